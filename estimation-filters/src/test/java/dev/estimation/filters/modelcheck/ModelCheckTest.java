package dev.estimation.filters.modelcheck;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableSensor;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

/** Regions, settings and reports; and how small a mistake is found. */
class ModelCheckTest {
  private static final Region SIGHT = CleanModelsTest.sight();

  private static void refuses(String words, Executable call) {
    String message = assertThrows(IllegalArgumentException.class, call).getMessage();
    for (String word : words.split("\\|", -1)) {
      assertTrue(message.contains(word), () -> word + " is not in " + message);
    }
  }

  /** Keeps the places that it is called at. */
  private static final class Recorder extends BrokenSensors.Plain {
    private final List<double[]> states = new ArrayList<>();
    private final List<double[]> givens = new ArrayList<>();

    @Override
    public void measure(double[] x, double[] given, double[] z) {
      super.measure(x, given, z);
      states.add(x.clone());
      givens.add(given.clone());
    }

    private boolean wasAt(double... state) {
      return states.stream().anyMatch(x -> Arrays.equals(x, state));
    }
  }

  @Test
  void centreAndEndsAreAmongThePlacesAndGivenStaysInItsRange() {
    Recorder recorder = new Recorder();
    Region region = Region.between(Space.reals(2), new double[] {-8, 2}, new double[] {8, 4})
        .withGiven(new double[] {1, 5}, new double[] {1, 6});
    ModelCheck.over(region).withPlaces(20).examine(recorder);
    assertTrue(recorder.wasAt(0, 3));
    assertTrue(recorder.wasAt(-8, 3));
    assertTrue(recorder.wasAt(8, 3));
    assertTrue(recorder.wasAt(0, 2));
    assertTrue(recorder.wasAt(0, 4));
    assertTrue(recorder.wasAt(-8, 2));
    assertTrue(recorder.wasAt(8, 4));
    for (double[] given : recorder.givens) {
      assertEquals(1, given[0]);
      assertTrue(given[1] >= 5 && given[1] <= 6, () -> "given[1] = " + given[1]);
    }
  }

  @Test
  void theSameSeedGivesTheSameReportAndAnotherDoesNot() {
    ModelCheck check = ModelCheck.over(SIGHT);
    String report = check.examine(new BrokenSensors.WrongSlope()).toString();
    assertEquals(report, check.examine(new BrokenSensors.WrongSlope()).toString());
    assertFalse(
        report.equals(check.withSeed(2).examine(new BrokenSensors.WrongSlope()).toString()));
  }

  @Test
  void aFailedAssertionListsFaultsHintsAndNotes() {
    ModelReport report = ModelCheck.over(SIGHT).examine(new BrokenSensors.Unfilled());
    String message = assertThrows(AssertionError.class, report::assertClean).getMessage();
    assertEquals(report.toString(), message);
    assertTrue(message.startsWith("sensor model Unfilled: 1 fault, 0 hints at 200 places\n"));
    assertTrue(message.contains("note: derivatives, inputs, seams and composition were not"));
  }

  @Test
  void acceptedFaultsAreHints() {
    ModelCheck check = ModelCheck.over(SIGHT).accepting(FindingKind.ALLOCATION);
    ModelReport report = check.examine(new BrokenSensors.Allocates());
    assertTrue(report.isClean(), report::toString);
    assertEquals(1, report.findings().size());
    report.assertClean();
    assertFalse(check.examine(new BrokenSensors.WrongSlope()).isClean());
  }

  @Test
  void aFixedStepNeedsNoComposition() {
    Region region = Region.around(Space.reals(2), new double[2], 300, 5).withSteps(1, 1);
    ModelReport report = ModelCheck.over(region).examine(new BrokenMotions.NoiseWithoutTime());
    assertEquals(List.of(), report.findings());
  }

  @Test
  void theScaleRatioIsOnesOwn() {
    ModelCheck check = ModelCheck.over(SIGHT).withScaleRatio(1e12);
    ModelReport report = check.examine(new BrokenSensors.WrongUnit());
    assertEquals(List.of(), report.findings());
  }

  /** An entry of the sight's Jacobian off by a factor. */
  private record Off(int entry, double factor) implements DifferentiableSensor {
    private static final CleanModels.BuoySight RIGHT = new CleanModels.BuoySight();

    @Override
    public Space measurementSpace() {
      return RIGHT.measurementSpace();
    }

    @Override
    public int givenDimension() {
      return 2;
    }

    @Override
    public void measure(double[] x, double[] given, double[] z) {
      RIGHT.measure(x, given, z);
    }

    @Override
    public void measureJacobian(double[] x, double[] given, double[] jacobian) {
      RIGHT.measureJacobian(x, given, jacobian);
      jacobian[entry] *= factor;
    }

    @Override
    public void measurementNoise(double[] x, double[] given, double[] r) {
      RIGHT.measurementNoise(x, given, r);
    }
  }

  /** The limit is 1e-6, and differences over widths of 200 m do not blur 1e-5. */
  @Test
  void aHundredThousandthOfASlopeIsFound() {
    for (int entry : new int[] {0, 1, 3, 4, 5}) {
      ModelReport report = ModelCheck.over(SIGHT).examine(new Off(entry, 1 + 1e-5));
      assertEquals(1, report.findings().size(), report::toString);
      assertEquals(FindingKind.JACOBIAN, report.findings().get(0).kind());
      assertEquals(
          "jacobian[" + entry / 3 + "][" + entry % 3 + "]",
          report.findings().get(0).component());
    }
  }

  @Test
  void wrongRegionsAreRefused() {
    Space plane = Space.reals(2);
    refuses("halfWidths[1]|-1.0", () -> Region.around(plane, new double[2], 1, -1));
    refuses("halfWidths|length 2|got 1", () -> Region.around(plane, new double[2], 1));
    refuses("centre", () -> Region.around(plane, new double[] {Double.NaN, 0}, 1, 1));
    refuses(
        "high state[0]|3.0|got 2.0",
        () -> Region.between(plane, new double[] {3, 0}, new double[] {2, 1}));
    refuses(
        "corners|(unit quaternion)",
        () -> Region.between(Space.unitQuaternion(), new double[4], new double[4]));
    Region region = Region.around(plane, new double[2], 1, 1);
    refuses("step|0.0", () -> region.withSteps(0, 1));
    refuses("high step[0]|2.0 or more|1.0", () -> region.withSteps(2, 1));
    refuses("high time", () -> region.withTimes(2, 1));
  }

  @Test
  void regionsThatDoNotFitTheModelAreRefused() {
    Region line = Region.around(Space.reals(1), new double[1], 1);
    refuses(
        "2 given|got 0|BuoySight",
        () -> ModelCheck.over(line).examine(new CleanModels.BuoySight()));
    refuses(
        "(real, real)|got (real)|Lift",
        () -> ModelCheck.over(line).examine(new CleanModels.Lift()));
    refuses("withSteps|Mooring", () -> ModelCheck.over(line).examine(new CleanModels.Mooring()));
    refuses("places|got 1", () -> ModelCheck.over(line).withPlaces(1));
    refuses("scale ratio|got 1.0", () -> ModelCheck.over(line).withScaleRatio(1));
  }
}
