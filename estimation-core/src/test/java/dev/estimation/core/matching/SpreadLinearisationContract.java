package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.testing.PlainFunction;

/** The contract for differences over the spread, of functions without derivatives. */
abstract class SpreadLinearisationContract extends MomentMatchingContract
    implements FrozenInputChecks {
  @Override
  public VectorFunction offered(VectorFunction function) {
    return new PlainFunction(function);
  }

  @Override
  public double spread(int carried) {
    return Math.sqrt(3);
  }

  /** A sixth of two deviations, each with the rounding of two values, for each input. */
  @Override
  public double amplification(int carried) {
    return 1 + 2 * carried / 3.0;
  }
}
