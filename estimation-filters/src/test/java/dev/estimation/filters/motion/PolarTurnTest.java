package dev.estimation.filters.motion;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.testing.Flows;
import java.util.stream.DoubleStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class PolarTurnTest extends MotionContract {
  @Override
  DifferentiableMotion model() {
    return new PolarTurn(0.1, 2e-4);
  }

  /** With headings at the seam. */
  @Override
  double[][] states() {
    return DoubleStream.of(0, 1e-6, -4e-5, 2e-4, 0.018, -0.04, 0.3, -1.2)
        .mapToObj(rate -> new double[] {40, -30, 5, 3.1, rate})
        .toArray(double[][]::new);
  }

  @Override
  double[] scales() {
    return new double[] {100, 100, 3, 1, 0.1};
  }

  /** Two routes: the turn with Cartesian velocity. Held to roundings of 1000 m. */
  @ParameterizedTest
  @ValueSource(doubles = {0, 1e-7, -0.003, 0.2, -1.5})
  void drivesTheArcOfTheCartesianTurn(double rate) {
    double dt = 3;
    double[] polar =
        MotionFunctions.moved(model(), new double[] {1000, 500, 8, 0.6, rate}, control(), dt);
    double[] start = {1000, 500, 8 * Math.cos(0.6), 8 * Math.sin(0.6), rate};
    double[] turned = MotionFunctions.moved(new CoordinatedTurn(1, 1), start, control(), dt);
    assertArrayEquals(
        turned,
        new double[] {
          polar[0], polar[1], polar[2] * Math.cos(polar[3]), polar[2] * Math.sin(polar[3]), polar[4]
        },
        1e-12);
  }

  /**
   * On a straight course Q is exact: the moment equations of the same motion, integrated to 1e-12. Held to 1e-10 of
   * the deviations of both components.
   */
  @Test
  void noiseOnAStraightCourseIsThatOfTheMomentEquations() {
    DifferentiableMotion integrated =
        IntegratedMotion.of(new Flows.Polar(0.1, 2e-4), 1e-12, 1e-8, 1e-8, 1e-8, 1e-10, 1e-10);
    double[] state = {40, -30, 5, 2.2, 0};
    for (double dt : new double[] {0.01, 1, 30}) {
      double[] expected = MotionFunctions.noise(integrated, state, control(), dt);
      double[] noise = MotionFunctions.noise(model(), state, control(), dt);
      for (int i = 0; i < 25; i++) {
        double size = Math.sqrt(expected[i / 5 * 6] * expected[i % 5 * 6]);
        assertEquals(expected[i], noise[i], 1e-10 * size);
      }
    }
  }
}
