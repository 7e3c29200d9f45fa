package dev.estimation.filters.motion;

import dev.estimation.core.function.Structure;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.motion.MomentEquations.Kind;
import java.util.Arrays;
import org.apache.commons.math3.exception.MaxCountExceededException;
import org.apache.commons.math3.exception.NumberIsTooSmallException;
import org.apache.commons.math3.ode.nonstiff.DormandPrince853Integrator;

/**
 * A motion in continuous time, dx = a(x) dt + noise of density D, as a motion model: over each step is integrated
 *
 * <pre>
 * x' = a(x)        Phi' = A Phi, Phi(0) = I        Q' = A Q + Q A' + D, Q(0) = 0        A = da / dx
 * </pre>
 *
 * <p>with x alone for a move, x and Phi for the Jacobian, x and Q for the process noise. A matching over points moves
 * each point; linearisation takes Phi. Q is that of the linearised motion along the path of the mean in both.
 *
 * <p>Accuracy: an adaptive Runge-Kutta method of order 8 keeps its error estimate in each of its steps below
 * relative |value| + absolute, where absolute is s_i for x_i, r s_i / s_j for Phi_ij, with r the relative tolerance, and
 * s_i s_j for Q_ij: noise of a standard deviation below s_i is not resolved. The error after dt may be some times larger.
 *
 * <p>Where the integrator cannot follow, results are NaN, and a filter's step ends with a status and no change: {@code
 * NOISE_NOT_VALID} where the path of the mean fails, {@code MODEL_NOT_FINITE} where that of a point does. That is so where the
 * model gives NaN or infinity at a place the integrator tries, where an internal step falls below 1e-12 dt, or after 100,000
 * evaluations of the drift (a stiff motion).
 *
 * <p>Cost: 12 evaluations an internal step, times d^3 for matrices. <i>Immutable.</i> Each call allocates, some
 * kilobytes: this is the one ready model that does. Source: Dormand and Prince 1980, <i>A family of embedded
 * Runge-Kutta formulae</i>; Hairer, Norsett and Wanner 1993, section II.10; moment equations: Sarkka and Svensson 2023,
 * chapter 4 (from memory).
 */
public final class IntegratedMotion implements DifferentiableMotion {
  private static final double SMALLEST_STEP = 1e-12;
  private static final int EVALUATIONS = 100_000;
  private static final double FINEST = 1e-14;

  private final DifferentiableContinuousMotion motion;
  private final double relative;
  private final double[] absolute;

  private IntegratedMotion(
      DifferentiableContinuousMotion motion, double relative, double[] absolute) {
    Space space = motion.stateSpace();
    if (space.storage() != space.dimension()) {
      throw new IllegalArgumentException(
          "IntegratedMotion wants a state of reals and angles, got " + space);
    }
    if (!(relative >= FINEST && relative < 1)) {
      throw new IllegalArgumentException("IntegratedMotion relativeTolerance must be from " + FINEST
          + " to below 1, got " + relative);
    }
    Checks.length("IntegratedMotion absoluteTolerances", absolute, space.dimension());
    for (int i = 0; i < absolute.length; i++) {
      Parameters.positive("IntegratedMotion absoluteTolerances[" + i + "]", absolute[i]);
    }
    this.motion = motion;
    this.relative = relative;
    this.absolute = absolute.clone();
  }

  /**
   * A motion that knows the Jacobian of its drift.
   *
   * @param motion in continuous time
   * @param relativeTolerance from 1e-14 to below 1, e.g. 1e-9
   * @param absoluteTolerances one for each component of the state, in its unit, finite and above 0; copied
   * @return the motion model
   */
  public static IntegratedMotion of(
      DifferentiableContinuousMotion motion,
      double relativeTolerance,
      double... absoluteTolerances) {
    return new IntegratedMotion(motion, relativeTolerance, absoluteTolerances);
  }

  /**
   * A motion whose Jacobian is taken by central differences of the drift, right to about 1e-10.
   *
   * @param motion in continuous time
   * @param scales lengths over which the drift bends noticeably, one for each component of the state, in its unit,
   *     finite and above 0; copied
   * @param relativeTolerance from 1e-14 to below 1; below 1e-9 the differences, which are not smooth to that, make the
   *     integrator work in vain
   * @param absoluteTolerances one for each component of the state, in its unit, finite and above 0; copied
   * @return the motion model
   */
  public static IntegratedMotion withDifferences(
      ContinuousMotion motion,
      double[] scales,
      double relativeTolerance,
      double... absoluteTolerances) {
    return of(new DifferencedDrift(motion, scales), relativeTolerance, absoluteTolerances);
  }

  @Override
  public Space stateSpace() {
    return motion.stateSpace();
  }

  @Override
  public int controlDimension() {
    return motion.controlDimension();
  }

  @Override
  public Structure structure() {
    return motion.structure();
  }

  @Override
  public void move(double[] state, double[] control, double time, double dt, double[] next) {
    double[] end = integrated(Kind.STATE, state, control, time, dt);
    System.arraycopy(end, 0, next, 0, absolute.length);
  }

  @Override
  public void moveJacobian(
      double[] state, double[] control, double time, double dt, double[] jacobian) {
    double[] end = integrated(Kind.TRANSITION, state, control, time, dt);
    System.arraycopy(end, absolute.length, jacobian, 0, jacobian.length);
  }

  @Override
  public void processNoise(
      double[] state, double[] control, double time, double dt, double[] covariance) {
    double[] end = integrated(Kind.NOISE, state, control, time, dt);
    System.arraycopy(end, absolute.length, covariance, 0, covariance.length);
  }

  /** State and matrix at the end, all NaN if they cannot be reached. */
  private double[] integrated(Kind kind, double[] state, double[] control, double time, double dt) {
    MomentEquations equations = new MomentEquations(motion, kind, control, time);
    double[] y = new double[equations.getDimension()];
    System.arraycopy(state, 0, y, 0, absolute.length);
    if (kind == Kind.TRANSITION) {
      for (int i = 0; i < absolute.length; i++) {
        y[absolute.length + i * (absolute.length + 1)] = 1;
      }
    }
    try {
      integrator(kind, y.length, dt).integrate(equations, 0, y, dt, y);
    } catch (MomentEquations.NotFiniteException
        | NumberIsTooSmallException
        | MaxCountExceededException unreachable) {
      Arrays.fill(y, Double.NaN);
    }
    return y;
  }

  private DormandPrince853Integrator integrator(Kind kind, int length, double dt) {
    double[] relatives = new double[length];
    Arrays.fill(relatives, relative);
    double[] absolutes = Arrays.copyOf(absolute, length);
    int d = absolute.length;
    for (int i = d; i < length; i++) {
      double row = absolute[(i - d) / d];
      double column = absolute[(i - d) % d];
      absolutes[i] = kind == Kind.TRANSITION ? relative * row / column : row * column;
    }
    DormandPrince853Integrator integrator =
        new DormandPrince853Integrator(SMALLEST_STEP * dt, dt, absolutes, relatives);
    integrator.setMaxEvaluations(EVALUATIONS);
    return integrator;
  }
}
