package dev.estimation.core.points;

import static dev.estimation.testing.Agreement.assertWithin;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** The inverse normal map, into both tails. */
class UnitNormalTest {
  static Stream<ReferenceTable.Row> rows() {
    return ReferenceTable.read("unit_normal_quantiles.csv").stream();
  }

  /** 4e-15: what is promised. */
  @ParameterizedTest
  @MethodSource("rows")
  void quantilesAreThoseOfTheTable(ReferenceTable.Row row) {
    double p = Double.parseDouble(row.text("p"));
    assertWithin("p = " + p, row.number("x"), UnitNormal.quantile(p), 4e-15, 1);
    if (1 - (1 - p) == p) {
      assertEquals(0, UnitNormal.quantile(p) + UnitNormal.quantile(1 - p), "symmetry");
    }
  }

  @Test
  void theEndsAreFinite() {
    assertTrue(UnitNormal.quantile(0) < -8.2 && UnitNormal.quantile(0) > -8.3);
    assertTrue(UnitNormal.quantile(1) > 8.2 && UnitNormal.quantile(1) < 8.3);
    assertEquals(0, UnitNormal.quantile(0.5));
  }
}
