package dev.estimation.core.evidence;

import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;

/** The distance of components 1 and 4 of six from the origin. */
final class ReadRange implements VectorFunction {
  @Override
  public void evaluate(double[] u, double[] given, double[] z) {
    z[0] = Math.hypot(u[1], u[4]);
  }

  @Override
  public Structure structure() {
    return Structure.UNKNOWN.withActiveInputs(1, 4);
  }
}
