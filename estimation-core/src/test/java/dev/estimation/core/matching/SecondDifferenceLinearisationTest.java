package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.testing.PlainFunction;

/** Second-order linearisation of functions without derivatives. */
class SecondDifferenceLinearisationTest extends MomentMatchingContract
    implements FrozenInputChecks {
  @Override
  public MomentMatching matching(double... inputScales) {
    return Linearisation.secondOrder().withInputScales(inputScales);
  }

  @Override
  public VectorFunction offered(VectorFunction function) {
    return new PlainFunction(function);
  }

  /** The centre, 2 k for the Jacobian, 2 k^2 + 1 for the Hessian. */
  @Override
  public int evaluations(int carried) {
    return 2 * carried * (carried + 1) + 2;
  }

  @Override
  public int jacobians(int carried) {
    return 1;
  }

  /** The smaller of the steps, in scales: the cube root of eps. */
  @Override
  public double spread(int carried) {
    return Math.cbrt(0x1p-52);
  }

  /** Differences of four values over the square of a step of 1.2e-4. */
  @Override
  public double amplification(int carried) {
    return carried / Math.sqrt(0x1p-52);
  }

  /** With a scale of 1 the step of the Jacobian is 6e-6, and errors of the Hessian are squared. */
  @Override
  public double largestOffset() {
    return 1e3;
  }
}
