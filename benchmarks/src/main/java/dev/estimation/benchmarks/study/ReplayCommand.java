package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.cases.balloon.BalloonCase;
import dev.estimation.benchmarks.cases.uwb.UwbCase;
import dev.estimation.benchmarks.cases.vessel.VesselCase;
import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import java.io.PrintWriter;
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
  private static final String DEMO = "demo";

  @Option(names = "--case", paramLabel = "NAME", description = "vessel, uwb or demo (the default)")
  private String caseName = DEMO;

  @Option(names = "--variant", paramLabel = "NAME", description = "repeatable; all if not given")
  private List<String> variants = new ArrayList<>();

  @Option(names = "--log", paramLabel = "FOLDER", description = "the recorded log")
  private String log;

  @Option(
      names = "--method",
      paramLabel = "METHOD",
      description = "repeatable: " + MethodParser.FORMS + "; KAPPA may be N-n, n the dimension")
  private List<String> methods = new ArrayList<>();

  @Option(names = "--whole-state", description = "draw points over the whole state in updates too")
  private boolean wholeState;

  @Option(
      names = "--out",
      paramLabel = "FOLDER",
      description = "for results.json (default results)")
  private String out = "results";

  @Mixin
  private UwbOptions uwb = new UwbOptions();

  @Spec
  private CommandSpec spec;

  @Override
  public Integer call() {
    List<Method> chosenMethods = chosenMethods();
    ReplayCase replayed = open();
    List<LoadedVariant> loaded = load(replayed);
    ResultsFolder folder = ResultsFolder.prepare(out);
    Comparison comparison = new Comparison(loaded, chosenMethods, wholeState);
    PrintWriter console = spec.commandLine().getOut();
    ResultTable table = new ResultTable(console);
    ResultsDocument document = new ResultsDocument(caseName, log);
    comparison.run(run -> {
      table.print(run);
      document.add(run);
    });
    table.printNotes();
    console.println("Results: " + folder.write(document.root()));
    console.flush();
    return 0;
  }

  private List<Method> chosenMethods() {
    List<String> typed = methods.isEmpty() ? MethodParser.DEFAULT : methods;
    return new LinkedHashSet<>(typed).stream().map(MethodParser::parse).toList();
  }

  private ReplayCase open() {
    if (!caseName.equals("uwb")) {
      uwb.requireUnused(caseName);
    }
    return switch (caseName) {
      case "vessel" -> new VesselCase(requireLog());
      case "uwb" -> new UwbCase(requireLog(), uwb.settings());
      case DEMO -> {
        requireNoLog();
        yield new BalloonCase();
      }
      default ->
        throw new BadInputException(
            "--case must be one of vessel, uwb, demo; got '" + caseName + "'");
    };
  }

  private void requireNoLog() {
    if (log != null) {
      throw new BadInputException("case demo is simulated and reads no --log, got " + log
          + "; name the log's --case: vessel or uwb");
    }
  }

  private LogFolder requireLog() {
    if (log == null) {
      throw new BadInputException("case " + caseName + " wants --log FOLDER, got none");
    }
    return LogFolder.open(log);
  }

  private List<LoadedVariant> load(ReplayCase replayed) {
    List<String> names = variants.isEmpty() ? replayed.variants() : variants;
    for (String name : names) {
      if (!replayed.variants().contains(name)) {
        throw new BadInputException("--variant of case " + caseName + " must be one of "
            + String.join(", ", replayed.variants()) + "; got '" + name + "'");
      }
    }
    return new LinkedHashSet<>(names).stream().map(replayed::load).toList();
  }
}
