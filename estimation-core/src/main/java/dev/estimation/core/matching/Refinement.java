package dev.estimation.core.matching;

/**
 * Chooses what to look at next: of all members that can be added, the one for which most is expected for each node, from
 * the terms of those below it. <i>Confined to one thread.</i> Source: Gerstner and Griebel 2003, <i>Dimension-adaptive
 * tensor-product quadrature</i>, Computing 71, in the choice by member; the expectation is from the members below.
 */
final class Refinement {
  /** Of axes that seem linear: the order among them is then by cost. */
  private static final double LEAST_BEND = 1e-3;

  private static final double LEAST = 1e-9;

  private final LevelSet set;
  private final ExpansionNorms norms;
  private final int axes;
  private int member;
  private int axis;

  Refinement(LevelSet set, ExpansionNorms norms, int axes) {
    this.set = set;
    this.norms = norms;
    this.axes = axes;
  }

  /** The member below the chosen one. */
  int member() {
    return member;
  }

  /** The axis on which the chosen one is above. */
  int axis() {
    return axis;
  }

  /** Chooses; false if there is nothing of at most so many nodes. */
  boolean choose(int mostNodes) {
    double best = 0;
    for (int below = 0; below < set.size(); below++) {
      // Each candidate once: it comes from the member below it on its last axis.
      for (int last = axes - 1; last >= 0; last--) {
        if (set.isOpen(below, last) && set.nodesAbove(below, last) <= mostNodes) {
          double gain = expected(below, last) / set.nodesAbove(below, last);
          if (gain > best) {
            best = gain;
            member = below;
            axis = last;
          }
        }
        if (set.level(below, last) > 0) {
          break;
        }
      }
    }
    return best > 0;
  }

  /** What the least of the members below lets expect: a product has no term that its factors have not. */
  private double expected(int below, int last) {
    double least = Double.POSITIVE_INFINITY;
    int moved = 0;
    int other = last;
    for (int i = 0; i < axes; i++) {
      int level = set.level(below, i) + (i == last ? 1 : 0);
      if (level == 0) {
        continue;
      }
      moved++;
      other = i == last ? other : i;
      int under = i == last ? below : set.above(set.below(below, i), last);
      least = Math.min(least, expectedOf(under, i, level));
    }
    if (moved == 1 && set.level(below, last) == 1) {
      least *= bend(last);
    } else if (moved == 2 && set.level(below, other) == 1 && set.level(below, last) == 0) {
      least = Math.max(least, Math.sqrt(norms.pair(other, last)));
    }
    return Math.max(LEAST, least);
  }

  private double expectedOf(int under, int i, int level) {
    return level == 1 ? Math.sqrt(norms.block(under)) * bend(i) : Math.sqrt(norms.edge(under, i));
  }

  private double bend(int i) {
    return norms.bend(i) + LEAST_BEND;
  }
}
