package dev.estimation.core.matching;

import dev.estimation.core.function.CentralDifferences;
import dev.estimation.core.function.Hessian;
import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.JacobianDifferences;
import dev.estimation.core.function.SecondDifferences;
import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;

/**
 * Where derivatives come from, and what they cost. A function's own ones are taken before differences.
 *
 * @param jacobian the first derivatives
 * @param hessian the second, or null for the first order
 * @param evaluations of the function that one of each costs
 * @param furtherJacobians of the function that the Hessian costs
 */
record DerivativeSource(Jacobian jacobian, Hessian hessian, int evaluations, int furtherJacobians) {

  static DerivativeSource firstOrder(
      Space input, Space output, VectorFunction function, double[] inputScales) {
    Jacobian analytic = function.structure().jacobian().orElse(null);
    if (analytic != null) {
      return new DerivativeSource(analytic, null, 0, 0);
    }
    require("a Jacobian", inputScales);
    CentralDifferences differences = new CentralDifferences(input, output, function, inputScales);
    return new DerivativeSource(differences, null, differences.evaluations(), 0);
  }

  static DerivativeSource secondOrder(
      Space input, Space output, VectorFunction function, double[] inputScales) {
    DerivativeSource first = firstOrder(input, output, function, inputScales);
    Structure structure = function.structure();
    if (structure.hessian().isPresent()) {
      return first.with(structure.hessian().get(), 0, 0);
    }
    require("a Hessian", inputScales);
    if (structure.jacobian().isPresent()) {
      JacobianDifferences second = new JacobianDifferences(input, output, function, inputScales);
      return first.with(second, 0, second.jacobians());
    }
    SecondDifferences second = new SecondDifferences(input, output, function, inputScales);
    return first.with(second, second.evaluations(), 0);
  }

  private DerivativeSource with(Hessian second, int moreEvaluations, int moreJacobians) {
    return new DerivativeSource(
        jacobian, second, evaluations + moreEvaluations, furtherJacobians + moreJacobians);
  }

  private static void require(String what, double[] inputScales) {
    if (inputScales == null) {
      throw new IllegalArgumentException(
          "linearisation wants " + what + " and the function offers none; offer one, give input"
              + " scales for central differences, or take differences over the spread");
    }
  }
}
