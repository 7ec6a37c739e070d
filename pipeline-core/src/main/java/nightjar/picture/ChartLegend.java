package nightjar.picture;

import java.util.ArrayList;
import java.util.List;

/** Lines, shades and marks of a chart by name, in rows over the chart. */
final class ChartLegend {
  private static final double ROW = 18;
  private static final double SWATCH = 28;
  private static final double GAP = 18;
  private static final double LONGEST_NAME = 200;

  /**
   * @param name text
   * @param left place of the swatch
   * @param row from 0
   * @param swatch markup drawn around a point in the swatch's middle left
   */
  private record Entry(String name, double left, int row, String swatch) {}

  private final List<Entry> entries = new ArrayList<>();
  private final double width;
  private double next = 62;
  private int row;

  private ChartLegend(double width) {
    this.width = width;
  }

  static ChartLegend of(List<Curve> curves, List<String> lanes, boolean rejected, double width) {
    ChartLegend legend = new ChartLegend(width);
    for (Curve c : curves) {
      if (!c.name().isEmpty()) {
        legend.add(
            c.name(),
            "<path d=\"M0 0h22\" fill=\"none\" stroke-width=\"2\" stroke=\""
                + c.colour()
                + "\""
                + c.dashes()
                + "/>");
      }
    }
    for (int i = 0; i < lanes.size(); i++) {
      String paint = "fill=\"" + Palette.css(Palette.category(i)) + "\"";
      legend.add(lanes.get(i), "<rect x=\"6\" y=\"-5\" width=\"16\" height=\"10\" " + paint + "/>");
    }
    if (rejected) {
      legend.add(
          "rejected frame", "<path d=\"M18 4v-8\" stroke=\"currentColor\" stroke-width=\"1.5\"/>");
    }
    return legend;
  }

  private void add(String name, String swatch) {
    String fitted = Svg.fit(name, LONGEST_NAME);
    double needs = SWATCH + Svg.widthOf(fitted) + GAP;
    if (next + needs > width && next > 62) {
      row++;
      next = 62;
    }
    entries.add(new Entry(fitted, next, row, swatch));
    next += needs;
  }

  double height() {
    return entries.isEmpty() ? 0 : ROW * (row + 1);
  }

  void draw(Svg svg) {
    for (Entry e : entries) {
      double y = ROW * e.row() + 9;
      svg.add(
          "<g transform=\"translate("
              + Svg.number(e.left())
              + " "
              + Svg.number(y)
              + ")\">"
              + e.swatch()
              + "</g>");
      svg.text(e.left() + SWATCH, y + 4, "start", e.name());
    }
  }
}
