package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Replayer;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.weigh.ScenarioChange;
import java.io.PrintWriter;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** Replays a log with every combination of noise scale, lag and method, on all cores; takes no times. */
@Command(
    name = "sweep",
    description = "Replays a log over lists of noise scales, lags and methods, on all cores.")
final class SweepCommand implements Callable<Integer> {
  @Mixin
  private CaseOptions cases = new CaseOptions();

  @Mixin
  private SweepOptions sweep = new SweepOptions();

  @Option(
      names = "--extra-lag",
      paramLabel = "S,...",
      description = "how much earlier than said everything was measured (s; default 0)")
  private String lags = "0";

  @Option(
      names = "--method",
      paramLabel = "METHOD",
      description = "repeatable: " + MethodParser.FORMS + "; KAPPA may be N-n, n the dimension")
  private List<String> methods = new ArrayList<>();

  @Option(names = "--out", paramLabel = "FOLDER", description = "for sweep.json (default results)")
  private String out = "results";

  @Spec
  private CommandSpec spec;

  /** One combination, on a scenario that is already changed. */
  private record Cell(
      LoadedVariant variant, ScenarioChange change, Method method, Scenario scenario) {
    LabelledRun run() {
      Replayer replayer = Trial.of(variant.name(), scenario, method);
      return new LabelledRun(
          variant,
          method.typed(),
          false,
          false,
          false,
          method.kind(),
          Optional.of(replayer.run()),
          Optional.empty());
    }
  }

  @Override
  public Integer call() {
    List<Cell> cells = cells();
    ResultsFolder folder = ResultsFolder.prepare(out);
    List<LabelledRun> runs;
    try (ProgressLines progress =
        new ProgressLines(spec.commandLine().getErr(), "sweep", cells.size())) {
      List<Callable<LabelledRun>> tasks = new ArrayList<>();
      for (Cell cell : cells) {
        tasks.add(() -> {
          LabelledRun run = cell.run();
          progress.done();
          return run;
        });
      }
      runs = sweep.workers().run(tasks);
    }
    show(cells, runs, folder);
    return 0;
  }

  private List<Cell> cells() {
    List<String> typed = methods.isEmpty() ? MethodParser.DEFAULT : methods;
    List<Method> chosen =
        new LinkedHashSet<>(typed).stream().map(MethodParser::parse).toList();
    List<Double> scales = sweep.noiseScales();
    List<Double> extra = SweepOptions.numbers("--extra-lag", lags);
    List<Cell> cells = new ArrayList<>();
    for (LoadedVariant variant : cases.load()) {
      for (Scenario scenario : variant.scenario().stream().toList()) {
        chosen.forEach(method -> Trial.of(variant.name(), scenario, method));
        for (double lag : extra) {
          for (double scale : scales) {
            ScenarioChange change = new ScenarioChange(scale, sweep.rows(), lag);
            Scenario changed = change.of(scenario);
            chosen.forEach(method -> cells.add(new Cell(variant, change, method, changed)));
          }
        }
      }
    }
    if (cells.isEmpty()) {
      throw new BadInputException("no variant of case " + cases.name() + " is in this log");
    }
    return cells;
  }

  private void show(List<Cell> cells, List<LabelledRun> runs, ResultsFolder folder) {
    PrintWriter console = spec.commandLine().getOut();
    SweepTable table = new SweepTable(console);
    ResultsDocument document = new ResultsDocument(cases.name(), cases.log());
    for (int i = 0; i < runs.size(); i++) {
      ScenarioChange change = cells.get(i).change();
      table.print(change, runs.get(i));
      document.add(runs.get(i), null);
      ObjectNode node = (ObjectNode) document.root().get("runs").get(i);
      node.put("noiseScale", change.noiseScale());
      node.put("extraLag", change.lag());
      node.remove("nanosPerStep"); // of a run beside others: tells nothing
    }
    console.println();
    console.println("Results: " + folder.write("sweep.json", document.root()));
    console.flush();
  }
}
