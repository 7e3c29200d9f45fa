package dev.estimation.benchmarks.replay;

import java.util.List;

/**
 * A time, the control that held until then, and the measurements of that time, which are updates
 * one after another. <i>Immutable.</i>
 */
public final class Step {
  private final double time;
  private final double[] control;
  private final List<Measurement> measurements;

  /** A step of a motion without controls; see the other constructor. */
  public Step(double time, List<Measurement> measurements) {
    this(time, new double[0], measurements);
  }

  /**
   * A step.
   *
   * @param time s
   * @param control that held since the step before; copied
   * @param measurements in the order of processing; may be empty; copied
   */
  public Step(double time, double[] control, List<Measurement> measurements) {
    this.time = time;
    this.control = control.clone();
    this.measurements = List.copyOf(measurements);
  }

  /** {@return the time (s)} */
  public double time() {
    return time;
  }

  /** {@return the control that held since the step before; a copy} */
  public double[] control() {
    return control.clone();
  }

  /** The array itself, to be read only: steps allocate nothing. */
  double[] sharedControl() {
    return control;
  }

  /** {@return the measurements, in the order of processing} */
  public List<Measurement> measurements() {
    return measurements;
  }
}
