package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.VariableNames;
import java.io.IOException;
import java.io.Writer;
import java.util.ArrayList;
import java.util.List;

/** Gathers the runs of a replay for its page. <i>Confined to one thread.</i> */
public final class ReplayPage {
  private final ObjectNode root = JsonNodeFactory.instance.objectNode();
  private final List<VariantNode> variants = new ArrayList<>();
  private final int runs;

  /**
   * A page without runs.
   *
   * @param log as typed; null if there is none
   * @param runs how many there will be, so that the page does not grow too large
   */
  public ReplayPage(String caseName, String log, int runs) {
    this.runs = runs;
    root.put("case", caseName);
    root.put("log", log);
  }

  /** Adds a run; those of one variant come in succession. */
  public void add(LoadedVariant variant, VariableNames names, PageRun run) {
    if (variants.isEmpty() || !last().isOf(variant)) {
      variants.add(new VariantNode(variant, names, thinning(variant)));
    }
    last().add(run);
  }

  private VariantNode last() {
    return variants.get(variants.size() - 1);
  }

  private Thinning thinning(LoadedVariant variant) {
    int dimension = variant
        .scenario()
        .map(Scenario::motion)
        .map(motion -> motion.stateSpace().dimension())
        .orElse(0);
    // Mean, deviation and error of each component; some more for NEES, NIS and innovations.
    return Thinning.of(runs, 3 * dimension + 12);
  }

  /** {@return all that the page draws} */
  public ObjectNode data() {
    ArrayNode array = root.putArray("variants");
    variants.forEach(variant -> array.add(variant.complete()));
    return root;
  }

  /** Writes the page. */
  public void writeTo(Writer out) throws IOException {
    new PageTemplate().write(data(), out);
  }
}
