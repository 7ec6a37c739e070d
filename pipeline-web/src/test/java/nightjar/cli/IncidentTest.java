package nightjar.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class IncidentTest {
  private final Throwable fault =
      new IllegalStateException("outer", new ArithmeticException("inner"));

  @Test
  void theLogHoldsEveryTraceWhole(@TempDir Path folder) throws IOException {
    Incident.record(fault, List.of(folder));
    Incident.record(fault, List.of(folder));
    String log = Files.readString(folder.resolve("nightjar/incidents.log"));
    assertEquals(2, log.split("incident [0-9A-F]{8}\n", -1).length - 1);
    assertTrue(log.contains("Caused by: java.lang.ArithmeticException: inner"), log);
  }

  @Test
  void theNextFolderIsTakenWhereTheFirstCannotBeWritten(@TempDir Path folder) throws IOException {
    Path file = Files.createFile(folder.resolve("file"));
    String sentence = Incident.record(fault, List.of(file, folder));
    Path log = folder.resolve("nightjar").resolve("incidents.log");
    assertTrue(sentence.contains("logged in " + log), sentence);
    assertTrue(Files.exists(log));
  }

  @Test
  void aFaultIsToldWhereNoLogCanBeWritten(@TempDir Path folder) throws IOException {
    Path file = Files.createFile(folder.resolve("file"));
    String sentence = Incident.record(new IllegalStateException("two\nlines"), List.of(file));
    assertTrue(sentence.endsWith("IllegalStateException: two lines."), sentence);
    assertFalse(sentence.contains("\n"), sentence);
  }
}
