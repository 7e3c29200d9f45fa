package dev.estimation.filters.sensor;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.FlatSpace;
import dev.estimation.filters.model.DifferentiableSensor;

/** A sensor whose components have independent errors of variances that are always the same. */
abstract class ReadySensor implements DifferentiableSensor {
  private final FlatSpace space;
  private final int givenDimension;
  private final Structure structure;
  private final double[] variances;

  /** Variances, one for each component, are kept. */
  ReadySensor(FlatSpace space, int givenDimension, Structure structure, double... variances) {
    this.space = space;
    this.givenDimension = givenDimension;
    this.structure = structure;
    this.variances = variances;
  }

  @Override
  public final FlatSpace measurementSpace() {
    return space;
  }

  @Override
  public final int givenDimension() {
    return givenDimension;
  }

  @Override
  public final Structure structure() {
    return structure;
  }

  @Override
  public void measurementNoise(double[] state, double[] given, double[] covariance) {
    for (int i = 0; i < variances.length; i++) {
      covariance[i * (variances.length + 1)] = variances[i];
    }
  }
}
