package nightjar.refusal;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import org.junit.jupiter.api.Test;

class RefusedInputTest {
  @Test
  void saysEverythingInOneSentence() {
    RefusedInput e =
        RefusedInput.because("the onset is not a number")
            .in("events.tsv")
            .at("line 4")
            .found("soon")
            .expected("seconds")
            .remedy("give seconds from the recording's start");
    assertEquals(
        "events.tsv, line 4: the onset is not a number (found soon, expected seconds);"
            + " give seconds from the recording's start.",
        e.getMessage());
    assertEquals("line 4", e.facts().get("place"));
    assertEquals(e.getMessage(), e.facts().get("sentence"));
  }

  @Test
  void leavesOutWhatIsNotKnownAndKeepsToOneLine() {
    RefusedInput e = RefusedInput.because("the text breaks").found("a\r\n  b");
    assertEquals("the text breaks (found a b).", e.getMessage());
    assertFalse(e.facts().containsKey("file"));
  }
}
