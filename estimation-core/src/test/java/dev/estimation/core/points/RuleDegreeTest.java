package dev.estimation.core.points;

import dev.estimation.testing.ReferenceTable;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Degree of exactness, first failing monomial and smallest weight, row by row of the table. */
class RuleDegreeTest {
  private static final Map<String, PointRule> RULES = Map.of(
      "cubature 3", CubatureRule.degreeThree(),
      "unscented 1 0 3-n", UnscentedRule.scaled(1, 0, n -> 3 - n),
      "unscented 1 0 0", UnscentedRule.scaled(1, 0, 0),
      "unscented 1 0 1", UnscentedRule.scaled(1, 0, 1),
      "unscented 1 0 2", UnscentedRule.scaled(1, 0, 2),
      "Gauss-Hermite 2", GaussHermiteRule.product(2),
      "Gauss-Hermite 3", GaussHermiteRule.product(3),
      "Gauss-Hermite 4", GaussHermiteRule.product(4),
      "Gauss-Hermite 5", GaussHermiteRule.product(5));

  static Stream<ReferenceTable.Row> rows() {
    return ReferenceTable.read("rule_degree.csv").stream();
  }

  @ParameterizedTest
  @MethodSource("rows")
  void degreeAndFirstFailureAreThoseOfTheTable(ReferenceTable.Row row) {
    DegreeCheck.check(RULES.get(row.text("rule")), row);
  }
}
