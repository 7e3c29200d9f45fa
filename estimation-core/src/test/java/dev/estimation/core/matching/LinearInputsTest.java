package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.LatinHypercubeRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.space.Space;
import dev.estimation.testing.ConditionallyLinearFunction;
import dev.estimation.testing.RandomGaussians;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;

/** Functions that are linear in some inputs, in whatever order, held against products over all inputs. */
class LinearInputsTest {
  private static final int INPUTS = 5;
  private static final int OUTPUTS = 3;

  /** Active and linear inputs of five. */
  record Layout(int[] active, int[] linear) {
    static Layout of(String active, String linear) {
      return new Layout(indices(active), indices(linear));
    }

    private static int[] indices(String digits) {
      return digits.chars().map(digit -> digit - '0').toArray();
    }

    int bent() {
      return active.length - linear.length;
    }
  }

  static List<Layout> layouts() {
    return List.of(
        Layout.of("0123", "01"),
        Layout.of("0123", "23"),
        Layout.of("0123", "31"),
        Layout.of("420", "4"),
        Layout.of("314", "41"),
        Layout.of("2041", "402"),
        Layout.of("01234", "0234"));
  }

  /** Well-conditioned; a variance of zero in a linear and a bent input; all but a plane; small beside large. */
  enum Spread {
    PLAIN,
    ZEROS,
    NEARLY_SINGULAR,
    SCALED;

    Moments moments(int seed) {
      RandomGaussians random = new RandomGaussians(seed);
      DMatrixRMaj p = random.covariance(INPUTS);
      double[] factors = {1, 1, 1, 1, 1};
      if (this == ZEROS) {
        factors[1] = 0;
        factors[seed % 2 == 0 ? 4 : 2] = 0;
      } else if (this == SCALED) {
        factors = new double[] {1e-3, 1, 1e-6, 0.1, 1e-2};
      }
      for (int i = 0; i < INPUTS; i++) {
        for (int j = 0; j < INPUTS; j++) {
          p.set(i, j, p.get(i, j) * factors[i] * factors[j] / 4);
        }
      }
      if (this == NEARLY_SINGULAR) {
        flatten(p);
      }
      return RandomGaussians.momentsOf(Gaussian.of(random.vector(INPUTS), p));
    }

    /** Input 3 becomes the sum of 0 and 1, with an own deviation of 1e-5. */
    private static void flatten(DMatrixRMaj p) {
      for (int j = 0; j < INPUTS; j++) {
        p.set(3, j, p.get(0, j) + p.get(1, j));
      }
      p.set(3, 3, p.get(0, 0) + 2 * p.get(0, 1) + p.get(1, 1) + 1e-10);
      for (int i = 0; i < INPUTS; i++) {
        p.set(i, 3, p.get(3, i));
      }
    }
  }

  private static int nodes(Layout layout) {
    return layout.active.length == 5 ? 8 : layout.active.length == 4 ? 14 : 20;
  }

  /**
   * The truncation of p nodes for squares of sines with a slope of 1/2 and deviations to 1: (2 s)^2p p! / (2 p)!
   * with 2 s up to 1 an axis, below 1e-13 for 14 nodes and 1e-9 for 8; some axes add up. 1e-8 of the largest
   * variance for 8 nodes, 1e-10 for more.
   */
  @ParameterizedTest
  @EnumSource(Spread.class)
  void equalToProductsOverAllInputs(Spread spread) {
    for (Layout layout : layouts()) {
      MomentMatching product = NamedMatchings.product(nodes(layout));
      Moments input = spread.moments(layout.bent() + layout.linear[0]);
      VectorFunction plain =
          ConditionallyLinearFunction.waves(INPUTS, OUTPUTS, layout.active, layout.linear, false);
      VectorFunction known =
          ConditionallyLinearFunction.waves(INPUTS, OUTPUTS, layout.active, layout.linear, true);
      Space output = Space.reals(OUTPUTS);
      double tolerance = nodes(layout) == 8 ? 1e-8 : 1e-10;
      for (Form form : Form.values()) {
        MatchingWorkspace wanted =
            LinearInputs.carry(product, LinearInputs.undeclared(plain), input, output, form);
        String what = spread + " " + layout + " " + form;
        LinearInputs.assertSame(
            what, wanted, LinearInputs.carry(product, plain, input, output, form), tolerance);
        LinearInputs.assertSame(
            what, wanted, LinearInputs.carry(product, known, input, output, form), tolerance);
      }
    }
  }

  /**
   * u_a apart from u_b, and all linear in u_a too: deviations of the mean given u_a have degree 1 and what u_b
   * adds has degree 2 then, so that every rule is exact. Rounding of numbers to 10, times the
   * amplification by the weights where they are of both signs.
   */
  @ParameterizedTest
  @MethodSource("dev.estimation.core.matching.RuleFamilies#all")
  void everyRuleIsExactForBilinearFunctionsOfIndependentParts(PointRule rule) {
    for (Layout layout : layouts()) {
      Moments input = independentParts(layout);
      checkBilinear(rule, layout, input, true);
    }
  }

  /** Correlated parts make the mean given u_a quadratic: mean and cross-covariance want degree 3. */
  @ParameterizedTest
  @MethodSource("dev.estimation.core.matching.RuleFamilies#ofDegreeThree")
  void meansOfBilinearFunctionsAreExactToDegreeThree(PointRule rule) {
    for (Layout layout : layouts()) {
      checkBilinear(rule, layout, Spread.PLAIN.moments(3), false);
      checkBilinear(rule, layout, Spread.ZEROS.moments(3), false);
      checkBilinear(rule, layout, Spread.NEARLY_SINGULAR.moments(3), false);
    }
  }

  private static void checkBilinear(PointRule rule, Layout layout, Moments input, boolean all) {
    double tolerance = 1e-13 * rule.points(layout.bent()).weightAmplification() + 1e-12;
    Space output = Space.reals(OUTPUTS);
    for (boolean derivatives : new boolean[] {false, true}) {
      VectorFunction function = ConditionallyLinearFunction.bilinear(
          INPUTS, OUTPUTS, layout.active, layout.linear, derivatives);
      for (Form form : Form.values()) {
        MatchingWorkspace wanted = LinearInputs.carry(
            NamedMatchings.product(3), LinearInputs.undeclared(function), input, output, form);
        MatchingWorkspace got =
            LinearInputs.carry(PointMatching.of(rule), function, input, output, form);
        String what = layout + " " + form + (derivatives ? ", Jacobian" : "");
        if (all) {
          LinearInputs.assertSame(what, wanted, got, tolerance);
        } else {
          LinearInputs.assertMeanAndCross(what, wanted, got, tolerance);
        }
      }
    }
  }

  private static Moments independentParts(Layout layout) {
    Moments input = Spread.PLAIN.moments(9);
    DMatrixRMaj p = input.changeCovariance();
    boolean[] linear = new boolean[INPUTS];
    for (int index : layout.linear) {
      linear[index] = true;
    }
    for (int i = 0; i < INPUTS; i++) {
      for (int j = 0; j < INPUTS; j++) {
        p.set(i, j, linear[i] == linear[j] ? p.get(i, j) : 0);
      }
    }
    return input;
  }

  /** One evaluation a point and the centre's; for A a Jacobian where there is a weight, or b evaluations. */
  @ParameterizedTest
  @MethodSource("dev.estimation.core.matching.RuleFamilies#all")
  void evaluationsAreThoseOfTheNonlinearInputs(PointRule rule) {
    for (Layout layout : layouts()) {
      int size = rule.points(layout.bent()).size();
      int weighed = size + (rule.points(layout.bent()).centreMeanWeight() == 0 ? 0 : 1);
      for (boolean derivatives : new boolean[] {false, true}) {
        VectorFunction function = ConditionallyLinearFunction.waves(
            INPUTS, OUTPUTS, layout.active, layout.linear, derivatives);
        MatchingWorkspace work = LinearInputs.carry(
            PointMatching.of(rule),
            function,
            Spread.PLAIN.moments(1),
            Space.reals(OUTPUTS),
            Form.COVARIANCE);
        int further = derivatives ? 0 : weighed * layout.linear.length;
        assertEquals(1 + size + further, work.evaluations(), layout::toString);
        assertEquals(derivatives ? weighed : 0, work.jacobians(), layout::toString);
        assertEquals(layout.active.length, work.activeInputs());
      }
    }
  }

  /** Draws with a mean and covariance of their own are made over all active inputs. */
  @Test
  void drawsAreMadeOverAllActiveInputs() {
    Layout layout = layouts().get(3);
    VectorFunction function =
        ConditionallyLinearFunction.waves(INPUTS, OUTPUTS, layout.active, layout.linear, false);
    Moments input = Spread.PLAIN.moments(2);
    Space output = Space.reals(OUTPUTS);
    for (PointRule rule : List.of(RandomRule.independent(50, 1), LatinHypercubeRule.of(50, 1))) {
      MomentMatching matching = PointMatching.of(rule);
      MatchingWorkspace got =
          LinearInputs.carry(matching, function, input, output, Form.COVARIANCE);
      MatchingWorkspace wanted = LinearInputs.carry(
          matching, LinearInputs.undeclared(function), input, output, Form.COVARIANCE);
      LinearInputs.assertSame("the same draws", wanted, got, 0);
      assertEquals(wanted.evaluations(), got.evaluations());
    }
  }
}
