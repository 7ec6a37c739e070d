package nightjar.recording;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import nightjar.refusal.RefusedInput;

/** Whether the trials of an event table lie within a recording. */
public final class EventTiming {
  /**
   * A trial that ended longer before the first frame, s, cannot be seen any more. Common practice,
   * no source: about the length of a haemodynamic response.
   */
  private static final double LONGEST_LEAD_SECONDS = 30;

  /** More outside than this share and the fault is the table's, not a trial's. */
  private static final double MOST_OUTSIDE = 0.1;

  /** Onsets are logged to about a millisecond, and binary fractions add to that. */
  private static final double LOGGED_TO_SECONDS = 1e-3;

  private final EventTable events;
  private final String recordingName;
  private final double first;
  private final double last;

  /** Onsets before this are before the recording: its beginning, or zero if that is later. */
  private final double beginning;

  private EventTiming(EventTable events, FrameTimes times, String recordingName) {
    this.events = events;
    this.recordingName = recordingName;
    this.first = times.at(0);
    this.last = times.at(times.size() - 1);
    double opens = first - times.intervalSeconds() / 2 - LOGGED_TO_SECONDS;
    this.beginning = Math.max(opens, Math.min(first, 0));
  }

  /**
   * Compares the trials with the frames.
   *
   * @param recordingName the recording's file name, for messages
   * @return warnings, each one sentence: that trials begin before the recording, and how many
   * @throws RefusedInput if a trial begins after the last frame or ended more than 30 s before the
   *     first; one refusal of the whole table if more than a tenth of its trials do
   */
  public static List<String> check(EventTable events, FrameTimes times, String recordingName) {
    EventTiming timing = new EventTiming(events, times, recordingName);
    timing.refuseOutside();
    return timing.warning().stream().toList();
  }

  private void refuseOutside() {
    List<Trial> outside =
        events.trials().stream().filter(t -> isAfter(t) || isLongBefore(t)).toList();
    if (outside.size() > MOST_OUTSIDE * events.trials().size()) {
      throw anotherRecording(outside);
    }
    if (!outside.isEmpty()) {
      throw single(outside.get(0));
    }
  }

  private boolean isAfter(Trial t) {
    return t.onsetSeconds() > last;
  }

  private boolean isLongBefore(Trial t) {
    return end(t) < first - LONGEST_LEAD_SECONDS;
  }

  private static double end(Trial t) {
    return t.onsetSeconds() + t.durationSeconds();
  }

  private RefusedInput anotherRecording(List<Trial> outside) {
    double from = events.trials().stream().mapToDouble(Trial::onsetSeconds).min().orElseThrow();
    double to = events.trials().stream().mapToDouble(EventTiming::end).max().orElseThrow();
    String count = outside.size() + " of " + events.trials().size() + " trials";
    return RefusedInput.because(
            "the table seems to belong to another recording than " + recordingName)
        .in(events.fileName())
        .at("line " + outside.get(0).line())
        .found(count + " outside, a table of " + length(from, to))
        .expected("trials within the recording of " + length(first, last))
        .remedy("give the event table of this recording, with onsets in s from its time zero");
  }

  private RefusedInput single(Trial t) {
    boolean after = isAfter(t);
    return RefusedInput.because(
            after
                ? "the onset is after the last frame of " + recordingName
                : "the trial ends over 30 s before the first frame of " + recordingName)
        .in(events.fileName())
        .at("line " + t.line())
        .found(shown(after ? t.onsetSeconds() : end(t)) + " s")
        .expected(
            after
                ? "at most " + shown(last) + " s"
                : "at least " + shown(first - LONGEST_LEAD_SECONDS) + " s")
        .remedy("correct the onset or delete the line");
  }

  private Optional<String> warning() {
    long early = events.trials().stream().filter(t -> t.onsetSeconds() < beginning).count();
    if (early == 0) {
      return Optional.empty();
    }
    return Optional.of(
        String.format(
            Locale.ROOT,
            "%s: %d of %d trials %s before %s, whose first frame is at %s s; they are used as far as"
                + " their responses reach into it.",
            events.fileName(),
            early,
            events.trials().size(),
            early == 1 ? "begins" : "begin",
            recordingName,
            shown(first)));
  }

  private static String length(double from, double to) {
    return shown(to - from) + " s (from " + shown(from) + " to " + shown(to) + " s)";
  }

  private static String shown(double seconds) {
    return Math.abs(seconds) < 1e9
        ? new BigDecimal(seconds)
            .setScale(3, RoundingMode.HALF_EVEN)
            .stripTrailingZeros()
            .toPlainString()
        : Double.toString(seconds);
  }
}
