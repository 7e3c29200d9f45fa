package dev.estimation.benchmarks.weigh;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.IdentityHashMap;
import java.util.List;

/**
 * Measures, roughly, what a call takes: at some points of each function, spread over all of them, every contender is
 * called in a loop of its own, first untimed, and the median of several rounds is taken; then the median over points.
 * The factor of the prior is there already, as in a filter. A method's own time and that of the models, nothing else of a
 * step. Wall time on whatever else the machine does: no benchmark.
 */
final class CallTimes {
  private static final int POINTS = 5;
  private static final int ROUNDS = 7;
  private static final long FIRST_WARM_UP = 60_000_000;
  private static final long WARM_UP = 3_000_000;
  private static final long ROUND = 1_000_000;

  private final CallSchedule schedule;
  private final List<Contender> contenders;
  private final int[] interval;
  private final int[] met;
  /** By function and contender: one number a point. */
  private final List<List<List<Double>>> micros = new ArrayList<>();

  CallTimes(CallSchedule schedule, List<Contender> contenders) {
    this.schedule = schedule;
    this.contenders = contenders;
    int functions = schedule.functions().size();
    this.interval = new int[functions];
    this.met = new int[functions];
    int[] points = new int[functions];
    for (int point = 0; point < schedule.points(); point++) {
      points[schedule.functionOfPoint(point)]++;
    }
    for (int function = 0; function < functions; function++) {
      interval[function] = Math.max(1, (points[function] + POINTS - 1) / POINTS);
      List<List<Double>> ofContenders = new ArrayList<>();
      contenders.forEach(one -> ofContenders.add(new ArrayList<>()));
      micros.add(ofContenders);
    }
  }

  void measure(Region region, MomentMatching track) {
    new RunWalk(region, track, schedule, this::visitor).run();
  }

  private RunWalk.Visitor visitor() {
    IdentityHashMap<Carry.Target, List<Contender.Scratch>> scratch = new IdentityHashMap<>();
    return (point, carry) -> measure(point, carry, scratch);
  }

  private void measure(
      int point, Carry carry, IdentityHashMap<Carry.Target, List<Contender.Scratch>> scratch) {
    int function = schedule.functionOfPoint(point);
    if (met[function]++ % interval[function] != 0) {
      return;
    }
    List<Contender.Scratch> works = scratch.computeIfAbsent(
        carry.target(),
        target -> contenders.stream().map(one -> one.scratch(target)).toList());
    for (int i = 0; i < works.size(); i++) {
      if (works.get(i).work() != null) {
        List<Double> known = micros.get(function).get(i);
        known.add(micros(works.get(i).work(), carry, known.isEmpty() ? FIRST_WARM_UP : WARM_UP));
      }
    }
  }

  private static double micros(MatchingWorkspace work, Carry carry, long warmUp) {
    Moments input = new Moments(carry.target().input());
    input.set(carry.input());
    Covariance noise = null;
    if (carry.noise() != null) {
      noise = new Covariance(carry.noise().dimension());
      noise.set(carry.noise());
    }
    int calls = 0;
    for (long begun = System.nanoTime(); System.nanoTime() - begun < warmUp; calls++) {
      work.carry(input, carry.given(), noise, carry.use());
    }
    int perRound = (int) Math.max(1, calls * (double) ROUND / warmUp);
    double[] rounds = new double[ROUNDS];
    for (int round = 0; round < ROUNDS; round++) {
      long begun = System.nanoTime();
      for (int call = 0; call < perRound; call++) {
        work.carry(input, carry.given(), noise, carry.use());
      }
      rounds[round] = (System.nanoTime() - begun) / 1000.0 / perRound;
    }
    return median(rounds);
  }

  private static double median(double[] numbers) {
    Arrays.sort(numbers);
    return numbers.length == 0 ? Double.NaN : numbers[numbers.length / 2];
  }

  /** {@return the time of a call (us); NaN if it was not measured} */
  double micros(int function, int contender) {
    return median(micros.get(function).get(contender).stream()
        .mapToDouble(Double::doubleValue)
        .toArray());
  }
}
