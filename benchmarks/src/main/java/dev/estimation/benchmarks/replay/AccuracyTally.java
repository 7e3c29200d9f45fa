package dev.estimation.benchmarks.replay;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.consistency.ConsistencyTally;
import java.util.Optional;

/** Compares estimates with truth, step by step. */
final class AccuracyTally {
  private final TruthComparison comparison;
  private final boolean headed;
  private final ConsistencyTally consistency;
  private final ScoreTally position = new ScoreTally();
  private final ScoreTally heading = new ScoreTally();

  AccuracyTally(Space stateSpace, Truth truth) {
    this.comparison = new TruthComparison(stateSpace, truth);
    this.headed = hasAngle(comparison);
    this.consistency = new ConsistencyTally(comparison.count());
  }

  private static boolean hasAngle(TruthComparison comparison) {
    for (int i = 0; i < comparison.count(); i++) {
      if (comparison.isAngle(i)) {
        return true;
      }
    }
    return false;
  }

  void add(double time, Gaussian estimate) {
    if (!comparison.compare(time, estimate)) {
      return;
    }
    position.add(square(false));
    heading.add(square(true));
    consistency.add(comparison.normalisedSquared());
  }

  /** The squared error of the angles, or of the rest. */
  private double square(boolean angles) {
    double square = 0;
    for (int i = 0; i < comparison.count(); i++) {
      if (comparison.isAngle(i) == angles) {
        square += comparison.error(i) * comparison.error(i);
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
