package dev.estimation.core.accuracy;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import java.util.NoSuchElementException;
import java.util.function.Supplier;
import org.ejml.data.DMatrixRMaj;

/**
 * Independent draws of a Gaussian in a space, as {@link SampledOutput} takes them: the mean displaced by L xi.
 * The same seed gives the same draws on every Java version. <i>Confined to one thread.</i>
 */
public final class GaussianDraws implements Supplier<double[]> {
  private final Space space;
  private final double[] mean;
  private final DMatrixRMaj factor;
  private final UnitPoints points;
  private int next;

  /**
   * A number of draws.
   *
   * @param space where the Gaussian lives
   * @param value mean and covariance
   * @param count how many, from 2 to {@link UnitPoints#LARGEST_SIZE}
   * @param seed of a {@code SplittableRandom}
   */
  public GaussianDraws(Space space, Gaussian value, int count, long seed) {
    Moments moments = new Moments(space);
    moments.set(value);
    moments.factor();
    this.space = space;
    this.mean = value.mean();
    this.factor = moments.lowerFactor();
    this.points = RandomRule.independent(count, seed).points(space.dimension());
  }

  /**
   * {@return the next draw}
   *
   * @throws NoSuchElementException if all have been given
   */
  @Override
  public double[] get() {
    if (next == points.size()) {
      throw new NoSuchElementException("all " + points.size() + " draws have been given");
    }
    double[] tangent = new double[space.dimension()];
    for (int i = 0; i < tangent.length; i++) {
      for (int j = 0; j <= i; j++) {
        tangent[i] += factor.get(i, j) * points.coordinate(next, j);
      }
    }
    next++;
    double[] point = new double[mean.length];
    space.displace(mean, tangent, point);
    return point;
  }
}
