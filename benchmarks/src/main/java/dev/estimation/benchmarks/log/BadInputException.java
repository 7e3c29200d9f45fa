package dev.estimation.benchmarks.log;

/**
 * Something from outside that cannot be used: an option, a folder, a file, a cell. The message is
 * one line, written for whoever gave the input, and is shown as it is.
 */
public final class BadInputException extends RuntimeException {
  private static final long serialVersionUID = 1L;

  /** With what was wrong, in one line. */
  public BadInputException(String message) {
    super(message);
  }

  /** With what was wrong, in one line, and what found it. */
  public BadInputException(String message, Throwable cause) {
    super(message, cause);
  }
}
