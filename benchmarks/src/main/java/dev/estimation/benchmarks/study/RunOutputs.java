package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.page.PageRun;
import dev.estimation.benchmarks.page.ReplayPage;
import dev.estimation.benchmarks.replay.Quantity;
import dev.estimation.benchmarks.replay.ReplayCase;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.VariableNames;
import java.nio.file.Path;
import java.util.List;

/** What is written of runs: the steps of each as it comes, and results and page of all at the end. */
final class RunOutputs {
  private static final String RESULTS = "results.json";
  private static final String PAGE = "replay.html";

  private final ReplayCase replayed;
  private final ResultsFolder folder;
  private final ResultsDocument document;
  private final ReplayPage page;
  private final FileNames names = new FileNames();
  private int files;

  /**
   * Nothing yet.
   *
   * @param log as typed; null if there is none
   * @param runs how many there will be
   */
  RunOutputs(String caseName, String log, ReplayCase replayed, ResultsFolder folder, int runs) {
    this.replayed = replayed;
    this.folder = folder;
    this.document = new ResultsDocument(caseName, log);
    this.page = new ReplayPage(caseName, log, runs);
  }

  void add(LabelledRun run) {
    VariableNames variables = replayed.names(run.variant().name());
    document.add(run, run.result().map(result -> writeSteps(run, variables)).orElse(null));
    page.add(
        run.variant(),
        variables,
        new PageRun(
            run.name(), run.kind(), run.smoothed(), run.status(), run.result(), run.trace()));
  }

  private String writeSteps(LabelledRun run, VariableNames variables) {
    Scenario scenario = run.variant().scenario().orElseThrow();
    List<Quantity> state = variables.stateOf(scenario.motion().stateSpace());
    StepsFile steps = new StepsFile(scenario, run.result().orElseThrow(), run.trace(), state);
    String name = names.next(".csv", "steps", run.variant().label(), run.name());
    folder.write(name, steps::writeTo);
    files++;
    return name;
  }

  /** {@return how many files of steps there are, in words} */
  String stepsFiles() {
    return files + (files == 1 ? " file" : " files") + " of steps beside it";
  }

  Path writeResults() {
    return folder.write(RESULTS, document.root());
  }

  Path writePage() {
    return folder.write(PAGE, page::writeTo);
  }
}
