package dev.estimation.filters.modelcheck;

import java.util.List;
import java.util.stream.Collectors;

/**
 * Bytes that each method allocates a call. The JVM itself allocates now and then on behalf of a thread, when it compiles
 * or links; what the model allocates is in every window of many calls, so the smallest of several windows counts. The
 * calls are too few for the optimising compiler to step in (5000, from memory), unless the model was used much before: what it might
 * remove counts as well.
 */
final class AllocationCount {
  private static final int PLACES = 16;
  private static final int CALLS = 256;
  private static final int WINDOWS = 16;
  private static final double LEAST = 8;

  private final Examination examination;

  AllocationCount(Examination examination) {
    this.examination = examination;
  }

  void look() {
    ByteCounter counter = ByteCounter.ofThisThread();
    if (counter == null) {
      examination.ledger.note("allocation was not measured: this JVM does not count it");
      return;
    }
    examination.subject.operations().forEach(operation -> {
      List<Arguments> at = examination.places.stream()
          .filter(place -> !Attempt.of(operation, place).threw())
          .limit(PLACES)
          .collect(Collectors.toList());
      try {
        look(operation, at, counter);
      } catch (Exception | AssertionError | StackOverflowError thrown) {
        examination.ledger.note(
            "allocation of " + operation.method() + " was not measured: it throws, " + thrown);
      }
    });
  }

  private void look(Operation operation, List<Arguments> places, ByteCounter counter) {
    if (places.isEmpty()) {
      return;
    }
    Arguments in = places.get(0).copy();
    double[] out = operation.blankOutput();
    run(operation, places, in, out);
    double fewest = Double.POSITIVE_INFINITY;
    for (int window = 0; window < WINDOWS && fewest >= LEAST; window++) {
      long start = counter.bytes();
      long begin = counter.bytes();
      run(operation, places, in, out);
      long bytes = counter.bytes() - begin - (begin - start);
      fewest = Math.min(fewest, (double) bytes / CALLS);
    }
    if (fewest >= LEAST) {
      examination.ledger.add(
          FindingKind.ALLOCATION,
          operation,
          "call",
          places.get(0),
          0,
          fewest,
          fewest,
          "a call must allocate nothing, got " + fewest + " bytes a call in the best of " + WINDOWS
              + " windows of " + CALLS + " calls");
    }
  }

  private static void run(Operation operation, List<Arguments> places, Arguments in, double[] out) {
    int count = places.size();
    for (int call = 0; call < CALLS; call++) {
      in.set(places.get(call % count));
      operation.clear(out);
      operation.run(in, out);
    }
  }
}
