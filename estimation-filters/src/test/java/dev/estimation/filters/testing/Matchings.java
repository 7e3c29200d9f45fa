package dev.estimation.filters.testing;

import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.SpreadLinearisation;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.SimplexRule;
import dev.estimation.core.points.UnscentedRule;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Named;

/** Every matching of the library, each over active inputs and over the whole input. */
public final class Matchings {
  private Matchings() {}

  /** All of them, by name. */
  public static List<Named<MomentMatching>> all() {
    List<Named<MomentMatching>> over = new ArrayList<>();
    for (Named<MomentMatching> named : overActiveInputs()) {
      over.add(named);
      over.add(Named.of(named.getName() + ", whole state", named.getPayload().overWholeInput()));
    }
    return over;
  }

  /** All of them over active inputs. */
  public static List<Named<MomentMatching>> overActiveInputs() {
    return List.of(
        Named.of("linearisation", Linearisation.firstOrder()),
        Named.of("second order", secondOrder()),
        Named.of("spread", SpreadLinearisation.firstOrder()),
        Named.of("spread, second order", SpreadLinearisation.secondOrder()),
        Named.of("spread, along axes", SpreadLinearisation.secondOrderAlongAxes()),
        Named.of("unscented 1, 2, 0", PointMatching.of(UnscentedRule.scaled(1, 2, 0))),
        Named.of("unscented 0.5, 2, 1", PointMatching.of(UnscentedRule.scaled(0.5, 2, 1))),
        Named.of("unscented 3-n", PointMatching.of(UnscentedRule.symmetric(n -> 3 - n))),
        Named.of("unscented at 2 deviations", PointMatching.of(UnscentedRule.atDeviations(2))),
        Named.of("simplex", PointMatching.of(SimplexRule.spherical())),
        Named.of("cubature 3", PointMatching.of(CubatureRule.degreeThree())),
        Named.of("cubature 5", PointMatching.of(CubatureRule.degreeFive())),
        Named.of("McNamee-Stenger", PointMatching.of(CubatureRule.mcNameeStenger())),
        Named.of("Gauss-Hermite 3", PointMatching.of(GaussHermiteRule.product(3))));
  }

  /** Second order, with scales of 1 where a model has no Hessian. */
  private static MomentMatching secondOrder() {
    return (input, output, function, form) -> {
      double[] scales = new double[input.dimension()];
      Arrays.fill(scales, 1);
      return Linearisation.secondOrder()
          .withInputScales(scales)
          .workspace(input, output, function, form);
    };
  }

  /**
   * The evaluations of one call: one with a Jacobian, 1 + k + k^2 with products over the
   * spread, 3^k for the product of 3 nodes, 2 k^2 + 1 for degree
   * 5, k + 2 for the simplex, 2 k + 1 for the others; k counts the inputs that a function reads, or all.
   */
  public static int evaluations(Named<MomentMatching> matching, int active, int whole) {
    String[] words = matching.getName().split(", whole state", -1);
    int k = words.length > 1 ? whole : active;
    return switch (words[0]) {
      case "linearisation", "second order" -> 1;
      case "spread, second order" -> 1 + k + k * k;
      case "simplex" -> k + 2;
      case "cubature 5", "McNamee-Stenger" -> 2 * k * k + 1;
      case "Gauss-Hermite 3" -> (int) Math.pow(3, k);
      default -> 2 * k + 1;
    };
  }

  /** The Jacobians of one call of a function that has one but no Hessian. */
  public static int jacobians(Named<MomentMatching> matching, int active, int whole) {
    if (matching.getName().startsWith("second order")) {
      return 1 + 2 * (matching.getName().endsWith("whole state") ? whole : active);
    }
    return isLinear(matching) ? 1 : 0;
  }

  /** Whether it takes a Jacobian and nothing else. */
  public static boolean isLinear(Named<MomentMatching> matching) {
    return matching.getName().startsWith("linearisation");
  }
}
