package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.DecimalNumber;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.UnscentedRule;
import java.util.List;

/**
 * Reads methods: {@code linear}, {@code unscented:ALPHA,BETA,KAPPA} (KAPPA a number, or a number
 * less the dimension, as in {@code 3-n}), {@code cubature}, {@code hermite:NODES}.
 */
final class MethodParser {
  static final String FORMS = "linear, unscented:ALPHA,BETA,KAPPA, cubature, hermite:NODES";

  /** What is run when nothing is asked for. */
  static final List<String> DEFAULT = List.of(
      "linear",
      "unscented:1,2,0",
      "unscented:0.001,2,0",
      "unscented:1,0,3-n",
      "cubature",
      "hermite:3");

  private static final String LESS_DIMENSION = "-n";

  private MethodParser() {}

  static Method parse(String typed) {
    try {
      return new Method(typed, matching(typed));
    } catch (IllegalArgumentException refused) {
      throw new BadInputException("method " + typed + ": " + refused.getMessage(), refused);
    }
  }

  private static MomentMatching matching(String typed) {
    int colon = typed.indexOf(':');
    String name = colon < 0 ? typed : typed.substring(0, colon);
    String[] numbers = colon < 0 ? new String[0] : typed.substring(colon + 1).split(",", -1);
    return switch (name) {
      case "linear" -> {
        requireCount(typed, numbers, 0);
        yield Linearisation.firstOrder();
      }
      case "cubature" -> {
        requireCount(typed, numbers, 0);
        yield PointMatching.of(CubatureRule.degreeThree());
      }
      case "unscented" -> {
        requireCount(typed, numbers, 3);
        yield PointMatching.of(unscented(typed, numbers));
      }
      case "hermite" -> {
        requireCount(typed, numbers, 1);
        yield PointMatching.of(GaussHermiteRule.product(nodes(typed, numbers[0])));
      }
      default ->
        throw new BadInputException("method must be one of " + FORMS + "; got '" + typed + "'");
    };
  }

  private static void requireCount(String typed, String[] numbers, int wanted) {
    if (numbers.length != wanted) {
      throw new BadInputException("method " + typed + ": must have " + wanted + " numbers, got "
          + numbers.length + " (forms: " + FORMS + ")");
    }
  }

  private static UnscentedRule unscented(String typed, String[] numbers) {
    double alpha = number(typed, "ALPHA", numbers[0]);
    double beta = number(typed, "BETA", numbers[1]);
    String kappa = numbers[2];
    if (!kappa.endsWith(LESS_DIMENSION)) {
      return UnscentedRule.scaled(alpha, beta, number(typed, "KAPPA", kappa));
    }
    String offset = kappa.substring(0, kappa.length() - LESS_DIMENSION.length());
    double total = number(typed, "KAPPA", offset);
    return UnscentedRule.scaled(alpha, beta, dimension -> total - dimension);
  }

  private static double number(String typed, String what, String text) {
    return DecimalNumber.parse(text)
        .orElseThrow(() -> new BadInputException(
            "method " + typed + ": " + what + " must be a finite number, got '" + text + "'"));
  }

  private static int nodes(String typed, String text) {
    try {
      return Integer.parseInt(text);
    } catch (NumberFormatException notWhole) {
      throw new BadInputException(
          "method " + typed + ": NODES must be a whole number, got '" + text + "'", notWhole);
    }
  }
}
