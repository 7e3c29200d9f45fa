package dev.estimation.core.points;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import org.junit.jupiter.api.Nested;
import org.junit.jupiter.api.Test;

/** Every rule of drawn points, standardised. */
class StandardisedRulesTest {
  @Nested
  class Independent extends DrawnRuleContract {
    @Override
    PointRule rule() {
      return RandomRule.independent(100, 1).standardised();
    }
  }

  @Nested
  class Antithetic extends DrawnRuleContract {
    @Override
    PointRule rule() {
      return RandomRule.antithetic(50, 1).standardised();
    }

    @Override
    int degree(int dimension) {
      return 3;
    }

    @Override
    boolean mirrored(int dimension) {
      return true;
    }

    @Test
    void mirroringAPointGivesItsPartner() {
      UnitPoints points = rule().points(4);
      for (int i = 0; i < points.size(); i += 2) {
        for (int axis = 0; axis < 4; axis++) {
          assertEquals(-points.coordinate(i, axis), points.coordinate(i + 1, axis));
        }
      }
    }
  }

  @Nested
  class LatinHypercube extends DrawnRuleContract {
    @Override
    PointRule rule() {
      return LatinHypercubeRule.of(100, 1).standardised();
    }
  }

  @Nested
  class Sobol extends DrawnRuleContract {
    @Override
    PointRule rule() {
      return QuasiRandomRule.sobol(100).standardised();
    }
  }

  @Nested
  class Halton extends DrawnRuleContract {
    @Override
    PointRule rule() {
      return QuasiRandomRule.halton(100).standardised();
    }
  }

  @Nested
  class ShiftedSobol extends DrawnRuleContract {
    @Override
    PointRule rule() {
      return QuasiRandomRule.sobol(15).shifted(16, 1).standardised();
    }
  }

  /** Said by the points, so that it can be known before use. */
  @Test
  void standardisedPointsHaveNoStandardErrors() {
    PointRule[] rules = {
      RandomRule.independent(100, 1).standardised(),
      RandomRule.antithetic(50, 1).standardised(),
      LatinHypercubeRule.of(5, 1).replicates(16).standardised(),
      LatinHypercubeRule.of(5, 1).standardised().replicates(16),
      QuasiRandomRule.sobol(7).standardised().shifted(16, 1),
      QuasiRandomRule.halton(7).shifted(16, 1).standardised(),
    };
    for (PointRule rule : rules) {
      assertFalse(rule.points(2).isSample());
      assertEquals(0, rule.points(2).replicates());
    }
  }

  @Test
  void pointsTellTheirReplicates() {
    assertEquals(100, RandomRule.independent(100, 1).points(2).replicates());
    assertEquals(50, RandomRule.antithetic(50, 1).points(2).replicates());
    assertEquals(1, LatinHypercubeRule.of(50, 1).points(2).replicates());
    assertEquals(16, LatinHypercubeRule.of(50, 1).replicates(16).points(2).replicates());
    assertEquals(1, QuasiRandomRule.sobol(7).points(2).replicates());
    assertEquals(1, QuasiRandomRule.sobol(7).shifted(1, 5).points(2).replicates());
    assertEquals(20, QuasiRandomRule.halton(7).shifted(20, 5).points(2).replicates());
    assertEquals(140, QuasiRandomRule.halton(7).shifted(20, 5).points(2).size());
  }
}
