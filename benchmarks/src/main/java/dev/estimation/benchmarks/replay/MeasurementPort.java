package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StackedPort;
import dev.estimation.filters.filter.StepStatus;

/** Where measurements of one sensor enter, be they single rows or stacked ones. */
interface MeasurementPort {
  StepStatus update(Estimate estimate, Measurement measurement);

  /** What the last update has to tell. */
  SensorPort last();

  /** A port for single rows. */
  record Single(SensorPort last) implements MeasurementPort {
    @Override
    public StepStatus update(Estimate estimate, Measurement measurement) {
      return last.update(estimate, measurement.sharedValue(), measurement.sharedGiven());
    }
  }

  /** A port for stacked rows. */
  record Stacked(StackedPort port) implements MeasurementPort {
    @Override
    public StepStatus update(Estimate estimate, Measurement measurement) {
      return port.update(
          estimate, measurement.rows(), measurement.sharedValue(), measurement.sharedGiven());
    }

    @Override
    public SensorPort last() {
      return port.last();
    }
  }
}
