package dev.estimation.filters.filter;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.ToleranceMatching;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.core.space.Space;
import dev.estimation.filters.consistency.ChiSquareBounds;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.NoiseDrivenMotion;

/**
 * A Gaussian filter, ready to be run: a motion model, a matching for prediction and update, and a gate.
 *
 * <p>Prediction: mean and covariance of f(x) by the matching, plus Q. Update: with the innovation nu =
 * z - mean of h(x), its covariance S, the cross-covariance C of x and z, and K = C S^-1: mean + K nu, P
 * - K S K'. Points are drawn anew for each. The filter is the textbook one of its matching: linearisation
 * gives the extended Kalman filter, sigma points the unscented one.
 *
 * <p><i>Immutable.</i> Share one plan among all threads; each takes its own workspace. Source: Ito and
 * Xiong 2000, <i>Gaussian filters for nonlinear filtering problems</i>; Sarkka and Svensson 2023,
 * chapter 8.
 */
public final class FilterPlan {
  private final Motion motion;
  private final Space stateSpace;
  private final MomentMatching matching;
  private final double gateProbability;
  private final IteratedUpdate iteration;
  private final Form form;
  private final boolean refusing;

  private FilterPlan(
      Motion motion,
      MomentMatching matching,
      double gateProbability,
      IteratedUpdate iteration,
      Form form,
      boolean refusing) {
    this.motion = motion;
    this.stateSpace = motion.stateSpace();
    this.matching = matching;
    this.gateProbability = gateProbability;
    this.iteration = iteration;
    this.form = form;
    this.refusing = refusing;
  }

  /**
   * A filter on any matching, without a gate.
   *
   * @param motion how the state moves
   * @param matching how moments are carried through both models
   * @return the plan
   * @throws IllegalArgumentException if the matching cannot serve the model
   */
  public static FilterPlan of(Motion motion, MomentMatching matching) {
    FilterPlan plan = new FilterPlan(motion, matching, Double.NaN, null, Form.COVARIANCE, false);
    plan.transition(); // refuses a model that the matching cannot serve now, not at the first step
    return plan;
  }

  /**
   * {@return the extended Kalman filter: first-order linearisation; models must know their Jacobians}
   *
   * @param motion how the state moves
   */
  public static FilterPlan extended(Motion motion) {
    return of(motion, Linearisation.firstOrder());
  }

  /**
   * The iterated extended Kalman filter: updates are linearised anew until they settle.
   *
   * @param motion how the state moves
   * @param iteration how updates are iterated
   * @return the plan
   * @throws IllegalArgumentException if the state has quaternions, whose displacements do not add up as the
   *     rounds assume
   */
  public static FilterPlan iteratedExtended(Motion motion, IteratedUpdate iteration) {
    Space space = motion.stateSpace();
    if (space.storage() != space.dimension()) {
      throw new IllegalArgumentException("iterated updates want a state of reals and angles, got "
          + space + " (motion model " + nameOf(motion) + ")");
    }
    return new FilterPlan(
        motion, extended(motion).matching, Double.NaN, iteration, Form.COVARIANCE, false);
  }

  /**
   * {@return the unscented Kalman filter with the scaled rule; see {@link UnscentedRule#scaled}}
   *
   * @param motion how the state moves
   * @param alpha spread, above 0
   * @param beta added to the covariance weight of the centre
   * @param kappa above -n
   */
  public static FilterPlan unscented(Motion motion, double alpha, double beta, double kappa) {
    return of(motion, PointMatching.of(UnscentedRule.scaled(alpha, beta, kappa)));
  }

  /**
   * {@return a filter whose moments are within a tolerance at every step; see {@link ToleranceMatching}}
   *
   * @param motion how the state moves
   * @param tolerance of means in standard deviations, of variances relative: 0.01 is one per cent
   */
  public static FilterPlan withinTolerance(Motion motion, double tolerance) {
    return of(motion, ToleranceMatching.within(tolerance));
  }

  /**
   * {@return the cubature Kalman filter of degree 3}
   *
   * @param motion how the state moves
   */
  public static FilterPlan cubature(Motion motion) {
    return of(motion, PointMatching.of(CubatureRule.degreeThree()));
  }

  /**
   * {@return the Gauss-Hermite filter with a number of nodes on each axis}
   *
   * @param motion how the state moves
   * @param nodesPerAxis p: a step costs p^k evaluations for k active inputs
   */
  public static FilterPlan gaussHermite(Motion motion, int nodesPerAxis) {
    return of(motion, PointMatching.of(GaussHermiteRule.product(nodesPerAxis)));
  }

  /**
   * This plan with a gate on updates: a measurement whose normalised innovation squared is above the
   * chi-square quantile of the given probability is rejected.
   *
   * @param probability of passing for an honest filter, from 1e-12 to 1 - 1e-12, e.g. 0.999
   * @return the plan with a gate
   */
  public FilterPlan withGate(double probability) {
    ChiSquareBounds.upperLimit(probability, 1);
    return new FilterPlan(motion, matching, probability, iteration, form, refusing);
  }

  /**
   * This plan in square-root form: estimates carry a lower factor instead of the covariance, which keeps
   * twice the digits, in a smoother too. Take it where standard deviations of directions differ by more than 1e6 or
   * so, e.g. after measurements far more accurate than the estimate in a motion of little noise: there the
   * covariance form may be wrong without a word. A step costs somewhat more.
   *
   * @return the plan in square-root form
   */
  public FilterPlan inSquareRootForm() {
    return new FilterPlan(motion, matching, gateProbability, iteration, Form.SQUARE_ROOT, refusing);
  }

  /**
   * This plan, refusing steps whose moments are not within the tolerance of a {@code ToleranceMatching}: the estimate then
   * stays as it is, and the status is {@code BELOW_TOLERANCE}. Unless this is said, such steps are applied, and the
   * status is {@code APPLIED_BELOW_TOLERANCE}.
   *
   * @return the plan
   */
  public FilterPlan refusingBelowTolerance() {
    return new FilterPlan(motion, matching, gateProbability, iteration, form, true);
  }

  /** A status as this plan takes it. */
  StepStatus judge(StepStatus status) {
    return refusing && status == StepStatus.APPLIED_BELOW_TOLERANCE
        ? StepStatus.BELOW_TOLERANCE
        : status;
  }

  /** {@return scratch for one thread} */
  public FilterWorkspace workspace() {
    return new FilterWorkspace(this);
  }

  /**
   * A new track.
   *
   * @param time of the estimate (s), finite
   * @param initial mean and covariance; angles are brought into [-pi, pi). With quaternions: {@code
   *     Gaussian.of(space, mean, covariance)}
   * @return the estimate of the track
   */
  public Estimate start(double time, Gaussian initial) {
    return new Estimate(stateSpace, time, initial);
  }

  Space stateSpace() {
    return stateSpace;
  }

  /** A matching workspace; a refusal names the model. */
  MatchingWorkspace workspace(Space input, Space output, VectorFunction function, String model) {
    try {
      return matching.workspace(input, output, function, form);
    } catch (IllegalArgumentException refused) {
      throw new IllegalArgumentException(refused.getMessage() + " (" + model + ")", refused);
    }
  }

  /** What messages call a model. */
  static String nameOf(Object model) {
    String simple = model.getClass().getSimpleName();
    return simple.isEmpty() ? model.getClass().getName() : simple;
  }

  Transition transition() {
    Motion own = motion.forOneThread();
    return own instanceof MotionModel additive
        ? new AdditiveTransition(additive, this)
        : new NoiseDrivenTransition((NoiseDrivenMotion) own, this);
  }

  Form form() {
    return form;
  }

  /** How updates are iterated, or null. */
  IteratedUpdate iteration() {
    return iteration;
  }

  /** The limit of the normalised innovation squared; infinite without a gate. */
  double gateLimit(int degreesOfFreedom) {
    return Double.isNaN(gateProbability)
        ? Double.POSITIVE_INFINITY
        : ChiSquareBounds.upperLimit(gateProbability, degreesOfFreedom);
  }
}
