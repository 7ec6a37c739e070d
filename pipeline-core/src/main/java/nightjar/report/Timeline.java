package nightjar.report;

import java.util.ArrayList;
import java.util.List;
import java.util.function.IntToDoubleFunction;
import java.util.stream.IntStream;
import nightjar.picture.ChartFrame;
import nightjar.picture.Curve;
import nightjar.picture.CurveChart;
import nightjar.picture.Span;
import nightjar.recording.FrameTimes;
import nightjar.recording.NamedSeries;

/** Charts over the whole recording, stimuli shaded and rejected frames marked. */
final class Timeline {
  private static final double WIDTH = 900;
  private static final double HEIGHT = 170;

  private final ReportedFrames frames;
  private final List<Span> spans = new ArrayList<>();
  private final List<Double> rejected;

  Timeline(ReportedFrames frames) {
    this.frames = frames;
    FrameTimes times = frames.kept().times();
    frames
        .stimuli()
        .forEach(
            s ->
                s.trials()
                    .forEach(
                        t ->
                            spans.add(
                                new Span(
                                    s.name(),
                                    t.onsetSeconds(),
                                    t.onsetSeconds() + t.durationSeconds()))));
    this.rejected =
        IntStream.range(0, times.size())
            .filter(t -> !frames.kept().isKept(t))
            .mapToObj(times::at)
            .toList();
  }

  /** A series in the colour of the text. */
  Curve curve(NamedSeries series) {
    return curve("", series::at);
  }

  /** A value per frame over time, broken where a segment ends. */
  Curve curve(String name, IntToDoubleFunction value) {
    FrameTimes times = frames.kept().times();
    int n = times.size();
    double[] x = new double[n + times.segments() - 1];
    double[] y = new double[x.length];
    int k = 0;
    for (int t = 0; t < n; t++) {
      if (t > 0 && times.segment(t) != times.segment(t - 1)) {
        x[k] = times.at(t);
        y[k++] = Double.NaN;
      }
      x[k] = times.at(t);
      y[k++] = value.applyAsDouble(t);
    }
    return Curve.of(name, x, y);
  }

  /** A chart of the recording. */
  String chart(String title, String ordinate, List<Curve> curves) {
    ChartFrame frame = new ChartFrame(title, "time (s)", ordinate, WIDTH, HEIGHT);
    return new CurveChart(frame, curves, spans, rejected).svg();
  }

  /** Mean of a measure of motion over the planes, or the volume's. */
  IntToDoubleFunction meanMotion(MotionMeasure measure) {
    int units = frames.motion().units();
    return t -> IntStream.range(0, units).mapToDouble(u -> measure.of(t, u)).sum() / units;
  }

  /** A measure of the motion of frame {@code t}, unit {@code u}. */
  interface MotionMeasure {
    double of(int t, int u);
  }
}
