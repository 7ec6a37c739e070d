package nightjar.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;

import java.time.Duration;
import nightjar.recording.Progress;
import org.junit.jupiter.api.Test;

class ProgressLineTest {
  @Test
  void theLineHasStageShareAndRemainingTime() {
    assertEquals(
        "[========                      ]  25 %  aligning, 1:30 left",
        ProgressLine.line("aligning", 0.25, Duration.ofSeconds(30)));
  }

  @Test
  void noTimeIsPromisedAtEitherEnd() {
    assertEquals(
        "[" + " ".repeat(30) + "]   0 %  opening",
        ProgressLine.line("opening", 0, Duration.ofSeconds(3)));
    assertEquals(
        "[" + "=".repeat(30) + "] 100 %  writing",
        ProgressLine.line("writing", 1, Duration.ofSeconds(3)));
  }

  @Test
  void nothingIsShownWhereStandardErrorIsNoTerminal() {
    try (ProgressLine line = ProgressLine.onTerminal(false)) {
      assertSame(Progress.SILENT, line.stage("aligning", 0.5));
    }
  }
}
