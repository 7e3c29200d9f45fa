package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Option;
import picocli.CommandLine.Spec;

/** Replays a log, or the simulated flight, with some methods and shows how they compare. */
@Command(
    name = "replay",
    description = "Replays a log with several methods; without arguments, a simulated flight.")
final class ReplayCommand implements Callable<Integer> {
  @Mixin
  private CaseOptions cases = new CaseOptions();

  @Option(
      names = "--method",
      paramLabel = "METHOD",
      description = "repeatable: " + MethodParser.FORMS + "; KAPPA may be N-n, n the dimension")
  private List<String> methods = new ArrayList<>();

  @Option(
      names = "--whole-state",
      description = "draw points over the whole state, not over active inputs alone")
  private boolean wholeState;

  @Option(
      names = "--square-root",
      description = "carry factors of covariances, which keeps more digits")
  private boolean squareRoot;

  @Option(names = "--smooth", description = "also smooth each run and report that")
  private boolean smooth;

  @Option(
      names = "--out",
      paramLabel = "FOLDER",
      description = "for results.json, replay.html and the steps of each run (default results)")
  private String out = "results";

  @Spec
  private CommandSpec spec;

  @Override
  public Integer call() {
    List<Method> chosenMethods = chosenMethods();
    ReplayCase replayed = cases.open();
    List<LoadedVariant> loaded = cases.load(replayed);
    ResultsFolder folder = ResultsFolder.prepare(out);
    Comparison comparison = new Comparison(loaded, chosenMethods, wholeState, squareRoot, smooth);
    PrintWriter console = spec.commandLine().getOut();
    ResultTable table =
        new ResultTable(console, LabelledRun.longestName(chosenMethods, squareRoot));
    RunOutputs outputs =
        new RunOutputs(cases.name(), cases.log(), replayed, folder, comparison.size());
    comparison.run(Progress.onTerminal(), run -> {
      table.print(run);
      outputs.add(run);
    });
    table.printNotes();
    Path page = outputs.writePage();
    console.println("Results: " + outputs.writeResults() + " and " + outputs.stepsFiles());
    console.println("Page: " + page);
    console.flush();
    return 0;
  }

  private List<Method> chosenMethods() {
    List<String> typed = methods.isEmpty() ? MethodParser.DEFAULT : methods;
    return new LinkedHashSet<>(typed).stream().map(MethodParser::parse).toList();
  }
}
