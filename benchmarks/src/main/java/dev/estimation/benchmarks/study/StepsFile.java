package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.Quantity;
import dev.estimation.benchmarks.replay.RunResult;
import dev.estimation.benchmarks.replay.RunTrace;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.Snapshot;
import dev.estimation.benchmarks.replay.TruthComparison;
import dev.estimation.benchmarks.replay.UpdateRecord;
import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.space.Space;
import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.IntStream;
import org.apache.commons.csv.CSVFormat;

/**
 * A run as a table: one line for each update, one for a step without updates. The first line of a step tells its
 * prediction, the last one the estimate after it (mean, standard deviations, and, where the case has truth, errors and
 * their normalised square); what a line does not have is empty. A smoothed run has estimates alone.
 */
final class StepsFile {
  private final RunResult result;
  private final Optional<RunTrace> trace;
  private final List<Quantity> state;
  private final List<String> means;
  private final Optional<TruthComparison> truth;
  private final int innovations;
  private final List<Object> line = new ArrayList<>();

  /**
   * The table of a run.
   *
   * @param trace empty for a smoothed run
   * @param names of the state's components
   */
  StepsFile(Scenario scenario, RunResult result, Optional<RunTrace> trace, List<Quantity> names) {
    this.result = result;
    this.trace = trace;
    this.state = names;
    this.means = means(scenario.motion().stateSpace(), names);
    this.truth =
        scenario.truth().map(known -> new TruthComparison(scenario.motion().stateSpace(), known));
    this.innovations = trace.stream()
        .flatMap(kept -> kept.updates().stream())
        .mapToInt(UpdateRecord::degrees)
        .max()
        .orElse(0);
  }

  /** A state of quaternions has more numbers in its mean than standard deviations. */
  private static List<String> means(Space space, List<Quantity> names) {
    return space.storage() == space.dimension()
        ? names.stream().map(Quantity::column).toList()
        : IntStream.range(0, space.storage()).mapToObj(i -> "mean_" + i).toList();
  }

  void writeTo(Writer out) throws IOException {
    CSVFormat.RFC4180.printRecord(out, head().toArray());
    int next = 0;
    for (int step = 0; step < begun(); step++) {
      int first = next;
      while (next < updates().size() && updates().get(next).step() == step) {
        next++;
      }
      printStep(out, step, updates().subList(first, next), first);
    }
  }

  /** A step that failed was begun but not done. */
  private int begun() {
    return trace.map(kept -> kept.predictions().size()).orElse(result.steps());
  }

  private List<UpdateRecord> updates() {
    return trace.map(RunTrace::updates).orElse(List.of());
  }

  private List<String> head() {
    List<String> names = new ArrayList<>(List.of("step", "time_s"));
    if (trace.isPresent()) {
      names.addAll(List.of(
          "prediction_status",
          "prediction_evaluations",
          "prediction_jacobians",
          "row",
          "status",
          "nis",
          "nis_degrees",
          "evaluations",
          "jacobians"));
      for (int i = 1; i <= innovations; i++) {
        names.add("innovation_" + i);
        names.add("innovation_sd_" + i);
      }
    }
    names.addAll(means);
    state.forEach(quantity -> names.add("sd_" + quantity.column()));
    truth.ifPresent(known -> {
      for (int i = 0; i < known.count(); i++) {
        names.add("error_" + state.get(known.component(i)).column());
      }
      names.add("nees");
    });
    return names;
  }

  private void printStep(Writer out, int step, List<UpdateRecord> updates, int row)
      throws IOException {
    int lines = Math.max(1, updates.size());
    for (int i = 0; i < lines; i++) {
      line.clear();
      line.add(step);
      line.add(time(step));
      if (trace.isPresent()) {
        addPrediction(i == 0 ? Optional.of(trace.get().predictions().get(step)) : Optional.empty());
        addUpdate(i < updates.size() ? Optional.of(updates.get(i)) : Optional.empty(), row + i);
      }
      addEstimate(
          i == lines - 1 && step < result.steps()
              ? Optional.of(result.history().get(step))
              : Optional.empty());
      CSVFormat.RFC4180.printRecord(out, line.toArray());
    }
  }

  private double time(int step) {
    return step < result.steps()
        ? result.history().get(step).time()
        : trace.orElseThrow().predictions().get(step).time();
  }

  private void addPrediction(Optional<RunTrace.PredictionRecord> prediction) {
    prediction.ifPresentOrElse(
        made -> line.addAll(List.of(made.status(), made.evaluations(), made.jacobians())),
        () -> addEmpty(3));
  }

  private void addUpdate(Optional<UpdateRecord> made, int row) {
    if (made.isEmpty()) {
      addEmpty(6 + 2 * innovations);
      return;
    }
    UpdateRecord update = made.get();
    line.add(row);
    line.add(update.status());
    addNumber(update.normalisedSquared());
    line.addAll(List.of(update.degrees(), update.evaluations(), update.jacobians()));
    for (int i = 0; i < update.degrees(); i++) {
      addNumber(update.innovation(i));
      addNumber(update.deviation(i));
    }
    addEmpty(2 * (innovations - update.degrees()));
  }

  private void addEstimate(Optional<Snapshot> done) {
    if (done.isEmpty()) {
      addEmpty(
          means.size() + state.size() + truth.map(known -> known.count() + 1).orElse(0));
      return;
    }
    Gaussian estimate = done.get().estimate();
    for (int i = 0; i < means.size(); i++) {
      addNumber(estimate.mean(i));
    }
    for (int i = 0; i < state.size(); i++) {
      addNumber(estimate.standardDeviation(i));
    }
    truth.ifPresent(known -> addErrors(known, done.get()));
  }

  private void addErrors(TruthComparison known, Snapshot done) {
    if (!known.compare(done.time(), done.estimate())) {
      addEmpty(known.count() + 1);
      return;
    }
    for (int i = 0; i < known.count(); i++) {
      addNumber(known.error(i));
    }
    addNumber(known.normalisedSquared());
  }

  private void addNumber(double value) {
    line.add(Double.isFinite(value) ? value : null);
  }

  private void addEmpty(int count) {
    for (int i = 0; i < count; i++) {
      line.add(null);
    }
  }
}
