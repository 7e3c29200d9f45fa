package dev.estimation.core.points;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Extends a symmetric quadrature rule for N(0, 1) by the best nodes, with 150 digits (Patterson 1968,
 * with the normal weight as Genz and Keister 1996). The table in {@link NestedNodes} was made by this.
 *
 * <p>Let p be the polynomial that vanishes at the present nodes, of odd degree as the centre is one of
 * them. Of m new nodes, m even, E = x^m + e_(m/2-1) x^(m-2) + ... + e_0 is the polynomial. E[p E x^k]
 * must be 0 for all k below m; for even k it is by symmetry, so m / 2 linear equations remain for as many
 * unknowns. Weights are means of Lagrange polynomials, here in y = x^2, since odd ones are 0.
 */
final class NormalExtension {
  static final MathContext DIGITS = new MathContext(150);

  /** Nodes of 0 or more in the order in which they were added. */
  private final List<BigDecimal> nodes = new ArrayList<>(List.of(BigDecimal.ZERO));

  /** Adds {@code count} nodes, half of them above 0, in rising order. */
  NormalExtension extend(int count) {
    BigDecimal[] squares = realRoots(extension(count));
    for (BigDecimal square : squares) {
      nodes.add(square.sqrt(DIGITS));
    }
    return this;
  }

  List<BigDecimal> nodes() {
    return nodes;
  }

  /** The weights of the nodes of 0 or more; those below 0 have the same. */
  List<BigDecimal> weights() {
    List<BigDecimal> weights = new ArrayList<>();
    for (BigDecimal node : nodes) {
      BigDecimal square = square(node);
      BigDecimal[] lagrange = {BigDecimal.ONE};
      for (BigDecimal other : nodes) {
        if (other != node) {
          BigDecimal slope = BigDecimal.ONE.divide(square.subtract(square(other)), DIGITS);
          lagrange = times(lagrange, square(other).negate().multiply(slope, DIGITS), slope);
        }
      }
      BigDecimal pair = mean(lagrange, 0);
      weights.add(node.signum() == 0 ? pair : pair.divide(BigDecimal.valueOf(2), DIGITS));
    }
    return weights;
  }

  /** E x^power: (power - 1)!! for an even power. */
  static BigDecimal moment(int power) {
    BigDecimal result = power % 2 == 0 ? BigDecimal.ONE : BigDecimal.ZERO;
    for (int factor = power - 1; factor > 1; factor -= 2) {
      result = result.multiply(BigDecimal.valueOf(factor));
    }
    return result;
  }

  /** The coefficients of E in y = x^2, lowest first. */
  private BigDecimal[] extension(int count) {
    // p = x times a polynomial in y.
    BigDecimal[] present = {BigDecimal.ONE};
    for (BigDecimal node : nodes.subList(1, nodes.size())) {
      present = times(present, square(node).negate(), BigDecimal.ONE);
    }
    int half = count / 2;
    BigDecimal[][] rows = new BigDecimal[half][half + 1];
    for (int row = 0; row < half; row++) {
      for (int column = 0; column <= half; column++) {
        // x from p and x^(2 row + 1) together are y^(row + 1).
        rows[row][column] = mean(present, column + row + 1);
      }
      rows[row][half] = rows[row][half].negate();
    }
    BigDecimal[] monic = Arrays.copyOf(solve(rows), half + 1);
    monic[half] = BigDecimal.ONE;
    return monic;
  }

  /** E[a(x^2) x^(2 shift)]. */
  private static BigDecimal mean(BigDecimal[] a, int shift) {
    BigDecimal sum = BigDecimal.ZERO;
    for (int i = 0; i < a.length; i++) {
      sum = sum.add(a[i].multiply(moment(2 * (i + shift)), DIGITS), DIGITS);
    }
    return sum;
  }

  private static BigDecimal square(BigDecimal x) {
    return x.multiply(x, DIGITS);
  }

  /** a(y) (constant + slope y). */
  private static BigDecimal[] times(BigDecimal[] a, BigDecimal constant, BigDecimal slope) {
    BigDecimal[] result = new BigDecimal[a.length + 1];
    Arrays.fill(result, BigDecimal.ZERO);
    for (int i = 0; i < a.length; i++) {
      result[i] = result[i].add(a[i].multiply(constant, DIGITS), DIGITS);
      result[i + 1] = result[i + 1].add(a[i].multiply(slope, DIGITS), DIGITS);
    }
    return result;
  }

  /** Gaussian elimination with row exchanges; the last column is the right side. */
  private static BigDecimal[] solve(BigDecimal[][] rows) {
    int size = rows.length;
    for (int pivot = 0; pivot < size; pivot++) {
      int column = pivot;
      Arrays.sort(rows, pivot, size, (a, b) -> b[column].abs().compareTo(a[column].abs()));
      for (int row = 0; row < size; row++) {
        if (row != pivot) {
          subtract(rows[row], rows[pivot], pivot);
        }
      }
    }
    BigDecimal[] solution = new BigDecimal[size];
    for (int row = 0; row < size; row++) {
      solution[row] = rows[row][size].divide(rows[row][row], DIGITS);
    }
    return solution;
  }

  private static void subtract(BigDecimal[] row, BigDecimal[] pivotRow, int pivot) {
    BigDecimal factor = row[pivot].divide(pivotRow[pivot], DIGITS);
    for (int column = pivot; column < row.length; column++) {
      row[column] = row[column].subtract(factor.multiply(pivotRow[column], DIGITS), DIGITS);
    }
  }

  /** All roots, which must be simple, above 0.02, below 100 and more than 0.05 apart; by bisection. */
  private static BigDecimal[] realRoots(BigDecimal[] polynomial) {
    List<BigDecimal> roots = new ArrayList<>();
    BigDecimal step = new BigDecimal("0.05");
    for (int i = 0; i < 2000; i++) {
      // A third of a step off, so that no root, such as 3, lies on the grid.
      BigDecimal from = step.multiply(new BigDecimal(i + ".333"));
      if (value(polynomial, from).signum() * value(polynomial, from.add(step)).signum() < 0) {
        roots.add(bisect(polynomial, from, step));
      }
    }
    if (roots.size() != polynomial.length - 1) {
      throw new ArithmeticException("found the roots " + roots);
    }
    return roots.toArray(new BigDecimal[0]);
  }

  private static BigDecimal bisect(BigDecimal[] polynomial, BigDecimal from, BigDecimal step) {
    int sign = value(polynomial, from).signum();
    BigDecimal low = from;
    BigDecimal width = step;
    // 0.05 / 2^400 = 2e-122.
    for (int i = 0; i < 400; i++) {
      width = width.divide(BigDecimal.valueOf(2), DIGITS);
      BigDecimal middle = low.add(width, DIGITS);
      low = value(polynomial, middle).signum() == sign ? middle : low;
    }
    return low;
  }

  private static BigDecimal value(BigDecimal[] polynomial, BigDecimal y) {
    BigDecimal result = BigDecimal.ZERO;
    for (int i = polynomial.length - 1; i >= 0; i--) {
      result = result.multiply(y, DIGITS).add(polynomial[i], DIGITS);
    }
    return result;
  }
}
