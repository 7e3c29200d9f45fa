package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.Use;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * The rounds of an {@link IteratedUpdate}, in unit coordinates s of the prior: x = m + B s. As H B =
 * W', a round is the least squares of (z - h(x) + W' s) - W' s_new and s_new, all taken at x. Confined
 * to one thread.
 */
final class GaussNewton {
  private static final double SUFFICIENT_DECREASE = 1e-4;
  private static final double SHORTEST_STEP = 1e-10;
  private static final double EPSILON = 0x1p-52;

  /** Steps below this, in prior standard deviations, that no longer shrink are rounding. */
  private static final double ROUNDING_STEP = 1e-6;

  private final IteratedUpdate settings;
  private final MatchingWorkspace matching;
  private final NoiseMatrix noise;
  private final Space state;
  private final Space measured;
  private final Moments iterate;
  private final UnitLeastSquares squares;
  private final double[] unit;
  private final double[] step;
  private final double[] trial;
  private final double[] displacement;
  private final double[] residual;
  private final double[] target;
  private final double[] column;
  private int evaluations;
  private int jacobians;
  private double[] given;
  private double[] measurement;
  private Moments prior;

  GaussNewton(
      IteratedUpdate settings,
      MatchingWorkspace matching,
      NoiseMatrix noise,
      Space state,
      Space measured) {
    this.settings = settings;
    this.matching = matching;
    this.noise = noise;
    this.state = state;
    this.measured = measured;
    int k = matching.activeInputs();
    int m = measured.dimension();
    this.iterate = new Moments(state);
    this.squares = new UnitLeastSquares(k, m);
    this.unit = new double[k];
    this.step = new double[k];
    this.trial = new double[k];
    this.displacement = new double[state.dimension()];
    this.residual = new double[m];
    this.target = new double[m];
    this.column = new double[m];
  }

  /**
   * Iterates from the prior mean, at which the matching must stand. On APPLIED it stands at the result,
   * {@link #mean()}.
   */
  StepStatus run(Moments from, double[] nextGiven, double[] nextMeasurement) {
    prior = from;
    given = nextGiven;
    measurement = nextMeasurement;
    StepStatus ended = iterate();
    prior = null; // what belongs to the caller is not kept
    given = null;
    measurement = null;
    return ended;
  }

  private StepStatus iterate() {
    evaluations = 0;
    jacobians = 0;
    iterate.set(prior);
    Arrays.fill(unit, 0);
    measured.difference(measurement, matching.mean(), residual);
    double previous = Double.POSITIVE_INFINITY;
    for (int round = 0; round < settings.maximumRounds(); round++) {
      fillStep();
      double length = length(step);
      boolean settled =
          length < settings.tolerance() || (length < ROUNDING_STEP && length >= previous);
      StepStatus moved = settings.searchesLine() && !settled ? search() : go(1);
      if (moved != StepStatus.APPLIED) {
        return moved;
      }
      System.arraycopy(trial, 0, unit, 0, unit.length);
      if (settled) {
        reduce();
        return StepStatus.APPLIED;
      }
      previous = length;
    }
    return StepStatus.NOT_CONVERGED;
  }

  /** The step to the solution of the linearised problem. */
  private void fillStep() {
    reduce();
    squares.solve(step);
    for (int a = 0; a < unit.length; a++) {
      step[a] -= unit[a];
    }
  }

  private void reduce() {
    System.arraycopy(residual, 0, target, 0, target.length);
    addProduct(unit, target);
    squares.reduce(matching.unitCrossCovariance(), noise.covariance(), target);
  }

  /** result += W' s. */
  private void addProduct(double[] s, double[] result) {
    double[] w = matching.unitCrossCovariance().data;
    int m = result.length;
    for (int a = 0; a < s.length; a++) {
      for (int j = 0; j < m; j++) {
        result[j] += w[a * m + j] * s[a];
      }
    }
  }

  /** The largest move of a component, B step, in prior standard deviations. */
  private double length(double[] s) {
    fillDisplacement(s);
    double[] p = prior.covariance().data;
    int d = displacement.length;
    double longest = 0;
    for (int i = 0; i < d; i++) {
      double variance = p[i * (d + 1)];
      if (variance > 0) {
        longest = Math.max(longest, Math.abs(displacement[i]) / Math.sqrt(variance));
      }
    }
    return longest;
  }

  private void fillDisplacement(double[] s) {
    DMatrixRMaj b = matching.inputFactor();
    for (int i = 0; i < displacement.length; i++) {
      double sum = 0;
      for (int a = 0; a < s.length; a++) {
        sum += b.data[i * b.numCols + a] * s[a];
      }
      displacement[i] = sum;
    }
  }

  /** Moves to s + length step and linearises there. */
  private StepStatus go(double length) {
    for (int a = 0; a < unit.length; a++) {
      trial[a] = unit[a] + length * step[a];
    }
    fillDisplacement(trial);
    state.displace(prior.mean(), displacement, iterate.changeMean());
    MatchingStatus matched = matching.carry(iterate, given, noise.covariance(), Use.UPDATE);
    evaluations += matching.evaluations();
    jacobians += matching.jacobians();
    if (!matched.hasResult()) {
      return StepStatus.of(matched);
    }
    measured.difference(measurement, matching.mean(), residual);
    return StepStatus.APPLIED;
  }

  /** Halves the step until the cost falls as its slope promises. */
  private StepStatus search() {
    double before = cost(unit);
    double allowed = before + rounding(before);
    double slope = slope();
    StepStatus moved = StepStatus.NOT_CONVERGED;
    for (double length = 1; length > SHORTEST_STEP; length /= 2) {
      moved = go(length);
      if (moved == StepStatus.APPLIED
          && cost(trial) <= allowed + SUFFICIENT_DECREASE * length * slope) {
        return moved;
      }
    }
    return moved == StepStatus.APPLIED ? StepStatus.NOT_CONVERGED : moved;
  }

  /** (s's + r' R^-1 r) / 2. */
  private double cost(double[] s) {
    System.arraycopy(residual, 0, column, 0, column.length);
    noise.whiten(column);
    return 0.5 * (dot(s, s) + dot(column, column));
  }

  /** By how much rounding of the measurement alone can change the cost: |L^-1 r| eps |L^-1 z|. */
  private double rounding(double cost) {
    System.arraycopy(measurement, 0, column, 0, column.length);
    noise.whiten(column);
    return 4 * EPSILON * (cost + Math.sqrt(2 * cost) * Math.sqrt(dot(column, column)));
  }

  /** The slope of the cost along the step, where the residual changes by -W' step. */
  private double slope() {
    System.arraycopy(residual, 0, column, 0, column.length);
    noise.whiten(column);
    Arrays.fill(target, 0);
    addProduct(step, target);
    noise.whiten(target);
    return dot(unit, step) - dot(column, target);
  }

  private static double dot(double[] a, double[] b) {
    double sum = 0;
    for (int i = 0; i < a.length; i++) {
      sum += a[i] * b[i];
    }
    return sum;
  }

  /** The update, linearised at the result. */
  UnitLeastSquares squares() {
    return squares;
  }

  double[] mean() {
    return iterate.mean();
  }

  int evaluations() {
    return evaluations;
  }

  int jacobians() {
    return jacobians;
  }
}
