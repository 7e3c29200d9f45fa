package dev.estimation.benchmarks.agreement;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import com.fasterxml.jackson.databind.JsonNode;
import dev.estimation.benchmarks.cases.gnss.GnssCase;
import dev.estimation.benchmarks.cases.robot.RobotCase;
import dev.estimation.benchmarks.cases.uwb.UwbCase;
import dev.estimation.benchmarks.cases.uwb.UwbSettings;
import dev.estimation.benchmarks.cases.vessel.VesselCase;
import dev.estimation.benchmarks.replay.FilterKind;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.filters.filter.IteratedUpdate;
import java.util.ArrayList;
import java.util.List;
import java.util.function.Supplier;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/**
 * Runs on recorded logs agree with an independent program that was written from the published
 * equations. It draws its points over the whole state, so the same is done here. The limits are
 * those that came with its results.
 */
class AgreementTest {
  private static final double SAME = 1e-9;
  private static final String UNSETTLED = "uwb-hanyang-los-a1-offset-start";

  @TestFactory
  List<DynamicTest> vesselAgrees() {
    return agreement(
        "vessel",
        AgreementTest::vessel,
        ReferenceFilter.ALL,
        "vessel-cv-checkpoints.csv",
        "vessel-ct-checkpoints.csv");
  }

  @TestFactory
  List<DynamicTest> uwbAgrees() {
    return agreement("uwb", AgreementTest::uwb, ReferenceFilter.ALL, "uwb-checkpoints.csv");
  }

  @TestFactory
  List<DynamicTest> robotAgrees() {
    return agreement("robot", AgreementTest::robot, ReferenceFilter.ALL, "robot-checkpoints.csv");
  }

  @TestFactory
  List<DynamicTest> gnssAgrees() {
    return agreement(
        "gnss", AgreementTest::gnss, ReferenceFilter.FROM_A_FAR_START, "gnss-checkpoints.csv");
  }

  /**
   * Undamped steps do not settle from here, and what follows hangs on one rounding: nothing to
   * compare. They must say so, and damped ones must do as well as the other methods.
   */
  @Test
  void iterationFromAnOffsetStartTellsThatItDoesNotSettle() {
    assumeTrue(ReferenceFiles.exist());
    Scenario offset = uwb().load("offset").scenario().orElseThrow();
    RunResult undamped = new Replayer(offset, FilterKind.iterated(IteratedUpdate.undamped())).run();
    assertTrue(undamped.status().startsWith("NOT_CONVERGED in "), undamped.status());
    RunResult damped = new Replayer(offset, FilterKind.iterated(IteratedUpdate.lineSearch())).run();
    assertTrue(
        damped.accuracy().position().rmse() <= 0.76,
        () -> damped.status() + ": " + damped.accuracy());
  }

  /**
   * The active components come first in the state, so these two see the same numbers either way. So do motions
   * that are linear in all; a turn is linear in all but the rate, whose points then lie elsewhere: see below.
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
          if (filter == ReferenceFilter.LINEAR || !variant.endsWith("ct")) {
            tests.add(DynamicTest.dynamicTest(
                variant + " " + filter.name(),
                () -> compareWithWholeState(replayed.load(variant), filter.kind(), SAME)));
          }
        }
      }
    }
    return tests;
  }

  /**
   * Points for the turn rate alone against points over the whole state: they differ by the truncation of the product
   * and converge. Measured, largest of both targets: 1e-3 standard deviations with 3 nodes, which are themselves 0.28 from
   * 15 nodes, and 8e-7 with 5.
   */
  @ParameterizedTest
  @CsvSource({"3, 2e-3", "5, 2e-6"})
  void pointsOfTheTurnRateAloneConverge(int nodes, double limit) {
    assumeTrue(ReferenceFiles.exist());
    FilterKind kind = FilterKind.of(PointMatching.of(GaussHermiteRule.product(nodes)));
    compareWithWholeState(vessel().load("target1-ct"), kind, limit);
    compareWithWholeState(vessel().load("target2-ct"), kind, limit);
  }

  /**
   * The two forms against each other, every step: within the limits of the reference; a thousand times those from
   * a far start. Measured: 4e-12 (2.1e-6 with weights of 1e6), there 2.9e-7 (3.4e-3).
   */
  @TestFactory
  List<DynamicTest> formsAgree() {
    if (!ReferenceFiles.exist()) {
      return ReferenceFiles.skipped();
    }
    List<DynamicTest> tests = new ArrayList<>();
    for (ReplayCase replayed : List.of(vessel(), uwb(), robot(), gnss())) {
      for (String name : replayed.variants()) {
        LoadedVariant variant = replayed.load(name);
        for (ReferenceFilter filter : ReferenceFilter.ALL) {
          double limit = filter.limits().distance() * (replayed instanceof GnssCase ? 1000 : 1);
          if (!(variant.label().equals(UNSETTLED) && filter.name().equals("iekf"))) {
            tests.add(DynamicTest.dynamicTest(
                variant.label() + " " + filter.name(), () -> compareForms(variant, filter, limit)));
          }
        }
      }
    }
    return tests;
  }

  private static void compareForms(LoadedVariant variant, ReferenceFilter filter, double limit) {
    RunResult plain = run(variant, filter);
    RunResult root = run(variant, filter.inSquareRootForm());
    assertEquals(plain.status(), root.status());
    double apart = distance(plain, root);
    assertTrue(apart <= limit, "distance must be at most " + limit + ", got " + apart);
  }

  private static ReplayCase vessel() {
    return new VesselCase(ReferenceFiles.log("maritime-scenario16"));
  }

  private static ReplayCase uwb() {
    return new UwbCase(ReferenceFiles.log("uwb-hanyang-los-a1"), UwbSettings.DEFAULT);
  }

  private static ReplayCase robot() {
    return new RobotCase(ReferenceFiles.log("mrclam6-robot3"));
  }

  private static ReplayCase gnss() {
    return new GnssCase(ReferenceFiles.log("gnss-nya1-2024124"));
  }

  private static List<DynamicTest> agreement(
      String caseName,
      Supplier<ReplayCase> opener,
      List<ReferenceFilter> filters,
      String... checkpointFiles) {
    if (!ReferenceFiles.exist()) {
      return ReferenceFiles.skipped();
    }
    JsonNode runs = ReferenceFiles.expectedRuns(caseName);
    List<String[]> checkpoints =
        Stream.of(checkpointFiles).flatMap(ReferenceFiles::checkpoints).toList();
    ReplayCase replayed = opener.get();
    List<DynamicTest> tests = new ArrayList<>();
    for (String name : replayed.variants()) {
      LoadedVariant variant = replayed.load(name);
      JsonNode expected = ReferenceFiles.run(runs, variant.label()).get("filters");
      for (String filterName : comparable(expected, variant.label())) {
        ReferenceFilter filter = ReferenceFilter.named(filterName, filters);
        for (ReferenceFilter formed : List.of(filter, filter.inSquareRootForm())) {
          tests.add(DynamicTest.dynamicTest(
              variant.label() + " " + filterName + " " + formed.kind().form(),
              () -> checkAgainst(expected.get(filterName), checkpoints, variant, formed)));
        }
      }
    }
    return tests;
  }

  /** The filters of the files, but for random draws, which are others here, and one known case. */
  private static List<String> comparable(JsonNode expected, String label) {
    List<String> names = new ArrayList<>();
    expected.fieldNames().forEachRemaining(names::add);
    names.remove("mc");
    if (label.equals(UNSETTLED)) {
      names.remove("iekf");
    }
    return names;
  }

  private static void checkAgainst(
      JsonNode expected,
      List<String[]> checkpoints,
      LoadedVariant variant,
      ReferenceFilter filter) {
    List<String[]> ofThisRun = checkpoints.stream()
        .filter(cells -> cells[0].equals(variant.label()) && cells[1].equals(filter.name()))
        .toList();
    new Agreement(filter, run(variant, filter)).check(expected, ofThisRun);
  }

  private static RunResult run(LoadedVariant variant, ReferenceFilter filter) {
    Replayer replayer = overWholeState(variant, filter.kind());
    return filter.smoothed() ? replayer.runAndSmooth().smoothed() : replayer.run();
  }

  private static Replayer overWholeState(LoadedVariant variant, FilterKind kind) {
    return new Replayer(variant.scenario().orElseThrow(), kind.overWholeState());
  }

  private static void compareWithWholeState(LoadedVariant variant, FilterKind kind, double limit) {
    RunResult whole = overWholeState(variant, kind).run();
    RunResult active = new Replayer(variant.scenario().orElseThrow(), kind).run();
    double apart = distance(whole, active);
    assertTrue(apart <= limit, "distance must be at most " + limit + ", got " + apart);
  }

  /** The largest over all steps. */
  private static double distance(RunResult wanted, RunResult got) {
    EstimateDistance distance = new EstimateDistance();
    for (int step = 0; step < wanted.steps(); step++) {
      Gaussian estimate = wanted.history().get(step).estimate();
      distance.add(
          got.history().get(step).estimate(),
          estimate.mean(),
          estimate.covariance().getData());
    }
    return distance.largest();
  }
}
