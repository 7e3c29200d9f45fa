package dev.estimation.benchmarks.page;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.InputStream;
import java.io.Writer;
import java.nio.charset.StandardCharsets;
import java.util.Properties;

/** The page around the data: HTML, style, script and chart library, each in a resource of its own. */
final class PageTemplate {
  private static final String CHARTS = "/META-INF/resources/webjars/echarts/";
  private static final String CHARTS_VERSION =
      "/META-INF/maven/org.webjars.npm/echarts/pom.properties";

  void write(JsonNode data, Writer out) throws IOException {
    String rest = text("replay.html");
    rest = writeUpTo("@style@", rest, text("replay.css"), out);
    rest = writeUpTo("@data@", rest, json(data), out);
    rest = writeUpTo("@charts@", rest, charts(), out);
    rest = writeUpTo("@script@", rest, text("replay.js"), out);
    out.write(rest);
  }

  /** Writes the template up to a mark, and what stands for the mark. Returns what comes after it. */
  private static String writeUpTo(String mark, String template, String content, Writer out)
      throws IOException {
    int at = template.indexOf(mark);
    if (at < 0) {
      throw new IllegalStateException("the page's template has no " + mark);
    }
    out.write(template.substring(0, at));
    out.write(content);
    return template.substring(at + mark.length());
  }

  /** So that no text from outside ends the block of data or begins a comment in it. */
  static String json(JsonNode data) throws IOException {
    return new ObjectMapper().writeValueAsString(data).replace("<", "\\u003c");
  }

  private static String charts() throws IOException {
    Properties properties = new Properties();
    try (InputStream in = open(CHARTS_VERSION)) {
      properties.load(in);
    }
    return text(CHARTS + properties.getProperty("version") + "/dist/echarts.min.js");
  }

  private static String text(String resource) throws IOException {
    try (InputStream in = open(resource)) {
      return new String(in.readAllBytes(), StandardCharsets.UTF_8);
    }
  }

  private static InputStream open(String resource) {
    InputStream in = PageTemplate.class.getResourceAsStream(resource);
    if (in == null) {
      throw new IllegalStateException("not on the class path: " + resource);
    }
    return in;
  }
}
