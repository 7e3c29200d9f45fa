package dev.estimation.filters.guide;

import dev.estimation.core.function.Structure;
import dev.estimation.core.space.Space;
import dev.estimation.filters.model.DifferentiableMotion;
import dev.estimation.filters.model.DifferentiableNoiseDrivenMotion;
import dev.estimation.filters.model.DifferentiableSensor;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.model.NoiseDrivenMotion;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.model.TwiceDifferentiableMotion;
import dev.estimation.filters.model.TwiceDifferentiableSensor;
import dev.estimation.filters.modelcheck.FindingKind;
import dev.estimation.filters.modelcheck.ModelCheck;
import dev.estimation.filters.modelcheck.ModelReport;
import dev.estimation.filters.modelcheck.Region;
import java.util.ArrayList;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import java.util.stream.IntStream;

/** A ready model, the regions over which it is examined, and what is found there for a known reason. */
final class ReadyModel {
  /** A model in a state, over a region, in words. */
  record Look(String where, Object model, Space state, Region region) {}

  private final String name;
  private final List<Look> looks = new ArrayList<>();
  private final Map<FindingKind, String> known = new EnumMap<>(FindingKind.class);
  private int places = 200;

  ReadyModel(String name) {
    this.name = name;
  }

  ReadyModel over(String where, Motion model, Region region) {
    looks.add(new Look(where, model, model.stateSpace(), region));
    return this;
  }

  ReadyModel over(String where, SensorModel model, Space state, Region region) {
    looks.add(new Look(where, model, state, region));
    return this;
  }

  /** What must be found in at least one of the regions, and may be in others. */
  ReadyModel finding(FindingKind kind, String reason) {
    known.put(kind, reason);
    return this;
  }

  /** For models that take long. */
  ReadyModel atPlaces(int count) {
    places = count;
    return this;
  }

  String name() {
    return name;
  }

  Map<FindingKind, String> known() {
    return known;
  }

  /** The reports of all regions, by the words for them. */
  Map<String, ModelReport> reports() {
    FindingKind[] accepted = known.keySet().toArray(FindingKind[]::new);
    Map<String, ModelReport> reports = new LinkedHashMap<>();
    looks.forEach(look -> reports.put(name + ", " + look.where(), report(look, accepted)));
    return reports;
  }

  private ModelReport report(Look look, FindingKind... accepted) {
    ModelCheck check = ModelCheck.over(look.region()).withPlaces(places).accepting(accepted);
    return look.model() instanceof SensorModel sensor
        ? check.examine(sensor)
        : check.examine((Motion) look.model());
  }

  static String head() {
    return """
        | model | state | control, noise inside, given | sees | active | linear | derivatives | clean over |
        |---|---|---|---|---|---|---|---|
        """;
  }

  /** A row of the table, by the first region's model. */
  String row() {
    Look first = looks.get(0);
    Object model = first.model();
    String where = looks.stream().map(Look::where).collect(Collectors.joining("; "));
    String notes = known.isEmpty() ? "" : " (known: " + String.join("; ", known.values()) + ")";
    int inputs = first.state().dimension() + noises(model);
    Structure structure =
        model instanceof SensorModel sensor ? sensor.structure() : ((Motion) model).structure();
    return "| " + name + " | " + inWords(first.state()) + " | " + others(model) + " | "
        + (model instanceof SensorModel sensor ? inWords(sensor.measurementSpace()) : "")
        + " | " + inWords(structure.activeInputs(inputs), inputs) + " | "
        + inWords(structure.linearInputs(), inputs) + " | " + derivatives(model) + " | " + where
        + notes + " |\n";
  }

  private static int noises(Object model) {
    return model instanceof NoiseDrivenMotion driven ? driven.noiseDimension() : 0;
  }

  private static String others(Object model) {
    List<String> words = new ArrayList<>();
    if (model instanceof SensorModel sensor && sensor.givenDimension() > 0) {
      words.add(sensor.givenDimension() + " given");
    }
    if (model instanceof Motion motion && motion.controlDimension() > 0) {
      words.add(motion.controlDimension() + " controls");
    }
    if (noises(model) > 0) {
      words.add(noises(model) + " noises");
    }
    return String.join(", ", words);
  }

  private static String derivatives(Object model) {
    if (model instanceof TwiceDifferentiableMotion || model instanceof TwiceDifferentiableSensor) {
      return "Jacobian, Hessian";
    }
    boolean once = model instanceof DifferentiableMotion
        || model instanceof DifferentiableNoiseDrivenMotion
        || model instanceof DifferentiableSensor;
    return once ? "Jacobian" : "";
  }

  private static String inWords(int[] indices, int all) {
    return indices.length == all
        ? "all"
        : IntStream.of(indices).mapToObj(Integer::toString).collect(Collectors.joining(" "));
  }

  /** Equal parts that follow each other are counted: 4 real, 1 angle. */
  private static String inWords(Space space) {
    List<String> words = new ArrayList<>();
    String[] parts = space.toString().replaceAll("[()]", "").split(", | x ");
    for (int i = 0, count = 1; i < parts.length; i++, count++) {
      if (i + 1 == parts.length || !parts[i + 1].equals(parts[i])) {
        words.add(count + " " + parts[i]);
        count = 0;
      }
    }
    return String.join(", ", words);
  }

  @Override
  public String toString() {
    return name;
  }
}
