package dev.estimation.benchmarks.jmh;

import dev.estimation.core.internal.Householder;
import dev.estimation.core.internal.LowerFactor;
import dev.estimation.core.internal.Products;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.ejml.dense.row.decomposition.chol.CholeskyDecompositionInner_DDRM;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.QRDecomposition;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;

/** The library's own small kernels beside EJML's for the same result. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
public class KernelBenchmark {
  /** Rows and columns. */
  @Param({"2", "5", "9", "15"})
  int n;

  private DMatrixRMaj covariance;
  private DMatrixRMaj result;
  private DMatrixRMaj copy;
  private double[] vector;
  private LowerFactor ours;
  private CholeskyDecompositionInner_DDRM theirs;
  private DMatrixRMaj stack;
  private DMatrixRMaj stackCopy;
  private DMatrixRMaj triangle;
  private double[] work;
  private double[] block;
  private double[] blockWork;
  private QRDecomposition<DMatrixRMaj> reduction;

  /** A random covariance of condition about 10 and a vector. */
  @Setup
  public void fill() {
    SplittableRandom random = new SplittableRandom(1);
    DMatrixRMaj root = new DMatrixRMaj(n, 2 * n);
    for (int i = 0; i < root.getNumElements(); i++) {
      root.data[i] = random.nextGaussian();
    }
    covariance = new DMatrixRMaj(n, n);
    CommonOps_DDRM.multTransB(root, root, covariance);
    result = new DMatrixRMaj(n, n);
    copy = new DMatrixRMaj(n, n);
    vector = random.doubles(n).toArray();
    ours = new LowerFactor(n);
    theirs = new CholeskyDecompositionInner_DDRM(true);
    ours.factorDefinite(covariance);
    stack =
        new DMatrixRMaj(n + 2, n + 1, true, random.doubles((n + 2L) * (n + 1)).toArray());
    stackCopy = new DMatrixRMaj(n + 2, n + 1);
    triangle = new DMatrixRMaj(n + 1, n + 1);
    work = new double[(n + 1) * n];
    block = random.doubles((n + 1) * 2L).toArray();
    blockWork = new double[block.length];
    reduction = DecompositionFactory_DDRM.qr(n + 2, n + 1);
  }

  /** The lower Cholesky factor, the covariance kept. */
  @Benchmark
  public boolean factorOurs() {
    return ours.factorDefinite(covariance);
  }

  /** The same: EJML overwrites, so the covariance is copied first. */
  @Benchmark
  public boolean factorEjml() {
    copy.setTo(covariance);
    return theirs.decompose(copy);
  }

  /** The lower triangle of A D A', A square, D diagonal. */
  @Benchmark
  public double[] productOurs() {
    Products.fillOuterProduct(covariance.data, vector, n, n, result.data);
    return result.data;
  }

  /** A D A', whole, from a copy of A whose columns are scaled. */
  @Benchmark
  public DMatrixRMaj productEjml() {
    copy.setTo(covariance);
    CommonOps_DDRM.multCols(copy, vector);
    CommonOps_DDRM.multTransB(covariance, copy, result);
    return result;
  }

  /** [I A] to [U 0], A n x 2, the reflections applied to one more row. */
  @Benchmark
  public double[] reduceOurs() {
    for (int i = 0; i < n * n; i++) {
      work[i] = i % (n + 1) == 0 ? 1 : 0;
    }
    for (int i = n * n; i < work.length; i++) {
      work[i] = 0;
    }
    System.arraycopy(block, 0, blockWork, 0, block.length);
    Householder.reduceUpper(work, n, blockWork, n + 1, 2);
    return work;
  }

  /** The same by EJML, which knows no zeros: (n + 2) x (n + 1), the row handed over with the others. */
  @Benchmark
  public DMatrixRMaj reduceEjml() {
    stackCopy.setTo(stack);
    reduction.decompose(stackCopy);
    return reduction.getR(triangle, true);
  }
}
