package dev.estimation.core.accuracy;

import dev.estimation.core.function.VectorFunction;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.special.Erf;

/** Functions of one number by the names of gaussian_scalar_moments.csv. */
final class Scalars {
  private Scalars() {}

  static VectorFunction named(String name) {
    DoubleUnaryOperator function = switch (name) {
      case "exp(x)" -> Math::exp;
      case "sin(x)" -> Math::sin;
      case "cos(x)" -> Math::cos;
      case "|x|" -> Math::abs;
      case "max(x;0)" -> x -> Math.max(x, 0);
      case "x*exp(-x^2/2)" -> x -> x * Math.exp(-x * x / 2);
      case "Phi(x)" -> x -> Erf.erfc(-x / Math.sqrt(2)) / 2;
      default -> power(Integer.parseInt(name.substring(2)));
    };
    return (input, given, output) -> output[0] = function.applyAsDouble(input[0]);
  }

  private static DoubleUnaryOperator power(int exponent) {
    return x -> Math.pow(x, exponent);
  }
}
