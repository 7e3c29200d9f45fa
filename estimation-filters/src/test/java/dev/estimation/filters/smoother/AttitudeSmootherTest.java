package dev.estimation.filters.smoother;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.consistency.ChiSquareBounds;
import dev.estimation.filters.consistency.NormalisedError;
import dev.estimation.filters.testing.Attitude;
import dev.estimation.filters.testing.AttitudeRun;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.Matchings;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** A quaternion and a bias through the fixed-interval smoother. */
class AttitudeSmootherTest extends BothForms {
  private static final int RUNS = 60;

  static List<Named<MomentMatching>> matchings() {
    return Matchings.overActiveInputs();
  }

  /**
   * 60 runs, step 20 of 100. The averaged NEES has 6 x 60 degrees of freedom and must lie in the
   * two-sided bounds of level 1 - 1e-4: one false alarm in about 1600 sets of seeds, for 6 matchings; fixed
   * seeds. The mean square errors of attitude and bias must fall below 0.45 and 0.2 of the filtered ones;
   * 0.31 to 0.32 and 0.10 to 0.11 were measured.
   */
  @ParameterizedTest
  @MethodSource("matchings")
  void laterMeasurementsHelp(MomentMatching matching) {
    NormalisedError error = NormalisedError.of(Attitude.SPACE, 0, 1, 2, 3, 4, 5);
    double[] filtered = new double[2];
    double[] smoothed = new double[2];
    double nees = 0;
    for (int seed = 0; seed < RUNS; seed++) {
      AttitudeRun run = new AttitudeRun(matching, form, 0.2, 100 + seed);
      FixedIntervalSmoother smoother = FixedIntervalSmoother.startingAt(run.estimate());
      List<double[]> truths = new ArrayList<>(List.of(run.truth()));
      List<Gaussian> estimates = new ArrayList<>(List.of(run.estimate().toGaussian()));
      for (int k = 1; k <= AttitudeRun.STEPS; k++) {
        run.step(k);
        smoother.record(run.work(), run.estimate());
        truths.add(run.truth());
        estimates.add(run.estimate().toGaussian());
      }
      SmoothedTrack track = smoother.smooth();
      assertEquals(estimates.get(AttitudeRun.STEPS), track.gaussian(AttitudeRun.STEPS));
      assertTrue(Attitude.SPACE.contains(track.gaussian(20).mean()));
      nees += error.squaredFrom(track.gaussian(20), truths.get(20)) / RUNS;
      addSquares(estimates.get(20), truths.get(20), filtered);
      addSquares(track.gaussian(20), truths.get(20), smoothed);
    }
    double average = nees;
    assertTrue(
        ChiSquareBounds.ofAverage(1 - 1e-4, 6, RUNS).contains(average),
        () -> "average NEES of smoothed estimates: " + average);
    assertTrue(
        smoothed[0] < 0.45 * filtered[0],
        () -> "attitude: " + smoothed[0] / filtered[0] + " of the filtered mean square");
    assertTrue(
        smoothed[1] < 0.2 * filtered[1],
        () -> "bias: " + smoothed[1] / filtered[1] + " of the filtered mean square");
  }

  private static void addSquares(Gaussian estimate, double[] truth, double[] sums) {
    double[] apart = new double[6];
    Attitude.SPACE.difference(estimate.mean(), truth, apart);
    for (int i = 0; i < 6; i++) {
      sums[i / 3] += apart[i] * apart[i];
    }
  }
}
