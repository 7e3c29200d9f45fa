package dev.estimation.filters.guide;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import dev.estimation.core.gaussian.Gaussian;
import dev.estimation.filters.filter.FilterPlan;
import java.io.ByteArrayOutputStream;
import java.io.File;
import java.io.IOException;
import java.io.PrintStream;
import java.net.URISyntaxException;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import javax.tools.ToolProvider;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Programs in README.md compile with the compiler of this JDK and print what stands below them. */
class ReadmeTest {
  private static final Pattern PROGRAM =
      Pattern.compile("```java\n(.*?)```.*?```text\n(.*?)```", Pattern.DOTALL);
  private static final Pattern CLASS = Pattern.compile("^class (\\w+)", Pattern.MULTILINE);

  @TempDir
  Path folder;

  @Test
  void programsPrintWhatTheReadmeSays() throws Exception {
    String readme = Files.readString(Path.of("..", "README.md"));
    Matcher program = PROGRAM.matcher(readme);
    int programs = 0;
    while (program.find()) {
      assertEquals(program.group(2), run(program.group(1)));
      programs++;
    }
    assertTrue(programs >= 1, "README.md must hold at least 1 program, got " + programs);
    assertEquals(programs, readme.split("```java\n", -1).length - 1, "java blocks without output");
  }

  private String run(String source) throws Exception {
    Matcher name = CLASS.matcher(source);
    assertTrue(name.find(), "a program must start with a class of its own");
    Path file = Files.writeString(folder.resolve(name.group(1) + ".java"), source);
    ByteArrayOutputStream messages = new ByteArrayOutputStream();
    int result = ToolProvider.getSystemJavaCompiler()
        .run(
            null, messages, messages, "-d", folder.toString(), "-cp", classPath(), file.toString());
    assertEquals(0, result, () -> messages.toString(StandardCharsets.UTF_8));
    return output(name.group(1));
  }

  private static String classPath() {
    return Stream.of(FilterPlan.class, Gaussian.class, DMatrixRMaj.class)
        .map(ReadmeTest::location)
        .collect(Collectors.joining(File.pathSeparator));
  }

  private static String location(Class<?> type) {
    try {
      return Path.of(type.getProtectionDomain().getCodeSource().getLocation().toURI())
          .toString();
    } catch (URISyntaxException e) {
      throw new IllegalStateException(e);
    }
  }

  private String output(String className) throws ReflectiveOperationException, IOException {
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    PrintStream before = System.out;
    Locale locale = Locale.getDefault();
    try (URLClassLoader loader = new URLClassLoader(new URL[] {folder.toUri().toURL()});
        PrintStream captured = new PrintStream(bytes, true, StandardCharsets.UTF_8)) {
      System.setOut(captured);
      Locale.setDefault(Locale.ROOT);
      var main = loader.loadClass(className).getDeclaredMethod("main", String[].class);
      main.setAccessible(true);
      main.invoke(null, (Object) new String[0]);
    } finally {
      System.setOut(before);
      Locale.setDefault(locale);
    }
    return bytes.toString(StandardCharsets.UTF_8).replace("\r\n", "\n");
  }
}
