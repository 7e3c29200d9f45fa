package dev.estimation.filters.modelcheck;

/**
 * One thing that is wrong with a model, in one component, at the worst of the places where it is. <i>Immutable.</i>
 *
 * @param kind what is wrong
 * @param fault whether it counts: not for hints, nor for kinds that the check was told to accept
 * @param component the output, input or entry: {@code measurement[1]}, {@code state[2]}, {@code jacobian[0][3]}
 * @param wanted the number wanted, or the limit; NaN where there is none
 * @param got the number got; NaN where there is none
 * @param place where it is worst
 * @param places at how many of the places looked at it is wrong
 * @param message what, wanted, got
 */
public record ModelFinding(
    FindingKind kind,
    boolean fault,
    String component,
    double wanted,
    double got,
    Place place,
    int places,
    String message) {
  /** {@return the finding in one line, with its place} */
  @Override
  public String toString() {
    return (fault ? "" : "hint: ") + kind + " " + message + ", at " + place
        + (places > 1 ? "; worst of " + places + " places" : "");
  }
}
