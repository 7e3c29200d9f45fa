package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.testing.PlainFunction;

/** First-order linearisation of functions without a Jacobian. */
class CentralDifferenceLinearisationTest extends MomentMatchingContract
    implements FrozenInputChecks {
  @Override
  public MomentMatching matching(double... inputScales) {
    return Linearisation.firstOrder().withInputScales(inputScales);
  }

  @Override
  public VectorFunction offered(VectorFunction function) {
    return new PlainFunction(function);
  }

  @Override
  public int evaluations(int carried) {
    return 1 + 2 * carried;
  }

  @Override
  public int jacobians(int carried) {
    return 1;
  }

  /** The step, in scales: the cube root of eps. */
  @Override
  public double spread(int carried) {
    return Math.cbrt(0x1p-52);
  }

  @Override
  public double amplification(int carried) {
    return 1;
  }

  /** With a scale of 1 the step is 6e-6: means of 1e9 would leave no digit. */
  @Override
  public double largestOffset() {
    return 1e6;
  }
}
