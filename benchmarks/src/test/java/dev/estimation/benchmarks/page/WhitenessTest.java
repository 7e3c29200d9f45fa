package dev.estimation.benchmarks.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;

class WhitenessTest {
  /** Worked by hand: products of neighbours are -1, and there are 7 of them to 8 squares. */
  @Test
  void alternatingSignsAreAntiCorrelated() {
    Whiteness whiteness = new Whiteness(new double[] {1, -1, 1, -1, 1, -1, 1, -1});
    assertEquals(-7.0 / 8, whiteness.correlation(1), 1e-15); // one rounding
    assertEquals(6.0 / 8, whiteness.correlation(2), 1e-15);
    assertEquals(2, whiteness.lags());
    assertEquals(1.96 / Math.sqrt(8), whiteness.bound(), 1e-15);
  }

  @Test
  void nothingIsKnownOfZeros() {
    assertTrue(Double.isNaN(new Whiteness(new double[8]).correlation(1)));
    assertEquals(0, new Whiteness(new double[3]).lags());
  }

  /** One fixed draw of 4000 values, 40 lags of level 5 %: more than 8 outside has probability 1e-4 to 1e-3; seed fixed. */
  @Test
  void whiteNoiseKeepsTheBound() {
    Random random = new Random(3);
    Whiteness whiteness = new Whiteness(random.doubles(4000, -1, 1).toArray());
    long outside = 0;
    for (int lag = 1; lag <= whiteness.lags(); lag++) {
      outside += Math.abs(whiteness.correlation(lag)) > whiteness.bound() ? 1 : 0;
    }
    assertTrue(outside <= 8, "got " + outside);
  }
}
