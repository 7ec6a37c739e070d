package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertDoesNotThrow;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.IntStream;
import nightjar.recording.FrameTimes;
import nightjar.recording.Trace;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class TraceFileTest {
  /** 100 frames of 0.4 s: centres from 0.2 to 39.8 s. */
  private static final FrameTimes FRAMES =
      FrameTimes.of(IntStream.range(0, 100).mapToDouble(i -> 0.2 + 0.4 * i).toArray());

  @TempDir private Path folder;

  private List<Trace> read(String text) {
    return TraceFile.read(
        Fixture.file("traces.tsv", text.getBytes(StandardCharsets.UTF_8), folder));
  }

  private String refusal(String text) {
    return assertThrows(RefusedInput.class, () -> read(text)).getMessage();
  }

  private static Trace every(double interval, double from, double to) {
    double[] t =
        IntStream.rangeClosed(0, (int) Math.round((to - from) / interval))
            .mapToDouble(i -> from + interval * i)
            .toArray();
    return new Trace("speed", t, new double[t.length]);
  }

  private static void check(Trace trace) {
    TraceFile.checkCoverage(List.of(trace), "traces.tsv", FRAMES, "night.nc");
  }

  private static String uncovered(Trace trace) {
    return assertThrows(RefusedInput.class, () -> check(trace)).getMessage();
  }

  @Test
  void readsTracesAndLeavesMissingValuesOut() {
    for (String text :
        List.of(
            "time\tspeed\tpupil\n0\t1\t5\n0.5\tn/a\t6\n1\t3\t\n",
            "\uFEFFtime,speed,pupil\r\n0,1,5\r\n0.5,,6\r\n1,3,n/a")) {
      List<Trace> traces = read(text);
      assertEquals(List.of("speed", "pupil"), traces.stream().map(Trace::name).toList());
      assertSamples(traces.get(0), new double[] {0, 1}, new double[] {1, 3});
      assertSamples(traces.get(1), new double[] {0, 0.5}, new double[] {5, 6});
    }
  }

  private static void assertSamples(Trace t, double[] seconds, double[] values) {
    assertEquals(seconds.length, t.size());
    for (int i = 0; i < t.size(); i++) {
      assertEquals(seconds[i], t.secondsAt(i));
      assertEquals(values[i], t.at(i));
    }
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "Time,v/0,1/1,1 | line 1: the column time is missing (found as the nearest \"Time\"",
        "v,time/0,1/1,2 | line 1: the column time is not the first (found \"v\"",
        "time/0/1 | line 1: there is no trace beside the column time",
        "time,v,/0,1,2/1,1,2 | line 1: a trace has no name (found column 3)",
        "time,v,v/0,1,2/1,1,2 | line 1: two columns have the same name (found \"v\")",
        "time,v/0,1/n,1 | line 3: the time is not a number (found \"n\")",
        "time,v/0,1/0,1 | line 3: the time does not increase (found 0 s after 0 s)",
        "time,v/1,1/0.5,1 | line 3: the time does not increase (found 0.5 s after 1 s)",
        "time,v/0,1/1,fast | line 3: the value of v is not a number (found \"fast\")",
        "time,v/0,1/1,NaN | line 3: the value of v is not a finite number (found \"NaN\")",
        "time,v/0,1/1 | line 3: the line does not fit the header line (found 1 cell",
        "time,v/0,1/1,missing | line 1: the trace \"v\" has too few values (found 1",
        "time,v | line 1: the trace \"v\" has too few values (found 0",
      })
  void refusesInOneSentence(String lines, String what) {
    String s = refusal(lines.replace("/", "\n").replace("missing", "n/a"));
    assertTrue(s.startsWith("traces.tsv, " + what), s);
    assertTrue(s.contains("; ") && s.endsWith("."), s);
  }

  @Test
  void acceptsTracesThatCoverTheFramesButForOneInterval() {
    assertDoesNotThrow(() -> check(every(0.01, 0, 40)));
    assertDoesNotThrow(() -> check(every(0.4, 0.4, 39.6)));
    assertDoesNotThrow(() -> check(every(1, 1, 39)));
    assertDoesNotThrow(() -> check(every(5, -100, 300)));
  }

  @Test
  void refusesTracesThatBeginLateOrEndEarly() {
    String s = uncovered(every(0.1, 0, 20));
    assertTrue(
        s.startsWith(
            "traces.tsv, column \"speed\": the trace does not cover night.nc"
                + " (found from 0 to 20 s, expected from 0.2 to 39.8 s); "),
        s);
    assertTrue(uncovered(every(0.1, 0.5, 40)).contains("from 0.5 to 40 s"));
    assertTrue(uncovered(every(0.1, 100, 140)).contains("from 100 to 140 s"));
  }

  @Test
  void refusesAHoleThatFramesFallInto() {
    double[] t = IntStream.range(0, 400).mapToDouble(i -> 0.1 * i + (i < 200 ? 0 : 1.1)).toArray();
    String s = uncovered(new Trace("speed", t, new double[400]));
    assertTrue(s.contains("no values for some frames (found nothing from 19.9 to 21.1 s)"), s);
  }

  @Test
  void acceptsAHoleWhereTheRecordingPausedToo() {
    FrameTimes paused =
        FrameTimes.of(
            IntStream.range(0, 100).mapToDouble(i -> 0.2 + 0.4 * i + (i < 50 ? 0 : 60)).toArray());
    double[] t = IntStream.range(0, 400).mapToDouble(i -> 0.1 * i + (i < 201 ? 0 : 60)).toArray();
    Trace trace = new Trace("speed", t, new double[400]);
    assertDoesNotThrow(
        () -> TraceFile.checkCoverage(List.of(trace), "traces.tsv", paused, "night.nc"));
  }
}
