package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.cases.balloon.BalloonCase;
import dev.estimation.benchmarks.cases.gnss.GnssCase;
import dev.estimation.benchmarks.cases.robot.RobotCase;
import dev.estimation.benchmarks.cases.uwb.UwbCase;
import dev.estimation.benchmarks.cases.vessel.VesselCase;
import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.LogFolder;
import dev.estimation.benchmarks.replay.ReplayCase;

/** Finds a case by its name and reads its log. */
final class CaseOpener {
  static final String DEMO = "demo";

  private static final String ON_LOGS = "vessel, uwb, robot, gnss";

  private final String caseName;
  private final String log;
  private final UwbOptions uwb;

  /**
   * What was asked for.
   *
   * @param log as typed; null if none was
   * @param uwb the options that one case has
   */
  CaseOpener(String caseName, String log, UwbOptions uwb) {
    this.caseName = caseName;
    this.log = log;
    this.uwb = uwb;
  }

  ReplayCase open() {
    if (!caseName.equals("uwb")) {
      uwb.requireUnused(caseName);
    }
    return switch (caseName) {
      case "vessel" -> new VesselCase(requireLog());
      case "uwb" -> new UwbCase(requireLog(), uwb.settings());
      case "robot" -> new RobotCase(requireLog());
      case "gnss" -> new GnssCase(requireLog());
      case DEMO -> {
        requireNoLog();
        yield new BalloonCase();
      }
      default ->
        throw new BadInputException(
            "--case must be one of " + ON_LOGS + ", " + DEMO + "; got '" + caseName + "'");
    };
  }

  private void requireNoLog() {
    if (log != null) {
      throw new BadInputException("case demo is simulated and reads no --log, got " + log
          + "; name the log's --case: one of " + ON_LOGS);
    }
  }

  private LogFolder requireLog() {
    if (log == null) {
      throw new BadInputException("case " + caseName + " wants --log FOLDER, got none");
    }
    return LogFolder.open(log);
  }
}
