package nightjar.recording;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;

class EventTimingTest {
  /** 1500 frames of 0.4 s: centres from 0.2 to 599.8 s. */
  private static final FrameTimes FRAMES = frames(0.2);

  private static FrameTimes frames(double first) {
    return FrameTimes.of(IntStream.range(0, 1500).mapToDouble(i -> first + 0.4 * i).toArray());
  }

  private static Trial trial(double onset, double duration, int line) {
    return new Trial("puff", onset, duration, null, Map.of(), line);
  }

  /** Forty trials within the recording from line 2 on, and those given after them. */
  private static EventTable table(Trial... more) {
    List<Trial> trials = new ArrayList<>();
    for (int i = 0; i < 40; i++) {
      trials.add(trial(10 * i, 2, i + 2));
    }
    trials.addAll(List.of(more));
    return new EventTable("events.tsv", trials);
  }

  private static List<String> check(EventTable t) {
    return EventTiming.check(t, FRAMES, "night.nc");
  }

  private static String refusal(EventTable t) {
    return assertThrows(RefusedInput.class, () -> check(t)).getMessage();
  }

  @Test
  void trialsWithinTheRecordingGiveNoWarning() {
    assertEquals(List.of(), check(table(trial(599.8, 100, 42), trial(0, 0, 43))));
  }

  @Test
  void anOnsetAfterTheLastFrameIsRefused() {
    assertEquals(
        "events.tsv, line 42: the onset is after the last frame of night.nc"
            + " (found 599.9 s, expected at most 599.8 s); correct the onset or delete the line.",
        refusal(table(trial(599.9, 0, 42))));
  }

  @Test
  void aTrialThatEndsOverThirtySecondsBeforeTheFirstFrameIsRefused() {
    assertEquals(
        "events.tsv, line 42: the trial ends over 30 s before the first frame of night.nc"
            + " (found -29.9 s, expected at least -29.8 s); correct the onset or delete the line.",
        refusal(table(trial(-31.9, 2, 42))));
  }

  @Test
  void negativeOnsetsThatReachAFrameAreWarnedAboutOnce() {
    List<String> one = check(table(trial(-31.8, 2, 42)));
    assertEquals(1, one.size());
    assertTrue(
        one.get(0).startsWith("events.tsv: 1 of 41 trials begins before night.nc"), one.get(0));
    List<String> two = check(table(trial(-1000, 2000, 42), trial(-0.01, 1, 43)));
    assertEquals(1, two.size());
    assertTrue(
        two.get(0).startsWith("events.tsv: 2 of 42 trials begin before night.nc"), two.get(0));
    assertTrue(two.get(0).endsWith(".") && two.get(0).contains("at 0.2 s"), two.get(0));
  }

  @Test
  void aClockThatDoesNotBeginAtZeroIsRespected() {
    EventTable t = new EventTable("events.tsv", List.of(trial(-4, 1, 2), trial(5, 1, 3)));
    assertEquals(List.of(), EventTiming.check(t, frames(-5), "night.nc"));
    EventTable late = new EventTable("events.tsv", List.of(trial(80, 1, 2), trial(105, 1, 3)));
    List<String> warnings = EventTiming.check(late, frames(100), "night.nc");
    assertTrue(
        warnings.get(0).startsWith("events.tsv: 1 of 2 trials begins before"), "" + warnings);
  }

  @Test
  void upToATenthOutsideIsTheTrialsFaultAndMoreIsTheTables() {
    Trial[] four = {trial(700, 1, 42), trial(710, 1, 43), trial(720, 1, 44), trial(730, 1, 45)};
    assertTrue(refusal(table(four)).contains("line 42: the onset is after the last frame"));
    Trial[] five = {four[0], four[1], four[2], four[3], trial(1230, 4.5, 46)};
    assertEquals(
        "events.tsv, line 42: the table seems to belong to another recording than night.nc"
            + " (found 5 of 45 trials outside, a table of 1234.5 s (from 0 to 1234.5 s),"
            + " expected trials within the recording of 599.6 s (from 0.2 to 599.8 s));"
            + " give the event table of this recording, with onsets in s from its time zero.",
        refusal(table(five)));
  }

  @Test
  void exactlyATenthOutsideIsNotMoreThanATenth() {
    List<Trial> ten = new ArrayList<>(table().trials().subList(0, 9));
    ten.add(trial(700, 1, 11));
    assertTrue(refusal(new EventTable("events.tsv", ten)).contains("after the last frame"));
  }
}
