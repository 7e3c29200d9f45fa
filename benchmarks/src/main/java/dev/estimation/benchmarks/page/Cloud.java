package dev.estimation.benchmarks.page;

import dev.estimation.core.accuracy.GaussianDraws;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * 20 000 draws of a state sent through a model, as differences from their own mean, and what a regression on the state leaves
 * of them, noise added: that is what an update takes a measurement to say beyond the state. The covariances are those of the
 * draws, each variance therefore off by about 1 % (one standard error) if the output is near Gaussian.
 */
final class Cloud {
  static final int DRAWS = 20_000;
  private static final long SEED = 20_260_101;

  private final CloudPoint point;
  private final int dimension;
  private final double[] centre;
  private final DMatrixRMaj units; // a row a draw: the state in unit coordinates
  private final DMatrixRMaj differences; // a row a draw
  private final DMatrixRMaj rests;

  /** Draws at a place. */
  Cloud(CloudPoint point) {
    this.point = point;
    this.dimension = point.output().dimension();
    this.centre = new double[point.output().storage()];
    this.units = new DMatrixRMaj(DRAWS, point.input().dimension());
    this.differences = new DMatrixRMaj(DRAWS, dimension);
    draw();
    centre();
    this.rests = rests();
  }

  private void draw() {
    GaussianDraws draws = new GaussianDraws(point.input(), point.prior(), DRAWS, SEED);
    Moments prior = new Moments(point.input());
    prior.set(point.prior());
    prior.factor();
    double[] mean = point.prior().mean();
    evaluate(mean, centre);
    double[] output = new double[centre.length];
    double[] tangent = new double[units.numCols];
    double[] difference = new double[dimension];
    for (int i = 0; i < DRAWS; i++) {
      double[] state = draws.get();
      point.input().difference(state, mean, tangent);
      solve(prior.lowerFactor(), tangent);
      System.arraycopy(tangent, 0, units.data, i * tangent.length, tangent.length);
      evaluate(state, output);
      point.output().difference(output, centre, difference);
      System.arraycopy(difference, 0, differences.data, i * dimension, dimension);
    }
  }

  private void evaluate(double[] state, double[] output) {
    Arrays.fill(output, Double.NaN);
    point.function().evaluate(state, point.given().clone(), output);
  }

  /** Solves L x = b in place; a direction without spread has no coordinate. */
  private static void solve(DMatrixRMaj lower, double[] b) {
    for (int i = 0; i < b.length; i++) {
      double sum = b[i];
      for (int j = 0; j < i; j++) {
        sum -= lower.get(i, j) * b[j];
      }
      b[i] = lower.get(i, i) == 0 ? 0 : sum / lower.get(i, i);
    }
  }

  /** Takes the mean off the differences and adds it to the centre. */
  private void centre() {
    double[] mean = new double[dimension];
    for (int i = 0; i < differences.data.length; i++) {
      mean[i % dimension] += differences.data[i] / DRAWS;
    }
    for (int i = 0; i < differences.data.length; i++) {
      differences.data[i] -= mean[i % dimension];
    }
    point.output().displace(centre.clone(), mean, centre);
  }

  /** Differences less their regression on unit coordinates, of which the covariance is 1, plus noise. */
  private DMatrixRMaj rests() {
    DMatrixRMaj slope = new DMatrixRMaj(units.numCols, dimension);
    CommonOps_DDRM.multTransA(1.0 / DRAWS, units, differences, slope);
    DMatrixRMaj left = differences.copy();
    CommonOps_DDRM.multAdd(-1, units, slope, left);
    Gaussian noise = Gaussian.of(new double[dimension], point.noise());
    GaussianDraws draws = new GaussianDraws(Space.reals(dimension), noise, DRAWS, SEED + 1);
    for (int i = 0; i < DRAWS; i++) {
      double[] added = draws.get();
      for (int j = 0; j < dimension; j++) {
        left.data[i * dimension + j] += added[j];
      }
    }
    return left;
  }

  private static DMatrixRMaj covariance(DMatrixRMaj rows) {
    DMatrixRMaj covariance = new DMatrixRMaj(rows.numCols, rows.numCols);
    CommonOps_DDRM.multTransA(1.0 / (DRAWS - 1), rows, rows, covariance);
    return covariance;
  }

  private static double[] row(DMatrixRMaj rows, int index) {
    return Arrays.copyOfRange(rows.data, index * rows.numCols, (index + 1) * rows.numCols);
  }

  /** The mean of the output. */
  double[] mean() {
    return centre;
  }

  /** The covariance of the output, without noise. */
  DMatrixRMaj covariance() {
    return covariance(differences);
  }

  /** What one draw differs from the mean by. */
  double[] difference(int draw) {
    return row(differences, draw);
  }

  /** The covariance of what regression leaves, noise included. */
  DMatrixRMaj restCovariance() {
    return covariance(rests);
  }

  /** What regression leaves of one draw, noise included. */
  double[] rest(int draw) {
    return row(rests, draw);
  }
}
