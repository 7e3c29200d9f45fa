package dev.estimation.filters.filter;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * An innovation nu, its covariance S, and how likely it was. With T = S - W'W and the reduction of {@link
 * UnitLeastSquares}, nu' S^-1 nu is what the least squares leave, and ln det S = ln det T + ln det R'R: both
 * keep their digits where S itself is nearly singular. Confined to one thread.
 */
final class Innovation {
  private static final double LOG_TWO_PI = Math.log(2 * Math.PI);

  private final Space space;
  private final MatchingWorkspace matching;
  private final UnitLeastSquares squares;
  private Covariance unexplained;
  private final DMatrixRMaj covariance;
  private final boolean matchingMoves;
  private final double[] value;
  private double squared = Double.NaN;

  Innovation(Space space, MatchingWorkspace matching, boolean matchingMoves) {
    this.matchingMoves = matchingMoves;
    this.space = space;
    this.matching = matching;
    int m = space.dimension();
    this.squares = new UnitLeastSquares(matching.activeInputs(), m);
    this.unexplained = matching.unexplained();
    this.covariance = new DMatrixRMaj(m, m);
    this.value = new double[m];
  }

  void clear() {
    Arrays.fill(value, Double.NaN);
    squared = Double.NaN;
  }

  /** Weighs a measurement against the prediction at which the matching stands; false if T is not definite. */
  boolean weigh(double[] measurement) {
    space.difference(measurement, matching.mean(), value);
    if (matchingMoves) {
      covariance.setTo(matching.output().covariance());
    }
    unexplained = matching.unexplained();
    if (!unexplained.isDefinite()) {
      return false;
    }
    squares.reduce(matching.unitCrossCovariance(), unexplained, value);
    squared = squares.restSquared();
    return true;
  }

  /** The update in unit coordinates, reduced. */
  UnitLeastSquares squares() {
    return squares;
  }

  double[] value() {
    return value;
  }

  /** S; made when asked for, unless an iteration moves the matching on. */
  DMatrixRMaj covariance() {
    return matchingMoves ? covariance : matching.output().covariance();
  }

  double squared() {
    return squared;
  }

  /** Found when asked for, as logarithms are dear beside a small update. */
  double logLikelihood() {
    if (Double.isNaN(squared)) {
      return Double.NaN;
    }
    double logDeterminant = unexplained.logDeterminant() + squares.logDeterminant();
    return -0.5 * (squared + logDeterminant + value.length * LOG_TWO_PI);
  }

  /** Why {@link #weigh} was false. */
  String failure() {
    return "covariance of the innovation, less what the state explains of it, is not positive definite: "
        + unexplained.failure();
  }
}
