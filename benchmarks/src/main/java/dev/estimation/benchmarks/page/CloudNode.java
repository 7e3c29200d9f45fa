package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.ObjectNode;
import dev.estimation.benchmarks.replay.Scenario;
import dev.estimation.benchmarks.replay.VariableNames;
import dev.estimation.core.gaussian.Moments;
import dev.estimation.core.matching.MatchingStatus;
import dev.estimation.core.matching.MatchingWorkspace;
import dev.estimation.core.space.Space;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** A cloud as JSON: draws, their covariance, and what each method makes of them, all from the mean of the draws. */
final class CloudNode {
  private static final int DRAWN = 1200;

  private final Scenario scenario;
  private final VariableNames names;

  CloudNode(Scenario scenario, VariableNames names) {
    this.scenario = scenario;
    this.names = names;
  }

  void fill(ObjectNode node, CloudPoint point, List<CloudMethod> methods) {
    Space output = point.output();
    node.put("step", point.step());
    node.put("t", point.time() - scenario.steps().get(0).time());
    node.put("draws", Cloud.DRAWS);
    VariantNode.putQuantities(
        node.putArray("axes"),
        point.sensor().isPresent() ? names.measurementOf(output) : names.stateOf(output));
    Cloud cloud = new Cloud(point);
    putMatrix(node.putArray("covariance"), cloud.covariance());
    putMatrix(node.putArray("restCovariance"), cloud.restCovariance());
    ArrayNode samples = node.putArray("samples");
    ArrayNode rests = node.putArray("rests");
    for (int i = 0; i < DRAWN; i++) {
      putVector(samples.addArray(), cloud.difference(i));
      putVector(rests.addArray(), cloud.rest(i));
    }
    ArrayNode array = node.putArray("methods");
    methods.forEach(method -> add(array, method, point, cloud));
  }

  private static void add(ArrayNode array, CloudMethod method, CloudPoint point, Cloud cloud) {
    MatchingWorkspace work = method
        .kind()
        .matching()
        .workspace(
            point.input(), point.output(), point.function(), method.kind().form());
    Moments prior = new Moments(point.input());
    prior.set(point.prior());
    MatchingStatus status = work.carry(prior, point.given(), null, point.use());
    if (status != MatchingStatus.MATCHED && status != MatchingStatus.BELOW_TOLERANCE) {
      return;
    }
    ObjectNode node = array.addObject().put("name", method.name());
    node.put("iterated", method.kind().iteration().isPresent());
    double[] offset = new double[point.output().dimension()];
    point.output().difference(work.mean(), cloud.mean(), offset);
    putVector(node.putArray("mean"), offset);
    putMatrix(node.putArray("covariance"), work.output().covariance());
    DMatrixRMaj rest = work.unexplained().matrix().copy();
    CommonOps_DDRM.addEquals(rest, point.noise());
    putMatrix(node.putArray("restCovariance"), rest);
  }

  private static void putVector(ArrayNode array, double[] values) {
    for (double value : values) {
      Numbers.add(array, value);
    }
  }

  private static void putMatrix(ArrayNode array, DMatrixRMaj matrix) {
    for (int i = 0; i < matrix.numRows; i++) {
      ArrayNode row = array.addArray();
      for (int j = 0; j < matrix.numCols; j++) {
        Numbers.add(row, matrix.get(i, j));
      }
    }
  }
}
