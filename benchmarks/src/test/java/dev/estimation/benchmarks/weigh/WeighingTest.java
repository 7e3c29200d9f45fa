package dev.estimation.benchmarks.weigh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.benchmarks.cases.balloon.BalloonCase;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.core.accuracy.Audit;
import dev.estimation.core.accuracy.AuditRow;
import dev.estimation.core.accuracy.OperatingPoint;
import dev.estimation.core.accuracy.ReferenceSettings;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.Use;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.filters.model.SensorModel;
import java.util.List;
import org.junit.jupiter.api.Test;

class WeighingTest {
  private static final MomentMatching TRACK = PointMatching.of(GaussHermiteRule.product(5));
  private static final List<Contender> METHODS = List.of(
      new Contender("linear", Linearisation.firstOrder()),
      new Contender("cubature", PointMatching.of(CubatureRule.degreeThree())),
      new Contender("random", PointMatching.of(RandomRule.independent(3, 1).standardised())));

  private final Scenario flight = new BalloonCase().load("flight").scenario().orElseThrow();

  private WeighedRun weigh(Region region, int threads) {
    return new Weighing(region, TRACK, METHODS, 0.01).run(new Workers(threads), false, () -> {});
  }

  @Test
  void theNumberOfThreadsChangesNothing() {
    Region region = Region.along(flight, new Selection(0, 40, 2));
    WeighedRun one = weigh(region, 1);
    assertEquals(one, weigh(region, 4));
    assertEquals(20, one.functions().get(0).points());
    assertEquals(21, one.functions().get(1).points());
  }

  @Test
  void aMethodThatCannotServeIsTold() {
    MethodWeight random = weigh(Region.along(flight, new Selection(1, 1, 0)), 1)
        .functions()
        .get(1)
        .methods()
        .get(2);
    assertTrue(random.refusal().contains("3"), random.refusal());
  }

  /** A told estimate at the first step is the same point for an audit of the sensor on its own. */
  @Test
  void toldPointsAreThoseOfAnAudit() {
    Gaussian told = flight.start();
    WeighedRun run = weigh(Region.told(flight, List.of(new Region.Told(3, told))), 1);
    assertEquals(
        List.of("ConstantVelocity", "RangeAzimuthElevation"),
        run.functions().stream().map(FunctionWeight::name).toList());
    SensorModel sensor = flight.steps().get(3).measurements().get(0).sensor();
    VectorFunction look = sensor::measure;
    double[][] noise = new double[3][3];
    double[] flat = new double[9];
    double[] given = flight.steps().get(3).measurements().get(0).given();
    sensor.measurementNoise(told.mean(), given, flat);
    for (int i = 0; i < 3; i++) {
      noise[i][i] = flat[4 * i];
    }
    AuditRow audited = Audit.of(
            flight.motion().stateSpace(), sensor.measurementSpace(), look, Use.UPDATE)
        .reference(ReferenceSettings.standard().withAccuracy(1e-4))
        .method("whole", PointMatching.of(GaussHermiteRule.product(3)))
        .run(List.of(OperatingPoint.of(told, noise, given)))
        .rows()
        .get(0);
    WeighedRun hermite = new Weighing(
            Region.told(flight, List.of(new Region.Told(3, told))),
            TRACK,
            List.of(new Contender("3", PointMatching.of(GaussHermiteRule.product(3)))),
            0.01)
        .run(new Workers(2), false, () -> {});
    // Both truths are within 2e-4 of the right one; the audit draws over all six inputs, and no
    // more is read.
    assertEquals(
        audited.largest().worst(),
        hermite.functions().get(1).methods().get(0).error().largest(),
        1e-3);
  }

  @Test
  void badSettingsAreRefused() {
    Region region = Region.along(flight, Selection.ALL);
    assertThrows(IllegalArgumentException.class, () -> new Weighing(region, TRACK, METHODS, 0));
    assertThrows(IllegalArgumentException.class, () -> new Selection(3, 2, 0));
    assertThrows(IllegalArgumentException.class, () -> new Workers(0));
  }
}
