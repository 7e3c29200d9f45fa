package dev.estimation.filters.sensor;

/**
 * Where in Jacobians and Hessians the derivatives by the vector d of a sight and by its heading go. The derivative of d by the
 * position of the state is 1 or -1. Immutable.
 */
final class SightColumns {
  private static final int NONE = -1;

  private final double sign;
  private final int x;
  private final int y;
  private final int z;
  private final int heading;

  /** The heading is null if the state has none. */
  SightColumns(Components position, Components heading, double sign) {
    this.sign = sign;
    this.x = position.column(0);
    this.y = position.column(1);
    this.z = position.count() == 3 ? position.column(2) : NONE;
    this.heading = heading == null ? NONE : heading.column(0);
  }

  /** Fills a row of a Jacobian that begins at an index with the derivatives by d. */
  void fillRow(double[] jacobian, int start, double byX, double byY, double byZ) {
    jacobian[start + x] = sign * byX;
    jacobian[start + y] = sign * byY;
    if (z != NONE) {
      jacobian[start + z] = sign * byZ;
    }
  }

  /** Fills the derivative of a bearing by the heading, if that is in the state. */
  void fillHeading(double[] jacobian, int start) {
    if (heading != NONE) {
      jacobian[start + heading] = -1;
    }
  }

  /** Fills the Hessian of one component with the second derivatives by the first two coordinates of d. */
  void fillPlane(double[] hessians, int start, int columns, double byXx, double byXy, double byYy) {
    hessians[start + x * columns + x] = byXx;
    hessians[start + x * columns + y] = byXy;
    hessians[start + y * columns + x] = byXy;
    hessians[start + y * columns + y] = byYy;
  }

  /** Fills the Hessian of one component with the second derivatives by the third coordinate of d, if the state has it. */
  void fillThird(double[] hessians, int start, int columns, double byXz, double byYz, double byZz) {
    if (z != NONE) {
      hessians[start + x * columns + z] = byXz;
      hessians[start + z * columns + x] = byXz;
      hessians[start + y * columns + z] = byYz;
      hessians[start + z * columns + y] = byYz;
      hessians[start + z * columns + z] = byZz;
    }
  }
}
