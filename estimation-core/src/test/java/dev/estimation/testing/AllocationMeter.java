package dev.estimation.testing;

import com.sun.management.ThreadMXBean;
import java.lang.management.ManagementFactory;

/**
 * Measures the bytes that an action allocates on the calling thread, by the JVM's own count. What the
 * measurement itself allocates is measured too, and is the same for one call as for many, so the
 * difference of two lengths of run is what the action allocates.
 */
public final class AllocationMeter {
  private static final ThreadMXBean THREADS =
      (ThreadMXBean) ManagementFactory.getThreadMXBean();

  private AllocationMeter() {}

  /**
   * The bytes allocated by each call: (bytes of 2 n calls - bytes of n calls) / n.
   *
   * @param warmUp calls made before, so that classes are loaded and code is compiled
   * @param calls n
   * @param action what is measured
   */
  public static double bytesPerCall(int warmUp, int calls, Runnable action) {
    if (!THREADS.isThreadAllocatedMemorySupported()) {
      throw new IllegalStateException("this JVM does not count allocated bytes");
    }
    THREADS.setThreadAllocatedMemoryEnabled(true);
    bytes(warmUp, action);
    long once = bytes(calls, action);
    long twice = bytes(2 * calls, action);
    return (double) (twice - once) / calls;
  }

  private static long bytes(int calls, Runnable action) {
    long thread = Thread.currentThread().getId();
    long before = THREADS.getThreadAllocatedBytes(thread);
    for (int i = 0; i < calls; i++) {
      action.run();
    }
    return THREADS.getThreadAllocatedBytes(thread) - before;
  }
}
