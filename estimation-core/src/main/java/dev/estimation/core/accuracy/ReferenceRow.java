package dev.estimation.core.accuracy;

import dev.estimation.core.accuracy.ReferenceMoments.Evidence;
import java.util.List;

/**
 * The references of an audit: how sure the truth is. An error that is not well above this is not known.
 *
 * @param points how many operating points
 * @param converged at how many of them levels converged; at the others shifted points decided
 * @param evaluations the mean over points
 * @param uncertainty of the references, in the scale of the errors; by points, one standard error
 */
public record ReferenceRow(
    int points, int converged, double evaluations, ErrorQuantiles uncertainty) {
  static ReferenceRow of(List<ReferenceMoments> references) {
    double evaluations =
        references.stream().mapToInt(ReferenceMoments::evaluations).average().orElse(0);
    long converged = references.stream()
        .filter(reference -> reference.evidence() == Evidence.CONVERGED_LEVELS)
        .count();
    double[] errors =
        references.stream().mapToDouble(ReferenceMoments::estimatedError).toArray();
    return new ReferenceRow(
        references.size(), (int) converged, evaluations, ErrorQuantiles.of(errors));
  }
}
