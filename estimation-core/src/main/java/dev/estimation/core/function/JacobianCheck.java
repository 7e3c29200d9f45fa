package dev.estimation.core.function;

import dev.estimation.core.internal.Checks;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;

/**
 * Holds the derivatives that a function offers against differences, for the tests of whoever wrote them:
 * {@code assertTrue(check.passed(), check::toString)}.
 *
 * <p>Each entry of the Jacobian is compared with central differences of g; those of the Hessian, if
 * there is one, with differences of the Jacobian, between active inputs; and inputs declared inactive
 * must change nothing. Steps run from 1/4 of the scale of an input down to 1e-14 of it, and each entry
 * takes the one where its differences are steadiest, so scales may be wrong by a factor of a thousand.
 *
 * <p>An entry is reported where |given - differenced| &gt; 1e-6 max(|given|, |differenced|) + 10 u. The
 * first term lies well above the 1e-11 that differences reach where all is well, and below any mistake
 * worth the name. u is the uncertainty of the differences: how much they change over the neighbouring
 * steps, and the rounding of g, 4 eps (|g_i| + sum |G_il u_l|), over the width. So a mistake in an entry
 * too small to be seen in its output beside the rounding is not found, and a true entry is not reported
 * for rounding. NaN is reported. At a kink or a jump of g differences mean nothing: take other points.
 *
 * <p>Cost: 48 evaluations of g an input and point, and with a Hessian as many Jacobians. <i>Immutable.</i>
 */
public final class JacobianCheck {
  private final List<JacobianFinding> findings;
  private final int points;

  private JacobianCheck(List<JacobianFinding> findings, int points) {
    this.findings = List.copyOf(findings);
    this.points = points;
  }

  /**
   * Checks a function at one or many points.
   *
   * @param input where u lives
   * @param output where g(u) lives
   * @param function one that offers a Jacobian
   * @param scales for each input, a length over which g bends noticeably, in its unit; finite, above 0
   * @param given what the function wants beside u, read
   * @param points the places to check at, read
   * @return what was found
   * @throws IllegalArgumentException if there is no Jacobian, no point, or a size is wrong
   */
  public static JacobianCheck of(
      Space input,
      Space output,
      VectorFunction function,
      double[] scales,
      double[] given,
      double[]... points) {
    if (function.structure().jacobian().isEmpty()) {
      throw new IllegalArgumentException("the function offers no Jacobian to be checked");
    }
    if (points.length == 0) {
      throw new IllegalArgumentException("derivatives are checked at 1 point or more, got 0");
    }
    List<JacobianFinding> findings = new ArrayList<>();
    for (double[] point : points) {
      Checks.length("point", point, input.storage());
      findings.addAll(new PointCheck(input, output, function, scales, given, point).findings());
    }
    return new JacobianCheck(findings, points.length);
  }

  /** {@return whether nothing was found} */
  public boolean passed() {
    return findings.isEmpty();
  }

  /** {@return what was found, point by point} */
  public List<JacobianFinding> findings() {
    return findings;
  }

  /** {@return the findings in words, one a line} */
  @Override
  public String toString() {
    String head = findings.size() + " findings at " + points + " points";
    return findings.stream()
        .map(finding -> System.lineSeparator() + finding)
        .collect(Collectors.joining("", head, ""));
  }
}
