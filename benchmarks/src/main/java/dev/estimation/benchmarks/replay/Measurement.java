package dev.estimation.benchmarks.replay;

import dev.estimation.filters.model.SensorModel;

/**
 * What one update takes: the sensor, what it said, and what is known with it. One row of a log, or
 * several rows stacked. <i>Immutable.</i>
 */
public final class Measurement {
  private static final int UNSTACKED = 0;

  private final SensorModel sensor;
  private final int rows;
  private final double[] value;
  private final double[] given;

  /**
   * One row.
   *
   * @param sensor the same object for all rows that share a model
   * @param value copied
   * @param given copied
   */
  public Measurement(SensorModel sensor, double[] value, double... given) {
    this(sensor, UNSTACKED, value.clone(), given.clone());
  }

  private Measurement(SensorModel sensor, int rows, double[] value, double[] given) {
    this.sensor = sensor;
    this.rows = rows;
    this.value = value;
    this.given = given;
  }

  /**
   * {@return several rows that are one update}
   *
   * @param sensor the model of one row; the same object for all that share it
   * @param rows 1 or more
   * @param values row after row; copied
   * @param givens row after row; copied
   */
  public static Measurement stacked(
      SensorModel sensor, int rows, double[] values, double[] givens) {
    if (rows < 1) {
      throw new IllegalArgumentException("rows must be 1 or more, got " + rows);
    }
    return new Measurement(sensor, rows, values.clone(), givens.clone());
  }

  /** {@return the model of one row} */
  public SensorModel sensor() {
    return sensor;
  }

  /** {@return whether this is one or more stacked rows} */
  public boolean isStacked() {
    return rows != UNSTACKED;
  }

  /** {@return the number of stacked rows; 0 if this is one row for itself} */
  public int rows() {
    return rows;
  }

  /** {@return what the sensor said, row after row; a copy} */
  public double[] value() {
    return value.clone();
  }

  /** {@return what is known with it, row after row; a copy} */
  public double[] given() {
    return given.clone();
  }

  /** The array itself, to be read only: steps allocate nothing. */
  double[] sharedValue() {
    return value;
  }

  /** The array itself, to be read only. */
  double[] sharedGiven() {
    return given;
  }
}
