package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class FileNamesTest {
  private final FileNames names = new FileNames();

  @Test
  void unusualCharactersAreReplaced() {
    assertEquals("a-unscented_1_0_3-n.csv", names.next(".csv", "a", "unscented:1,0,3-n"));
    assertEquals(".._.._etc-x.csv", names.next(".csv", "../../etc", "x"));
    assertEquals("yard_a_-linear.csv", names.next(".csv", "yard \u00e9<\n>a\"", "linear"));
  }

  @Test
  void equalNamesAreNumbered() {
    assertEquals("a-hermite_3.csv", names.next(".csv", "a", "hermite:3"));
    assertEquals("a-hermite_3-2.csv", names.next(".csv", "a", "hermite 3"));
    assertEquals("A-Hermite_3-3.csv", names.next(".csv", "A", "Hermite:3"), "letters of any size");
  }

  @Test
  void longNamesAreCut() {
    String first = names.next(".csv", "x".repeat(500), "linear");
    String second = names.next(".csv", "x".repeat(500), "cubature");
    assertTrue(first.length() < 200);
    assertEquals(first.replace(".csv", "-2.csv"), second);
  }
}
