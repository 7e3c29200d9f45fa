package dev.estimation.benchmarks.cases.robot;

import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.filters.model.SensorModel;
import java.util.ArrayList;
import java.util.List;

/**
 * Commands and sightings in order of time, as steps. There is one step for each distinct time, from
 * the first command to the last true pose; what happens before or after is dropped. A step moves
 * under the command that was given last before its time, and commands of its own time hold from
 * then on; sightings of its time are updates one after another.
 */
final class RobotSteps {
  private final List<Command> commands;
  private final List<Sighting> sightings;
  private final SensorModel sensor;
  private final List<Step> steps = new ArrayList<>();
  private int nextCommand;
  private int nextSighting;

  /**
   * Makes the steps.
   *
   * @param log one command or more
   * @param sensor of the sightings
   */
  RobotSteps(RobotLog log, SensorModel sensor) {
    this.commands = log.commands();
    this.sightings = log.sightings();
    this.sensor = sensor;
    skipEarlySightings();
    for (double time = nextTime(); time <= log.lastTruthTime(); time = nextTime()) {
      addStep(time);
    }
  }

  private void skipEarlySightings() {
    double start = commands.get(0).time();
    while (nextSighting < sightings.size() && sightings.get(nextSighting).time() < start) {
      nextSighting++;
    }
  }

  /** The time of the next event; infinite if there is none. */
  private double nextTime() {
    return Math.min(commandTime(), sightingTime());
  }

  private double commandTime() {
    return nextCommand < commands.size()
        ? commands.get(nextCommand).time()
        : Double.POSITIVE_INFINITY;
  }

  private double sightingTime() {
    return nextSighting < sightings.size()
        ? sightings.get(nextSighting).time()
        : Double.POSITIVE_INFINITY;
  }

  private void addStep(double time) {
    double[] held = new double[2]; // stays zero in the first step, which moves over no time
    if (nextCommand > 0) {
      Command last = commands.get(nextCommand - 1);
      held[0] = last.speed();
      held[1] = last.turnRate();
    }
    while (commandTime() == time) {
      nextCommand++;
    }
    List<Measurement> rows = new ArrayList<>();
    while (sightingTime() == time) {
      rows.add(measurement(sightings.get(nextSighting++)));
    }
    steps.add(new Step(time, held, rows));
  }

  private Measurement measurement(Sighting seen) {
    double[] value = {seen.range(), seen.bearing()};
    return new Measurement(sensor, value, seen.landmarkX(), seen.landmarkY());
  }

  /** {@return the steps; none if the truth ends before the first command} */
  List<Step> steps() {
    return steps;
  }
}
