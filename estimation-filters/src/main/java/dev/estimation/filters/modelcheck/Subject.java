package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.NoiseDrivenMotion;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.model.TwiceDifferentiableMotion;
import dev.estimation.filters.model.TwiceDifferentiableSensor;
import java.util.Arrays;
import java.util.Optional;
import java.util.function.Supplier;
import java.util.stream.Stream;

/**
 * A model of any kind as the check sees it: a function of state and noise, the covariance of a noise, and derivatives where
 * there are any.
 *
 * @param title kind and name
 * @param state where states live
 * @param noises components of noise inside
 * @param output where the function's values live
 * @param function the function
 * @param noise the noise covariance
 * @param jacobian by state and noise
 * @param hessian by the state
 * @param structure what is declared
 */
record Subject(
    String title,
    Space state,
    int noises,
    Space output,
    Operation function,
    Operation noise,
    Optional<Operation> jacobian,
    Optional<Operation> hessian,
    Supplier<Structure> structure) {

  static Subject of(SensorModel model, Space state) {
    Space output = model.measurementSpace();
    int m = output.dimension();
    int d = state.dimension();
    return new Subject(
        "sensor model " + nameOf(model),
        state,
        0,
        output,
        Operation.vector(
            "measure",
            "measurement",
            output.storage(),
            (in, out) -> model.measure(in.state, in.given, out)),
        Operation.matrix(
            "measurementNoise",
            "covariance",
            (in, out) -> model.measurementNoise(in.state, in.given, out),
            m,
            m),
        instance(DifferentiableSensor.class, model)
            .map(once -> Operation.matrix(
                "measureJacobian",
                "jacobian",
                (in, out) -> once.measureJacobian(in.state, in.given, out),
                m,
                d)),
        instance(TwiceDifferentiableSensor.class, model)
            .map(twice -> Operation.matrix(
                "measureHessian",
                "hessian",
                (in, out) -> twice.measureHessian(in.state, in.given, out),
                m,
                d,
                d)),
        model::structure);
  }

  static Subject of(MotionModel model) {
    Space space = model.stateSpace();
    int d = space.dimension();
    return new Subject(
        "motion model " + nameOf(model),
        space,
        0,
        space,
        Operation.vector(
            "move",
            "next",
            space.storage(),
            (in, out) -> model.move(in.state, in.given, in.time, in.step, out)),
        Operation.matrix(
            "processNoise",
            "covariance",
            (in, out) -> model.processNoise(in.state, in.given, in.time, in.step, out),
            d,
            d),
        instance(DifferentiableMotion.class, model)
            .map(once -> Operation.matrix(
                "moveJacobian",
                "jacobian",
                (in, out) -> once.moveJacobian(in.state, in.given, in.time, in.step, out),
                d,
                d)),
        instance(TwiceDifferentiableMotion.class, model)
            .map(twice -> Operation.matrix(
                "moveHessian",
                "hessian",
                (in, out) -> twice.moveHessian(in.state, in.given, in.time, in.step, out),
                d,
                d,
                d)),
        model::structure);
  }

  static Subject of(NoiseDrivenMotion model) {
    Space space = model.stateSpace();
    int d = space.dimension();
    int q = model.noiseDimension();
    if (q < 1) {
      throw new IllegalArgumentException(
          "noise dimension must be 1 or more, got " + q + " (motion model " + nameOf(model) + ")");
    }
    return new Subject(
        "motion model " + nameOf(model),
        space,
        q,
        space,
        Operation.vector(
            "move",
            "next",
            space.storage(),
            (in, out) -> model.move(in.state, in.noise, in.given, in.time, in.step, out)),
        Operation.matrix(
            "noiseCovariance",
            "covariance",
            (in, out) -> model.noiseCovariance(in.given, in.time, in.step, out),
            q,
            q),
        instance(DifferentiableNoiseDrivenMotion.class, model)
            .map(once -> Operation.matrix("moveJacobians", "jacobian", joined(once), d, d + q)),
        Optional.empty(),
        model::structure);
  }

  static Subject of(Motion model) {
    return model instanceof MotionModel added ? of(added) : of((NoiseDrivenMotion) model);
  }

  private static <T> Optional<T> instance(Class<T> type, Object model) {
    return Optional.of(model).filter(type::isInstance).map(type::cast);
  }

  private static String nameOf(Object model) {
    String simple = model.getClass().getSimpleName();
    return simple.isEmpty() ? model.getClass().getName() : simple;
  }

  /** Both Jacobians side by side, by way of arrays of its own. */
  private static Operation.Call joined(DifferentiableNoiseDrivenMotion model) {
    int d = model.stateSpace().dimension();
    int q = model.noiseDimension();
    double[] byState = new double[d * d];
    double[] byNoise = new double[d * q];
    return (in, out) -> {
      Arrays.fill(byState, 0);
      Arrays.fill(byNoise, 0);
      model.moveJacobians(in.state, in.noise, in.given, in.time, in.step, byState, byNoise);
      for (int row = 0; row < d; row++) {
        System.arraycopy(byState, row * d, out, row * (d + q), d);
        System.arraycopy(byNoise, row * q, out, row * (d + q) + d, q);
      }
    };
  }

  /** Where state and noise live together. */
  Space input() {
    return noises == 0 ? state : state.and(Space.reals(noises));
  }

  boolean isSensor() {
    return noise.method().equals("measurementNoise");
  }

  boolean addsProcessNoise() {
    return noise.method().equals("processNoise");
  }

  Stream<Operation> operations() {
    return Stream.of(Stream.of(function, noise), jacobian.stream(), hessian.stream())
        .flatMap(each -> each);
  }

  /** The name of an input by its index among state and noise, in directions. */
  String inputName(int index) {
    int d = state.dimension();
    return index < d ? "state[" + index + "]" : "noise[" + (index - d) + "]";
  }
}
