package dev.estimation.core.matching;

import dev.estimation.core.points.SparseGridRule;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

/** A range and a bearing turned to x and y by sparse grids, against closed forms. */
class SparsePolarTest {
  /** The example of Julier and Uhlmann 1997: sigma_theta = 15 degrees. Level 2 errs by 5e-7. */
  @ParameterizedTest
  @ValueSource(strings = {"range_one_bearing_90", "bearing_0"})
  void levelThreeIsExactToNineDigits(String name) {
    PolarCase polar = PolarCase.named(name);
    MomentMatching matching = PointMatching.of(SparseGridRule.ofLevel(3));
    PolarCase.assertMoments(polar.exact(), polar.carry(matching), 1e-9);
  }

  static Stream<String> cases() {
    return ReferenceTable.read("polar2d_exact.csv").stream().map(row -> row.text("case"));
  }

  @ParameterizedTest
  @MethodSource("cases")
  void levelFourConvergesToTheClosedForm(String name) {
    PolarCase polar = PolarCase.named(name);
    MomentMatching matching = PointMatching.of(SparseGridRule.ofLevel(4));
    PolarCase.assertMoments(polar.exact(), polar.carry(matching), 1e-12);
  }
}
