package dev.estimation.filters.soak;

import static org.junit.jupiter.api.Assertions.assertAll;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.core.matching.MomentMatching;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.testing.Matchings;
import dev.estimation.testing.RandomGaussians;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Named;
import org.junit.jupiter.api.Tag;
import org.junit.jupiter.api.Test;

/**
 * Ten million random steps in both forms: 50000 models with seeds 0 to 49999, 200 steps each, a step being a
 * prediction and an update. States of 2 to 8 components; deviations from 1e-2 to 1e2 at first, of process noise
 * from 1e-4 to 1, of measurements from 1e-4 to 10; seven in ten are nonlinear, but for rules with negative weights none
 * is. Matchings take turns. Counts go to
 * {@code target/soak-forms.txt}. Measured: no failure in either form, at most 1.4e-7 standard deviations apart. Priors of
 * up to 1e3, then a ratio of 1e7 to the smallest noise, once gave 2.1e-5: the covariance form squares that ratio.
 */
@Tag("soak")
class FormsSoakTest {
  private static final int MODELS = 50_000;
  private static final int STEPS = 200;

  @Test
  void formsAgreeAndFailuresAreTold() throws IOException {
    List<Named<MomentMatching>> matchings = Matchings.all().stream()
        .filter(matching -> !matching.getName().startsWith("second order"))
        .toList();
    SoakTally tally = new SoakTally();
    for (int seed = 0; seed < MODELS; seed++) {
      RandomGaussians random = new RandomGaussians(seed);
      Named<MomentMatching> matching = matchings.get(seed % matchings.size());
      boolean large = matching.getName().startsWith("Gauss-Hermite");
      SoakModel model = new SoakModel(
          random, 2 + (int) random.uniform(0, large ? 3 : 7), !hasNegativeWeights(matching));
      run(model, matching, random, seed, tally);
    }
    Files.writeString(Path.of("target", "soak-forms.txt"), tally.report());
    assertAll(
        tally.report(),
        () -> assertEquals((long) MODELS * STEPS, tally.steps),
        () -> assertEquals(0, tally.rootFailures, "failures in square-root form"),
        () -> assertEquals(0, tally.unsound, "results that are NaN or not positive semi-definite"),
        () -> assertTrue(tally.plainFailures <= 1e-6 * tally.steps, "failures in covariance form"),
        () -> assertTrue(tally.worst <= SoakTally.LIMIT, "the forms agree"));
  }

  /** Such rules may make the covariance of a bent function indefinite, whatever the form. */
  private static boolean hasNegativeWeights(Named<MomentMatching> matching) {
    String name = matching.getName();
    return name.startsWith("cubature 5")
        || name.startsWith("McNamee-Stenger")
        || name.startsWith("unscented 3-n");
  }

  private static void run(
      SoakModel model,
      Named<MomentMatching> matching,
      RandomGaussians random,
      int seed,
      SoakTally tally) {
    FilterPlan plan = FilterPlan.of(model.motion(), matching.getPayload());
    Gaussian prior = Gaussian.independent(new double[model.n], model.priorDeviations);
    SoakTrack root = new SoakTrack(plan.inSquareRootForm(), model, prior);
    SoakTrack plain = new SoakTrack(plan, model, prior);
    double[] truth = random.vector(model.n);
    for (int i = 0; i < model.n; i++) {
      truth[i] *= model.priorDeviations[i];
    }
    double[] moved = new double[model.n];
    double[] z = new double[model.m];
    for (int k = 1; k <= STEPS; k++) {
      model.motion().move(truth, new double[0], k - 1, 1, moved);
      double[] noise = random.vector(model.n);
      for (int i = 0; i < model.n; i++) {
        truth[i] = moved[i] + model.processDeviation(i) * noise[i];
      }
      model.sensor().measure(truth, new double[0], z);
      double[] error = random.vector(model.m);
      for (int i = 0; i < model.m; i++) {
        z[i] += model.measurementDeviation(i) * error[i];
      }
      tally.count(
          matching.getName() + ", model " + seed + ", step " + k,
          root.step(k, z),
          plain.step(k, z),
          root,
          plain);
      if (!root.succeeded()) {
        root.restart(k);
      }
      if (!plain.succeeded()) {
        plain.follow(root, k);
      }
    }
  }
}
