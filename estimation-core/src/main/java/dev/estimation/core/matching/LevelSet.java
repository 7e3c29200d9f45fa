package dev.estimation.core.matching;

import java.util.Arrays;

/**
 * Levels on several axes, (l_1, ..., l_k), closed downwards: with each set member, those of one level less on
 * an axis are members too. Each holds a block of nodes that no member below it has, and a block of coefficients. A
 * new member is one above an old one on some axis. Nothing is allocated after construction. <i>Confined to one thread.</i>
 */
final class LevelSet {
  static final int NONE = -1;
  static final int CLOSED = -2;

  private final NestedProjection projection;
  private final int axes;
  private final byte[] levels;
  private final int[] below;
  private final int[] above;
  private final int[] firstNode;
  private final int[] firstCoefficient;
  private int size;
  private boolean deep;

  /** A set of so many nodes at most. */
  LevelSet(NestedProjection projection, int axes, int mostNodes) {
    this.projection = projection;
    this.axes = axes;
    int capacity = 1 + mostNodes / 2; // each member but the first has 2 nodes or more
    this.levels = new byte[capacity * axes];
    this.below = new int[capacity * axes];
    this.above = new int[capacity * axes];
    this.firstNode = new int[capacity + 1];
    this.firstCoefficient = new int[capacity + 1];
  }

  /** Begins anew, with the one member of level 0 on all axes. */
  void begin() {
    size = 1;
    deep = false;
    Arrays.fill(levels, 0, axes, (byte) 0);
    Arrays.fill(below, 0, axes, NONE);
    Arrays.fill(above, 0, axes, NONE);
    firstNode[1] = 1;
    firstCoefficient[1] = 1;
  }

  int size() {
    return size;
  }

  /** Whether a member has been added with levels on several axes that sum to 3 or more. */
  boolean isDeep() {
    return deep;
  }

  private boolean isDeep(int member) {
    int sum = 0;
    int highest = 0;
    for (int axis = 0; axis < axes; axis++) {
      sum += level(member, axis);
      highest = Math.max(highest, level(member, axis));
    }
    return sum >= 3 && sum > highest;
  }

  int level(int member, int axis) {
    return levels[member * axes + axis];
  }

  /** The member of one level less on an axis, or NONE. */
  int below(int member, int axis) {
    return below[member * axes + axis];
  }

  /** The member of one level more on an axis, NONE, or CLOSED. */
  int above(int member, int axis) {
    return above[member * axes + axis];
  }

  int firstNode(int member) {
    return firstNode[member];
  }

  int nodes(int member) {
    return firstNode[member + 1] - firstNode[member];
  }

  int firstCoefficient(int member) {
    return firstCoefficient[member];
  }

  int coefficients(int member) {
    return firstCoefficient[member + 1] - firstCoefficient[member];
  }

  int coefficients() {
    return firstCoefficient[size];
  }

  /** Whether a member can be had from another one by a level more on an axis: all below it are there. */
  boolean isOpen(int member, int axis) {
    if (above(member, axis) != NONE || level(member, axis) == projection.levels() - 1) {
      return false;
    }
    for (int other = 0; other < axes; other++) {
      if (other != axis && level(member, other) > 0 && above(below(member, other), axis) < 0) {
        return false;
      }
    }
    return true;
  }

  /** The nodes that a member above would add. */
  int nodesAbove(int member, int axis) {
    int count = added(level(member, axis) + 1);
    for (int other = 0; other < axes; other++) {
      count *= other == axis ? 1 : added(level(member, other));
    }
    return count;
  }

  private int added(int level) {
    return projection.nodes(level) - projection.nodes(level - 1);
  }

  /** Says that there is nothing above on an axis. */
  void close(int member, int axis) {
    above[member * axes + axis] = CLOSED;
  }

  /** Adds the member above, which must be open, and returns it. */
  int add(int member, int axis) {
    int added = size++;
    int start = added * axes;
    System.arraycopy(levels, member * axes, levels, start, axes);
    levels[start + axis]++;
    deep |= isDeep(added);
    Arrays.fill(above, start, start + axes, NONE);
    int coefficients = 1;
    for (int other = 0; other < axes; other++) {
      int under = other == axis ? member : lowered(member, other, axis);
      below[start + other] = under;
      if (under != NONE) {
        above[under * axes + other] = added;
      }
      int level = levels[start + other];
      coefficients *= projection.degree(level) - projection.degree(level - 1);
    }
    firstNode[size] = firstNode[added] + nodesAbove(member, axis);
    firstCoefficient[size] = firstCoefficient[added] + coefficients;
    return added;
  }

  /** The member one above a neighbour below, or NONE where there is no neighbour. */
  private int lowered(int member, int other, int axis) {
    int under = below(member, other);
    return under == NONE ? NONE : above(under, axis);
  }

  /** Takes the last one away again, which was above a member, and says that there is nothing there. */
  void removeLast(int member, int axis) {
    size--;
    for (int other = 0; other < axes; other++) {
      int under = below(size, other);
      if (under != NONE) {
        above[under * axes + other] = NONE;
      }
    }
    close(member, axis);
  }
}
