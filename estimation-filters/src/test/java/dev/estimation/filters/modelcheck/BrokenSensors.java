package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.SensorModel;
import java.util.SplittableRandom;

/** The sight of a buoy, each time with one fault. */
final class BrokenSensors {
  private BrokenSensors() {}

  /** The sign of one entry. */
  static class WrongSlope extends CleanModels.BuoySight {
    @Override
    public void measureJacobian(double[] x, double[] buoy, double[] jacobian) {
      super.measureJacobian(x, buoy, jacobian);
      jacobian[4] = -jacobian[4];
    }
  }

  /** One entry of the Hessian left out. */
  static class WrongBend extends CleanModels.BuoySight {
    @Override
    public void measureHessian(double[] x, double[] buoy, double[] hessians) {
      super.measureHessian(x, buoy, hessians);
      hessians[12] = 0;
    }
  }

  /** Forgets the heading, which the bearing reads. */
  static class ForgottenInput extends CleanModels.BuoySight {
    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1);
    }
  }

  /** Names an input that is none. */
  static class ImpossibleInput extends CleanModels.BuoySight {
    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1, 3);
    }
  }

  /** A range is not linear in the place. */
  static class NotLinear extends CleanModels.BuoySight {
    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withLinearInputs(1, 2);
    }
  }

  /** Bilinear: linear in each of two inputs, not in both. */
  static class Area extends Plain {
    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1).withLinearInputs(0, 1);
    }

    @Override
    public void measure(double[] x, double[] given, double[] z) {
      z[0] = (x[0] + 300) * (x[1] + 300);
    }
  }

  /** The bearing among the reals. */
  static class BearingAsReal extends CleanModels.BuoySight {
    @Override
    public Space measurementSpace() {
      return Space.reals(2);
    }

    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      super.measure(x, buoy, z);
      z[1] = Math.IEEEremainder(z[1], 2 * Math.PI);
    }
  }

  /** What it measures is proportional to the heading. */
  static class ProportionalToHeading extends CleanModels.BuoySight {
    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      super.measure(x, buoy, z);
      z[0] += 0.5 * x[2];
    }

    @Override
    public void measureJacobian(double[] x, double[] buoy, double[] jacobian) {
      super.measureJacobian(x, buoy, jacobian);
      jacobian[2] = 0.5;
    }
  }

  /** Noise written above the diagonal only. */
  static class HalfNoise extends CleanModels.BuoySight {
    @Override
    public void measurementNoise(double[] x, double[] buoy, double[] r) {
      super.measurementNoise(x, buoy, r);
      r[1] = 0.01;
    }
  }

  /** Standard deviations and a correlation above 1. */
  static class Overcorrelated extends CleanModels.BuoySight {
    @Override
    public void measurementNoise(double[] x, double[] buoy, double[] r) {
      super.measurementNoise(x, buoy, r);
      r[1] = 0.021;
      r[2] = 0.021;
    }
  }

  /** A component without noise. */
  static class Noiseless extends CleanModels.BuoySight {
    @Override
    public void measurementNoise(double[] x, double[] buoy, double[] r) {
      r[0] = 4;
    }
  }

  /** Turns the heading in the array that it was given. */
  static class WritesOnState extends CleanModels.BuoySight {
    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      x[2] = Math.IEEEremainder(x[2] - 1, 2 * Math.PI);
      x[2] += 1;
      super.measure(x, buoy, z);
    }
  }

  /** Moves the buoy. */
  static class WritesOnGiven extends CleanModels.BuoySight {
    @Override
    public void measurementNoise(double[] x, double[] buoy, double[] r) {
      buoy[0] -= x[0];
      super.measurementNoise(x, buoy, r);
    }
  }

  /** Leaves out the bearing. */
  static class Unfilled extends CleanModels.BuoySight {
    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      z[0] = Math.hypot(buoy[0] - x[0], buoy[1] - x[1]);
    }
  }

  /** Adds to what is not there yet. */
  static class AddsToNothing extends CleanModels.BuoySight {
    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      z[0] = Math.hypot(buoy[0] - x[0], buoy[1] - x[1]);
      z[1] -= x[2];
    }
  }

  /** Writes a third component. */
  static class TooLong extends CleanModels.BuoySight {
    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      super.measure(x, buoy, z);
      z[2] = 0;
    }
  }

  /** Refuses a part of the region. */
  static class Refuses extends CleanModels.BuoySight {
    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      if (x[0] > 150) {
        throw new IllegalStateException("no sight east of 150 m");
      }
      super.measure(x, buoy, z);
    }
  }

  /** The square root of what may be negative. */
  static class RootOfNegative extends CleanModels.BuoySight {
    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      super.measure(x, buoy, z);
      z[0] += 0 * Math.sqrt(190 - x[1]);
    }
  }

  /** Adds noise by itself. */
  static class Simulates extends CleanModels.BuoySight {
    private final SplittableRandom random = new SplittableRandom(1);

    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      super.measure(x, buoy, z);
      z[0] += random.nextDouble();
    }
  }

  /** Takes the same array for the same state. */
  static class KnowsTheArray extends CleanModels.BuoySight {
    private double[] last;
    private double range;

    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      super.measure(x, buoy, z);
      if (x != last) {
        range = z[0];
        last = x;
      }
      z[0] = range;
    }
  }

  /** The noise is that of the range measured last. */
  static class NoiseOfLastRange extends CleanModels.BuoySight {
    private double range;

    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      super.measure(x, buoy, z);
      range = z[0];
    }

    @Override
    public void measurementNoise(double[] x, double[] buoy, double[] r) {
      super.measurementNoise(x, buoy, r);
      r[0] += 1e-4 * range;
    }
  }

  /** Writes on the output of the call before. */
  static class WritesLater extends CleanModels.BuoySight {
    private double[] last = new double[2];

    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      super.measure(x, buoy, z);
      last[1] = z[1] + 1;
      super.measure(x, buoy, z);
      last = z;
    }
  }

  /** An array a call. */
  static class Allocates extends CleanModels.BuoySight {
    private double[] scratch = new double[2];

    @Override
    public void measure(double[] x, double[] buoy, double[] z) {
      scratch = new double[] {buoy[0] - x[0], buoy[1] - x[1]};
      z[0] = Math.hypot(scratch[0], scratch[1]);
      z[1] = Math.atan2(scratch[0], scratch[1]) - x[2];
    }
  }

  /** Depth of two inputs; the heading is not read, and not said to be. */
  static class Plain implements SensorModel {
    @Override
    public Space measurementSpace() {
      return Space.reals(1);
    }

    @Override
    public int givenDimension() {
      return 2;
    }

    @Override
    public Structure structure() {
      return Structure.UNKNOWN.withActiveInputs(0, 1);
    }

    @Override
    public void measure(double[] x, double[] given, double[] z) {
      z[0] = x[0] * x[0] + x[1];
    }

    @Override
    public void measurementNoise(double[] x, double[] given, double[] r) {
      r[0] = 1;
    }
  }

  /** All inputs active, the last unread. */
  static class Unread extends Plain {
    @Override
    public Structure structure() {
      return Structure.UNKNOWN;
    }
  }

  /** An input in the wrong unit. */
  static class WrongUnit extends Plain {
    @Override
    public void measure(double[] x, double[] given, double[] z) {
      z[0] = x[0] * x[0] + 1e-8 * x[1];
    }
  }

  /** A noise that no double can hold beside the value. */
  static class TinyNoise extends Plain {
    @Override
    public void measurementNoise(double[] x, double[] given, double[] r) {
      r[0] = 1e-36;
    }
  }
}
