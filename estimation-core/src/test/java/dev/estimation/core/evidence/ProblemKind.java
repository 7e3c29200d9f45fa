package dev.estimation.core.evidence;

import dev.estimation.core.accuracy.OperatingPoint;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.Use;
import dev.estimation.core.space.Space;
import java.util.function.DoubleUnaryOperator;
import java.util.function.Function;
import org.ejml.data.DMatrixRMaj;

/** Kinds of random problems; what is random in each is told by its lines. */
enum ProblemKind {
  POLAR("polar to Cartesian", 500, ProblemKind::polar),
  SPHERICAL("spherical to Cartesian", 500, ProblemKind::spherical),
  TURN("coordinated turn", 500, ProblemKind::turn),
  FALLING("falling body, 1 s", 2000, ProblemKind::falling),
  RANGE("range, 2 of 6 inputs", 500, draw -> range(draw, 0.25)),
  CUBIC_AT_ZERO("x^3 at 0", 500, draw -> scalar(draw, x -> x * x * x, 0, draw.log(0.01, 100))),
  CUBIC("x^3", 500, ProblemKind::cubic),
  SINE_AT_ZERO("sin x at 0", 500, draw -> scalar(draw, Math::sin, 0, draw.log(0.01, 2))),
  SINE(
      "sin x",
      500,
      draw -> scalar(draw, Math::sin, draw.uniform(-Math.PI, Math.PI), draw.log(0.01, 2))),
  EXPONENTIAL(
      "exp x", 500, draw -> scalar(draw, Math::exp, draw.uniform(-2, 2), draw.log(0.01, 1))),
  PRODUCT_OF_TWO("x1 x2 near 0", 500, draw -> product(draw, 2)),
  PRODUCT_OF_THREE("x1 x2 x3 near 0", 500, draw -> product(draw, 3)),
  WAVE("cos(a'x), 4 inputs", 500, ProblemKind::wave),
  RANGE_UPDATE("range, update", 500, draw -> withNoise(draw, range(draw, 0.2))),
  POLAR_UPDATE("range and bearing, update", 500, ProblemKind::rangeAndBearing),
  DISTANCES_UPDATE("four distances in space, update", 500, ProblemKind::distances);

  /** Drag of the falling body by altitude (1/ft), Athans, Wishner and Bertolini 1968. */
  private static final double FADING = 5e-5;

  private static final int SUBSTEPS = 16;

  private final String words;
  private final int budget;
  private final Function<Draw, Problem> problems;

  ProblemKind(String words, int budget, Function<Draw, Problem> problems) {
    this.words = words;
    this.budget = budget;
    this.problems = problems;
  }

  String words() {
    return words;
  }

  int budget() {
    return budget;
  }

  /** The number of inputs that are read. */
  int inputs() {
    Problem problem = problem(0);
    return problem
        .function()
        .structure()
        .activeInputs(problem.point().input().mean().length)
        .length;
  }

  Use use() {
    return ordinal() >= RANGE_UPDATE.ordinal() ? Use.UPDATE : Use.PREDICTION;
  }

  /** The problem of a number. */
  Problem problem(int number) {
    return problems.apply(new Draw(1000L * ordinal() + 1_000_003L * number));
  }

  private static Problem problem(
      VectorFunction function, int outputs, double[] mean, DMatrixRMaj covariance) {
    OperatingPoint point =
        OperatingPoint.of(Gaussian.of(mean, covariance), new DMatrixRMaj(outputs, outputs));
    return new Problem(function, function, Space.reals(outputs), point);
  }

  private static Problem polar(Draw draw) {
    double r = draw.log(10, 1e5);
    double[] deviations = {r * draw.log(1e-4, 0.1), draw.log(1e-3, 0.7)};
    double[] mean = {r, draw.uniform(-Math.PI, Math.PI)};
    VectorFunction polar = (u, given, z) -> {
      z[0] = u[0] * Math.cos(u[1]);
      z[1] = u[0] * Math.sin(u[1]);
    };
    return problem(polar, 2, mean, draw.correlated(deviations));
  }

  private static Problem spherical(Draw draw) {
    double r = draw.log(10, 1e5);
    double[] deviations = {r * draw.log(1e-4, 0.1), draw.log(1e-3, 0.7), draw.log(1e-3, 0.7)};
    double[] mean = {r, draw.uniform(-Math.PI, Math.PI), draw.uniform(-Math.PI / 2, Math.PI / 2)};
    VectorFunction spherical = (u, given, z) -> {
      z[0] = u[0] * Math.cos(u[1]) * Math.cos(u[2]);
      z[1] = u[0] * Math.sin(u[1]) * Math.cos(u[2]);
      z[2] = u[0] * Math.sin(u[2]);
    };
    return problem(spherical, 3, mean, draw.correlated(deviations));
  }

  /** Opaque to the matching; the reference is told that it is linear but for the rate. */
  private static Problem turn(Draw draw) {
    double speed = draw.log(1, 300);
    double course = draw.uniform(-Math.PI, Math.PI);
    double position = draw.log(1, 100);
    double velocity = draw.log(0.1, 10);
    double[] mean = {
      0, 0, speed * Math.cos(course), speed * Math.sin(course), draw.uniform(-0.1, 0.1)
    };
    double[] deviations = {position, position, velocity, velocity, draw.log(1e-3, 0.05)};
    Turn turn = new Turn();
    OperatingPoint point = OperatingPoint.of(
        Gaussian.independent(mean, deviations), new DMatrixRMaj(5, 5), draw.log(0.1, 20));
    return new Problem(turn::evaluate, turn, Space.reals(5), point);
  }

  /** Altitude (ft), speed (ft/s), ballistic parameter (1/ft); deviations of the first two are those of the source. */
  private static Problem falling(Draw draw) {
    double[] mean = {draw.uniform(1e5, 3e5), draw.log(5e3, 2e4), 1e-3};
    double[] deviations = {1e3, 2e3, draw.log(1e-5, 3e-4)};
    DMatrixRMaj covariance = draw.independent(deviations);
    return problem(ProblemKind::fall, 3, mean, covariance);
  }

  /** Fourth-order Runge-Kutta over a second. */
  private static void fall(double[] u, double[] given, double[] z) {
    double h = 1.0 / SUBSTEPS;
    double x = u[0];
    double v = u[1];
    for (int i = 0; i < SUBSTEPS; i++) {
      double x1 = -v;
      double v1 = drag(x, v, u[2]);
      double x2 = -(v + h / 2 * v1);
      double v2 = drag(x + h / 2 * x1, v + h / 2 * v1, u[2]);
      double x3 = -(v + h / 2 * v2);
      double v3 = drag(x + h / 2 * x2, v + h / 2 * v2, u[2]);
      double x4 = -(v + h * v3);
      double v4 = drag(x + h * x3, v + h * v3, u[2]);
      x += h / 6 * (x1 + 2 * x2 + 2 * x3 + x4);
      v += h / 6 * (v1 + 2 * v2 + 2 * v3 + v4);
    }
    z[0] = x;
    z[1] = v;
    z[2] = u[2];
  }

  private static double drag(double x, double v, double ballistic) {
    return -Math.exp(-FADING * x) * v * v * ballistic;
  }

  /** Spreads of up to so much of the range: nearer to its origin it is not smooth enough for 0.001. */
  private static Problem range(Draw draw, double most) {
    double r = draw.log(10, 1e5);
    double course = draw.uniform(-Math.PI, Math.PI);
    double[] mean = new double[6];
    mean[1] = r * Math.cos(course);
    mean[4] = r * Math.sin(course);
    double[] deviations = {1, r * draw.log(0.01, most), 2, 3, r * draw.log(0.01, most), 4};
    return problem(new ReadRange(), 1, mean, draw.correlated(deviations));
  }

  private static Problem cubic(Draw draw) {
    double deviation = draw.log(0.01, 100);
    return scalar(draw, x -> x * x * x, deviation * draw.uniform(-3, 3), deviation);
  }

  private static Problem scalar(
      Draw draw, DoubleUnaryOperator function, double mean, double deviation) {
    return problem(
        (u, given, z) -> z[0] = function.applyAsDouble(u[0]),
        1,
        new double[] {mean},
        draw.independent(deviation));
  }

  private static Problem product(Draw draw, int factors) {
    double[] mean = new double[factors];
    double[] deviations = new double[factors];
    for (int i = 0; i < factors; i++) {
      mean[i] = draw.uniform(-1, 1);
      deviations[i] = 1;
    }
    VectorFunction product = (u, given, z) -> {
      z[0] = 1;
      for (double factor : u) {
        z[0] *= factor;
      }
    };
    return problem(product, 1, mean, draw.independent(deviations));
  }

  /** a'x has a deviation of 0.05 to 0.5. */
  private static Problem wave(Draw draw) {
    double[] a = draw.direction(4, draw.log(0.05, 0.5));
    double[] mean = new double[4];
    double[] deviations = {1, 1, 1, 1};
    for (int i = 0; i < 4; i++) {
      mean[i] = draw.normal();
    }
    VectorFunction wave = (u, given, z) -> {
      double sum = 0;
      for (int i = 0; i < 4; i++) {
        sum += a[i] * u[i];
      }
      z[0] = Math.cos(sum);
    };
    return problem(wave, 1, mean, draw.independent(deviations));
  }

  /** The noise is 1e-5 to 1 of the largest input deviation, which is a length. */
  private static Problem withNoise(Draw draw, Problem silent) {
    double deviation = 0;
    DMatrixRMaj covariance = silent.point().input().covariance();
    for (int i : new int[] {1, 4}) {
      deviation = Math.max(deviation, Math.sqrt(covariance.get(i, i)));
    }
    deviation *= draw.log(1e-5, 1);
    OperatingPoint point =
        OperatingPoint.of(silent.point().input(), new double[][] {{deviation * deviation}});
    return new Problem(silent.function(), silent.truth(), silent.output(), point);
  }

  private static Problem rangeAndBearing(Draw draw) {
    double r = draw.log(10, 1e5);
    double course = draw.uniform(-Math.PI, Math.PI);
    double[] mean = {r * Math.cos(course), r * Math.sin(course)};
    double[] deviations = {r * draw.log(1e-3, 0.15), r * draw.log(1e-3, 0.15)};
    double ratio = draw.log(1e-3, 1);
    double noise = ratio * Math.max(deviations[0], deviations[1]);
    double turn = noise / r;
    OperatingPoint point = OperatingPoint.of(
        Gaussian.of(mean, draw.correlated(deviations)),
        new double[][] {{noise * noise, 0}, {0, turn * turn}});
    VectorFunction seen = (u, given, z) -> {
      z[0] = Math.hypot(u[0], u[1]);
      z[1] = Math.atan2(u[1], u[0]);
    };
    return new Problem(seen, seen, Space.reals(1).and(Space.angles(1)), point);
  }

  /** Four distances to places 2e7 m away, as of satellites; spread 10 m to 300 km, noise 1 m. */
  private static Problem distances(Draw draw) {
    double[][] places = new double[4][];
    for (int i = 0; i < 4; i++) {
      places[i] = draw.direction(3, 2e7);
    }
    double spread = draw.log(10, 3e5);
    VectorFunction distances = (u, given, z) -> {
      for (int i = 0; i < 4; i++) {
        double x = u[0] - places[i][0];
        double y = u[1] - places[i][1];
        double h = u[2] - places[i][2];
        z[i] = Math.sqrt(x * x + y * y + h * h);
      }
    };
    double[][] noise = {{1, 0, 0, 0}, {0, 1, 0, 0}, {0, 0, 1, 0}, {0, 0, 0, 1}};
    OperatingPoint point = OperatingPoint.of(
        Gaussian.of(new double[3], draw.independent(spread, spread, spread)), noise);
    return new Problem(distances, distances, Space.reals(4), point);
  }
}
