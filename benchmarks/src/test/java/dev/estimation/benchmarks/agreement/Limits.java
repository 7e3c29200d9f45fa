package dev.estimation.benchmarks.agreement;

/**
 * How close a run must come to the expected one.
 *
 * @param distance of estimates, in standard deviations
 * @param score relative, of scores against truth and of mean innovations
 * @param logLikelihood absolute
 * @param relativeLogLikelihood relative; the wider of the two counts
 */
record Limits(double distance, double score, double logLikelihood, double relativeLogLikelihood) {
  static Limits of(double distance, double score, double logLikelihood) {
    return new Limits(distance, score, logLikelihood, 0);
  }

  /** Scores move as much as the estimates they are made of. */
  static Limits wide(double distance, double relativeLogLikelihood) {
    return new Limits(distance, distance, 0, relativeLogLikelihood);
  }

  double logLikelihoodNear(double expected) {
    return Math.max(logLikelihood, relativeLogLikelihood * Math.abs(expected));
  }
}
