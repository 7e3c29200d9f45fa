package dev.estimation.benchmarks.replay;

import dev.estimation.core.space.FlatSpace;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;

/**
 * Truth between recorded fixes, linear between two neighbours, angles along the shorter arc. Where
 * neighbours lie too far apart, or one of them is not good enough, there is no truth.
 */
public final class InterpolatedTruth implements Truth {
  private final int[] components;
  private final FlatSpace space;
  private final double largestGap;
  private final List<Fix> fixes;

  private InterpolatedTruth(Builder builder, List<Fix> fixes) {
    this.components = builder.components;
    this.space = builder.space;
    this.largestGap = builder.largestGap;
    this.fixes = fixes;
  }

  /** Collects fixes in any order of time. */
  public static final class Builder {
    private final List<Fix> fixes = new ArrayList<>();
    private final int[] components;
    private final FlatSpace space;
    private final double largestGap;

    /**
     * Nothing yet; all values are reals.
     *
     * @param largestGap between neighbours (s)
     * @param components of the state that fixes tell
     */
    public Builder(double largestGap, int... components) {
      this(largestGap, Space.reals(components.length), components);
    }

    /**
     * Nothing yet.
     *
     * @param largestGap between neighbours (s)
     * @param space of the values: which of them are angles
     * @param components of the state that fixes tell
     */
    public Builder(double largestGap, FlatSpace space, int... components) {
      this.largestGap = largestGap;
      this.space = space;
      this.components = components.clone();
    }

    /** Adds a fix; one that is not good enough voids the truth on both its sides. */
    public void add(double time, boolean goodEnough, double... values) {
      fixes.add(new Fix(time, goodEnough, values.clone()));
    }

    /** {@return the truth, or nothing if there are no fixes} */
    public Optional<Truth> build() {
      List<Fix> sorted = new ArrayList<>(fixes);
      sorted.sort(Comparator.comparingDouble(fix -> fix.time));
      return sorted.isEmpty() ? Optional.empty() : Optional.of(new InterpolatedTruth(this, sorted));
    }
  }

  private static final class Fix {
    final double time;
    final boolean goodEnough;
    final double[] values;

    Fix(double time, boolean goodEnough, double[] values) {
      this.time = time;
      this.goodEnough = goodEnough;
      this.values = values;
    }
  }

  @Override
  public int[] components() {
    return components.clone();
  }

  @Override
  public FlatSpace space() {
    return space;
  }

  @Override
  public boolean at(double time, double[] values) {
    int after = firstNotBefore(time);
    if (interpolate(after - 1, time, values)) {
      return true;
    }
    // At the very time of a fix the pair that follows serves as well as the one that ends there.
    return after < fixes.size()
        && fixes.get(after).time == time
        && interpolate(after, time, values);
  }

  private int firstNotBefore(double time) {
    int low = 0;
    int high = fixes.size();
    while (low < high) {
      int middle = (low + high) >>> 1;
      if (fixes.get(middle).time < time) {
        low = middle + 1;
      } else {
        high = middle;
      }
    }
    return low;
  }

  /** Interpolates between a fix and its successor, if both exist and are fit for it. */
  private boolean interpolate(int index, double time, double[] values) {
    if (index < 0 || index + 1 >= fixes.size()) {
      return false;
    }
    Fix before = fixes.get(index);
    Fix after = fixes.get(index + 1);
    double gap = after.time - before.time;
    if (!(before.goodEnough && after.goodEnough && gap <= largestGap)) {
      return false;
    }
    double part = gap > 0 ? (time - before.time) / gap : 0;
    double[] change = new double[components.length];
    space.difference(after.values, before.values, change);
    for (int i = 0; i < change.length; i++) {
      change[i] *= part;
    }
    space.displace(before.values, change, values);
    return true;
  }
}
