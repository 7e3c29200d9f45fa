package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.math.BigDecimal;
import java.math.MathContext;

/** Numbers of the page, rounded to what can be seen; what is not finite is null. */
final class Numbers {
  private static final MathContext SEEN = new MathContext(5);
  /** Places may be millions of metres large and known to centimetres. */
  private static final MathContext PLACE = new MathContext(10);

  private Numbers() {}

  static void add(ArrayNode array, double value) {
    add(array, value, SEEN);
  }

  static void addPlace(ArrayNode array, double value) {
    add(array, value, PLACE);
  }

  private static void add(ArrayNode array, double value, MathContext digits) {
    if (Double.isFinite(value)) {
      array.add(new BigDecimal(value).round(digits).doubleValue());
    } else {
      array.addNull();
    }
  }

  /** Puts a number with all its digits. */
  static void put(ObjectNode node, String name, double value) {
    if (Double.isFinite(value)) {
      node.put(name, value);
    } else {
      node.putNull(name);
    }
  }
}
