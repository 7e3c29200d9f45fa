package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.SensorModel;

/** What one update had to tell. <i>Immutable.</i> */
public final class UpdateRecord {
  private final int step;
  private final SensorModel sensor;
  private final StepStatus status;
  private final double[] innovation;
  private final double[] deviations;
  private final double squared;
  private final int evaluations;
  private final int jacobians;

  UpdateRecord(int step, SensorModel sensor, StepStatus status, SensorPort told) {
    this.step = step;
    this.sensor = sensor;
    this.status = status;
    this.innovation = told.innovation().clone();
    this.deviations = new double[innovation.length];
    for (int i = 0; i < deviations.length; i++) {
      deviations[i] = Double.isNaN(innovation[i])
          ? Double.NaN
          : Math.sqrt(told.innovationCovariance().get(i, i));
    }
    this.squared = told.normalisedInnovationSquared();
    this.evaluations = told.evaluations();
    this.jacobians = told.jacobians();
  }

  /** {@return the step, counted from 0} */
  public int step() {
    return step;
  }

  /** {@return the model of one row} */
  public SensorModel sensor() {
    return sensor;
  }

  /** {@return how the update ended} */
  public StepStatus status() {
    return status;
  }

  /** {@return how many numbers the innovation has, those of stacked rows counted} */
  public int degrees() {
    return innovation.length;
  }

  /** {@return a component of the innovation; NaN if the update did not come that far} */
  public double innovation(int index) {
    return innovation[index];
  }

  /** {@return its standard deviation as predicted; NaN where the innovation is} */
  public double deviation(int index) {
    return deviations[index];
  }

  /** {@return the normalised innovation squared; NaN if the update did not come that far} */
  public double normalisedSquared() {
    return squared;
  }

  /** {@return the evaluations of the sensor model} */
  public int evaluations() {
    return evaluations;
  }

  /** {@return the Jacobians formed} */
  public int jacobians() {
    return jacobians;
  }
}
