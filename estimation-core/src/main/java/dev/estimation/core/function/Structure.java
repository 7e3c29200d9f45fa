package dev.estimation.core.function;

import dev.estimation.core.internal.Checks;
import java.util.Arrays;
import java.util.Optional;

/**
 * What is known of a function beyond its values.
 *
 * <ul>
 *   <li><i>Active inputs</i>: the components of the input that the function reads. Points are drawn
 *       over these alone; how the rest varies with the output follows by regression, exactly for
 *       Gaussian inputs.
 *   <li><i>Linear inputs</i>: those of the active inputs in which the function is linear once the others are
 *       given. Points are drawn for the others alone.
 *   <li><i>Jacobian</i>: its partial derivatives.
 *   <li><i>Hessian</i>: its second partial derivatives.
 * </ul>
 *
 * <p>With linear inputs u_b, the other active ones u_a, and g(u) = A(u_a) u_b + c(u_a), given u_a the mean and
 * covariance of u_b are
 *
 * <pre>
 * m_b|a = m_b + P_ba P_aa^-1 (u_a - m_a)        P_b|a = P_bb - P_ba P_aa^-1 P_ab
 * </pre>
 *
 * <p>and so, with expectations over u_a alone, where points are,
 *
 * <pre>
 * mean  = E[A m_b|a + c]                        P_zz = Cov[A m_b|a + c] + E[A P_b|a A']
 * P_az  = Cov[u_a, A m_b|a + c]                 P_bz = P_ba P_aa^-1 P_az + P_b|a E[A]'
 * </pre>
 *
 * <p>No inverse is formed: with L the lower factor of the covariance, u_a first, P_ba P_aa^-1 (u_a - m_a) is L_ba xi, and
 * S = L_bb has P_b|a = S S', so that columns A S add to those of points. What u_b contributes is exact, also where
 * P_aa is singular. Declare it wherever it is true: a coordinated turn is linear in all but its rate, a
 * pseudorange in the clock, a range rate in the velocity. A claim that is not true gives wrong
 * moments and no message.
 *
 * <p>Cost, a and b the numbers of inputs and N(a) the points of a rule, the centre included, of which N' have a mean
 * weight: N(a) evaluations, and for A N' Jacobians or, without a Jacobian, N' b evaluations more. A function that
 * is linear in all its inputs takes 1 evaluation and 1 Jacobian, or 1 + b evaluations, and is exact. Without a
 * Jacobian a rule of 2 n + 1 points saves nothing, and costs more where a is above 1 or the centre has a weight; products
 * save in any case. Rules whose points move out with n, cubature among them, keep them nearer to the mean: of a
 * range with a spread of 100 km cubature then sees less of the bend.
 * Matchings by derivatives or by differences over the spread, random draws that are not standardised, and those over
 * the whole input make no use of it. Source: Morelande and Moran 2007, <i>An unscented transformation for conditionally
 * linear models</i>, ICASSP (from memory).
 *
 * <p><i>Immutable.</i> Start from {@link #UNKNOWN} and add what is known.
 */
public final class Structure {
  /** Nothing is known: every input may matter, and there are no derivatives. */
  public static final Structure UNKNOWN = new Structure(null, new int[0], null, null);

  private final int[] activeInputs;
  private final int[] linearInputs;
  private final Jacobian jacobian;
  private final Hessian hessian;

  private Structure(int[] activeInputs, int[] linearInputs, Jacobian jacobian, Hessian hessian) {
    this.activeInputs = activeInputs;
    this.linearInputs = linearInputs;
    this.jacobian = jacobian;
    this.hessian = hessian;
  }

  /**
   * This structure with the inputs that the function reads.
   *
   * @param indices 1 or more, distinct, in the order in which points are to be drawn; copied
   * @return a structure that says so
   */
  public Structure withActiveInputs(int... indices) {
    if (indices.length == 0) {
      throw new IllegalArgumentException("a function must read at least 1 input, got 0");
    }
    return new Structure(indices.clone(), linearInputs, jacobian, hessian);
  }

  /**
   * This structure with the inputs in which the function is linear once the others are given; formulas, cost and
   * when to say so stand above.
   *
   * @param indices distinct, of active inputs, dimensions of the tangent as for those; none if there are none;
   *     copied
   * @return a structure that says so
   */
  public Structure withLinearInputs(int... indices) {
    return new Structure(activeInputs, indices.clone(), jacobian, hessian);
  }

  /** {@return this structure with every input active, and said to be linear in none} */
  public Structure withAllInputsActive() {
    return new Structure(null, new int[0], jacobian, hessian);
  }

  /**
   * {@return this structure with a Jacobian}
   *
   * @param derivatives of the function, over all inputs
   */
  public Structure withJacobian(Jacobian derivatives) {
    return new Structure(activeInputs, linearInputs, derivatives, hessian);
  }

  /**
   * {@return this structure with a Hessian}
   *
   * @param derivatives the second ones of the function, over all inputs
   */
  public Structure withHessian(Hessian derivatives) {
    return new Structure(activeInputs, linearInputs, jacobian, derivatives);
  }

  /**
   * The inputs that the function reads: all, unless it was said otherwise.
   *
   * @param dimension the dimension of the input space
   * @return their indices, a copy
   * @throws IllegalArgumentException if an index is not below the dimension, or comes twice
   */
  public int[] activeInputs(int dimension) {
    if (activeInputs == null) {
      int[] all = new int[dimension];
      Arrays.setAll(all, i -> i);
      return all;
    }
    Checks.distinctIndices("active inputs", activeInputs, dimension);
    return activeInputs.clone();
  }

  /** {@return the inputs in which the function is linear once the others are given, a copy} */
  public int[] linearInputs() {
    return linearInputs.clone();
  }

  /**
   * The active inputs that are not linear, in their order.
   *
   * @param dimension the dimension of the input space
   * @return their indices
   * @throws IllegalArgumentException if a linear input is not active or comes twice, or as for {@link
   *     #activeInputs}
   */
  public int[] nonlinearInputs(int dimension) {
    int[] active = activeInputs(dimension);
    Checks.distinctIndices("linear inputs", linearInputs, dimension);
    int[] rest = Arrays.stream(active)
        .filter(index -> Arrays.stream(linearInputs).noneMatch(linear -> linear == index))
        .toArray();
    if (rest.length + linearInputs.length != active.length) {
      throw new IllegalArgumentException("linear inputs must be active inputs, got "
          + Arrays.toString(linearInputs) + " of active " + Arrays.toString(active));
    }
    return rest;
  }

  /** {@return the Jacobian, where one is known} */
  public Optional<Jacobian> jacobian() {
    return Optional.ofNullable(jacobian);
  }

  /** {@return the Hessian, where one is known} */
  public Optional<Hessian> hessian() {
    return Optional.ofNullable(hessian);
  }
}
