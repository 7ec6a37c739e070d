package nightjar.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Path;
import java.util.List;
import picocli.CommandLine;

/**
 * What a command line did.
 *
 * @param code exit code
 * @param out standard output
 * @param err standard error
 */
record Ran(int code, String out, String err) {
  private static final Path ROOT = Path.of("..");

  static final Path READY = ROOT.resolve("demo-data").resolve("ready");
  static final String RECORDING = READY.resolve("small.nc").toString();
  static final String EVENTS = READY.resolve("small_events.tsv").toString();
  static final String PLAN = ROOT.resolve("configs").resolve("whisker-puff.yaml").toString();

  static Ran of(String... arguments) {
    return of(Nightjar.commandLine(), arguments);
  }

  static Ran of(CommandLine line, String... arguments) {
    StringWriter out = new StringWriter();
    StringWriter err = new StringWriter();
    line.setOut(new PrintWriter(out)).setErr(new PrintWriter(err));
    int code = Nightjar.run(line, arguments);
    return new Ran(code, out.toString(), err.toString());
  }

  /** Refused with one sentence on standard error and nothing else. */
  Ran assertRefused(String part) {
    List<String> sentences = err.lines().toList();
    assertEquals(2, code, err);
    assertEquals("", out);
    assertEquals(1, sentences.size(), err);
    assertTrue(err.contains(part), err);
    assertTrue(err.stripTrailing().endsWith("."), err);
    assertFalse(err.contains("Exception") || err.contains("\tat "), err);
    return this;
  }
}
