package dev.estimation.filters.modelcheck;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;

/**
 * Where to call a model: the centre, both ends of every input by itself, the two ends of all together, and then places
 * drawn evenly. Inputs are state, noise, given, time and step, each from -1 to 1.
 */
final class Places {
  /** Noise runs over this many standard deviations. */
  static final double DEVIATIONS = 3;

  private final Subject subject;
  private final Region region;
  private final Range given;
  private final int inputs;

  Places(Subject subject, Region region, Range given) {
    this.subject = subject;
    this.region = region;
    this.given = given;
    this.inputs = subject.input().dimension() + given.size() + 2;
  }

  List<Arguments> take(int count, long seed) {
    List<Arguments> places = new ArrayList<>();
    for (double[] coordinates : coordinates(count, seed)) {
      places.add(at(coordinates));
    }
    return places;
  }

  private List<double[]> coordinates(int count, long seed) {
    List<double[]> all = new ArrayList<>();
    all.add(new double[inputs]);
    for (int i = 0; i < inputs; i++) {
      if (varies(i)) {
        all.add(end(i, i + 1, -1));
        all.add(end(i, i + 1, 1));
      }
    }
    all.add(end(0, inputs, -1));
    all.add(end(0, inputs, 1));
    SplittableRandom random = new SplittableRandom(seed);
    while (all.size() < count) {
      double[] place = new double[inputs];
      for (int i = 0; i < inputs; i++) {
        place[i] = 2 * random.nextDouble() - 1;
      }
      all.add(place);
    }
    return all.subList(0, count);
  }

  private double[] end(int from, int to, double value) {
    double[] place = new double[inputs];
    for (int i = from; i < to; i++) {
      place[i] = value;
    }
    return place;
  }

  private boolean varies(int input) {
    int d = subject.state().dimension();
    int i = input - d - subject.noises();
    if (i < 0) {
      return input >= d || region.halfWidths()[input] > 0;
    }
    if (i < given.size()) {
      return given.isOpen(i);
    }
    return !subject.isSensor() && (i == given.size() ? region.time() : region.step()).isOpen(0);
  }

  private Arguments at(double[] coordinates) {
    double[] tangent = region.halfWidths();
    int input = 0;
    for (; input < tangent.length; input++) {
      tangent[input] *= coordinates[input];
    }
    double[] state = new double[subject.state().storage()];
    subject.state().displace(region.centre(), tangent, state);
    int noiseStart = input;
    input += subject.noises();
    double[] others = new double[given.size()];
    for (int i = 0; i < others.length; i++) {
      others[i] = given.at(i, coordinates[input++]);
    }
    double time = subject.isSensor() ? Double.NaN : region.time().at(0, coordinates[input]);
    double step = subject.isSensor() ? Double.NaN : region.step().at(0, coordinates[input + 1]);
    Arguments at = new Arguments(state, new double[subject.noises()], others, time, step);
    double[] reach = noiseReach(subject, at);
    for (int i = 0; i < reach.length; i++) {
      at.noise[i] = reach[i] * coordinates[noiseStart + i];
    }
    return at;
  }

  /** How far the noise inside goes; 0 where its variance is none. */
  static double[] noiseReach(Subject subject, Arguments at) {
    double[] reach = new double[subject.noises()];
    if (reach.length > 0) {
      Attempt covariance = Attempt.of(subject.noise(), at);
      for (int i = 0; i < reach.length && !covariance.threw(); i++) {
        double variance = covariance.out()[i * (reach.length + 1)];
        boolean sound = variance > 0 && variance <= Double.MAX_VALUE;
        reach[i] = sound ? DEVIATIONS * Math.sqrt(variance) : 0;
      }
    }
    return reach;
  }
}
