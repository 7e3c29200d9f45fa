package dev.estimation.filters.modelcheck;

import static dev.estimation.filters.modelcheck.FindingKind.ALLOCATION;
import static dev.estimation.filters.modelcheck.FindingKind.ANGLE_NOT_PERIODIC;
import static dev.estimation.filters.modelcheck.FindingKind.EARLIER_CALL;
import static dev.estimation.filters.modelcheck.FindingKind.EXCEPTION;
import static dev.estimation.filters.modelcheck.FindingKind.HESSIAN;
import static dev.estimation.filters.modelcheck.FindingKind.INPUT_CHANGED;
import static dev.estimation.filters.modelcheck.FindingKind.JACOBIAN;
import static dev.estimation.filters.modelcheck.FindingKind.NOISE_BELOW_ROUNDING;
import static dev.estimation.filters.modelcheck.FindingKind.NOISE_NOT_COMPOSING;
import static dev.estimation.filters.modelcheck.FindingKind.NOISE_NOT_DEFINITE;
import static dev.estimation.filters.modelcheck.FindingKind.NOISE_NOT_SYMMETRIC;
import static dev.estimation.filters.modelcheck.FindingKind.NOT_DETERMINISTIC;
import static dev.estimation.filters.modelcheck.FindingKind.NOT_FINITE;
import static dev.estimation.filters.modelcheck.FindingKind.NOT_LINEAR;
import static dev.estimation.filters.modelcheck.FindingKind.OUTPUT_UNFILLED;
import static dev.estimation.filters.modelcheck.FindingKind.THREAD_COPY;
import static dev.estimation.filters.modelcheck.FindingKind.UNDECLARED_INPUT;
import static dev.estimation.filters.modelcheck.FindingKind.UNDECLARED_SEAM;
import static dev.estimation.filters.modelcheck.FindingKind.UNEQUAL_SCALES;
import static dev.estimation.filters.modelcheck.FindingKind.UNREAD_INPUT;
import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.space.Space;
import dev.estimation.filters.guide.Guide;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.model.NoiseDrivenMotion;
import dev.estimation.filters.model.SensorModel;
import java.io.IOException;
import java.math.BigDecimal;
import java.math.MathContext;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.EnumMap;
import java.util.EnumSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** Each fault is found, with component and numbers in its message, and nothing else beside it. */
class BrokenModelsTest {
  /** A report, the one kind that it must have, and what its message must contain. */
  private record Case(ModelReport report, FindingKind kind, int findings, List<String> words) {
    void check() {
      Set<FindingKind> kinds = EnumSet.noneOf(FindingKind.class);
      report.findings().forEach(finding -> kinds.add(finding.kind()));
      assertEquals(Set.of(kind), kinds, report::toString);
      assertEquals(findings, report.findings().size(), report::toString);
      assertEquals(!kind.isFault(), report.isClean(), report::toString);
      for (String word : words) {
        assertTrue(report.toString().contains(word), () -> word + " is not in\n" + report);
      }
    }
  }

  private static Case of(SensorModel model, FindingKind kind, int findings, String... words) {
    ModelReport report = ModelCheck.over(CleanModelsTest.sight()).examine(model);
    return new Case(report, kind, findings, List.of(words));
  }

  private static Case of(Motion model, FindingKind kind, int findings, String... words) {
    Region region = model instanceof NoiseDrivenMotion ? cart(model.stateSpace()) : lift();
    ModelReport report = ModelCheck.over(region).examine(model);
    return new Case(report, kind, findings, List.of(words));
  }

  private static Region lift() {
    return Region.around(Space.reals(2), new double[] {300, 0}, 300, 5).withSteps(0.1, 4);
  }

  private static Region cart(Space space) {
    return Region.around(space, new double[] {10, 20, 3.1}, 50, 50, 1)
        .withControl(new double[] {0, -1}, new double[] {3, 1})
        .withSteps(0.05, 1);
  }

  private static Stream<Case> sensors() {
    return Stream.of(
        of(
            new BrokenSensors.WrongSlope(),
            JACOBIAN,
            1,
            "jacobian[1][1] must be 0.0019",
            "got -0.0019"),
        of(new BrokenSensors.WrongBend(), HESSIAN, 1, "hessian[1][1][0] must be", "got 0.0"),
        of(
            new BrokenSensors.ForgottenInput(),
            UNDECLARED_INPUT,
            1,
            "state[2] is not",
            "measurement[1]"),
        of(new BrokenSensors.ImpossibleInput(), EXCEPTION, 1, "0..2, got [0, 1, 3]"),
        of(new BrokenSensors.NotLinear(), NOT_LINEAR, 1, "state[1]"),
        of(new BrokenSensors.Area(), NOT_LINEAR, 1, "all of them together"),
        of(
            new BrokenSensors.BearingAsReal(),
            UNDECLARED_SEAM,
            1,
            "measurement[1]",
            "6.28318530717"),
        of(new BrokenSensors.ProportionalToHeading(), ANGLE_NOT_PERIODIC, 1, "3.14159265"),
        of(new BrokenSensors.HalfNoise(), NOISE_NOT_SYMMETRIC, 1, "[1][0]", "0.01, got 0.0"),
        of(new BrokenSensors.Overcorrelated(), NOISE_NOT_DEFINITE, 1, "pivot"),
        of(new BrokenSensors.Noiseless(), NOISE_NOT_DEFINITE, 1, "pivot"),
        of(new BrokenSensors.WritesOnState(), INPUT_CHANGED, 1, "measure: state[2]"),
        of(new BrokenSensors.WritesOnGiven(), INPUT_CHANGED, 1, "measurementNoise: given[0]"),
        of(new BrokenSensors.Unfilled(), OUTPUT_UNFILLED, 1, "measurement[1] must be filled, got"),
        of(new BrokenSensors.AddsToNothing(), OUTPUT_UNFILLED, 1, "before it is read"),
        of(new BrokenSensors.TooLong(), EXCEPTION, 1, "Index 2 out of bounds", "of 200 places"),
        of(new BrokenSensors.Refuses(), EXCEPTION, 1, "no sight east of 150 m"),
        of(new BrokenSensors.RootOfNegative(), NOT_FINITE, 1, "measurement[0] must be finite"),
        of(new BrokenSensors.Simulates(), NOT_DETERMINISTIC, 1, "measurement[0]"),
        of(new BrokenSensors.KnowsTheArray(), EARLIER_CALL, 1, "measurement[0]"),
        of(
            new BrokenSensors.NoiseOfLastRange(),
            EARLIER_CALL,
            1,
            "covariance[0][0]",
            "before measure"),
        of(new BrokenSensors.WritesLater(), EARLIER_CALL, 1, "must stay"),
        of(new BrokenSensors.Allocates(), ALLOCATION, 1, "measure: a call must allocate nothing"),
        of(new BrokenSensors.Unread(), UNREAD_INPUT, 1, "hint: ", "state[2]"),
        of(new BrokenSensors.WrongUnit(), UNEQUAL_SCALES, 1, "state[1] over its width of 200.0"),
        of(
            new BrokenSensors.TinyNoise(),
            NOISE_BELOW_ROUNDING,
            1,
            "covariance[0][0]",
            "doubles at 40000.0"));
  }

  private static Stream<Case> lifts() {
    return Stream.of(
        of(new BrokenMotions.LiftWrongSlope(), JACOBIAN, 1, "jacobian[0][1]", "got 1.0"),
        of(new BrokenMotions.WrongBend(), HESSIAN, 1, "hessian[1][1][1]"),
        of(new BrokenMotions.LiftForgottenInput(), UNDECLARED_INPUT, 1, "state[1]"),
        of(new BrokenMotions.SpeedNoiseOnly(), NOISE_NOT_COMPOSING, 2, "covariance[0][0] over"),
        of(new BrokenMotions.NoiseWithoutTime(), NOISE_NOT_COMPOSING, 3, "that of two steps of"),
        of(new BrokenMotions.LiftHalfNoise(), NOISE_NOT_SYMMETRIC, 1, "covariance[1][0]"),
        of(new BrokenMotions.NegativeVariance(), NOISE_NOT_DEFINITE, 1, "covariance[0][0] = -"),
        of(new BrokenMotions.LiftWritesOnState(), INPUT_CHANGED, 1, "move: state[0]"),
        of(new BrokenMotions.LiftUnfilled(), OUTPUT_UNFILLED, 1, "next[1]"),
        of(new BrokenMotions.LastStep(), EARLIER_CALL, 1, "next[0]"),
        of(new BrokenMotions.Counts(), NOT_DETERMINISTIC, 1, "processNoise: covariance[1][1]"),
        of(new BrokenMotions.LiftNotFinite(), NOT_FINITE, 1, "jacobian[0][1]", "got NaN"),
        of(new BrokenMotions.ForgetsFriction(0.2), THREAD_COPY, 1, "move: next[1] must be -0.8"),
        of(new BrokenMotions.TakesAnother(), THREAD_COPY, 1, "must give", "moveJacobian"),
        of(new BrokenMotions.LiftAllocates(), ALLOCATION, 1, "processNoise: a call must"));
  }

  private static Stream<Case> carts() {
    return Stream.of(
        of(new BrokenMotions.HeadingAsReal(), UNDECLARED_SEAM, 1, "next[2]"),
        of(new BrokenMotions.ReturningHeading(), ANGLE_NOT_PERIODIC, 1, "state[2] is an angle"),
        of(new BrokenMotions.CartWrongSlope(), JACOBIAN, 1, "jacobian[0][4]"),
        of(new BrokenMotions.CartNotLinear(), NOT_LINEAR, 1, "noise[1]"),
        of(new BrokenMotions.CartForgottenNoise(), UNDECLARED_INPUT, 1, "noise[1]"),
        of(new BrokenMotions.CartUnreadNoise(), UNREAD_INPUT, 1, "noise[2]"),
        of(new BrokenMotions.CartHalfNoise(), NOISE_NOT_SYMMETRIC, 1, "covariance[1][0]"),
        of(new BrokenMotions.CartNegativeVariance(), NOISE_NOT_DEFINITE, 1, "[1][1] = -0.001"),
        of(new BrokenMotions.CartWritesOnNoise(), INPUT_CHANGED, 2, "noise[1]"),
        of(new BrokenMotions.CartWritesOnControl(), INPUT_CHANGED, 1, "control[0]"),
        of(new BrokenMotions.CartThrows(), EXCEPTION, 1, "Index 3 out of bounds for length 3"));
  }

  private static List<Case> cases() {
    return Stream.of(sensors(), lifts(), carts())
        .flatMap(each -> each)
        .collect(Collectors.toList());
  }

  @Test
  void eachFaultIsFoundAndNoOther() throws IOException {
    List<Case> cases = cases();
    String list = cases.stream().map(each -> each.report() + "\n").collect(Collectors.joining());
    Files.writeString(Path.of("target", "modelcheck-broken.txt"), list);
    assertAll(cases.stream().map(each -> each::check));
  }

  /** The first model of each kind, numbers to four digits. */
  @Test
  void theGuideHasAnExampleOfEachKind() throws IOException {
    Map<FindingKind, String> examples = new EnumMap<>(FindingKind.class);
    for (Case each : cases()) {
      String message = each.report().findings().get(0).message();
      examples.putIfAbsent(each.kind(), "| " + each.kind() + " | " + shortened(message) + " |\n");
    }
    String head = "| finding | message, for example |\n|---|---|\n";
    Guide.assertHolds("modelcheck-kinds.md", head + String.join("", examples.values()));
  }

  private static String shortened(String message) {
    return Pattern.compile("-?\\d+\\.\\d+(E-?\\d+)?")
        .matcher(message)
        .replaceAll(number -> Double.toString(
            new BigDecimal(number.group()).round(new MathContext(4)).doubleValue()));
  }

  @Test
  void everyKindHasAModel() {
    Set<FindingKind> kinds = EnumSet.allOf(FindingKind.class);
    cases().forEach(each -> kinds.remove(each.kind()));
    assertEquals(Set.of(), kinds);
  }
}
