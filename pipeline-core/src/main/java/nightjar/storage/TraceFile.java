package nightjar.storage;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;
import java.util.stream.IntStream;
import nightjar.recording.FrameTimes;
import nightjar.recording.Trace;
import nightjar.refusal.RefusedInput;

/**
 * Continuous traces: a first column {@code time} (s from the recording's time zero), then one
 * numeric column a trace, separated by tabs or commas.
 */
public final class TraceFile {
  private static final String TIME = "time";

  /** As of frames, a step of more median intervals than this is a gap. */
  private static final int LONGEST_STEP = FrameTimes.LONGEST_STEP;

  private final DelimitedText text;
  private final List<DoubleStream.Builder> seconds = new ArrayList<>();
  private final List<DoubleStream.Builder> values = new ArrayList<>();
  private double previous = Double.NEGATIVE_INFINITY;

  private TraceFile(DelimitedText text) {
    this.text = text;
    for (int c = 1; c < text.columns().size(); c++) {
      seconds.add(DoubleStream.builder());
      values.add(DoubleStream.builder());
    }
  }

  /**
   * Reads all traces. A missing value ({@code n/a} or empty) is left out of its trace.
   *
   * @throws RefusedInput if the file cannot be read (missing, over 50 MB, not UTF-8, empty), its
   *     first column is not {@code time}, it has no further column or one without a name, a line of
   *     another length than the header, a cell that is no finite number, a time that does not
   *     increase, or a trace of fewer than two values
   */
  public static List<Trace> read(Path file) {
    DelimitedText text = new DelimitedText(file);
    checkHeader(text);
    TraceFile traces = new TraceFile(text);
    text.forEachRow(traces::add);
    return IntStream.range(1, text.columns().size()).mapToObj(traces::trace).toList();
  }

  private static void checkHeader(DelimitedText text) {
    int line = text.headerLine();
    if (text.required(TIME, List.of(TIME)) != 0) {
      throw text.refusal("the column time is not the first", line)
          .found(WholeText.shown(text.columns().get(0)))
          .expected("time")
          .remedy("move the column time to the front");
    }
    if (text.columns().size() == 1) {
      throw text.refusal("there is no trace beside the column time", line)
          .found("1 column")
          .remedy("add one column a trace");
    }
    if (text.columns().contains("")) {
      throw text.refusal("a trace has no name", line)
          .found("column " + (text.columns().indexOf("") + 1))
          .remedy("name the column in the header line");
    }
  }

  private void add(DelimitedText.Row row) {
    double t = text.number(row, 0, "the time");
    if (t <= previous) {
      throw text.refusal("the time does not increase", row.line())
          .found(AxisValues.shown(t) + " s after " + AxisValues.shown(previous) + " s")
          .remedy("sort the lines by time and leave out what is there twice");
    }
    previous = t;
    for (int c = 1; c < row.cells().size(); c++) {
      if (!DelimitedText.isMissing(row.cells().get(c))) {
        values.get(c - 1).add(text.number(row, c, "the value of " + text.columns().get(c)));
        seconds.get(c - 1).add(t);
      }
    }
  }

  private Trace trace(int column) {
    String name = text.columns().get(column);
    double[] v = values.get(column - 1).build().toArray();
    if (v.length < 2) {
      throw text.refusal(
              "the trace " + WholeText.shown(name) + " has too few values", text.headerLine())
          .found(v.length)
          .expected("at least 2")
          .remedy("record it again or leave the column out");
    }
    return new Trace(name, seconds.get(column - 1).build().toArray(), v);
  }

  /**
   * Refuses traces that say nothing of some frames. A trace must begin before the first frame and
   * end after the last, but for one of its own intervals or half a frame; and a step of more than
   * ten of its intervals, longer than a frame, must have no frame within it.
   *
   * @param traceFileName the traces' file name, for refusals
   * @param recordingName the recording's file name, for refusals
   * @throws RefusedInput if a trace does not cover the recording
   */
  public static void checkCoverage(
      List<Trace> traces, String traceFileName, FrameTimes times, String recordingName) {
    for (Trace trace : traces) {
      double interval = medianInterval(trace);
      double slack = Math.max(interval, times.intervalSeconds() / 2);
      double begin = trace.secondsAt(0);
      double end = trace.secondsAt(trace.size() - 1);
      double first = times.at(0);
      double last = times.at(times.size() - 1);
      if (begin > first + slack || end < last - slack) {
        throw uncovered(trace, traceFileName, "does not cover " + recordingName)
            .found(range(begin, end))
            .expected(range(first, last))
            .remedy("give the traces of this recording, with times in s from its time zero");
      }
      double longest = Math.max(LONGEST_STEP * interval, times.intervalSeconds());
      checkSteps(trace, traceFileName, times, longest);
    }
  }

  private static void checkSteps(
      Trace trace, String traceFileName, FrameTimes times, double longest) {
    double[] frames = times.toArray();
    for (int i = 1; i < trace.size(); i++) {
      double from = trace.secondsAt(i - 1);
      double to = trace.secondsAt(i);
      if (to - from > longest && after(frames, from) < frames.length) {
        if (frames[after(frames, from)] < to) {
          throw uncovered(trace, traceFileName, "has no values for some frames")
              .found("nothing " + range(from, to))
              .remedy("fill in the values or leave the trace out");
        }
      }
    }
  }

  /** The first frame after a time; the number of frames if there is none. */
  private static int after(double[] frames, double seconds) {
    int i = Arrays.binarySearch(frames, seconds);
    return i >= 0 ? i + 1 : -i - 1;
  }

  private static RefusedInput uncovered(Trace trace, String traceFileName, String fault) {
    return RefusedInput.because("the trace " + fault)
        .in(traceFileName)
        .at("column " + WholeText.shown(trace.name()));
  }

  private static double medianInterval(Trace trace) {
    double[] steps =
        IntStream.range(1, trace.size())
            .mapToDouble(i -> trace.secondsAt(i) - trace.secondsAt(i - 1))
            .sorted()
            .toArray();
    return steps[steps.length / 2];
  }

  private static String range(double from, double to) {
    return "from " + AxisValues.shown(from) + " to " + AxisValues.shown(to) + " s";
  }
}
