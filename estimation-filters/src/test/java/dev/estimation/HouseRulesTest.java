package dev.estimation;

import static com.tngtech.archunit.base.DescribedPredicate.describe;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAPackage;
import static com.tngtech.archunit.core.domain.JavaClass.Predicates.resideInAnyPackage;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.fields;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.Dependency;
import com.tngtech.archunit.core.domain.JavaAccess;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaField;
import com.tngtech.archunit.core.domain.JavaModifier;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import com.tngtech.archunit.lang.ArchCondition;
import com.tngtech.archunit.lang.ArchRule;
import com.tngtech.archunit.lang.ConditionEvents;
import com.tngtech.archunit.lang.EvaluationResult;
import com.tngtech.archunit.lang.SimpleConditionEvent;
import java.time.Clock;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;

/**
 * The rules that the classes of both library modules keep. Every rule is also run over the classes
 * of {@code dev.estimation.fixture}, which break it on purpose: a rule that never fires guards
 * nothing.
 */
class HouseRulesTest {
  private static final String ROOT = "dev.estimation";
  private static final String FIXTURE = "dev.estimation.fixture";

  /**
   * One row for each package, relative to the root: the package, an arrow and the packages that it
   * may use besides itself. {@code core.*} stands for every row that begins so. A package without a
   * row is an error, so a new package begins with a new row.
   */
  private static final String ARROWS = """
      core.internal       ->
      core.space          -> core.internal
      core.gaussian       -> core.internal core.space
      core.function       -> core.internal core.space
      core.points         -> core.internal
      core.matching       -> core.internal core.space core.gaussian core.function core.points
      core.accuracy       -> core.internal core.space core.gaussian core.function core.points core.matching
      filters.model       -> core.*
      filters.motion      -> core.* filters.model
      filters.sensor      -> core.* filters.model
      filters.geodesy     -> core.internal
      filters.consistency -> core.*
      filters.filter      -> core.* filters.model filters.consistency
      filters.smoother    -> core.* filters.filter
      filters.modelcheck  -> core.* filters.model
      """;

  /** Types of which a static field, though final, would still be shared state that changes. */
  private static final List<String> MUTABLE_TYPES = List.of(
      "java.util.Collection",
      "java.util.Map",
      "java.util.Iterator",
      "java.util.BitSet",
      "java.util.Random",
      "java.util.random.RandomGenerator",
      "java.util.Date",
      "java.util.Calendar",
      "java.lang.AbstractStringBuilder",
      "java.text.Format",
      "org.ejml.data.Matrix",
      "org.apache.commons.math3.random.RandomGenerator");

  private static final JavaClasses LIBRARY = new ClassFileImporter()
      .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
      // The test helpers of estimation-core come as a jar once that module is packaged.
      .withImportOption(location -> !location.contains("-tests.jar"))
      .importPackages(ROOT);

  private static final JavaClasses OFFENDERS = new ClassFileImporter().importPackages(FIXTURE);

  @Test
  @DisplayName("the rules see the classes of both modules, and no test")
  void seesBothModules() {
    assertTrue(LIBRARY.stream().anyMatch(resideInAPackage(ROOT + ".core..")));
    assertTrue(LIBRARY.stream().anyMatch(resideInAPackage(ROOT + ".filters..")));
    assertFalse(LIBRARY.contain(HouseRulesTest.class));
    assertFalse(LIBRARY.stream().anyMatch(type -> type.getSimpleName().endsWith("Test")));
  }

  @Test
  @DisplayName("packages use each other only along the arrows of the table")
  void packagesFollowTheArrows() {
    keeps(followArrows(ROOT));
    breaks(
        followArrows(FIXTURE),
        "core.internal may not use core.space",
        "core.space may not use filters.model",
        "stray has no row in the table");
  }

  @Test
  @DisplayName("the core knows nothing of the filters")
  void coreIsBelowFilters() {
    keeps(coreBelowFilters(ROOT));
    breaks(coreBelowFilters(FIXTURE), "core.space.LooksUpAndDown");
  }

  @Test
  @DisplayName("packages form no cycle")
  void noCycles() {
    keeps(acyclic(ROOT));
    breaks(acyclic(FIXTURE), "Cycle detected");
  }

  @Test
  @DisplayName("no static state that can change")
  void noMutableStatics() {
    ArchRule rule = fields()
        .that()
        .areStatic()
        // The compiler's own, such as the values of an enum.
        .and(describe("written by hand", f -> !f.getModifiers().contains(JavaModifier.SYNTHETIC)))
        .should(beConstant())
        // A library without static fields keeps the rule too.
        .allowEmptyShould(true);
    keeps(rule);
    breaks(
        rule,
        "NotFinal.counter is not final",
        "MutableStatics.ARRAY is of a mutable type",
        "MutableStatics.LIST is of a mutable type",
        "MutableStatics.MAP is of a mutable type",
        "MutableStatics.RANDOM is of a mutable type",
        "MutableStatics.TEXT is of a mutable type",
        "MutableStatics.ATOMIC is of a mutable type",
        "MutableStatics.MATRIX is of a mutable type");
    assertFalse(String.join("\n", failures(rule)).contains("Harmless"));
  }

  @Test
  @DisplayName("no ThreadLocal")
  void noThreadLocal() {
    ArchRule rule = noClasses().should().dependOnClassesThat().areAssignableTo(ThreadLocal.class);
    keeps(rule);
    breaks(rule, "UsesThreadLocal");
  }

  @Test
  @DisplayName("nothing is printed")
  void noPrinting() {
    ArchRule rule = noClasses()
        .should()
        .accessField(System.class, "out")
        .orShould()
        .accessField(System.class, "err")
        .orShould()
        .accessTargetWhere(target("printStackTrace", Throwable.class.getName()));
    keeps(rule);
    breaks(rule, "Prints.out()", "Prints.err()", "Prints.trace(");
  }

  @Test
  @DisplayName("no clock is read")
  void noClock() {
    ArchRule rule = noClasses().should().accessTargetWhere(readsClock());
    keeps(rule);
    breaks(
        rule,
        "ReadsClock.millis()",
        "ReadsClock.nanos()",
        "ReadsClock.nanosByReference()",
        "ReadsClock.instant()",
        "ReadsClock.local()",
        "ReadsClock.clock()");
  }

  @Test
  @DisplayName("no java.util.logging")
  void noLogging() {
    ArchRule rule = noDependenceOn("java.util.logging..");
    keeps(rule);
    breaks(rule, "Offences$Logs");
  }

  @Test
  @DisplayName("nothing is used but the JDK, EJML and commons-math")
  void onlyTheAgreedLibraries() {
    ArchRule rule = classes()
        .should()
        .onlyDependOnClassesThat(
            resideInAnyPackage("java..", "org.ejml..", "org.apache.commons.math3..", ROOT + ".."));
    keeps(rule);
    breaks(rule, "Offences$UsesOther");
    assertFalse(String.join("\n", failures(rule)).contains("Harmless"));
  }

  @Test
  @DisplayName("commons-math lends no filter")
  void noForeignFilter() {
    keeps(noDependenceOn("org.apache.commons.math3.filter.."));
    // No class here may touch that package, so a neighbour of it shows that such a rule fires.
    breaks(noDependenceOn("org.apache.commons.math3.util.."), "Offences$Harmless");
  }

  private static void keeps(ArchRule rule) {
    rule.check(LIBRARY);
  }

  /** Asserts that the rule reports each of these in some class of the fixture. */
  private static void breaks(ArchRule rule, String... expected) {
    List<String> failures = failures(rule);
    for (String part : expected) {
      assertTrue(
          failures.stream().anyMatch(line -> line.contains(part)),
          () -> "not reported: " + part + " in\n" + String.join("\n", failures));
    }
  }

  private static List<String> failures(ArchRule rule) {
    EvaluationResult result = rule.evaluate(OFFENDERS);
    return result.getFailureReport().getDetails();
  }

  private static ArchRule coreBelowFilters(String root) {
    return noClasses()
        .that()
        .resideInAPackage(root + ".core..")
        .should()
        .dependOnClassesThat()
        .resideInAPackage(root + ".filters..");
  }

  private static ArchRule acyclic(String root) {
    return slices().matching(root + ".(**)").should().beFreeOfCycles();
  }

  private static ArchRule noDependenceOn(String packages) {
    return noClasses().should().dependOnClassesThat().resideInAPackage(packages);
  }

  private static ArchRule followArrows(String root) {
    Map<String, Set<String>> table = table();
    return classes()
        .that()
        .resideInAPackage(root + "..")
        .should(new ArchCondition<JavaClass>("follow the arrows between packages") {
          @Override
          public void check(JavaClass type, ConditionEvents events) {
            String from = relative(type, root);
            Set<String> allowed = table.get(from);
            if (allowed == null) {
              report(type, from + " has no row in the table: " + type.getName(), events);
              return;
            }
            for (Dependency dependency : type.getDirectDependenciesFromSelf()) {
              JavaClass target = dependency.getTargetClass().getBaseComponentType();
              if (!target.getPackageName().startsWith(root + ".")) {
                continue;
              }
              String to = relative(target, root);
              if (!to.equals(from) && !allowed.contains(to)) {
                String arrow = from + " may not use " + to;
                report(type, arrow + ": " + dependency.getDescription(), events);
              }
            }
          }
        });
  }

  private static void report(Object where, String what, ConditionEvents events) {
    events.add(SimpleConditionEvent.violated(where, what));
  }

  private static String relative(JavaClass type, String root) {
    String name = type.getPackageName();
    return name.equals(root) ? "" : name.substring(root.length() + 1);
  }

  /** Reads {@link #ARROWS}. */
  private static Map<String, Set<String>> table() {
    Map<String, String> rows = new LinkedHashMap<>();
    ARROWS.lines().forEach(line -> {
      String[] sides = line.split("->", -1);
      assertEquals(2, sides.length, line);
      rows.put(sides[0].strip(), sides[1].strip());
    });
    Map<String, Set<String>> table = new LinkedHashMap<>();
    rows.forEach((name, used) -> {
      Set<String> allowed = new LinkedHashSet<>();
      for (String word : used.split(" +", -1)) {
        if (word.endsWith(".*")) {
          String group = word.substring(0, word.length() - 1);
          rows.keySet().stream().filter(row -> row.startsWith(group)).forEach(allowed::add);
        } else if (!word.isEmpty()) {
          assertTrue(rows.containsKey(word), () -> "no row for " + word);
          allowed.add(word);
        }
      }
      table.put(name, allowed);
    });
    return table;
  }

  private static ArchCondition<JavaField> beConstant() {
    return new ArchCondition<>("be final and of an immutable type") {
      @Override
      public void check(JavaField field, ConditionEvents events) {
        if (!field.getModifiers().contains(JavaModifier.FINAL)) {
          report(field, field.getFullName() + " is not final", events);
        }
        JavaClass type = field.getRawType();
        if (type.isArray()
            || type.getPackageName().equals("java.util.concurrent.atomic")
            || MUTABLE_TYPES.stream().anyMatch(type::isAssignableTo)) {
          report(field, field.getFullName() + " is of a mutable type", events);
        }
      }
    };
  }

  /** A call of, or a method reference to, a method of this name in this type or one below it. */
  private static DescribedPredicate<JavaAccess<?>> target(String method, String owner) {
    return describe(
        owner + "." + method,
        access -> access.getTarget().getName().equals(method)
            && access.getTargetOwner().isAssignableTo(owner));
  }

  private static DescribedPredicate<JavaAccess<?>> readsClock() {
    return describe("a clock is read", access -> {
      String name = access.getTarget().getName();
      JavaClass owner = access.getTargetOwner();
      return (owner.isEquivalentTo(System.class)
              && (name.equals("currentTimeMillis") || name.equals("nanoTime")))
          || (owner.isEquivalentTo(Clock.class)
              && (name.startsWith("system") || name.startsWith("tick")))
          || (owner.getPackageName().startsWith("java.time") && name.equals("now"));
    });
  }
}
