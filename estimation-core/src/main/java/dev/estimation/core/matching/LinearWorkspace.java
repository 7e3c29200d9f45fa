package dev.estimation.core.matching;

import dev.estimation.core.function.CentralDifferences;
import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/** Carries moments by the Jacobian at the mean; see {@link Linearisation}. */
final class LinearWorkspace extends BaseWorkspace {
  private final Jacobian jacobian;
  private final WeightedColumns columns;
  private final WeightedColumns nothing;
  private final double[] derivatives;
  private final double[] zero;
  private final int differenceEvaluations;

  LinearWorkspace(
      Space input, Space output, VectorFunction function, double[] inputScales, Form form) {
    super(input, output, function, function.structure().activeInputs(input.dimension()), form);
    Jacobian analytic = function.structure().jacobian().orElse(null);
    this.jacobian = analytic != null ? analytic : differences(input, output, function, inputScales);
    this.differenceEvaluations = analytic != null ? 0 : 2 * active.count();
    this.derivatives = new double[output.dimension() * input.dimension()];
    this.zero = new double[output.dimension()];
    double[] ones = new double[active.count()];
    Arrays.fill(ones, 1);
    this.columns = new WeightedColumns(output.dimension(), ones, form);
    this.nothing = new WeightedColumns(output.dimension(), new double[0], form);
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
  MatchingStatus match(double[] mean, double[] given, double[] outputMean) {
    Arrays.fill(derivatives, 0);
    jacobian.evaluate(copied(mean), given, derivatives);
    jacobians++;
    function.count(differenceEvaluations);
    if (!Checks.allFinite(derivatives)) {
      return MatchingStatus.JACOBIAN_NOT_FINITE;
    }
    fillColumns();
    outputSpace.displace(centre, zero, outputMean); // brings angles into their range
    return MatchingStatus.MATCHED;
  }

  /** G B over active inputs; Jacobians have many zeros, B is lower triangular there. */
  private void fillColumns() {
    double[] factor = active.factor().data;
    double[] data = columns.data();
    int k = active.count();
    int n = inputSpace.dimension();
    Arrays.fill(data, 0);
    for (int r = 0, at = 0; at < data.length; r++, at += k) {
      for (int a = 0; a < k; a++) {
        int row = active.input(a);
        double derivative = derivatives[r * n + row];
        if (derivative != 0) {
          for (int c = 0; c <= a; c++) {
            data[at + c] += derivative * factor[row * n + c];
          }
        }
      }
    }
  }

  @Override
  WeightedColumns columns() {
    return columns;
  }

  @Override
  WeightedColumns residuals() {
    return nothing;
  }

  /** W = (G B)'. */
  @Override
  void fillCross(double[] w) {
    double[] data = columns.data();
    int k = active.count();
    int m = outputSpace.dimension();
    for (int a = 0; a < k; a++) {
      for (int r = 0; r < m; r++) {
        w[a * m + r] = data[r * k + a];
      }
    }
  }

  @Override
  String jacobianFailure() {
    int n = inputSpace.dimension();
    int bad = Checks.firstNotFinite(derivatives);
    return "Jacobian[" + bad / n + "][" + bad % n + "] must be finite, got " + derivatives[bad];
  }
}
