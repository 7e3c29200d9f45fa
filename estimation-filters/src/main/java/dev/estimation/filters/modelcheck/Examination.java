package dev.estimation.filters.modelcheck;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import java.util.List;

/** What all parts of a check share: the subject, the places, how wide the region is, and the ledger. */
final class Examination {
  final Subject subject;
  final Space input;
  final View view;
  final Region region;
  final List<Arguments> places;
  final double[] widths;
  final Ledger ledger;

  Examination(Subject subject, Region region, List<Arguments> places, Ledger ledger) {
    this.subject = subject;
    this.input = subject.input();
    this.view = new View(subject.function(), input, subject.output());
    this.region = region;
    this.places = places;
    this.ledger = ledger;
    this.widths = widths();
  }

  private double[] widths() {
    double[] all = new double[input.dimension()];
    double[] ofState = region.halfWidths();
    System.arraycopy(ofState, 0, all, 0, ofState.length);
    for (Arguments at : places) {
      double[] reach = Places.noiseReach(subject, at);
      for (int i = 0; i < reach.length; i++) {
        all[ofState.length + i] = Math.max(all[ofState.length + i], reach[i]);
      }
    }
    return all;
  }

  /** The place that follows, the first after the last. */
  Arguments after(int place) {
    return places.get((place + 1) % places.size());
  }

  /** The name of an output, as {@code measurement[1]}, or of its direction where it is no number. */
  String outputName(int i) {
    boolean plain = subject.output().storage() == subject.output().dimension();
    return plain ? subject.function().entry(i) : "direction " + i + " of the output";
  }

  /** Whether the numbers of a method mean anything. */
  boolean isSound(Operation operation) {
    return !ledger.has(FindingKind.NOT_DETERMINISTIC, operation)
        && !ledger.has(FindingKind.EARLIER_CALL, operation)
        && !ledger.has(FindingKind.OUTPUT_UNFILLED, operation);
  }

  /** What the model declares; null, with a finding, if it names impossible inputs. */
  Structure structure() {
    try {
      Structure structure = subject.structure().get();
      structure.nonlinearInputs(input.dimension());
      return structure;
    } catch (RuntimeException thrown) {
      Operation declared = Operation.vector("structure", "structure", 0, (in, out) -> {});
      ledger.add(
          FindingKind.EXCEPTION,
          declared,
          "structure",
          places.get(0),
          Double.NaN,
          Double.NaN,
          0,
          "must name inputs among the " + input.dimension() + " of state and noise, got " + thrown);
      return null;
    }
  }
}
