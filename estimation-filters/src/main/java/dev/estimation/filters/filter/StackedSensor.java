package dev.estimation.filters.filter;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.model.TwiceDifferentiableSensor;
import java.util.Arrays;

/**
 * A number of rows of one sensor as one measurement, with independent noise. Its structure and derivatives are those of the
 * sensor. It has scratch for a row, so it is no model to be shared: it is owned by one port, and users stack rows by a {@link
 * StackedPort}.
 */
class StackedSensor implements SensorModel {
  final int rows;
  final int width;
  final int givenWidth;
  private final SensorModel sensor;
  private final Space space;
  private final double[] rowState;
  private final double[] rowGiven;
  private final double[] rowMeasurement;
  private final double[] rowNoise;

  private StackedSensor(SensorModel sensor, int rows, Space state) {
    this.sensor = sensor;
    this.rows = rows;
    this.width = sensor.measurementSpace().dimension();
    this.givenWidth = sensor.givenDimension();
    this.space = stacked(sensor.measurementSpace(), rows);
    this.rowState = new double[state.storage()];
    this.rowGiven = new double[givenWidth];
    this.rowMeasurement = new double[sensor.measurementSpace().storage()];
    this.rowNoise = new double[width * width];
  }

  static StackedSensor of(SensorModel sensor, int rows, Space state) {
    if (sensor instanceof TwiceDifferentiableSensor twice) {
      return new TwiceDifferentiable(twice, rows, state);
    }
    return sensor instanceof DifferentiableSensor differentiable
        ? new Differentiable(differentiable, rows, state)
        : new StackedSensor(sensor, rows, state);
  }

  private static Space stacked(Space row, int rows) {
    Space all = row;
    for (int i = 1; i < rows; i++) {
      all = all.and(row);
    }
    return all;
  }

  @Override
  public Space measurementSpace() {
    return space;
  }

  @Override
  public int givenDimension() {
    return rows * givenWidth;
  }

  @Override
  public void measure(double[] state, double[] given, double[] measurement) {
    int length = rowMeasurement.length;
    for (int row = 0; row < rows; row++) {
      // The row arrives filled with the NaN that marks what was left out.
      System.arraycopy(measurement, row * length, rowMeasurement, 0, length);
      sensor.measure(copied(state), givenOf(row, given), rowMeasurement);
      System.arraycopy(rowMeasurement, 0, measurement, row * length, length);
    }
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    int size = rows * width;
    for (int row = 0; row < rows; row++) {
      Arrays.fill(rowNoise, 0);
      sensor.measurementNoise(copied(state), givenOf(row, given), rowNoise);
      for (int i = 0; i < width; i++) {
        int start = (row * width + i) * size + row * width;
        System.arraycopy(rowNoise, i * width, covariance, start, width);
      }
    }
  }

  @Override
  public Structure structure() {
    return sensor.structure();
  }

  /** A copy for each row, since a model may write on it, against its contract. */
  final double[] copied(double[] state) {
    System.arraycopy(state, 0, rowState, 0, rowState.length);
    return rowState;
  }

  final double[] givenOf(int row, double[] given) {
    System.arraycopy(given, row * givenWidth, rowGiven, 0, givenWidth);
    return rowGiven;
  }

  /** The rows of a sensor that knows its Jacobian. */
  private static class Differentiable extends StackedSensor implements DifferentiableSensor {
    private final DifferentiableSensor sensor;
    private final double[] rowJacobian;

    Differentiable(DifferentiableSensor sensor, int rows, Space state) {
      super(sensor, rows, state);
      this.sensor = sensor;
      this.rowJacobian = new double[width * state.dimension()];
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      int size = rowJacobian.length;
      for (int row = 0; row < rows; row++) {
        Arrays.fill(rowJacobian, 0);
        sensor.measureJacobian(copied(state), givenOf(row, given), rowJacobian);
        System.arraycopy(rowJacobian, 0, jacobian, row * size, size);
      }
    }
  }

  /** The rows of a sensor that knows its Hessian too. */
  private static final class TwiceDifferentiable extends Differentiable
      implements TwiceDifferentiableSensor {
    private final TwiceDifferentiableSensor sensor;
    private final double[] rowHessians;

    TwiceDifferentiable(TwiceDifferentiableSensor sensor, int rows, Space state) {
      super(sensor, rows, state);
      this.sensor = sensor;
      this.rowHessians = new double[width * state.dimension() * state.dimension()];
    }

    @Override
    public void measureHessian(double[] state, double[] given, double[] hessians) {
      int size = rowHessians.length;
      for (int row = 0; row < rows; row++) {
        Arrays.fill(rowHessians, 0);
        sensor.measureHessian(copied(state), givenOf(row, given), rowHessians);
        System.arraycopy(rowHessians, 0, hessians, row * size, size);
      }
    }
  }
}
