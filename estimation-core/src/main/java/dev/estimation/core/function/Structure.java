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
 *   <li><i>Jacobian</i>: its partial derivatives.
 * </ul>
 *
 * <p><i>Immutable.</i> Start from {@link #UNKNOWN} and add what is known.
 */
public final class Structure {
  /** Nothing is known: every input may matter, and there is no Jacobian. */
  public static final Structure UNKNOWN = new Structure(null, null);

  private final int[] activeInputs;
  private final Jacobian jacobian;

  private Structure(int[] activeInputs, Jacobian jacobian) {
    this.activeInputs = activeInputs;
    this.jacobian = jacobian;
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
    return new Structure(indices.clone(), jacobian);
  }

  /** {@return this structure with every input active} */
  public Structure withAllInputsActive() {
    return new Structure(null, jacobian);
  }

  /**
   * {@return this structure with a Jacobian}
   *
   * @param derivatives of the function, over all inputs
   */
  public Structure withJacobian(Jacobian derivatives) {
    return new Structure(activeInputs, derivatives);
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

  /** {@return the Jacobian, where one is known} */
  public Optional<Jacobian> jacobian() {
    return Optional.ofNullable(jacobian);
  }
}
