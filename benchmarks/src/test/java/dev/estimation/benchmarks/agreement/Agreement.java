package dev.estimation.benchmarks.agreement;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Innovations;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Score;
import dev.estimation.benchmarks.replay.Snapshot;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Holds a run against what the independent program computed for it. */
final class Agreement {
  private static final int ESTIMATE_COLUMN = 4;

  private final ReferenceFilter filter;
  private final RunResult result;

  Agreement(ReferenceFilter filter, RunResult result) {
    this.filter = filter;
    this.result = result;
  }

  /**
   * Compares everything that the files hold.
   *
   * @param expected of this run and filter
   * @param checkpoints of this run and filter, cells as printed
   */
  void check(JsonNode expected, List<String[]> checkpoints) {
    assertAll(
        () -> assertEquals(expected.get("status").asText(), result.status()),
        () -> assertEquals(expected.get("steps_done").asInt(), result.steps()),
        () -> checkAccuracy(expected),
        () -> checkInnovations(expected),
        () -> checkCheckpoints(checkpoints),
        () -> checkEnd(expected));
  }

  private void checkAccuracy(JsonNode expected) {
    Accuracy accuracy = result.accuracy();
    JsonNode nees = expected.get("nees");
    String position = expected.has("rmse_position_m") ? "position_m" : "position_3d_m";
    assertEquals(expected.get("rows_scored").asLong(), accuracy.count());
    assertEquals(nees.get("dof").asInt(), accuracy.degreesOfFreedom());
    assertAll(
        () -> checkScore(expected, position, accuracy.position()),
        () -> checkHeading(expected, accuracy.heading()),
        () -> checkRelative("NEES", nees.get("mean"), accuracy.neesMean()),
        () -> checkRelative(
            "inside", nees.get("fraction_inside_two_sided_95"), accuracy.insideFraction()));
  }

  private void checkHeading(JsonNode expected, Optional<Score> heading) {
    assertEquals(expected.has("rmse_heading_rad"), heading.isPresent(), "heading is scored");
    heading.ifPresent(score -> checkScore(expected, "heading_rad", score));
  }

  private void checkScore(JsonNode expected, String what, Score score) {
    assertAll(
        () -> checkRelative("rmse " + what, expected.get("rmse_" + what), score.rmse()),
        () -> checkRelative("max " + what, expected.get("max_" + what), score.max()));
  }

  private void checkInnovations(JsonNode expected) {
    if (filter.smoothed()) {
      assertFalse(expected.has("nis"), "a smoothed track has no innovations");
      assertTrue(result.innovations().isEmpty(), "a smoothed track has no innovations");
      return;
    }
    Innovations innovations = result.innovations().orElseThrow();
    List<Double> rejected = Arrays.stream(ReferenceFiles.numbers(expected.get("rejected_rows")))
        .boxed()
        .toList();
    List<Double> actual =
        innovations.rejectedRows().stream().map(Integer::doubleValue).toList();
    assertEquals(rejected, actual, "rejected rows");
    assertEquals(expected.get("nis").get("updates").asInt(), innovations.accepted());
    checkRelative("NIS", expected.get("nis").get("mean_per_dof"), innovations.meanPerDegree());
    double logLikelihood = expected.get("log_likelihood").asDouble();
    assertEquals(
        logLikelihood,
        innovations.logLikelihood(),
        filter.limits().logLikelihoodNear(logLikelihood),
        "log-likelihood");
  }

  private void checkRelative(String what, JsonNode expected, double actual) {
    double value = expected.asDouble();
    assertEquals(value, actual, filter.limits().score() * Math.abs(value), what);
  }

  private void checkCheckpoints(List<String[]> checkpoints) {
    EstimateDistance distance = new EstimateDistance();
    for (String[] cells : checkpoints) {
      Snapshot snapshot = result.history().get(Integer.parseInt(cells[2]));
      assertEquals(Double.parseDouble(cells[3]), snapshot.time(), 1e-9, "time of a checkpoint");
      double[] numbers = Arrays.stream(cells)
          .skip(ESTIMATE_COLUMN)
          .mapToDouble(Double::parseDouble)
          .toArray();
      int n = snapshot.estimate().dimension();
      distance.add(
          snapshot.estimate(),
          Arrays.copyOf(numbers, n),
          Arrays.copyOfRange(numbers, n, numbers.length));
    }
    assertTrue(checkpoints.size() > 10, "checkpoints: " + checkpoints.size());
    checkDistance("checkpoints", distance);
  }

  /** The files hold where a filter ended, and where a smoother ended: at the first step. */
  private void checkEnd(JsonNode expected) {
    if (filter.smoothed()) {
      checkEstimate("first", result.history().get(0), expected.get("first"));
    } else {
      checkEstimate("final", result.history().get(result.steps() - 1), expected.get("final"));
    }
  }

  private void checkEstimate(String where, Snapshot snapshot, JsonNode expected) {
    assertEquals(expected.get("time_s").asDouble(), snapshot.time(), 1e-9, "time, " + where);
    EstimateDistance distance = new EstimateDistance();
    double[] covariance = Arrays.stream(rows(expected.get("covariance")))
        .flatMapToDouble(Arrays::stream)
        .toArray();
    distance.add(snapshot.estimate(), ReferenceFiles.numbers(expected.get("mean")), covariance);
    checkDistance(where, distance);
  }

  private static double[][] rows(JsonNode matrix) {
    double[][] rows = new double[matrix.size()][];
    Arrays.setAll(rows, i -> ReferenceFiles.numbers(matrix.get(i)));
    return rows;
  }

  private void checkDistance(String where, EstimateDistance distance) {
    double largest = distance.largest();
    assertTrue(
        largest <= filter.limits().distance(),
        filter.name() + ": distance at " + where + " must be at most "
            + filter.limits().distance() + " standard deviations, got " + largest);
  }
}
