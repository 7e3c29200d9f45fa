package dev.estimation.core.evidence;

import dev.estimation.core.accuracy.CarriedMoments;
import dev.estimation.core.accuracy.MatchingError;
import dev.estimation.core.accuracy.ReferenceSearch;
import dev.estimation.core.accuracy.ReferenceSettings;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.ToleranceMatching;
import dev.estimation.core.space.Space;
import java.util.Arrays;
import java.util.List;
import java.util.function.Predicate;
import java.util.stream.IntStream;

/** Runs of matchings on the random problems of a kind, held against reference moments. */
final class Evidence {
  /** How far the reference may be off by its own estimate: a hundredth of the least tolerance. */
  private static final double REFERENCE_ACCURACY = 1e-5;

  private Evidence() {}

  /** One run: whether it was within its budget, what it took, its estimated and its true error. */
  record Run(boolean met, int evaluations, double estimated, double error) {
    /** Whether the estimate is not below the true error by more than a hundredth of the tolerance. */
    boolean isHonest(double tolerance) {
      return estimated + 0.01 * tolerance >= error;
    }
  }

  /** A row for each problem, in it a run for each matching. */
  static List<Run[]> runs(ProblemKind kind, int problems, List<MomentMatching> matchings) {
    return IntStream.range(0, problems)
        .parallel()
        .mapToObj(number -> runs(kind, kind.problem(number), matchings))
        .toList();
  }

  /** Matchings to the given tolerances, with the budget of the kind. */
  static List<MomentMatching> within(ProblemKind kind, double... tolerances) {
    return Arrays.stream(tolerances)
        .<MomentMatching>mapToObj(
            tolerance -> ToleranceMatching.within(tolerance).withBudget(kind.budget()))
        .toList();
  }

  private static Run[] runs(ProblemKind kind, Problem problem, List<MomentMatching> matchings) {
    ReferenceSettings settings = ReferenceSettings.standard().withAccuracy(REFERENCE_ACCURACY);
    CarriedMoments reference = new ReferenceSearch(
            settings, input(problem), problem.output(), problem.truth())
        .find(problem.point(), kind.use())
        .moments()
        .plusNoise(problem.point().noise());
    return matchings.stream()
        .map(matching -> run(kind, problem, matching, reference))
        .toArray(Run[]::new);
  }

  private static Space input(Problem problem) {
    return Space.reals(problem.point().input().mean().length);
  }

  private static Run run(
      ProblemKind kind, Problem problem, MomentMatching matching, CarriedMoments reference) {
    Space input = input(problem);
    MatchingWorkspace work = matching.workspace(input, problem.output(), problem.function());
    Moments moments = new Moments(input);
    moments.set(problem.point().input());
    Covariance noise = new Covariance(problem.output().dimension());
    noise.changeMatrix().setTo(problem.point().noise());
    MatchingStatus status = work.carry(moments, problem.point().given(), noise, kind.use());
    CarriedMoments carried = CarriedMoments.of(work, moments);
    return new Run(
        status == MatchingStatus.MATCHED,
        work.evaluations(),
        work.estimatedError(),
        MatchingError.of(reference, carried, kind.use()).largest());
  }

  /** The share of runs for which something holds. */
  static double share(List<Run> runs, Predicate<Run> holds) {
    return runs.stream().filter(holds).count() / (double) runs.size();
  }
}
