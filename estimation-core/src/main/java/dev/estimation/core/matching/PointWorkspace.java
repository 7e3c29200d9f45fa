package dev.estimation.core.matching;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.points.UnitPoints;
import dev.estimation.core.space.Space;
import java.util.Arrays;

/** Carries moments by points; see {@link PointMatching} for the formulas. */
class PointWorkspace extends BaseWorkspace {
  final UnitPoints points;

  /** delta, by which the mean of the output differs from the image of the centre. */
  final double[] shift;

  private final PointColumns columns;
  private final LinearColumns linear;
  private final CentreRefinement refinement;
  private final double[] displacement;
  private final double[] point;
  private final double[] image;
  private final double[] deviation;

  PointWorkspace(
      Space input,
      Space output,
      VectorFunction function,
      UnitPoints points,
      int meanPasses,
      Form form) {
    super(input, output, function, LinearColumns.inputs(function, input), form);
    this.points = points;
    this.linear = LinearColumns.of(this, function, points);
    this.columns = new PointColumns(output.dimension(), points, linear.weights(), form);
    this.displacement = new double[input.dimension()];
    this.point = new double[input.storage()];
    this.image = new double[output.storage()];
    this.deviation = new double[output.dimension()];
    this.shift = new double[output.dimension()];
    this.refinement =
        meanPasses == 1 ? null : new CentreRefinement(output, points.size(), meanPasses);
  }

  @Override
  MatchingStatus match(double[] mean, double[] given, double[] outputMean) {
    double[] data = columns.total().data();
    int stride = columns.total().count();
    if (!linear.fillCentre(mean, given, centre, data, stride)) {
      return linear.fault();
    }
    for (int i = 0; i < points.size(); i++) {
      place(i, mean);
      if (!function.evaluate(linear.count() == 0 ? point : copied(point), given, image)) {
        return MatchingStatus.FUNCTION_NOT_FINITE;
      }
      outputSpace.difference(image, centre, deviation);
      for (int c = 0, at = i; c < deviation.length; c++, at += stride) {
        data[at] = deviation[c];
      }
      if (refinement != null) {
        refinement.keep(i, image);
      }
      if (!linear.fillPoint(i, point, given, image, data, stride)) {
        return linear.fault();
      }
    }
    columns.fillShift(shift);
    if (refinement == null) {
      outputSpace.displace(centre, shift, outputMean);
    } else {
      refinement.run(centre, columns, shift, outputMean);
    }
    columns.centre(shift);
    return MatchingStatus.MATCHED;
  }

  /** Sets {@link #point} to m + L xi_i. */
  private void place(int i, double[] mean) {
    Arrays.fill(displacement, 0);
    int end = points.start(i + 1);
    for (int entry = points.start(i); entry < end; entry++) {
      addColumn(points.axis(entry), points.coordinate(entry));
    }
    inputSpace.displace(mean, displacement, point);
  }

  /** Adds a column of L times a coordinate to the displacement, over active inputs. */
  private void addColumn(int axis, double coordinate) {
    double[] factor = active.factor().data;
    int n = displacement.length;
    int count = active.count();
    for (int a = axis; a < count; a++) {
      int row = active.input(a);
      displacement[row] += factor[row * n + axis] * coordinate;
    }
  }

  @Override
  WeightedColumns columns() {
    return columns.total();
  }

  @Override
  WeightedColumns residuals() {
    return columns.residuals(unitCrossCovariance().data, linear.count());
  }

  @Override
  void fillCross(double[] w) {
    columns.fillCross(w);
    linear.fillCross(w, columns.total());
  }

  @Override
  String jacobianFailure() {
    return linear.failure();
  }
}
