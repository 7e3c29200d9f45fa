package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StackedPort;
import dev.estimation.filters.filter.StepStatus;

/** Where measurements of one sensor enter, be they single rows or stacked ones. */
interface MeasurementPort {
  StepStatus update(Estimate estimate, Measurement measurement);

  /** How many numbers the innovation of the last update has. */
  int degreesOfFreedom();

  double normalisedInnovationSquared();

  double logLikelihood();

  int evaluations();

  int jacobians();

  String failure();

  /** A port for single rows. */
  record Single(SensorPort port) implements MeasurementPort {
    @Override
    public StepStatus update(Estimate estimate, Measurement measurement) {
      return port.update(estimate, measurement.sharedValue(), measurement.sharedGiven());
    }

    @Override
    public int degreesOfFreedom() {
      return port.innovation().length;
    }

    @Override
    public double normalisedInnovationSquared() {
      return port.normalisedInnovationSquared();
    }

    @Override
    public double logLikelihood() {
      return port.logLikelihood();
    }

    @Override
    public int evaluations() {
      return port.evaluations();
    }

    @Override
    public int jacobians() {
      return port.jacobians();
    }

    @Override
    public String failure() {
      return port.failure();
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
    public int degreesOfFreedom() {
      return port.innovation().length;
    }

    @Override
    public double normalisedInnovationSquared() {
      return port.normalisedInnovationSquared();
    }

    @Override
    public double logLikelihood() {
      return port.logLikelihood();
    }

    @Override
    public int evaluations() {
      return port.evaluations();
    }

    @Override
    public int jacobians() {
      return port.jacobians();
    }

    @Override
    public String failure() {
      return port.failure();
    }
  }
}
