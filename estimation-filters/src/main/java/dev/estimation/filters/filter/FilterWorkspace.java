package dev.estimation.filters.filter;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;

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
  private final MotionModel motion;
  private final MotionFunction function;
  private final MatchingWorkspace matching;
  private final NoiseMatrix noise;
  private final InputCheck input = new InputCheck();
  private StepStatus status = StepStatus.APPLIED;
  private int evaluations;
  private int jacobians;
  private double stepTime;
  private double estimateTime;

  FilterWorkspace(FilterPlan plan) {
    this.plan = plan;
    this.motion = plan.motion();
    Space space = motion.stateSpace();
    this.function = new MotionFunction(motion);
    this.matching = plan.matching().workspace(space, space, function);
    this.noise = new NoiseMatrix("processNoise", space.dimension(), false);
  }

  /**
   * A port for a sensor, with scratch of its own; belongs to the same thread as this workspace.
   *
   * @param sensor the model of the sensor
   * @return the port
   * @throws IllegalArgumentException if the plan's matching cannot serve the model
   */
  public SensorPort port(SensorModel sensor) {
    return new SensorPort(plan, sensor);
  }

  /**
   * Predicts an estimate to a time, for a motion model without controls.
   *
   * @param estimate updated if the status is {@code APPLIED}
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
   * @param estimate updated if the status is {@code APPLIED}
   * @param time to predict to (s)
   * @param control as many numbers as the motion model wants, read
   * @return how it ended
   * @throws IllegalArgumentException if the control or the estimate has the wrong size
   */
  public StepStatus predict(Estimate estimate, double time, double[] control) {
    estimate.requireSpace(motion.stateSpace());
    Checks.length("control", control, motion.controlDimension());
    evaluations = 0;
    jacobians = 0;
    stepTime = time;
    estimateTime = estimate.time();
    status = StepStatus.APPLIED;
    status = predictChecked(estimate, time, control);
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
    double dt = time - estimateTime;
    function.over(estimateTime, dt);
    double[] mean = estimate.moments().mean();
    motion.processNoise(mean, control, estimateTime, dt, noise.blank());
    if (!noise.isValid()) {
      return StepStatus.NOISE_NOT_VALID;
    }
    MatchingStatus matched = matching.carry(estimate.moments(), control, noise.matrix());
    evaluations = matching.evaluations();
    jacobians = matching.jacobians();
    if (matched != MatchingStatus.MATCHED) {
      return StepStatus.of(matched);
    }
    if (!matching.output().factor()) {
      return StepStatus.NOT_DEFINITE;
    }
    estimate.replace(time, matching.output());
    return StepStatus.APPLIED;
  }

  /** {@return the function evaluations of the last prediction} */
  public int evaluations() {
    return evaluations;
  }

  /** {@return the Jacobians formed in the last prediction} */
  public int jacobians() {
    return jacobians;
  }

  /** {@return why the last prediction was not applied, in words; empty if it was} */
  public String failure() {
    if (status == StepStatus.APPLIED) {
      return "";
    }
    return reason() + " (motion model " + motion.getClass().getSimpleName()
        + ", prediction from t = " + estimateTime + " s to " + stepTime + " s)";
  }

  private String reason() {
    return switch (status) {
      case TIME_NOT_FINITE -> "time must be finite, got " + stepTime;
      case TIME_BEFORE_ESTIMATE ->
        "step to t = " + stepTime + " s lies before the estimate at t = " + estimateTime
            + " s; late data needs a retained history";
      case INPUT_NOT_FINITE -> input.failure();
      case NOISE_NOT_VALID -> noise.failure();
      case NOT_DEFINITE -> indefinite();
      default -> matching.failure();
    };
  }

  private String indefinite() {
    return matching.failure().isEmpty()
        ? "predicted covariance is not positive semi-definite: "
            + matching.output().factorFailure()
        : matching.failure();
  }
}
