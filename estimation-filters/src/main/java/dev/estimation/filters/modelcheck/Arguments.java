package dev.estimation.filters.modelcheck;

import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;

/** The arrays and numbers that a model is called with. */
final class Arguments {
  final double[] state;
  final double[] noise;
  final double[] given;
  double time;
  double step;

  Arguments(double[] state, double[] noise, double[] given, double time, double step) {
    this.state = state;
    this.noise = noise;
    this.given = given;
    this.time = time;
    this.step = step;
  }

  Arguments copy() {
    return new Arguments(state.clone(), noise.clone(), given.clone(), time, step);
  }

  /** At another time, for another step. */
  Arguments over(double start, double duration) {
    return new Arguments(state.clone(), noise.clone(), given.clone(), start, duration);
  }

  /** Takes the values of others into the same arrays. */
  void set(Arguments other) {
    System.arraycopy(other.state, 0, state, 0, state.length);
    System.arraycopy(other.noise, 0, noise, 0, noise.length);
    System.arraycopy(other.given, 0, given, 0, given.length);
    time = other.time;
    step = other.step;
  }

  /** State and noise, one after the other. */
  double[] joint() {
    double[] joint = Arrays.copyOf(state, state.length + noise.length);
    System.arraycopy(noise, 0, joint, state.length, noise.length);
    return joint;
  }

  /** These with another state and noise, copied. */
  Arguments at(double[] joint) {
    return new Arguments(
        Arrays.copyOf(joint, state.length),
        Arrays.copyOfRange(joint, state.length, joint.length),
        given.clone(),
        time,
        step);
  }

  boolean sameBits(Arguments other) {
    return Arrays.equals(state, other.state)
        && Arrays.equals(noise, other.noise)
        && Arrays.equals(given, other.given);
  }

  Place place() {
    return new Place(list(state), list(noise), list(given), time, step);
  }

  private static List<Double> list(double[] values) {
    return Arrays.stream(values).boxed().collect(Collectors.toUnmodifiableList());
  }
}
