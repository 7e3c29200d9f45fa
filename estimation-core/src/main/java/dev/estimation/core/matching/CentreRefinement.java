package dev.estimation.core.matching;

import dev.estimation.core.space.Space;
import java.util.Arrays;

/**
 * Mean passes beyond the first: deviations are taken anew about the mean of the pass before. The centre's own
 * is then d_0, not zero. All sums but the mean are the same for d_i - d_0, where it is zero again: that is what is
 * kept.
 */
final class CentreRefinement {
  private final Space space;
  private final int passes;
  private final int points;
  private final double[] images;
  private final double[] image;
  private final double[] first;
  private final double[] firstDeviation;
  private final double[] deviation;

  CentreRefinement(Space space, int points, int passes) {
    this.space = space;
    this.points = points;
    this.passes = passes;
    this.images = new double[points * space.storage()];
    this.image = new double[space.storage()];
    this.first = new double[space.storage()];
    this.firstDeviation = new double[space.dimension()];
    this.deviation = new double[space.dimension()];
  }

  /** Keeps the image of a point. */
  void keep(int i, double[] imageOfPoint) {
    System.arraycopy(imageOfPoint, 0, images, i * image.length, image.length);
  }

  /**
   * Moves the centre to where the deviations sum to zero.
   *
   * @param centre updated
   * @param columns those of points are updated
   * @param shift delta, updated
   * @param mean filled
   */
  void run(double[] centre, PointColumns columns, double[] shift, double[] mean) {
    System.arraycopy(centre, 0, first, 0, first.length);
    Arrays.fill(firstDeviation, 0);
    for (int pass = 1; pass < passes; pass++) {
      fillMean(centre, shift, centre);
      space.difference(first, centre, firstDeviation);
      takeDeviations(centre, columns.total());
      columns.fillShift(shift);
    }
    fillMean(centre, shift, mean);
  }

  private void takeDeviations(double[] centre, WeightedColumns columns) {
    for (int i = 0; i < points; i++) {
      System.arraycopy(images, i * image.length, image, 0, image.length);
      space.difference(image, centre, deviation);
      for (int c = 0; c < deviation.length; c++) {
        columns.data()[c * columns.count() + i] = deviation[c] - firstDeviation[c];
      }
    }
  }

  /** The centre displaced by delta + d_0; weights sum to 1. */
  private void fillMean(double[] centre, double[] shift, double[] result) {
    for (int c = 0; c < deviation.length; c++) {
      deviation[c] = shift[c] + firstDeviation[c];
    }
    space.displace(centre, deviation, result);
  }
}
