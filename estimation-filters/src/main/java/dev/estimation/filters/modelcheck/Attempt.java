package dev.estimation.filters.modelcheck;

import dev.estimation.core.internal.Checks;
import java.util.Arrays;

/** A call that may throw: an output, and what was thrown or null. */
final class Attempt {
  private final Arguments in;
  private final double[] out;
  private final Throwable thrown;

  private Attempt(Arguments in, double[] out, Throwable thrown) {
    this.in = in;
    this.out = out;
    this.thrown = thrown;
  }

  /** Calls with copies of the arguments and a blank output. */
  static Attempt of(Operation operation, Arguments at) {
    return of(operation, at.copy(), operation.blankOutput());
  }

  /** Calls with these very arrays. */
  static Attempt of(Operation operation, Arguments in, double[] out) {
    try {
      operation.run(in, out);
      return new Attempt(in, out, null);
    } catch (Exception | AssertionError | StackOverflowError thrown) {
      return new Attempt(in, out, thrown);
    }
  }

  /** This with an output of its own, which no later call can write on. */
  Attempt kept() {
    return new Attempt(in, out.clone(), thrown);
  }

  /** The arguments, as the call left them. */
  Arguments in() {
    return in;
  }

  /** The output, as the call or a later one left it. */
  double[] out() {
    return out;
  }

  Throwable thrown() {
    return thrown;
  }

  boolean threw() {
    return thrown != null;
  }

  boolean isFinite() {
    return thrown == null && Checks.allFinite(out);
  }

  /** Whether both threw, or gave the same bits. */
  boolean agrees(Attempt other) {
    if (threw() || other.threw()) {
      return threw() && other.threw();
    }
    return Arrays.equals(out, other.out);
  }

  /** The first output that differs, -1 if one of both threw. */
  int firstDifference(Attempt other) {
    return (threw() || other.threw()) ? -1 : Arrays.mismatch(out, other.out);
  }
}
