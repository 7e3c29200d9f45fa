package dev.estimation.filters.modelcheck;

import java.lang.management.ManagementFactory;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Method;

/**
 * The JVM's count of bytes that this thread has allocated. It is an extension of the platform, so it is asked for by
 * name, and may be missing.
 */
final class ByteCounter {
  private final Object bean;
  private final Method count;
  private final long thread = Thread.currentThread().getId();

  private ByteCounter(Object bean, Method count) {
    this.bean = bean;
    this.count = count;
  }

  /** A counter; null where the JVM has none. */
  static ByteCounter ofThisThread() {
    try {
      Class<?> type = Class.forName("com.sun.management.ThreadMXBean");
      Object bean = ManagementFactory.getThreadMXBean();
      boolean able = type.isInstance(bean)
          && (boolean) type.getMethod("isThreadAllocatedMemorySupported").invoke(bean)
          && (boolean) type.getMethod("isThreadAllocatedMemoryEnabled").invoke(bean);
      Method count = type.getMethod("getThreadAllocatedBytes", long.class);
      return able ? new ByteCounter(bean, count) : null;
    } catch (ReflectiveOperationException | LinkageError missing) {
      return null;
    }
  }

  /** Bytes so far; what asking itself allocates is among them at the next time. */
  long bytes() {
    try {
      return (long) count.invoke(bean, thread);
    } catch (IllegalAccessException | InvocationTargetException failed) {
      throw new IllegalStateException("allocated bytes could be asked for before", failed);
    }
  }
}
