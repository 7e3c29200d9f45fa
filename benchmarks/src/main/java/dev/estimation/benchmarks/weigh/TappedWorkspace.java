package dev.estimation.benchmarks.weigh;

import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.Use;
import java.util.function.Consumer;
import org.ejml.data.DMatrixRMaj;

/** The workspace of a {@link TappedMatching}: shows each call, then hands it on. */
final class TappedWorkspace implements MatchingWorkspace {
  private final MatchingWorkspace work;
  private final Carry.Target target;
  private final Consumer<Carry> watcher;

  TappedWorkspace(MatchingWorkspace work, Carry.Target target, Consumer<Carry> watcher) {
    this.work = work;
    this.target = target;
    this.watcher = watcher;
  }

  @Override
  public MatchingStatus carry(Moments input, double[] given, Covariance additiveNoise, Use use) {
    watcher.accept(new Carry(target, input, given, additiveNoise, use));
    return work.carry(input, given, additiveNoise, use);
  }

  @Override
  public double[] mean() {
    return work.mean();
  }

  @Override
  public Moments output() {
    return work.output();
  }

  @Override
  public int activeInputs() {
    return work.activeInputs();
  }

  @Override
  public DMatrixRMaj inputFactor() {
    return work.inputFactor();
  }

  @Override
  public int[] inputOrder() {
    return work.inputOrder();
  }

  @Override
  public DMatrixRMaj unitCrossCovariance() {
    return work.unitCrossCovariance();
  }

  @Override
  public Covariance unexplained() {
    return work.unexplained();
  }

  @Override
  public int evaluations() {
    return work.evaluations();
  }

  @Override
  public int jacobians() {
    return work.jacobians();
  }

  @Override
  public double estimatedError() {
    return work.estimatedError();
  }

  @Override
  public String failure() {
    return work.failure();
  }
}
