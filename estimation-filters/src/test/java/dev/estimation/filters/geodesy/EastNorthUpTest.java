package dev.estimation.filters.geodesy;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class EastNorthUpTest {
  static Stream<ReferenceTable.Row> rows() {
    return ReferenceTable.read("wgs84_enu.csv").stream();
  }

  private static double[] geodetic(ReferenceTable.Row row, String prefix) {
    return new double[] {
      Math.toRadians(row.number(prefix + "lat_deg")),
      Math.toRadians(row.number(prefix + "lon_deg")),
      row.number(prefix + "h")
    };
  }

  /** 1e-8 m: ten roundings of the Earth's radius, from degrees, both places and the axes. */
  @ParameterizedTest
  @MethodSource("rows")
  void agreesWithReferences(ReferenceTable.Row row) {
    EastNorthUp axes = EastNorthUp.at(geodetic(row, "origin_"));
    double[] place = new double[3];
    Wgs84.toEarthFixed(geodetic(row, ""), place);
    double[] local = new double[3];
    axes.toLocal(place, local);
    double[] wanted = {row.number("E_m"), row.number("N_m"), row.number("U_m")};
    assertArrayEquals(wanted, local, 1e-8);
    double[] back = new double[3];
    axes.toEarthFixed(wanted, back);
    assertArrayEquals(place, back, 1e-8);
  }

  /** The worked example of EPSG Guidance Note 7-2, methods 9836 and 9837, as printed: half a millimetre. */
  @Test
  void workedExampleOfTheGuidanceNote() {
    EastNorthUp axes = EastNorthUp.at(new double[] {Math.toRadians(55), Math.toRadians(5), 200});
    double[] local = new double[3];
    axes.toLocal(new double[] {3771793.968, 140253.342, 5124304.349}, local);
    // The place is printed to 1 mm too.
    assertArrayEquals(new double[] {-189013.869, -128642.040, -4220.171}, local, 1e-3);
    double[] origin = new double[3];
    axes.toEarthFixed(new double[3], origin);
    assertArrayEquals(new double[] {3652755.3058, 319574.6799, 5201547.3536}, origin, 6e-5);
  }

  /** At longitude 0 on the equator: east is y, north is z, up is x; over the pole, from longitude 0: east is y, north is -x, up is z. */
  @Test
  void axesPointWhereTheyShould() {
    EastNorthUp equator = EastNorthUp.at(new double[] {0, 0, 0});
    double[] local = new double[3];
    equator.vectorToLocal(new double[] {1, 2, 3}, local);
    assertArrayEquals(new double[] {2, 3, 1}, local, 0);
    EastNorthUp pole = EastNorthUp.at(new double[] {Math.PI / 2, 0, 0});
    pole.vectorToLocal(new double[] {1, 2, 3}, local);
    assertArrayEquals(new double[] {2, -1, 3}, local, 1e-15); // cos(pi/2) is 6e-17 in doubles
  }

  /** A turn and back: some roundings of numbers to 10. */
  @Test
  void vectorsComeBackAndKeepTheirLength() {
    EastNorthUp axes = EastNorthUp.at(new double[] {-0.6, 2.6, 58});
    double[] vector = {3, -4, 12};
    axes.vectorToEarthFixed(vector, vector);
    assertArrayEquals(
        new double[] {13},
        new double[] {
          Math.sqrt(vector[0] * vector[0] + vector[1] * vector[1] + vector[2] * vector[2])
        },
        1e-14);
    axes.vectorToLocal(vector, vector);
    assertArrayEquals(new double[] {3, -4, 12}, vector, 1e-14);
  }

  @ParameterizedTest
  @ValueSource(doubles = {55, -1.6, Double.NaN})
  void originsInDegreesAreRefused(double latitude) {
    IllegalArgumentException error = assertThrows(
        IllegalArgumentException.class, () -> EastNorthUp.at(new double[] {latitude, 0, 0}));
    assertNames(error.getMessage(), "origin", "got " + latitude);
  }

  @Test
  void whatIsNoNumberStaysSo() {
    double[] local = new double[3];
    EastNorthUp.at(new double[3]).toLocal(new double[] {Double.NaN, Double.NaN, Double.NaN}, local);
    assertArrayEquals(new double[] {Double.NaN, Double.NaN, Double.NaN}, local, 0);
  }
}
