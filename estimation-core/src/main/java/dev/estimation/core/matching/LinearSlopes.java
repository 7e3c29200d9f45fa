package dev.estimation.core.matching;

import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.internal.Checks;
import java.util.Arrays;

/**
 * The columns A S of a function that is linear in some inputs once the others are given: g(u) = A(u_a) u_b + c(u_a), and
 * u_b = its mean given u_a, plus S s, s ~ N(0, I). A is the part of the Jacobian that belongs to u_b, or comes from one more
 * evaluation for each of them, exactly since g is linear in it.
 */
final class LinearSlopes {
  private final BaseWorkspace owner;
  private final int count;
  private final Jacobian jacobian;
  private final RootProduct root;
  private final double[] derivatives;
  private final double[] displacement;
  private final double[] moved;
  private final double[] image;
  private final double[] deviation;
  private boolean jacobianFault;

  /** Slopes by the active inputs from a number on. */
  LinearSlopes(BaseWorkspace owner, VectorFunction function, int nonlinear) {
    this.owner = owner;
    this.count = owner.active.count() - nonlinear;
    this.jacobian = function.structure().jacobian().orElse(null);
    this.root = new RootProduct(owner.active, nonlinear);
    int n = owner.inputSpace.dimension();
    int m = owner.outputSpace.dimension();
    this.derivatives = new double[m * n];
    this.displacement = new double[n];
    this.moved = new double[owner.inputSpace.storage()];
    this.image = new double[owner.outputSpace.storage()];
    this.deviation = new double[m];
  }

  /** How many evaluations the columns of a point take. */
  int evaluations() {
    return jacobian == null ? count : 0;
  }

  /** Fills the columns at a point, given its image, into rows a stride apart; false if a value is not finite. */
  boolean fill(
      int first, double[] point, double[] given, double[] output, double[] data, int stride) {
    jacobianFault = false;
    return jacobian == null
        ? fillByDifferences(first, point, given, output, data, stride)
        : fillByJacobian(first, point, given, data, stride);
  }

  private boolean fillByJacobian(
      int first, double[] point, double[] given, double[] data, int stride) {
    Arrays.fill(derivatives, 0);
    jacobian.evaluate(owner.copied(point), given, derivatives);
    owner.jacobians++;
    double zero = root.fill(derivatives, deviation.length, data, first, stride);
    jacobianFault = zero != 0;
    return !jacobianFault;
  }

  private boolean fillByDifferences(
      int first, double[] point, double[] given, double[] output, double[] data, int stride) {
    for (int q = 0; q < count; q++) {
      root.fillColumn(q, displacement);
      owner.inputSpace.displace(point, displacement, moved);
      if (!owner.function.evaluate(moved, given, image)) {
        return false;
      }
      owner.outputSpace.difference(image, output, deviation);
      for (int c = 0; c < deviation.length; c++) {
        data[c * stride + first + q] = deviation[c];
      }
    }
    return true;
  }

  /** The Jacobian of the last fill, over all inputs; only where there is one. */
  double[] derivatives() {
    return derivatives;
  }

  /** Why a fill was false. */
  MatchingStatus fault() {
    return jacobianFault ? MatchingStatus.JACOBIAN_NOT_FINITE : MatchingStatus.FUNCTION_NOT_FINITE;
  }

  /** The entry of the Jacobian that is not finite. */
  String failure() {
    int n = displacement.length;
    int bad = Checks.firstNotFinite(derivatives);
    return "Jacobian[" + bad / n + "][" + bad % n + "] must be finite, got " + derivatives[bad];
  }
}
