package nightjar.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.stream.IntStream;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;
import nightjar.recording.NamedSeries;
import org.jspecify.annotations.Nullable;
import org.junit.jupiter.api.Test;

class ChartsTest {
  private static final ChartFrame FRAME =
      new ChartFrame("chart", "time (s)", "change (%)", 600, 200);
  private static final String HOSTILE = "\"><img src=x onerror='a'>&";

  private static double[] upTo(int n) {
    return IntStream.range(0, n).mapToDouble(i -> i).toArray();
  }

  private static CurveChart chart(Curve... curves) {
    return new CurveChart(FRAME, List.of(curves), List.of(), List.of());
  }

  @Test
  void aLineBreaksWhereAValueIsMissing() {
    Curve whole = Curve.of("", upTo(5), new double[] {1, 2, 3, 4, 5});
    Curve broken = Curve.of("", upTo(5), new double[] {1, 2, Double.NaN, 4, 5});
    PlotArea area = PlotArea.of(FRAME, List.of(whole), List.of(), 0, 0);
    assertEquals(1, count(CurvePath.line(whole, area), 'M'));
    assertEquals(2, count(CurvePath.line(broken, area), 'M'));
    assertEquals(2, count(CurvePath.band(broken.withBand(upTo(5)), area), 'z'));
  }

  private static long count(String path, char c) {
    return path.chars().filter(x -> x == c).count();
  }

  @Test
  void aLongSeriesKeepsItsSpikes() {
    double[] y = new double[100_000];
    y[54_321] = 9;
    Curve c = Curve.of("", upTo(y.length), y);
    PlotArea area = PlotArea.of(FRAME, List.of(c), List.of(), 0, 0);
    String path = CurvePath.line(c, area);
    assertTrue(path.length() < 30_000, "length " + path.length());
    assertTrue(path.contains(" " + Svg.number(area.y(9))), "the spike is drawn");
  }

  @Test
  void nothingButMissingValuesIsAnEmptyChart() {
    double[] none = new double[4];
    Arrays.fill(none, Double.NaN);
    Svgs.parse(chart(Curve.of("a", upTo(4), none).withBand(none)).svg());
    Svgs.parse(chart().svg());
    Svgs.parse(chart(Curve.of("flat", upTo(3), new double[3])).svg());
    Svgs.parse(chart(Curve.of("point", upTo(1), new double[] {4})).svg());
  }

  @Test
  void stimuliAreShadedWithinTheAxisAndRejectedFramesMarked() {
    CurveChart c =
        new CurveChart(
            FRAME,
            List.of(Curve.of("", upTo(11), upTo(11))),
            List.of(new Span("a", 2, 4), new Span("b", 9, 30), new Span("a", 40, 50)),
            List.of(3.0));
    var svg = Svgs.parse(c.svg());
    // Two swatches, a shade and a lane for each of the two stretches that touch the axis.
    assertEquals(6, Svgs.count(svg, "rect"));
    assertTrue(c.svg().contains("rejected frame"));
  }

  @Test
  void curvesOfDifferentThingsDifferInMoreThanColour() {
    Curve one = Curve.of("a", upTo(2), upTo(2));
    List<String> looks =
        IntStream.range(0, 32)
            .mapToObj(i -> one.ofCategory(i).colour() + one.ofCategory(i).dashes())
            .toList();
    assertEquals(32, looks.stream().distinct().count());
    assertFalse(one.ofCategory(0).dashes().equals(one.ofCategory(1).dashes()));
  }

  @Test
  void refusesACurveWithTooFewValues() {
    assertThrows(IllegalArgumentException.class, () -> Curve.of("a", upTo(3), upTo(2)));
  }

  @Test
  void hostileNamesStayTextInEveryChart() {
    KeptFrames kept = KeptFrames.all(FrameTimes.of(upTo(6)));
    List<String> pictures =
        List.of(
            new CurveChart(
                    new ChartFrame(HOSTILE, HOSTILE, HOSTILE, 600, 200),
                    List.of(Curve.of(HOSTILE, upTo(3), upTo(3))),
                    List.of(new Span(HOSTILE, 0, 1)),
                    List.of())
                .svg(),
            new IntervalChart(
                    HOSTILE,
                    HOSTILE,
                    List.of(new IntervalChart.Row(HOSTILE, 1, 0, 2, IntervalChart.Marker.FILLED)))
                .svg(),
            new MatrixPicture(HOSTILE, List.of(new NamedSeries(HOSTILE, upTo(6))), kept).svg());
    for (String p : pictures) {
      var svg = Svgs.parse(p);
      assertEquals(0, Svgs.count(svg, "img"));
      assertEquals(HOSTILE, Svgs.title(svg));
      assertEquals("img", svg.getDocumentElement().getAttribute("role"));
    }
  }

  @Test
  void anIntervalIsFilledWhereItIsSignificantAndARowWithoutValueSaysSo() {
    String svg =
        new IntervalChart(
                "effects",
                "effect (%)",
                List.of(
                    new IntervalChart.Row("sure", 5, 4, 6, IntervalChart.Marker.FILLED),
                    new IntervalChart.Row("open", 0.1, -1, 1.2, IntervalChart.Marker.OPEN),
                    new IntervalChart.Row("gone", Double.NaN, 0, 0, IntervalChart.Marker.OPEN)))
            .svg();
    assertEquals(2, Svgs.count(Svgs.parse(svg), "circle"));
    assertTrue(svg.contains("gone (no value)"));
  }

  @Test
  void rejectedFramesOfTheDesignAreBlankAndLongOnesAreThinned() {
    int n = 5000;
    List<@Nullable String> reasons = new ArrayList<>(Collections.nCopies(n, null));
    Collections.fill(reasons.subList(0, 100), "power");
    KeptFrames kept = new KeptFrames(FrameTimes.of(upTo(n)), reasons);
    KeptFrames all = KeptFrames.all(FrameTimes.of(upTo(n)));
    List<NamedSeries> columns = List.of(new NamedSeries("level", new double[n]));
    String some = new MatrixPicture("design", columns, kept).svg();
    assertFalse(some.equals(new MatrixPicture("design", columns, all).svg()));
    Svgs.parse(some);
  }

  @Test
  void numbersAreWrittenTheSameWayEverywhere() {
    assertEquals("-0.5", Svg.number(-0.5));
    assertEquals("0", Svg.number(-0.001));
    assertEquals("12.34", Svg.number(12.341));
    assertEquals("1234567.05", Svg.number(1234567.05));
    assertThrows(IllegalArgumentException.class, () -> Svg.number(Double.NaN));
  }

  @Test
  void aLongNameKeepsBothEnds() {
    assertEquals("barre…left", Svg.fit("barrel_cortex_of_the_left", 64));
    assertEquals("barrel", Svg.fit("barrel", 64));
  }

  @Test
  void longTickLabelsPushTheAxisInwards() {
    Curve tiny = Curve.of("", upTo(3), new double[] {-1e-7, 0, 1e-7});
    PlotArea area = PlotArea.of(FRAME, List.of(tiny), List.of(), 0, 0);
    assertTrue(area.left() > Svg.widthOf("\u22120.0000001") + 20, "left " + area.left());
  }

  @Test
  void controlCharactersDoNotReachTheXml() {
    assertEquals("a\uFFFDb", Svg.escape("a\u0000b"));
  }
}
