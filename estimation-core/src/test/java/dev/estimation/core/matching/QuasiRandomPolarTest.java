package dev.estimation.core.matching;

import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.QuasiRandomRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** A range and a bearing by sequences: against another program, and how fast errors fall. */
class QuasiRandomPolarTest {
  private static final PolarCase POLAR = PolarCase.named("range_one_bearing_90");

  static Stream<ReferenceTable.Row> rows() {
    return ReferenceTable.read("quasi_random_polar.csv").stream();
  }

  /** 1e-12 of the largest entry: sums of up to 16383 numbers, and the two inverse normal maps. */
  @ParameterizedTest
  @MethodSource("rows")
  void momentsAreThoseOfTheOtherProgram(ReferenceTable.Row row) {
    int count = row.count("count");
    boolean sobol = row.text("sequence").equals("Sobol");
    QuasiRandomRule rule = sobol ? QuasiRandomRule.sobol(count) : QuasiRandomRule.halton(count);
    PolarCase.assertMoments(row, POLAR.carry(PointMatching.of(rule)), 1e-12);
  }

  private static double error(PointRule rule) {
    double[] mean = POLAR.carry(PointMatching.of(rule)).mean;
    return Math.abs(mean[1] - POLAR.exact().number("mean_y"));
  }

  /**
   * From 1023 to 16383 points, 16 times as many, the sequences' errors fall by more than 9 (11.7 and
   * 11.3 in the other program's table), where independent draws' fall by 4: over 200 seeds the root
   * mean square at either count is known to 5 %, its ratio to 7 %, so 3 to 5.2 is asked, some 4
   * deviations. At the larger count the sequences are better by more than 8.
   */
  @Test
  void errorsOfSequencesFallFaster() {
    double sobol = error(QuasiRandomRule.sobol(16383));
    double halton = error(QuasiRandomRule.halton(16383));
    double sobolFall = error(QuasiRandomRule.sobol(1023)) / sobol;
    double haltonFall = error(QuasiRandomRule.halton(1023)) / halton;
    assertTrue(sobolFall > 9, () -> "Sobol by " + sobolFall);
    assertTrue(haltonFall > 9, () -> "Halton by " + haltonFall);
    double random = randomError(16383);
    double randomFall = randomError(1023) / random;
    assertTrue(randomFall > 3 && randomFall < 5.2, () -> "random by " + randomFall);
    assertTrue(random > 8 * sobol, () -> random + " and Sobol " + sobol);
    assertTrue(random > 8 * halton, () -> random + " and Halton " + halton);
  }

  private static double randomError(int count) {
    double squares = 0;
    for (int seed = 0; seed < 200; seed++) {
      double error = error(RandomRule.independent(count, seed));
      squares += error * error / 200;
    }
    return Math.sqrt(squares);
  }
}
