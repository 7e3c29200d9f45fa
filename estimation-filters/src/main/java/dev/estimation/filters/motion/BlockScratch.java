package dev.estimation.filters.motion;

import java.util.Arrays;

/** The parts of arrays that a block sees. One thread's own; what it gives is valid until it is asked again. */
final class BlockScratch {
  private final BlockPlace place;
  private final double[] state;
  private final double[] control;
  private final double[] noise;
  private final double[] next;
  private final double[] square;
  private final double[] byNoise;
  private final double[] noiseSquare;
  private double[] cube = {};

  BlockScratch(BlockPlace place) {
    this.place = place;
    int d = place.dimension();
    int q = place.noises();
    this.state = new double[place.storage()];
    this.control = new double[place.controls()];
    this.noise = new double[q];
    this.next = new double[place.storage()];
    this.square = new double[d * d];
    this.byNoise = new double[d * q];
    this.noiseSquare = new double[q * q];
  }

  double[] state(double[] whole) {
    System.arraycopy(whole, place.storageStart(), state, 0, state.length);
    return state;
  }

  double[] control(double[] whole) {
    System.arraycopy(whole, place.controlStart(), control, 0, control.length);
    return control;
  }

  double[] noise(double[] whole) {
    System.arraycopy(whole, place.noiseStart(), noise, 0, noise.length);
    return noise;
  }

  /** An array of NaN for the next state. */
  double[] next() {
    Arrays.fill(next, Double.NaN);
    return next;
  }

  void putNext(double[] whole) {
    System.arraycopy(next, 0, whole, place.storageStart(), next.length);
  }

  /** Zeros, d x d. */
  double[] square() {
    Arrays.fill(square, 0);
    return square;
  }

  void putSquare(double[] whole, int total) {
    put(square, place.dimension(), place.start(), place.start(), whole, total);
  }

  /** Zeros, d x q. */
  double[] byNoise() {
    Arrays.fill(byNoise, 0);
    return byNoise;
  }

  void putByNoise(double[] whole, int totalNoises) {
    put(byNoise, place.noises(), place.start(), place.noiseStart(), whole, totalNoises);
  }

  /** Zeros, q x q. */
  double[] noiseSquare() {
    Arrays.fill(noiseSquare, 0);
    return noiseSquare;
  }

  void putNoiseSquare(double[] whole, int totalNoises) {
    put(noiseSquare, place.noises(), place.noiseStart(), place.noiseStart(), whole, totalNoises);
  }

  /** Zeros, d x d x d. */
  double[] cube() {
    int d = place.dimension();
    if (cube.length == 0) {
      cube = new double[d * d * d]; // at the first call: few ask for Hessians
    }
    Arrays.fill(cube, 0);
    return cube;
  }

  void putCube(double[] whole, int total) {
    int d = place.dimension();
    for (int i = 0; i < d; i++) {
      for (int j = 0; j < d; j++) {
        int to = ((place.start() + i) * total + place.start() + j) * total + place.start();
        System.arraycopy(cube, (i * d + j) * d, whole, to, d);
      }
    }
  }

  private static void put(
      double[] part, int columns, int row, int column, double[] whole, int wholeColumns) {
    for (int at = 0; at < part.length; at += columns) {
      int to = (row + at / columns) * wholeColumns + column;
      System.arraycopy(part, at, whole, to, columns);
    }
  }
}
