package dev.estimation.benchmarks.cases.balloon;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.consistency.ChiSquareBounds;
import java.util.stream.LongStream;
import org.junit.jupiter.api.Test;

class BalloonTest {
  private static final ChiSquareBounds BOUNDS = ChiSquareBounds.twoSided(0.95, 3);
  private static final MomentMatching LINEAR = Linearisation.firstOrder();
  private static final MomentMatching HERMITE = PointMatching.of(GaussHermiteRule.product(3));

  @Test
  void theFlightShownTellsTheMethodsApart() {
    assertTrue(nees(BalloonCase.SEED, LINEAR) > BOUNDS.upper());
    assertTrue(BOUNDS.contains(nees(BalloonCase.SEED, HERMITE)));
    MomentMatching unscented = PointMatching.of(UnscentedRule.scaled(1, 2, 0));
    assertTrue(BOUNDS.contains(nees(BalloonCase.SEED, unscented)));
  }

  /**
   * Fixed seeds, so nothing can fail by chance; 82 of the first 100 flights are such for linear.
   */
  @Test
  void theFlightShownIsNoException() {
    long dishonest =
        LongStream.rangeClosed(1, 20).filter(s -> isOutside(s, LINEAR)).count();
    assertTrue(dishonest >= 12, "linear outside its bounds in " + dishonest + " of 20 flights");
    long others =
        LongStream.rangeClosed(1, 20).filter(s -> isOutside(s, HERMITE)).count();
    assertEquals(0, others, "Gauss-Hermite outside its bounds");
  }

  @Test
  void theSameSeedGivesTheSameFlight() {
    assertEquals(nees(7, LINEAR), nees(7, LINEAR), 0);
    assertTrue(nees(7, LINEAR) != nees(8, LINEAR));
  }

  private static boolean isOutside(long seed, MomentMatching matching) {
    return !BOUNDS.contains(nees(seed, matching));
  }

  private static double nees(long seed, MomentMatching matching) {
    RunResult result = new Replayer(new BalloonFlight(seed).fly(), matching).run();
    assertEquals(RunResult.OK, result.status());
    Accuracy accuracy = result.accuracy();
    assertEquals(BalloonFlight.STEPS, accuracy.count());
    return accuracy.neesMean();
  }
}
