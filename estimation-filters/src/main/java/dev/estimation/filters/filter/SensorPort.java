package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.Use;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.SensorModel;
import org.ejml.data.DMatrixRMaj;

/**
 * Where the measurements of one sensor enter: the update of a filter, with all sizes fixed.
 *
 * <p>Several measurements of one time are updates one after another, or one update of stacked rows
 * ({@link StackedPort}). With d the dimension of the state, m of the measurement and k its active
 * inputs, an update costs the evaluations of the matching, the noise, and about m^3 / 6 + 2 (m + k) k^2
 * + d^3 operations. <i>Confined to one thread</i>; serves any number of estimates of its plan; allocates
 * only when built and in {@link #failure()}.
 */
public final class SensorPort {
  private final double[] nothing = new double[0];
  private final String name;
  private final FilterPlan plan;
  private final SensorModel sensor;
  private final Space stateSpace;
  private final Space space;
  private final double gateLimit;
  private final MatchingWorkspace matching;
  private final NoiseMatrix noise;
  private final Innovation innovation;
  private final Posterior posterior;
  private final GaussNewton iteration;
  private final double[] mean;
  private final InputCheck input = new InputCheck();
  private StepStatus status = StepStatus.APPLIED;
  private double estimatedError = Double.NaN;
  private boolean belowTolerance;
  private boolean interrupted;
  private double estimateTime;
  private int evaluations;
  private int jacobians;

  SensorPort(FilterPlan plan, SensorModel sensor, String name) {
    this.plan = plan;
    this.name = name;
    this.sensor = sensor;
    this.stateSpace = plan.stateSpace();
    this.space = sensor.measurementSpace();
    int m = space.dimension();
    this.gateLimit = plan.gateLimit(m);
    this.matching = plan.workspace(
        stateSpace,
        space,
        new SensorFunction(sensor),
        "sensor model " + name
            + "; its derivatives: DifferentiableSensor, TwiceDifferentiableSensor");
    this.noise = new NoiseMatrix("measurementNoise", m, true);
    this.innovation = new Innovation(space, matching, plan.iteration() != null);
    this.posterior = new Posterior(stateSpace, matching);
    this.mean = new double[stateSpace.storage()];
    this.iteration = plan.iteration() == null
        ? null
        : new GaussNewton(plan.iteration(), matching, noise, stateSpace, space);
  }

  /**
   * Updates an estimate with a measurement, for a sensor to which nothing is given.
   *
   * @param estimate updated if the status {@code isApplied()}
   * @param measurement read
   * @return how it ended
   * @throws IllegalArgumentException if the measurement or the estimate has the wrong size, or the
   *     sensor wants something given
   */
  public StepStatus update(Estimate estimate, double[] measurement) {
    return update(estimate, measurement, nothing);
  }

  /**
   * Updates an estimate with a measurement of its own time.
   *
   * @param estimate updated if the status {@code isApplied()}
   * @param measurement in the sensor's measurement space, read
   * @param given as many numbers as the sensor model wants, read
   * @return how it ended
   * @throws IllegalArgumentException if an array or the estimate has the wrong size
   */
  public StepStatus update(Estimate estimate, double[] measurement, double[] given) {
    estimate.requireSpace(stateSpace);
    Checks.length("measurement", measurement, space.storage());
    Checks.length("given", given, sensor.givenDimension());
    evaluations = 0;
    jacobians = 0;
    estimatedError = Double.NaN;
    innovation.clear();
    estimateTime = estimate.time();
    interrupted = true;
    status = updateChecked(estimate, measurement, given);
    interrupted = false;
    return status;
  }

  private StepStatus updateChecked(Estimate estimate, double[] measurement, double[] given) {
    if (!input.isFinite("measurement", measurement)
        || !input.isFinite("given", given)
        || !input.isPoint("measurement", measurement, space)) {
      return StepStatus.INPUT_NOT_FINITE;
    }
    Moments prior = estimate.moments();
    // A copy, since a model may write on what it is given, against its contract.
    System.arraycopy(prior.mean(), 0, mean, 0, mean.length);
    sensor.measurementNoise(mean, given, noise.blank());
    if (!noise.isValid()) {
      return StepStatus.NOISE_NOT_VALID;
    }
    StepStatus weighed = weigh(prior, measurement, given);
    if (!weighed.isApplied()) {
      return weighed;
    }
    StepStatus conditioned = condition(prior, measurement, given);
    if (conditioned != StepStatus.APPLIED) {
      return conditioned;
    }
    estimate.replace(estimateTime, posterior.moments());
    return weighed;
  }

  /** Predicts the measurement and holds the innovation against the gate. */
  private StepStatus weigh(Moments prior, double[] measurement, double[] given) {
    MatchingStatus matched = matching.carry(prior, given, noise.covariance(), Use.UPDATE);
    evaluations = matching.evaluations();
    jacobians = matching.jacobians();
    estimatedError = matching.estimatedError();
    belowTolerance = matched == MatchingStatus.BELOW_TOLERANCE;
    StepStatus judged = plan.judge(StepStatus.of(matched));
    if (!judged.isApplied()) {
      return judged;
    }
    if (!innovation.weigh(measurement)) {
      return StepStatus.NOT_DEFINITE;
    }
    if (innovation.squared() > gateLimit) {
      return StepStatus.GATED;
    }
    return Double.isFinite(innovation.squared()) ? judged : StepStatus.RESULT_NOT_FINITE;
  }

  private StepStatus condition(Moments prior, double[] measurement, double[] given) {
    if (iteration == null) {
      return posterior.condition(prior, innovation.squares());
    }
    StepStatus iterated = iteration.run(prior, given, measurement);
    evaluations += iteration.evaluations();
    jacobians += iteration.jacobians();
    return iterated == StepStatus.APPLIED
        ? posterior.take(iteration.squares(), iteration.mean())
        : iterated;
  }

  /** {@return the innovation of the last update; NaN if it did not come that far; read only} */
  public double[] innovation() {
    return innovation.value();
  }

  /** {@return the covariance of that innovation, valid where it is not NaN; read only} */
  public DMatrixRMaj innovationCovariance() {
    return innovation.covariance();
  }

  /**
   * The normalised innovation squared (NIS) nu' S^-1 nu of the last update, from the prediction; NaN
   * if the update did not come that far.
   *
   * @return the NIS
   */
  public double normalisedInnovationSquared() {
    return innovation.squared();
  }

  /**
   * The logarithm of the density of the last measurement given all before it, -(NIS + ln det S + m ln 2
   * pi) / 2; NaN if the update did not come that far.
   *
   * @return the log-likelihood
   */
  public double logLikelihood() {
    return innovation.logLikelihood();
  }

  /** {@return the function evaluations of the last update} */
  public int evaluations() {
    return evaluations;
  }

  /** {@return the Jacobians formed in the last update} */
  public int jacobians() {
    return jacobians;
  }

  /** {@return the estimated error of the last update's moments, as {@code MatchingWorkspace.estimatedError()}} */
  public double estimatedError() {
    return estimatedError;
  }

  /** {@return why the last update was not applied, or not within its tolerance, in words; else empty} */
  public String failure() {
    if (status == StepStatus.APPLIED && !interrupted) {
      return "";
    }
    return (interrupted ? "the model threw an exception" : reason()) + " (sensor model " + name
        + ", update at t = " + estimateTime + " s)";
  }

  private String reason() {
    return switch (status) {
      case GATED ->
        "normalised innovation squared " + innovation.squared() + " is above the gate " + gateLimit;
      case INPUT_NOT_FINITE -> input.failure();
      case NOISE_NOT_VALID -> noise.failure();
      case NOT_CONVERGED ->
        "the iterated update did not converge; a line search or a tighter prior may help";
      case NOT_DEFINITE -> indefinite();
      case RESULT_NOT_FINITE -> notFinite();
      default -> matching.failure();
    };
  }

  /** Whether the matching gave moments: what was wrong is then not what it says of their accuracy. */
  private boolean hasMoments() {
    return belowTolerance || matching.failure().isEmpty();
  }

  private String notFinite() {
    return hasMoments()
        ? "updated mean or covariance is not finite: the innovation overflows"
        : matching.failure();
  }

  private String indefinite() {
    if (!hasMoments()) {
      return matching.failure();
    }
    if (Double.isNaN(innovation.squared())) {
      return innovation.failure();
    }
    return "updated covariance is not positive semi-definite: "
        + posterior.moments().factorFailure();
  }
}
