package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.QuasiRandomRule;
import dev.estimation.core.points.SparseGridRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AllocationMeter;
import dev.estimation.testing.RandomGaussians;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** A call allocates nothing, by the JVM's own count of the thread's bytes. */
class MatchingAllocationTest {
  private static final int[] SIZES = {2, 5, 7, 8, 12};

  static Stream<Arguments> matchings() {
    List<Arguments> all = new ArrayList<>();
    for (int n : SIZES) {
      double[] scales = MatchingUnderTest.unitScales(n);
      all.add(Arguments.of("linearisation", n, Linearisation.firstOrder(), 1));
      all.add(
          Arguments.of("differences", n, Linearisation.firstOrder().withInputScales(scales), 0));
      all.add(Arguments.of("second order", n, Linearisation.secondOrder(), 2));
      MomentMatching scaled = Linearisation.secondOrder().withInputScales(scales);
      all.add(Arguments.of("second differences", n, scaled, 0));
      all.add(Arguments.of("differences of Jacobians", n, scaled, 1));
      for (String name : List.of(
          "spread 1",
          "spread 2",
          "spread axes",
          "unscented 1 2 0",
          "unscented 1e-3 2 0",
          "simplex 1/3",
          "cubature 3",
          "cubature 5",
          "McNamee-Stenger")) {
        all.add(Arguments.of(name, n, NamedMatchings.of(name), 0));
      }
      Map<String, PointRule> rules = Map.of(
          "at 2 deviations", UnscentedRule.atDeviations(2),
          "sparse grid 2", SparseGridRule.ofLevel(2),
          "sparse grid of degree 7", SparseGridRule.ofDegree(7),
          "Sobol", QuasiRandomRule.sobol(100).standardised());
      rules.forEach((name, rule) -> all.add(Arguments.of(name, n, PointMatching.of(rule), 0)));
      PointRule kappa = UnscentedRule.scaled(1, 0, k -> 3 - k);
      all.add(Arguments.of("kappa = 3 - n", n, PointMatching.of(kappa), 0));
      for (int nodes = 3; nodes <= 5 && Math.pow(nodes, n) <= 4096; nodes++) {
        String name = "Gauss-Hermite " + nodes;
        all.add(Arguments.of(name, n, NamedMatchings.of(name), 0));
      }
    }
    all.add(Arguments.of("Gauss-Hermite 3", 8, NamedMatchings.product(3), 0));
    PointRule two = GaussHermiteRule.product(2);
    all.add(Arguments.of("Gauss-Hermite 2", 12, PointMatching.of(two), 0));
    return all.stream();
  }

  @ParameterizedTest
  @MethodSource("matchings")
  void aCallAllocatesNothing(String name, int n, MomentMatching matching, int derivatives) {
    check(name, n, matching, new Wave(n, n, derivatives));
  }

  @Test
  void aCallOfAMixedProductAllocatesNothing() {
    MomentMatching mixed = PointMatching.of(GaussHermiteRule.product(3, 5));
    check("mixed product", 2, mixed, new Wave(2, 2, 0));
  }

  /** The same for functions that read a part, whose factor is made in another order. */
  @ParameterizedTest
  @MethodSource("matchings")
  void aCallForSomeInputsAllocatesNothing(
      String name, int n, MomentMatching matching, int derivatives) {
    check(name, n, matching, new Wave(n, n - 1, derivatives));
    check(name, n, matching.overWholeInput(), new Wave(n, n - 1, derivatives));
  }

  private static void check(String name, int n, MomentMatching matching, Wave function) {
    for (Form form : Form.values()) {
      check(name + ", " + form, n, matching, function, form);
    }
  }

  private static void check(String name, int n, MomentMatching matching, Wave function, Form form) {
    RandomGaussians random = new RandomGaussians(n);
    Moments input = random.moments(n);
    Covariance noise = RandomGaussians.noise(random.covariance(2));
    double[] given = new double[1];
    MatchingWorkspace work = matching.workspace(Space.reals(n), Space.angles(2), function, form);
    Runnable call = () -> {
      input.changeCovariance();
      if (work.carry(input, given, noise) != MatchingStatus.MATCHED) {
        throw new IllegalStateException(work.failure());
      }
      work.unitCrossCovariance();
      work.unexplained();
    };
    int calls = Math.max(20, 10_000 / Math.max(1, evaluations(work, call)));
    double bytes = AllocationMeter.bytesPerCall(calls, calls, call);
    assertEquals(0, bytes, name + " for n = " + n + ", bytes per call");
  }

  private static int evaluations(MatchingWorkspace work, Runnable call) {
    call.run();
    return work.evaluations();
  }

  @Test
  void rotationsInSeveralPassesAllocateNothing() {
    Space space = Space.unitQuaternion().and(Space.reals(1));
    Moments input = new Moments(space);
    input.set(
        Gaussian.independent(space, new double[] {1, 0, 0, 0, 0}, new double[] {0.4, 0.3, 0.2, 1}));
    double[] given = new double[0];
    MatchingWorkspace work = PointMatching.of(CubatureRule.degreeThree())
        .withMeanPasses(3)
        .workspace(space, space, (u, none, z) -> System.arraycopy(u, 0, z, 0, 5));
    assertEquals(0, AllocationMeter.bytesPerCall(1000, 1000, () -> {
      if (work.carry(input, given, null) != MatchingStatus.MATCHED) {
        throw new IllegalStateException(work.failure());
      }
    }));
  }

  /** A failed call allocates nothing either, until its words are asked for. */
  @Test
  void aFailedCallAllocatesNothing() {
    MatchingWorkspace work = NamedMatchings.of("cubature 3")
        .workspace(Space.reals(5), Space.reals(2), new Wave(5, 4, 0));
    Moments input = new RandomGaussians(1).moments(5);
    Moments indefinite = new RandomGaussians(1).moments(5);
    indefinite.changeCovariance().set(3, 3, -1);
    double[] broken = {Double.NaN};
    double[] fine = new double[1];
    Runnable calls = () -> {
      work.carry(input, broken, null);
      work.carry(indefinite, fine, null);
    };
    assertEquals(0, AllocationMeter.bytesPerCall(2000, 2000, calls));
  }

  /** The meter itself must see an allocation: an array of 10 doubles has 80 bytes and a header. */
  @Test
  void theMeterSeesAnArray() {
    double[][] sink = new double[1][];
    double bytes = AllocationMeter.bytesPerCall(1000, 1000, () -> sink[0] = new double[10]);
    assertTrue(bytes >= 80 && bytes <= 120, () -> bytes + " bytes for an array of 10 doubles");
  }

  @Test
  void theMeterCountsNothingForNothing() {
    assertEquals(0, AllocationMeter.bytesPerCall(1000, 1000, () -> {}));
  }

  /** Two smooth angles of the last inputs, read backwards; allocates nothing itself. */
  private static final class Wave implements VectorFunction {
    private final int inputs;
    private final int read;
    private final Structure structure;

    Wave(int inputs, int read, int derivatives) {
      this.inputs = inputs;
      this.read = read;
      int[] active = new int[read];
      for (int i = 0; i < read; i++) {
        active[i] = read == inputs ? i : inputs - 1 - i;
      }
      Structure known = Structure.UNKNOWN.withActiveInputs(active);
      this.structure = derivatives == 0
          ? known
          : derivatives == 1
              ? known.withJacobian(this::derive)
              : known.withJacobian(this::derive).withHessian(this::deriveTwice);
    }

    @Override
    public void evaluate(double[] input, double[] given, double[] output) {
      double sum = given[0];
      for (int i = inputs - read; i < inputs; i++) {
        sum += 0.1 * input[i];
      }
      output[0] = 0.1 * sum;
      output[1] = 0.1 * sum * sum;
    }

    private void derive(double[] input, double[] given, double[] jacobian) {
      double sum = given[0];
      for (int i = inputs - read; i < inputs; i++) {
        sum += 0.1 * input[i];
      }
      for (int i = inputs - read; i < inputs; i++) {
        jacobian[i] = 0.01;
        jacobian[inputs + i] = 0.02 * sum;
      }
    }

    private void deriveTwice(double[] input, double[] given, double[] hessians) {
      for (int j = inputs - read; j < inputs; j++) {
        for (int l = inputs - read; l <= j; l++) {
          hessians[(inputs + j) * inputs + l] = 0.002;
        }
      }
    }

    @Override
    public Structure structure() {
      return structure;
    }
  }
}
