package dev.estimation.core.matching;

import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.points.SimplexRule;
import dev.estimation.core.points.SparseGridRule;
import dev.estimation.core.points.UnscentedRule;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Named;

/** Rules of every family that is no sample, some with negative weights at the centre or elsewhere. */
final class RuleFamilies {
  private RuleFamilies() {}

  static List<Named<PointRule>> all() {
    List<Named<PointRule>> all = new ArrayList<>(ofDegreeThree());
    all.add(Named.of("simplex", SimplexRule.spherical(0)));
    all.add(Named.of("standardised draws", RandomRule.independent(40, 5).standardised()));
    all.add(Named.of("simplex, centre -1/2", SimplexRule.spherical(-0.5)));
    return all;
  }

  static List<Named<PointRule>> ofDegreeThree() {
    return List.of(
        Named.of("unscented 1 2 0", UnscentedRule.scaled(1, 2, 0)),
        Named.of("unscented 0.5 2 0", UnscentedRule.scaled(0.5, 2, 0)),
        Named.of("unscented 1e-3 2 0", UnscentedRule.scaled(1e-3, 2, 0)),
        Named.of("unscented 1e-3 0 0", UnscentedRule.scaled(1e-3, 0, 0)),
        Named.of("unscented 1 0 3-n", UnscentedRule.scaled(1, 0, (int n) -> 3 - n)),
        Named.of("cubature 3", CubatureRule.degreeThree()),
        Named.of("cubature 5", CubatureRule.degreeFive()),
        Named.of("McNamee-Stenger", CubatureRule.mcNameeStenger()),
        Named.of("Gauss-Hermite 2", GaussHermiteRule.product(2)),
        Named.of("Gauss-Hermite 3", GaussHermiteRule.product(3)),
        Named.of("Gauss-Hermite 4", GaussHermiteRule.product(4)),
        Named.of("sparse grid 2", SparseGridRule.ofLevel(2)),
        Named.of("sparse grid 3", SparseGridRule.ofLevel(3)));
  }
}
