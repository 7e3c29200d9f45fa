package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.testing.OnceDifferentiable;

/** Second-order linearisation of functions that have a Jacobian and no Hessian. */
class JacobianDifferenceLinearisationTest extends MomentMatchingContract
    implements FrozenInputChecks {
  @Override
  public MomentMatching matching(double... inputScales) {
    return Linearisation.secondOrder().withInputScales(inputScales);
  }

  @Override
  public VectorFunction offered(VectorFunction function) {
    return new OnceDifferentiable(function);
  }

  @Override
  public int evaluations(int carried) {
    return 1;
  }

  @Override
  public int jacobians(int carried) {
    return 1 + 2 * carried;
  }

  @Override
  public double spread(int carried) {
    return 1;
  }

  /** Differences of Jacobians of size 1 over steps of 6e-6. */
  @Override
  public double amplification(int carried) {
    return carried / Math.cbrt(0x1p-52);
  }
}
