package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;
import java.util.Arrays;

/**
 * What moving one input through a good half of its width does to each output, at every place: whether inputs declared
 * inactive matter, active ones are read, and all have effects of like size.
 */
final class Influence {
  /** The golden section: a part of a width that no symmetry of a region singles out. */
  private static final double PART = 0.618;

  private static final double RELATIVE = 1e-10;

  private final Examination examination;
  private final int inputs;
  private final int outputs;
  private final double[][] largest;
  private final Arguments[][] where;
  private final boolean[] seen;
  private final boolean[] bitsChange;
  private final double[] magnitude;

  Influence(Examination examination) {
    this.examination = examination;
    this.inputs = examination.input.dimension();
    this.outputs = examination.view.outputs();
    this.largest = new double[outputs][inputs];
    this.where = new Arguments[outputs][inputs];
    this.seen = new boolean[inputs];
    this.bitsChange = new boolean[inputs];
    this.magnitude = new double[outputs];
  }

  void look(Structure structure, double scaleRatio) {
    for (Arguments at : examination.places) {
      measure(at);
    }
    boolean[] active = new boolean[inputs];
    for (int j : structure.activeInputs(inputs)) {
      active[j] = true;
    }
    for (int j = 0; j < inputs; j++) {
      if (!active[j]) {
        lookAtInactive(j);
      } else if (seen[j] && !bitsChange[j]) {
        reportUnread(j);
      } else if (seen[j]) {
        lookAtScale(j, scaleRatio);
      }
    }
  }

  /** S of an output: the largest change that one input makes. */
  double largest(int output) {
    return Arrays.stream(largest[output]).max().orElse(0);
  }

  /** M of an output. */
  double magnitude(int output) {
    return magnitude[output];
  }

  private boolean isVaried(int j) {
    return examination.widths[j] > 0;
  }

  private void measure(Arguments at) {
    View view = examination.view;
    double[] value = view.value(at);
    if (value == null) {
      return;
    }
    for (int i = 0; i < outputs; i++) {
      magnitude[i] = Math.max(magnitude[i], view.size(value, i));
    }
    double[] fromCentre = view.displacement(centre(at), at);
    for (int j = 0; j < inputs; j++) {
      if (isVaried(j)) {
        double[] step = new double[inputs];
        step[j] = fromCentre[j] > 0 ? -examination.widths[j] : examination.widths[j];
        measure(at, value, j, view.value(view.moved(at, step, PART)));
      }
    }
  }

  private Arguments centre(Arguments at) {
    double[] joint = Arrays.copyOf(examination.region.centre(), at.joint().length);
    return at.at(joint);
  }

  private void measure(Arguments at, double[] value, int j, double[] moved) {
    if (moved == null) {
      return;
    }
    seen[j] = true;
    bitsChange[j] |= !Arrays.equals(value, moved);
    double[] change = examination.view.change(moved, value);
    for (int i = 0; i < outputs; i++) {
      if (Math.abs(change[i]) > largest[i][j]) {
        largest[i][j] = Math.abs(change[i]);
        where[i][j] = at;
      }
    }
  }

  /** Tells of the output that changes most for its size. */
  private void lookAtInactive(int j) {
    int i = 0;
    for (int other = 1; other < outputs; other++) {
      i = largest[other][j] * size(i) > largest[i][j] * size(other) ? other : i;
    }
    double limit = RELATIVE * size(i);
    if (largest[i][j] > limit) {
      add(
          FindingKind.UNDECLARED_INPUT,
          j,
          where[i][j],
          limit,
          largest[i][j],
          examination.subject.inputName(j) + " is not declared active and must not change "
              + examination.outputName(i) + ", got a change of " + largest[i][j] + " for "
              + PART * examination.widths[j]);
    }
  }

  private double size(int i) {
    return magnitude[i] + largest(i);
  }

  private void reportUnread(int j) {
    String name = examination.subject.inputName(j);
    add(
        FindingKind.UNREAD_INPUT,
        j,
        examination.places.get(0),
        Double.NaN,
        0,
        name
            + " is active and should change some output, got no changed bit anywhere; the structure"
            + " can leave it out");
  }

  private void lookAtScale(int j, double ratio) {
    double relative = 0;
    for (int i = 0; i < outputs; i++) {
      relative = Math.max(relative, largest[i][j] == 0 ? 0 : largest[i][j] / largest(i));
    }
    if (relative < 1 / ratio) {
      add(
          FindingKind.UNEQUAL_SCALES,
          j,
          examination.places.get(0),
          1 / ratio,
          relative,
          examination.subject.inputName(j) + " over its width of " + examination.widths[j]
              + " should change some output by " + 1 / ratio
              + " or more of what other inputs do, got " + relative);
    }
  }

  private void add(
      FindingKind kind, int j, Arguments at, double wanted, double got, String message) {
    String name = examination.subject.inputName(j);
    Operation function = examination.subject.function();
    examination.ledger.add(kind, function, name, at, wanted, got, got, message);
  }
}
