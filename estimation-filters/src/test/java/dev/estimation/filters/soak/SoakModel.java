package dev.estimation.filters.soak;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.testing.RandomGaussians;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.NormOps_DDRM;

/**
 * A random model: x' = F x + b s sin(x_next / s), z = H x_read + b s sin(x_read / s), with noise of many
 * magnitudes. Rows of F have absolute sums of 0.85 at most, so that the motion contracts. b = 0 is linear, else 0.1;
 * s is three times the first spread or more, and thirty times the process noise, so that bends are mild over the
 * spread of every step.
 */
final class SoakModel {
  final int n;
  final int m;
  final double[] priorDeviations;
  final int[] read;
  private final DMatrixRMaj f;
  private final DMatrixRMaj h;
  private final double bend;
  private final double scale;
  private final DMatrixRMaj processNoise;
  private final DMatrixRMaj measurementNoise;

  SoakModel(RandomGaussians random, int n, boolean mayBend) {
    this.n = n;
    this.m = 1 + (int) random.uniform(0, 3);
    this.f = random.matrix(n, n);
    CommonOps_DDRM.scale(0.85 / NormOps_DDRM.inducedPInf(f), f);
    this.read = Arrays.copyOf(random.permutation(n), 1 + (int) random.uniform(0, n));
    this.h = random.matrix(m, read.length);
    this.bend = mayBend && random.uniform(0, 1) < 0.7 ? 0.1 : 0;
    this.priorDeviations = powers(random, n, -2, 2);
    double[] driven = powers(random, n, -4, 0);
    this.processNoise = scaled(random.covariance(n), driven);
    this.scale = Math.max(3 * largest(priorDeviations), 30 * largest(driven));
    this.measurementNoise = scaled(random.covariance(m), powers(random, m, -4, 1));
  }

  private static double largest(double... values) {
    return Arrays.stream(values).max().orElseThrow();
  }

  private static double[] powers(RandomGaussians random, int count, double low, double high) {
    double[] result = new double[count];
    Arrays.setAll(result, i -> Math.pow(10, random.uniform(low, high)));
    return result;
  }

  private static DMatrixRMaj scaled(DMatrixRMaj covariance, double... deviations) {
    for (int i = 0; i < deviations.length; i++) {
      for (int j = 0; j < deviations.length; j++) {
        covariance.set(i, j, covariance.get(i, j) * deviations[i] * deviations[j]);
      }
    }
    return covariance;
  }

  double processDeviation(int i) {
    return Math.sqrt(processNoise.get(i, i));
  }

  double measurementDeviation(int i) {
    return Math.sqrt(measurementNoise.get(i, i));
  }

  DifferentiableMotion motion() {
    return new DifferentiableMotion() {
      private final Space space = Space.reals(n);

      @Override
      public Space stateSpace() {
        return space;
      }

      @Override
      public void move(double[] x, double[] control, double time, double dt, double[] next) {
        for (int i = 0; i < n; i++) {
          double sum = bend * scale * Math.sin(x[(i + 1) % n] / scale);
          for (int j = 0; j < n; j++) {
            sum += f.data[i * n + j] * x[j];
          }
          next[i] = sum;
        }
      }

      @Override
      public void moveJacobian(double[] x, double[] control, double time, double dt, double[] j) {
        System.arraycopy(f.data, 0, j, 0, n * n);
        for (int i = 0; i < n; i++) {
          int next = (i + 1) % n;
          j[i * n + next] += bend * Math.cos(x[next] / scale);
        }
      }

      @Override
      public void processNoise(double[] x, double[] control, double time, double dt, double[] q) {
        System.arraycopy(processNoise.data, 0, q, 0, n * n);
      }
    };
  }

  DifferentiableSensor sensor() {
    return new DifferentiableSensor() {
      private final Space space = Space.reals(m);
      private final Structure structure = Structure.UNKNOWN.withActiveInputs(read);

      @Override
      public Space measurementSpace() {
        return space;
      }

      @Override
      public void measure(double[] x, double[] given, double[] z) {
        for (int r = 0; r < m; r++) {
          double sum = bend * scale * Math.sin(x[read[r % read.length]] / scale);
          for (int a = 0; a < read.length; a++) {
            sum += h.data[r * read.length + a] * x[read[a]];
          }
          z[r] = sum;
        }
      }

      @Override
      public void measureJacobian(double[] x, double[] given, double[] j) {
        for (int r = 0; r < m; r++) {
          for (int a = 0; a < read.length; a++) {
            j[r * n + read[a]] = h.data[r * read.length + a];
          }
          int bent = read[r % read.length];
          j[r * n + bent] += bend * Math.cos(x[bent] / scale);
        }
      }

      @Override
      public void measurementNoise(double[] x, double[] given, double[] r) {
        System.arraycopy(measurementNoise.data, 0, r, 0, m * m);
      }

      @Override
      public Structure structure() {
        return structure;
      }
    };
  }
}
