package dev.estimation.core.points;

import java.util.ArrayList;
import java.util.List;

/** Moments and other views of unit points, by their definition. */
final class UnitMoments {
  private UnitMoments() {}

  /** sum w_i prod_j xi_ij^powers_j over all points but the centre; the powers name the monomial. */
  static double of(UnitPoints points, int[] powers) {
    double sum = 0;
    for (int i = 0; i < points.size(); i++) {
      double term = points.weight(i);
      for (int axis = 0; axis < powers.length && term != 0; axis++) {
        if (powers[axis] > 0) {
          term *= power(points.coordinate(i, axis), powers[axis]);
        }
      }
      sum += term;
    }
    return sum;
  }

  private static double power(double base, int exponent) {
    double result = 1;
    for (int i = 0; i < exponent; i++) {
      result *= base;
    }
    return result;
  }

  /** The exact moment under N(0, I): the product of (k - 1)!! for even powers k, else 0. */
  static double exact(int[] powers) {
    double result = 1;
    for (int power : powers) {
      if (power % 2 == 1) {
        return 0;
      }
      for (int factor = power - 1; factor > 1; factor -= 2) {
        result *= factor;
      }
    }
    return result;
  }

  /** All coordinates of a point. */
  static double[] place(UnitPoints points, int index) {
    double[] place = new double[points.dimension()];
    for (int entry = points.start(index); entry < points.start(index + 1); entry++) {
      place[points.axis(entry)] = points.coordinate(entry);
    }
    return place;
  }

  /** A place as a key, with one zero only. */
  static List<Double> key(double[] place) {
    List<Double> key = new ArrayList<>();
    for (double coordinate : place) {
      key.add(coordinate == 0 ? 0.0 : coordinate);
    }
    return key;
  }

  /** Every number of the points, bit for bit. */
  static List<Long> bits(UnitPoints points) {
    List<Long> bits = new ArrayList<>();
    bits.add(Double.doubleToRawLongBits(points.centreMeanWeight()));
    bits.add(Double.doubleToRawLongBits(points.centreCovarianceWeight()));
    for (int i = 0; i < points.size(); i++) {
      bits.add(Double.doubleToRawLongBits(points.weight(i)));
      for (double coordinate : place(points, i)) {
        bits.add(Double.doubleToRawLongBits(coordinate));
      }
    }
    return bits;
  }
}
