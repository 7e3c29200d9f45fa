package dev.estimation.benchmarks.weigh;

import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.core.gaussian.Gaussian;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Where methods are weighed: runs of a filter, each from a start of its own, whose calls of the matching are the points.
 *
 * @param runs one or more
 * @param selection of their calls
 * @param steps how many steps the selection has
 */
public record Region(List<Scenario> runs, Selection selection, int steps) {
  /** Keeps a copy of the runs. */
  public Region {
    runs = List.copyOf(runs);
  }

  /** {@return the operating points along one run} */
  public static Region along(Scenario scenario, Selection selection) {
    int last = Math.min(selection.to(), scenario.steps().size() - 1);
    int steps = Math.max(0, last - selection.from() + 1);
    return new Region(List.of(selection.cut(scenario)), selection, steps);
  }

  /**
   * An estimate that is told instead of followed.
   *
   * @param step of a scenario, counted from 0, whose time, control and measurements are taken
   * @param estimate before the motion to that step, and before each of its measurements
   */
  public record Told(int step, Gaussian estimate) {}

  /** {@return told operating points in place of those of a run} */
  public static Region told(Scenario scenario, List<Told> points) {
    List<Scenario> runs = new ArrayList<>();
    for (Told point : points) {
      addRuns(scenario, point, runs);
    }
    return new Region(runs, new Selection(0, Integer.MAX_VALUE, 1), points.size());
  }

  private static void addRuns(Scenario scenario, Told point, List<Scenario> runs) {
    Step step = scenario.steps().get(point.step());
    if (point.step() > 0) {
      double before = scenario.steps().get(point.step() - 1).time();
      Step motion = new Step(step.time(), step.control(), List.of());
      runs.add(single(scenario, point, List.of(new Step(before, List.of()), motion)));
    }
    for (Measurement measurement : step.measurements()) {
      Step update = new Step(step.time(), step.control(), List.of(measurement));
      runs.add(single(scenario, point, List.of(update)));
    }
  }

  private static Scenario single(Scenario scenario, Told point, List<Step> steps) {
    return new Scenario(
        scenario.motion(), OptionalDouble.empty(), point.estimate(), steps, Optional.empty());
  }
}
