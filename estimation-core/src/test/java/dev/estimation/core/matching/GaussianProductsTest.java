package dev.estimation.core.matching;

import static dev.estimation.testing.Agreement.assertMatrix;
import static dev.estimation.testing.Agreement.assertRelative;
import static dev.estimation.testing.Agreement.assertVector;
import static dev.estimation.testing.Agreement.assertWithin;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import dev.estimation.testing.RandomGaussians;
import dev.estimation.testing.ReferenceTable;
import java.util.stream.Stream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Products of a correlated pair and lognormal vectors, against closed forms. */
class GaussianProductsTest {
  private static final VectorFunction PRODUCT = (u, given, z) -> z[0] = u[0] * u[1];

  static Stream<ReferenceTable.Row> products() {
    return ReferenceTable.read("gaussian_products.csv").stream();
  }

  private static Gaussian pair(ReferenceTable.Row row) {
    double sx = row.number("sx");
    double sy = row.number("sy");
    double c = row.number("rho") * sx * sy;
    return Gaussian.of(new double[] {row.number("mx"), row.number("my")}, new double[][] {
      {sx * sx, c}, {c, sy * sy}
    });
  }

  private static Outcome carry(String name, Gaussian input, VectorFunction function, int outputs) {
    MatchingWorkspace work = NamedMatchings.of(name)
        .workspace(Space.reals(input.dimension()), Space.reals(outputs), function);
    return Outcome.of(work, RandomGaussians.momentsOf(input));
  }

  /**
   * Degree 2, its square degree 4: three nodes suffice. Rounding of a dozen numbers of size 1 to 4.
   */
  @ParameterizedTest
  @MethodSource("products")
  void productsAreExactWithThreeNodes(ReferenceTable.Row row) {
    for (String name : new String[] {"Gauss-Hermite 3", "Gauss-Hermite 5", "Gauss-Hermite 8"}) {
      Outcome got = carry(name, pair(row), PRODUCT, 1);
      assertWithin("mean", row.number("mean"), got.mean[0], 1e-14, 4);
      assertWithin("variance", row.number("variance"), got.covariance.get(0, 0), 1e-14, 4);
      DMatrixRMaj cross = got.cross();
      assertWithin("covariance", row.number("covariance_x"), cross.get(0, 0), 1e-14, 4);
      assertWithin("covariance", row.number("covariance_y"), cross.get(1, 0), 1e-14, 4);
    }
  }

  /** Degree 3 suffices for the mean and, as x times it has degree 3, for the covariance with x. */
  @ParameterizedTest
  @MethodSource("products")
  void theMeanOfAProductIsExactToDegreeThree(ReferenceTable.Row row) {
    for (String name :
        new String[] {"cubature 3", "unscented 1 2 0", "unscented 0.5 2 0", "unscented 1 0 3-n"}) {
      Outcome got = carry(name, pair(row), PRODUCT, 1);
      assertWithin("mean", row.number("mean"), got.mean[0], 1e-14, 4);
      assertWithin("covariance", row.number("covariance_x"), got.cross().get(0, 0), 1e-14, 4);
      assertWithin("covariance", row.number("covariance_y"), got.cross().get(1, 0), 1e-14, 4);
    }
  }

  static Stream<ReferenceTable.Row> lognormal() {
    return ReferenceTable.read("gaussian_lognormal.csv").stream();
  }

  /**
   * Truncation, relative, is s^2p p! / (2 p)! for the mean and (4 s^2)^p p! / (2 p)! for its
   * square: at 10 nodes and s^2 = 0.2 that is 2e-19 and 2e-13. So 1e-14 for means, 1e-12 for
   * covariances.
   */
  @ParameterizedTest
  @MethodSource
  void lognormal(ReferenceTable.Row row) {
    double[] p = row.numbers("p");
    Gaussian input = Gaussian.of(row.numbers("m"), DMatrixRMaj.wrap(2, 2, p));
    VectorFunction exponential = (u, given, z) -> {
      z[0] = Math.exp(u[0]);
      z[1] = Math.exp(u[1]);
    };
    DMatrixRMaj wanted = DMatrixRMaj.wrap(2, 2, row.numbers("covariance"));
    for (int nodes : new int[] {10, 15, 25}) {
      Outcome got = carry("Gauss-Hermite " + nodes, input, exponential, 2);
      assertVector("mean", row.numbers("mean"), got.mean, 1e-14, 1);
      assertMatrix("covariance", wanted, got.covariance, 1e-12, 1);
      // Stein's lemma: the covariance of x_i and f_j is P_ij E f_j.
      double cross = p[1] * row.numbers("mean")[1];
      assertRelative("cross-covariance", cross, got.cross().get(0, 1), 1e-12);
    }
  }
}
