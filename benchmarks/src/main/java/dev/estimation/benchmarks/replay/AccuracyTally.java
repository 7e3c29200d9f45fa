package dev.estimation.benchmarks.replay;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import dev.estimation.filters.consistency.ConsistencyTally;
import dev.estimation.filters.consistency.NormalisedError;

/** Compares estimates with truth, step by step. */
final class AccuracyTally {
  private final Truth truth;
  private final int[] components;
  private final double[] values;
  private final NormalisedError normalised;
  private final ConsistencyTally consistency;
  private double sumOfSquares;
  private double largestSquare;

  AccuracyTally(Space space, Truth truth) {
    if (!(space instanceof FlatSpace flat)) {
      throw new IllegalArgumentException("scoring wants reals and angles, got " + space);
    }
    this.truth = truth;
    this.components = truth.components();
    this.values = new double[components.length];
    this.normalised = NormalisedError.of(flat, components);
    this.consistency = new ConsistencyTally(components.length);
  }

  void add(double time, Gaussian estimate) {
    if (!truth.at(time, values)) {
      return;
    }
    double square = 0;
    for (int i = 0; i < components.length; i++) {
      double error = estimate.mean(components[i]) - values[i];
      square += error * error;
    }
    sumOfSquares += square;
    largestSquare = Math.max(largestSquare, square);
    consistency.add(normalisedSquare(estimate));
  }

  private double normalisedSquare(Gaussian estimate) {
    try {
      return normalised.squared(estimate, values);
    } catch (IllegalArgumentException singular) {
      return Double.NaN; // a covariance without an inverse has no normalised error
    }
  }

  Accuracy summary() {
    long count = consistency.count();
    return count == 0
        ? Accuracy.NONE
        : new Accuracy(
            count,
            Math.sqrt(sumOfSquares / count),
            Math.sqrt(largestSquare),
            consistency.degreesOfFreedom(),
            consistency.mean(),
            consistency.insideFraction());
  }
}
