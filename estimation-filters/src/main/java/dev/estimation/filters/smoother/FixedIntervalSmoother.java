package dev.estimation.filters.smoother;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterWorkspace;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;

/**
 * The fixed-interval (Rauch-Tung-Striebel) smoother on any matching.
 *
 * <p>With C the cross-covariance of x_k and x_(k+1) that the prediction found, m', P' the predicted
 * moments and G = C P'^-1: m_s = m + G (m_s+ - m'), P_s = P + G (P_s+ - P') G', from the last step back;
 * the last smoothed estimate is the filtered one, bit for bit. Differences and displacements are those
 * of the state space. A component that is predicted with zero variance has gain zero.
 *
 * <p>For a plan in square-root form nothing is subtracted: reduction of the joint root [W' L 0; B 0 E] of next and
 * this state (L the factor of what this state does not explain of the next, noise included) gives [S 0; Y F], G =
 * Y S^-1, and P_s = F F' + G P_s+ G' by reduction of [F, G S_s+]. Only where negative weights leave no L does a
 * step go by the formula above. A component of the next state that others determine to within rounding of its mean
 * carries nothing back.
 *
 * <p>Use: start with the first estimate; after each step (one prediction, then any number of updates)
 * call {@link #record}; at the end {@link #smooth()}. A step over no time replaces the last one. One
 * smoother follows one estimate; with one workspace for many tracks, record each before the next is
 * predicted. Memory: about 40 d^2 bytes a step, d the dimension. Cost of smoothing: about 4 d^3 operations a step,
 * in square-root form 3 d^3, after 5 d^3 or so when recording.
 * <i>Confined to one thread.</i> Source: Rauch, Tung and Striebel 1965, AIAA Journal 3(8); Sarkka 2008,
 * <i>Unscented Rauch-Tung-Striebel smoother</i>, IEEE Transactions on Automatic Control 53(3). Square-root form:
 * Park and Kailath 1995, <i>Square-root RTS smoothing algorithms</i>, International Journal of Control 62(5)
 * (from memory).
 */
public final class FixedIntervalSmoother {
  private final Estimate track;
  private final Space space;
  private final List<RecordedStep> steps = new ArrayList<>();

  private FixedIntervalSmoother(Estimate track) {
    this.track = track;
    this.space = track.space();
  }

  /**
   * A smoother whose first step is the estimate as it stands.
   *
   * @param estimate of the track to be followed, read
   * @return the smoother
   */
  public static FixedIntervalSmoother startingAt(Estimate estimate) {
    FixedIntervalSmoother smoother = new FixedIntervalSmoother(estimate);
    smoother.steps.add(RecordedStep.first(estimate));
    return smoother;
  }

  /**
   * Records a step that has ended: its last prediction and the estimate after all its updates.
   *
   * @param work what predicted it, read
   * @param estimate after the step, read
   * @throws IllegalStateException if this is not the estimate that the smoother was started with, or
   *     the workspace did not move it last, from the last
   *     recorded time to its own
   */
  public void record(FilterWorkspace work, Estimate estimate) {
    if (estimate != track) {
      throw new IllegalStateException(
          "a smoother records the one estimate that it was started with, got another");
    }
    RecordedStep last = steps.get(steps.size() - 1);
    if (estimate.time() == last.time()) {
      steps.set(steps.size() - 1, last.updated(estimate));
      return;
    }
    DMatrixRMaj cross = new DMatrixRMaj(space.dimension(), space.dimension());
    Moments predicted = work.prediction(estimate, cross);
    if (work.movedFrom() != last.time()) {
      throw new IllegalStateException(
          "every prediction must be recorded: the last record is at t = " + last.time()
              + " s, the prediction went from t = " + work.movedFrom() + " s");
    }
    steps.add(work.jointRoot(estimate)
        .map(root -> Conditional.of(root, magnitudes(predicted.mean())))
        .map(conditional -> RecordedStep.after(predicted, conditional, estimate))
        .orElseGet(() -> RecordedStep.after(predicted, cross, estimate)));
  }

  /** Of which the components are differences; that of a quaternion is 1, and left out with all others there. */
  private double[] magnitudes(double[] mean) {
    double[] result = new double[space.dimension()];
    if (space.storage() == result.length) {
      Arrays.setAll(result, i -> Math.abs(mean[i]));
    }
    return result;
  }

  /** {@return the number of recorded steps, the first estimate included} */
  public int size() {
    return steps.size();
  }

  /**
   * Goes back over the record.
   *
   * @return the smoothed estimates, one for each recorded step
   * @throws ArithmeticException if a predicted covariance is not positive semi-definite, or a result is
   *     not finite
   */
  public SmoothedTrack smooth() {
    int last = steps.size() - 1;
    SmoothedTrack track = new SmoothedTrack(space, steps.size());
    BackwardStep backward = new BackwardStep(steps.get(last).filtered());
    track.set(last, steps.get(last).time(), backward.smoothed());
    for (int k = last - 1; k >= 0; k--) {
      backward.smooth(steps.get(k), steps.get(k + 1));
      track.set(k, steps.get(k).time(), backward.smoothed());
    }
    return track;
  }
}
