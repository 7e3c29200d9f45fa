package dev.estimation.core.matching;

import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.SimplexRule;
import dev.estimation.core.points.UnscentedRule;

/** The matchings that reference tables name, e.g. "unscented 0.5 2 0" for alpha, beta and kappa. */
final class NamedMatchings {
  private NamedMatchings() {}

  static MomentMatching of(String name) {
    String[] words = name.split(" ");
    return switch (words[0]) {
      case "linearisation" ->
        words.length == 1 ? Linearisation.firstOrder() : Linearisation.secondOrder();
      case "spread" -> spread(words[1]);
      case "cubature" ->
        PointMatching.of(
            name.equals("cubature 5") ? CubatureRule.degreeFive() : CubatureRule.degreeThree());
      case "McNamee-Stenger" -> PointMatching.of(CubatureRule.mcNameeStenger());
      case "simplex" ->
        PointMatching.of(SimplexRule.spherical(name.equals("simplex 1/3") ? 1.0 / 3 : 0));
      case "unscented" -> PointMatching.of(unscented(words));
      case "Gauss-Hermite" -> product(Integer.parseInt(words[1]));
      default -> throw new IllegalArgumentException("no matching is named " + name);
    };
  }

  private static MomentMatching spread(String order) {
    return switch (order) {
      case "1" -> SpreadLinearisation.firstOrder();
      case "2" -> SpreadLinearisation.secondOrder();
      default -> SpreadLinearisation.secondOrderAlongAxes();
    };
  }

  private static UnscentedRule unscented(String[] words) {
    double alpha = Double.parseDouble(words[1]);
    double beta = Double.parseDouble(words[2]);
    return words[3].equals("3-n")
        ? UnscentedRule.scaled(alpha, beta, n -> 3 - n)
        : UnscentedRule.scaled(alpha, beta, Double.parseDouble(words[3]));
  }

  static MomentMatching product(int nodes) {
    return PointMatching.of(GaussHermiteRule.product(nodes));
  }
}
