package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.DecimalNumber;
import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.SpreadLinearisation;
import dev.estimation.core.matching.ToleranceMatching;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.LatinHypercubeRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.QuasiRandomRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.points.SimplexRule;
import dev.estimation.core.points.SparseGridRule;
import dev.estimation.core.points.UnscentedRule;
import dev.estimation.filters.filter.IteratedUpdate;
import java.util.List;
import java.util.function.IntToDoubleFunction;

/**
 * Reads methods: {@code linear}, {@code linear-iterated}, {@code linear-iterated:line-search},
 * {@code linear-spread}, {@code linear2-spread}, {@code linear2-axes} (linearisation of first and second
 * order by differences over the spread), {@code tolerance:EPS}, {@code unscented:ALPHA,BETA,KAPPA} (KAPPA a number, or a number less the dimension, as in {@code
 * 3-n}), {@code unscented:KAPPA}, {@code deviations:S}, {@code simplex} or {@code simplex:WEIGHT} (of the
 * centre), {@code cubature}, {@code cubature5}, {@code mcnamee-stenger}, {@code hermite:NODES}, {@code
 * sparse:LEVEL}, {@code sparse-degree:DEGREE}, {@code random:COUNT,SEED}, {@code antithetic:PAIRS,SEED},
 * {@code latin:COUNT,SEED}, {@code sobol:COUNT}, {@code halton:COUNT}. The last five are standardised, as
 * filters want them.
 */
final class MethodParser {
  static final String FORMS = "linear, linear-iterated, linear-iterated:line-search,"
      + " linear-spread, linear2-spread, linear2-axes, tolerance:EPS,"
      + " unscented:ALPHA,BETA,KAPPA, unscented:KAPPA, deviations:S, simplex, simplex:WEIGHT,"
      + " cubature, cubature5, mcnamee-stenger, hermite:NODES, sparse:LEVEL, sparse-degree:DEGREE,"
      + " random:COUNT,SEED, antithetic:PAIRS,SEED, latin:COUNT,SEED, sobol:COUNT, halton:COUNT";

  /** What is run when nothing is asked for. */
  static final List<String> DEFAULT = List.of(
      "linear",
      "unscented:1,2,0",
      "unscented:0.001,2,0",
      "unscented:1,0,3-n",
      "cubature",
      "hermite:3");

  private static final String LINE_SEARCH = "line-search";
  private static final String LESS_DIMENSION = "-n";

  private MethodParser() {}

  static Method parse(String typed) {
    try {
      return new Method(typed, kind(typed));
    } catch (IllegalArgumentException refused) {
      throw new BadInputException("method " + typed + ": " + refused.getMessage(), refused);
    }
  }

  private static FilterKind kind(String typed) {
    int colon = typed.indexOf(':');
    String name = colon < 0 ? typed : typed.substring(0, colon);
    String[] settings = colon < 0 ? new String[0] : typed.substring(colon + 1).split(",", -1);
    return switch (name) {
      case "linear" -> {
        requireCount(typed, settings, 0);
        yield FilterKind.of(Linearisation.firstOrder());
      }
      case "linear-spread", "linear2-spread", "linear2-axes" -> {
        requireCount(typed, settings, 0);
        yield FilterKind.of(overSpread(name));
      }
      case "tolerance" -> {
        requireCount(typed, settings, 1);
        yield FilterKind.of(ToleranceMatching.within(number(typed, "EPS", settings[0])));
      }
      case "linear-iterated" -> FilterKind.iterated(iteration(typed, settings));
      default -> FilterKind.of(PointMatching.of(rule(name, typed, settings)));
    };
  }

  private static MomentMatching overSpread(String name) {
    return switch (name) {
      case "linear-spread" -> SpreadLinearisation.firstOrder();
      case "linear2-spread" -> SpreadLinearisation.secondOrder();
      default -> SpreadLinearisation.secondOrderAlongAxes();
    };
  }

  private static IteratedUpdate iteration(String typed, String[] settings) {
    if (settings.length == 0) {
      return IteratedUpdate.undamped();
    }
    if (settings.length == 1 && settings[0].equals(LINE_SEARCH)) {
      return IteratedUpdate.lineSearch();
    }
    throw new BadInputException(
        "method " + typed + ": only " + LINE_SEARCH + " may follow (forms: " + FORMS + ")");
  }

  private static PointRule rule(String name, String typed, String[] settings) {
    return switch (name) {
      case "cubature" -> {
        requireCount(typed, settings, 0);
        yield CubatureRule.degreeThree();
      }
      case "cubature5" -> {
        requireCount(typed, settings, 0);
        yield CubatureRule.degreeFive();
      }
      case "mcnamee-stenger" -> {
        requireCount(typed, settings, 0);
        yield CubatureRule.mcNameeStenger();
      }
      case "unscented" -> unscented(typed, settings);
      case "deviations" -> {
        requireCount(typed, settings, 1);
        yield UnscentedRule.atDeviations(number(typed, "S", settings[0]));
      }
      case "simplex" -> simplex(typed, settings);
      case "hermite" -> {
        requireCount(typed, settings, 1);
        yield GaussHermiteRule.product(wholeNumber(typed, "NODES", settings[0]));
      }
      case "sparse" -> {
        requireCount(typed, settings, 1);
        yield SparseGridRule.ofLevel(wholeNumber(typed, "LEVEL", settings[0]));
      }
      case "sparse-degree" -> {
        requireCount(typed, settings, 1);
        yield SparseGridRule.ofDegree(wholeNumber(typed, "DEGREE", settings[0]));
      }
      case "random" -> {
        requireCount(typed, settings, 2);
        int count = wholeNumber(typed, "COUNT", settings[0]);
        yield RandomRule.independent(count, seed(typed, settings[1])).standardised();
      }
      case "antithetic" -> {
        requireCount(typed, settings, 2);
        int pairs = wholeNumber(typed, "PAIRS", settings[0]);
        yield RandomRule.antithetic(pairs, seed(typed, settings[1])).standardised();
      }
      case "latin" -> {
        requireCount(typed, settings, 2);
        int count = wholeNumber(typed, "COUNT", settings[0]);
        yield LatinHypercubeRule.of(count, seed(typed, settings[1])).standardised();
      }
      case "sobol" -> {
        requireCount(typed, settings, 1);
        yield QuasiRandomRule.sobol(wholeNumber(typed, "COUNT", settings[0])).standardised();
      }
      case "halton" -> {
        requireCount(typed, settings, 1);
        yield QuasiRandomRule.halton(wholeNumber(typed, "COUNT", settings[0])).standardised();
      }
      default ->
        throw new BadInputException("method must be one of " + FORMS + "; got '" + typed + "'");
    };
  }

  private static void requireCount(String typed, String[] settings, int wanted) {
    if (settings.length != wanted) {
      throw new BadInputException("method " + typed + ": must have " + wanted + " numbers, got "
          + settings.length + " (forms: " + FORMS + ")");
    }
  }

  private static UnscentedRule unscented(String typed, String[] numbers) {
    if (numbers.length == 1) {
      return UnscentedRule.symmetric(kappa(typed, numbers[0]));
    }
    requireCount(typed, numbers, 3);
    double alpha = number(typed, "ALPHA", numbers[0]);
    double beta = number(typed, "BETA", numbers[1]);
    return UnscentedRule.scaled(alpha, beta, kappa(typed, numbers[2]));
  }

  private static IntToDoubleFunction kappa(String typed, String text) {
    boolean lessDimension = text.endsWith(LESS_DIMENSION);
    int end = text.length() - (lessDimension ? LESS_DIMENSION.length() : 0);
    double total = number(typed, "KAPPA", text.substring(0, end));
    return dimension -> lessDimension ? total - dimension : total;
  }

  private static SimplexRule simplex(String typed, String[] numbers) {
    if (numbers.length == 0) {
      return SimplexRule.spherical();
    }
    requireCount(typed, numbers, 1);
    return SimplexRule.spherical(number(typed, "WEIGHT", numbers[0]));
  }

  private static double number(String typed, String what, String text) {
    return DecimalNumber.parse(text)
        .orElseThrow(() -> new BadInputException(
            "method " + typed + ": " + what + " must be a finite number, got '" + text + "'"));
  }

  private static int wholeNumber(String typed, String what, String text) {
    try {
      return Integer.parseInt(text);
    } catch (NumberFormatException notWhole) {
      throw notWhole(typed, what, text, notWhole);
    }
  }

  private static long seed(String typed, String text) {
    try {
      return Long.parseLong(text);
    } catch (NumberFormatException notWhole) {
      throw notWhole(typed, "SEED", text, notWhole);
    }
  }

  private static BadInputException notWhole(
      String typed, String what, String text, NumberFormatException cause) {
    return new BadInputException(
        "method " + typed + ": " + what + " must be a whole number, got '" + text + "'", cause);
  }
}
