package dev.estimation.benchmarks.weigh;

import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.Callable;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.Future;

/**
 * A number of threads for work that falls into independent tasks.
 *
 * @param threads 1 or more
 */
public record Workers(int threads) {
  /** Refuses no threads. */
  public Workers {
    if (threads < 1) {
      throw new IllegalArgumentException("threads must be 1 or more, got " + threads);
    }
  }

  /** {@return as many as there are cores} */
  public static Workers onAllCores() {
    return new Workers(Runtime.getRuntime().availableProcessors());
  }

  /**
   * Does all tasks. If one fails the rest is given up and the failure thrown on.
   *
   * @return their results, in the order of the tasks
   */
  public <T> List<T> run(List<Callable<T>> tasks) {
    ExecutorService pool = Executors.newFixedThreadPool(threads);
    try {
      List<T> results = new ArrayList<>();
      for (Future<T> future : tasks.stream().map(pool::submit).toList()) {
        results.add(future.get());
      }
      return results;
    } catch (ExecutionException failed) {
      throw asUnchecked(failed.getCause());
    } catch (InterruptedException interrupted) {
      Thread.currentThread().interrupt();
      throw (CancellationException)
          new CancellationException("work was interrupted").initCause(interrupted);
    } finally {
      pool.shutdownNow();
    }
  }

  private static RuntimeException asUnchecked(Throwable cause) {
    if (cause instanceof Error error) {
      throw error;
    }
    return cause instanceof RuntimeException unchecked
        ? unchecked
        : new IllegalStateException(cause);
  }
}
