package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.BufferedReader;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ResultFolderTest {
  @TempDir Path parent;

  private static List<String> names(Path folder) {
    try (Stream<Path> all = Files.list(folder)) {
      return all.map(p -> String.valueOf(p.getFileName())).sorted().toList();
    } catch (IOException e) {
      throw new IllegalStateException(e);
    }
  }

  @Test
  void theFolderHasItsNameOnlyWhenItIsComplete() throws IOException {
    Path out = parent.resolve("out");
    try (ResultFolder folder = ResultFolder.begin(out)) {
      Files.writeString(folder.file("a.csv"), "a");
      assertFalse(Files.exists(out));
      assertEquals(1, names(parent).size(), "written beside it");
      assertTrue(names(parent).get(0).startsWith(".out.part-"), names(parent).get(0));
      Files.writeString(folder.file("b.csv"), "b");
      folder.complete();
      assertEquals(List.of("out"), names(parent));
    }
    assertEquals(List.of("a.csv", "b.csv"), names(out));
    assertEquals("a", Files.readString(out.resolve("a.csv")));
  }

  @Test
  void anUnfinishedFolderDisappearsWithAllThatIsInIt() throws IOException {
    try (ResultFolder folder = ResultFolder.begin(parent.resolve("out"))) {
      Files.writeString(folder.file("a.csv"), "a");
      Files.createDirectories(folder.file("deep/er"));
      Files.writeString(folder.file("deep/er/b"), "b");
    }
    assertEquals(List.of(), names(parent));
  }

  @Test
  void foldersWithinAreCompletedToo() throws IOException {
    try (ResultFolder folder = ResultFolder.begin(parent.resolve("out"))) {
      Files.createDirectories(folder.file("pictures"));
      Files.writeString(folder.file("pictures/t.svg"), "<svg/>");
      folder.complete();
    }
    assertEquals("<svg/>", Files.readString(parent.resolve("out/pictures/t.svg")));
  }

  /** A folder of the service's account must be readable for whom the account lets read. */
  @Test
  void theFolderHasTheRightsOfAnyNewFolder() throws IOException {
    Path ordinary = Files.createDirectory(parent.resolve("ordinary"));
    try (ResultFolder folder = ResultFolder.begin(parent.resolve("out"))) {
      folder.complete();
    }
    assertEquals(
        Files.getPosixFilePermissions(ordinary),
        Files.getPosixFilePermissions(parent.resolve("out")));
  }

  @Test
  void anEmptyFolderIsReplacedAndMissingParentsAreMade() throws IOException {
    Path empty = Files.createDirectory(parent.resolve("empty"));
    for (Path out : List.of(empty, parent.resolve("a/b/out"))) {
      try (ResultFolder folder = ResultFolder.begin(out)) {
        Files.writeString(folder.file("a.csv"), "a");
        folder.complete();
      }
      assertEquals(List.of("a.csv"), names(out));
    }
  }

  @Test
  void aFolderWithContentIsRefusedAndKept() throws IOException {
    Path out = Files.createDirectory(parent.resolve("out"));
    Files.writeString(out.resolve("old.csv"), "old");
    assertRefused(out, "exists and is not empty");
    assertEquals(List.of("out"), names(parent));
    assertEquals("old", Files.readString(out.resolve("old.csv")));
  }

  @Test
  void aFileInTheWayIsRefused() throws IOException {
    Path file = Files.writeString(parent.resolve("out"), "text");
    assertRefused(file, "is taken by a file");
    assertRefused(file.resolve("below"), "cannot be made");
    assertRefused(Path.of("/"), "cannot be a result folder");
    assertEquals("text", Files.readString(file));
  }

  /** /proc takes no new folders, not even from the superuser. */
  @Test
  void aParentThatCannotBeWrittenIsRefused() {
    org.junit.jupiter.api.Assumptions.assumeTrue(Files.isDirectory(Path.of("/proc/self")));
    assertRefused(Path.of("/proc/out"), "cannot be made");
  }

  private static void assertRefused(Path out, String part) {
    RefusedInput e = assertThrows(RefusedInput.class, () -> ResultFolder.begin(out).close());
    assertTrue(e.getMessage().contains(part), e.getMessage());
    assertTrue(e.getMessage().startsWith(out.toString()), e.getMessage());
    assertTrue(e.facts().containsKey("remedy"), e.getMessage());
    assertEquals(1, e.getMessage().lines().count());
  }

  @Test
  void whatAppearsUnderTheNameMeanwhileIsKept() throws IOException {
    Path out = parent.resolve("out");
    try (ResultFolder folder = ResultFolder.begin(out)) {
      Files.writeString(folder.file("a.csv"), "a");
      Files.createDirectory(out);
      Files.writeString(out.resolve("other.csv"), "other");
      RefusedInput e = assertThrows(RefusedInput.class, folder::complete);
      assertTrue(e.getMessage().contains("exists and is not empty"), e.getMessage());
    }
    assertEquals(List.of("out"), names(parent));
    assertEquals(List.of("other.csv"), names(out));
  }

  @Test
  void isCompletedOnceAndNotAfterItsRemoval() {
    ResultFolder folder = ResultFolder.begin(parent.resolve("out"));
    folder.complete();
    assertThrows(IllegalStateException.class, folder::complete);
    folder.close();
    folder.close();
    assertEquals(List.of("out"), names(parent));
    ResultFolder removed = ResultFolder.begin(parent.resolve("other"));
    removed.close();
    assertThrows(IllegalStateException.class, removed::complete);
    assertEquals(List.of("out"), names(parent));
  }

  /** Writes files into a result folder until it is stopped; {@code out} is the first argument. */
  static final class EndlessWriting {
    private EndlessWriting() {}

    public static void main(String[] arguments) throws IOException {
      try (ResultFolder folder = ResultFolder.begin(Path.of(arguments[0]))) {
        for (int i = 0; ; i++) {
          Files.writeString(folder.file("file-" + i), "text");
          if (i == 20) {
            System.out.println("writing");
          }
        }
      }
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"TERM", "INT"})
  void aProcessToldToStopLeavesNothing(String signal) throws Exception {
    Process process =
        new ProcessBuilder(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-cp",
                System.getProperty("java.class.path"),
                EndlessWriting.class.getName(),
                parent.resolve("out").toString())
            .redirectError(ProcessBuilder.Redirect.DISCARD)
            .start();
    try (BufferedReader output = process.inputReader(StandardCharsets.UTF_8)) {
      assertEquals("writing", output.readLine());
      assertTrue(names(parent).get(0).startsWith(".out.part-"));
      new ProcessBuilder("kill", "-" + signal, Long.toString(process.pid())).start().waitFor();
      assertTrue(process.waitFor(30, TimeUnit.SECONDS), "ends by itself");
      assertEquals(List.of(), names(parent));
    } finally {
      process.destroyForcibly();
    }
  }
}
