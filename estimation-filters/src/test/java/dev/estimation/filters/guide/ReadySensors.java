package dev.estimation.filters.guide;

import static dev.estimation.filters.modelcheck.FindingKind.UNEQUAL_SCALES;

import dev.estimation.core.space.Space;
import dev.estimation.filters.modelcheck.Region;
import dev.estimation.filters.sensor.Bearing;
import dev.estimation.filters.sensor.Components;
import dev.estimation.filters.sensor.Heading;
import dev.estimation.filters.sensor.KnownVector;
import dev.estimation.filters.sensor.Position;
import dev.estimation.filters.sensor.Pseudorange;
import dev.estimation.filters.sensor.PseudorangeRate;
import dev.estimation.filters.sensor.Range;
import dev.estimation.filters.sensor.RangeAndBearing;
import dev.estimation.filters.sensor.RangeAzimuthElevation;
import dev.estimation.filters.sensor.RangeDifference;
import dev.estimation.filters.sensor.RangeRate;
import dev.estimation.filters.sensor.Sight;
import dev.estimation.filters.sensor.SpeedAndCourse;
import java.util.List;

/**
 * All ready sensors, over the places where each is used and those where it is hard: in a small state, in one with an attitude
 * before and a clock behind, far away, at the seam of an angle.
 */
final class ReadySensors {
  /** x, y (m), their rates (m/s), heading. */
  private static final Space PLANE = Space.reals(4).and(Space.angles(1));

  private static final Components PLACE = Components.of(0, 1);
  private static final Components VELOCITY = Components.of(2, 3);
  private static final Components HEADING = Components.of(4);
  private static final Sight FROM = Sight.fromGiven(PLACE);
  private static final Sight TO = Sight.toGiven(PLACE);

  /** Attitude, gyroscope bias, place, velocity, clock: {@link ReadyMotions#navigation()}. */
  private static final Space NAVIGATION = ReadyMotions.navigation();

  private static final Components ATTITUDE = Components.of(0, 1, 2, 3);
  private static final Components PLACE_BEHIND = Components.of(7, 8, 9).behindQuaternions(1);
  private static final Components PLANE_BEHIND = Components.of(8, 7).behindQuaternions(1);
  private static final Components VELOCITY_BEHIND = Components.of(10, 11, 12).behindQuaternions(1);
  private static final Components CLOCK = Components.of(13).behindQuaternions(1);
  private static final Components DRIFT = Components.of(14).behindQuaternions(1);
  private static final String BEHIND = "behind an attitude";

  private ReadySensors() {}

  static List<ReadyModel> all() {
    return List.of(
        position(),
        range(),
        bearing(),
        rangeAndBearing(),
        rangeAzimuthElevation(),
        rangeRate(),
        rangeDifference(),
        pseudorange(),
        pseudorangeOfGivenDeviation(),
        pseudorangeRate(),
        knownVector(),
        heading(),
        speedAndCourse());
  }

  /** Within 100 m of a place, with any heading. */
  private static Region plane(double x, double y) {
    double[] centre = {x, y, 3, -4, Math.PI};
    return Region.around(PLANE, centre, 100, 100, 20, 20, Math.PI);
  }

  /** Within 100 m of a place on the x axis. */
  private static Region navigation(double x) {
    double[] centre = {0.5, -0.5, 0.5, 0.5, 0, 0, 0, x, 0, 0, 0, 0, 0, 0, 0};
    double[] widths = {1, 1, 1, 0.01, 0.01, 0.01, 100, 100, 100, 30, 30, 30, 1e5, 100};
    return Region.around(NAVIGATION, centre, widths);
  }

  private static double[] numbers(double... numbers) {
    return numbers;
  }

  private static ReadyModel position() {
    return new ReadyModel("Position")
        .over("near", new Position(PLACE, 5, 5), PLANE, plane(0, 0))
        .over("1e7 m off", new Position(PLACE, 5, 5), PLANE, plane(1e7, -2e7))
        .over(BEHIND, new Position(PLACE_BEHIND, 5, 5, 9), NAVIGATION, navigation(0));
  }

  private static ReadyModel range() {
    Range range = new Range(FROM, 2);
    return new ReadyModel("Range")
        .over("300 m off", range, PLANE, east(plane(0, 0), 300))
        .over("5 m off", range, PLANE, east(plane(0, 0), 105))
        .over("2e7 m off", range, PLANE, east(plane(0, 0), 2e7))
        .over("at a known height", new Range(TO.atHeight(3), 2), PLANE, beacon(plane(0, 0)))
        .over(BEHIND, new Range(Sight.toGiven(PLACE_BEHIND), 2), NAVIGATION, beacon(navigation(0)));
  }

  /** Given a place far enough in the east of the region's centre, at the origin. */
  private static Region east(Region region, double distance) {
    return region.withGiven(numbers(distance, -50), numbers(distance + 50, 50));
  }

  /** Given a place in space, above all of the region. */
  private static Region beacon(Region region) {
    return region.withGiven(numbers(-50, -50, 120), numbers(50, 50, 400));
  }

  private static ReadyModel bearing() {
    Bearing bearing = new Bearing(TO.relativeTo(HEADING), 0.01);
    Bearing own = new Bearing(FROM.relativeToGivenHeading(), 0.01);
    return new ReadyModel("Bearing relative to the heading")
        .over("300 m off", bearing, PLANE, east(plane(0, 0), 300))
        .over("direction at pi", bearing, PLANE, east(plane(0, 0), -300))
        .over("5 m off", bearing, PLANE, east(plane(0, 0), 105))
        .over("2e7 m off", bearing, PLANE, east(plane(0, 0), 2e7))
        .over("from a given pose", own, PLANE, pose(plane(0, 0)))
        .over(BEHIND, new Bearing(Sight.toGiven(PLANE_BEHIND), 0.01), NAVIGATION, north())
        .finding(UNEQUAL_SCALES, "hint at 2e7 m: 100 m along the sight move no bearing");
  }

  private static Region pose(Region region) {
    return region.withGiven(numbers(-500, -500, -4), numbers(500, -150, 4));
  }

  /** Given a place (north, east) seen from components named so. */
  private static Region north() {
    return navigation(0).withGiven(numbers(150, -50), numbers(200, 50));
  }

  private static ReadyModel rangeAndBearing() {
    RangeAndBearing landmark = new RangeAndBearing(TO.relativeTo(HEADING), 0.3, 0.01);
    RangeAndBearing radar = new RangeAndBearing(FROM.relativeToGivenHeading(), 20, 0.01);
    RangeAndBearing behind = new RangeAndBearing(Sight.fromGiven(PLANE_BEHIND), 20, 0.01);
    return new ReadyModel("RangeAndBearing relative to the heading")
        .over("300 m off", landmark, PLANE, east(plane(0, 0), 300))
        .over("direction at pi", landmark, PLANE, east(plane(0, 0), -300))
        .over("2e7 m off", landmark, PLANE, east(plane(0, 0), 2e7))
        .over("from a given pose", radar, PLANE, pose(plane(0, 0)))
        .over(BEHIND, behind, NAVIGATION, north());
  }

  private static ReadyModel rangeAzimuthElevation() {
    RangeAzimuthElevation radar =
        new RangeAzimuthElevation(Sight.fromGiven(PLACE_BEHIND), 20, 0.01, 0.01);
    RangeAzimuthElevation flat =
        new RangeAzimuthElevation(TO.atHeight(3).relativeTo(HEADING), 20, 0.01, 0.01);
    Region overhead = navigation(0).withGiven(numbers(101, 101, -900), numbers(110, 110, -800));
    return new ReadyModel("RangeAzimuthElevation")
        .over("2 km off", radar, NAVIGATION, space(2e3))
        .over("azimuth at pi", radar, NAVIGATION, space(-2e3))
        .over("2e7 m off", radar, NAVIGATION, space(2e7))
        .over("nearly overhead", radar, NAVIGATION, overhead)
        .over("at a known height, relative to the heading", flat, PLANE, mast());
  }

  /** Given a place in space so far from the origin that the state lies that far along x. */
  private static Region space(double distance) {
    return navigation(0).withGiven(numbers(-distance, -50, -50), numbers(50 - distance, 50, 50));
  }

  private static Region mast() {
    return plane(0, 0).withGiven(numbers(150, -50, -20), numbers(400, 50, 40));
  }

  private static ReadyModel rangeRate() {
    RangeRate behind = new RangeRate(Sight.fromGiven(PLACE_BEHIND), VELOCITY_BEHIND, 0.1);
    RangeRate flat = new RangeRate(FROM.atHeight(3), VELOCITY, 0.1);
    return new ReadyModel("RangeRate")
        .over(
            "300 m off",
            new RangeRate(FROM, VELOCITY, 0.1),
            PLANE,
            plane(0, 0).withGiven(numbers(150, -50, -9, -9), numbers(400, 50, 9, 9)))
        .over("at a known height", flat, PLANE, moving(plane(0, 0), 400))
        .over("2e7 m off", behind, NAVIGATION, moving(navigation(0), 2e7))
        .over(BEHIND, behind, NAVIGATION, moving(navigation(0), 400))
        .finding(UNEQUAL_SCALES, "hint at 2e7 m: 100 m along the sight change no range rate");
  }

  /** Given a place in space along x, and a velocity. */
  private static Region moving(Region region, double distance) {
    return region.withGiven(
        numbers(distance - 200, -50, -50, -9, -9, -9), numbers(distance, 50, 50, 9, 9, 9));
  }

  private static ReadyModel rangeDifference() {
    RangeDifference plane = new RangeDifference(FROM, 3);
    RangeDifference behind = new RangeDifference(Sight.fromGiven(PLACE_BEHIND), 3);
    double[] low = {150, -50, -50, -400, -50, -50};
    double[] high = {400, 50, 50, -150, 50, 50};
    return new ReadyModel("RangeDifference")
        .over(
            "between both",
            plane,
            PLANE,
            plane(0, 0).withGiven(numbers(150, -50, -400, -50), numbers(400, 50, -150, 50)))
        .over(
            "both 2e7 m off",
            plane,
            PLANE,
            plane(0, 0).withGiven(numbers(2e7, 0, 2e7, 5e6), numbers(2.1e7, 4e6, 2.1e7, 9e6)))
        .over(BEHIND, behind, NAVIGATION, navigation(0).withGiven(low, high));
  }

  /** Given a satellite's place. */
  private static Region satellite() {
    return navigation(6.4e6).withGiven(numbers(2e7, -1.5e7, -1e7), numbers(2.6e7, 1.5e7, 1e7));
  }

  private static ReadyModel pseudorange() {
    Pseudorange satellite = new Pseudorange(Sight.fromGiven(PLACE_BEHIND), CLOCK, 5);
    return new ReadyModel("Pseudorange")
        .over("2e7 m off", satellite, NAVIGATION, satellite())
        .over("pseudolite at 300 m", satellite, NAVIGATION, beacon(navigation(0)));
  }

  private static ReadyModel pseudorangeOfGivenDeviation() {
    Pseudorange satellite = Pseudorange.ofGivenDeviation(Sight.fromGiven(PLACE_BEHIND), CLOCK);
    double[] low = {2e7, -1.5e7, -1e7, 1};
    double[] high = {2.6e7, 1.5e7, 1e7, 20};
    return new ReadyModel("Pseudorange.ofGivenDeviation")
        .over("2e7 m off", satellite, NAVIGATION, navigation(6.4e6).withGiven(low, high));
  }

  private static ReadyModel pseudorangeRate() {
    PseudorangeRate satellite =
        new PseudorangeRate(Sight.fromGiven(PLACE_BEHIND), VELOCITY_BEHIND, DRIFT, 0.1);
    double[] low = {2e7, -1.5e7, -1e7, -3e3, -3e3, -3e3};
    double[] high = {2.6e7, 1.5e7, 1e7, 3e3, 3e3, 3e3};
    return new ReadyModel("PseudorangeRate")
        .over("2e7 m off", satellite, NAVIGATION, navigation(6.4e6).withGiven(low, high))
        .over("pseudolite at 300 m", satellite, NAVIGATION, moving(navigation(0), 400));
  }

  private static ReadyModel knownVector() {
    KnownVector field = new KnownVector(ATTITUDE, 0.5);
    Space alone = Space.unitQuaternion();
    Space two = alone.and(Space.reals(2)).and(alone);
    KnownVector second = new KnownVector(Components.of(6, 7, 8, 9).behindQuaternions(1), 0.5);
    double[] turned = {0.5, -0.5, 0.5, 0.5};
    double[] both = {1, 0, 0, 0, 0, 0, 0.5, -0.5, 0.5, 0.5};
    return new ReadyModel("KnownVector")
        .over("alone, any attitude", field, alone, field(Region.around(alone, turned, 2, 2, 2)))
        .over("before the rest", field, NAVIGATION, field(navigation(0)))
        .over(
            "behind another attitude",
            second,
            two,
            field(Region.around(two, both, 1, 1, 1, 5, 5, 1, 1, 1)));
  }

  private static Region field(Region region) {
    return region.withGiven(numbers(-50, -50, -50), numbers(50, 50, 50));
  }

  private static ReadyModel heading() {
    return new ReadyModel("Heading")
        .over("all headings", new Heading(HEADING, 0.02), PLANE, plane(0, 0));
  }

  private static ReadyModel speedAndCourse() {
    SpeedAndCourse log = new SpeedAndCourse(VELOCITY, 0.2, 0.02);
    Region west = Region.around(PLANE, numbers(0, 0, -9, 0, 0), 1e3, 1e3, 5, 5, 1);
    Region slow = Region.around(PLANE, numbers(0, 0, 0.02, 0.02, 0), 1e3, 1e3, 0.01, 0.01, 1);
    return new ReadyModel("SpeedAndCourse")
        .over("course at pi", log, PLANE, west)
        .over("nearly at rest", log, PLANE, slow);
  }
}
