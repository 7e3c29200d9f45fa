package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Jacobian;
import dev.estimation.core.function.JacobianCheck;
import dev.estimation.core.function.JacobianFinding;
import dev.estimation.core.function.Structure;
import dev.estimation.core.function.VectorFunction;
import dev.estimation.core.space.Space;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/** Jacobian and Hessian against differences, by {@link JacobianCheck}. */
final class Derivatives {
  /** The length of differences along an input of width 0, relative to its value where that is above 1. */
  private static final double LENGTH = 1e-3;

  private final Examination examination;
  private final Subject subject;
  private final int inputs;

  /** What waits until the Jacobian is known to be right everywhere. */
  private final List<Runnable> ofHessian = new ArrayList<>();

  Derivatives(Examination examination) {
    this.examination = examination;
    this.subject = examination.subject;
    this.inputs = examination.input.dimension();
  }

  void look(Structure declared) {
    if (subject.jacobian().isEmpty() || !examination.isSound(subject.jacobian().get())) {
      return;
    }
    for (Arguments at : examination.places) {
      if (examination.view.value(at) != null) {
        look(declared, at);
      }
    }
    if (!examination.ledger.has(FindingKind.JACOBIAN, subject.jacobian().get())) {
      ofHessian.forEach(Runnable::run);
    } else if (subject.hessian().isPresent()) {
      examination.ledger.note(
          "the Hessian was not looked at: the Jacobian, of which it is the derivative, is at fault");
    }
  }

  private void look(Structure declared, Arguments at) {
    double[] joint = at.joint();
    double[] scales = scales(joint);
    JacobianCheck check = JacobianCheck.of(
        examination.input, subject.output(), new At(declared, at), scales, at.given, joint);
    for (JacobianFinding finding : check.findings()) {
      if (finding.kind() != JacobianFinding.Kind.INACTIVE_INPUT
          && Double.isFinite(finding.given())
          && Double.isFinite(finding.differenced())) {
        if (finding.kind() == JacobianFinding.Kind.JACOBIAN) {
          judge(finding, at, scales);
        } else {
          ofHessian.add(() -> judge(finding, at, scales));
        }
      }
    }
  }

  private double[] scales(double[] joint) {
    double[] scales = examination.widths.clone();
    for (int j = 0; j < scales.length; j++) {
      if (scales[j] == 0) {
        double size = joint.length == scales.length ? Math.abs(joint[j]) : 1;
        scales[j] = LENGTH * Math.max(1, size);
      }
    }
    return scales;
  }

  private void judge(JacobianFinding finding, Arguments at, double[] scales) {
    boolean first = finding.kind() == JacobianFinding.Kind.JACOBIAN;
    Operation operation = (first ? subject.jacobian() : subject.hessian()).orElseThrow();
    int j = first ? finding.column() : finding.secondColumn();
    int row = first ? finding.row() : finding.row() * inputs + finding.column();
    SecondOpinion opinion = new SecondOpinion(differenced(first), scales);
    if (opinion.disagrees(at, row, j, finding.given())) {
      int entry = first ? finding.row() * inputs + j : row * inputs + j;
      report(first ? FindingKind.JACOBIAN : FindingKind.HESSIAN, operation, entry, finding, at);
    }
  }

  private View differenced(boolean first) {
    Space entries = Space.reals(subject.output().dimension() * inputs);
    return first
        ? examination.view
        : new View(subject.jacobian().orElseThrow(), examination.input, entries);
  }

  private void report(
      FindingKind kind, Operation operation, int entry, JacobianFinding finding, Arguments at) {
    String name = operation.entry(entry);
    examination.ledger.add(
        kind,
        operation,
        name,
        at,
        finding.differenced(),
        finding.given(),
        finding.relativeDifference(),
        name + " must be " + finding.differenced() + ", by differences, got " + finding.given()
            + ", relative difference " + finding.relativeDifference());
  }

  /** The function about a place, NaN where it throws. */
  private final class At implements VectorFunction {
    private final Arguments at;
    private final Structure structure;

    At(Structure declared, Arguments at) {
      this.at = at;
      Structure once = declared.withJacobian(calls(subject.jacobian().orElseThrow()));
      boolean twice = subject.hessian().filter(examination::isSound).isPresent();
      this.structure =
          twice ? once.withHessian(calls(subject.hessian().orElseThrow())::evaluate) : once;
    }

    private Jacobian calls(Operation operation) {
      return (joint, given, out) -> fill(operation, joint, out);
    }

    private void fill(Operation operation, double[] joint, double[] out) {
      if (Attempt.of(operation, at.at(joint), out).threw()) {
        Arrays.fill(out, Double.NaN);
      }
    }

    @Override
    public void evaluate(double[] joint, double[] given, double[] out) {
      fill(subject.function(), joint, out);
    }

    @Override
    public Structure structure() {
      return structure;
    }
  }
}
