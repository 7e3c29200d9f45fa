package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.RunTrace;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.IteratedUpdate;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.motion.ConstantVelocity;
import java.io.IOException;
import java.io.StringReader;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class StepsFileTest {
  @TempDir
  private Path folder;

  /** The position to the given power, with a variance of 1. */
  private static final class Power implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public int givenDimension() {
      return 1;
    }

    @Override
    public void measure(double[] state, double[] given, double[] measurement) {
      measurement[0] = Math.pow(state[0], given[0]);
    }

    @Override
    public void measureJacobian(double[] state, double[] given, double[] jacobian) {
      jacobian[0] = given[0] * Math.pow(state[0], given[0] - 1);
    }

    @Override
    public void measurementNoise(double[] state, double[] given, double[] covariance) {
      covariance[0] = 1;
    }
  }

  private final Power power = new Power();

  @Test
  void everyUpdateHasALineThatAgreesWithTheResults() throws IOException {
    JsonNode run = demo("--method", "linear").get(0);
    StepsTable table = StepsTable.read(folder.resolve(run.get("stepsFile").asText()));
    assertEquals(90, table.rows().size());
    assertEquals(
        run.get("rejectedRows").size(),
        table.column("status").stream().filter("GATED"::equals).count());
    int rejected = run.at("/rejectedRows/0").asInt();
    assertEquals("GATED", table.text(rejected, "status"));
    assertTrue(table.number(rejected, "nis") > 16.27); // chi-square, 3 degrees, 99.9 %
    // Numbers are written with all their digits.
    assertEquals(run.at("/final/mean/0").asDouble(), table.number(89, "east_m"), 0);
    assertEquals(
        Math.sqrt(run.at("/final/covariance/4/4").asDouble()),
        table.number(89, "sd_north_velocity_m_per_s"),
        0);
    assertEquals(run.at("/final/time").asDouble(), table.number(89, "time_s"), 0);
    long evaluations = 0;
    for (String column : List.of("evaluations", "prediction_evaluations")) {
      evaluations += table.column(column).stream().mapToLong(Long::parseLong).sum();
    }
    assertEquals(run.get("evaluations").asLong(), evaluations);
    double sum = table.column("nees").stream().mapToDouble(Double::parseDouble).sum();
    double mean = run.at("/nees/mean").asDouble();
    assertEquals(mean, sum / 90, 1e-12 * mean); // the same numbers summed in the same order
  }

  @Test
  void withoutTruthThereAreNoErrors() throws IOException {
    Path log = SyntheticLog.uwb(folder.resolve("yard"));
    assertTrue(uwb(log).columns().containsAll(List.of("error_x_m", "error_y_m", "nees")));
    Files.delete(log.resolve("groundtruth.csv"));
    List<String> columns = uwb(log).columns();
    assertFalse(columns.stream().anyMatch(name -> name.startsWith("error_")));
    assertFalse(columns.contains("nees"));
    assertTrue(columns.contains("sd_x_m"));
  }

  /** Two rows of one time: the prediction stands in the first line, the estimate in the last one. */
  @Test
  void rowsOfOneStepHaveALineEach() throws IOException {
    StepsTable table = uwb(SyntheticLog.uwb(folder.resolve("yard")));
    assertEquals(List.of("0", "0", "1", "2"), table.column("step"));
    assertEquals(List.of("0", "1", "2", "3"), table.column("row"));
    assertEquals("APPLIED", table.text(0, "prediction_status"));
    assertEquals("", table.text(0, "x_m"));
    assertEquals("", table.text(1, "prediction_status"));
    assertFalse(table.text(1, "x_m").isEmpty());
  }

  @Test
  void smoothedRunsHaveEstimatesAlone() throws IOException {
    JsonNode runs = demo("--method", "cubature", "--smooth");
    StepsTable table = StepsTable.read(folder.resolve(runs.at("/1/stepsFile").asText()));
    assertEquals(90, table.rows().size());
    assertFalse(table.columns().contains("nis"));
    assertEquals(2 + 6 + 6 + 3 + 1, table.columns().size());
  }

  /** Two rounds are enough for an affine sensor and for no other. */
  @Test
  void skippedAndGatedRowsAreTold() throws IOException {
    StepsTable table =
        run(new Step(0, List.of(row(1, 900), row(1, 3))), new Step(1, List.of(row(3, 60))));
    assertEquals(List.of("GATED", "APPLIED", "NOT_CONVERGED"), table.column("status"));
    assertEquals(897, table.number(0, "innovation_1"), 1e-12); // 900 less the prior mean of 3
    assertEquals(Math.sqrt(5), table.number(0, "innovation_sd_1"), 1e-15); // variances 4 and 1
    assertEquals(897 * 897 / 5.0, table.number(0, "nis"), 1e-9);
    assertFalse(table.text(2, "component_0").isEmpty());
  }

  @Test
  void aStepThatFailedHasNoEstimate() throws IOException {
    StepsTable table = run(new Step(0, List.of(row(1, 3))), new Step(-1, List.of(row(1, 3))));
    assertEquals(2, table.rows().size());
    assertEquals("TIME_BEFORE_ESTIMATE", table.text(1, "prediction_status"));
    assertEquals(-1, table.number(1, "time_s"), 0);
    assertEquals("", table.text(1, "status"));
    assertEquals("", table.text(1, "component_0"));
  }

  @Test
  void aStepWithoutRowsHasALine() throws IOException {
    StepsTable table = run(new Step(0, List.of()), new Step(2, List.of(row(1, 3))));
    assertEquals(List.of("", "0"), table.column("row"));
    assertEquals(3, table.number(0, "component_0"), 0);
  }

  private Measurement row(double exponent, double value) {
    return new Measurement(power, new double[] {value}, exponent);
  }

  private static StepsTable run(Step... steps) throws IOException {
    Gaussian start = Gaussian.independent(new double[] {3, 0}, new double[] {2, 0});
    Scenario scenario = new Scenario(
        new ConstantVelocity(0), OptionalDouble.of(0.999), start, List.of(steps), Optional.empty());
    RunTrace trace = new RunTrace();
    IteratedUpdate twoRounds = IteratedUpdate.undamped().withMaximumRounds(2);
    RunResult result = new Replayer(scenario, FilterKind.iterated(twoRounds)).run(trace);
    StringWriter out = new StringWriter();
    new StepsFile(
            scenario,
            result,
            Optional.of(trace),
            VariableNames.NONE.stateOf(scenario.motion().stateSpace()))
        .writeTo(out);
    return StepsTable.read(new StringReader(out.toString()));
  }

  private StepsTable uwb(Path log) throws IOException {
    StudyRun run = StudyRun.of(
        "replay",
        "--case",
        "uwb",
        "--log",
        log,
        "--variant",
        "near",
        "--method",
        "linear",
        "--out",
        folder);
    assertEquals(0, run.code(), run.err());
    return StepsTable.read(folder.resolve("steps-yard-linear.csv"));
  }

  private JsonNode demo(Object... more) throws IOException {
    Object[] words = new Object[more.length + 3];
    System.arraycopy(new Object[] {"replay", "--out", folder}, 0, words, 0, 3);
    System.arraycopy(more, 0, words, 3, more.length);
    StudyRun run = StudyRun.of(words);
    assertEquals(0, run.code(), run.err());
    return StudyRun.results(folder).get("runs");
  }
}
