package nightjar.architecture;

import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.classes;
import static com.tngtech.archunit.lang.syntax.ArchRuleDefinition.noClasses;
import static com.tngtech.archunit.library.dependencies.SlicesRuleDefinition.slices;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.tngtech.archunit.base.DescribedPredicate;
import com.tngtech.archunit.core.domain.JavaClass;
import com.tngtech.archunit.core.domain.JavaClasses;
import com.tngtech.archunit.core.domain.JavaPackage;
import com.tngtech.archunit.core.importer.ClassFileImporter;
import com.tngtech.archunit.core.importer.ImportOption;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.jspecify.annotations.NullMarked;
import org.junit.jupiter.api.Test;

/** Packages by feature, arrows one way, libraries behind their fences. */
final class ArchitectureTest {
  /** What each package may use besides refusal and recording. */
  private static final Map<String, List<String>> MAY_USE = mayUse();

  private static final JavaClasses CORE =
      new ClassFileImporter()
          .withImportOption(ImportOption.Predefined.DO_NOT_INCLUDE_TESTS)
          .importPackages("nightjar");

  private static Map<String, List<String>> mayUse() {
    String stages = "film numeric alignment screening mask design glm inference regions verdict";
    Map<String, List<String>> m = new LinkedHashMap<>();
    put(m, "refusal", "");
    put(m, "recording", "");
    put(m, "numeric", "");
    put(m, "storage", "");
    put(m, "film", "");
    put(m, "alignment", "film numeric");
    put(m, "screening", "film numeric");
    put(m, "mask", "film numeric");
    put(m, "design", "numeric");
    put(m, "glm", "design film numeric");
    put(m, "inference", "glm design numeric");
    put(m, "regions", "glm design film numeric inference");
    put(m, "verdict", "screening alignment design glm inference regions");
    put(m, "plan", stages);
    put(m, "picture", "");
    put(m, "results", "storage " + stages);
    put(m, "report", "results picture plan " + stages);
    put(m, "analysis", "report results picture plan storage " + stages);
    put(m, "demo", "storage");
    return m;
  }

  private static void put(Map<String, List<String>> m, String name, String uses) {
    m.put(name, uses.isEmpty() ? List.of() : Arrays.asList(uses.split(" ")));
  }

  private static Set<String> packages() {
    return CORE.stream()
        .map(JavaClass::getPackageName)
        .filter(p -> p.startsWith("nightjar."))
        .map(p -> p.substring("nightjar.".length()))
        .collect(Collectors.toCollection(TreeSet::new));
  }

  @Test
  void everyPackageIsListed() {
    assertEquals(new TreeSet<>(MAY_USE.keySet()), packages());
  }

  @Test
  void arrowsPointOneWay() {
    MAY_USE.forEach(
        (name, uses) -> {
          List<String> allowed = new ArrayList<>(List.of("nightjar." + name));
          if (!name.equals("refusal")) {
            allowed.add("nightjar.refusal");
          }
          if (!name.equals("refusal") && !name.equals("recording")) {
            allowed.add("nightjar.recording");
          }
          uses.forEach(u -> allowed.add("nightjar." + u));
          noClasses()
              .that()
              .resideInAPackage("nightjar." + name)
              .should()
              .dependOnClassesThat(ofNightjarOutside(allowed))
              .because(name + " may use " + allowed)
              .check(CORE);
        });
  }

  private static DescribedPredicate<JavaClass> ofNightjarOutside(List<String> allowed) {
    return DescribedPredicate.describe(
        "are Nightjar's and outside " + allowed,
        c -> c.getPackageName().startsWith("nightjar") && !allowed.contains(c.getPackageName()));
  }

  @Test
  void packagesHaveNoCycles() {
    slices().matching("nightjar.(*)..").should().beFreeOfCycles().check(CORE);
  }

  @Test
  void everyPackageIsNullMarked() {
    for (String p : packages()) {
      JavaPackage pack = CORE.getPackage("nightjar." + p);
      assertTrue(pack.isAnnotatedWith(NullMarked.class), p + " lacks @NullMarked");
    }
  }

  @Test
  void librariesStayBehindTheirFences() {
    fence("ucar..", "storage");
    fence("org.jtransforms..", "numeric", "inference");
    fence("org.apache.commons.math3..", "numeric", "inference");
    fence("org.ejml..", "numeric", "glm", "design");
    fence("com.fasterxml.jackson..", "storage", "plan", "results");
    fence("org.snakeyaml..", "plan");
    fence("org.apache.commons.csv..", "storage");
  }

  private static void fence(String library, String... homes) {
    noClasses()
        .that()
        .resideOutsideOfPackages(Stream.of(homes).map(h -> "nightjar." + h).toArray(String[]::new))
        .should()
        .dependOnClassesThat()
        .resideInAPackage(library)
        .check(CORE);
  }

  @Test
  void nothingIsPrintedAndNoLegacyClockIsRead() {
    noClasses()
        .should()
        .accessField(System.class, "out")
        .orShould()
        .accessField(System.class, "err")
        .orShould()
        .callMethod(System.class, "currentTimeMillis")
        .orShould()
        .callMethod(java.time.Instant.class, "now")
        .because("the core tells its caller, and clocks are handed in")
        .check(CORE);
  }

  @Test
  void namesAreNounsOfTheField() {
    classes()
        .should()
        .haveNameNotMatching(".*(Util|Utils|Manager|Helper|Impl)(\\$.*)?")
        .check(CORE);
  }
}
