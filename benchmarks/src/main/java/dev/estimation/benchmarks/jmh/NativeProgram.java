package dev.estimation.benchmarks.jmh;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;

/**
 * A native program for the same step: takes a file of measurements and a number of repetitions, prints
 * the lines {@code ns_per_step}, {@code mean} and {@code variances}, each followed by numbers.
 */
final class NativeProgram {
  private static final Path EIGEN = Path.of("/usr/include/eigen3/Eigen/Dense");

  private final Path program;
  private double nanosPerStep = Double.NaN;

  private NativeProgram(Path program) {
    this.program = program;
  }

  /** Whether the compiler and the matrix library are there. */
  static boolean canCompile() throws InterruptedException {
    try {
      Process version = new ProcessBuilder("g++", "--version").start();
      version.getInputStream().readAllBytes();
      return version.waitFor() == 0 && Files.exists(EIGEN);
    } catch (IOException noCompiler) {
      return false;
    }
  }

  /** Compiles a source file for this machine. */
  static NativeProgram compile(Path source) throws IOException, InterruptedException {
    Path program = Files.createTempDirectory("native").resolve("step");
    Process compiler = new ProcessBuilder(
            "g++",
            "-O3",
            "-march=native",
            "-std=c++17",
            "-I/usr/include/eigen3",
            source.toString(),
            "-o",
            program.toString())
        .redirectErrorStream(true)
        .start();
    String messages = read(compiler);
    if (compiler.waitFor() != 0) {
      throw new IOException("cannot compile " + source + ": " + messages);
    }
    return new NativeProgram(program);
  }

  /** Runs it; returns the mean and the variances that it prints. */
  List<double[]> run(Path measurements, int repetitions) throws IOException, InterruptedException {
    Process run = new ProcessBuilder(
            program.toString(), measurements.toString(), Integer.toString(repetitions))
        .redirectErrorStream(true)
        .start();
    String output = read(run);
    if (run.waitFor() != 0) {
      throw new IOException("the native program failed: " + output);
    }
    nanosPerStep = numbers(output, "ns_per_step")[0];
    return List.of(numbers(output, "mean"), numbers(output, "variances"));
  }

  private static String read(Process process) throws IOException {
    return new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8);
  }

  private static double[] numbers(String output, String name) throws IOException {
    return output
        .lines()
        .filter(line -> line.startsWith(name + " "))
        .findFirst()
        .map(line -> Arrays.stream(line.substring(name.length()).trim().split(" "))
            .mapToDouble(Double::parseDouble)
            .toArray())
        .orElseThrow(() -> new IOException("the native program printed no " + name));
  }

  /** The time of the last run. */
  double nanosPerStep() {
    return nanosPerStep;
  }
}
