package dev.estimation.benchmarks.page;

import dev.estimation.filters.filter.StepStatus;

/** What a normalised square says of the covariance behind it. The page knows these by number. */
enum Verdict {
  BELOW(0),
  INSIDE(1),
  ABOVE(2),
  GATED(3),
  SKIPPED(4),
  UNKNOWN(5);

  private final int code;

  Verdict(int code) {
    this.code = code;
  }

  int code() {
    return code;
  }

  /** {@return the verdict of an update: that of its square if it was applied} */
  static Verdict of(StepStatus status, Verdict ofSquare) {
    if (status.isApplied()) {
      return ofSquare;
    }
    return switch (status) {
      case GATED -> GATED;
      case NOT_CONVERGED -> SKIPPED;
      default -> UNKNOWN;
    };
  }
}
