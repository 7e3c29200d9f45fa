package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.Products;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.SensorModel;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * Where the measurements of one sensor enter: the update of a filter, with all sizes fixed.
 *
 * <p>Several measurements of one time are updates one after another. With d the dimension of the state,
 * m of the measurement and k its active inputs, an update costs the evaluations of the matching, the
 * noise, and about d k m + d^2 m / 2 + d^3 / 6 operations. <i>Confined to one thread</i>; serves any
 * number of estimates of its plan; allocates only when built and in {@link #failure()}.
 */
public final class SensorPort {
  private static final double LOG_TWO_PI = Math.log(2 * Math.PI);

  private final double[] nothing = new double[0];
  private final SensorModel sensor;
  private final Space stateSpace;
  private final Space space;
  private final double gateLimit;
  private final MatchingWorkspace matching;
  private final NoiseMatrix noise;
  private final LowerFactor innovationFactor;
  private final double[] innovation;
  private final double[] whitened;
  private final double[] column;
  private final DMatrixRMaj gainFactor;
  private final double[] correction;
  private final Moments posterior;
  private final InputCheck input = new InputCheck();
  private StepStatus status = StepStatus.APPLIED;
  private double estimateTime;
  private double squared = Double.NaN;
  private double logLikelihood = Double.NaN;
  private int evaluations;
  private int jacobians;

  SensorPort(FilterPlan plan, SensorModel sensor) {
    this.sensor = sensor;
    this.stateSpace = plan.motion().stateSpace();
    this.space = sensor.measurementSpace();
    int m = space.dimension();
    int d = stateSpace.dimension();
    this.gateLimit = plan.gateLimit(m);
    this.matching = plan.matching().workspace(stateSpace, space, new SensorFunction(sensor));
    this.noise = new NoiseMatrix("measurementNoise", m, true);
    this.innovationFactor = new LowerFactor(m);
    this.innovation = new double[m];
    this.whitened = new double[m];
    this.column = new double[m];
    this.gainFactor = new DMatrixRMaj(d, m);
    this.correction = new double[d];
    this.posterior = new Moments(stateSpace);
  }

  /**
   * Updates an estimate with a measurement, for a sensor to which nothing is given.
   *
   * @param estimate updated if the status is {@code APPLIED}
   * @param measurement read
   * @return how it ended
   */
  public StepStatus update(Estimate estimate, double[] measurement) {
    return update(estimate, measurement, nothing);
  }

  /**
   * Updates an estimate with a measurement of its own time.
   *
   * @param estimate updated if the status is {@code APPLIED}
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
    squared = Double.NaN;
    logLikelihood = Double.NaN;
    estimateTime = estimate.time();
    status = StepStatus.APPLIED;
    status = updateChecked(estimate, measurement, given);
    return status;
  }

  private StepStatus updateChecked(Estimate estimate, double[] measurement, double[] given) {
    if (!input.isFinite("measurement", measurement) || !input.isFinite("given", given)) {
      return StepStatus.INPUT_NOT_FINITE;
    }
    Moments prior = estimate.moments();
    sensor.measurementNoise(prior.mean(), given, noise.blank());
    if (!noise.isValid()) {
      return StepStatus.NOISE_NOT_VALID;
    }
    MatchingStatus matched = matching.carry(prior, given, noise.matrix());
    evaluations = matching.evaluations();
    jacobians = matching.jacobians();
    if (matched != MatchingStatus.MATCHED) {
      return StepStatus.of(matched);
    }
    if (!innovationFactor.factorDefinite(matching.output().covariance())) {
      return StepStatus.NOT_DEFINITE;
    }
    weighInnovation(measurement);
    if (squared > gateLimit) {
      return StepStatus.GATED;
    }
    if (!Double.isFinite(squared)) {
      return StepStatus.RESULT_NOT_FINITE;
    }
    return condition(estimate);
  }

  private void weighInnovation(double[] measurement) {
    space.difference(measurement, matching.output().mean(), innovation);
    int m = innovation.length;
    System.arraycopy(innovation, 0, whitened, 0, m);
    innovationFactor.solveLower(whitened);
    double sum = 0;
    for (int i = 0; i < m; i++) {
      sum += whitened[i] * whitened[i];
    }
    squared = sum;
    logLikelihood = -0.5 * (sum + innovationFactor.logDeterminant() + m * LOG_TWO_PI);
  }

  /** Conditions on the innovation: with G = C L_S^-T, mean + G L_S^-1 nu and P - G G'. */
  private StepStatus condition(Estimate estimate) {
    Moments prior = estimate.moments();
    fillGainFactor();
    int d = correction.length;
    int m = innovation.length;
    double[] g = gainFactor.data;
    for (int r = 0; r < d; r++) {
      double shift = 0;
      for (int j = 0; j < m; j++) {
        shift += g[r * m + j] * whitened[j];
      }
      correction[r] = shift;
    }
    double[] lower = posterior.changeCovariance().data;
    Products.fillDifference(prior.covariance().data, g, d, m, lower);
    SymmetricMatrix.mirrorLower(posterior.covariance());
    stateSpace.displace(prior.mean(), correction, posterior.changeMean());
    if (!Checks.allFinite(posterior.mean())
        || SymmetricMatrix.firstNotFinite(posterior.covariance()) >= 0) {
      return StepStatus.RESULT_NOT_FINITE;
    }
    if (!posterior.factor()) {
      return StepStatus.NOT_DEFINITE;
    }
    estimate.replace(estimateTime, posterior);
    return StepStatus.APPLIED;
  }

  /** G = C L_S^-T = B (L_S^-1 W')', formed row by row of W. */
  private void fillGainFactor() {
    double[] b = matching.inputFactor().data;
    double[] w = matching.unitCrossCovariance().data;
    double[] g = gainFactor.data;
    int k = matching.unitCrossCovariance().numRows;
    int m = innovation.length;
    int d = correction.length;
    Arrays.fill(g, 0);
    for (int a = 0; a < k; a++) {
      System.arraycopy(w, a * m, column, 0, m);
      innovationFactor.solveLower(column);
      for (int r = 0; r < d; r++) {
        double factor = b[r * k + a];
        for (int j = 0; j < m; j++) {
          g[r * m + j] += factor * column[j];
        }
      }
    }
  }

  /** {@return the innovation of the last update that was applied or gated; read only} */
  public double[] innovation() {
    return innovation;
  }

  /** {@return the covariance of the innovation of the last update that was applied or gated; read only} */
  public DMatrixRMaj innovationCovariance() {
    return matching.output().covariance();
  }

  /**
   * The normalised innovation squared (NIS) nu' S^-1 nu of the last update, from the prediction; NaN
   * if the update did not come that far.
   *
   * @return the NIS
   */
  public double normalisedInnovationSquared() {
    return squared;
  }

  /**
   * The logarithm of the density of the last measurement given all before it, -(NIS + ln det S + m ln 2
   * pi) / 2; NaN if the update did not come that far.
   *
   * @return the log-likelihood
   */
  public double logLikelihood() {
    return logLikelihood;
  }

  /** {@return the function evaluations of the last update} */
  public int evaluations() {
    return evaluations;
  }

  /** {@return the Jacobians formed in the last update} */
  public int jacobians() {
    return jacobians;
  }

  /** {@return why the last update was not applied, in words; empty if it was} */
  public String failure() {
    if (status == StepStatus.APPLIED) {
      return "";
    }
    return reason() + " (sensor model " + sensor.getClass().getSimpleName() + ", update at t = "
        + estimateTime + " s)";
  }

  private String reason() {
    return switch (status) {
      case GATED -> "normalised innovation squared " + squared + " is above the gate " + gateLimit;
      case INPUT_NOT_FINITE -> input.failure();
      case NOISE_NOT_VALID -> noise.failure();
      case NOT_DEFINITE -> indefinite();
      case RESULT_NOT_FINITE -> notFinite();
      default -> matching.failure();
    };
  }

  private String notFinite() {
    return matching.failure().isEmpty()
        ? "updated mean or covariance is not finite: the innovation overflows"
        : matching.failure();
  }

  private String indefinite() {
    if (!matching.failure().isEmpty()) {
      return matching.failure();
    }
    if (Double.isNaN(squared)) {
      return "covariance of the innovation is not positive definite: " + innovationFactor.failure();
    }
    return "updated covariance is not positive semi-definite: " + posterior.factorFailure();
  }
}
