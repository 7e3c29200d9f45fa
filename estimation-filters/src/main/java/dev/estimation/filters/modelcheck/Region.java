package dev.estimation.filters.modelcheck;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;

/**
 * Where a model is to be examined: a box of states about a centre, and ranges of what else it is called with. Choose it
 * as wide as the model will be used, and leave out what is no place for it (a bearing from its own sensor). States are in SI
 * units and radians. <i>Immutable.</i>
 */
public final class Region {
  private final Space space;
  private final double[] centre;
  private final double[] halfWidths;
  private final Range given;
  private final Range control;
  private final Range time;
  private final Range step;

  private Region(
      Space space,
      double[] centre,
      double[] halfWidths,
      Range given,
      Range control,
      Range time,
      Range step) {
    this.space = space;
    this.centre = centre;
    this.halfWidths = halfWidths;
    this.given = given;
    this.control = control;
    this.time = time;
    this.step = step;
  }

  /**
   * The states reached from a centre by displacements of up to the half-widths.
   *
   * @param space where states live
   * @param centre a point of it; copied
   * @param halfWidths one for each dimension of differences, finite, 0 or more; an input of width 0 stays as it is, and
   *     what depends on its moving is not examined; copied
   * @return the region
   */
  public static Region around(Space space, double[] centre, double... halfWidths) {
    Checks.length("centre", centre, space.storage());
    Checks.length("halfWidths", halfWidths, space.dimension());
    if (!space.contains(centre)) {
      throw new IllegalArgumentException(
          "centre must be a point of " + space + ", got numbers that are none");
    }
    for (int i = 0; i < halfWidths.length; i++) {
      if (!(halfWidths[i] >= 0 && halfWidths[i] <= Double.MAX_VALUE)) {
        throw new IllegalArgumentException(
            "halfWidths[" + i + "] must be finite and >= 0, got " + halfWidths[i]);
      }
    }
    Range none = Range.of("range", new double[0], new double[0]);
    Range zero = Range.of("time", new double[1], new double[1]);
    return new Region(space, centre.clone(), halfWidths.clone(), none, none, zero, null);
  }

  /**
   * The states between two corners; angles run up from the low to the high one.
   *
   * @param space where states live: reals and angles
   * @param low read
   * @param high nowhere below {@code low}; read
   * @return the region
   */
  public static Region between(Space space, double[] low, double[] high) {
    if (space.storage() != space.dimension()) {
      throw new IllegalArgumentException(
          "corners need a space of as many numbers as directions, got " + space
              + "; give a centre and half-widths");
    }
    Range range = Range.of("state", low, high);
    Checks.length("low", low, space.storage());
    double[] halfWidths = new double[low.length];
    for (int i = 0; i < low.length; i++) {
      halfWidths[i] = high[i] / 2 - low[i] / 2;
    }
    return around(space, range.middle(), halfWidths);
  }

  /**
   * This region with a range of what is given with a measurement.
   *
   * @param low as many as the sensor's given; copied
   * @param high nowhere below {@code low}; copied
   * @return a region that has it
   */
  public Region withGiven(double[] low, double[] high) {
    return new Region(space, centre, halfWidths, Range.of("given", low, high), control, time, step);
  }

  /**
   * This region with a range of controls of a motion.
   *
   * @param low as many as the motion's controls; copied
   * @param high nowhere below {@code low}; copied
   * @return a region that has it
   */
  public Region withControl(double[] low, double[] high) {
    return new Region(space, centre, halfWidths, given, Range.of("control", low, high), time, step);
  }

  /**
   * This region with a range of times at which a motion starts; 0 alone unless said otherwise.
   *
   * @param low s
   * @param high s, not below {@code low}
   * @return a region that has it
   */
  public Region withTimes(double low, double high) {
    Range times = Range.of("time", new double[] {low}, new double[] {high});
    return new Region(space, centre, halfWidths, given, control, times, step);
  }

  /**
   * This region with a range of durations of a motion; without one motions are not examined.
   *
   * @param shortest s, above 0
   * @param longest s, not below {@code shortest}
   * @return a region that has it
   */
  public Region withSteps(double shortest, double longest) {
    if (!(shortest > 0)) {
      throw new IllegalArgumentException("shortest step must be > 0 s, got " + shortest);
    }
    Range steps = Range.of("step", new double[] {shortest}, new double[] {longest});
    return new Region(space, centre, halfWidths, given, control, time, steps);
  }

  Space space() {
    return space;
  }

  double[] centre() {
    return centre.clone();
  }

  double[] halfWidths() {
    return halfWidths.clone();
  }

  Range given() {
    return given;
  }

  Range control() {
    return control;
  }

  Range time() {
    return time;
  }

  /** Null if none was set. */
  Range step() {
    return step;
  }
}
