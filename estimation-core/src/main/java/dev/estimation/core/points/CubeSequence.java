package dev.estimation.core.points;

import org.apache.commons.math3.primes.Primes;
import org.apache.commons.math3.random.HaltonSequenceGenerator;
import org.apache.commons.math3.random.RandomVectorGenerator;
import org.apache.commons.math3.random.SobolSequenceGenerator;

/** The sequences in the unit cube that commons-math3 has. */
enum CubeSequence {
  SOBOL("Sobol", 1000) {
    @Override
    RandomVectorGenerator generator(int dimension) {
      return new SobolSequenceGenerator(dimension);
    }
  },
  HALTON("Halton", 40) {
    /** Weights of null keep the digits as they are; the generator scrambles them otherwise. */
    @Override
    RandomVectorGenerator generator(int dimension) {
      int[] bases = new int[dimension];
      int prime = 1;
      for (int axis = 0; axis < dimension; axis++) {
        prime = Primes.nextPrime(prime + 1);
        bases[axis] = prime;
      }
      return new HaltonSequenceGenerator(dimension, bases, null);
    }
  };

  private final String title;
  private final int largestDimension;

  CubeSequence(String title, int largestDimension) {
    this.title = title;
    this.largestDimension = largestDimension;
  }

  /** A generator that begins at point 0. */
  abstract RandomVectorGenerator generator(int dimension);

  String title() {
    return title;
  }

  /** Points 1 to count; point 0 is the origin. */
  double[][] points(int count, int dimension) {
    if (dimension > largestDimension) {
      throw new IllegalArgumentException("a " + title + " rule has at most " + largestDimension
          + " dimensions, got " + dimension + "; declare active inputs, or take another rule");
    }
    RandomVectorGenerator generator = generator(dimension);
    generator.nextVector();
    double[][] points = new double[count][];
    for (int i = 0; i < count; i++) {
      points[i] = generator.nextVector();
    }
    return points;
  }
}
