package nightjar.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Clock;
import java.util.List;
import java.util.Locale;
import java.util.UUID;

/** A fault of our own: logged whole, told in one sentence with an id. */
final class Incident {
  private Incident() {}

  /** Writes the fault to the user's log and returns the sentence for the user. */
  static String record(Throwable fault) {
    return record(
        fault, List.of(stateFolder(), Path.of(System.getProperty("java.io.tmpdir", "."))));
  }

  /** Writes the fault to the log in the first of the folders that can be written. */
  static String record(Throwable fault, List<Path> folders) {
    String id = UUID.randomUUID().toString().substring(0, 8).toUpperCase(Locale.ROOT);
    StringWriter entry = new StringWriter();
    entry.write(Clock.systemUTC().instant() + " incident " + id + "\n");
    fault.printStackTrace(new PrintWriter(entry));
    for (Path folder : folders) {
      Path log = folder.resolve("nightjar").resolve("incidents.log");
      if (append(entry.toString(), log)) {
        return "Nightjar failed, and this is not your fault: incident "
            + id
            + ", logged in "
            + log
            + ".";
      }
    }
    String told = String.valueOf(fault).replaceAll("\\s*[\\r\\n]+\\s*", " ");
    return "Nightjar failed (incident " + id + ") and could not write its log: " + told + ".";
  }

  private static boolean append(String entry, Path log) {
    try {
      Files.createDirectories(log.resolveSibling("."));
      Files.writeString(
          log, entry, StandardCharsets.UTF_8, StandardOpenOption.CREATE, StandardOpenOption.APPEND);
      return true;
    } catch (IOException e) {
      return false;
    }
  }

  /** Where a user's programs keep their logs [XDG Base Directory Specification 0.8]. */
  private static Path stateFolder() {
    String state = System.getenv("XDG_STATE_HOME");
    return state != null && !state.isBlank()
        ? Path.of(state)
        : Path.of(System.getProperty("user.home", "."), ".local", "state");
  }
}
