package dev.estimation.filters.consistency;

/**
 * Counts normalised squared errors (or innovations) of one kind: their mean, and the share that lies
 * inside the two-sided 95 % bounds. <i>Confined to one thread</i>; allocates only when built.
 */
public final class ConsistencyTally {
  private final int degreesOfFreedom;
  private final ChiSquareBounds bounds;
  private long count;
  private long inside;
  private double sum;

  /**
   * A tally of values with the given degrees of freedom.
   *
   * @param degreesOfFreedom 1 or more
   */
  public ConsistencyTally(int degreesOfFreedom) {
    this.degreesOfFreedom = degreesOfFreedom;
    this.bounds = ChiSquareBounds.twoSided(0.95, degreesOfFreedom);
  }

  /**
   * Counts one value; NaN lies outside and makes the mean NaN.
   *
   * @param squared a normalised squared error or innovation
   */
  public void add(double squared) {
    count++;
    sum += squared;
    if (bounds.contains(squared)) {
      inside++;
    }
  }

  /** {@return the degrees of freedom of each value} */
  public int degreesOfFreedom() {
    return degreesOfFreedom;
  }

  /** {@return how many values were counted} */
  public long count() {
    return count;
  }

  /** {@return their mean; about the degrees of freedom if covariances are honest. NaN if there are none} */
  public double mean() {
    return sum / count;
  }

  /** {@return the share inside the two-sided 95 % bounds. NaN if there are none} */
  public double insideFraction() {
    return (double) inside / count;
  }
}
