package dev.estimation.benchmarks.jmh;

import dev.estimation.core.matching.Linearisation;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.core.matching.PointMatching;
import dev.estimation.core.matching.SpreadLinearisation;
import dev.estimation.core.matching.ToleranceMatching;
import dev.estimation.core.points.CubatureRule;
import dev.estimation.core.points.GaussHermiteRule;
import dev.estimation.core.points.RandomRule;
import dev.estimation.core.points.SimplexRule;
import dev.estimation.core.points.SparseGridRule;
import dev.estimation.core.points.UnscentedRule;
import java.util.Arrays;

/**
 * The matchings that are timed, by the names that benchmarks and tables know them by. {@code power} is the leading power
 * of n in the operations of a call with n inputs, n outputs and a function of n operations, the input's factor being
 * there: W'W and the product of Jacobian and factor take n^3; so do the 2 n + 1 or so points of rules of degree 3 with
 * n^2 for each in the covariance; about 2 n^2 points take n^4, and so do n projected Hessians; the product of the
 * factor with a fixed number of points takes n^2 each. It shows only where these products outweigh the
 * calls of the function. NaN where it is no power.
 */
enum ComparedMatching {
  /** Of first order. */
  LINEAR("linear", 3),
  /** Hessians by differences of Jacobians over the input's deviations. */
  SECOND_ORDER("second-order", 4),
  /** Of first order by differences over the spread. */
  SPREAD("linear-spread", 3),
  /** With alpha = 1, beta = 2, kappa = 0. */
  UNSCENTED("unscented", 3),
  /** The fewest points. */
  SIMPLEX("simplex", 3),
  /** Degree 3. */
  CUBATURE_THREE("cubature3", 3),
  /** Degree 5. */
  CUBATURE_FIVE("cubature5", 4),
  /** Products of 3 nodes: exponential. */
  HERMITE("hermite3", Double.NaN),
  /** A sparse grid of level 2. */
  SPARSE("sparse2", 4),
  /** To a tolerance; the power is that of its first points, which are all if the function bends little. */
  TOLERANCE("tolerance0.01", 3),
  /** 1000 standardised draws from one seed: its error is that of these draws. */
  RANDOM("random1000", 2);

  private static final int SEED = 11;

  private final String label;
  private final double power;

  ComparedMatching(String label, double power) {
    this.label = label;
    this.power = power;
  }

  String label() {
    return label;
  }

  double power() {
    return power;
  }

  static ComparedMatching named(String label) {
    return Arrays.stream(values())
        .filter(one -> one.label.equals(label))
        .findFirst()
        .orElseThrow(() -> new IllegalArgumentException("no matching is named " + label));
  }

  MomentMatching matching(CarryProblem problem) {
    return switch (this) {
      case LINEAR -> Linearisation.firstOrder();
      case SECOND_ORDER -> Linearisation.secondOrder().withInputScales(problem.deviations());
      case SPREAD -> SpreadLinearisation.firstOrder();
      case UNSCENTED -> PointMatching.of(UnscentedRule.scaled(1, 2, 0));
      case SIMPLEX -> PointMatching.of(SimplexRule.spherical());
      case CUBATURE_THREE -> PointMatching.of(CubatureRule.degreeThree());
      case CUBATURE_FIVE -> PointMatching.of(CubatureRule.degreeFive());
      case HERMITE -> PointMatching.of(GaussHermiteRule.product(3));
      case SPARSE -> PointMatching.of(SparseGridRule.ofLevel(2));
      case TOLERANCE -> ToleranceMatching.within(0.01);
      case RANDOM -> PointMatching.of(RandomRule.independent(1000, SEED).standardised());
    };
  }
}
