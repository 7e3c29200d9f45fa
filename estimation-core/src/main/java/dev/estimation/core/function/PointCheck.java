package dev.estimation.core.function;

import dev.estimation.core.function.JacobianFinding.Kind;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;

/** The part of {@link JacobianCheck} that belongs to one point; the criterion stands there. */
final class PointCheck {
  private static final double RELATIVE = 1e-6;
  private static final double UNCERTAINTIES = 10;
  private static final double ROUNDING = 4 * 0x1p-52;

  private final Space input;
  private final Space output;
  private final VectorFunction function;
  private final Structure structure;
  private final double[] scales;
  private final double[] given;
  private final double[] point;
  private final List<Double> place;
  private final int n;
  private final boolean[] active;
  private final double[] jacobian;
  private final List<JacobianFinding> findings = new ArrayList<>();

  PointCheck(
      Space input,
      Space output,
      VectorFunction function,
      double[] scales,
      double[] given,
      double[] point) {
    this.input = input;
    this.output = output;
    this.function = function;
    this.structure = function.structure();
    this.scales = scales;
    this.given = given;
    this.point = point;
    this.place = Arrays.stream(point).boxed().collect(Collectors.toUnmodifiableList());
    this.n = input.dimension();
    this.active = new boolean[n];
    for (int j : structure.activeInputs(n)) {
      active[j] = true;
    }
    this.jacobian = new double[output.dimension() * n];
    slopes(point.clone(), given, jacobian);
  }

  private void slopes(double[] at, double[] with, double[] result) {
    Arrays.fill(result, 0);
    structure.jacobian().orElseThrow().evaluate(at, with, result);
  }

  List<JacobianFinding> findings() {
    checkJacobian();
    structure.hessian().ifPresent(this::checkHessian);
    return findings;
  }

  private void checkJacobian() {
    SteadyDifferences differences = new SteadyDifferences(input, output, function, scales);
    double[] centre = new double[output.storage()];
    Arrays.fill(centre, Double.NaN);
    function.evaluate(point.clone(), given, centre);
    for (int j = 0; j < n; j++) {
      differences.take(point, given, centre, j);
      for (int i = 0; i < output.dimension(); i++) {
        double rounding = rounding(size(centre, i, output), jacobian, i);
        if (active[j]) {
          judge(differences, i, rounding, Kind.JACOBIAN, i, j, -1, jacobian[i * n + j]);
        } else {
          judge(differences, i, rounding, Kind.INACTIVE_INPUT, i, j, -1, 0);
        }
      }
    }
  }

  private void checkHessian(Hessian hessian) {
    double[] hessians = new double[jacobian.length * n];
    hessian.evaluate(point.clone(), given, hessians);
    SteadyDifferences differences =
        new SteadyDifferences(input, Space.reals(jacobian.length), this::slopes, scales);
    for (int l = 0; l < n; l++) {
      if (active[l]) {
        differences.take(point, given, jacobian, l);
        for (int entry = 0; entry < jacobian.length; entry++) {
          int j = entry % n;
          if (active[j] && l <= j) {
            double rounding = rounding(Math.abs(jacobian[entry]), hessians, entry);
            double said = hessians[entry * n + l];
            judge(differences, entry, rounding, Kind.HESSIAN, entry / n, j, l, said);
          }
        }
      }
    }
  }

  private void judge(
      SteadyDifferences differences,
      int entry,
      double rounding,
      Kind kind,
      int row,
      int column,
      int secondColumn,
      double said) {
    int rung = differences.steadiest(entry, rounding);
    double seen = differences.value(entry, rung);
    double allowed = RELATIVE * Math.max(Math.abs(said), Math.abs(seen))
        + UNCERTAINTIES * differences.uncertainty(entry, rung, rounding);
    if (!(Math.abs(said - seen) <= allowed)) {
      findings.add(new JacobianFinding(kind, row, column, secondColumn, said, seen, place));
    }
  }

  /** What rounding of a value and of the inputs behind it may do to a difference of values. */
  private double rounding(double value, double[] derivatives, int row) {
    double sum = value;
    for (int l = 0; l < n; l++) {
      double share = Math.abs(derivatives[row * n + l]) * size(point, l, input);
      sum += share <= Double.MAX_VALUE ? share : 0;
    }
    return ROUNDING * sum;
  }

  /** The magnitude of a component; the largest one where components are not those of differences. */
  private static double size(double[] vector, int index, Space space) {
    return space.storage() == space.dimension()
        ? Math.abs(vector[index])
        : Arrays.stream(vector).map(Math::abs).max().orElse(0);
  }
}
