package dev.estimation.core.accuracy;

import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.PointRule;
import dev.estimation.core.points.SparseGridRule;
import java.util.ArrayList;
import java.util.List;

/** Rules of growing order, to see whether a function is smooth; see {@link ReferenceSearch}. */
final class LevelRules {
  private static final int MOST_INPUTS_OF_PRODUCTS = 3;

  private LevelRules() {}

  static List<PointRule> of(int inputs) {
    List<PointRule> rules = new ArrayList<>();
    if (inputs <= MOST_INPUTS_OF_PRODUCTS) {
      int most = inputs == MOST_INPUTS_OF_PRODUCTS ? 33 : 65;
      for (int nodes = 5; nodes <= most; nodes = 2 * nodes - 1) {
        rules.add(GaussHermiteRule.product(nodes));
      }
    } else {
      for (int level = 1; level <= highestLevel(inputs); level++) {
        rules.add(SparseGridRule.ofLevel(level));
      }
    }
    return List.copyOf(rules);
  }

  /** The next would have more points than a rule may. */
  private static int highestLevel(int inputs) {
    if (inputs <= 15) {
      return 4;
    }
    return inputs <= 30 ? 3 : 2;
  }
}
