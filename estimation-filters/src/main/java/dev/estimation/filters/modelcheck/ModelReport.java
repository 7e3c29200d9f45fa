package dev.estimation.filters.modelcheck;

import java.util.ArrayList;
import java.util.List;

/**
 * What a {@link ModelCheck} found. <i>Immutable.</i>
 *
 * @param model the model's kind and name
 * @param places at how many places it was called
 * @param findings faults and hints, each kind once for each component
 * @param notes what could not be looked at, and why
 */
public record ModelReport(
    String model, int places, List<ModelFinding> findings, List<String> notes) {
  /**
   * Copies the lists.
   *
   * @param model the model's kind and name
   * @param places at how many places it was called
   * @param findings what was found
   * @param notes what could not be looked at
   */
  public ModelReport {
    findings = List.copyOf(findings);
    notes = List.copyOf(notes);
  }

  /** {@return whether there is no fault; hints do not count} */
  public boolean isClean() {
    return findings.stream().noneMatch(ModelFinding::fault);
  }

  /**
   * Fails the test that calls it unless the report {@link #isClean()}.
   *
   * @throws AssertionError with the whole report, hints and notes included
   */
  public void assertClean() {
    if (!isClean()) {
      throw new AssertionError(toString());
    }
  }

  /** {@return head, findings and notes, one a line} */
  @Override
  public String toString() {
    long faults = findings.stream().filter(ModelFinding::fault).count();
    List<String> lines = new ArrayList<>();
    lines.add(model + ": " + counted(faults, "fault") + ", "
        + counted(findings.size() - faults, "hint") + " at " + places + " places");
    findings.forEach(finding -> lines.add("  " + finding));
    notes.forEach(note -> lines.add("  note: " + note));
    return String.join("\n", lines);
  }

  private static String counted(long count, String what) {
    return count + " " + what + (count == 1 ? "" : "s");
  }
}
