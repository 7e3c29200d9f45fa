package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.ReplayCase;
import java.lang.reflect.InvocationTargetException;

/** Makes a case of a class on the class path: public, with a public constructor without arguments. */
final class CaseClass {
  private CaseClass() {}

  static ReplayCase open(String name) {
    Class<?> type = find(name);
    if (!ReplayCase.class.isAssignableFrom(type)) {
      throw new BadInputException(
          "case class " + name + " must implement " + ReplayCase.class.getName());
    }
    try {
      return (ReplayCase) type.getConstructor().newInstance();
    } catch (InvocationTargetException thrown) {
      throw thrown(name, thrown.getCause());
    } catch (ExceptionInInitializerError thrown) {
      throw thrown(name, thrown.getCause());
    } catch (ReflectiveOperationException unfit) {
      throw new BadInputException(
          "case class " + name + " must be public and have a public constructor without arguments",
          unfit);
    }
  }

  private static Class<?> find(String name) {
    try {
      return Class.forName(name, false, Thread.currentThread().getContextClassLoader());
    } catch (ClassNotFoundException | LinkageError absent) {
      throw new BadInputException(
          "case class not found on the class path: '" + name + "' (" + absent + ")", absent);
    }
  }

  private static BadInputException thrown(String name, Throwable cause) {
    return cause instanceof BadInputException told
        ? told
        : new BadInputException("constructor of case class " + name + " threw " + cause, cause);
  }
}
