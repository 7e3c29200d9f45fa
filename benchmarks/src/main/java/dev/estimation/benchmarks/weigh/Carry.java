package dev.estimation.benchmarks.weigh;

import dev.estimation.core.accuracy.OperatingPoint;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.Use;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;

/** A call of a matching, as it comes in: valid while the call lasts. All it tells is only read. */
final class Carry {
  private final Target target;
  private final Moments input;
  private final double[] given;
  private final Covariance noise;
  private final Use use;

  /**
   * A call.
   *
   * @param target what moments are carried through; one object for all calls of one workspace
   * @param noise added to the output; null if it is inside the function
   */
  Carry(Target target, Moments input, double[] given, Covariance noise, Use use) {
    this.target = target;
    this.input = input;
    this.given = given;
    this.noise = noise;
    this.use = use;
  }

  /** A function and the spaces that it goes between. */
  record Target(VectorFunction function, Space input, Space output) {
    int nonlinearInputs() {
      return function.structure().nonlinearInputs(input.dimension()).length;
    }
  }

  /** {@return the operating point, copied} */
  OperatingPoint point() {
    int m = target.output.dimension();
    DMatrixRMaj added = noise == null ? new DMatrixRMaj(m, m) : noise.matrix().copy();
    Gaussian known =
        Gaussian.of(target.input, input.mean().clone(), input.covariance().copy());
    return OperatingPoint.of(known, added, given);
  }

  Target target() {
    return target;
  }

  Moments input() {
    return input;
  }

  double[] given() {
    return given;
  }

  /** Null if it is inside the function. */
  Covariance noise() {
    return noise;
  }

  Use use() {
    return use;
  }
}
