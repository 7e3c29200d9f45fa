package dev.estimation.core.space;

/** A space as a user may write it: lengths above 0, of which logarithms differ; no more than it must. */
final class UserSpace implements Space {
  @Override
  public int storage() {
    return 1;
  }

  @Override
  public int dimension() {
    return 1;
  }

  @Override
  public void difference(double[] a, double[] b, double[] tangent) {
    tangent[0] = Math.log(a[0] / b[0]);
  }

  @Override
  public void displace(double[] point, double[] tangent, double[] result) {
    result[0] = point[0] * Math.exp(tangent[0]);
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof UserSpace;
  }

  @Override
  public int hashCode() {
    return 1;
  }

  @Override
  public String toString() {
    return "(lengths)";
  }
}
