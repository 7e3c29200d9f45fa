package dev.estimation.benchmarks.page;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ThinningTest {
  @Test
  void shortSeriesAreWhole() {
    assertArrayEquals(new int[] {0, 1, 2, 3}, new Thinning(5).of(4).toArray());
    assertEquals(1, new Thinning(5).stride(4));
    assertEquals(0, new Thinning(5).of(0).count());
  }

  @Test
  void theLastPointIsAlwaysDrawn() {
    assertArrayEquals(new int[] {0, 3, 6, 9, 10}, new Thinning(5).of(11).toArray());
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 5, 6, 99, 1000, 70_001})
  void noMoreThanTheLimitRemain(int count) {
    int[] drawn = new Thinning(5).of(count).toArray();
    assertTrue(drawn.length <= 5, "got " + drawn.length);
    assertEquals(count - 1, drawn[drawn.length - 1]);
  }

  @Test
  void manyRunsGetFewerPointsEach() {
    assertEquals(2000, Thinning.of(6, 30).limit());
    assertEquals(1018, Thinning.of(36, 30).limit());
    assertEquals(200, Thinning.of(1000, 30).limit());
  }
}
