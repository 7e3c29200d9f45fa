package dev.estimation.benchmarks.jmh;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.stream.Stream;

/** Costs and accuracies as JSON, with all that a chart wants. What is not known, not given or infinite is null. */
final class CostDocument {
  private static final Path PROCESSOR = Path.of("/proc/cpuinfo");

  private final ObjectNode root = JsonNodeFactory.instance.objectNode();

  CostDocument(CostProfile profile, String date, String commit) {
    root.put("profile", profile.name().toLowerCase(Locale.ROOT));
    root.put("date", date);
    root.put("commit", commit);
    root.put("cpu", cpu());
    root.put("processors", Runtime.getRuntime().availableProcessors());
    root.put("jdk", System.getProperty("java.vm.name") + " " + Runtime.version());
  }

  ObjectNode root() {
    return root;
  }

  /** The name that the system gives, or null where it gives none. */
  private static String cpu() {
    try (Stream<String> lines = Files.lines(PROCESSOR)) {
      return lines
          .filter(line -> line.startsWith("model name"))
          .map(line -> line.substring(line.indexOf(':') + 1).trim())
          .findFirst()
          .orElse(null);
    } catch (IOException elsewhere) {
      return null;
    }
  }

  void add(List<CostRow> rows) {
    ArrayNode array = root.putArray("calls");
    for (CostRow row : rows) {
      String problem = row.timing().subject();
      CarryAccuracy accuracy = row.accuracy();
      ObjectNode node = array.addObject();
      node.put("problem", problem);
      node.put("function", problem.substring(0, problem.indexOf(':')));
      node.put("dimension", Integer.parseInt(problem.substring(problem.indexOf(':') + 1)));
      node.put("matching", row.timing().matching());
      putTime(node, row.timing());
      putNumber(node, "modelNanoseconds", row.model().orElse(Double.NaN));
      node.put("evaluations", accuracy.evaluations());
      node.put("jacobians", accuracy.jacobians());
      putNumber(node, "meanError", accuracy.mean());
      putNumber(node, "covarianceError", accuracy.covariance());
      putNumber(node, "referenceError", accuracy.uncertainty());
      node.put("onFront", row.onFront());
    }
  }

  void addCurves(List<ScalingCurve> curves) {
    ArrayNode array = root.putArray("scaling");
    for (ScalingCurve curve : curves) {
      ObjectNode node = array.addObject();
      node.put("matching", curve.matching().label());
      putNumber(node, "slope", curve.slope());
      putNumber(node, "theoreticalSlope", curve.matching().power());
      node.put("fittedFrom", ScalingCurve.FIRST_FITTED);
      ArrayNode points = node.putArray("points");
      for (int i = 0; i < curve.points().size(); i++) {
        ObjectNode point = points.addObject();
        point.put("n", ScalingCurve.size(curve.points().get(i)));
        putTime(point, curve.points().get(i));
        putNumber(point, "modelNanoseconds", curve.models().get(i).orElse(Double.NaN));
      }
    }
  }

  private static void putTime(ObjectNode node, Timing timing) {
    putNumber(node, "nanoseconds", timing.nanos());
    putNumber(node, "leastNanoseconds", timing.least());
    putNumber(node, "mostNanoseconds", timing.most());
    putNumber(node, "bytes", timing.bytes());
  }

  private static void putNumber(ObjectNode node, String name, double value) {
    node.put(name, Double.isFinite(value) ? (Double) value : null);
  }
}
