package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;

/** Whether the function is linear in what it declares so: by each of these inputs, and by all of them together. */
final class LinearInputs {
  private final Examination examination;

  LinearInputs(Examination examination) {
    this.examination = examination;
  }

  void look(Structure structure) {
    int[] linear = structure.linearInputs();
    for (int j : linear) {
      look(new int[] {j}, examination.subject.inputName(j));
    }
    Operation function = examination.subject.function();
    if (linear.length > 1 && !examination.ledger.has(FindingKind.NOT_LINEAR, function)) {
      look(linear, "all of them together");
    }
  }

  private void look(int[] inputs, String name) {
    for (int k = 0; k < examination.places.size(); k++) {
      Arguments at = examination.places.get(k);
      double[] whole = examination.view.displacement(at, examination.after(k));
      double[] part = new double[whole.length];
      for (int j : inputs) {
        part[j] = whole[j];
      }
      look(at, part, name);
    }
  }

  private void look(Arguments at, double[] displacement, String name) {
    Bend bend = Bend.between(examination.view, at, displacement);
    for (int i = 0; bend != null && i < examination.view.outputs(); i++) {
      if (bend.isReal(i)) {
        examination.ledger.add(
            FindingKind.NOT_LINEAR,
            examination.subject.function(),
            name,
            at,
            0,
            bend.amount(i),
            bend.relative(i),
            examination.outputName(i) + " is declared linear in " + name
                + ": half way between two places it must be off their middle by 0, got "
                + bend.amount(i) + ", " + bend.relative(i) + " of the change");
      }
    }
  }
}
