package dev.estimation.benchmarks.agreement;

import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import dev.estimation.benchmarks.cases.uwb.UwbCase;
import dev.estimation.benchmarks.cases.uwb.UwbSettings;
import dev.estimation.benchmarks.cases.vessel.VesselCase;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Snapshot;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.TestFactory;

/**
 * Runs on recorded logs agree with an independent program that was written from the published
 * equations. It draws its points over the whole state, so the same is done here. The limits are
 * those that came with its results.
 */
class AgreementTest {
  private static final double SAME = 1e-9;

  @TestFactory
  List<DynamicTest> vesselAgrees() {
    if (!ReferenceFiles.exist()) {
      return ReferenceFiles.skipped();
    }
    JsonNode runs = ReferenceFiles.expectedRuns("vessel");
    List<String[]> checkpoints =
        new ArrayList<>(ReferenceFiles.checkpoints("vessel-cv-checkpoints.csv"));
    checkpoints.addAll(ReferenceFiles.checkpoints("vessel-ct-checkpoints.csv"));
    return agreement(vessel(), runs, checkpoints);
  }

  @TestFactory
  List<DynamicTest> uwbAgrees() {
    if (!ReferenceFiles.exist()) {
      return ReferenceFiles.skipped();
    }
    JsonNode runs = ReferenceFiles.expectedRuns("uwb");
    return agreement(uwb(), runs, ReferenceFiles.checkpoints("uwb-checkpoints.csv"));
  }

  /**
   * The active components come first in the state, so these two see the same numbers either way.
   */
  @TestFactory
  List<DynamicTest> activeInputsAloneGiveTheSame() {
    if (!ReferenceFiles.exist()) {
      return ReferenceFiles.skipped();
    }
    List<DynamicTest> tests = new ArrayList<>();
    for (ReplayCase replayed : List.of(vessel(), uwb())) {
      for (String variant : replayed.variants()) {
        for (ReferenceFilter filter : List.of(ReferenceFilter.LINEAR, ReferenceFilter.HERMITE)) {
          tests.add(DynamicTest.dynamicTest(
              variant + " " + filter.name(),
              () -> compareWithWholeState(replayed.load(variant), filter)));
        }
      }
    }
    return tests;
  }

  private static ReplayCase vessel() {
    return new VesselCase(ReferenceFiles.log("maritime-scenario16"));
  }

  private static ReplayCase uwb() {
    return new UwbCase(ReferenceFiles.log("uwb-hanyang-los-a1"), UwbSettings.DEFAULT);
  }

  private static List<DynamicTest> agreement(
      ReplayCase replayed, JsonNode runs, List<String[]> checkpoints) {
    List<DynamicTest> tests = new ArrayList<>();
    for (String name : replayed.variants()) {
      LoadedVariant variant = replayed.load(name);
      for (ReferenceFilter filter : ReferenceFilter.ALL) {
        tests.add(DynamicTest.dynamicTest(
            variant.label() + " " + filter.name(),
            () -> checkAgainst(runs, checkpoints, variant, filter)));
      }
    }
    return tests;
  }

  private static void checkAgainst(
      JsonNode runs, List<String[]> checkpoints, LoadedVariant variant, ReferenceFilter filter) {
    List<String[]> ofThisRun = checkpoints.stream()
        .filter(cells -> cells[0].equals(variant.label()) && cells[1].equals(filter.name()))
        .toList();
    JsonNode expected = ReferenceFiles.run(runs, variant.label()).get("filters").get(filter.name());
    RunResult result = run(variant, filter.matching().overWholeInput());
    new Agreement(filter, result).check(expected, ofThisRun);
  }

  private static void compareWithWholeState(LoadedVariant variant, ReferenceFilter filter) {
    RunResult whole = run(variant, filter.matching().overWholeInput());
    RunResult active = run(variant, filter.matching());
    EstimateDistance distance = new EstimateDistance();
    for (int step = 0; step < whole.steps(); step++) {
      Snapshot expected = whole.history().get(step);
      Gaussian estimate = expected.estimate();
      distance.add(
          active.history().get(step).estimate(),
          estimate.mean(),
          estimate.covariance().getData());
    }
    assertTrue(
        distance.largest() <= SAME,
        "distance must be at most " + SAME + ", got " + distance.largest());
  }

  private static RunResult run(LoadedVariant variant, MomentMatching matching) {
    return new Replayer(variant.scenario().orElseThrow(), matching).run();
  }
}
