package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.weigh.Contender;
import dev.estimation.benchmarks.weigh.Recommendation;
import dev.estimation.benchmarks.weigh.ScenarioChange;
import dev.estimation.benchmarks.weigh.WeighedRun;
import dev.estimation.benchmarks.weigh.Weighing;
import dev.estimation.benchmarks.weigh.Wish;
import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.stream.Stream;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** Holds methods against the truth at the operating points of a run, and says which one suffices. */
@Command(
    name = "weigh",
    description =
        "Finds the cheapest method that is accurate enough where a log is, or a simulated flight.")
final class WeighCommand implements Callable<Integer> {
  private static final String USUAL_TOLERANCE = "0.01";

  @Mixin
  private CaseOptions cases = new CaseOptions();

  @Mixin
  private PointOptions points = new PointOptions();

  @Mixin
  private SweepOptions sweep = new SweepOptions();

  @Option(
      names = "--tolerance",
      paramLabel = "EPS",
      description = "of errors in standard deviations, or relative of a variance (default 0.01)")
  private String tolerance;

  @Option(
      names = "--budget-us",
      paramLabel = "US",
      description =
          "time that the calls of a step may take; alone: recommends the most accurate within it")
  private String budget;

  @Option(
      names = "--method",
      paramLabel = "METHOD",
      description = "repeatable: " + MethodParser.FORMS + "; KAPPA may be N-n, n the dimension")
  private List<String> methods = new ArrayList<>();

  @Option(
      names = "--track",
      paramLabel = "METHOD",
      description = "whose run gives the operating points (default tolerance:0.001)")
  private String track = "tolerance:0.001";

  @Option(names = "--untimed", description = "measure no times: the output is the same each time")
  private boolean untimed;

  @Option(names = "--out", paramLabel = "FOLDER", description = "for weigh.json (default results)")
  private String out = "results";

  @Spec
  private CommandSpec spec;

  private WeighTable table;
  private WeighDocument document;
  private List<Method> contenders;
  private Wish wish;

  @Override
  public Integer call() {
    wish = wish();
    points.check();
    contenders = contenders();
    Method tracking = matching(track);
    List<Double> scales = sweep.noiseScales();
    List<LoadedVariant> variants = cases.load();
    List<Job> jobs = new ArrayList<>();
    variants.forEach(variant -> scales.forEach(scale -> jobs.add(job(variant, scale, tracking))));
    if (jobs.stream().allMatch(job -> job.weighing == null || job.weighing.points() == 0)) {
      throw new BadInputException(
          "no operating point is left: " + cases.name() + " has none in the steps asked for");
    }
    ResultsFolder folder = ResultsFolder.prepare(out);
    PrintWriter console = spec.commandLine().getOut();
    table = new WeighTable(console, LabelledRun.longestName(contenders, false), wish.tolerance());
    document = new WeighDocument(cases, wish.tolerance(), track);
    jobs.forEach(this::run);
    if (document.isEmpty()) {
      throw new BadInputException("no operating point is left: the runs of " + cases.name()
          + " came to none; see what replay says of them");
    }
    table.printNotes();
    console.println("Results: " + folder.write("weigh.json", document.root()));
    console.flush();
    return 0;
  }

  private Wish wish() {
    double allowed =
        SweepOptions.positive("--tolerance", tolerance == null ? USUAL_TOLERANCE : tolerance);
    double micros =
        budget == null ? Double.POSITIVE_INFINITY : SweepOptions.positive("--budget-us", budget);
    if (budget != null && untimed) {
      throw new BadInputException("--budget-us wants times measured: not with --untimed");
    }
    return new Wish(allowed, tolerance == null && budget != null, micros);
  }

  private List<Method> contenders() {
    Stream<String> usual = Stream.of(
        "linear",
        "linear2-spread",
        "cubature",
        "unscented:3-n",
        "simplex",
        "hermite:3",
        "hermite:5",
        "sparse:2",
        "tolerance:" + (tolerance == null ? USUAL_TOLERANCE : tolerance));
    Stream<String> typed = methods.isEmpty() ? usual : new LinkedHashSet<>(methods).stream();
    return typed.map(WeighCommand::matching).toList();
  }

  private static Method matching(String typed) {
    Method method = MethodParser.parse(typed);
    if (method.kind().iteration().isPresent()) {
      throw new BadInputException("method " + typed
          + " iterates updates; single calls are weighed, which for it are those of linear");
    }
    return method;
  }

  /** A variant at one noise scale; no weighing if the log does not have the variant. */
  private record Job(LoadedVariant variant, double scale, Weighing weighing) {}

  private Job job(LoadedVariant variant, double scale, Method tracking) {
    if (variant.scenario().isEmpty()) {
      return new Job(variant, scale, null);
    }
    Scenario scenario =
        new ScenarioChange(scale, sweep.rows(), 0).of(variant.scenario().get());
    Trial.of(variant.name(), scenario, tracking);
    List<Contender> named = contenders.stream()
        .map(one -> new Contender(one.typed(), one.kind().matching()))
        .toList();
    return new Job(
        variant,
        scale,
        new Weighing(points.region(scenario), tracking.kind().matching(), named, wish.tolerance()));
  }

  private void run(Job job) {
    if (job.weighing == null) {
      table.printAbsent(job.variant, job.variant.absence());
      return;
    }
    WeighedRun run;
    try (ProgressLines progress = new ProgressLines(
        spec.commandLine().getErr(), job.variant.label(), job.weighing.points())) {
      run = job.weighing.run(sweep.workers(), !untimed, progress::done);
    }
    if (!run.hasPoints()) {
      table.printAbsent(job.variant, "no operating point is left: " + run.status());
      return;
    }
    Recommendation recommendation = Recommendation.of(run, wish);
    table.print(job.variant, job.scale, run, recommendation);
    document.add(job.variant, job.scale, run, recommendation);
  }
}
