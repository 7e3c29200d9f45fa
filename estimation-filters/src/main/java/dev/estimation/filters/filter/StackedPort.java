package dev.estimation.filters.filter;

import dev.estimation.filters.model.SensorModel;

/**
 * Where several rows of one sensor enter as one update: all pseudoranges of an epoch, say. The number of
 * rows may change from update to update, up to a maximum; the noise of different rows is independent.
 *
 * <p>Compared with updates one after another, the rows are linearised (or sampled) about the same
 * estimate, and the gate judges them together. What the sensor declares holds for the rows: points are drawn over its
 * active inputs that are not linear, once for all rows, and its Jacobian and Hessian are there for matchings by derivatives.
 *
 * <p>Scratch for every number of rows is made at set-up: some M^3 and M^2 d numbers for at most M rows of one component in a
 * state of dimension d. <i>Confined to one thread</i>; allocates only when built and in {@link SensorPort#failure()}.
 */
public final class StackedPort {
  private final String name;
  private final int width;
  private final int givenWidth;
  private final SensorPort[] ports;
  private final double[][] measurements;
  private final double[][] givens;
  private SensorPort last;

  StackedPort(FilterPlan plan, SensorModel sensor, int maximumRows) {
    if (maximumRows < 1) {
      throw new IllegalArgumentException("maximum rows must be 1 or more, got " + maximumRows);
    }
    this.name = FilterPlan.nameOf(sensor);
    this.width = sensor.measurementSpace().storage();
    this.givenWidth = sensor.givenDimension();
    this.ports = new SensorPort[maximumRows];
    this.measurements = new double[maximumRows][];
    this.givens = new double[maximumRows][];
    for (int i = 0; i < maximumRows; i++) {
      int rows = i + 1;
      StackedSensor stacked = StackedSensor.of(sensor, rows, plan.stateSpace());
      ports[i] = new SensorPort(plan, stacked, name + ", " + rows + " stacked rows");
      measurements[i] = new double[rows * width];
      givens[i] = new double[rows * givenWidth];
    }
    this.last = ports[0];
  }

  /**
   * Updates an estimate with several rows of its own time.
   *
   * @param estimate updated if the status {@code isApplied()}
   * @param rows how many, from 1 to the maximum
   * @param rowMeasurements row after row, at least {@code rows} of them; read
   * @param rowGivens what is given with each, row after row, at least {@code rows} of them; read
   * @return how it ended
   * @throws IllegalArgumentException if there are more rows than the maximum, or an array is too short
   */
  public StepStatus update(
      Estimate estimate, int rows, double[] rowMeasurements, double[] rowGivens) {
    if (rows < 1 || rows > ports.length) {
      throw new IllegalArgumentException("rows must be from 1 to the maximum of " + ports.length
          + ", got " + rows + " (sensor model " + name + ")");
    }
    requireRows("measurements", rowMeasurements, rows * width);
    requireRows("givens", rowGivens, rows * givenWidth);
    last = ports[rows - 1];
    double[] measurement = measurements[rows - 1];
    double[] given = givens[rows - 1];
    System.arraycopy(rowMeasurements, 0, measurement, 0, measurement.length);
    System.arraycopy(rowGivens, 0, given, 0, given.length);
    return last.update(estimate, measurement, given);
  }

  private void requireRows(String what, double[] array, int wanted) {
    if (array.length < wanted) {
      throw new IllegalArgumentException(what + " must hold " + wanted + " numbers or more, got "
          + array.length + " (sensor model " + name + ")");
    }
  }

  /**
   * What the last update has to tell: innovation, likelihood, evaluations, failure.
   *
   * @return the port for as many rows as the last update had
   */
  public SensorPort last() {
    return last;
  }
}
