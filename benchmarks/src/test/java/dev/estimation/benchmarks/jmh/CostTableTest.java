package dev.estimation.benchmarks.jmh;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.util.List;
import org.junit.jupiter.api.Test;

/** Joining, front, slopes and the file, on times that are made up. */
class CostTableTest {
  private static final List<Timing> TIMINGS = List.of(
      carry("polar:2", "linear", 100),
      carry("polar:2", "cubature3", 300),
      carry("polar:2", "unscented", 200),
      carry("polar:2", "sparse2", 900),
      carry("turn:5", "linear", 400),
      new Timing("polar:2", "linear", "modelOnly", 40, 39, 41, 0));

  private static Timing carry(String subject, String matching, double nanos) {
    return new Timing(subject, matching, "carry", nanos, nanos - 1, nanos + 9, 0);
  }

  /** Cubature is slower than the unscented points and here less accurate; nothing else is beaten. */
  @Test
  void theFrontIsMarkedForEachProblem() {
    for (CostRow row : CostRow.of(TIMINGS)) {
      assertEquals(!row.timing().matching().equals("cubature3"), row.onFront(), row::toString);
    }
  }

  /** Errors below that of the reference are not told apart: the faster of two such wins. */
  @Test
  void theFrontDoesNotTrustNoise() {
    CarryAccuracy one = new CarryAccuracy(1e-9, 1e-9, 1e-6, 5, 0);
    CarryAccuracy other = new CarryAccuracy(1e-12, 1e-12, 1e-6, 5, 0);
    CostRow fast = new CostRow(TIMINGS.get(0), Timing.ofModel(TIMINGS, "", ""), one, false);
    CostRow slow = new CostRow(TIMINGS.get(1), Timing.ofModel(TIMINGS, "", ""), other, false);
    List<CostRow> marked = CostRow.marked(List.of(fast, slow));
    assertTrue(marked.get(0).onFront());
    assertFalse(marked.get(1).onFront());
  }

  @Test
  void theModelsTimeIsJoined() {
    List<CostRow> rows = CostRow.of(TIMINGS);
    assertEquals(40, rows.get(0).model().orElseThrow(), 0);
    assertTrue(rows.get(1).model().isEmpty());
  }

  /** 5 n^3 from 8 on, other times before: a slope of 3 to rounding. */
  @Test
  void theSlopeIsThatOfLargeN() {
    ScalingCurve curve = curve();
    assertEquals(
        List.of(2, 8, 15, 60), curve.points().stream().map(ScalingCurve::size).toList());
    assertEquals(3, curve.slope(), 1e-12);
  }

  private static ScalingCurve curve() {
    return ScalingCurve.of(List.of(
            carry("60", "cubature3", 5.0 * 60 * 60 * 60),
            carry("2", "cubature3", 700),
            carry("8", "cubature3", 5.0 * 8 * 8 * 8),
            carry("15", "cubature3", 5.0 * 15 * 15 * 15)))
        .get(0);
  }

  @Test
  void theFileHasWhatAChartWants() {
    CostDocument document = new CostDocument(CostProfile.QUICK, "2001-02-03", null);
    document.add(CostRow.of(TIMINGS));
    document.addCurves(List.of(curve()));
    JsonNode root = document.root();
    assertEquals("2001-02-03", root.path("date").asText());
    assertTrue(root.path("commit").isNull());
    assertTrue(root.path("jdk").asText().contains(Runtime.version().toString()));
    JsonNode call = root.path("calls").get(0);
    assertEquals("polar", call.path("function").asText());
    assertEquals(2, call.path("dimension").asInt());
    assertEquals(100, call.path("nanoseconds").asDouble(), 0);
    assertEquals(99, call.path("leastNanoseconds").asDouble(), 0);
    assertEquals(109, call.path("mostNanoseconds").asDouble(), 0);
    assertTrue(call.path("meanError").asDouble() > 0);
    assertTrue(call.path("covarianceError").asDouble() > 0);
    assertTrue(call.path("onFront").isBoolean());
    JsonNode curve = root.path("scaling").get(0);
    assertEquals(3, curve.path("theoreticalSlope").asDouble(), 0);
    assertEquals(4, curve.path("points").size());
    assertEquals(2, curve.path("points").get(0).path("n").asInt());
  }

  @Test
  void refusesWhatItDoesNotKnow() {
    for (String[] wrong : new String[][] {{"--fast"}, {"--date"}}) {
      Exception refusal = assertThrows(IllegalArgumentException.class, () -> CostTable.main(wrong));
      assertTrue(refusal.getMessage().contains(wrong[0]), refusal::getMessage);
    }
  }

  @Test
  void theTextTellsFrontAndSlopes() {
    StringWriter text = new StringWriter();
    CostPrinter printer = new CostPrinter(new PrintWriter(text));
    printer.printRows(CostRow.of(TIMINGS));
    printer.printCurves(List.of(curve()));
    assertTrue(text.toString().contains("* unscented"), text::toString);
    assertTrue(text.toString().contains("  cubature3"), text::toString);
    assertTrue(text.toString().contains("slope 3.00, theory 3"), text::toString);
  }
}
