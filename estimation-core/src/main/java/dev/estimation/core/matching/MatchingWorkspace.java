package dev.estimation.core.matching;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import org.ejml.data.DMatrixRMaj;

/**
 * One thread's scratch and results for carrying moments through one function. <i>Confined to one
 * thread</i>; allocates only when built.
 *
 * <p>With n the dimension of the input, k the number of active inputs and m the dimension of the
 * output, the cross-covariance of input and output is the product of two small matrices, P_uz = B W: B, the
 * first k columns of {@link #inputFactor()}, and {@link #unitCrossCovariance()} W, k x m. B B' is the part
 * of the input covariance that the active inputs carry. Gains and smoother gains are made from the two.
 */
public interface MatchingWorkspace {
  /**
   * Carries moments through the function.
   *
   * @param input read; its lower factor is made if it has none
   * @param given read and handed to the function
   * @param additiveNoise covariance added to the output's, m x m, kept until the next call and not to be
   *     changed before; or null
   * @param use what the result is for
   * @return {@link MatchingStatus#MATCHED} if the results below are valid, {@link MatchingStatus#BELOW_TOLERANCE} if they
   *     are but not as accurate as asked for; otherwise they are not. {@link #failure()} says what was wrong
   * @throws IllegalArgumentException if a shape is wrong
   */
  MatchingStatus carry(Moments input, double[] given, Covariance additiveNoise, Use use);

  /**
   * Carries moments for a prediction; see {@link #carry(Moments, double[], Covariance, Use)}.
   *
   * @param input read
   * @param given read and handed to the function
   * @param additiveNoise kept until the next call; or null
   * @return how it ended
   */
  default MatchingStatus carry(Moments input, double[] given, Covariance additiveNoise) {
    return carry(input, given, additiveNoise, Use.PREDICTION);
  }

  /** {@return the mean of the output; read only, valid until the next call} */
  double[] mean();

  /**
   * The result, in the form of this workspace: a covariance, symmetric and finite, or a lower factor. Whether a
   * covariance is positive semi-definite is for the caller to ask, since negative weights can undo that.
   *
   * @return mean and covariance of the output, noise included; read only, valid until the next call
   */
  Moments output();

  /** {@return k, the number of active inputs} */
  int activeInputs();

  /**
   * A factor L of the input's covariance, L L', with active inputs first: its first k columns B carry the
   * active inputs, the others are what the remaining inputs have of their own and are zero in the rows of
   * active ones.
   *
   * @return n x n, rows in natural order; read only, valid until the next call
   */
  DMatrixRMaj inputFactor();

  /** {@return the inputs, active ones first: with its rows in this order, that factor is lower triangular} */
  int[] inputOrder();

  /** {@return W, k x m, with P_uz = B W; read only, valid until the next call} */
  DMatrixRMaj unitCrossCovariance();

  /**
   * The covariance of what a regression on the input does not explain of the output, additive noise
   * included: P_zz - W'W, formed without that subtraction. First-order linearisation gives the noise itself. Not positive
   * semi-definite only where negative weights have made it so; an update would then give an indefinite
   * covariance.
   *
   * @return m x m; read only, valid until the next call
   */
  Covariance unexplained();

  /** {@return the function evaluations of the last call, those for numerical derivatives included} */
  int evaluations();

  /**
   * {@return the Jacobians formed in the last call, analytic or by differences, those that differences
   * for a Hessian take included}
   */
  int jacobians();

  /**
   * The estimated error of the last call's moments where they are used, the largest of mean, covariance and cross-covariance
   * in the sense of {@code MatchingError} in {@code core.accuracy}.
   *
   * @return the estimate, infinite if there is no result or nothing to go by; NaN from all matchings but {@link
   *     ToleranceMatching}
   */
  default double estimatedError() {
    return Double.NaN;
  }

  /** {@return what was wrong in the last call, in words; empty if nothing was} */
  String failure();
}
