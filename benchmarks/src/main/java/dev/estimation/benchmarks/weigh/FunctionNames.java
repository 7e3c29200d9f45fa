package dev.estimation.benchmarks.weigh;

import java.util.List;

/** Names of motions and sensors, for reading: those of their classes. */
final class FunctionNames {
  private FunctionNames() {}

  static String of(Object model) {
    Object named = model instanceof ScaledSensor scaled ? scaled.original() : model;
    String name = named.getClass().getName();
    return name.substring(name.lastIndexOf('.') + 1).replace('$', '.');
  }

  /** The name, with a number if it is taken: two sensors of one class are two functions. */
  static String unused(String name, List<String> taken) {
    String result = name;
    for (int number = 2; taken.contains(result); number++) {
      result = name + " " + number;
    }
    return result;
  }
}
