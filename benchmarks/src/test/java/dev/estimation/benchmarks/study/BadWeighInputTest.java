package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.benchmarks.cases.balloon.BalloonCase;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever is wrong from outside is told in one line, with exit code 2 and nothing written. */
class BadWeighInputTest {
  /** A case that cannot be made. */
  public static final class Broken extends CaseBase {
    /** Throws. */
    public Broken() {
      throw new IllegalStateException("no disk");
    }
  }

  /** A case whose constructor wants something. */
  public static final class Wanting extends CaseBase {
    /** Never called. */
    public Wanting(int seed) {
      assertTrue(seed > 0);
    }
  }

  @TempDir
  private Path folder;

  @ParameterizedTest
  @ValueSource(
      strings = {
        "weigh extra",
        "weigh --case ship",
        "weigh --case vessel",
        "weigh --variant near",
        "weigh --tolerance 0",
        "weigh --tolerance -0.01",
        "weigh --tolerance NaN",
        "weigh --tolerance one",
        "weigh --budget-us 0",
        "weigh --budget-us 5 --untimed",
        "weigh --from -1",
        "weigh --from 5 --to 4",
        "weigh --from 90",
        "weigh --from 1000000",
        "weigh --every 0",
        "weigh --rows 0",
        "weigh --threads 0",
        "weigh --threads two",
        "weigh --noise-scale 0",
        "weigh --noise-scale 1,,2",
        "weigh --noise-scale 1,-2",
        "weigh --method spline",
        "weigh --method linear-iterated",
        "weigh --track linear-iterated",
        "weigh --track random:3,1",
        "weigh --points nowhere.csv",
        "weigh --points nowhere.csv --every 2",
        "weigh --case-class no.such.Case",
        "weigh --case-class java.lang.String",
        "weigh --case-class java.lang.String --case demo",
        "weigh --log somewhere",
        "weigh --lag 1",
        "sweep --extra-lag soon",
        "sweep --noise-scale 0",
        "sweep --case ship",
        "sweep --method spline",
        "compare one"
      })
  void refusesBadOptions(String arguments) {
    assertRefused(arguments);
  }

  @Test
  void namesWhatWasWrongAndWhatWouldDo() throws IOException {
    assertRefused("weigh --from 90", "no operating point", "demo");
    assertRefused("weigh --tolerance 0", "--tolerance", "above 0", "'0'");
    assertRefused("weigh --case-class no.such.Case", "no.such.Case");
    assertRefused("weigh --case-class java.lang.String", "java.lang.String", "ReplayCase");
    assertRefused("weigh --case-class " + Broken.class.getName(), "Broken", "no disk");
    assertRefused("weigh --case-class " + Wanting.class.getName(), "Wanting", "without arguments");
    assertRefused("replay --case-class " + Broken.class.getName(), "Broken", "no disk");
    assertRefused(
        "weigh --case-class " + BalloonCase.class.getName() + " --log here", "--log here");
    Path uwb = SyntheticLog.uwb(folder.resolve("yard"));
    Files.writeString(uwb.resolve("ranges.csv"), "");
    assertRefused("weigh --case uwb --log " + uwb, "ranges.csv");
    Files.delete(uwb.resolve("ranges.csv"));
    assertRefused("weigh --case uwb --log " + uwb, "ranges.csv");
    Path gnss = SyntheticLog.gnss(folder.resolve("mast"));
    Files.delete(gnss.resolve("truth.csv"));
    assertRefused("weigh --case gnss --log " + gnss, "no operating point");
    assertRefused("sweep --case gnss --log " + gnss, "no variant");
  }

  @Test
  void badPointsAreToldWithTheirLine() throws IOException {
    Path points = folder.resolve("points.csv");
    String head = "step,mean_0,mean_1,mean_2,mean_3,mean_4,mean_5,"
        + "deviation_0,deviation_1,deviation_2,deviation_3,deviation_4,deviation_5\n";
    Files.writeString(points, head + "90,1,2,3,4,5,6,1,1,1,1,1,1\n");
    assertRefused("weigh --points " + points, "points.csv", "step", "90");
    Files.writeString(points, head + "1,1,2,3,4,5,6,1,1,-1,1,1,1\n");
    assertRefused("weigh --points " + points, "points.csv", "-1.0");
    Files.writeString(points, head);
    assertRefused("weigh --points " + points, "points.csv");
    Files.writeString(points, "step,mean_0\n1,2\n");
    assertRefused("weigh --points " + points, "mean_1");
  }

  private void assertRefused(String arguments, String... parts) {
    Path out = folder.resolve("out");
    List<Object> words = new ArrayList<>(List.of((Object[]) arguments.split(" ")));
    if (!words.get(0).equals("compare")) {
      words.addAll(List.of("--out", out));
    }
    StudyRun run = StudyRun.of(words.toArray());
    assertEquals(2, run.code(), run.out() + run.err());
    assertEquals(1, run.err().lines().count(), run.err());
    assertTrue(run.err().startsWith("study: "), run.err());
    for (String part : parts) {
      assertTrue(run.err().contains(part), () -> "wanted '" + part + "' in " + run.err());
    }
    for (String name : new String[] {"weigh.json", "sweep.json", "results.json"}) {
      assertFalse(Files.exists(out.resolve(name)), "nothing may be written");
    }
  }
}
