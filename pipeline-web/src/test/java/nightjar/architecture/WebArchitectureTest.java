package nightjar.architecture;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static org.junit.jupiter.api.Assertions.assertEquals;

import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.nio.file.Path;
import java.util.Set;
import java.util.stream.Collectors;
import org.jspecify.annotations.NullMarked;
import org.junit.jupiter.api.Test;

/** The commands see of the core what callers need, and keep their libraries to themselves. */
final class WebArchitectureTest {
  private static final JavaClasses WEB =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .importPath(Path.of("target", "classes"));

  @Test
  void everyPackageIsListedAndNullMarked() {
    Set<String> packages = WEB.stream().map(JavaClass::getPackageName).collect(Collectors.toSet());
    assertEquals(Set.of("nightjar.cli"), packages);
    for (String name : packages) {
      assertEquals(true, WEB.getPackage(name).isAnnotatedWith(NullMarked.class), name);
    }
  }

  @Test
  void commandsUseOnlyWhatCallersOfTheCoreNeed() {
    classes()
        .that()
        .resideInAPackage("nightjar.cli")
        .should()
        .onlyDependOnClassesThat()
        .resideInAnyPackage(
            "java..",
            "nightjar.cli",
            "nightjar.analysis",
            "nightjar.plan",
            "nightjar.recording",
            "nightjar.refusal",
            "nightjar.storage",
            "nightjar.demo",
            "picocli..",
            "me.tongfei.progressbar..",
            "com.fasterxml.jackson..",
            "org.jspecify..")
        .check(WEB);
  }

  @Test
  void noLegacyClockIsRead() {
    noClasses()
        .should()
        .callMethod(System.class, "currentTimeMillis")
        .orShould()
        .callMethod(java.time.Instant.class, "now")
        .because("clocks are named where they are read")
        .check(WEB);
  }
}
