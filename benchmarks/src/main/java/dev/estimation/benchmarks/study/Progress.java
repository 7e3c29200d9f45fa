package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.replay.RunFollower;
import dev.estimation.benchmarks.replay.Snapshot;
import java.lang.reflect.Method;
import me.tongfei.progressbar.ConsoleProgressBarConsumer;
import me.tongfei.progressbar.ProgressBar;
import me.tongfei.progressbar.ProgressBarBuilder;
import me.tongfei.progressbar.ProgressBarStyle;

/**
 * Shows on standard error how far a run is, once it has taken a while, and only where someone sits before a terminal. The
 * bar is wiped away before the next line of the table.
 */
final class Progress {
  private static final long PATIENCE = 1_000_000_000L; // ns
  private static final int WIDTH = 78;
  private static final int INTERVAL = 250; // ms

  private final boolean interactive;

  private Progress(boolean interactive) {
    this.interactive = interactive;
  }

  /** {@return progress for the terminal that this program was started from, if there is one} */
  static Progress onTerminal() {
    return new Progress(hasTerminal());
  }

  /** {@return progress that is never shown} */
  static Progress silent() {
    return new Progress(false);
  }

  @SuppressWarnings("SystemConsoleNull") // what newer versions do is asked of the console itself
  private static boolean hasTerminal() {
    if (System.console() == null || "dumb".equals(System.getenv("TERM"))) {
      return false;
    }
    try {
      // From Java 22 on there may be a console without a terminal, and a method that tells.
      Method tells = System.console().getClass().getMethod("isTerminal");
      return (boolean) tells.invoke(System.console());
    } catch (NoSuchMethodException olderJava) {
      return true;
    } catch (ReflectiveOperationException | RuntimeException unknown) {
      return false;
    }
  }

  /** {@return how a run of so many steps comes on} */
  Bar begin(String name, int steps) {
    return new Bar(name, steps);
  }

  /** One run. */
  final class Bar implements RunFollower, AutoCloseable {
    private final String name;
    private final int steps;
    private final long begun = System.nanoTime();
    private ProgressBar shown;
    private long count;

    private Bar(String name, int steps) {
      this.name = name;
      this.steps = steps;
    }

    @Override
    public void done(Snapshot snapshot) {
      count++;
      if (shown != null) {
        shown.stepTo(count);
      } else if (interactive && System.nanoTime() - begun > PATIENCE) {
        show();
      }
    }

    private void show() {
      shown = new ProgressBarBuilder()
          .setTaskName(name)
          .setInitialMax(steps)
          .setUnit(" steps", 1)
          .setUpdateIntervalMillis(INTERVAL)
          .setStyle(ProgressBarStyle.ASCII)
          .setConsumer(new ConsoleProgressBarConsumer(System.err, WIDTH))
          .clearDisplayOnFinish()
          .build();
      shown.stepTo(count);
    }

    @Override
    public void close() {
      if (shown != null) {
        shown.close();
      }
    }
  }
}
