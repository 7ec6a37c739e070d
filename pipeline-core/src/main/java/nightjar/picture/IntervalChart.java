package nightjar.picture;

import java.util.List;

/**
 * Values with their intervals, one row each, around zero: filled where they are significant, open
 * where they are not.
 *
 * @param title read aloud in place of the picture
 * @param abscissa name and unit of the values
 * @param rows from the top
 */
public record IntervalChart(String title, String abscissa, List<Row> rows) {
  private static final double WIDTH = 680;
  private static final double ROW = 24;
  private static final double FOOT = 40;
  private static final double RADIUS = 4.5;
  private static final double LONGEST_NAME = 220;

  public IntervalChart {
    rows = List.copyOf(rows);
  }

  /** How a row is marked. */
  public enum Marker {
    /** Significant. */
    FILLED,
    /** Not significant. */
    OPEN
  }

  /**
   * One value; NaN where there is none.
   *
   * @param name what it is of
   * @param value the dot
   * @param low lower end
   * @param high upper end
   * @param marker how the dot is drawn
   */
  public record Row(String name, double value, double low, double high, Marker marker) {
    private String label() {
      return Svg.fit(name, LONGEST_NAME) + (isNumber() ? "" : " (no value)");
    }

    private boolean isNumber() {
      return Double.isFinite(value) && Double.isFinite(low) && Double.isFinite(high);
    }
  }

  /** The picture as one SVG element. */
  public String svg() {
    double names = rows.stream().mapToDouble(r -> Svg.widthOf(r.label())).max().orElse(0);
    double left = names + 20;
    double bottom = 8 + ROW * rows.size();
    Svg svg = new Svg(title, WIDTH, bottom + FOOT);
    PlotArea area = new PlotArea(left, WIDTH - 16, 8, bottom, range(), new PlotArea.Range(0, 1));
    axis(svg, area);
    for (int i = 0; i < rows.size(); i++) {
      draw(svg, area, rows.get(i), 8 + ROW * (i + 0.5));
    }
    return svg.finish();
  }

  private PlotArea.Range range() {
    double low = 0;
    double high = 0;
    for (Row r : rows) {
      if (r.isNumber()) {
        low = Math.min(low, r.low());
        high = Math.max(high, r.high());
      }
    }
    return PlotArea.Range.around(low, high).widened(0.04);
  }

  private void axis(Svg svg, PlotArea area) {
    NiceTicks ticks = NiceTicks.between(area.horizontal().low(), area.horizontal().high(), 9);
    for (double v : ticks.values()) {
      svg.line(area.x(v), area.top(), area.x(v), area.bottom() + 4, v == 0 ? 0.7 : 0.13);
      svg.text(area.x(v), area.bottom() + 17, "middle", ticks.label(v));
    }
    svg.line(area.left(), area.bottom(), area.right(), area.bottom(), 1);
    svg.text((area.left() + area.right()) / 2, area.bottom() + 34, "middle", abscissa);
  }

  private static void draw(Svg svg, PlotArea area, Row r, double y) {
    svg.text(area.left() - 10, y + 4, "end", r.label());
    if (!r.isNumber()) {
      return;
    }
    double value = area.x(r.value());
    double low = Math.min(area.x(r.low()), value - RADIUS);
    double high = Math.max(area.x(r.high()), value + RADIUS);
    String line = " stroke=\"currentColor\" stroke-width=\"1.6\"";
    // Two halves, so that an open circle stays empty on any ground.
    svg.add(
        "<path fill=\"none\""
            + line
            + " d=\""
            + whisker(low, value - RADIUS, y)
            + whisker(high, value + RADIUS, y)
            + "\"/>");
    String fill = r.marker() == Marker.FILLED ? "currentColor" : "none";
    svg.add(
        "<circle cx=\""
            + Svg.number(value)
            + "\" cy=\""
            + Svg.number(y)
            + "\" r=\""
            + Svg.number(RADIUS)
            + "\""
            + line
            + " fill=\""
            + fill
            + "\"/>");
  }

  private static String whisker(double end, double circle, double y) {
    return "M"
        + Svg.number(end)
        + " "
        + Svg.number(y - 4)
        + "v8M"
        + Svg.number(end)
        + " "
        + Svg.number(y)
        + "H"
        + Svg.number(circle);
  }
}
