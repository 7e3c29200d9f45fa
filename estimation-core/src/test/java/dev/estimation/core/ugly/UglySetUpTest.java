package dev.estimation.core.ugly;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.AffineFunction;
import dev.estimation.testing.OnceDifferentiable;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

/** Set-ups that cannot work are refused when a workspace is made, not at the first step. */
class UglySetUpTest {
  private static final VectorFunction PLAIN = (input, given, output) -> output[0] = input[0];

  private static void assertRefused(
      MomentMatching matching, int inputs, VectorFunction function, String... fragments) {
    IllegalArgumentException refusal = assertThrows(
        IllegalArgumentException.class,
        () -> matching.workspace(Space.reals(inputs), Space.reals(1), function));
    assertNames(refusal.getMessage(), fragments);
  }

  private static VectorFunction reading(int... active) {
    return new VectorFunction() {
      @Override
      public void evaluate(double[] input, double[] given, double[] output) {
        output[0] = input[active[0]];
      }

      @Override
      public Structure structure() {
        return Structure.UNKNOWN.withActiveInputs(active);
      }
    };
  }

  @Test
  void linearisationWithoutAJacobian() {
    assertRefused(Linearisation.firstOrder(), 2, PLAIN, "Jacobian", "input scales");
    assertRefused(Linearisation.secondOrder(), 2, PLAIN, "Jacobian", "input scales");
  }

  @Test
  void secondOrderWithoutAHessian() {
    AffineFunction sum = new AffineFunction(new DMatrixRMaj(1, 2), 0);
    VectorFunction function = new OnceDifferentiable(sum);
    assertRefused(Linearisation.secondOrder(), 2, function, "Hessian", "input scales", "spread");
    Linearisation.firstOrder().workspace(Space.reals(2), Space.reals(1), function);
  }

  @Test
  void inputScalesThatDoNotFit() {
    assertRefused(Linearisation.firstOrder().withInputScales(1, 1), 3, PLAIN, "scales", "3", "2");
    assertRefused(
        Linearisation.firstOrder().withInputScales(1, 0, 1), 3, PLAIN, "scales[1]", "0.0");
  }

  @Test
  void tooManyPoints() {
    MomentMatching product = PointMatching.of(GaussHermiteRule.product(5));
    assertRefused(product, 8, PLAIN, "390625", "100000", "active inputs");
    product.workspace(Space.reals(8), Space.reals(1), reading(7, 0));
    assertRefused(product.overWholeInput(), 8, reading(7, 0), "390625");
  }

  @Test
  void activeInputsThatTheSpaceDoesNotHave() {
    for (MomentMatching matching : new MomentMatching[] {
      PointMatching.of(UnscentedRule.scaled(1, 2, 0)),
      Linearisation.firstOrder().withInputScales(1, 1, 1),
    }) {
      assertRefused(matching, 3, reading(0, 3), "active inputs", "0..2", "3");
      assertRefused(matching, 3, reading(1, 1), "active inputs", "[1, 1]");
    }
  }

  private static VectorFunction linearIn(Structure structure) {
    return new VectorFunction() {
      @Override
      public void evaluate(double[] input, double[] given, double[] output) {
        output[0] = input[0];
      }

      @Override
      public Structure structure() {
        return structure;
      }
    };
  }

  @Test
  void linearInputsThatAreNotActiveOrNotThere() {
    MomentMatching matching = PointMatching.of(UnscentedRule.scaled(1, 2, 0));
    Structure part = Structure.UNKNOWN.withActiveInputs(2, 0);
    assertRefused(
        matching,
        3,
        linearIn(part.withLinearInputs(1)),
        "linear inputs",
        "[1]",
        "active",
        "[2, 0]");
    assertRefused(
        matching, 3, linearIn(part.withLinearInputs(0, 0)), "linear inputs", "distinct", "[0, 0]");
    assertRefused(matching, 3, linearIn(part.withLinearInputs(3)), "linear inputs", "0..2", "[3]");
    assertRefused(
        matching, 3, linearIn(part.withLinearInputs(-1)), "linear inputs", "0..2", "[-1]");
    matching.workspace(Space.reals(3), Space.reals(1), linearIn(part.withLinearInputs(0, 2)));
    // Over the whole input nothing of it is used.
    matching
        .overWholeInput()
        .workspace(Space.reals(3), Space.reals(1), linearIn(part.withLinearInputs(1)));
  }

  @Test
  void aRuleThatDoesNotExistThere() {
    MomentMatching rule = PointMatching.of(UnscentedRule.scaled(1, 0, -3));
    assertRefused(rule, 3, PLAIN, "n + kappa", "3", "-3.0");
    rule.workspace(Space.reals(4), Space.reals(1), PLAIN);
  }
}
