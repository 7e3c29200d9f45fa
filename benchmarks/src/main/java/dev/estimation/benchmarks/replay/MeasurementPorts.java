package dev.estimation.benchmarks.replay;

import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.model.SensorModel;
import java.util.IdentityHashMap;
import java.util.List;

/** A port for every sensor of some steps; those for stacked rows take the most that there are. */
final class MeasurementPorts {
  private final IdentityHashMap<SensorModel, MeasurementPort> single = new IdentityHashMap<>();
  private final IdentityHashMap<SensorModel, MeasurementPort> stacked = new IdentityHashMap<>();

  MeasurementPorts(FilterWorkspace workspace, List<Step> steps) {
    IdentityHashMap<SensorModel, Integer> mostRows = new IdentityHashMap<>();
    for (Step step : steps) {
      for (Measurement measurement : step.measurements()) {
        if (measurement.isStacked()) {
          mostRows.merge(measurement.sensor(), measurement.rows(), Math::max);
        } else {
          single.computeIfAbsent(
              measurement.sensor(), sensor -> new MeasurementPort.Single(workspace.port(sensor)));
        }
      }
    }
    mostRows.forEach((sensor, rows) ->
        stacked.put(sensor, new MeasurementPort.Stacked(workspace.port(sensor, rows))));
  }

  MeasurementPort of(Measurement measurement) {
    return (measurement.isStacked() ? stacked : single).get(measurement.sensor());
  }
}
