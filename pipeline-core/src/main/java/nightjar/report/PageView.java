package nightjar.report;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import nightjar.design.DesignColumn;
import nightjar.picture.ChartFrame;
import nightjar.picture.Curve;
import nightjar.picture.CurveChart;
import nightjar.picture.IntervalChart;
import nightjar.picture.MapFigure;
import nightjar.picture.MatrixPicture;
import nightjar.picture.Outline;
import nightjar.picture.Overlay;
import nightjar.recording.FrameMotion;
import nightjar.recording.Mask;
import nightjar.recording.NamedSeries;
import nightjar.recording.RigidMotion;
import nightjar.regions.RegionContrast;
import nightjar.regions.ResponseBin;
import nightjar.report.ContrastMap.Peak;

/** What the page's template draws: pictures as SVG elements and numbers as text. */
public final class PageView {
  private final ReportContent content;
  private final Timeline timeline;

  PageView(ReportContent content) {
    this.content = content;
    this.timeline = new Timeline(content.frames());
  }

  /** The content. */
  public ReportContent content() {
    return content;
  }

  /** The verdict's sign: a shape of its own for each word. */
  public String sign() {
    return VerdictSign.svg(content.verdict().word());
  }

  /** The level of significance. */
  public String level() {
    return Words.plain(content.level());
  }

  /** The effect of a contrast over power. */
  public String effectMap(ContrastMap m) {
    return map("effect of " + m.summary().name(), "effect", "% of baseline", m, m.effectPercent());
  }

  /** The t of a contrast over power. */
  public String tMap(ContrastMap m) {
    return map("t of " + m.summary().name(), "t", "", m, m.t());
  }

  private String map(String title, String name, String unit, ContrastMap m, float[] values) {
    Mask significant = m.significant(content.level());
    Outline line = new Outline("q < " + level(), significant, Outline.Stroke.DASHED);
    BrainMaps maps = content.maps();
    return MapFigure.ofPower("Map: " + title, maps.grid(), maps.meanPower())
        .withOverlay(new Overlay(name, unit, values, m.t(), significant))
        .withOutlines(List.of(line))
        .svg();
  }

  /** Power with the analysed part and the regions. */
  public String anatomy() {
    BrainMaps maps = content.maps();
    return MapFigure.ofPower("Map: mean power and regions", maps.grid(), maps.meanPower())
        .withOutlines(List.of(new Outline("mask (analysed)", maps.mask(), Outline.Stroke.SOLID)))
        .withRegions(maps.regions())
        .svg();
  }

  /** Where a contrast is strongest. */
  public String peak(ContrastMap m) {
    Peak p = m.summary().peak();
    if (p == null) {
      return "–";
    }
    String plane = content.maps().grid().hasPlaneAxis() ? "plane " + p.plane() + ", " : "";
    return "t = "
        + Words.fixed(p.t(), 2)
        + " at "
        + plane
        + "depth "
        + Words.fixed(p.depthMillimetres(), 2)
        + " mm, lateral "
        + Words.fixed(p.lateralMillimetres(), 2)
        + " mm";
  }

  /** Region effects of a contrast with their intervals. */
  public String effects(String contrast) {
    List<IntervalChart.Row> rows =
        content.regions().of(contrast).stream().map(this::interval).toList();
    return new IntervalChart(
            "Region effects of " + contrast, "effect (% of baseline), 95 % interval", rows)
        .svg();
  }

  private IntervalChart.Row interval(RegionContrast r) {
    IntervalChart.Marker marker =
        r.q() < content.level() ? IntervalChart.Marker.FILLED : IntervalChart.Marker.OPEN;
    return new IntervalChart.Row(
        r.region(), r.effectPercent(), r.lowPercent(), r.highPercent(), marker);
  }

  /** A number with fixed decimals. */
  public String fixed(double value, int decimals) {
    return Words.fixed(value, decimals);
  }

  /** The 95 % interval of a region. */
  public String interval95(RegionContrast r) {
    return Double.isFinite(r.lowPercent())
        ? Words.fixed(r.lowPercent(), 2) + " to " + Words.fixed(r.highPercent(), 2)
        : "–";
  }

  /** A probability. */
  public String probability(double p) {
    return Words.probability(p);
  }

  /** Mean responses of a region around the onset, a curve a stimulus. */
  public String responses(String region) {
    List<ResponseBin> all =
        content.regions().responses().stream().filter(b -> b.region().equals(region)).toList();
    List<String> stimuli = all.stream().map(ResponseBin::stimulus).distinct().toList();
    List<Curve> curves = new ArrayList<>();
    for (int s = 0; s < stimuli.size(); s++) {
      String stimulus = stimuli.get(s);
      curves.add(
          response(all.stream().filter(b -> b.stimulus().equals(stimulus)).toList()).ofCategory(s));
    }
    ChartFrame frame =
        new ChartFrame(
            "Event-locked responses of " + region,
            "time from onset (s)",
            "power change (%)",
            430,
            230);
    return new CurveChart(frame, curves, List.of(), List.of()).svg();
  }

  private static Curve response(List<ResponseBin> bins) {
    return Curve.of(
            bins.get(0).stimulus(),
            bins.stream().mapToDouble(ResponseBin::lagSeconds).toArray(),
            bins.stream().mapToDouble(ResponseBin::meanPercent).toArray())
        .withBand(bins.stream().mapToDouble(ResponseBin::standardErrorPercent).toArray());
  }

  /** The mean series of a region. */
  public String timeCourse(NamedSeries series) {
    return timeline.chart(
        "Time course of " + series.name(), "change (%)", List.of(timeline.curve(series)));
  }

  /** The matrix as fitted. */
  public String design() {
    List<NamedSeries> columns = content.design().columns().stream().map(PageView::series).toList();
    return new MatrixPicture("Design matrix as fitted", columns, content.frames().kept()).svg();
  }

  private static NamedSeries series(DesignColumn c) {
    return new NamedSeries(c.name(), IntStream.range(0, c.frames()).mapToDouble(c::at).toArray());
  }

  /** Whether any frame moved. */
  public boolean moved() {
    FrameMotion motion = content.frames().motion();
    return IntStream.range(0, motion.frames())
        .anyMatch(
            t ->
                IntStream.range(0, motion.units())
                    .anyMatch(u -> !motion.at(t, u).equals(RigidMotion.NONE)));
  }

  /** Charts of motion and of the measures of screening. */
  public List<String> frameCharts() {
    FrameMotion motion = content.frames().motion();
    List<String> charts = new ArrayList<>();
    if (moved()) {
      Curve depth =
          timeline.curve(
              "depth", timeline.meanMotion((t, u) -> motion.at(t, u).shiftDepthMillimetres()));
      Curve lateral =
          timeline.curve(
              "lateral", timeline.meanMotion((t, u) -> motion.at(t, u).shiftLateralMillimetres()));
      charts.add(timeline.chart("Shifts", "shift (mm)", List.of(depth, lateral.ofCategory(3))));
      Curve rotation =
          timeline.curve("", timeline.meanMotion((t, u) -> motion.at(t, u).rotationDegrees()));
      charts.add(timeline.chart("Rotation", "rotation (°)", List.of(rotation)));
      Curve displacement = timeline.curve("", timeline.meanMotion(motion::displacementMillimetres));
      charts.add(timeline.chart("Displacement", "displaced (mm)", List.of(displacement)));
    }
    for (NamedSeries s : content.frames().screening()) {
      charts.add(timeline.chart(s.name(), s.name(), List.of(timeline.curve(s))));
    }
    return charts;
  }

  /** The methods text as HTML. */
  public String methods() {
    return MethodsHtml.of(content.methods());
  }
}
