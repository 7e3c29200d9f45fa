package dev.estimation.filters.modelcheck;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.SensorModel;
import java.util.ArrayList;
import java.util.List;
import java.util.function.LongFunction;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;

/** Nothing is said of right models where rounding, singular places nearby or units make it tempting. */
class HardModelsTest {
  /** All seeds must pass, so one false alarm in twenty runs would show. */
  private static void nothingIsSaid(LongFunction<ModelReport> examine) {
    List<Executable> seeds = new ArrayList<>();
    for (long seed = 1; seed <= 20; seed++) {
      ModelReport report = examine.apply(seed);
      seeds.add(() -> assertEquals(List.of(), report.findings(), report::toString));
    }
    assertAll(seeds);
  }

  private static void nothingIsSaid(Region region, SensorModel model) {
    nothingIsSaid(seed -> ModelCheck.over(region).withSeed(seed).examine(model));
  }

  /** One output of two inputs, with its slopes. */
  private abstract static class Flat implements DifferentiableSensor {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measurementNoise(double[] x, double[] given, double[] r) {
      r[0] = 1e-6;
    }
  }

  private static final Region SLOW = Region.between(
          Space.reals(3), new double[] {-1e4, 10, 2e-6}, new double[] {1e4, 50, 2e-5})
      .withSteps(1, 1);

  /** A turn that loses up to eleven digits of 1 - cos, at a slow rate. */
  private static class SlowTurn implements DifferentiableMotion {
    @Override
    public Space stateSpace() {
      return Space.reals(3);
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withLinearInputs(0, 1);
    }

    @Override
    public void move(double[] x, double[] control, double t, double dt, double[] next) {
      next[0] = x[0] + (1 - Math.cos(x[2] * dt)) / x[2] * x[1];
      next[1] = x[1];
      next[2] = x[2];
    }

    @Override
    public void moveJacobian(double[] x, double[] control, double t, double dt, double[] f) {
      double half = Math.sin(x[2] * dt / 2);
      f[0] = 1;
      f[1] = 2 * half * half / x[2];
      f[2] = x[1] * (dt * Math.sin(x[2] * dt) / x[2] - 2 * half * half / (x[2] * x[2]));
      f[4] = 1;
      f[8] = 1;
    }

    @Override
    public void processNoise(double[] x, double[] control, double t, double dt, double[] q) {
      q[4] = dt;
      q[8] = 1e-6 * dt;
    }
  }

  @Test
  void aTurnDividedByItsRate() {
    nothingIsSaid(seed -> ModelCheck.over(SLOW).withSeed(seed).examine(new SlowTurn()));
  }

  /** Differences are doubtful in this model, but not as much as that. */
  @Test
  void aWrongSignInTheTurnDividedByItsRateIsFound() {
    ModelReport report = ModelCheck.over(SLOW).examine(new SlowTurn() {
      @Override
      public void moveJacobian(double[] x, double[] control, double t, double dt, double[] f) {
        super.moveJacobian(x, control, t, dt, f);
        f[2] = -f[2];
      }
    });
    assertTrue(report.toString().contains("jacobian[0][2] must be"), report::toString);
    assertEquals(1, report.findings().size(), report::toString);
  }

  @Test
  void aBearingTwoMetresFromItsOwnSensor() {
    Region region = Region.between(
            CleanModelsTest.POSE, new double[] {-200, -100, -1}, new double[] {-2, 100, 1})
        .withGiven(new double[2], new double[2]);
    nothingIsSaid(region, new CleanModels.BuoySight());
  }

  /** Beyond the region it throws, and at its edge the slope is infinite in the limit. */
  @Test
  void aRefusalJustOutside() {
    nothingIsSaid(
        Region.between(Space.reals(2), new double[] {0.001, -1}, new double[] {4, 1}), new Flat() {
          @Override
          public void measure(double[] x, double[] given, double[] z) {
            if (x[0] < 0) {
              throw new IllegalArgumentException("negative depth " + x[0]);
            }
            z[0] = Math.sqrt(x[0]) + x[1];
          }

          @Override
          public void measureJacobian(double[] x, double[] given, double[] jacobian) {
            jacobian[0] = 0.5 / Math.sqrt(x[0]);
            jacobian[1] = 1;
          }
        });
  }

  /** 3000 rad over a half-width. */
  private static class RapidWave extends Flat {
    private static final Region REGION = Region.around(Space.reals(2), new double[] {1, 5}, 10, 1);

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withLinearInputs(1);
    }

    @Override
    public void measure(double[] x, double[] given, double[] z) {
      z[0] = 1e-3 * Math.sin(300 * x[0]) * x[1];
    }

    @Override
    public void measureJacobian(double[] x, double[] given, double[] jacobian) {
      jacobian[0] = 0.3 * Math.cos(300 * x[0]) * x[1];
      jacobian[1] = 1e-3 * Math.sin(300 * x[0]);
    }
  }

  @Test
  void aRapidWave() {
    nothingIsSaid(RapidWave.REGION, new RapidWave());
  }

  @Test
  void aThousandthOfTheSlopeOfARapidWaveIsFound() {
    ModelReport report = ModelCheck.over(RapidWave.REGION).examine(new RapidWave() {
      @Override
      public void measureJacobian(double[] x, double[] given, double[] jacobian) {
        super.measureJacobian(x, given, jacobian);
        jacobian[0] *= 1.001;
      }
    });
    assertTrue(report.toString().contains("jacobian[0][0] must be"), report::toString);
    assertEquals(1, report.findings().size(), report::toString);
  }

  /** A fold of which the slope jumps at 0.3, away from the places. */
  @Test
  void aKinkInside() {
    nothingIsSaid(Region.around(Space.reals(2), new double[] {0, 0}, 1, 1), new Flat() {
      @Override
      public void measure(double[] x, double[] given, double[] z) {
        z[0] = Math.max(0, x[0] - 0.3) + x[1];
      }

      @Override
      public void measureJacobian(double[] x, double[] given, double[] jacobian) {
        jacobian[0] = x[0] > 0.3 ? 1 : 0;
        jacobian[1] = 1;
      }
    });
  }

  /** An angle that turns 40 times over the region is told as an angle. */
  @Test
  void aPhaseOfManyTurns() {
    Flat phase = new Flat() {
      @Override
      public Space measurementSpace() {
        return Space.angles(1);
      }

      @Override
      public Structure structure() {
        return Structure.UNKNOWN.withLinearInputs(0, 1);
      }

      @Override
      public void measure(double[] x, double[] given, double[] z) {
        z[0] = Math.IEEEremainder(2 * Math.PI * (40 * x[0] + x[1]), 2 * Math.PI);
      }

      @Override
      public void measureJacobian(double[] x, double[] given, double[] jacobian) {
        jacobian[0] = 80 * Math.PI;
        jacobian[1] = 2 * Math.PI;
      }
    };
    nothingIsSaid(Region.around(Space.reals(2), new double[] {0.2, 0}, 0.5, 0.5), phase);
  }

  /** Steps in a chart, 1 m high: no seam, though they jump. */
  @Test
  void aStaircase() {
    nothingIsSaid(Region.around(Space.reals(2), new double[] {0.3, 0}, 5, 1), new CleanStairs());
  }

  private static final class CleanStairs implements SensorModel {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public void measure(double[] x, double[] given, double[] z) {
      z[0] = 7 * Math.floor(x[0]) + x[1];
    }

    @Override
    public void measurementNoise(double[] x, double[] given, double[] r) {
      r[0] = 1;
    }
  }
}
