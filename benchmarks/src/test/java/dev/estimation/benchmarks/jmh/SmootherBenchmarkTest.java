package dev.estimation.benchmarks.jmh;

import static org.junit.jupiter.api.Assertions.assertEquals;

import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.smoother.SmoothedTrack;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What the benchmark of the smoother measures is right before it is fast. */
class SmootherBenchmarkTest {
  /** 1e-7 standard deviations: two ways of writing the same, 1000 steps back, in one of them with subtractions. */
  @ParameterizedTest
  @CsvSource({
    "linear, covariance",
    "linear, square-root",
    "unscented, covariance",
    "unscented, square-root",
    "cubature, covariance",
    "cubature, square-root",
    "hermite3, covariance",
    "hermite3, square-root"
  })
  void plainPassGivesTheSmoothedTrack(String method, String form) {
    SmootherBenchmark benchmark = new SmootherBenchmark();
    benchmark.method = method;
    benchmark.form = form;
    benchmark.make();
    PlainSmoother plain = benchmark.plainEjml();
    requireSame(plain, benchmark.backward());
    requireSame(plain, benchmark.whole());
    Estimate last = benchmark.filterOnly();
    for (int i = 0; i < 5; i++) {
      assertEquals(last.mean(i), plain.mean(SmootherBenchmark.STEPS, i), 0);
    }
  }

  private static void requireSame(PlainSmoother plain, SmoothedTrack track) {
    for (int k = 0; k < track.size(); k++) {
      for (int i = 0; i < 5; i++) {
        double deviation = Math.sqrt(track.covariance(k, i, i));
        assertEquals(plain.mean(k, i), track.mean(k, i), 1e-7 * deviation, "step " + k);
        for (int j = 0; j < 5; j++) {
          double scale = deviation * Math.sqrt(track.covariance(k, j, j));
          assertEquals(plain.covariance(k, i, j), track.covariance(k, i, j), 1e-7 * scale);
        }
      }
    }
  }
}
