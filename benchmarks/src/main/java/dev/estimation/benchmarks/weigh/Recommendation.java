package dev.estimation.benchmarks.weigh;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Collectors;

/**
 * The one method to take, and why.
 *
 * <p>It is the method with the least evaluations and Jacobians a step of those whose error is within the tolerance at 99 % or
 * more of the points of every function; of equals the more accurate, then the first. Time plays no part, unless there is a
 * budget: then what is not within it is left out, and if nothing remains that is within the tolerance, or the most accurate
 * was wanted, it is the one with the smallest 99 % error.
 *
 * @param method empty if there is none to recommend
 * @param suffices whether it is within the tolerance
 * @param reason a sentence
 */
public record Recommendation(Optional<String> method, boolean suffices, String reason) {
  private static final double MUCH_FASTER = 0.7;

  /** {@return the recommendation} */
  public static Recommendation of(WeighedRun run, Wish wish) {
    for (FunctionWeight function : run.functions()) {
      if (function.points() == 0) {
        String reason =
            "none of the points of " + function.name() + " has a truth to hold methods against";
        return new Recommendation(Optional.empty(), false, reason);
      }
    }
    Recommendation recommendation = ofKnown(run, wish);
    return new Recommendation(
        recommendation.method, recommendation.suffices, recommendation.reason + unknown(run));
  }

  private static String unknown(WeighedRun run) {
    return run.functions().stream()
        .filter(function -> function.unknown() > 0)
        .map(function -> "; " + function.unknown() + " points of " + function.name()
            + " have no truth and do not count")
        .collect(Collectors.joining());
  }

  private static Recommendation ofKnown(WeighedRun run, Wish wish) {
    List<StepWeight> all =
        StepWeight.of(run.functions()).stream().filter(StepWeight::serves).toList();
    List<StepWeight> affordable = all.stream().filter(wish::affords).toList();
    Optional<StepWeight> cheapest = affordable.stream()
        .filter(StepWeight::suffices)
        .min(Comparator.comparingDouble(StepWeight::cost).thenComparingDouble(StepWeight::error));
    Optional<StepWeight> best = affordable.stream()
        .filter(weight -> Double.isFinite(weight.error()))
        .min(Comparator.comparingDouble(StepWeight::error));
    if (cheapest.isPresent() && !wish.mostAccurate()) {
      return new Recommendation(
          cheapest.map(StepWeight::method), true, reason(cheapest.get(), all, wish));
    }
    if (best.isPresent() && wish.hasBudget()) {
      return new Recommendation(
          best.map(StepWeight::method), best.get().suffices(), withinBudget(best.get(), wish));
    }
    return new Recommendation(Optional.empty(), false, none(all, affordable, wish, run));
  }

  private static String reason(StepWeight chosen, List<StepWeight> all, Wish wish) {
    List<String> parts = new ArrayList<>();
    parts.add(String.format(
        Locale.ROOT,
        "%s: error within %s at %s of the operating points, %s evaluations and Jacobians a step%s",
        chosen.method(),
        percent(wish.tolerance()),
        percent(1 - chosen.worstShare()),
        number(chosen.cost()),
        time(chosen)));
    if (chosen.worstShare() > 0) {
      parts.add(
          Double.isFinite(chosen.largest())
              ? "at the others its error is up to " + percent(chosen.largest())
              : "at some of the others it gives no result");
    }
    List<StepWeight> refused = all.stream()
        .filter(other -> !other.suffices() && other.cost() <= chosen.cost())
        .toList();
    parts.add(refused.isEmpty() ? "nothing that was weighed is cheaper" : refused(refused, wish));
    all.stream()
        .filter(other -> other.suffices() && other.micros() < MUCH_FASTER * chosen.micros())
        .min(Comparator.comparingDouble(StepWeight::micros))
        .ifPresent(other -> parts.add(other.method() + " suffices too and took less time, "
            + number(other.micros()) + " us"));
    return String.join("; ", parts);
  }

  /** The first of cheaper methods that do not suffice, and the one that comes nearest. */
  private static String refused(List<StepWeight> refused, Wish wish) {
    StepWeight first = refused.get(0);
    StepWeight nearest = nearest(refused);
    return exceeds(first, wish) + (nearest.equals(first) ? "" : ", " + exceeds(nearest, wish));
  }

  private static StepWeight nearest(List<StepWeight> weights) {
    return weights.stream()
        .min(Comparator.comparingDouble(StepWeight::worstShare)
            .thenComparingDouble(StepWeight::error))
        .orElseThrow();
  }

  private static String withinBudget(StepWeight best, Wish wish) {
    return String.format(
        Locale.ROOT,
        "%s: the most accurate within %s us a step%s, error %.1e at 99 %% of the operating points%s",
        best.method(),
        number(wish.budget()),
        time(best),
        best.error(),
        best.suffices() ? "" : "; that is not within " + percent(wish.tolerance()));
  }

  private static String none(
      List<StepWeight> all, List<StepWeight> affordable, Wish wish, WeighedRun run) {
    if (all.isEmpty()) {
      return "no method serves every function";
    }
    if (affordable.isEmpty()) {
      return "no method is within " + number(wish.budget()) + " us a step";
    }
    return "no method is within " + percent(wish.tolerance())
        + " at 99 % of the operating points; the nearest, " + exceeds(nearest(all), wish)
        + smallest(all) + rough(run);
  }

  private static String smallest(List<StepWeight> all) {
    return all.stream()
        .min(Comparator.comparingDouble(StepWeight::error))
        .filter(best -> Double.isFinite(best.error()))
        .map(best -> "; the smallest error at 99 % of them has " + best.method() + ", "
            + percent(best.error()))
        .orElse("");
  }

  /** Where a function is not smooth, no method can be sure. */
  private static String rough(WeighedRun run) {
    return run.functions().stream()
        .filter(function -> function.notConverged() > 0)
        .findFirst()
        .map(function -> "; " + function.name() + " is not smooth at the scale of the spread at "
            + function.notConverged() + " of its " + function.points() + " points")
        .orElse("");
  }

  private static String exceeds(StepWeight weight, Wish wish) {
    return weight.method() + " exceeds " + percent(wish.tolerance()) + " at "
        + percent(weight.worstShare()) + " of the points of " + weight.worst();
  }

  private static String time(StepWeight weight) {
    return Double.isNaN(weight.micros()) ? "" : ", " + number(weight.micros()) + " us";
  }

  /** {@return a share as it is read} */
  public static String percent(double share) {
    return number(100 * share) + " %";
  }

  /** Three digits, no exponent, no zeros at the end. */
  private static String number(double value) {
    return new BigDecimal(value).round(new MathContext(3)).stripTrailingZeros().toPlainString();
  }
}
