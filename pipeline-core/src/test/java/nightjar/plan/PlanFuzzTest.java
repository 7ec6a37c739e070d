package nightjar.plan;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Random;
import nightjar.recording.EventTable;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Whatever happens to a plan's text, it is read or refused in one sentence. */
class PlanFuzzTest {
  private static final int TEXTS = 3000;
  private static final List<String> PIECES =
      List.of(
          "{",
          "}",
          "[",
          "]",
          ": ",
          ", ",
          "- ",
          "\n",
          "\t",
          "#",
          "'",
          "\"",
          "&a ",
          "*a",
          "!!str ",
          "? ",
          "| \n",
          "> \n",
          "---\n",
          "...\n",
          "%YAML 1.1\n",
          "<<: ",
          "null",
          "~",
          "1e400",
          "-0.0",
          "0x",
          "0o7",
          ".nan",
          "\u0000",
          "\uFEFF",
          "\u2028",
          "\uD83D\uDC3E",
          "\uD83D",
          "\\u",
          "contrasts",
          "weights",
          "ignore",
          "99999999999999999999");

  private static final EventTable EVENTS = Plans.events("left_puff", "right_puff", "sham_puff");

  @ParameterizedTest
  @ValueSource(longs = {1, 2, 3})
  void mutatedPlansAreReadOrRefused(long seed) throws IOException {
    String ready = Files.readString(Path.of("..", "configs", "whisker-puff.yaml"));
    Random r = new Random(seed);
    int read = 0;
    int refused = 0;
    for (int i = 0; i < TEXTS; i++) {
      String text = ready;
      for (int n = 1 + r.nextInt(4); n > 0; n--) {
        text = mutated(text, r);
      }
      try {
        PlanCheck.against(PlanFile.parse(text, "p.yaml"), EVENTS);
        read++;
      } catch (RefusedInput e) {
        refused++;
        assertSentence(e.getMessage(), text);
      } catch (RuntimeException | StackOverflowError e) {
        throw new AssertionError(
            e + " at " + e.getStackTrace()[0] + ", seed " + seed + ", text " + i + ":\n" + text, e);
      }
    }
    // Both must happen often, or the mutations try nothing.
    assertTrue(read > TEXTS / 20, read + " read");
    assertTrue(refused > TEXTS / 20, refused + " refused");
    assertEquals(TEXTS, read + refused);
  }

  private static void assertSentence(String sentence, String text) {
    assertTrue(sentence.matches("[^\\r\\n]{10,1500}\\."), () -> sentence + "\n" + text);
  }

  private static String mutated(String text, Random r) {
    int at = r.nextInt(text.length() + 1);
    int to = Math.min(text.length(), at + 1 + r.nextInt(12));
    String piece = PIECES.get(r.nextInt(PIECES.size()));
    return switch (r.nextInt(5)) {
      case 0 -> text.substring(0, at) + piece + text.substring(at);
      case 1 -> text.substring(0, at) + text.substring(to);
      case 2 -> text.substring(0, at) + piece + text.substring(to);
      case 3 -> text.substring(0, to) + text.substring(at);
      default -> text.substring(0, at) + (char) r.nextInt(0x300) + text.substring(to);
    };
  }
}
