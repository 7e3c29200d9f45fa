package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.filters.model.MotionModel;
import dev.estimation.filters.testing.Flows;
import java.util.List;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

/** What a model cannot be built with is refused, naming it and what was got. */
class MotionArgumentsTest {
  private static final double NAN = Double.NaN;
  private static final double INFINITE = Double.POSITIVE_INFINITY;

  static List<Arguments> refused() {
    return List.of(
        bad(() -> new RandomWalk(), "RandomWalk", "1 axis", "none"),
        bad(() -> new RandomWalk(1, -2), "RandomWalk", "[1]", "-2.0"),
        bad(() -> new ConstantVelocity(NAN), "ConstantVelocity", "[0]", "NaN"),
        bad(() -> new ConstantAcceleration(1, 1, INFINITE), "ConstantAcceleration", "Infinity"),
        bad(() -> new CorrelatedAcceleration(0, 1), "timeConstant", "> 0", "0.0"),
        bad(() -> new CorrelatedAcceleration(INFINITE, 1), "timeConstant", "Infinity"),
        bad(() -> new CorrelatedAcceleration(2), "CorrelatedAcceleration", "none"),
        bad(() -> CorrelatedAcceleration.ofDeviations(2, -1), "deviations[0]", "-1.0"),
        bad(() -> CorrelatedAcceleration.ofDeviations(NAN, 1), "timeConstant", "NaN"),
        bad(() -> new ReceiverClock(-1, 1), "phaseDensity", "-1.0"),
        bad(() -> new ReceiverClock(1, NAN), "frequencyDensity", "NaN"),
        bad(() -> new CoordinatedTurn(-1, 1), "CoordinatedTurn accelerationDensity", "-1.0"),
        bad(() -> new CoordinatedTurn(1, -3), "CoordinatedTurn turnDensity", "-3.0"),
        bad(() -> new PolarTurn(NAN, 1), "PolarTurn accelerationDensity", "NaN"),
        bad(() -> new PolarTurn(1, -3), "PolarTurn turnDensity", "-3.0"),
        bad(() -> new PlanarVehicle(-1, 0), "PlanarVehicle speedDensity", "-1.0"),
        bad(() -> new PlanarVehicle(0, NAN), "PlanarVehicle yawDensity", "NaN"),
        bad(() -> new GyroscopeAttitude(-1, 0), "angleDensity", "-1.0"),
        bad(() -> new GyroscopeAttitude(0, -1), "biasDensity", "-1.0"),
        bad(() -> new FallingBody(-1, 0, 0, 0), "FallingBody decay", "-1.0"),
        bad(() -> new FallingBody(0, NAN, 0, 0), "FallingBody gravity", "NaN"),
        bad(() -> new FallingBody(0, 0, -1, 0), "FallingBody accelerationDensity", "-1.0"),
        bad(() -> new FallingBody(0, 0, 0, -1), "FallingBody ballisticDensity", "-1.0"),
        bad(() -> MotionBlocks.of(new MotionModel[0]), "MotionBlocks", "1 block", "none"),
        bad(() -> IntegratedMotion.of(new Flows.Straight(1), 0, 1, 1), "relative", "0.0"),
        bad(() -> IntegratedMotion.of(new Flows.Straight(1), NAN, 1, 1), "relative", "NaN"),
        bad(() -> IntegratedMotion.of(new Flows.Straight(1), 1e-9, 1), "length 2", "1"),
        bad(() -> IntegratedMotion.of(new Flows.Straight(1), 1e-9, 1, 0), "[1]", "0.0"),
        bad(
            () -> IntegratedMotion.withDifferences(new Flows.Forced(), new double[] {-1}, 1e-9, 1),
            "scales[0]",
            "-1.0"));
  }

  private static Arguments bad(Executable construction, String... parts) {
    return Arguments.of(construction, parts);
  }

  @ParameterizedTest
  @MethodSource("refused")
  void isRefused(Executable construction, String[] parts) {
    String message = assertThrows(IllegalArgumentException.class, construction).getMessage();
    for (String part : parts) {
      assertTrue(message.contains(part), () -> part + " is not in: " + message);
    }
  }
}
