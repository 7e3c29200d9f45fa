package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.filters.model.SensorModel;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;

/**
 * One thread's scratch for a plan: predicts, and makes the ports through which sensors update.
 *
 * <p>Cost of a prediction: the evaluations of the matching, the noise, and about d^3 / 3 operations for
 * the check of both covariances, d the dimension of the state. <i>Confined to one thread</i>; serves any
 * number of estimates of its plan; allocates only when built and in {@link #failure()}.
 */
public final class FilterWorkspace {
  private final double[] nothing = new double[0];
  private final FilterPlan plan;
  private final Transition transition;
  private final InputCheck input = new InputCheck();
  private StepStatus status = StepStatus.APPLIED;
  private double estimatedError = Double.NaN;
  private int evaluations;
  private int jacobians;
  private boolean interrupted;
  private Estimate moved;
  private double movedFrom = Double.NaN;
  private double movedTo = Double.NaN;
  private double stepTime = Double.NaN;
  private double estimateTime = Double.NaN;

  FilterWorkspace(FilterPlan plan) {
    this.plan = plan;
    this.transition = plan.transition();
  }

  /**
   * A port for a sensor, with scratch of its own; belongs to the same thread as this workspace.
   *
   * @param sensor the model of the sensor
   * @return the port
   * @throws IllegalArgumentException if the plan's matching cannot serve the model
   */
  public SensorPort port(SensorModel sensor) {
    return new SensorPort(plan, sensor, FilterPlan.nameOf(sensor));
  }

  /**
   * A port for several rows of a sensor as one update.
   *
   * @param sensor the model of one row
   * @param maximumRows the most rows that an update will have
   * @return the port
   * @throws IllegalArgumentException if the plan's matching cannot serve the model
   */
  public StackedPort port(SensorModel sensor, int maximumRows) {
    return new StackedPort(plan, sensor, maximumRows);
  }

  /**
   * Predicts an estimate to a time, for a motion model without controls.
   *
   * @param estimate updated if the status {@code isApplied()}
   * @param time to predict to (s); the estimate's own time is a prediction over no time, which
   *     changes nothing
   * @return how it ended
   */
  public StepStatus predict(Estimate estimate, double time) {
    return predict(estimate, time, nothing);
  }

  /**
   * Predicts an estimate to a time under a control that holds until then.
   *
   * @param estimate updated if the status {@code isApplied()}
   * @param time to predict to (s)
   * @param control as many numbers as the motion model wants, read
   * @return how it ended
   * @throws IllegalArgumentException if the control or the estimate has the wrong size
   */
  public StepStatus predict(Estimate estimate, double time, double[] control) {
    estimate.requireSpace(plan.stateSpace());
    Checks.length("control", control, transition.controlDimension());
    evaluations = 0;
    jacobians = 0;
    estimatedError = Double.NaN;
    stepTime = time;
    estimateTime = estimate.time();
    interrupted = true;
    status = predictChecked(estimate, time, control);
    interrupted = false;
    return status;
  }

  private StepStatus predictChecked(Estimate estimate, double time, double[] control) {
    if (!Double.isFinite(time)) {
      return StepStatus.TIME_NOT_FINITE;
    }
    if (time < estimateTime) {
      return StepStatus.TIME_BEFORE_ESTIMATE;
    }
    if (!input.isFinite("control", control)) {
      return StepStatus.INPUT_NOT_FINITE;
    }
    if (time == estimateTime) {
      return StepStatus.APPLIED;
    }
    moved = null;
    movedFrom = Double.NaN;
    StepStatus carried = plan.judge(
        transition.carry(estimate.moments(), control, estimateTime, time - estimateTime));
    estimatedError = transition.estimatedError();
    evaluations = transition.evaluations();
    jacobians = transition.jacobians();
    if (carried.isApplied()) {
      estimate.replace(time, transition.output());
      moved = estimate;
      movedFrom = estimateTime;
      movedTo = time;
    }
    return carried;
  }

  /**
   * What a smoother needs of the last prediction that moved an estimate in time.
   *
   * @param estimate that was moved, and has not been moved since
   * @param cross filled with the cross-covariance of the state before and after, d x d
   * @return the predicted moments; read only, valid until the next prediction
   * @throws IllegalStateException if this workspace did not move the estimate last, to its time
   * @throws IllegalArgumentException if {@code cross} is not d x d
   */
  public Moments prediction(Estimate estimate, DMatrixRMaj cross) {
    int d = plan.stateSpace().dimension();
    if (cross.numRows != d || cross.numCols != d) {
      throw new IllegalArgumentException(
          "cross must be " + d + " x " + d + ", got " + cross.numRows + " x " + cross.numCols);
    }
    requireMoved(estimate);
    transition.crossCovariance(cross);
    return transition.output();
  }

  /**
   * A root of the joint covariance of the state after and before the last prediction that moved an estimate in
   * time: [W' L 0; B 0 E] with as many rows again as the state has components. P' = W'W + L L', C = B W, P = B B'
   * + E E'. Allocates.
   *
   * @param estimate that was moved, and has not been moved since
   * @return the root; none in covariance form, or where negative weights leave none
   * @throws IllegalStateException as for {@link #prediction}
   */
  public Optional<DMatrixRMaj> jointRoot(Estimate estimate) {
    requireMoved(estimate);
    return plan.form() == Form.SQUARE_ROOT ? transition.jointRoot() : Optional.empty();
  }

  private void requireMoved(Estimate estimate) {
    if (moved != estimate || movedTo != estimate.time()) {
      throw new IllegalStateException("the last prediction of this workspace must have moved the"
          + " estimate to t = " + estimate.time() + " s, it "
          + (moved == null
              ? "moved none"
              : "moved " + (moved == estimate ? "it" : "another") + " to t = " + movedTo + " s"));
    }
  }

  /** {@return the time (s) from which the last prediction went that moved an estimate; NaN if none} */
  public double movedFrom() {
    return movedFrom;
  }

  /** {@return the function evaluations of the last prediction} */
  public int evaluations() {
    return evaluations;
  }

  /** {@return the Jacobians formed in the last prediction} */
  public int jacobians() {
    return jacobians;
  }

  /** {@return the estimated error of the last prediction's moments, as {@code MatchingWorkspace.estimatedError()}} */
  public double estimatedError() {
    return estimatedError;
  }

  /** {@return why the last prediction was not applied, or not within its tolerance, in words; else empty} */
  public String failure() {
    if (status == StepStatus.APPLIED && !interrupted) {
      return "";
    }
    return (interrupted ? "the model threw an exception" : reason()) + " (motion model "
        + transition.name() + ", prediction from t = " + estimateTime + " s to " + stepTime + " s)";
  }

  private String reason() {
    return switch (status) {
      case TIME_NOT_FINITE -> "time must be finite, got " + stepTime;
      case TIME_BEFORE_ESTIMATE ->
        "step to t = " + stepTime + " s lies before the estimate at t = " + estimateTime
            + " s; late data needs a retained history";
      case INPUT_NOT_FINITE -> input.failure();
      default -> transition.failure(status);
    };
  }
}
