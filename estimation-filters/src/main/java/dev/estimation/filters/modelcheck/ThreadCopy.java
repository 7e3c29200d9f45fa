package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;
import java.util.Arrays;
import java.util.Iterator;

/** Whether the model that a motion gives for one thread is the same motion: sizes, structure, derivatives, every bit of results. */
final class ThreadCopy {
  private final Subject itself;
  private final Subject copy;
  private final boolean alike;

  /**
   * The model itself and what it gives for one thread.
   *
   * @param itself the model
   * @param copy for one thread; may be the same
   */
  ThreadCopy(Subject itself, Subject copy) {
    this.itself = itself;
    this.copy = copy;
    this.alike = described(itself).equals(described(copy));
  }

  /** What a filter calls: the copy, unless it is quite another motion. */
  Subject examined() {
    return alike ? copy : itself;
  }

  void look(Examination examination) {
    if (!alike) {
      report(examination);
      return;
    }
    if (copy.equals(itself)) {
      return;
    }
    for (Arguments at : examination.places) {
      Iterator<Operation> originals = itself.operations().iterator();
      copy.operations().forEach(operation -> compare(examination, operation, originals.next(), at));
    }
  }

  private void report(Examination examination) {
    Operation asked = Operation.vector("forOneThread", "model", 0, (in, out) -> {});
    examination.ledger.add(
        FindingKind.THREAD_COPY,
        asked,
        "model",
        examination.places.get(0),
        Double.NaN,
        Double.NaN,
        0,
        "must give a motion " + described(itself) + ", as the model itself is, got one "
            + described(copy));
  }

  private static void compare(
      Examination examination, Operation operation, Operation original, Arguments at) {
    Attempt wanted = Attempt.of(original, at);
    Attempt got = Attempt.of(operation, at);
    if (!wanted.agrees(got)) {
      examination.ledger.addDifference(
          FindingKind.THREAD_COPY,
          operation,
          at,
          wanted,
          got,
          "as of the model that forOneThread() was asked of");
    }
  }

  private static String described(Subject subject) {
    return "in " + subject.state() + " with " + subject.noises() + " noises inside, "
        + subject.operations().map(Operation::method).toList() + ", " + inputs(subject);
  }

  private static String inputs(Subject subject) {
    try {
      Structure structure = subject.structure().get();
      int[] active = structure.activeInputs(subject.input().dimension());
      return "active inputs " + Arrays.toString(active) + ", linear "
          + Arrays.toString(structure.linearInputs());
    } catch (RuntimeException thrown) {
      return "a structure that throws";
    }
  }
}
