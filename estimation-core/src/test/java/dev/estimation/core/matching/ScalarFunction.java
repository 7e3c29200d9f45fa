package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import java.util.Map;
import java.util.function.DoubleUnaryOperator;
import org.apache.commons.math3.special.Erf;

/** Functions of one number, by the names that gaussian_scalar_moments.csv gives them. */
final class ScalarFunction {
  private static final Map<String, DoubleUnaryOperator> SMOOTH = Map.of(
      "x^2", x -> x * x,
      "x^3", x -> x * x * x,
      "x^4", x -> x * x * x * x,
      "x^5", x -> x * x * x * x * x,
      "exp(x)", Math::exp,
      "sin(x)", Math::sin,
      "cos(x)", Math::cos,
      "x*exp(-x^2/2)", x -> x * Math.exp(-x * x / 2),
      "Phi(x)", x -> Erf.erfc(-x / Math.sqrt(2)) / 2);

  private ScalarFunction() {}

  static boolean isSmooth(String name) {
    return SMOOTH.containsKey(name);
  }

  /** The power of a monomial, or 0 for another function. */
  static int power(String name) {
    return name.startsWith("x^") ? Integer.parseInt(name.substring(2)) : 0;
  }

  static VectorFunction named(String name) {
    return of(SMOOTH.get(name));
  }

  static VectorFunction of(DoubleUnaryOperator function) {
    return (input, given, output) -> output[0] = function.applyAsDouble(input[0]);
  }
}
