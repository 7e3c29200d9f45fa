package dev.estimation.core.matching;

import dev.estimation.core.function.CentralDifferences;
import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.Products;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/** Carries moments by the Jacobian at the mean; see {@link Linearisation}. */
final class LinearWorkspace extends BaseWorkspace {
  private final Jacobian jacobian;
  private final double[] derivatives;
  private final double[] zero;
  private final double[] ones;
  private final int differenceEvaluations;

  LinearWorkspace(Space input, Space output, VectorFunction function, double[] inputScales) {
    super(input, output, function);
    Jacobian analytic = function.structure().jacobian().orElse(null);
    this.jacobian = analytic != null ? analytic : differences(input, output, function, inputScales);
    this.differenceEvaluations = analytic != null ? 0 : 2 * active.count();
    this.derivatives = new double[output.dimension() * input.dimension()];
    this.zero = new double[output.dimension()];
    this.ones = new double[active.count()];
    Arrays.fill(ones, 1);
  }

  private static Jacobian differences(
      Space input, Space output, VectorFunction function, double[] inputScales) {
    if (inputScales == null) {
      throw new IllegalArgumentException(
          "linearisation wants a Jacobian and the function offers none; offer one, or give"
              + " input scales for central differences");
    }
    return new CentralDifferences(input, output, function, inputScales);
  }

  @Override
  MatchingStatus match(double[] mean, double[] given, double[] outputMean, double[] covariance) {
    Arrays.fill(derivatives, 0);
    jacobian.evaluate(copied(mean), given, derivatives);
    jacobians++;
    function.count(differenceEvaluations);
    if (!Checks.allFinite(derivatives)) {
      return MatchingStatus.JACOBIAN_NOT_FINITE;
    }
    fillCross();
    Products.fillInnerProduct(
        cross.data, ones, active.count(), outputSpace.dimension(), covariance);
    outputSpace.displace(centre, zero, outputMean); // brings angles into their range
    return MatchingStatus.MATCHED;
  }

  /** W = (G B)', over active inputs; Jacobians have many zeros, B is lower triangular there. */
  private void fillCross() {
    double[] factor = active.columns().data;
    double[] w = cross.data;
    int k = active.count();
    int n = inputSpace.dimension();
    int m = outputSpace.dimension();
    Arrays.fill(w, 0);
    for (int a = 0; a < k; a++) {
      int row = active.input(a);
      for (int r = 0; r < m; r++) {
        double derivative = derivatives[r * n + row];
        if (derivative != 0) {
          for (int c = 0; c <= a; c++) {
            w[c * m + r] += derivative * factor[row * k + c];
          }
        }
      }
    }
  }

  @Override
  public void unexplainedCovariance(DMatrixRMaj result) {
    requireOutputShape(result);
    result.setTo(noise);
  }

  @Override
  String jacobianFailure() {
    int n = inputSpace.dimension();
    int bad = Checks.firstNotFinite(derivatives);
    return "Jacobian[" + bad / n + "][" + bad % n + "] must be finite, got " + derivatives[bad];
  }
}
