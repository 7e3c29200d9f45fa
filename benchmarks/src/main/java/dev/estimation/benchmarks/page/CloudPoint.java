package dev.estimation.benchmarks.page;

import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Use;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.SensorModel;
import java.util.Arrays;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;

/** A place in a run where a model meets an uncertain state: before a prediction, or before an update. */
final class CloudPoint {
  private final int step;
  private final double time;
  private final Optional<SensorModel> sensor;
  private final Gaussian prior;
  private final Space input;
  private final Space output;
  private final VectorFunction function;
  private final double[] given;
  private final DMatrixRMaj noise;

  private CloudPoint(
      int step,
      double time,
      Optional<SensorModel> sensor,
      Estimate prior,
      Space output,
      VectorFunction function,
      double[] given) {
    this.step = step;
    this.time = time;
    this.sensor = sensor;
    this.prior = prior.toGaussian();
    this.input = prior.space();
    this.output = output;
    this.function = function;
    this.given = given;
    this.noise = new DMatrixRMaj(output.dimension(), output.dimension());
  }

  /** An update; of stacked rows the first one. */
  static CloudPoint of(int step, Measurement measurement, Estimate prior) {
    SensorModel sensor = measurement.sensor();
    double[] given = Arrays.copyOf(measurement.given(), sensor.givenDimension());
    CloudPoint point = new CloudPoint(
        step,
        prior.time(),
        Optional.of(sensor),
        prior,
        sensor.measurementSpace(),
        ModelFunction.of(sensor),
        given);
    sensor.measurementNoise(point.prior.mean(), given.clone(), point.noise.data);
    return point;
  }

  /** A prediction. */
  static CloudPoint of(int step, MotionModel motion, Step to, Estimate from) {
    double dt = to.time() - from.time();
    CloudPoint point = new CloudPoint(
        step,
        from.time(),
        Optional.empty(),
        from,
        motion.stateSpace(),
        ModelFunction.of(motion, from.time(), dt),
        to.control());
    motion.processNoise(point.prior.mean(), point.given.clone(), from.time(), dt, point.noise.data);
    return point;
  }

  int step() {
    return step;
  }

  double time() {
    return time;
  }

  /** The sensor whose function it is; empty for a motion. */
  Optional<SensorModel> sensor() {
    return sensor;
  }

  Use use() {
    return sensor.isPresent() ? Use.UPDATE : Use.PREDICTION;
  }

  Gaussian prior() {
    return prior;
  }

  Space input() {
    return input;
  }

  Space output() {
    return output;
  }

  VectorFunction function() {
    return function;
  }

  double[] given() {
    return given;
  }

  DMatrixRMaj noise() {
    return noise;
  }
}
