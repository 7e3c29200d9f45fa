package dev.estimation.core.gaussian;

import dev.estimation.core.internal.RowOrder;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.ejml.data.DMatrixRMaj;

/** An estimate of a part of a state, as equations of a displacement from a reference. Immutable. */
final class PartialEstimate {
  private final double[][] map;
  private final Covariance covariance;
  private final Distance distance;
  private final double[] point;
  private final int[] components;

  /** How far an estimate lies from a reference, and how large the numbers are that are subtracted. */
  @FunctionalInterface
  private interface Distance {
    void fill(double[] reference, double[] difference, double[] size);
  }

  private PartialEstimate(
      double[][] map,
      DMatrixRMaj covariance,
      Distance distance,
      double[] point,
      int... components) {
    this.map = map;
    this.covariance = new Covariance(covariance.numRows);
    this.covariance.changeMatrix().setTo(covariance);
    this.covariance.factor(); // true: it has been checked
    this.distance = distance;
    this.point = point;
    this.components = components;
  }

  static PartialEstimate ofAll(Space space, Gaussian estimate) {
    Moments moments = new Moments(space);
    moments.set(estimate);
    int[] all = RowOrder.natural(space.dimension());
    return ofComponents(space, estimate.mean(), moments.covariance(), all);
  }

  /** Everything is kept. */
  static PartialEstimate ofComponents(
      Space space, double[] point, DMatrixRMaj covariance, int... components) {
    Distance distance = componentsOf(space, point, components);
    return new PartialEstimate(
        selection(space, components), covariance, distance, point, components);
  }

  /** Everything is kept. */
  static PartialEstimate ofMap(DMatrixRMaj map, Space output, Gaussian value) {
    double[][] rows = new double[map.numRows][map.numCols];
    for (int i = 0; i < map.getNumElements(); i++) {
      rows[i / map.numCols][i % map.numCols] = map.data[i];
    }
    double[] mean = value.mean();
    Distance distance = (reference, difference, size) -> {
      double[] predicted = new double[rows.length];
      for (int r = 0; r < rows.length; r++) {
        size[r] = Math.abs(mean[r]);
        for (int c = 0; c < reference.length; c++) {
          predicted[r] += rows[r][c] * reference[c];
          size[r] += Math.abs(rows[r][c] * reference[c]);
        }
      }
      output.difference(mean, predicted, difference);
    };
    return new PartialEstimate(rows, value.covariance(), distance, null);
  }

  private static double[][] selection(Space space, int... components) {
    double[][] rows = new double[components.length][space.dimension()];
    for (int i = 0; i < components.length; i++) {
      rows[i][components[i]] = 1;
    }
    return rows;
  }

  private static Distance componentsOf(Space space, double[] point, int... components) {
    int d = space.dimension();
    return (reference, difference, size) -> {
      double[] all = new double[d];
      space.difference(point, reference, all);
      for (int i = 0; i < components.length; i++) {
        int component = components[i];
        difference[i] = all[component];
        // Numbers and components match one by one, or the largest number stands for any.
        size[i] = space.storage() == d
            ? Math.abs(point[component]) + Math.abs(reference[component])
            : largest(point) + largest(reference);
      }
    };
  }

  private static double largest(double[] values) {
    return Arrays.stream(values).map(Math::abs).max().orElse(0);
  }

  /** The mean if it is that of the whole state, else null. */
  double[] whole() {
    return components.length == map[0].length ? point : null;
  }

  /** Copies the numbers it has into a point of as many numbers as components, where none is known yet. */
  void addTo(double[] target, boolean[] known) {
    for (int component : components) {
      if (!known[component]) {
        target[component] = point[component];
        known[component] = true;
      }
    }
  }

  /** Adds the independent equations of this estimate. */
  void split(double[] reference, int source, List<LinearEquation> target) {
    double[] difference = new double[map.length];
    double[] size = new double[map.length];
    distance.fill(reference, difference, size);
    List<LinearEquation> rows = new ArrayList<>();
    for (int r = 0; r < map.length; r++) {
      rows.add(new LinearEquation(map[r], difference[r], 0, size[r], source));
    }
    LinearEquation.split(rows, covariance, target);
  }
}
