package dev.estimation.core.function;

import java.util.List;

/**
 * A derivative with which differences disagree. <i>Immutable.</i>
 *
 * @param kind what is wrong
 * @param row the output, from 0
 * @param column the input, from 0
 * @param secondColumn the other input of an entry of a Hessian, from 0; -1 for a Jacobian
 * @param given the value given; 0 in the column of an input that is declared inactive
 * @param differenced the value by differences; NaN where the function is not finite
 * @param point where
 */
public record JacobianFinding(
    Kind kind,
    int row,
    int column,
    int secondColumn,
    double given,
    double differenced,
    List<Double> point) {

  /** What is wrong. */
  public enum Kind {
    /** An entry of the Jacobian. */
    JACOBIAN,
    /** An entry of the Hessian, which is compared with differences of the Jacobian. */
    HESSIAN,
    /** An input that is declared inactive changes an output. */
    INACTIVE_INPUT
  }

  /** {@return |given - differenced| over the larger of the two magnitudes} */
  public double relativeDifference() {
    return Math.abs(given - differenced) / Math.max(Math.abs(given), Math.abs(differenced));
  }

  @Override
  public String toString() {
    String what = switch (kind) {
      case JACOBIAN -> "Jacobian[" + row + "][" + column + "]";
      case HESSIAN -> "Hessian[" + row + "][" + column + "][" + secondColumn + "]";
      case INACTIVE_INPUT ->
        "input " + column + " is declared inactive but changes output " + row + ":";
    };
    return what + " given " + given + ", by differences " + differenced + ", relative difference "
        + relativeDifference() + ", at " + point;
  }
}
