package dev.estimation.testing;

import com.sun.management.ThreadMXBean;
import java.lang.management.ManagementFactory;

/**
 * Measures the bytes that an action allocates on the calling thread, by the JVM's own count.
 *
 * <p>The JVM itself allocates a few bytes now and then on behalf of a thread, when it compiles or
 * links code. What the action allocates is in every window of many calls, so the smallest of
 * several windows is taken; an object at each call is at least 16 bytes a call in all of them. Five
 * windows were once too few: on a loaded machine the compiler was still at work in all of them.
 */
public final class AllocationMeter {
  private static final ThreadMXBean THREADS = (ThreadMXBean) ManagementFactory.getThreadMXBean();

  private AllocationMeter() {}

  /**
   * The bytes allocated by each call, in the best of up to 50 windows; the first without any ends it.
   *
   * @param warmUp calls made before, so that classes are loaded and code is compiled
   * @param calls calls in a window
   * @param action what is measured
   */
  public static double bytesPerCall(int warmUp, int calls, Runnable action) {
    if (!THREADS.isThreadAllocatedMemorySupported()) {
      throw new IllegalStateException("this JVM does not count allocated bytes");
    }
    THREADS.setThreadAllocatedMemoryEnabled(true);
    bytes(warmUp, action);
    long fewest = Long.MAX_VALUE;
    for (int window = 0; window < 50 && fewest > 0; window++) {
      fewest = Math.min(fewest, bytes(calls, action));
    }
    return (double) fewest / calls;
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
