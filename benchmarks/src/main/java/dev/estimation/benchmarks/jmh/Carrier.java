package dev.estimation.benchmarks.jmh;

import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.Use;
import org.ejml.data.DMatrixRMaj;

/**
 * A problem with one matching, ready to be carried again and again; and the function alone, as often as the matching calls
 * it. The factor of the input is there already, as it is in a filter. <i>Confined to one thread.</i>
 */
final class Carrier {
  private final CarryProblem problem;
  private final MatchingWorkspace work;
  private final Moments input;
  private final Covariance noise;
  private final double[] nothing = new double[0];
  private final VectorFunction function;
  private final Jacobian derivative;
  private final double[] state;
  private final double[] image;
  private final double[] jacobian;

  Carrier(String problemName, String matchingName) {
    this(CarryProblem.of(problemName), ComparedMatching.named(matchingName));
  }

  Carrier(CarryProblem problem, ComparedMatching matching) {
    this.problem = problem;
    this.function = problem.function();
    this.derivative = function.structure().jacobian().orElseThrow();
    this.work = matching
        .matching(problem)
        .workspace(problem.input(), problem.output(), function, Form.COVARIANCE);
    this.input = new Moments(problem.input());
    input.set(problem.point().input());
    this.noise = new Covariance(problem.output().dimension());
    noise.changeMatrix().setTo(problem.point().noise());
    this.state = problem.point().input().mean();
    this.image = new double[problem.output().storage()];
    this.jacobian = new double[problem.output().dimension() * problem.input().dimension()];
    carry();
  }

  /** Carries; a result that is known to be below a tolerance is a result all the same. */
  DMatrixRMaj carry() {
    MatchingStatus status = work.carry(input, nothing, noise, problem.use());
    if (status != MatchingStatus.MATCHED && status != MatchingStatus.BELOW_TOLERANCE) {
      throw new IllegalStateException(problem.name() + ": " + work.failure());
    }
    return problem.use() == Use.PREDICTION
        ? work.output().covariance()
        : work.unexplained().matrix();
  }

  /** Evaluations and Jacobians alone, as many as the last carry took, each at another place. */
  double model() {
    double sum = 0;
    double first = state[0];
    for (int i = 0; i < work.evaluations(); i++) {
      state[0] = first + 1e-6 * i;
      function.evaluate(state, nothing, image);
      sum += image[0];
    }
    for (int i = 0; i < work.jacobians(); i++) {
      state[0] = first + 1e-6 * i;
      derivative.evaluate(state, nothing, jacobian);
      sum += jacobian[0];
    }
    state[0] = first;
    return sum;
  }

  MatchingWorkspace work() {
    return work;
  }

  Moments input() {
    return input;
  }
}
