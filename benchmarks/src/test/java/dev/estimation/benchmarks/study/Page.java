package dev.estimation.benchmarks.study;

import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * A page, read back.
 *
 * @param html all of it
 */
record Page(String html) {
  private static final String BEGIN = "<script type=\"application/json\" id=\"data\">";

  static Page in(Path folder) throws IOException {
    return new Page(Files.readString(folder.resolve("replay.html")));
  }

  /** {@return the block of data} */
  JsonNode data() throws IOException {
    int begin = html.indexOf(BEGIN);
    assertTrue(begin > 0, "a block of data");
    return new ObjectMapper()
        .readTree(html.substring(begin + BEGIN.length(), html.indexOf("</script>", begin)));
  }
}
