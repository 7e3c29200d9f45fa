package dev.estimation.benchmarks.cases.robot;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Step;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The order of events and the start, on logs small enough to be worked by hand. */
class RobotStepsTest {
  @TempDir
  private Path folder;

  @BeforeEach
  void makeLog() throws IOException {
    write(
        "odometry.csv",
        "time_s,forward_velocity_m_per_s,angular_velocity_rad_per_s",
        "1.0,0.1,0.01",
        "2.0,0.2,0.02",
        "2.0,0.3,0.03",
        "5.5,0.4,0.04",
        "6.5,0.5,0.05");
    write("landmarks.csv", "landmark_id,x_m,y_m", "6,10,20", "7,30,40");
    write(
        "measurements.csv",
        "time_s,landmark_id,range_m,bearing_rad",
        "0.5,6,1,0.1",
        "1.0,7,2,0.2",
        "2.0,7,3,0.3",
        "2.0,6,4,0.4",
        "3.0,6,5,0.5",
        "6.0,6,6,0.6",
        "6.25,6,7,0.7");
    write(
        "groundtruth.csv",
        "time_s,x_m,y_m,heading_rad",
        "0.75,1,2,3.0",
        "1.25,3,6,-3.08",
        "6.0,3,6,-3.08");
  }

  @Test
  void eachDistinctTimeIsOneStepFromTheFirstCommandToTheLastTruth() {
    List<Step> steps = scenario("near").steps();
    assertEquals(
        List.of(1.0, 2.0, 3.0, 5.5, 6.0), steps.stream().map(Step::time).toList());
    assertEquals(
        List.of(1, 2, 1, 0, 1),
        steps.stream().map(step -> step.measurements().size()).toList());
  }

  /** A command holds from after its own time on; of two at one time the later row counts. */
  @Test
  void theCommandBeforeHoldsUntilTheStep() {
    List<Step> steps = scenario("near").steps();
    assertArrayEquals(new double[] {0.1, 0.01}, steps.get(1).control(), 0);
    assertArrayEquals(new double[] {0.3, 0.03}, steps.get(2).control(), 0);
    assertArrayEquals(new double[] {0.3, 0.03}, steps.get(3).control(), 0);
    assertArrayEquals(new double[] {0.4, 0.04}, steps.get(4).control(), 0);
  }

  @Test
  void sightingsOfOneTimeStayInFileOrder() {
    Step step = scenario("near").steps().get(1);
    assertArrayEquals(new double[] {3, 0.3}, step.measurements().get(0).value(), 0);
    assertArrayEquals(new double[] {30, 40}, step.measurements().get(0).given(), 0);
    assertArrayEquals(new double[] {10, 20}, step.measurements().get(1).given(), 0);
  }

  @Test
  void rowsMayStandInAnyOrder() throws IOException {
    List<Step> sorted = scenario("near").steps();
    for (String file : List.of("odometry.csv", "measurements.csv", "groundtruth.csv")) {
      List<String> lines = Files.readAllLines(folder.resolve(file));
      lines.add(lines.remove(1)); // the first row becomes the last
      write(file, lines.toArray(new String[0]));
    }
    List<Step> shuffled = scenario("near").steps();
    assertEquals(sorted.size(), shuffled.size());
    for (int i = 0; i < sorted.size(); i++) {
      assertEquals(sorted.get(i).time(), shuffled.get(i).time(), 0);
      assertArrayEquals(sorted.get(i).control(), shuffled.get(i).control(), 0);
    }
  }

  /** Half way between 3.0 and -3.08 across the seam: 3.0 + (2 pi - 6.08) / 2. */
  @Test
  void theStartIsTheInterpolatedTruthPlusAnOffset() {
    double heading = 3.0 + (2 * Math.PI - 6.08) / 2;
    double[] near = scenario("near").start().mean();
    double[] wide = scenario("wide").start().mean();
    // A few roundings of 4; an angle may be told a full turn off.
    assertArrayEquals(new double[] {2.2, 3.8}, new double[] {near[0], near[1]}, 4e-15);
    assertEquals(0, Math.sin(near[2] - heading - 0.1), 4e-15);
    assertArrayEquals(new double[] {3.5, 2.5}, new double[] {wide[0], wide[1]}, 4e-15);
    assertEquals(0, Math.sin(wide[2] - heading - 0.8), 4e-15);
    assertEquals(0.0225, scenario("near").start().covariance(2, 2), 1e-17);
    assertEquals(4, scenario("wide").start().covariance(0, 0), 0);
  }

  @Test
  void withoutTruthAtTheFirstCommandThereIsNoStart() throws IOException {
    write("groundtruth.csv", "time_s,x_m,y_m,heading_rad", "1.25,3,6,-3", "6.0,3,6,-3");
    assertAbsent();
    write("groundtruth.csv", "time_s,x_m,y_m,heading_rad", "0.25,3,6,-3", "0.75,3,6,-3");
    assertAbsent();
    Files.delete(folder.resolve("groundtruth.csv"));
    assertAbsent();
  }

  private void assertAbsent() {
    LoadedVariant variant = load("near");
    assertTrue(variant.scenario().isEmpty());
    assertTrue(variant.absence().contains("groundtruth.csv"), variant.absence());
    assertTrue(variant.absence().contains("t = 1.0 s"), variant.absence());
  }

  private Scenario scenario(String variant) {
    return load(variant).scenario().orElseThrow();
  }

  private LoadedVariant load(String variant) {
    return new RobotCase(LogFolder.open(folder.toString())).load(variant);
  }

  private void write(String name, String... lines) throws IOException {
    Files.writeString(folder.resolve(name), String.join("\n", lines) + "\n");
  }
}
