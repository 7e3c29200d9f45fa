package dev.estimation.filters.filter;

import dev.estimation.core.space.Space;

/** A space followed by real numbers: a state and its noise. */
final class AppendedReals implements Space {
  private final Space first;
  private final int reals;

  AppendedReals(Space first, int reals) {
    this.first = first;
    this.reals = reals;
  }

  @Override
  public int storage() {
    return first.storage() + reals;
  }

  @Override
  public int dimension() {
    return first.dimension() + reals;
  }

  @Override
  public void difference(double[] a, double[] b, double[] tangent) {
    first.difference(a, b, tangent);
    for (int i = 0; i < reals; i++) {
      int at = first.storage() + i;
      tangent[first.dimension() + i] = a[at] - b[at];
    }
  }

  @Override
  public void displace(double[] point, double[] tangent, double[] result) {
    first.displace(point, tangent, result);
    for (int i = 0; i < reals; i++) {
      int at = first.storage() + i;
      result[at] = point[at] + tangent[first.dimension() + i];
    }
  }
}
