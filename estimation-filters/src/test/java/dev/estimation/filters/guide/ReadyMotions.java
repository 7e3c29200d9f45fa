package dev.estimation.filters.guide;

import static dev.estimation.filters.modelcheck.FindingKind.ALLOCATION;

import dev.estimation.core.space.Space;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.modelcheck.Region;
import dev.estimation.filters.motion.ConstantAcceleration;
import dev.estimation.filters.motion.ConstantVelocity;
import dev.estimation.filters.motion.CoordinatedTurn;
import dev.estimation.filters.motion.CorrelatedAcceleration;
import dev.estimation.filters.motion.FallingBody;
import dev.estimation.filters.motion.GyroscopeAttitude;
import dev.estimation.filters.motion.IntegratedMotion;
import dev.estimation.filters.motion.MotionBlocks;
import dev.estimation.filters.motion.PlanarVehicle;
import dev.estimation.filters.motion.PolarTurn;
import dev.estimation.filters.motion.RandomWalk;
import dev.estimation.filters.motion.ReceiverClock;
import java.util.List;

/** All ready motions, over the places where each is used and those where it is hard. */
final class ReadyMotions {
  private ReadyMotions() {}

  static List<ReadyModel> all() {
    return List.of(
        randomWalk(),
        constantVelocity(),
        constantAcceleration(),
        correlatedAcceleration(),
        receiverClock(),
        coordinatedTurn(),
        polarTurn(),
        planarVehicle(),
        gyroscopeAttitude(),
        fallingBody(),
        addedBlocks(),
        attitudeBlocks(),
        drivenBlocks());
  }

  private static Region around(Motion model, double[] centre, double... halfWidths) {
    return Region.around(model.stateSpace(), centre, halfWidths);
  }

  private static ReadyModel randomWalk() {
    Motion model = new RandomWalk(0.1, 2);
    return new ReadyModel("RandomWalk(q, q)")
        .over("near", model, around(model, new double[2], 10, 100).withSteps(1e-3, 1e4))
        .over("1e7 m off", model, around(model, new double[] {1e7, -2e7}, 1, 1).withSteps(1, 10));
  }

  private static ReadyModel constantVelocity() {
    Motion model = new ConstantVelocity(0.1, 2);
    double[] off = {1e7, -2e7, 0, 0};
    return new ReadyModel("ConstantVelocity(q, q)")
        .over("near", model, around(model, new double[4], 1e3, 1e3, 30, 30).withSteps(1e-3, 100))
        .over("1e7 m off", model, around(model, off, 10, 10, 30, 30).withSteps(0.1, 10));
  }

  private static ReadyModel constantAcceleration() {
    Motion model = new ConstantAcceleration(0.1);
    return new ReadyModel("ConstantAcceleration(q)")
        .over("near", model, around(model, new double[3], 1e3, 30, 3).withSteps(1e-3, 100))
        .over(
            "1e7 m off",
            model,
            around(model, new double[] {1e7, 0, 0}, 10, 30, 3).withSteps(0.1, 10));
  }

  private static ReadyModel correlatedAcceleration() {
    Motion model = new CorrelatedAcceleration(20, 0.1);
    double[] off = {1e7, 0, 0};
    return new ReadyModel("CorrelatedAcceleration(tau, q)")
        .over("steps to 1 tau", model, around(model, new double[3], 1e3, 30, 3).withSteps(1e-2, 20))
        .over("10 tau", model, around(model, new double[3], 1e3, 30, 3).withSteps(20, 200))
        .over("1e7 m off", model, around(model, off, 10, 30, 3).withSteps(0.1, 10));
  }

  private static ReadyModel receiverClock() {
    Motion metres = new ReceiverClock(0.01, 0.04);
    Motion seconds = new ReceiverClock(1e-19, 4e-20);
    return new ReadyModel("ReceiverClock(p, f)")
        .over("m", metres, around(metres, new double[2], 3e5, 100).withSteps(0.01, 100))
        .over("s", seconds, around(seconds, new double[2], 1e-3, 1e-7).withSteps(0.01, 100));
  }

  private static ReadyModel coordinatedTurn() {
    Motion model = new CoordinatedTurn(0.1, 1e-4);
    double[] none = new double[5];
    double[] off = {1e7, -1e7, 0, 0, 0};
    return new ReadyModel("CoordinatedTurn(q, r)")
        .over("turns", model, around(model, none, 5e3, 5e3, 30, 30, 0.5).withSteps(0.1, 10))
        .over(
            "turn rate 1e-5", model, around(model, none, 5e3, 5e3, 30, 30, 1e-5).withSteps(0.1, 10))
        .over("1e7 m off", model, around(model, off, 10, 10, 30, 30, 0.1).withSteps(0.1, 10));
  }

  private static ReadyModel polarTurn() {
    Motion model = new PolarTurn(0.1, 1e-4);
    double[] west = {0, 0, 15, Math.PI, 0};
    double[] off = {1e7, -1e7, 15, 0, 0};
    return new ReadyModel("PolarTurn(q, r)")
        .over(
            "all headings",
            model,
            around(model, west, 5e3, 5e3, 14, Math.PI, 0.5).withSteps(0.1, 10))
        .over(
            "heading at pi", model, around(model, west, 5e3, 5e3, 14, 0.1, 0.01).withSteps(0.1, 2))
        .over(
            "turn rate 1e-5", model, around(model, west, 5e3, 5e3, 14, 1, 1e-5).withSteps(0.1, 10))
        .over("1e7 m off", model, around(model, off, 10, 10, 14, 1, 0.1).withSteps(0.1, 10));
  }

  private static ReadyModel planarVehicle() {
    Motion model = new PlanarVehicle(0.01, 1e-3);
    Motion quiet = new PlanarVehicle(1e-6, 1e-12);
    double[] west = {0, 0, Math.PI};
    double[] slow = {-1, -1};
    double[] fast = {10, 1};
    return new ReadyModel("PlanarVehicle(s, y)")
        .over("all headings", model, driven(model, west, 100, Math.PI, slow, fast))
        .over("heading at pi", model, driven(model, west, 100, 0.1, slow, fast))
        .over("straight on", quiet, driven(quiet, west, 100, 1, new double[2], new double[] {5, 0}))
        .over("1e7 m off", model, driven(model, new double[] {1e7, 0, 1}, 1, 1, slow, fast));
  }

  private static Region driven(
      Motion model, double[] centre, double place, double angle, double[] slow, double[] fast) {
    return around(model, centre, place, place, angle).withControl(slow, fast).withSteps(0.05, 1);
  }

  private static ReadyModel gyroscopeAttitude() {
    Motion model = new GyroscopeAttitude(1e-6, 1e-8);
    double[] level = {1, 0, 0, 0, 0, 0, 0};
    double[] tilted = {0.5, 0.5, -0.5, 0.5, 0, 0, 0};
    double[] upsideDown = {0, 1, 0, 0, 0, 0, 0};
    return new ReadyModel("GyroscopeAttitude(n, r)")
        .over("50 Hz", model, turned(model, tilted, 0.5, 2).withSteps(0.01, 0.02))
        .over("up to 10 rad a step", model, turned(model, level, 0.5, 10).withSteps(0.1, 1))
        .over("at rest", model, turned(model, level, 0.1, 1e-6).withSteps(0.01, 1))
        .over("any attitude", model, turned(model, upsideDown, 2, 1).withSteps(0.01, 0.5));
  }

  private static Region turned(Motion model, double[] centre, double angle, double rate) {
    return around(model, centre, angle, angle, angle, 0.01, 0.01, 0.01)
        .withControl(new double[] {-rate, -rate, -rate}, new double[] {rate, rate, rate});
  }

  private static ReadyModel fallingBody() {
    FallingBody body = new FallingBody(1.0 / 7000, 9.81, 0.1, 1e-12);
    Motion model = IntegratedMotion.of(body, 1e-12, 1e-6, 1e-6, 1e-12);
    Motion differenced = IntegratedMotion.withDifferences(
        body, new double[] {7e3, 1e3, 1e-4}, 1e-9, 1e-6, 1e-6, 1e-12);
    double[] high = {3e4, 2000, 1e-4};
    double[] low = {2e3, 300, 1e-3};
    return new ReadyModel("FallingBody, by IntegratedMotion")
        .over("high and fast", model, around(model, high, 1e4, 1e3, 5e-5).withSteps(0.1, 2))
        .over("low and slow", model, around(model, low, 1e3, 100, 5e-4).withSteps(0.1, 2))
        .over(
            "differenced",
            differenced,
            around(differenced, high, 1e4, 1e3, 5e-5).withSteps(0.1, 2))
        .finding(ALLOCATION, "the integrator allocates")
        .atPlaces(40);
  }

  private static ReadyModel addedBlocks() {
    Motion model = MotionBlocks.of(new CoordinatedTurn(0.1, 1e-4), new ReceiverClock(0.01, 0.04));
    return new ReadyModel("MotionBlocks of CoordinatedTurn, ReceiverClock")
        .over(
            "turns",
            model,
            around(model, new double[7], 5e3, 5e3, 30, 30, 0.5, 3e5, 100).withSteps(0.1, 10));
  }

  private static ReadyModel attitudeBlocks() {
    Motion model = MotionBlocks.of(
        new GyroscopeAttitude(1e-6, 1e-8),
        MotionBlocks.of(new ConstantVelocity(1, 1), new RandomWalk(0.1)));
    double[] centre = {0.5, 0.5, -0.5, 0.5, 0, 0, 0, 1e5, 0, 0, 0, 2};
    double[] widths = {0.5, 0.5, 0.5, 0.01, 0.01, 0.01, 1e3, 1e3, 30, 30, 1};
    return new ReadyModel(
            "MotionBlocks of GyroscopeAttitude and MotionBlocks of ConstantVelocity, RandomWalk")
        .over(
            "all that moves",
            model,
            around(model, centre, widths)
                .withControl(new double[] {-1, -1, -1}, new double[] {1, 1, 1})
                .withSteps(0.01, 0.5));
  }

  private static ReadyModel drivenBlocks() {
    Motion model = MotionBlocks.of(new PlanarVehicle(0.01, 1e-3), new PlanarVehicle(0.1, 1e-2));
    double[] centre = {0, 0, Math.PI, 50, 0, 1};
    return new ReadyModel("MotionBlocks of two PlanarVehicle")
        .over(
            "one heading at pi",
            model,
            around(model, centre, 100, 100, 0.1, 100, 100, 1)
                .withControl(new double[] {-1, -1, 0, -1}, new double[] {10, 1, 5, 1})
                .withSteps(0.05, 1));
  }

  /** The state of a vehicle with attitude, gyroscope bias, place, velocity and clock. */
  static Space navigation() {
    return MotionBlocks.of(
            new GyroscopeAttitude(1e-6, 1e-8),
            new ConstantVelocity(1, 1, 1),
            new ReceiverClock(0.01, 0.04))
        .stateSpace();
  }
}
