package dev.estimation.core.evidence;

import java.util.List;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

/**
 * What a tolerance buys: random problems of each kind, with fixed seeds, held against reference moments. The full table, with
 * 1000 problems and fixed rules beside them, is that of {@link ToleranceEvidenceSoakTest}.
 */
class ToleranceEvidenceTest {
  private static final int PROBLEMS = 1000;

  @ParameterizedTest
  @EnumSource
  void theErrorIsWithinTheTolerance(ProblemKind kind) {
    double[] tolerances = {0.1, 0.01, 0.001};
    List<Evidence.Run[]> runs = Evidence.runs(kind, PROBLEMS, Evidence.within(kind, tolerances));
    for (int t = 0; t < tolerances.length; t++) {
      int column = t;
      EvidenceRow.of(kind, tolerances[t], runs.stream().map(row -> row[column]).toList())
          .check();
    }
  }
}
