package dev.estimation.benchmarks.replay;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * What the components of a state and of its measurements are, for readers of results.
 *
 * @param state one for each component of the state; empty if that is not known
 * @param measurement one for each component of a measurement; empty if that is not known
 * @param planes in which a track is drawn, the first one first; empty if that is not known
 */
public record VariableNames(List<Quantity> state, List<Quantity> measurement, List<Plane> planes) {
  /** Nothing is known. */
  public static final VariableNames NONE = new VariableNames(List.of(), List.of(), List.of());

  private static final int MOST_PLANE_COMPONENTS = 3;

  /** Keeps copies. */
  public VariableNames {
    state = List.copyOf(state);
    measurement = List.copyOf(measurement);
    planes = List.copyOf(planes);
  }

  /**
   * Two components of a state.
   *
   * @param across drawn from left to right
   * @param up drawn from below to above
   */
  public record Plane(int across, int up) {}

  /** {@return names of a state, each as {@code name [unit]}} */
  public static VariableNames ofState(String... quantities) {
    return new VariableNames(parse(quantities), List.of(), List.of());
  }

  /** {@return these with names of measurements, each as {@code name [unit]}} */
  public VariableNames withMeasurement(String... quantities) {
    return new VariableNames(state, parse(quantities), planes);
  }

  /** {@return these with a further plane for tracks} */
  public VariableNames withPlane(int across, int up) {
    List<Plane> more = new ArrayList<>(planes);
    more.add(new Plane(across, up));
    return new VariableNames(state, measurement, more);
  }

  private static List<Quantity> parse(String... quantities) {
    return Arrays.stream(quantities).map(Quantity::parse).toList();
  }

  /** {@return one for each component of a state, by number where they are not known} */
  public List<Quantity> stateOf(Space space) {
    return orNumbers(state, space);
  }

  /** {@return one for each component of a measurement, by number where they are not known} */
  public List<Quantity> measurementOf(Space space) {
    return orNumbers(measurement, space);
  }

  private static List<Quantity> orNumbers(List<Quantity> known, Space space) {
    if (known.size() == space.dimension()) {
      return known;
    }
    List<Quantity> numbered = new ArrayList<>();
    for (int i = 0; i < space.dimension(); i++) {
      boolean angle = space instanceof FlatSpace flat && flat.isAngle(i);
      numbered.add(new Quantity("component " + i, angle ? "rad" : ""));
    }
    return numbered;
  }

  /**
   * {@return the planes of a state, pairs of its first components where they are not known; none if it has quaternions,
   * whose components and standard deviations do not pair}
   */
  public List<Plane> planesOf(Space space) {
    if (!planes.isEmpty() || space.storage() != space.dimension()) {
      return planes;
    }
    List<Plane> pairs = new ArrayList<>();
    int count = Math.min(MOST_PLANE_COMPONENTS, space.dimension());
    for (int i = 0; i < count; i++) {
      for (int j = i + 1; j < count; j++) {
        pairs.add(new Plane(i, j));
      }
    }
    return pairs;
  }
}
