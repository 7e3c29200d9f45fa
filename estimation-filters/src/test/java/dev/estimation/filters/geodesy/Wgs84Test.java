package dev.estimation.filters.geodesy;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.testing.AllocationMeter;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class Wgs84Test {
  private static final double RADIUS = Wgs84.SEMI_MAJOR_AXIS;

  static Stream<ReferenceTable.Row> points() {
    return ReferenceTable.read("wgs84_points.csv").stream();
  }

  private static double[] earthFixed(double latitude, double longitude, double height) {
    double[] place = new double[3];
    Wgs84.toEarthFixed(new double[] {latitude, longitude, height}, place);
    return place;
  }

  private static double[] geodetic(double... earthFixed) {
    double[] place = new double[3];
    Wgs84.toGeodetic(earthFixed, place);
    return place;
  }

  private static double[] geodetic(ReferenceTable.Row row) {
    return new double[] {
      Math.toRadians(row.number("lat_deg")),
      Math.toRadians(row.number("lon_deg")),
      row.number("h_m")
    };
  }

  private static double[] earthFixed(ReferenceTable.Row row) {
    return new double[] {row.number("X_m"), row.number("Y_m"), row.number("Z_m")};
  }

  /** Five roundings of the distance from the centre: some are in the degrees, sines and cosines. */
  private static double tolerance(double[] earthFixed) {
    return 5 * Math.ulp(Math.max(RADIUS, Math.abs(earthFixed[0]) + Math.abs(earthFixed[1])));
  }

  @ParameterizedTest
  @MethodSource("points")
  void earthFixedAgreesWithReferences(ReferenceTable.Row row) {
    double[] wanted = earthFixed(row);
    double[] geodetic = geodetic(row);
    assertArrayEquals(wanted, earthFixed(geodetic[0], geodetic[1], geodetic[2]), tolerance(wanted));
  }

  @ParameterizedTest
  @MethodSource("points")
  void geodeticAgreesWithReferences(ReferenceTable.Row row) {
    double[] wanted = geodetic(row);
    double[] got = geodetic(earthFixed(row));
    double tolerance = tolerance(earthFixed(row));
    assertEquals(wanted[0], got[0], tolerance / RADIUS);
    double turn = Math.IEEEremainder(wanted[1] - got[1], 2 * Math.PI); // 180 degrees are -pi here
    double cos = Math.cos(wanted[0]);
    if (cos > 1e-9) { // elsewhere at a pole, where any longitude is right
      assertEquals(0, turn * cos, tolerance / RADIUS);
    }
    assertEquals(wanted[2], got[2], tolerance);
  }

  /** The worked example of EPSG Guidance Note 7-2, method 9602, as printed: 1 mm, and 1e-3'' of arc are 3 cm. */
  @Test
  void workedExampleOfTheGuidanceNote() {
    double latitude = Math.toRadians(53 + 48 / 60.0 + 33.820 / 3600);
    double longitude = Math.toRadians(2 + 7 / 60.0 + 46.380 / 3600);
    double[] printed = {3771793.968, 140253.342, 5124304.349};
    assertArrayEquals(
        printed, earthFixed(latitude, longitude, 73.0), 6e-4); // half of the last digit printed
    double[] back = geodetic(printed);
    assertEquals(latitude, back[0], Math.toRadians(0.0005 / 3600));
    assertEquals(longitude, back[1], Math.toRadians(0.0005 / 3600));
    assertEquals(73.0, back[2], 1e-3);
    assertEquals(53.80939443996212, Math.toDegrees(back[0]), 2e-14); // two roundings
    assertEquals(2.129550001320768, Math.toDegrees(back[1]), 1e-15);
    assertEquals(72.99993067, back[2], 6e-9); // the digits that are known
  }

  /** Each direction in metres; 5 roundings of the distance from the centre. Latitudes in steps of 0.1 degree. */
  @ParameterizedTest
  @CsvSource({
    "-6e6, 5e-9",
    "-1e4, 5e-9",
    "0, 5e-9",
    "1e4, 5e-9",
    "4e5, 5e-9",
    "3e6, 1e-8",
    "2e7, 2e-8",
    "4e7, 2e-8"
  })
  void thereAndBack(double height, double tolerance) {
    for (int i = -900; i <= 900; i++) {
      double latitude = Math.toRadians(i / 10.0);
      double longitude = i * 3.4e-3;
      double[] back = geodetic(earthFixed(latitude, longitude, height));
      double distance = RADIUS + height;
      assertEquals(0, (back[0] - latitude) * distance, tolerance, "latitude " + i / 10.0);
      assertEquals(
          0, (back[1] - longitude) * distance * Math.cos(latitude), tolerance, "longitude");
      assertEquals(height, back[2], tolerance, "latitude " + i / 10.0);
    }
  }

  /** At a pole and within a nanometre of it. */
  @ParameterizedTest
  @ValueSource(doubles = {1, -1})
  void poles(double sign) {
    double polar = sign * (Wgs84.SEMI_MINOR_AXIS + 250);
    assertArrayEquals(new double[] {sign * Math.PI / 2, 0, 250}, geodetic(0, 0, polar), 0);
    assertArrayEquals(new double[] {sign * Math.PI / 2, 0, 250}, geodetic(-0.0, -0.0, polar), 0);
    double[] near = geodetic(0, -1e-9, polar);
    assertEquals(sign * Math.PI / 2, near[0], 3e-16);
    assertEquals(-Math.PI / 2, near[1], 0);
    assertEquals(250, near[2], 1e-9);
  }

  /** 180 degrees are -pi from either side; a nanometre to the east and west of it lies just inside. */
  @Test
  void antimeridian() {
    assertEquals(-Math.PI, geodetic(-7e6, 0, 1e5)[1], 0);
    assertEquals(-Math.PI, geodetic(-7e6, -0.0, 1e5)[1], 0);
    assertEquals(-Math.PI, geodetic(-7e6, Double.MIN_VALUE, 1e5)[1], 0);
    double west = geodetic(-7e6, 1e-2, 1e5)[1];
    assertTrue(west < Math.PI && west > 3.14159265);
    assertTrue(geodetic(-7e6, -1e-2, 1e5)[1] < -3.14159265);
  }

  @Test
  void equator() {
    assertArrayEquals(new double[] {0, 0, 0}, geodetic(RADIUS, 0, 0), 0);
    assertArrayEquals(new double[] {0, Math.PI / 2, -1e4}, geodetic(0, RADIUS - 1e4, 0), 0);
  }

  @ParameterizedTest
  @CsvSource({
    "0, 0, 0",
    "0, 0, 2e5",
    "1e5, -1e5, 0",
    "NaN, 7e6, 0",
    "7e6, NaN, 0",
    "7e6, 0, NaN",
    "Infinity, 0, 0",
    "7e6, 0, -Infinity"
  })
  void nearTheCentreAndForWhatIsNoNumberThereIsNoAnswer(double x, double y, double z) {
    assertArrayEquals(new double[] {Double.NaN, Double.NaN, Double.NaN}, geodetic(x, y, z), 0);
  }

  @Test
  void arraysMayBeTheSame() {
    double[] place = {0.7, -2.1, 350};
    double[] apart = earthFixed(place[0], place[1], place[2]);
    Wgs84.toEarthFixed(place, place);
    assertArrayEquals(apart, place, 0);
    Wgs84.toGeodetic(place, place);
    assertArrayEquals(geodetic(apart), place, 0);
  }

  @Test
  void allocatesNothing() {
    double[] geodetic = {0.7, -2.1, 350};
    double[] earthFixed = new double[3];
    EastNorthUp local = EastNorthUp.at(geodetic);
    assertEquals(0, AllocationMeter.bytesPerCall(100, 100, () -> {
      Wgs84.toEarthFixed(geodetic, earthFixed);
      local.toLocal(earthFixed, earthFixed);
      local.toEarthFixed(earthFixed, earthFixed);
      Wgs84.toGeodetic(earthFixed, geodetic);
    }));
  }

  @Test
  void wrongLengthsAreRefused() {
    IllegalArgumentException error = assertThrows(
        IllegalArgumentException.class, () -> Wgs84.toEarthFixed(new double[2], new double[3]));
    assertNames(error.getMessage(), "geodetic coordinates", "length 3", "got 2");
    error = assertThrows(
        IllegalArgumentException.class, () -> Wgs84.toGeodetic(new double[3], new double[4]));
    assertNames(error.getMessage(), "geodetic coordinates", "length 3", "got 4");
  }
}
