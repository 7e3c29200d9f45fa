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
  private final PointPlacement placement;
  private final boolean flat;
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
    this.placement = new PointPlacement(points, active, input);
    this.flat = output.isVectorSpace();
    this.image = new double[output.storage()];
    this.deviation = new double[output.dimension()];
    this.shift = new double[output.dimension()];
    this.refinement =
        meanPasses == 1 ? null : new CentreRefinement(output, points.size(), meanPasses);
  }

  @Override
  MatchingStatus match(double[] mean, double[] given, Use use, double[] outputMean) {
    double[] data = columns.total().data();
    int stride = columns.total().count();
    if (!linear.fillCentre(mean, given, centre, data, stride)) {
      return linear.fault();
    }
    placement.begin(mean);
    Arrays.fill(shift, 0);
    for (int i = 0; i < points.size(); i++) {
      double[] point = placement.place(i, mean);
      if (!function.evaluate(point, given, image)) {
        return MatchingStatus.FUNCTION_NOT_FINITE;
      }
      takeDeviation(i, data, stride);
      if (refinement != null) {
        refinement.keep(i, image);
      }
      if (!linear.fillPoint(i, point, given, image, data, stride)) {
        return linear.fault();
      }
    }
    if (refinement == null) {
      outputSpace.displace(centre, shift, outputMean);
    } else {
      refinement.run(centre, columns, shift, outputMean);
    }
    columns.centre(shift);
    linear.centre(data, stride);
    return MatchingStatus.MATCHED;
  }

  /** Puts d_i into its column, and its share into delta = sum w_i d_i. */
  private void takeDeviation(int i, double[] data, int stride) {
    double weight = points.weight(i);
    if (flat) {
      for (int c = 0, at = i; c < shift.length; c++, at += stride) {
        double difference = image[c] - centre[c];
        data[at] = difference;
        shift[c] += weight * difference;
      }
      return;
    }
    outputSpace.difference(image, centre, deviation);
    for (int c = 0, at = i; c < shift.length; c++, at += stride) {
      data[at] = deviation[c];
      shift[c] += weight * deviation[c];
    }
  }

  @Override
  WeightedColumns columns() {
    return columns.total();
  }

  @Override
  WeightedColumns residuals() {
    return columns.residuals(unitCrossCovariance().data, linear);
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
