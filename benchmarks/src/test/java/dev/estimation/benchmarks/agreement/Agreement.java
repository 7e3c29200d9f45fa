package dev.estimation.benchmarks.agreement;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import dev.estimation.benchmarks.replay.Accuracy;
import dev.estimation.benchmarks.replay.Innovations;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Snapshot;
import java.util.Arrays;
import java.util.List;

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
        () -> checkFinal(expected.get("final")));
  }

  private void checkAccuracy(JsonNode expected) {
    Accuracy accuracy = result.accuracy();
    JsonNode nees = expected.get("nees");
    assertEquals(expected.get("rows_scored").asLong(), accuracy.count());
    assertEquals(nees.get("dof").asInt(), accuracy.degreesOfFreedom());
    assertAll(
        () -> checkScore("rmse", expected.get("rmse_position_m"), accuracy.rmse()),
        () -> checkScore("max", expected.get("max_position_m"), accuracy.max()),
        () -> checkScore("NEES", nees.get("mean"), accuracy.neesMean()),
        () -> checkScore(
            "inside", nees.get("fraction_inside_two_sided_95"), accuracy.insideFraction()));
  }

  private void checkInnovations(JsonNode expected) {
    Innovations innovations = result.innovations();
    List<Double> rejected = Arrays.stream(ReferenceFiles.numbers(expected.get("rejected_rows")))
        .boxed()
        .toList();
    List<Double> actual =
        innovations.rejectedRows().stream().map(Integer::doubleValue).toList();
    assertEquals(rejected, actual, "rejected rows");
    assertEquals(expected.get("nis").get("updates").asInt(), innovations.accepted());
    checkScore("NIS", expected.get("nis").get("mean_per_dof"), innovations.meanPerDegree());
    assertEquals(
        expected.get("log_likelihood").asDouble(),
        innovations.logLikelihood(),
        filter.logLikelihoodLimit(),
        "log-likelihood");
  }

  private void checkScore(String what, JsonNode expected, double actual) {
    double value = expected.asDouble();
    assertEquals(value, actual, filter.scoreLimit() * Math.abs(value), what);
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

  private void checkFinal(JsonNode expected) {
    Snapshot last = result.history().get(result.steps() - 1);
    EstimateDistance distance = new EstimateDistance();
    double[] covariance = Arrays.stream(rows(expected.get("covariance")))
        .flatMapToDouble(Arrays::stream)
        .toArray();
    distance.add(last.estimate(), ReferenceFiles.numbers(expected.get("mean")), covariance);
    checkDistance("final", distance);
  }

  private static double[][] rows(JsonNode matrix) {
    double[][] rows = new double[matrix.size()][];
    Arrays.setAll(rows, i -> ReferenceFiles.numbers(matrix.get(i)));
    return rows;
  }

  private void checkDistance(String where, EstimateDistance distance) {
    double largest = distance.largest();
    assertTrue(
        largest <= filter.distanceLimit(),
        filter.name() + ": distance at " + where + " must be at most " + filter.distanceLimit()
            + " standard deviations, got " + largest);
  }
}
