package dev.estimation.core.evidence;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.evidence.Evidence.Run;
import java.util.List;
import java.util.Locale;

/** What one tolerance came to on all problems of a kind. */
record EvidenceRow(
    ProblemKind kind,
    double tolerance,
    double met,
    double inside,
    double honest,
    int median,
    int ninetyPerCent) {

  static EvidenceRow of(ProblemKind kind, double tolerance, List<Run> runs) {
    List<Run> met = runs.stream().filter(Run::met).toList();
    int[] counts = met.stream().mapToInt(Run::evaluations).sorted().toArray();
    return new EvidenceRow(
        kind,
        tolerance,
        Evidence.share(runs, Run::met),
        Evidence.share(met, run -> run.error() <= tolerance),
        Evidence.share(met, run -> run.isHonest(tolerance)),
        counts[counts.length / 2],
        counts[counts.length * 9 / 10]);
  }

  /** 99 % within the budget, of those 99 % inside the tolerance, and 95 % with an estimate that is honest. */
  void check() {
    assertAll(
        toString(),
        () -> assertTrue(met >= 0.99, "within the budget"),
        () -> assertTrue(inside >= 0.99, "inside the tolerance"),
        () -> assertTrue(honest >= 0.95, "honest"));
  }

  @Override
  public String toString() {
    return String.format(
        Locale.ROOT,
        "%-33s %6s  met %5.1f %%, inside %5.1f %%, honest %5.1f %%, evaluations %d (90 %%: %d)",
        kind.words(),
        tolerance,
        100 * met,
        100 * inside,
        100 * honest,
        median,
        ninetyPerCent);
  }
}
