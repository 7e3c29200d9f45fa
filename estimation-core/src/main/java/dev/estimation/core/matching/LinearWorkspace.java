package dev.estimation.core.matching;

import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/** Carries moments by the derivatives at the mean; see {@link Linearisation}. */
final class LinearWorkspace extends TaylorWorkspace {
  private final DerivativeSource source;
  private final RootProduct root;
  private final Jacobian jacobian;
  private final double[] derivatives;
  private final double[] hessians;
  private final double[] column;

  LinearWorkspace(
      Space input, Space output, VectorFunction function, DerivativeSource source, Form form) {
    super(input, output, function, source.hessian() != null, form);
    this.root = new RootProduct(active, 0);
    this.source = source;
    this.jacobian = source.jacobian();
    int entries = output.dimension() * input.dimension();
    this.derivatives = new double[entries];
    this.hessians = new double[source.hessian() == null ? 0 : entries * input.dimension()];
    this.column = new double[active.count()];
  }

  @Override
  MatchingStatus expand(double[] mean, double[] given) {
    Arrays.fill(derivatives, 0);
    jacobian.evaluate(copied(mean), given, derivatives);
    jacobians += 1 + source.furtherJacobians();
    function.count(source.evaluations());
    if (fillSlopes() != 0) {
      return MatchingStatus.JACOBIAN_NOT_FINITE;
    }
    if (source.hessian() != null) {
      Arrays.fill(hessians, 0);
      source.hessian().evaluate(copied(mean), given, hessians);
      if (!Checks.allFinite(hessians)) {
        return MatchingStatus.JACOBIAN_NOT_FINITE;
      }
      fillBends();
    }
    return MatchingStatus.MATCHED;
  }

  /** G B, over active inputs. Zero, or NaN if G has something that is not finite. */
  private double fillSlopes() {
    return root.fill(derivatives, outputSpace.dimension(), slopesAndBends(), 0, width());
  }

  /** M_i = B' H_i B over active inputs, column by column of H_i B. */
  private void fillBends() {
    double[] factor = active.factor().data;
    int k = active.count();
    int n = inputSpace.dimension();
    for (int i = 0; i < outputSpace.dimension(); i++) {
      for (int b = 0; b < k; b++) {
        fillColumn(i, b);
        for (int a = b; a < k; a++) {
          double sum = 0;
          for (int r = a; r < k; r++) {
            sum += factor[active.input(r) * n + a] * column[r];
          }
          slopesAndBends()[i * width() + bend(a, b)] = sum;
        }
      }
    }
  }

  /** Column b of H_i B. */
  private void fillColumn(int i, int b) {
    double[] factor = active.factor().data;
    int k = active.count();
    int n = inputSpace.dimension();
    for (int r = b; r < k; r++) {
      column[r] = 0;
      for (int s = b; s < k; s++) {
        column[r] += second(i, active.input(r), active.input(s)) * factor[active.input(s) * n + b];
      }
    }
  }

  /** An entry of H_i, from its lower triangle. */
  private double second(int i, int j, int l) {
    int n = inputSpace.dimension();
    return hessians[(i * n + Math.max(j, l)) * n + Math.min(j, l)];
  }

  @Override
  String jacobianFailure() {
    int n = inputSpace.dimension();
    int bad = Checks.firstNotFinite(derivatives);
    if (bad >= 0) {
      return "Jacobian[" + bad / n + "][" + bad % n + "] must be finite, got " + derivatives[bad];
    }
    int second = Checks.firstNotFinite(hessians);
    return "Hessian[" + second / (n * n) + "][" + second / n % n + "][" + second % n
        + "] must be finite, got " + hessians[second];
  }
}
