package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.model.NoiseDrivenMotion;
import dev.estimation.filters.model.TwiceDifferentiableMotion;
import dev.estimation.filters.testing.Turns;
import java.util.Arrays;
import org.junit.jupiter.api.Test;

/** The contract is kept by a clock behind a body behind a turn: spaces, controls and indices are all mixed. */
class MotionBlocksTest extends MotionContract {
  private final CoordinatedTurn turn = new CoordinatedTurn(0.1, 2e-4);
  private final GyroscopeAttitude attitude = new GyroscopeAttitude(1e-6, 1e-8);
  private final ReceiverClock clock = new ReceiverClock(2e-3, 3e-8);

  @Override
  DifferentiableMotion model() {
    return (DifferentiableMotion) MotionBlocks.of(turn, attitude, clock);
  }

  @Override
  double[][] states() {
    return new double[][] {{40, -30, 4, 2.5, 0.1, 0, 0.6, 0.8, 0, 0.3, -0.2, 0.4, 7, -0.5}};
  }

  @Override
  double[] scales() {
    return new double[] {100, 100, 3, 3, 0.1, 1, 1, 1, 0.02, 0.02, 0.02, 10, 1};
  }

  @Override
  double[] control() {
    return new double[] {0.3, -0.2, 0.5};
  }

  @Test
  void whatIsKnownOfBlocksIsKnownOfTheWhole() {
    MotionModel whole = model();
    assertEquals(
        Space.reals(5).and(Space.unitQuaternion()).and(Space.reals(5)), whole.stateSpace());
    assertEquals(3, whole.controlDimension());
    assertArrayEquals(
        new int[] {0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12}, whole.structure().activeInputs(13));
    assertArrayEquals(new int[] {0, 1, 2, 3, 11, 12}, whole.structure().linearInputs());
    assertFalse(whole instanceof TwiceDifferentiableMotion);
  }

  @Test
  void everyBlockMovesByItself() {
    double[] state = states()[0];
    double[] next = MotionFunctions.moved(model(), state, control(), 0.7);
    double[] none = {};
    double[] first = MotionFunctions.moved(turn, part(state, 0, 5), none, 0.7);
    double[] second = MotionFunctions.moved(attitude, part(state, 5, 12), control(), 0.7);
    double[] third = MotionFunctions.moved(clock, part(state, 12, 14), none, 0.7);
    assertArrayEquals(first, part(next, 0, 5), 0);
    assertArrayEquals(second, part(next, 5, 12), 0);
    assertArrayEquals(third, part(next, 12, 14), 0);
  }

  private static double[] part(double[] values, int from, int to) {
    return Arrays.copyOfRange(values, from, to);
  }

  @Test
  void noiseIsBlockDiagonal() {
    double[] noise = MotionFunctions.noise(model(), states()[0], control(), 0.5);
    double[] expected = new double[169];
    put(MotionFunctions.noise(turn, new double[5], new double[0], 0.5), 5, 0, expected);
    put(MotionFunctions.noise(attitude, part(states()[0], 5, 12), control(), 0.5), 6, 5, expected);
    put(MotionFunctions.noise(clock, new double[2], new double[0], 0.5), 2, 11, expected);
    assertArrayEquals(expected, noise, 0);
  }

  private static void put(double[] block, int n, int start, double[] whole) {
    for (int i = 0; i < n; i++) {
      System.arraycopy(block, i * n, whole, (start + i) * 13 + start, n);
    }
  }

  @Test
  void nestingChangesNothing() {
    MotionModel nested = MotionBlocks.of(turn, MotionBlocks.of(attitude, clock));
    double[] state = states()[0];
    assertEquals(model().stateSpace(), nested.stateSpace());
    assertArrayEquals(model().structure().linearInputs(), nested.structure().linearInputs());
    assertArrayEquals(
        MotionFunctions.moved(model(), state, control(), 0.7),
        MotionFunctions.moved(nested, state, control(), 0.7),
        0);
    DifferentiableMotion own = (DifferentiableMotion) nested.forOneThread();
    assertNotSame(nested, own);
    assertArrayEquals(
        MotionFunctions.jacobian(model(), state, control(), 0.7),
        MotionFunctions.jacobian(own, state, control(), 0.7),
        0);
  }

  /** With Hessians that are not zero, in different places; checked against differences of the Jacobian. */
  @Test
  void hessiansOfBlocksAreThatOfTheWhole() {
    MotionModel whole = MotionBlocks.of(new Bent(2), clock, new Bent(3));
    assertTrue(whole instanceof TwiceDifferentiableMotion);
    double[] state = {0.7, -0.2, 3, 0.1, 0.4, 1.1};
    double[] scales = {1, 1, 1, 1, 1, 1};
    TwiceDifferentiableMotion twice = (TwiceDifferentiableMotion) whole;
    MotionFunctions.checkDerivatives(twice, state, new double[0], 0.5, scales);
    double[] hessians = new double[216];
    twice.moveHessian(state, new double[0], 0, 0.5, hessians);
    assertEquals(2 * 0.5, hessians[(0 * 6 + 1) * 6 + 0], 0);
    assertEquals(3 * 0.5, hessians[(4 * 6 + 5) * 6 + 4], 0);
    assertArrayEquals(new int[] {2, 3}, whole.structure().linearInputs());
  }

  /** x' = x + a dt x y, y' = y: of two inputs. */
  private record Bent(double a) implements TwiceDifferentiableMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(2);
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      next[0] = state[0] + a * dt * state[0] * state[1];
      next[1] = state[1];
    }

    @Override
    public void moveJacobian(
        double[] state, double[] control, double time, double dt, double[] jacobian) {
      jacobian[0] = 1 + a * dt * state[1];
      jacobian[1] = a * dt * state[0];
      jacobian[3] = 1;
    }

    @Override
    public void moveHessian(
        double[] state, double[] control, double time, double dt, double[] hessians) {
      hessians[1] = a * dt;
      hessians[2] = a * dt;
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      covariance[0] = dt;
    }
  }

  /** Reads its second component alone. */
  private record Follower() implements MotionModel {
    @Override
    public Space stateSpace() {
      return Space.reals(2);
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(1);
    }

    @Override
    public void move(double[] state, double[] control, double time, double dt, double[] next) {
      next[0] = Math.sin(state[1]);
      next[1] = state[1];
    }

    @Override
    public void processNoise(
        double[] state, double[] control, double time, double dt, double[] covariance) {
      covariance[0] = 1;
    }
  }

  @Test
  void aBlockWithoutAJacobianLeavesTheWholeWithoutOne() {
    MotionModel whole = MotionBlocks.of(clock, new Follower());
    assertFalse(whole instanceof DifferentiableMotion);
    assertFalse(whole.forOneThread() instanceof DifferentiableMotion);
    assertArrayEquals(new int[] {0, 1, 3}, whole.structure().activeInputs(4));
    assertArrayEquals(new int[] {0, 1}, whole.structure().linearInputs());
    double[] next = MotionFunctions.moved(whole, new double[] {1, 2, 9, 0.5}, new double[0], 3);
    assertArrayEquals(new double[] {7, 2, Math.sin(0.5), 0.5}, next, 0);
  }

  /** Points are drawn for the turn rate alone, as they are without the clock: 3 points and Jacobians. */
  @Test
  void pointsAreDrawnForWhatBendsAlone() {
    FilterPlan whole = FilterPlan.unscented(MotionBlocks.of(turn, clock), 1, 2, 0);
    FilterPlan alone = FilterPlan.unscented(turn, 1, 2, 0);
    FilterWorkspace work = whole.workspace();
    FilterWorkspace single = alone.workspace();
    double[] mean = {40, -30, 4, 2.5, 0.1, 7, -0.5};
    double[] deviations = {10, 10, 1, 1, 0.05, 3, 0.1};
    Estimate both = whole.start(0, Gaussian.independent(mean, deviations));
    Estimate one = alone.start(0, Gaussian.independent(part(mean, 0, 5), part(deviations, 0, 5)));
    assertEquals(StepStatus.APPLIED, work.predict(both, 4));
    assertEquals(StepStatus.APPLIED, single.predict(one, 4));
    assertEquals(single.evaluations(), work.evaluations());
    for (int i = 0; i < 5; i++) {
      assertEquals(one.mean(i), both.mean(i), 1e-12); // roundings of 60
      assertEquals(one.standardDeviation(i), both.standardDeviation(i), 1e-13 * 20);
    }
    assertEquals(5, both.mean(5), 1e-14);
  }

  @Test
  void noiseDrivenBlocksMoveByThemselves() {
    NoiseDrivenMotion whole = MotionBlocks.of(new PlanarVehicle(1, 2), new Turns.Slip());
    assertEquals(3, whole.controlDimension());
    assertEquals(4, whole.noiseDimension());
    assertArrayEquals(new int[] {0, 1, 3, 4, 6, 8}, whole.structure().linearInputs());
    double[] state = {1, 2, 0.4, -3, 5, 3.1};
    double[] noise = {0.1, 0.2, -0.3, 0.15};
    double[] control = {2, 0.3, 1.5};
    DifferentiableNoiseDrivenMotion known = (DifferentiableNoiseDrivenMotion) whole;
    MotionFunctions.checkDerivatives(
        known, state, noise, control, 0.7, 1, 1, 1, 1, 1, 1, 1, 1, 1, 1);
    double[] covariance = new double[16];
    whole.noiseCovariance(control, 0, 0.5, covariance);
    double[] expected = {2, 0, 0, 0, 0, 4, 0, 0, 0, 0, 0.3, 0.05, 0, 0, 0.05, 0.06};
    assertArrayEquals(expected, covariance, 0);
    double[] next = new double[6];
    whole.move(state, noise, control, 0, 0.7, next);
    double[] second = new double[3];
    new Turns.Slip()
        .move(part(state, 3, 6), part(noise, 2, 4), part(control, 2, 3), 0, 0.7, second);
    assertArrayEquals(second, part(next, 3, 6), 0);
  }

  /** Two vehicles as one are two vehicles: moments are those of filters of their own. */
  @Test
  void aFilterCarriesNoiseDrivenBlocks() {
    PlanarVehicle vehicle = new PlanarVehicle(0.1, 0.01);
    FilterPlan whole = FilterPlan.extended(MotionBlocks.of(vehicle, vehicle));
    FilterPlan alone = FilterPlan.extended(vehicle);
    double[] mean = {1, 2, 0.4, -3, 5, 3.1};
    double[] deviations = {0.5, 0.6, 0.1, 0.7, 0.8, 0.2};
    Estimate both =
        whole.start(0, Gaussian.independent(vehicleSpace().and(vehicleSpace()), mean, deviations));
    Estimate second = alone.start(
        0, Gaussian.independent(vehicleSpace(), part(mean, 3, 6), part(deviations, 3, 6)));
    assertEquals(
        StepStatus.APPLIED, whole.workspace().predict(both, 2, new double[] {2, 0.1, 3, -0.2}));
    assertEquals(StepStatus.APPLIED, alone.workspace().predict(second, 2, new double[] {3, -0.2}));
    for (int i = 0; i < 3; i++) {
      assertEquals(second.mean(i), both.mean(3 + i), 1e-14);
      assertEquals(second.standardDeviation(i), both.standardDeviation(3 + i), 1e-14);
    }
  }

  private static Space vehicleSpace() {
    return Space.reals(2).and(Space.angles(1));
  }
}
