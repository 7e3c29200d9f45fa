package dev.estimation.benchmarks.study;

import java.io.PrintWriter;
import me.tongfei.progressbar.DelegatingProgressBarConsumer;
import me.tongfei.progressbar.ProgressBar;
import me.tongfei.progressbar.ProgressBarBuilder;
import me.tongfei.progressbar.ProgressBarStyle;

/** How far long work has come: a line on standard error every few seconds; none if it is soon done. */
final class ProgressLines implements AutoCloseable {
  private static final int INTERVAL_MILLIS = 5000;
  private static final int WIDTH = 79;

  private final ProgressBar bar;

  ProgressLines(PrintWriter err, String task, long tasks) {
    this.bar = new ProgressBarBuilder()
        .setTaskName(task)
        .setInitialMax(tasks)
        .setStyle(ProgressBarStyle.ASCII)
        .setUpdateIntervalMillis(INTERVAL_MILLIS)
        .setConsumer(new DelegatingProgressBarConsumer(line -> print(err, line), WIDTH))
        .build();
  }

  /** May be called by any thread. */
  void done() {
    bar.step();
  }

  private void print(PrintWriter err, String line) {
    if (bar != null && bar.getTotalElapsed().toMillis() >= INTERVAL_MILLIS) {
      err.println(line);
      err.flush();
    }
  }

  @Override
  public void close() {
    bar.close();
  }
}
