package dev.estimation.filters.guide;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import dev.estimation.filters.model.Motion;
import dev.estimation.filters.model.SensorModel;
import dev.estimation.filters.modelcheck.FindingKind;
import dev.estimation.filters.modelcheck.ModelFinding;
import dev.estimation.filters.motion.ContinuousMotion;
import dev.estimation.filters.motion.RandomWalk;
import dev.estimation.filters.sensor.Range;
import java.io.IOException;
import java.util.Collection;
import java.util.EnumSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

/** Every ready model is clean over all its regions, and MODELS.md says what it is. */
class ReadyModelsTest {
  static List<ReadyModel> models() {
    return Stream.of(ReadyMotions.all(), ReadySensors.all())
        .flatMap(Collection::stream)
        .toList();
  }

  /** No fault, no hint and no note, but those that are known, and these are there. */
  @ParameterizedTest
  @MethodSource("models")
  void isClean(ReadyModel model) {
    Set<FindingKind> found = EnumSet.noneOf(FindingKind.class);
    model.reports().forEach((where, report) -> {
      report.assertClean();
      Set<FindingKind> kinds =
          report.findings().stream().map(ModelFinding::kind).collect(Collectors.toSet());
      assertTrue(model.known().keySet().containsAll(kinds), () -> where + ": " + report);
      assertEquals(List.of(), report.notes(), where);
      found.addAll(kinds);
    });
    assertEquals(model.known().keySet(), found);
  }

  @Test
  void noReadyModelIsLeftOut() {
    Set<String> named = models().stream()
        .map(ReadyModel::name)
        .flatMap(name -> Stream.of(name.split("\\W+")))
        .collect(Collectors.toSet());
    Set<String> ready = Stream.of(RandomWalk.class, Range.class)
        .flatMap(in -> new ClassFileImporter().importPackagesOf(in).stream())
        .filter(ReadyModelsTest::isReady)
        .map(JavaClass::getSimpleName)
        .collect(Collectors.toSet());
    assertTrue(ready.containsAll(Set.of("RandomWalk", "FallingBody", "KnownVector")), "search");
    ready.removeAll(named);
    assertEquals(Set.of(), ready);
  }

  private static boolean isReady(JavaClass type) {
    return type.getModifiers().contains(JavaModifier.PUBLIC)
        && !type.isInterface()
        && type.getSource()
            .filter(source -> source.getUri().toString().contains("/test"))
            .isEmpty()
        && Stream.of(Motion.class, SensorModel.class, ContinuousMotion.class)
            .anyMatch(type::isAssignableTo);
  }

  @Test
  void theGuideHasTheTable() throws IOException {
    String table =
        ReadyModel.head() + models().stream().map(ReadyModel::row).collect(Collectors.joining());
    Guide.assertHolds("ready-models.md", table);
  }
}
