package dev.estimation.filters.filter;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.testing.Bits;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.filters.testing.PlainWalk;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/**
 * Two rows of two components, one an angle, against the same four components written out by hand.
 */
class StackedSightsTest extends BothForms {
  /** Place, variances of range and bearing, their covariance; both places lie east of the state. */
  private static final double[] SIGHTS = {
    40, 12.5, 0.04, 0.0009, 0.003, 60, 11, 0.25, 0.0001, -0.002
  };

  /**
   * The first bearing is measured at 3.12 and predicted at -3.117, the second the other way
   * round.
   */
  private static final double[] MEASURED = {20.3, 3.12, 39.5, -3.13};

  static List<Named<MomentMatching>> matchings() {
    return Matchings.all();
  }

  private FilterPlan plan(MomentMatching matching) {
    return formed(FilterPlan.of(new PlainWalk(3, 1), matching));
  }

  private static Gaussian prior() {
    return Gaussian.of(
        new double[] {20, 12, 5}, new double[][] {{2, 0.5, 0.3}, {0.5, 1, 0.2}, {0.3, 0.2, 4}});
  }

  /** The same operations in the same order, so the same bits. */
  @ParameterizedTest
  @MethodSource("matchings")
  void rowsAreThoseWrittenOut(MomentMatching matching) {
    FilterPlan plan = plan(matching);
    StackedPort stacked = plan.workspace().port(new Sight(), 3);
    SensorPort written = plan.workspace().port(new TwoSights());
    Estimate one = plan.start(0, prior());
    Estimate other = plan.start(0, prior());
    assertEquals(StepStatus.APPLIED, stacked.update(one, 2, MEASURED, SIGHTS));
    assertEquals(StepStatus.APPLIED, written.update(other, MEASURED, SIGHTS));
    assertArrayEquals(Bits.of(other, 3), Bits.of(one, 3));
    assertArrayEquals(written.innovation(), stacked.last().innovation());
    assertArrayEquals(
        written.innovationCovariance().data, stacked.last().innovationCovariance().data);
    assertEquals(written.logLikelihood(), stacked.last().logLikelihood());
  }

  /** From a state known exactly: each innovation is a few hundredths, not nearly 2 pi. */
  @ParameterizedTest
  @MethodSource("matchings")
  void innovationsGoTheShortWayRound(MomentMatching matching) {
    FilterPlan plan = plan(matching);
    StackedPort stacked = plan.workspace().port(new Sight(), 2);
    Gaussian certain = Gaussian.independent(prior().mean(), new double[3]);
    Estimate estimate = plan.start(0, certain);
    assertEquals(StepStatus.APPLIED, stacked.update(estimate, 2, MEASURED, SIGHTS));
    double first = MEASURED[1] - (Math.atan2(-0.5, -20) + 2 * Math.PI);
    double second = MEASURED[3] - (Math.atan2(1, -40) - 2 * Math.PI);
    assertTrue(Math.abs(first) < 0.1 && Math.abs(second) < 0.1, "both cross the seam");
    // 1e-14: roundings on numbers to 2 pi.
    assertWithin("first", first, stacked.last().innovation()[1], 1e-14, 1);
    assertWithin("second", second, stacked.last().innovation()[3], 1e-14, 1);
  }

  /** A state known exactly leaves the noise alone: two blocks, and nothing between them. */
  @ParameterizedTest
  @MethodSource("matchings")
  void noiseStandsInBlocks(MomentMatching matching) {
    FilterPlan plan = plan(matching);
    StackedPort stacked = plan.workspace().port(new Sight(), 2);
    Estimate estimate = plan.start(0, Gaussian.independent(prior().mean(), new double[3]));
    assertEquals(StepStatus.APPLIED, stacked.update(estimate, 2, MEASURED, SIGHTS));
    DMatrixRMaj wanted = new DMatrixRMaj(new double[][] {
      {0.04, 0.003, 0, 0}, {0.003, 0.0009, 0, 0}, {0, 0, 0.25, -0.002}, {0, 0, -0.002, 0.0001}
    });
    // 1e-16: points all stand at the mean, whose own bearing may be rounded once by the space.
    DMatrixRMaj got = stacked.last().innovationCovariance();
    assertMatrix("S", wanted, got, 1e-16, 1);
  }

  private static double east(double[] state, double[] given, int row) {
    return state[0] - given[5 * row];
  }

  private static double north(double[] state, double[] given, int row) {
    return state[1] - given[5 * row + 1];
  }

  /** Range and bearing of the state from a given place. */
  private record Sight() implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1).and(Space.angles(1));
    }

    @Override
    public int givenDimension() {
      return 5;
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = Math.hypot(east(state, given, 0), north(state, given, 0));
      measurement[1] = Math.atan2(north(state, given, 0), east(state, given, 0));
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      fillRow(east(state, given, 0), north(state, given, 0), 0, jacobian);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = given[2];
      covariance[1] = given[4];
      covariance[2] = given[4];
      covariance[3] = given[3];
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1);
    }
  }

  /** Two of them at once. */
  private record TwoSights() implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1).and(Space.angles(1)).and(Space.reals(1)).and(Space.angles(1));
    }

    @Override
    public int givenDimension() {
      return 10;
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = Math.hypot(east(state, given, 0), north(state, given, 0));
      measurement[1] = Math.atan2(north(state, given, 0), east(state, given, 0));
      measurement[2] = Math.hypot(east(state, given, 1), north(state, given, 1));
      measurement[3] = Math.atan2(north(state, given, 1), east(state, given, 1));
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      fillRow(east(state, given, 0), north(state, given, 0), 0, jacobian);
      fillRow(east(state, given, 1), north(state, given, 1), 6, jacobian);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = given[2];
      covariance[1] = given[4];
      covariance[4] = given[4];
      covariance[5] = given[3];
      covariance[10] = given[7];
      covariance[11] = given[9];
      covariance[14] = given[9];
      covariance[15] = given[8];
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1);
    }
  }

  /** Derivatives of range and bearing by three components, the last of them unread. */
  private static void fillRow(double east, double north, int start, double[] jacobian) {
    double range = Math.hypot(east, north);
    jacobian[start] = east / range;
    jacobian[start + 1] = north / range;
    jacobian[start + 3] = -north / (range * range);
    jacobian[start + 4] = east / (range * range);
  }
}
