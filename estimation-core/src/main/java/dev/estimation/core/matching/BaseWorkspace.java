package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.internal.Checks;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.space.Space;
import org.ejml.data.DMatrixRMaj;

/** What all matchings share: checks, the factor of the input, the image of the centre, the results. */
abstract class BaseWorkspace implements MatchingWorkspace {
  final Space inputSpace;
  final Space outputSpace;
  final ActiveFactor active;
  final GuardedFunction function;
  final DMatrixRMaj cross;
  final double[] centre;
  int jacobians;
  private final Moments output;
  private MatchingStatus status = MatchingStatus.MATCHED;
  private final double[] handed;
  final DMatrixRMaj noise;
  private int failedIndex;
  private double failedValue;

  BaseWorkspace(Space inputSpace, Space outputSpace, VectorFunction function) {
    this.inputSpace = inputSpace;
    this.outputSpace = outputSpace;
    int dimension = inputSpace.dimension();
    this.active = new ActiveFactor(function.structure().activeInputs(dimension), dimension);
    this.function = new GuardedFunction(function);
    this.cross = new DMatrixRMaj(active.count(), outputSpace.dimension());
    this.centre = new double[outputSpace.storage()];
    this.output = new Moments(outputSpace);
    this.handed = new double[inputSpace.storage()];
    this.noise = new DMatrixRMaj(outputSpace.dimension(), outputSpace.dimension());
  }

  @Override
  public final MatchingStatus carry(Moments input, double[] given, DMatrixRMaj additiveNoise) {
    checkShapes(input, additiveNoise);
    function.reset();
    jacobians = 0;
    status = MatchingStatus.MATCHED;
    status = carryChecked(input, given, additiveNoise);
    return status;
  }

  private MatchingStatus carryChecked(Moments input, double[] given, DMatrixRMaj additiveNoise) {
    if (!isFinite(input.mean())) {
      return MatchingStatus.INPUT_NOT_FINITE;
    }
    if (additiveNoise != null && !isFinite(additiveNoise)) {
      return MatchingStatus.NOISE_NOT_FINITE;
    }
    if (!active.factor(input)) {
      return MatchingStatus.INPUT_NOT_DEFINITE;
    }
    if (!function.evaluate(copied(input.mean()), given, centre)) {
      return MatchingStatus.FUNCTION_NOT_FINITE;
    }
    double[] mean = output.changeMean();
    DMatrixRMaj covariance = output.changeCovariance();
    MatchingStatus matched = match(input.mean(), given, mean, covariance.data);
    if (matched != MatchingStatus.MATCHED) {
      return matched;
    }
    if (additiveNoise == null) {
      noise.zero();
    } else {
      noise.setTo(additiveNoise);
    }
    addNoise(covariance);
    return Checks.allFinite(mean) && SymmetricMatrix.allFinite(covariance)
        ? MatchingStatus.MATCHED
        : MatchingStatus.OUTPUT_NOT_FINITE;
  }

  /** A copy to hand to a function, which may write on it against its contract. */
  final double[] copied(double[] point) {
    System.arraycopy(point, 0, handed, 0, handed.length);
    return handed;
  }

  private boolean isFinite(double[] mean) {
    if (Checks.allFinite(mean)) {
      return true;
    }
    failedIndex = Checks.firstNotFinite(mean);
    failedValue = mean[failedIndex];
    return false;
  }

  private boolean isFinite(DMatrixRMaj noise) {
    if (SymmetricMatrix.allFinite(noise)) {
      return true;
    }
    failedIndex = SymmetricMatrix.firstNotFinite(noise);
    failedValue = noise.data[failedIndex];
    return false;
  }

  /**
   * Finds the moments of the output, given the image of the mean in {@link #centre}.
   *
   * @param outputMean filled
   * @param outputCovariance lower triangle filled, row by row
   */
  abstract MatchingStatus match(
      double[] mean, double[] given, double[] outputMean, double[] outputCovariance);

  private void checkShapes(Moments input, DMatrixRMaj noise) {
    if (input.mean().length != inputSpace.storage()
        || input.covariance().numRows != inputSpace.dimension()) {
      throw new IllegalArgumentException("input must have dimension " + inputSpace.dimension()
          + ", got " + input.covariance().numRows);
    }
    int m = outputSpace.dimension();
    if (noise != null && (noise.numRows != m || noise.numCols != m)) {
      throw new IllegalArgumentException("additive noise must be " + m + " x " + m
          + " to match the output, got " + noise.numRows + " x " + noise.numCols);
    }
  }

  /** Adds the noise of this call, and mirrors the lower triangle. */
  final void addNoise(DMatrixRMaj covariance) {
    int size = covariance.numRows * covariance.numRows;
    for (int i = 0; i < size; i++) {
      covariance.data[i] += noise.data[i];
    }
    SymmetricMatrix.mirrorLower(covariance);
  }

  @Override
  public final Moments output() {
    return output;
  }

  @Override
  public final DMatrixRMaj inputFactor() {
    return active.columns();
  }

  @Override
  public final DMatrixRMaj restFactor() {
    return active.rest();
  }

  @Override
  public final DMatrixRMaj unitCrossCovariance() {
    return cross;
  }

  final void requireOutputShape(DMatrixRMaj matrix) {
    int m = outputSpace.dimension();
    if (matrix.numRows != m || matrix.numCols != m) {
      throw new IllegalArgumentException("a matrix of the output must be " + m + " x " + m
          + ", got " + matrix.numRows + " x " + matrix.numCols);
    }
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
      case INPUT_NOT_DEFINITE -> "covariance is not positive semi-definite: " + active.failure();
      case FUNCTION_NOT_FINITE -> function.failure();
      case JACOBIAN_NOT_FINITE -> jacobianFailure();
      case OUTPUT_NOT_FINITE -> "moments of the output are not finite: the deviations overflow";
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
}
