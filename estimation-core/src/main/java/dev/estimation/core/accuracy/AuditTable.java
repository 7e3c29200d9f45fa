package dev.estimation.core.accuracy;

import dev.estimation.core.matching.Use;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * What an {@link Audit} found. <i>Immutable.</i>
 *
 * @param use what the moments are for; decides what errors mean, see {@link MatchingError}
 * @param reference how sure the truth is
 * @param rows one for each method, in the order given
 */
public record AuditTable(Use use, ReferenceRow reference, List<AuditRow> rows) {
  /**
   * A table.
   *
   * @param use what the moments are for
   * @param reference how sure the truth is
   * @param rows copied
   */
  public AuditTable {
    rows = List.copyOf(rows);
  }

  /**
   * The cheapest method within a tolerance: fewest evaluations, a Jacobian counted as one.
   *
   * @param tolerance as for {@link AuditRow#shareWithin}
   * @param share of the points at which it must be met, above 0 and up to 1
   * @return its row; nothing if none is
   */
  public Optional<AuditRow> cheapest(double tolerance, double share) {
    return cheapest(tolerance, share, 1);
  }

  /**
   * The cheapest method within a tolerance, for Jacobians of a known cost.
   *
   * @param tolerance as for {@link AuditRow#shareWithin}
   * @param share of the points at which it must be met, above 0 and up to 1
   * @param jacobianCost of a Jacobian, in evaluations; 0 where derivatives are numerical, since
   *     their evaluations are counted
   * @return its row, the first of equals; nothing if none is
   */
  public Optional<AuditRow> cheapest(double tolerance, double share, double jacobianCost) {
    if (!(share > 0 && share <= 1)) {
      throw new IllegalArgumentException(
          "share of points must be above 0 and up to 1, got " + share + " (audit)");
    }
    return rows.stream()
        .filter(row -> row.shareWithin(tolerance) >= share)
        .min(Comparator.comparingDouble(row -> row.evaluations() + jacobianCost * row.jacobians()));
  }

  /** {@return a table for reading: median, 99 % and worst of each error} */
  @Override
  public String toString() {
    int width = rows.stream().mapToInt(row -> row.method().length()).max().orElse(0);
    String name = "%-" + Math.max(width, 9) + "s";
    StringBuilder text = new StringBuilder();
    text.append(String.format(
        Locale.ROOT,
        name + " %8s %6s   %-26s   %-26s   %-26s   %-26s  %s\n",
        use.name().toLowerCase(Locale.ROOT),
        "eval.",
        "Jac.",
        "mean: 50 %, 99 %, worst",
        use == Use.UPDATE ? "unexplained" : "covariance",
        "cross-covariance",
        "divergence",
        "failed"));
    for (AuditRow row : rows) {
      text.append(String.format(
          Locale.ROOT,
          name + " %8.1f %6.1f   %s   %s   %s   %s  %d\n",
          row.method(),
          row.evaluations(),
          row.jacobians(),
          row.mean(),
          row.covariance(),
          row.crossCovariance(),
          row.divergence(),
          row.failures()));
    }
    text.append(String.format(
        Locale.ROOT,
        name + " %8.0f %6s   %s   sure to this; converged at %d of %d points\n",
        "reference",
        reference.evaluations(),
        "",
        reference.uncertainty(),
        reference.converged(),
        reference.points()));
    return text.toString();
  }
}
