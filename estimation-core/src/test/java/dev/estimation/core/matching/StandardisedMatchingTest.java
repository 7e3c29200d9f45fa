package dev.estimation.core.matching;

import dev.estimation.core.points.LatinHypercubeRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.QuasiRandomRule;
import dev.estimation.core.points.RandomRule;
import org.junit.jupiter.api.Nested;

/** Drawn and standardised points owe what all other points do. */
class StandardisedMatchingTest {
  private static final int COUNT = 64;

  @Nested
  class Independent extends DrawnContract {
    @Override
    PointRule rule() {
      return RandomRule.independent(COUNT, 1).standardised();
    }
  }

  @Nested
  class Antithetic extends DrawnContract {
    @Override
    PointRule rule() {
      return RandomRule.antithetic(COUNT / 2, 1).standardised();
    }
  }

  @Nested
  class LatinHypercube extends DrawnContract {
    @Override
    PointRule rule() {
      return LatinHypercubeRule.of(COUNT, 1).standardised();
    }
  }

  @Nested
  class Sobol extends DrawnContract {
    @Override
    PointRule rule() {
      return QuasiRandomRule.sobol(COUNT).standardised();
    }
  }

  @Nested
  class Halton extends DrawnContract {
    @Override
    PointRule rule() {
      return QuasiRandomRule.halton(COUNT).standardised();
    }
  }

  /** The points, and the mean. */
  abstract static class DrawnContract extends PointMatchingContract {
    @Override
    public int evaluations(int carried) {
      return COUNT + 1;
    }
  }
}
