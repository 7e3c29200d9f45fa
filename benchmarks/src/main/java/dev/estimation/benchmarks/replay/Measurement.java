package dev.estimation.benchmarks.replay;

import dev.estimation.filters.model.SensorModel;

/** One measurement row: the sensor, what it said, and what is known with it. <i>Immutable.</i> */
public final class Measurement {
  private final SensorModel sensor;
  private final double[] value;
  private final double[] given;

  /**
   * A row.
   *
   * @param sensor the same object for all rows that share a model
   * @param value copied
   * @param given copied
   */
  public Measurement(SensorModel sensor, double[] value, double... given) {
    this.sensor = sensor;
    this.value = value.clone();
    this.given = given.clone();
  }

  SensorModel sensor() {
    return sensor;
  }

  /** The array itself, to be read only. */
  double[] value() {
    return value;
  }

  /** The array itself, to be read only. */
  double[] given() {
    return given;
  }
}
