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
 *       given, g(u) = A(u_a) u_b + c(u_a). Points are drawn for u_a alone and the rest follows in closed form
 *       (Morelande and Moran 2007, from memory): a coordinated turn, linear given the turn rate, costs what a
 *       function of one input costs.
 *   <li><i>Jacobian</i>: its partial derivatives.
 *   <li><i>Hessian</i>: its second partial derivatives.
 * </ul>
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
   * This structure with the inputs in which the function is linear once the others are given.
   *
   * @param indices distinct, of active inputs; none if there are none; copied
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
