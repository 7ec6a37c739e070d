package nightjar.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.concurrent.CancellationException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.DisabledIfEnvironmentVariable;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.OptionSpec;

class NightjarTest {
  @Test
  void theVersionIsOneLine() {
    Ran ran = Ran.of("--version");
    assertEquals(0, ran.code());
    assertTrue(ran.out().matches("Nightjar \\S+\\R"), ran.out());
  }

  @Test
  void theHelpNamesCommandsAndExitCodes() {
    Ran ran = Ran.of("--help");
    assertEquals(0, ran.code());
    for (String word : List.of("analyse", "inspect", "demo", "0 done", "2 the input", "130")) {
      assertTrue(ran.out().contains(word), word);
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {"analyse", "inspect"})
  void aCommandsHelpHasExitCodesAndAnExample(String command) {
    Ran ran = Ran.of(command, "--help");
    assertEquals(0, ran.code());
    assertTrue(ran.out().contains("Exit codes:"), ran.out());
    assertTrue(ran.out().contains("Example:\n  ./nightjar " + command), ran.out());
  }

  @ParameterizedTest
  @ValueSource(strings = {"analyse", "inspect", "demo"})
  void everyOptionThatMayBeLeftOutTellsItsDefault(String command) {
    CommandLine line = Objects.requireNonNull(Nightjar.commandLine().getSubcommands().get(command));
    for (OptionSpec option : line.getCommandSpec().options()) {
      boolean told = String.join(" ", option.description()).contains("default");
      assertTrue(
          told
              || option.required()
              || option.hidden()
              || option.usageHelp()
              || option.versionHelp(),
          option.longestName());
    }
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      textBlock =
          """
          ''                                  | A command is missing
          analyze                             | analyze
          analyse                             | Missing required options
          inspect --record x                  | --record
          inspect --plan                      | --plan
          inspect x                           | x
          inspect                             | there is no file to inspect; name one with --recording
          """)
  void aCommandLineThatMakesNoSenseIsRefused(String arguments, String part) {
    Ran.of(arguments.isEmpty() ? new String[0] : arguments.split(" ")).assertRefused(part);
  }

  @Test
  @DisabledIfEnvironmentVariable(
      named = "XDG_STATE_HOME",
      matches = ".+",
      disabledReason = "the log would be written there")
  void aFaultOfOursIsLoggedAndToldInOneSentence(@TempDir Path home) throws IOException {
    String before = System.setProperty("user.home", home.toString());
    try {
      for (Throwable fault :
          List.of(new IllegalStateException("two\nlines"), new StackOverflowError("deep"))) {
        Ran ran = Ran.of(line(fault), "broken");
        assertEquals(3, ran.code());
        assertEquals("", ran.out());
        assertTrue(
            ran.err().matches("Nightjar failed, .*incident [0-9A-F]{8}, logged in .*\\.\\R"),
            ran.err());
        String id = ran.err().replaceAll("(?s).*incident ([0-9A-F]{8}).*", "$1");
        String log = Files.readString(home.resolve(".local/state/nightjar/incidents.log"));
        assertTrue(log.contains("incident " + id), log);
        assertTrue(log.contains(fault + "\n\tat "), log);
      }
    } finally {
      System.setProperty("user.home", before);
    }
  }

  @Test
  void anInterruptionHasItsOwnExitCode() {
    Ran ran = Ran.of(line(new CancellationException("interrupted")), "broken");
    assertEquals(130, ran.code());
    assertEquals("Interrupted; nothing was written.", ran.err().strip());
  }

  private static CommandLine line(Throwable fault) {
    return Nightjar.commandLine().addSubcommand("broken", new BrokenCommand(fault));
  }

  @Command(name = "broken")
  private record BrokenCommand(Throwable fault) implements Runnable {
    @Override
    public void run() {
      if (fault instanceof Error e) {
        throw e;
      }
      throw (RuntimeException) fault;
    }
  }
}
