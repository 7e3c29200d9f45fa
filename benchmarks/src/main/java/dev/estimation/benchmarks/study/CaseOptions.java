package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.replay.LoadedVariant;
import dev.estimation.benchmarks.replay.ReplayCase;
import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import picocli.CommandLine.Mixin;
import picocli.CommandLine.Option;

/** The options that say which case, on which log, in which variants. */
final class CaseOptions {
  @Option(
      names = "--case",
      paramLabel = "NAME",
      description = "vessel, uwb, robot, gnss or demo (the default)")
  private String caseName;

  @Option(
      names = "--case-class",
      paramLabel = "CLASS",
      description = "a ReplayCase of your own on the class path, in place of --case")
  private String caseClass;

  @Option(names = "--variant", paramLabel = "NAME", description = "repeatable; all if not given")
  private List<String> variants = new ArrayList<>();

  @Option(names = "--log", paramLabel = "FOLDER", description = "the recorded log")
  private String log;

  @Mixin
  private UwbOptions uwb = new UwbOptions();

  /** {@return the name of the case, or of its class} */
  String name() {
    if (caseClass != null) {
      return caseClass;
    }
    return caseName == null ? CaseOpener.DEMO : caseName;
  }

  /** {@return as typed; null if none was} */
  String log() {
    return log;
  }

  /** Reads the log, and makes the variants that were asked for. */
  List<LoadedVariant> load() {
    return load(open());
  }

  /** Makes the variants that were asked for of a case. */
  List<LoadedVariant> load(ReplayCase opened) {
    List<String> known = opened.variants();
    List<String> names = variants.isEmpty() ? known : variants;
    for (String name : names) {
      if (!known.contains(name)) {
        throw new BadInputException("--variant of case " + name() + " must be one of "
            + String.join(", ", known) + "; got '" + name + "'");
      }
    }
    return new LinkedHashSet<>(names).stream().map(opened::load).toList();
  }

  /** Reads the log. */
  ReplayCase open() {
    if (caseClass == null) {
      return new CaseOpener(name(), log, uwb).open();
    }
    if (caseName != null || log != null) {
      throw new BadInputException("--case-class " + caseClass
          + " stands in place of --case and finds its log itself; got also "
          + (caseName != null ? "--case " + caseName : "--log " + log));
    }
    uwb.requireUnused(caseClass);
    return CaseClass.open(caseClass);
  }
}
