package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import org.ejml.data.DMatrixRMaj;

/**
 * What all matchings share: checks, the factor of the input, the image of the centre, the results. A
 * matching gives the output's covariance and what regression leaves of it as weighted columns, so that both
 * forms follow from one description.
 */
abstract class BaseWorkspace implements MatchingWorkspace {
  final Space inputSpace;
  final Space outputSpace;
  final Form form;
  final ActiveFactor active;
  final GuardedFunction function;
  final double[] centre;
  int jacobians;
  private final DMatrixRMaj cross;
  private final Moments output;
  private Covariance noise;
  private final Covariance unexplained;
  private final double[] handed;
  private boolean outputKnown = true;
  private boolean crossKnown;
  private boolean unexplainedKnown;
  private MatchingStatus status = MatchingStatus.MATCHED;
  private int failedIndex;
  private double failedValue;

  /** A workspace over inputs in the given order; {@code inputs} are those that the function reads. */
  BaseWorkspace(
      Space inputSpace, Space outputSpace, VectorFunction function, int[] inputs, Form form) {
    this.inputSpace = inputSpace;
    this.outputSpace = outputSpace;
    this.form = form;
    int m = outputSpace.dimension();
    this.active = new ActiveFactor(inputs, inputSpace.dimension());
    this.function = new GuardedFunction(function);
    this.cross = new DMatrixRMaj(active.count(), m);
    this.centre = new double[outputSpace.storage()];
    this.output = new Moments(outputSpace);
    this.handed = new double[inputSpace.storage()];
    this.unexplained = new Covariance(m);
  }

  @Override
  public final MatchingStatus carry(
      Moments input, double[] given, Covariance additiveNoise, Use use) {
    checkShapes(input, additiveNoise);
    function.reset();
    jacobians = 0;
    crossKnown = false;
    unexplainedKnown = false;
    status = MatchingStatus.MATCHED;
    status = carryChecked(input, given, additiveNoise, use);
    return status;
  }

  /** Whether the last call gave moments. */
  final boolean hasResult() {
    return status.hasResult();
  }

  private MatchingStatus carryChecked(
      Moments input, double[] given, Covariance additiveNoise, Use use) {
    double[] mean = input.mean();
    if (!Checks.allFinite(mean)) {
      failedIndex = Checks.firstNotFinite(mean);
      failedValue = mean[failedIndex];
      return MatchingStatus.INPUT_NOT_FINITE;
    }
    if (additiveNoise != null && form == Form.SQUARE_ROOT && !additiveNoise.factor()) {
      return faultOf(additiveNoise, MatchingStatus.NOISE_NOT_DEFINITE);
    }
    if (!active.factor(input)) {
      return MatchingStatus.INPUT_NOT_DEFINITE;
    }
    if (!function.evaluate(copied(mean), given, centre)) {
      return MatchingStatus.FUNCTION_NOT_FINITE;
    }
    if (!Arrays.equals(handed, mean)) {
      failedIndex = Arrays.mismatch(handed, mean);
      failedValue = handed[failedIndex];
      return MatchingStatus.FUNCTION_CHANGED_INPUT;
    }
    noise = additiveNoise;
    MatchingStatus matched = match(mean, given, use, output.changeMean());
    if (!matched.hasResult()) {
      return matched;
    }
    outputKnown = false;
    MatchingStatus ended = use == Use.PREDICTION ? fillCovariance() : MatchingStatus.MATCHED;
    if (Checks.allFinite(output.mean()) && ended != MatchingStatus.OUTPUT_NOT_FINITE) {
      return ended == MatchingStatus.MATCHED ? matched : ended;
    }
    return additiveNoise != null
        ? faultOf(additiveNoise, MatchingStatus.OUTPUT_NOT_FINITE)
        : MatchingStatus.OUTPUT_NOT_FINITE;
  }

  private MatchingStatus fillCovariance() {
    outputKnown = true;
    return columns().fill(noise, output.factoredCovariance());
  }

  /** The noise that is not finite, or another fault. */
  final MatchingStatus faultOf(Covariance additiveNoise, MatchingStatus otherwise) {
    DMatrixRMaj matrix = additiveNoise.matrix();
    if (SymmetricMatrix.allFinite(matrix)) {
      return otherwise;
    }
    failedIndex = SymmetricMatrix.firstNotFinite(matrix);
    failedValue = matrix.data[failedIndex];
    return MatchingStatus.NOISE_NOT_FINITE;
  }

  /** A copy to hand to a function, which may write on it against its contract. */
  final double[] copied(double[] point) {
    System.arraycopy(point, 0, handed, 0, handed.length);
    return handed;
  }

  /**
   * Finds the mean of the output and fills {@link #columns()}, given the image of the mean in {@link
   * #centre}.
   *
   * @param use what the result is for
   * @param outputMean filled
   */
  abstract MatchingStatus match(double[] mean, double[] given, Use use, double[] outputMean);

  /** The noise of this call, or null. */
  final Covariance noise() {
    return noise;
  }

  /** The covariance of the output, without noise. */
  abstract WeightedColumns columns();

  /** Fills what a regression on the input leaves of the columns, and returns it. */
  abstract WeightedColumns residuals();

  /** Fills W. */
  abstract void fillCross(double[] w);

  private void checkShapes(Moments input, Covariance additiveNoise) {
    if (input.mean().length != inputSpace.storage()
        || input.space().dimension() != inputSpace.dimension()) {
      throw new IllegalArgumentException("input must have dimension " + inputSpace.dimension()
          + ", got " + input.space().dimension());
    }
    int m = outputSpace.dimension();
    if (additiveNoise != null && additiveNoise.dimension() != m) {
      int got = additiveNoise.dimension();
      throw new IllegalArgumentException("additive noise must be " + m + " x " + m
          + " to match the output, got " + got + " x " + got);
    }
  }

  @Override
  public final Moments output() {
    if (!outputKnown) {
      fillCovariance();
    }
    return output;
  }

  @Override
  public final double[] mean() {
    return output.mean();
  }

  @Override
  public final int activeInputs() {
    return active.count();
  }

  @Override
  public final DMatrixRMaj inputFactor() {
    return active.factor();
  }

  @Override
  public final int[] inputOrder() {
    return active.order();
  }

  /** Made when asked for: a filter's prediction does without it. */
  @Override
  public final DMatrixRMaj unitCrossCovariance() {
    if (!crossKnown) {
      fillCross(cross.data);
      crossKnown = true;
    }
    return cross;
  }

  @Override
  public Covariance unexplained() {
    if (!unexplainedKnown) {
      residuals().fill(noise, unexplained);
      unexplainedKnown = true;
    }
    return unexplained;
  }

  @Override
  public final int evaluations() {
    return function.evaluations();
  }

  @Override
  public final int jacobians() {
    return jacobians;
  }

  @Override
  public final String failure() {
    return switch (status) {
      case MATCHED -> "";
      case INPUT_NOT_FINITE -> "mean[" + failedIndex + "] must be finite, got " + failedValue;
      case NOISE_NOT_FINITE -> noiseFailure();
      case NOISE_NOT_DEFINITE -> "additive noise is not positive semi-definite";
      case INPUT_NOT_DEFINITE -> "covariance is not positive semi-definite: " + active.failure();
      case FUNCTION_NOT_FINITE -> function.failure();
      case FUNCTION_CHANGED_INPUT ->
        "the function must only read its input, wrote " + failedValue + " on input[" + failedIndex
            + "]";
      case JACOBIAN_NOT_FINITE -> jacobianFailure();
      case OUTPUT_NOT_FINITE ->
        "moments of the output are not finite: the deviations overflow, or the function has left "
            + outputSpace;
      case OUTPUT_NOT_DEFINITE ->
        "covariance of the output is not positive definite: negative weights outweigh the others";
      case BELOW_TOLERANCE -> toleranceFailure();
    };
  }

  private String noiseFailure() {
    int m = outputSpace.dimension();
    return "additive noise[" + failedIndex / m + "][" + failedIndex % m + "] must be finite, got "
        + failedValue;
  }

  String jacobianFailure() {
    return "";
  }

  String toleranceFailure() {
    return "";
  }
}
