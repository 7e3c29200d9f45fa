package dev.estimation.benchmarks.jmh;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.OptionalDouble;
import org.apache.commons.math3.stat.regression.SimpleRegression;

/**
 * The time of a call against the number of inputs, for one matching.
 *
 * @param matching which
 * @param points a timing for each n, n rising
 * @param models of the function's calls alone (ns), where they were measured, for each n
 */
record ScalingCurve(ComparedMatching matching, List<Timing> points, List<OptionalDouble> models) {
  /** Below, what does not depend on n is a large part of the time. */
  static final int FIRST_FITTED = 8;

  static List<ScalingCurve> of(List<Timing> timings) {
    List<ScalingCurve> curves = new ArrayList<>();
    for (ComparedMatching matching : ComparedMatching.values()) {
      List<Timing> points = timings.stream()
          .filter(one -> one.part().equals("carry") && one.matching().equals(matching.label()))
          .sorted(Comparator.comparingInt(ScalingCurve::size))
          .toList();
      if (!points.isEmpty()) {
        List<OptionalDouble> models = points.stream()
            .map(point -> Timing.ofModel(timings, point.subject(), matching.label()))
            .toList();
        curves.add(new ScalingCurve(matching, points, models));
      }
    }
    return curves;
  }

  static int size(Timing timing) {
    return Integer.parseInt(timing.subject());
  }

  /** {@return the slope of log time against log n by least squares, over n from 8 on; NaN with fewer than two} */
  double slope() {
    SimpleRegression line = new SimpleRegression();
    points.stream()
        .filter(point -> size(point) >= FIRST_FITTED)
        .forEach(point -> line.addData(Math.log(size(point)), Math.log(point.nanos())));
    return line.getSlope();
  }
}
