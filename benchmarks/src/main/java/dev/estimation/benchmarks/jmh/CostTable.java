package dev.estimation.benchmarks.jmh;

import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.PrintWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Collection;
import java.util.List;
import org.openjdk.jmh.results.RunResult;
import org.openjdk.jmh.runner.RunnerException;

/**
 * What each matching costs beside how accurate it is, in one table: {@link MatchingBenchmark} joined with errors against
 * converged moments, then {@link ScalingBenchmark} with fitted slopes. Prints both and writes them as JSON.
 *
 * <pre>{@code
 * java -cp benchmarks/target/study.jar dev.estimation.benchmarks.jmh.CostTable \
 *     [--full] [--date DATE] [--commit COMMIT] [--out FILE]
 * }</pre>
 *
 * <p>Without {@code --full} few combinations in short iterations, some three minutes: times are rough then. Date and commit
 * are noted as they are given. The file is {@code benchmarks/target/cost-table.json} unless told otherwise.
 */
public final class CostTable {
  private CostProfile profile = CostProfile.QUICK;
  private String date;
  private String commit;
  private Path file = Path.of("benchmarks", "target", "cost-table.json");

  private CostTable() {}

  /**
   * Makes the table.
   *
   * @param arguments as above
   */
  public static void main(String[] arguments) throws IOException, RunnerException {
    CostTable table = new CostTable();
    table.read(arguments);
    table.make();
  }

  private void read(String[] arguments) {
    for (int i = 0; i < arguments.length; i++) {
      String name = arguments[i];
      switch (name) {
        case "--full" -> profile = CostProfile.FULL;
        case "--date" -> date = value(arguments, ++i, name);
        case "--commit" -> commit = value(arguments, ++i, name);
        case "--out" -> file = Path.of(value(arguments, ++i, name));
        default -> throw new IllegalArgumentException("unknown argument " + name);
      }
    }
  }

  private static String value(String[] arguments, int at, String name) {
    if (at == arguments.length) {
      throw new IllegalArgumentException(name + " wants a value, got none");
    }
    return arguments[at];
  }

  private void make() throws IOException, RunnerException {
    Files.createDirectories(file.toAbsolutePath().getParent());
    List<CostRow> rows = CostRow.of(timings(profile.runMatchings()));
    List<ScalingCurve> curves = ScalingCurve.of(timings(profile.runScaling()));
    PrintWriter out = new PrintWriter(System.out, true, StandardCharsets.UTF_8);
    CostPrinter printer = new CostPrinter(out);
    printer.printRows(rows);
    printer.printCurves(curves);
    CostDocument document = new CostDocument(profile, date, commit);
    document.add(rows);
    document.addCurves(curves);
    new ObjectMapper().writerWithDefaultPrettyPrinter().writeValue(file.toFile(), document.root());
    out.println("Written: " + file);
  }

  private static List<Timing> timings(Collection<RunResult> runs) {
    return runs.stream().map(Timing::of).toList();
  }
}
