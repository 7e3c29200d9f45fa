package dev.estimation.filters.filter;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.ChainMotion;
import dev.estimation.filters.testing.ChainSight;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.testing.AllocationMeter;
import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** A step allocates nothing: prediction and update, every matching, several sizes. */
class FilterAllocationTest extends BothForms {
  static List<Arguments> cases() {
    return IntStream.of(2, 5, 6, 7, 8, 12, 20)
        .boxed()
        .flatMap(n -> Matchings.all().stream().map(m -> Arguments.of(n, m)))
        .filter(FilterAllocationTest::isFeasible)
        .toList();
  }

  /** Products over all of 12 axes have 531441 points, and are refused; of 20 even more. */
  private static boolean isFeasible(Arguments arguments) {
    boolean product = ((Named<?>) arguments.get()[1]).getName().startsWith("Gauss-Hermite");
    return !(product && (int) arguments.get()[0] > 8);
  }

  @ParameterizedTest
  @MethodSource("cases")
  void stepsAllocateNothing(int n, MomentMatching matching) {
    ChainMotion motion = new ChainMotion(n);
    FilterPlan plan = formed(FilterPlan.of(motion, matching)).withGate(0.999999);
    FilterWorkspace work = plan.workspace();
    SensorPort port = work.port(new ChainSight(n));
    double[] deviations = new double[n];
    Arrays.fill(deviations, 0.1);
    Estimate estimate = plan.start(0, Gaussian.independent(new double[n], deviations));
    double[] measurement = {0.05, -0.02};
    assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
      require(work.predict(estimate, estimate.time() + 0.1));
      require(port.update(estimate, measurement));
    }));
  }

  private static void require(StepStatus status) {
    if (status != StepStatus.APPLIED) {
      throw new AssertionError(status);
    }
  }
}
