package dev.estimation.benchmarks.study;

import dev.estimation.benchmarks.log.BadInputException;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.Model.OptionSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.ParseResult;
import picocli.CommandLine.Spec;

/**
 * The study program. Exit codes: 0 done, 2 bad input (told in one line), 1 a fault of its own, or that a comparison found a
 * loss.
 */
@Command(
    name = "study",
    description = "Compares filters and methods on a recorded log.",
    subcommands = {ReplayCommand.class, WeighCommand.class, SweepCommand.class, CompareCommand.class
    })
public final class Study implements Runnable {
  @Spec
  private CommandSpec spec;

  /** Runs a command and exits. */
  public static void main(String[] arguments) {
    System.exit(commandLine().execute(arguments));
  }

  /** {@return the commands, with errors told in one line} */
  static CommandLine commandLine() {
    CommandLine study = new CommandLine(new Study())
        .setParameterExceptionHandler((error, arguments) -> tell(error.getCommandLine(), error))
        .setExecutionExceptionHandler(Study::handle);
    addHelp(study);
    study.getSubcommands().values().forEach(Study::addHelp);
    return study;
  }

  private static void addHelp(CommandLine command) {
    command
        .getCommandSpec()
        .addOption(OptionSpec.builder("--help")
            .usageHelp(true)
            .description("show this help and exit")
            .build());
  }

  @Override
  public void run() {
    throw new ParameterException(
        spec.commandLine(), "a command is wanted: replay, weigh, sweep or compare; see --help");
  }

  private static int handle(Exception error, CommandLine command, ParseResult parsed)
      throws Exception {
    if (error instanceof BadInputException) {
      return tell(command, error);
    }
    throw error;
  }

  private static int tell(CommandLine command, Exception error) {
    command.getErr().println("study: " + error.getMessage().replaceAll("\\s+", " "));
    command.getErr().flush();
    return CommandLine.ExitCode.USAGE;
  }
}
