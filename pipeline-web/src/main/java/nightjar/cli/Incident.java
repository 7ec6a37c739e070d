package nightjar.cli;

import java.io.IOException;
import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.time.Clock;
import java.util.Locale;
import java.util.UUID;

/** A fault of our own: logged whole, told in one sentence with an id. */
final class Incident {
  private Incident() {}

  /** Writes the fault to the log and returns the sentence for the user. */
  static String record(Throwable fault) {
    String id = UUID.randomUUID().toString().substring(0, 8).toUpperCase(Locale.ROOT);
    StringWriter trace = new StringWriter();
    trace.write(Clock.systemUTC().instant() + " incident " + id + "\n");
    fault.printStackTrace(new PrintWriter(trace));
    Path log = log();
    try {
      Files.createDirectories(log.getParent() == null ? Path.of(".") : log.getParent());
      Files.writeString(
          log,
          trace.toString(),
          StandardCharsets.UTF_8,
          StandardOpenOption.CREATE,
          StandardOpenOption.APPEND);
    } catch (IOException e) {
      return "Nightjar failed (incident "
          + id
          + ") and could not write its log "
          + log
          + ": "
          + fault;
    }
    return "Nightjar failed, and this is not your fault: incident "
        + id
        + ", logged in "
        + log
        + ".";
  }

  private static Path log() {
    String state = System.getenv("XDG_STATE_HOME");
    Path folder =
        state != null && !state.isBlank()
            ? Path.of(state)
            : Path.of(System.getProperty("user.home", "."), ".local", "state");
    return folder.resolve("nightjar").resolve("incidents.log");
  }
}
