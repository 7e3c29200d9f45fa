package dev.estimation.filters.modelcheck;

import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * Whether two steps of h add the noise that one of 2 h adds, in a motion for which that can be told: linear, composing
 * itself, and with a noise that does not depend on the state.
 */
final class NoiseOverTime {
  private static final int PLACES = 40;
  private static final double RELATIVE = 1e-6;
  private static final double SAME = 1e-9;

  private final Examination examination;
  private final Operation noise;
  private final View view;
  private final int d;

  NoiseOverTime(Examination examination) {
    this.examination = examination;
    this.noise = examination.subject.noise();
    this.view = examination.view;
    this.d = view.outputs();
  }

  void look() {
    Range steps = examination.region.step();
    boolean whole = Arrays.stream(examination.widths).allMatch(width -> width > 0);
    if (!examination.subject.addsProcessNoise()
        || !isCovariance()
        || steps.high(0) < 2 * steps.low(0)
        || !whole
        || !isLinear()) {
      return;
    }
    for (int k = 0; k < Math.min(PLACES, examination.places.size()); k++) {
      Arguments at = examination.places.get(k);
      look(at, examination.after(k), Math.min(at.step, steps.high(0) / 2));
    }
  }

  private boolean isCovariance() {
    return examination.isSound(noise)
        && !examination.ledger.has(FindingKind.NOT_FINITE, noise)
        && !examination.ledger.has(FindingKind.NOISE_NOT_SYMMETRIC, noise)
        && !examination.ledger.has(FindingKind.NOISE_NOT_DEFINITE, noise);
  }

  private boolean isLinear() {
    for (int k = 0; k < examination.places.size(); k++) {
      Arguments at = examination.places.get(k);
      Bend bend = Bend.between(view, at, view.displacement(at, examination.after(k)));
      if (bend == null || bend.anyReal()) {
        return false;
      }
    }
    return true;
  }

  private void look(Arguments at, Arguments other, double h) {
    Arguments first = at.over(at.time, h);
    Arguments second = at.over(at.time + h, h);
    Arguments both = at.over(at.time, 2 * h);
    DMatrixRMaj f1 = slopes(first);
    DMatrixRMaj f2 = slopes(second);
    DMatrixRMaj f = slopes(both);
    DMatrixRMaj q1 = noise(first);
    DMatrixRMaj q2 = noise(second);
    DMatrixRMaj q = noise(both);
    Arguments elsewhere = new Arguments(other.state, at.noise, at.given, at.time, 2 * h);
    if (f1 == null || f2 == null || f == null || q1 == null || q2 == null || q == null) {
      return;
    }
    DMatrixRMaj product = new DMatrixRMaj(d, d);
    CommonOps_DDRM.mult(f2, f1, product);
    if (motionComposes(product, f) && isClose(q, noise(elsewhere), SAME)) {
      compare(at, h, composed(f2, q1, q2), q);
    }
  }

  /** F by differences over the whole region, exact but for rounding since the motion is linear. */
  private DMatrixRMaj slopes(Arguments at) {
    DMatrixRMaj f = new DMatrixRMaj(d, d);
    for (int j = 0; j < d; j++) {
      double[] step = new double[d];
      step[j] = examination.widths[j];
      double[] ahead = view.value(view.moved(at, step, 0.5));
      double[] behind = view.value(view.moved(at, step, -0.5));
      if (ahead == null || behind == null) {
        return null;
      }
      double[] change = view.change(ahead, behind);
      for (int i = 0; i < d; i++) {
        f.set(i, j, change[i] / examination.widths[j]);
      }
    }
    return f;
  }

  private DMatrixRMaj noise(Arguments at) {
    Attempt attempt = Attempt.of(noise, at);
    if (!attempt.isFinite()) {
      return null;
    }
    DMatrixRMaj q = new DMatrixRMaj(d, d);
    q.setData(attempt.out());
    return q;
  }

  /** Entries weighed by the widths of what they lead from and to. */
  private boolean motionComposes(DMatrixRMaj product, DMatrixRMaj f) {
    for (int i = 0; i < d; i++) {
      double largest = 0;
      double off = 0;
      for (int j = 0; j < d; j++) {
        largest = Math.max(largest, Math.abs(f.get(i, j)) * examination.widths[j]);
        off = Math.max(off, Math.abs(product.get(i, j) - f.get(i, j)) * examination.widths[j]);
      }
      if (!(off <= RELATIVE * largest)) {
        return false;
      }
    }
    return true;
  }

  private static boolean isClose(DMatrixRMaj a, DMatrixRMaj b, double relative) {
    if (b == null) {
      return false;
    }
    for (int i = 0; i < a.data.length; i++) {
      double size = Math.max(Math.abs(a.data[i]), Math.abs(b.data[i]));
      if (Math.abs(a.data[i] - b.data[i]) > relative * size) {
        return false;
      }
    }
    return true;
  }

  /** F Q1 F' + Q2. */
  private DMatrixRMaj composed(DMatrixRMaj f, DMatrixRMaj q1, DMatrixRMaj q2) {
    DMatrixRMaj half = new DMatrixRMaj(d, d);
    DMatrixRMaj sum = new DMatrixRMaj(d, d);
    CommonOps_DDRM.mult(f, q1, half);
    CommonOps_DDRM.multTransB(half, f, sum);
    CommonOps_DDRM.addEquals(sum, q2);
    return sum;
  }

  private void compare(Arguments at, double h, DMatrixRMaj twice, DMatrixRMaj once) {
    for (int i = 0; i < d; i++) {
      for (int j = 0; j <= i; j++) {
        double scale = Math.sqrt(Math.max(twice.get(i, i), once.get(i, i)))
            * Math.sqrt(Math.max(twice.get(j, j), once.get(j, j)));
        double off = Math.abs(twice.get(i, j) - once.get(i, j));
        if (off > RELATIVE * scale) {
          report(at, h, i * d + j, twice.get(i, j), once.get(i, j), off / scale);
        }
      }
    }
  }

  private void report(Arguments at, double h, int entry, double twice, double once, double off) {
    String name = noise.entry(entry);
    examination.ledger.add(
        FindingKind.NOISE_NOT_COMPOSING,
        noise,
        name,
        at,
        twice,
        once,
        off,
        name + " over " + 2 * h + " s must be " + twice + ", that of two steps of " + h + " s, got "
            + once);
  }
}
