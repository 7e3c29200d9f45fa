package dev.estimation.filters.smoother;

import static dev.estimation.testing.Agreement.assertNames;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.filter.Estimate;
import dev.estimation.filters.filter.FilterPlan;
import dev.estimation.filters.filter.FilterWorkspace;
import dev.estimation.filters.filter.SensorPort;
import dev.estimation.filters.filter.StepStatus;
import dev.estimation.filters.testing.BothForms;
import dev.estimation.filters.testing.FaultyMotion;
import dev.estimation.filters.testing.FaultySensor;
import java.util.ArrayList;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.function.Executable;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** A record is of the prediction that led to the estimate, or is refused. */
class RecordingTest extends BothForms {
  private static final double[] CONTROL = {1, -1};

  private final FaultyMotion motion = new FaultyMotion();
  private FilterPlan plan;
  private FilterWorkspace work;
  private Estimate track;
  private FixedIntervalSmoother smoother;

  @BeforeEach
  void begin() {
    plan = formed(FilterPlan.cubature(motion));
    work = plan.workspace();
    track = start();
    smoother = FixedIntervalSmoother.startingAt(track);
  }

  private Estimate start() {
    return plan.start(0, Gaussian.of(new double[] {1, 2}, new double[][] {{1, 0.2}, {0.2, 2}}));
  }

  private void move(Estimate estimate, double time) {
    assertEquals(StepStatus.APPLIED, work.predict(estimate, time, CONTROL), work::failure);
  }

  private static void assertRefused(Executable call, String... words) {
    assertNames(assertThrows(IllegalStateException.class, call).getMessage(), words);
  }

  @Test
  void aWorkspaceThatMovedAnotherTrackIsRefused() {
    Estimate other = start();
    move(track, 1);
    move(other, 3);
    assertRefused(() -> smoother.record(work, track), "t = 1.0 s", "moved another to t = 3.0 s");
    assertEquals(1, smoother.size(), "nothing recorded");
  }

  @Test
  void anotherTrackAtTheSameTimeIsRefusedToo() {
    Estimate other = start();
    move(track, 1);
    move(other, 1);
    assertRefused(() -> smoother.record(work, track), "moved another to t = 1.0 s");
    assertEquals(1, smoother.size(), "nothing recorded");
  }

  @Test
  void aWorkspaceThatMovedNothingIsRefused() {
    move(track, 1);
    FilterWorkspace idle = plan.workspace();
    assertRefused(() -> smoother.record(idle, track), "t = 1.0 s", "moved none");
  }

  /** What was refused, or took no time, has moved nothing: the same bits as without it. */
  @ParameterizedTest
  @ValueSource(doubles = {0.5, 1, Double.NaN, Double.POSITIVE_INFINITY})
  void stepsThatDoNotMoveDoNoHarm(double time) {
    long[] wanted = smoothedWith(Double.NEGATIVE_INFINITY);
    assertArrayEquals(wanted, smoothedWith(time));
  }

  /** Two steps; before each record, a prediction to the given time after the last record. */
  private long[] smoothedWith(double between) {
    Estimate estimate = start();
    FixedIntervalSmoother recorder = FixedIntervalSmoother.startingAt(estimate);
    SensorPort port = work.port(new FaultySensor());
    for (int k = 1; k <= 2; k++) {
      move(estimate, k);
      if (between != Double.NEGATIVE_INFINITY) {
        work.predict(estimate, k - 1 + between, CONTROL);
      }
      assertEquals(k, estimate.time(), "not moved");
      assertEquals(StepStatus.APPLIED, port.update(estimate, new double[] {3 * k, -k}));
      recorder.record(work, estimate);
    }
    return bits(recorder.smooth());
  }

  private static long[] bits(SmoothedTrack smoothed) {
    List<Double> numbers = new ArrayList<>();
    for (int k = 0; k < smoothed.size(); k++) {
      for (int i = 0; i < 2; i++) {
        numbers.add(smoothed.mean(k, i));
        numbers.add(smoothed.covariance(k, i, 0));
        numbers.add(smoothed.covariance(k, i, 1));
      }
    }
    return numbers.stream().mapToLong(Double::doubleToRawLongBits).toArray();
  }

  @Test
  void aSecondPredictionWithoutARecordIsRefused() {
    move(track, 1);
    smoother.record(work, track);
    move(track, 2);
    move(track, 3);
    assertRefused(
        () -> smoother.record(work, track), "last record is at t = 1.0 s", "from t = 2.0 s");
    assertEquals(2, smoother.size());
  }

  /** The model threw half way: what the workspace holds is of no prediction. */
  @Test
  void nothingIsRecordedOfAModelThatThrows() {
    move(track, 1);
    motion.set(FaultyMotion.Fault.THROWS);
    assertThrows(IllegalStateException.class, () -> work.predict(track, 2, CONTROL));
    assertNames(
        work.failure(), "the model threw an exception", "FaultyMotion", "t = 1.0 s to 2.0 s");
    assertRefused(() -> smoother.record(work, track), "t = 1.0 s", "moved none");
    assertRefused(() -> work.prediction(track, new DMatrixRMaj(2, 2)), "moved none");
    assertEquals(1, smoother.size());
    motion.set(FaultyMotion.Fault.NONE);
    move(track, 2);
    assertEquals("", work.failure());
  }

  @Test
  void aSensorThatThrowsIsTold() {
    FaultySensor sensor = new FaultySensor();
    SensorPort port = work.port(sensor);
    sensor.set(FaultySensor.Fault.THROWS);
    assertThrows(IllegalStateException.class, () -> port.update(track, new double[2]));
    assertNames(port.failure(), "the model threw an exception", "FaultySensor", "t = 0.0 s");
    sensor.set(FaultySensor.Fault.NONE);
    assertEquals(StepStatus.APPLIED, port.update(track, new double[2]));
    assertEquals("", port.failure());
  }

  /** Also a failed step forgets the one before. */
  @Test
  void nothingIsRecordedOfAStepThatFailed() {
    move(track, 1);
    motion.set(FaultyMotion.Fault.NAN);
    assertEquals(StepStatus.MODEL_NOT_FINITE, work.predict(track, 2, CONTROL));
    assertRefused(() -> smoother.record(work, track), "moved none");
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 3})
  void aCrossCovarianceOfTheWrongShapeIsRefused(int size) {
    move(track, 1);
    for (DMatrixRMaj cross : List.of(new DMatrixRMaj(2, size), new DMatrixRMaj(size, 2))) {
      IllegalArgumentException refusal =
          assertThrows(IllegalArgumentException.class, () -> work.prediction(track, cross));
      assertNames(
          refusal.getMessage(),
          "cross must be 2 x 2, got " + cross.numRows + " x " + cross.numCols);
    }
    work.prediction(track, new DMatrixRMaj(2, 2));
  }
}
