package dev.estimation.filters.sensor;

import dev.estimation.core.function.Structure;
import dev.estimation.core.internal.Checks;

/**
 * The line of sight of a sensor: from an observer to what is seen, one of them part of the state and the other given with
 * each measurement.
 *
 * <pre>
 * fromGiven   d = position - place    a target of the state seen from a given station: a radar, a satellite
 * toGiven     d = place - position    a given landmark seen from the platform that is the state: a robot, a ship
 * </pre>
 *
 * <p>In the plane or in space, by the number of components. What is given has one number for each axis, in the order of
 * the components (m): if these are (north, east), a place is given as north and east.
 *
 * <p>Bearings and azimuths are zero along the first axis and grow towards the second. They are reckoned from a
 * heading if the sight is relative to one, of the state or given; a heading is an angle of the same kind, so that direction =
 * relative bearing + heading. <i>Immutable.</i>
 */
public final class Sight {
  private static final int NONE = -1;

  private final Components position;
  private final double sign;
  private final Components heading;
  private final boolean headingGiven;
  private final int width;
  private final double height;
  private final int x;
  private final int y;
  private final int z;
  private final int headingIndex;
  private final SightColumns columns;

  private Sight(
      Components position,
      double sign,
      int width,
      double height,
      Components heading,
      boolean headingGiven) {
    this.position = position;
    this.sign = sign;
    this.heading = heading;
    this.headingGiven = headingGiven;
    this.width = width;
    this.height = height;
    boolean upward = position.count() == 3;
    this.x = position.index(0);
    this.y = position.index(1);
    this.z = upward ? position.index(2) : NONE;
    this.columns = new SightColumns(position, heading, sign);
    this.headingIndex = heading == null ? NONE : heading.index(0);
  }

  /**
   * {@return the sight from a given place to the position that is in the state}
   *
   * @param position 2 or 3 components (m)
   * @throws IllegalArgumentException if they are not
   */
  public static Sight fromGiven(Components position) {
    return sight(position, 1);
  }

  /**
   * {@return the sight from the position that is in the state to a given place}
   *
   * @param position 2 or 3 components (m)
   * @throws IllegalArgumentException if they are not
   */
  public static Sight toGiven(Components position) {
    return sight(position, -1);
  }

  private static Sight sight(Components position, double sign) {
    if (position.count() != 2 && position.count() != 3) {
      throw new IllegalArgumentException("a position must have 2 or 3 components, got " + position);
    }
    return new Sight(position, sign, position.count(), 0, null, false);
  }

  /**
   * This sight in space though the state knows a position in a plane alone, at a height that is known. Three numbers are
   * then given.
   *
   * @param thirdCoordinate of the position in the state (m), finite
   * @return a sight in space
   * @throws IllegalArgumentException if the position has 3 components
   */
  public Sight atHeight(double thirdCoordinate) {
    position.requireCount(2, "a position at a known height", "line of sight");
    Checks.finite("height", thirdCoordinate);
    return new Sight(position, sign, 3, thirdCoordinate, heading, headingGiven);
  }

  /**
   * {@return this sight with bearings reckoned from a heading that is in the state}
   *
   * @param headingOfState 1 component (rad); sensors are linear in it
   * @throws IllegalArgumentException if there are more
   */
  public Sight relativeTo(Components headingOfState) {
    headingOfState.requireCount(1, "a heading", "line of sight");
    return new Sight(position, sign, width, height, headingOfState, false);
  }

  /** {@return this sight with bearings reckoned from a heading (rad) that is given, behind the place} */
  public Sight relativeToGivenHeading() {
    return new Sight(position, sign, width, height, null, true);
  }

  /** Fails if there is a heading: a sensor without an angle has no use for it. */
  Sight requireNoHeading(String sensor) {
    if (heading != null || headingGiven) {
      throw new IllegalArgumentException(
          "a sight without a heading is wanted where no angle is measured, got one relative to "
              + (headingGiven ? "a given heading" : "heading " + heading) + " (sensor model "
              + sensor + ")");
    }
    return this;
  }

  Sight requireWidth(int wanted, String sensor) {
    if (width != wanted) {
      throw new IllegalArgumentException("a sight in " + wanted
          + " dimensions is wanted, got one in " + width + " (sensor model " + sensor + ")");
    }
    return this;
  }

  /** The same line for velocities: that of the state, and one that is given. */
  Sight ofVelocity(Components velocity, String sensor) {
    velocity.requireCount(position.count(), "a velocity", "sensor model " + sensor);
    return new Sight(velocity, sign, width, 0, null, false);
  }

  Components position() {
    return position;
  }

  /** The numbers of a place. */
  int width() {
    return width;
  }

  int givenDimension() {
    return headingGiven ? width + 1 : width;
  }

  /** Linear in a heading of the state, if the sensor reads nothing else. */
  Structure structure(String sensor) {
    int[] linear = heading == null ? new int[0] : heading.columns();
    return SensorSetUp.structure(position.columns(), linear, sensor);
  }

  /** Where derivatives by d and by the heading go. */
  SightColumns columns() {
    return columns;
  }

  /** The first coordinate of d, with the place beginning at an index of what is given. */
  double first(double[] state, double[] given, int at) {
    return sign * (state[x] - given[at]);
  }

  double second(double[] state, double[] given, int at) {
    return sign * (state[y] - given[at + 1]);
  }

  /** The third coordinate; 0 in the plane. */
  double third(double[] state, double[] given, int at) {
    if (width == 2) {
      return 0;
    }
    return sign * ((z == NONE ? height : state[z]) - given[at + 2]);
  }

  double distance(double[] state, double[] given, int at) {
    double dx = first(state, given, at);
    double dy = second(state, given, at);
    double dz = third(state, given, at);
    return Math.sqrt(dx * dx + dy * dy + dz * dz);
  }

  /** The angle of a direction from the heading; NaN if it has none. */
  double bearing(double[] state, double[] given, double dx, double dy) {
    if (dx == 0 && dy == 0) {
      return Double.NaN;
    }
    double direction = Math.atan2(dy, dx);
    if (headingIndex != NONE) {
      return direction - state[headingIndex];
    }
    return headingGiven ? direction - given[width] : direction;
  }
}
