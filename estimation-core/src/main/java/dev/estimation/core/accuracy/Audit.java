package dev.estimation.core.accuracy;

import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.gaussian.Covariance;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.Use;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Compares ways of carrying moments through one function with the truth, over the operating points of a user's own:
 * what each buys at what cost. Errors are those of {@link MatchingError}, the truth is that of {@link
 * ReferenceSearch}.
 *
 * <pre>{@code
 * AuditTable table = Audit.of(state, measurement, radar, Use.UPDATE)
 *     .method("linear", Linearisation.firstOrder())
 *     .method("cubature", PointMatching.of(CubatureRule.degreeThree()))
 *     .run(points);
 * }</pre>
 *
 * <p>A matching that fails at a point has infinite errors there, and its failure is told; moments that
 * a matching knows to be below its tolerance are measured like any. Cost: for each point a
 * search, and one call of each matching; see {@link ReferenceSearch} for what a search takes. <i>Immutable</i>:
 * methods give a new audit; a run keeps its scratch to itself, so one audit serves many threads if the
 * function does.
 */
public final class Audit {
  private final Space input;
  private final Space output;
  private final VectorFunction function;
  private final Use use;
  private final ReferenceSettings settings;
  private final Map<String, MomentMatching> methods;

  private Audit(
      Space input,
      Space output,
      VectorFunction function,
      Use use,
      ReferenceSettings settings,
      Map<String, MomentMatching> methods) {
    this.input = input;
    this.output = output;
    this.function = function;
    this.use = use;
    this.settings = settings;
    this.methods = methods;
  }

  /**
   * An audit without methods yet.
   *
   * @param input where u lives
   * @param output where g(u) lives
   * @param function g
   * @param use what the moments are for
   * @return the audit
   */
  public static Audit of(Space input, Space output, VectorFunction function, Use use) {
    return new Audit(input, output, function, use, ReferenceSettings.standard(), Map.of());
  }

  /**
   * {@return this audit with another method}
   *
   * @param name in the table; not yet taken
   * @param matching the method
   */
  public Audit method(String name, MomentMatching matching) {
    Map<String, MomentMatching> more = new LinkedHashMap<>(methods);
    if (more.put(name, matching) != null) {
      throw new IllegalArgumentException(
          "methods must have different names, got \"" + name + "\" twice (audit)");
    }
    return new Audit(input, output, function, use, settings, more);
  }

  /**
   * {@return this audit with references found as the settings say}
   *
   * @param reference how hard to look; {@link ReferenceSettings#standard()} unless set
   */
  public Audit reference(ReferenceSettings reference) {
    return new Audit(input, output, function, use, reference, methods);
  }

  /**
   * Looks at every point.
   *
   * @param points 1 or more
   * @return the table
   * @throws IllegalArgumentException if there are no points or methods, the function gives NaN or infinity, shapes do
   *     not match, or the noise is too small to measure by; with the index of the point
   */
  public AuditTable run(List<OperatingPoint> points) {
    if (points.isEmpty() || methods.isEmpty()) {
      throw new IllegalArgumentException("an audit must have 1 point and 1 method or more, got "
          + points.size() + " points and " + methods.size() + " methods");
    }
    List<Contender> contenders = new ArrayList<>();
    methods.forEach((name, matching) ->
        contenders.add(new Contender(name, matching.workspace(input, output, function))));
    ReferenceSearch search = new ReferenceSearch(settings, input, output, function);
    List<ReferenceMoments> references = new ArrayList<>();
    for (int i = 0; i < points.size(); i++) {
      try {
        references.add(look(search, points.get(i), contenders));
      } catch (IllegalArgumentException e) {
        throw new IllegalArgumentException(e.getMessage() + " (operating point " + i + ")", e);
      }
    }
    double[] uncertainties =
        references.stream().mapToDouble(ReferenceMoments::estimatedError).toArray();
    return new AuditTable(
        use,
        ReferenceRow.of(references),
        contenders.stream().map(contender -> contender.row(uncertainties)).toList());
  }

  private ReferenceMoments look(
      ReferenceSearch search, OperatingPoint point, List<Contender> contenders) {
    ReferenceMoments reference = search.find(point, use);
    CarriedMoments truth = reference.moments().plusNoise(point.noise());
    Moments moments = new Moments(input);
    moments.set(point.input());
    Covariance noise = new Covariance(output.dimension());
    noise.changeMatrix().setTo(point.noise());
    for (Contender contender : contenders) {
      contender.look(moments, point.given(), noise, truth, use);
    }
    return reference;
  }

  /** One method's workspace, and what it has done so far. */
  private static final class Contender {
    private final String name;
    private final MatchingWorkspace work;
    private final List<MatchingError> errors = new ArrayList<>();
    private long evaluations;
    private long jacobians;
    private int failures;
    private String firstFailure = "";

    Contender(String name, MatchingWorkspace work) {
      this.name = name;
      this.work = work;
    }

    void look(Moments input, double[] given, Covariance noise, CarriedMoments truth, Use use) {
      MatchingStatus status = work.carry(input, given, noise, use);
      evaluations += work.evaluations();
      jacobians += work.jacobians();
      if (status.hasResult()) {
        errors.add(MatchingError.of(truth, CarriedMoments.of(work, input), use));
        return;
      }
      errors.add(MatchingError.FAILED);
      failures++;
      firstFailure = failures == 1 ? work.failure() : firstFailure;
    }

    AuditRow row(double[] uncertainties) {
      double points = errors.size();
      return AuditRow.of(
          name,
          evaluations / points,
          jacobians / points,
          errors,
          uncertainties,
          failures,
          firstFailure);
    }
  }
}
