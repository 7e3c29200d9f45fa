package dev.estimation.core.matching;

import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Form;
import dev.estimation.core.internal.SymmetricMatrix;
import dev.estimation.core.space.Space;

/** Carries moments to a tolerance; see {@link ToleranceMatching}. */
final class ToleranceWorkspace extends BaseWorkspace {
  private static final double ROUNDINGS = 16 * 0x1p-52;

  /** With so few axes products are looked at soon; with more, something may hide from one pair of probes. */
  private static final int AXES_WITHOUT_FRESH_PROBE = 2;

  private final double tolerance;
  private final int budget;
  private final int axes;
  private final int costOfNode;
  private final Jacobian jacobian;
  private final UnitFunction values;
  private final NestedExpansion expansion;
  private final ProbePairs probes;
  private final ErrorEstimate estimate;
  private final Refinement refinement;
  private final SlopeCheck slopes;
  private final ExpansionColumns columns;
  private final double[] rounding;
  private final double[] shift;
  private double error = Double.NaN;
  private String reason = "";

  ToleranceWorkspace(
      Space input, Space output, VectorFunction function, double tolerance, int budget, Form form) {
    super(input, output, function, LinearColumns.inputs(function, input), form);
    this.tolerance = tolerance;
    this.budget = budget;
    int n = input.dimension();
    int m = output.dimension();
    this.axes = function.structure().nonlinearInputs(n).length;
    this.jacobian = function.structure().jacobian().orElse(null);
    this.values = new UnitFunction(this, function, axes);
    this.costOfNode = 1 + values.slopes().evaluations();
    int width = m * values.columns();
    int most = 1 + budget / costOfNode;
    checkBudget();
    this.expansion = new NestedExpansion(axes, width, most, values);
    this.probes = new ProbePairs(expansion, axes, width, values);
    values.know(probes);
    ExpansionNorms norms = new ExpansionNorms(expansion, axes, m, values.columns(), most);
    this.estimate = new ErrorEstimate(expansion, norms, probes, axes, width);
    this.refinement = new Refinement(expansion.set(), norms, axes);
    this.slopes = new SlopeCheck(expansion, axes, m, values.columns(), active);
    this.columns = new ExpansionColumns(expansion, axes, m, values.columns(), form);
    this.rounding = new double[m];
    this.shift = new double[m];
  }

  private void checkBudget() {
    int first = (axes == 0 ? 1 : 2 * axes + 3) * costOfNode;
    if (budget < first) {
      throw new IllegalArgumentException("budget must be at least " + first + " evaluations for "
          + axes + " nonlinear inputs and " + (values.columns() - 1) + " linear ones, got "
          + budget);
    }
  }

  @Override
  MatchingStatus match(double[] mean, double[] given, Use use, double[] outputMean) {
    error = Double.POSITIVE_INFINITY;
    reason = "";
    if (noise() != null && !SymmetricMatrix.allFinite(noise().matrix())) {
      return faultOf(noise(), MatchingStatus.NOISE_NOT_FINITE);
    }
    values.begin(mean, given);
    int moving = moving();
    probes.begin(moving == 1 ? firstMoving() : -1);
    if (!expansion.begin()) {
      return values.slopes().fault();
    }
    MatchingStatus status = axes == 0 ? withoutError() : start(mean, given, use);
    if (!status.hasResult()) {
      return status;
    }
    columns.fill();
    for (int c = 0; c < shift.length; c++) {
      shift[c] = expansion.coefficients()[c * values.columns()];
    }
    outputSpace.displace(centre, shift, outputMean);
    return status;
  }

  private int moving() {
    int count = 0;
    for (int axis = 0; axis < axes; axis++) {
      count += values.isStill(axis) ? 0 : 1;
    }
    return count;
  }

  private int firstMoving() {
    int axis = 0;
    while (values.isStill(axis)) {
      axis++;
    }
    return axis;
  }

  /** The points on the axes, the first probes, and what more it takes. */
  private MatchingStatus start(double[] mean, double[] given, Use use) {
    compareSlopes(mean, given);
    int moving = 0;
    for (int axis = 0; axis < axes; axis++) {
      if (values.isStill(axis)) {
        expansion.set().close(0, axis);
      } else if (expansion.add(0, axis) < 0) {
        return values.slopes().fault();
      } else {
        moving++;
      }
    }
    if (moving == 0) {
      return withoutError();
    }
    double[] linear = values.changeLinear();
    for (int i = 0; i < linear.length; i++) {
      linear[i] = columns.linear(i / shift.length, i % shift.length);
    }
    probes.add();
    return refine(use, moving > AXES_WITHOUT_FRESH_PROBE);
  }

  private MatchingStatus withoutError() {
    error = 0;
    return MatchingStatus.MATCHED;
  }

  private void compareSlopes(double[] mean, double[] given) {
    slopes.forget();
    if (jacobian != null && values.columns() > 1) {
      slopes.take(values.slopes().derivatives());
    } else if (jacobian != null) {
      slopes.evaluate(jacobian, copied(mean), given);
      jacobians++;
    }
  }

  private MatchingStatus refine(Use use, boolean manyAxes) {
    boolean fresh = true;
    while (!values.turned()) {
      error = estimateError(use);
      if (Double.isNaN(error)) {
        error = Double.POSITIVE_INFINITY;
        return below("the estimate overflows");
      }
      boolean passes = error <= tolerance;
      boolean confirmed = fresh || !(manyAxes || hides()) || !probes.hasNext();
      if (passes && confirmed) {
        return MatchingStatus.MATCHED;
      }
      int rest = (budget - evaluations()) / costOfNode;
      if (passes || (probes.size() == 0 && probes.hasNext())) {
        if (rest < 2) {
          return below("the budget has no room for a further pair of probes");
        }
        fresh = probes.add();
      } else if (refinement.choose(rest)) {
        expansion.add(refinement.member(), refinement.axis());
        fresh = false;
      } else {
        return below("there is no further term with finite values that the budget has room for");
      }
    }
    error = estimateError(use);
    return error <= tolerance
        ? MatchingStatus.MATCHED
        : below("an angle of the output would pass half a turn from the centre's");
  }

  /** Whether two axes may hide something from one pair of probes: both bend, or products go beyond the first levels. */
  private boolean hides() {
    return expansion.set().isDeep() || estimate.bendingAxes() > 1;
  }

  private MatchingStatus below(String why) {
    reason = why;
    return MatchingStatus.BELOW_TOLERANCE;
  }

  private double estimateError(Use use) {
    boolean alike = outputSpace.storage() == outputSpace.dimension();
    for (int c = 0; c < rounding.length; c++) {
      double size = values.largest(c) + (alike ? Math.abs(centre[c]) : 1);
      double seen = ROUNDINGS * size / tolerance;
      rounding[c] = seen * seen;
    }
    if (slopes.isKnown()) {
      slopes.compare(estimate.changeSlopes());
    }
    return estimate.estimate(noise(), use, rounding, slopes.isKnown());
  }

  @Override
  WeightedColumns columns() {
    return columns.total();
  }

  @Override
  WeightedColumns residuals() {
    return columns.residuals();
  }

  @Override
  void fillCross(double[] w) {
    columns.fillCross(w);
  }

  @Override
  public double estimatedError() {
    return hasResult() ? error : Double.POSITIVE_INFINITY;
  }

  @Override
  String jacobianFailure() {
    return values.slopes().failure();
  }

  @Override
  String toleranceFailure() {
    String where = error <= tolerance ? ", not confirmed, is within" : " is above";
    return "estimated error " + error + where + " the tolerance of " + tolerance + " after "
        + evaluations() + " of at most " + budget + " evaluations: " + reason;
  }
}
