package dev.estimation.benchmarks.study;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Path;
import picocli.CommandLine;

/**
 * What the program did when it was run in this process.
 *
 * @param code exit code
 * @param out standard output
 * @param err standard error
 */
record StudyRun(int code, String out, String err) {
  static StudyRun of(Object... arguments) {
    String[] words = new String[arguments.length];
    for (int i = 0; i < words.length; i++) {
      words[i] = arguments[i].toString();
    }
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    CommandLine study = Study.commandLine();
    study.setOut(new PrintWriter(out));
    study.setErr(new PrintWriter(err));
    int code = study.execute(words);
    return new StudyRun(code, out.toString(), err.toString());
  }

  static JsonNode results(Path folder) throws IOException {
    return new ObjectMapper().readTree(folder.resolve("results.json").toFile());
  }
}
