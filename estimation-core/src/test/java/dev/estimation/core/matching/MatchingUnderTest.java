package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertSameBits;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/**
 * What a contract test has to know of a matching, and how far rounding may take its results.
 *
 * <p>Three numbers tell the rounding: how far from the mean the function is evaluated (the nearer,
 * the fewer digits a deviation has), by how much weights amplify the rounding of the function, and
 * how many inputs are carried. {@link #ROUNDINGS} covers the constants of sums over points and
 * inputs.
 */
interface MatchingUnderTest {
  /** Units of eps that a result may be off beside the named factors: sums of up to 5^8 terms. */
  double ROUNDINGS = 64 * 0x1p-52;

  /** The matching, with a scale for each input in case it takes differences. */
  MomentMatching matching(double... inputScales);

  /** The form under test. */
  Form form();

  /** The matching, whose workspaces have the form under test. */
  default MomentMatching formed(double... inputScales) {
    MomentMatching matching = matching(inputScales);
    return (input, output, function, other) -> matching.workspace(input, output, function, form());
  }

  /** The function as this matching is to see it, e.g. without its Jacobian. */
  default VectorFunction offered(VectorFunction function) {
    return function;
  }

  /** Evaluations that a call costs when this many inputs are carried. */
  int evaluations(int carried);

  /** Jacobians that a call costs when this many inputs are carried. */
  default int jacobians(int carried) {
    return 0;
  }

  /** The smallest distance from the mean of an evaluation, in standard deviations or scales. */
  double spread(int carried);

  /** By how much the rounding of the function is multiplied in the mean. */
  double amplification(int carried);

  /** How many inputs are carried when a function reads some of all. */
  default int carried(int active, int whole) {
    return active;
  }

  /** The most inputs that tests carry. */
  default int largestDimension() {
    return 8;
  }

  /** The largest mean, in standard deviations, at which a covariance still has a digit. */
  default double largestOffset() {
    return 1e9;
  }

  /** The absolute error that rounding may make in a mean where numbers have the given magnitude. */
  default double meanRounding(int carried, double magnitude) {
    return ROUNDINGS * amplification(carried) * magnitude;
  }

  /**
   * The error that rounding may make in a covariance, relative to sqrt(p_ii p_jj): that of
   * deviations, and the square of that of the mean, which enters as a factor times delta delta'.
   *
   * @param magnitude the largest number among inputs and outputs
   * @param deviation the smallest standard deviation of those
   */
  default double covarianceRounding(int carried, double magnitude, double deviation) {
    double digits = magnitude / deviation;
    double mean = ROUNDINGS * amplification(carried) * digits;
    return ROUNDINGS * (carried + digits / spread(carried)) + 3 * mean * mean;
  }

  /**
   * The same where the function bends: the shift of the mean, of a deviation at most, is squared
   * with its rounding, times beta - alpha^2, 3 at most.
   */
  default double bentCovarianceRounding(int carried, double magnitude, double deviation) {
    double mean = ROUNDINGS * amplification(carried) * magnitude / deviation;
    return covarianceRounding(carried, magnitude, deviation) + 6 * mean;
  }

  /**
   * Matrices of entries of order 1 that follow from the same numbers in another order of inputs: the same bits
   * in covariance form; a factor that is reduced anew for that order has roundings of its own.
   */
  default void assertSame(String what, DMatrixRMaj expected, DMatrixRMaj actual, double rounding) {
    if (form() == Form.COVARIANCE) {
      assertSameBits(what, expected, actual);
    } else {
      double scale = Math.max(1, CommonOps_DDRM.elementMaxAbs(expected));
      assertMatrix(what, expected, actual, rounding, scale);
    }
  }

  /** Scales of 1 for every input. */
  static double[] unitScales(int inputs) {
    double[] scales = new double[inputs];
    Arrays.fill(scales, 1);
    return scales;
  }
}
