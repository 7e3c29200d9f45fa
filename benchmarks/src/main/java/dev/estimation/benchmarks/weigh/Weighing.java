package dev.estimation.benchmarks.weigh;

import dev.estimation.benchmarks.weigh.PointLook.MethodLook;
import dev.estimation.core.accuracy.ReferenceSettings;
import dev.estimation.core.matching.MomentMatching;
import java.util.ArrayList;
import java.util.List;
import java.util.function.ToDoubleFunction;

/**
 * Weighs contenders over the operating points of a region. The truth is sought to a fiftieth of the tolerance, where
 * the function is not smooth by 32 shifts of 1023 points.
 */
public final class Weighing {
  private static final double SURER_THAN_TOLERANCE = 50;
  private static final int POINTS = 1023;
  private static final int SHIFTS = 32;

  private final Region region;
  private final CallSchedule schedule;
  private final MomentMatching track;
  private final List<Contender> contenders;
  private final double tolerance;

  /**
   * A weighing, not yet done.
   *
   * @param region where
   * @param track the matching whose run gives the operating points
   * @param tolerance above 0
   */
  public Weighing(
      Region region, MomentMatching track, List<Contender> contenders, double tolerance) {
    this.region = region;
    this.schedule = new CallSchedule(region);
    this.track = track;
    this.contenders = List.copyOf(contenders);
    this.tolerance = tolerance;
    if (!(tolerance > 0 && Double.isFinite(tolerance))) {
      throw new IllegalArgumentException("tolerance must be above 0 and finite, got " + tolerance);
    }
  }

  /** {@return how many operating points will be looked at} */
  public int points() {
    return schedule.points();
  }

  /**
   * Looks at all points.
   *
   * @param timed whether the time of calls is measured, by one thread after all else is done
   * @param pointDone called by any thread after each point
   */
  public WeighedRun run(Workers workers, boolean timed, Runnable pointDone) {
    ReferenceSettings settings =
        new ReferenceSettings(tolerance / SURER_THAN_TOLERANCE, POINTS, SHIFTS, 1);
    PointWork work = new PointWork(region, schedule, track, contenders, settings, pointDone);
    String status = work.run(workers);
    CallTimes times = new CallTimes(schedule, contenders);
    if (timed) {
      times.measure(region, track);
    }
    List<FunctionWeight> functions = new ArrayList<>();
    for (int function = 0; function < schedule.functions().size(); function++) {
      List<PointLook> looks = work.looks(function);
      if (!looks.isEmpty()) {
        functions.add(weight(function, looks, times));
      }
    }
    return new WeighedRun(status, functions);
  }

  private FunctionWeight weight(int function, List<PointLook> all, CallTimes times) {
    List<PointLook> looks = all.stream().filter(PointLook::isKnown).toList();
    List<MethodWeight> methods = new ArrayList<>();
    for (int i = 0; i < contenders.size(); i++) {
      methods.add(weight(i, looks, times.micros(function, i)));
    }
    return new FunctionWeight(
        schedule.functions().get(function),
        function == 0,
        schedule.callsPerStep(function),
        looks.size(),
        all.size() - looks.size(),
        all.stream()
            .map(PointLook::unknown)
            .filter(why -> !why.isEmpty())
            .findFirst()
            .orElse(""),
        looks.isEmpty() ? 0 : looks.get(0).nonlinearInputs(),
        quantiles(looks, PointLook::uncertainty),
        (int) looks.stream().filter(look -> !look.converged()).count(),
        methods);
  }

  private MethodWeight weight(int contender, List<PointLook> points, double micros) {
    List<MethodLook> looks =
        points.stream().map(point -> point.methods().get(contender)).toList();
    List<String> failures =
        looks.stream().map(MethodLook::failure).filter(why -> !why.isEmpty()).toList();
    String first = failures.isEmpty() ? "" : failures.get(0);
    return new MethodWeight(
        contenders.get(contender).name(),
        looks.stream().anyMatch(MethodLook::refused) ? first : "",
        quantiles(looks, MethodLook::error),
        looks.stream().filter(look -> !(look.error() <= tolerance)).count() / (double) looks.size(),
        quantiles(looks, MethodLook::evaluations),
        quantiles(looks, MethodLook::jacobians),
        micros,
        failures.size(),
        first);
  }

  private static <T> Quantiles quantiles(List<T> looks, ToDoubleFunction<T> of) {
    return Quantiles.of(looks.stream().mapToDouble(of).toArray());
  }
}
