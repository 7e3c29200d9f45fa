package dev.estimation.core.points;

import dev.estimation.testing.ReferenceTable;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Degree of exactness, first failing monomial and smallest weight, row by row of the table. */
class RuleDegreeTest {
  private static final Map<String, PointRule> RULES = Map.ofEntries(
      Map.entry("cubature 3", CubatureRule.degreeThree()),
      Map.entry("cubature 5", CubatureRule.degreeFive()),
      Map.entry("McNamee-Stenger", CubatureRule.mcNameeStenger()),
      Map.entry("simplex 0", SimplexRule.spherical(0)),
      Map.entry("simplex 1/3", SimplexRule.spherical(1.0 / 3)),
      Map.entry("unscented 1 0 3-n", UnscentedRule.symmetric(n -> 3 - n)),
      Map.entry("unscented 1 0 0", UnscentedRule.symmetric(0)),
      Map.entry("unscented 1 0 1", UnscentedRule.symmetric(1)),
      Map.entry("unscented 1 0 2", UnscentedRule.symmetric(2)),
      Map.entry("Gauss-Hermite 2", GaussHermiteRule.product(2)),
      Map.entry("Gauss-Hermite 3", GaussHermiteRule.product(3)),
      Map.entry("Gauss-Hermite 4", GaussHermiteRule.product(4)),
      Map.entry("Gauss-Hermite 5", GaussHermiteRule.product(5)));

  static Stream<ReferenceTable.Row> rows() {
    return ReferenceTable.read("rule_degree.csv").stream();
  }

  @ParameterizedTest
  @MethodSource("rows")
  void degreeAndFirstFailureAreThoseOfTheTable(ReferenceTable.Row row) {
    DegreeCheck.check(RULES.get(row.text("rule")), row);
  }
}
