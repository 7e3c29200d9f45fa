package dev.estimation.benchmarks.replay;

/**
 * What a component of a state or measurement is.
 *
 * @param name a word or two
 * @param unit SI or radians; empty if it is not known
 */
public record Quantity(String name, String unit) {
  /** {@return a quantity told as {@code name [unit]}, or by its name alone} */
  public static Quantity parse(String text) {
    int bracket = text.indexOf(" [");
    return bracket < 0
        ? new Quantity(text, "")
        : new Quantity(text.substring(0, bracket), text.substring(bracket + 2, text.length() - 1));
  }

  /** {@return name and unit for a reader} */
  public String title() {
    return unit.isEmpty() ? name : name + " (" + unit + ")";
  }

  /** {@return name and unit as the name of a column: letters, digits and underscores} */
  public String column() {
    String whole = unit.isEmpty() ? name : name + "_" + unit.replace("/", "_per_");
    return whole.replaceAll("[^A-Za-z0-9]+", "_");
  }
}
