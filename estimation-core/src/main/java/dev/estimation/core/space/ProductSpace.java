package dev.estimation.core.space;

import java.util.ArrayList;
import java.util.List;
import java.util.StringJoiner;

/** Points of several spaces one after the other; two or more factors, none of them a product. */
final class ProductSpace implements Space {
  private final Space[] factors;
  private final int storage;
  private final int dimension;

  private ProductSpace(List<Space> factors) {
    this.factors = factors.toArray(Space[]::new);
    this.storage = factors.stream().mapToInt(Space::storage).sum();
    this.dimension = factors.stream().mapToInt(Space::dimension).sum();
  }

  static Space of(Space first, Space next) {
    List<Space> factors = new ArrayList<>();
    append(first, factors);
    append(next, factors);
    return factors.size() == 1 ? factors.get(0) : new ProductSpace(factors);
  }

  /** Adds the factors of a space, and joins a flat one to a flat one before it. */
  private static void append(Space space, List<Space> factors) {
    if (space instanceof ProductSpace product) {
      for (Space factor : product.factors) {
        append(factor, factors);
      }
      return;
    }
    int last = factors.size() - 1;
    if (space instanceof FlatSpace flat
        && last >= 0
        && factors.get(last) instanceof FlatSpace before) {
      factors.set(last, before.and(flat));
    } else {
      factors.add(space);
    }
  }

  @Override
  public int storage() {
    return storage;
  }

  @Override
  public int dimension() {
    return dimension;
  }

  @Override
  public void difference(double[] a, double[] b, double[] tangent) {
    difference(a, b, 0, tangent, 0);
  }

  @Override
  public void difference(
      double[] a, double[] b, int pointStart, double[] tangent, int tangentStart) {
    int point = pointStart;
    int at = tangentStart;
    for (Space factor : factors) {
      factor.difference(a, b, point, tangent, at);
      point += factor.storage();
      at += factor.dimension();
    }
  }

  @Override
  public void displace(double[] point, double[] tangent, double[] result) {
    displace(point, tangent, 0, result, 0);
  }

  @Override
  public void displace(
      double[] point, double[] tangent, int tangentStart, double[] result, int pointStart) {
    int place = pointStart;
    int at = tangentStart;
    for (Space factor : factors) {
      factor.displace(point, tangent, at, result, place);
      place += factor.storage();
      at += factor.dimension();
    }
  }

  @Override
  public boolean contains(double[] point, int start) {
    int place = start;
    for (Space factor : factors) {
      if (!factor.contains(point, place)) {
        return false;
      }
      place += factor.storage();
    }
    return true;
  }

  @Override
  public boolean equals(Object other) {
    return other instanceof ProductSpace that && List.of(factors).equals(List.of(that.factors));
  }

  @Override
  public int hashCode() {
    return List.of(factors).hashCode();
  }

  @Override
  public String toString() {
    StringJoiner text = new StringJoiner(" x ");
    for (Space factor : factors) {
      text.add(factor.toString());
    }
    return text.toString();
  }
}
