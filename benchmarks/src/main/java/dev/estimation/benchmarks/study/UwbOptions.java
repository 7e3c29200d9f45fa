package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.cases.uwb.UwbSettings;
import dev.estimation.benchmarks.log.BadInputException;
import dev.estimation.benchmarks.log.DecimalNumber;
import picocli.CommandLine.Option;

/** The options that only the case {@code uwb} has. */
final class UwbOptions {
  @Option(
      names = "--lag",
      paramLabel = "S",
      description = "uwb: how late ranges are stamped (s; default 0.20)")
  private String lag;

  @Option(
      names = "--height",
      paramLabel = "M",
      description = "uwb: height of the tag (m; default 1.3)")
  private String height;

  @Option(
      names = "--bias",
      paramLabel = "M",
      description = "uwb: added to every range (m; default 0)")
  private String bias;

  @Option(
      names = "--near-start",
      paramLabel = "X,Y",
      description = "uwb: start of variant near (m; default -2.5,-4.0)")
  private String nearStart;

  UwbSettings settings() {
    UwbSettings usual = UwbSettings.DEFAULT;
    String near = nearStart == null ? usual.nearX() + "," + usual.nearY() : nearStart;
    String[] place = near.split(",", -1);
    if (place.length != 2) {
      throw new BadInputException("--near-start must be two numbers X,Y, got '" + near + "'");
    }
    return new UwbSettings(
        number("--lag", lag, usual.lag()),
        number("--height", height, usual.height()),
        number("--bias", bias, usual.bias()),
        number("--near-start", place[0], usual.nearX()),
        number("--near-start", place[1], usual.nearY()));
  }

  private static double number(String option, String text, double usual) {
    if (text == null) {
      return usual;
    }
    return DecimalNumber.parse(text)
        .orElseThrow(
            () -> new BadInputException(option + " must be a finite number, got '" + text + "'"));
  }

  /** Fails if one of these options was given to another case. */
  void requireUnused(String caseName) {
    if (lag != null || height != null || bias != null || nearStart != null) {
      throw new BadInputException(
          "--lag, --height, --bias and --near-start belong to case uwb, got case " + caseName);
    }
  }
}
