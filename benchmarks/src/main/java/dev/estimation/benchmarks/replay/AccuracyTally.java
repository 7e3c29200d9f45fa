package dev.estimation.benchmarks.replay;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.consistency.ConsistencyTally;
import dev.estimation.filters.consistency.NormalisedError;
import java.util.Optional;

/** Compares estimates with truth, step by step. */
final class AccuracyTally {
  private final Truth truth;
  private final FlatSpace space;
  private final int[] components;
  private final double[] values;
  private final double[] error;
  private final boolean headed;
  private final NormalisedError normalised;
  private final ConsistencyTally consistency;
  private final ScoreTally position = new ScoreTally();
  private final ScoreTally heading = new ScoreTally();

  AccuracyTally(Space stateSpace, Truth truth) {
    this.truth = truth;
    this.space = truth.space();
    this.components = truth.components();
    this.values = new double[components.length];
    this.error = new double[components.length];
    this.headed = hasAngle(space);
    this.normalised = NormalisedError.of(stateSpace, components);
    this.consistency = new ConsistencyTally(components.length);
  }

  private static boolean hasAngle(FlatSpace space) {
    for (int i = 0; i < space.dimension(); i++) {
      if (space.isAngle(i)) {
        return true;
      }
    }
    return false;
  }

  void add(double time, Gaussian estimate) {
    if (!truth.at(time, values)) {
      return;
    }
    for (int i = 0; i < components.length; i++) {
      error[i] = estimate.mean(components[i]);
    }
    space.difference(error, values, error);
    position.add(square(false));
    heading.add(square(true));
    // A covariance without an inverse has no normalised error: NaN.
    consistency.add(normalised.squared(estimate, values));
  }

  /** The squared error of the angles, or of the rest. */
  private double square(boolean angles) {
    double square = 0;
    for (int i = 0; i < error.length; i++) {
      if (space.isAngle(i) == angles) {
        square += error[i] * error[i];
      }
    }
    return square;
  }

  Accuracy summary() {
    return new Accuracy(
        consistency.count(),
        position.summary(),
        headed ? Optional.of(heading.summary()) : Optional.empty(),
        consistency.degreesOfFreedom(),
        consistency.mean(),
        consistency.insideFraction());
  }
}
