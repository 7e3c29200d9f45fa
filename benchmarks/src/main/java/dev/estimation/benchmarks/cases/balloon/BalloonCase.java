package dev.estimation.benchmarks.cases.balloon;

import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import java.util.List;

/** A weather balloon. */
public final class BalloonCase implements ReplayCase {
  private static final String FLIGHT = "flight";
  private static final long SEED = 1;

  @Override
  public List<String> variants() {
    return List.of(FLIGHT);
  }

  @Override
  public LoadedVariant load(String variant) {
    if (!variant.equals(FLIGHT)) {
      throw new IllegalArgumentException("variant must be " + FLIGHT + ", got " + variant);
    }
    return LoadedVariant.of(FLIGHT, "demo", new BalloonFlight(SEED).fly());
  }
}
