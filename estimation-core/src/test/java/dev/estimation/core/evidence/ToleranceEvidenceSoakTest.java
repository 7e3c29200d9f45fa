package dev.estimation.core.evidence;

import dev.estimation.core.evidence.Evidence.Run;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.SpreadLinearisation;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.SparseGridRule;
import dev.estimation.core.points.UnscentedRule;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * The published table: what tolerances take on 1000 random problems of each kind, and beside it the cheapest fixed rule of
 * those below that is inside the same tolerance on every one of them. Written to {@code target/tolerance-evidence.txt}.
 */
@Tag("soak")
class ToleranceEvidenceSoakTest {
  private static final int PROBLEMS = 1000;
  private static final int MOST_POINTS = 3000;

  @Test
  void table() throws IOException {
    StringBuilder table = new StringBuilder();
    double[] tolerances = {0.1, 0.01, 0.001};
    for (ProblemKind kind : ProblemKind.values()) {
      Map<String, MomentMatching> rules = rules(kind);
      List<MomentMatching> matchings = new ArrayList<>(Evidence.within(kind, tolerances));
      matchings.addAll(rules.values());
      List<Run[]> runs = Evidence.runs(kind, PROBLEMS, matchings);
      for (int t = 0; t < tolerances.length; t++) {
        int column = t;
        List<Run> own = runs.stream().map(row -> row[column]).toList();
        EvidenceRow row = EvidenceRow.of(kind, tolerances[t], own);
        String fixed =
            cheapest(List.copyOf(rules.keySet()), runs, tolerances.length, tolerances[t]);
        table.append(row).append("; fixed: ").append(fixed).append('\n');
        row.check();
      }
    }
    Files.writeString(Path.of("target", "tolerance-evidence.txt"), table);
  }

  private static Map<String, MomentMatching> rules(ProblemKind kind) {
    int inputs = kind.inputs();
    Map<String, MomentMatching> rules = new LinkedHashMap<>();
    rules.put("linear over the spread", SpreadLinearisation.firstOrder());
    rules.put("second order over the spread", SpreadLinearisation.secondOrder());
    rules.put("cubature 3", PointMatching.of(CubatureRule.degreeThree()));
    rules.put("unscented, kappa 3 - n", PointMatching.of(UnscentedRule.symmetric(n -> 3 - n)));
    if (inputs > 1) {
      rules.put("cubature 5", PointMatching.of(CubatureRule.degreeFive()));
    }
    for (int nodes = 3; nodes <= 35 && Math.pow(nodes, inputs) <= MOST_POINTS; nodes += 2) {
      rules.put("Gauss-Hermite " + nodes, PointMatching.of(GaussHermiteRule.product(nodes)));
    }
    for (int level = 1; level <= (inputs > 3 ? 2 : 4); level++) {
      rules.put("sparse grid, level " + level, PointMatching.of(SparseGridRule.ofLevel(level)));
    }
    return rules;
  }

  private static String cheapest(
      List<String> names, List<Run[]> runs, int first, double tolerance) {
    String best = "none";
    int least = Integer.MAX_VALUE;
    for (int i = 0; i < names.size(); i++) {
      int column = first + i;
      double worst = runs.stream().mapToDouble(row -> row[column].error()).max().orElseThrow();
      int evaluations = runs.get(0)[column].evaluations();
      if (worst <= tolerance && evaluations < least) {
        least = evaluations;
        best = String.format(Locale.ROOT, "%s, %d", names.get(i), evaluations);
      }
    }
    return best;
  }
}
