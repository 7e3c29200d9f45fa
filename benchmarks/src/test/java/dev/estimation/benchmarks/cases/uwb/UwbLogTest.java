package dev.estimation.benchmarks.cases.uwb;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.Measurement;
import dev.estimation.benchmarks.replay.Step;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class UwbLogTest {
  @TempDir
  private Path folder;

  /** Of a range of 7.25 m with a bias of 0.25 m, 7 m are left; it was true 0.5 s before. */
  @Test
  void biasAndLagAreTakenOff() throws IOException {
    Files.write(folder.resolve("anchors.csv"), List.of("anchor_id,x_m,y_m,z_m", "a,1,4,7.5"));
    Files.write(folder.resolve("ranges.csv"), List.of("time_s,anchor_id,range_m", "2,a,7.25"));
    UwbCase uwb =
        new UwbCase(LogFolder.open(folder.toString()), new UwbSettings(0.5, 1.5, 0.25, 3, 7));
    List<Step> steps = uwb.load("near").scenario().orElseThrow().steps();
    assertEquals(1.5, steps.get(0).time(), 0);
    Measurement range = steps.get(0).measurements().get(0);
    assertArrayEquals(new double[] {7}, range.value(), 0);
    assertArrayEquals(new double[] {1, 4, 7.5}, range.given(), 0);
  }
}
