package dev.estimation.benchmarks.cases.gnss;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class GnssLogTest {
  private static final String HEADER = "time_s,pseudorange_l1_m,sat_x_m,sat_y_m,sat_z_m,"
      + "sat_clock_m,ionosphere_model_m,troposphere_model_m,elevation_rad";

  @TempDir
  private Path folder;

  @BeforeEach
  void makeLog() throws IOException {
    write(
        "pseudoranges.csv",
        HEADER,
        "30,1000,1,2,3,100,10,1,0.5",
        "30,2000,4,5,6,-100,20,2,0.6",
        "60,3000,7,8,9,0,0,0,0.7");
    write("truth.csv", "x_m,y_m,z_m", "500000,600000,700000");
  }

  @Test
  void rowsOfOneTimeAreOneUpdate() {
    List<Step> steps = scenario().steps();
    assertEquals(List.of(30.0, 60.0), steps.stream().map(Step::time).toList());
    Measurement first = steps.get(0).measurements().get(0);
    assertEquals(2, first.rows());
    assertArrayEquals(new double[] {1089, 1878}, first.value(), 0);
    double[] given = {1, 2, 3, GnssLog.deviation(0.5), 4, 5, 6, GnssLog.deviation(0.6)};
    assertArrayEquals(given, first.given(), 0);
    assertEquals(1, steps.get(1).measurements().get(0).rows());
  }

  @Test
  void theStartIsFarFromTheTruth() {
    Scenario scenario = scenario();
    double[] expected = {560_000, 552_000, 764_000, 0, 0};
    assertArrayEquals(expected, scenario.start().mean(), 0);
    assertEquals(9e10, scenario.start().covariance(3, 3), 0);
    assertTrue(scenario.gateProbability().isEmpty());
    double[] place = new double[3];
    assertTrue(scenario.truth().orElseThrow().at(1e9, place));
    assertArrayEquals(new double[] {500_000, 600_000, 700_000}, place, 0);
  }

  @Test
  void withoutTruthThereIsNoStart() throws IOException {
    write("truth.csv", "x_m,y_m,z_m");
    assertTrue(load().absence().contains("truth.csv"));
    Files.delete(folder.resolve("truth.csv"));
    assertTrue(load().absence().contains("truth.csv"));
    assertTrue(load().scenario().isEmpty());
  }

  @Test
  void aReceiverAtRestHasOnePlace() throws IOException {
    write("truth.csv", "x_m,y_m,z_m", "1,2,3", "1,2,4");
    String message = assertThrows(BadInputException.class, this::load).getMessage();
    assertTrue(message.contains("truth.csv, line 3"), message);
  }

  private Scenario scenario() {
    return load().scenario().orElseThrow();
  }

  private LoadedVariant load() {
    return new GnssCase(LogFolder.open(folder.toString())).load("far");
  }

  private void write(String name, String... lines) throws IOException {
    Files.writeString(folder.resolve(name), String.join("\n", lines) + "\n");
  }
}
