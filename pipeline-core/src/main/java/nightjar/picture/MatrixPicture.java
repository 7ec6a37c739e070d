package nightjar.picture;

import java.util.List;
import java.util.stream.IntStream;
import nightjar.recording.KeptFrames;
import nightjar.recording.NamedSeries;

/**
 * The columns of a model as strips under each other, frames from left to right, each strip scaled
 * by its own largest magnitude; rejected frames are left blank.
 *
 * @param title read aloud in place of the picture
 * @param columns one value a frame
 * @param kept frames of the fit
 */
public record MatrixPicture(String title, List<NamedSeries> columns, KeptFrames kept) {
  private static final double WIDTH = 900;
  private static final double ROW = 15;
  private static final double LONGEST_NAME = 190;
  private static final int MOST_PIXELS = 1400;

  public MatrixPicture {
    columns = List.copyOf(columns);
  }

  /** The picture as one SVG element. */
  public String svg() {
    double names =
        columns.stream()
            .mapToDouble(c -> Math.min(LONGEST_NAME, Svg.widthOf(c.name())))
            .max()
            .orElse(0);
    double left = names + 12;
    double width = WIDTH - left - 12;
    double bottom = 6 + ROW * columns.size();
    Svg svg = new Svg(title, WIDTH, bottom + 66);
    for (int j = 0; j < columns.size(); j++) {
      double y = 6 + ROW * j;
      svg.text(left - 8, y + 11, "end", Svg.fit(columns.get(j).name(), LONGEST_NAME));
      svg.image(left, y + 1, width, ROW - 2, strip(columns.get(j)));
    }
    PlotArea area =
        new PlotArea(
            left,
            left + width,
            6,
            bottom,
            new PlotArea.Range(0, kept.frames()),
            new PlotArea.Range(0, 1));
    axis(svg, area);
    legend(svg, left, bottom + 46);
    return svg.finish();
  }

  private String strip(NamedSeries column) {
    int frames = kept.frames();
    int pixels = Math.min(frames, MOST_PIXELS);
    double largest =
        IntStream.range(0, frames).mapToDouble(t -> Math.abs(column.at(t))).max().orElse(0);
    int[] argb = new int[pixels];
    for (int i = 0; i < pixels; i++) {
      int from = (int) ((long) i * frames / pixels);
      int to = (int) ((long) (i + 1) * frames / pixels);
      argb[i] = pixel(column, from, to, largest > 0 ? largest : 1);
    }
    return PngImage.base64(pixels, 1, argb);
  }

  /** Mean over the kept frames of a pixel; transparent where there is none. */
  private int pixel(NamedSeries column, int from, int to, double largest) {
    double sum = 0;
    int n = 0;
    for (int t = from; t < to; t++) {
      if (kept.isKept(t) && Double.isFinite(column.at(t))) {
        sum += column.at(t);
        n++;
      }
    }
    return n == 0 ? 0 : 0xff000000 | Palette.diverging(sum / n / largest);
  }

  private static void axis(Svg svg, PlotArea area) {
    NiceTicks ticks = NiceTicks.between(0, area.horizontal().high(), 12);
    for (double v : ticks.values()) {
      svg.line(area.x(v), area.bottom(), area.x(v), area.bottom() + 4, 1);
      svg.text(area.x(v), area.bottom() + 17, "middle", ticks.label(v));
    }
    svg.text((area.left() + area.right()) / 2, area.bottom() + 33, "middle", "frame");
  }

  private static void legend(Svg svg, double left, double y) {
    int[] bar =
        IntStream.rangeClosed(-50, 50).map(i -> 0xff000000 | Palette.diverging(i / 50.0)).toArray();
    svg.text(left + 14, y + 11, "end", "\u22121");
    svg.image(left + 20, y + 2, 120, 10, PngImage.base64(bar.length, 1, bar));
    svg.text(left + 146, y + 11, "start", "1   share of the column's largest magnitude");
  }
}
