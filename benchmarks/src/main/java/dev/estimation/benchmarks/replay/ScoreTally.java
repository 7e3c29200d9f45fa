package dev.estimation.benchmarks.replay;

/** Sums up errors of one kind. */
final class ScoreTally {
  private long count;
  private double sumOfSquares;
  private double largestSquare;

  void add(double square) {
    count++;
    sumOfSquares += square;
    largestSquare = Math.max(largestSquare, square);
  }

  Score summary() {
    return count == 0
        ? new Score(Double.NaN, Double.NaN)
        : new Score(Math.sqrt(sumOfSquares / count), Math.sqrt(largestSquare));
  }
}
