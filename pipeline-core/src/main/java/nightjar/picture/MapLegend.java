package nightjar.picture;

import java.util.List;
import java.util.Locale;
import nightjar.recording.RegionLabels;
import org.jspecify.annotations.Nullable;

/** What the colours and lines of a map mean, beside it. */
final class MapLegend {
  /** Pixels. */
  static final double WIDTH = 210;

  private static final double LINE = 17;
  private static final double BAR_HEIGHT = 150;
  private static final double BAR_WIDTH = 16;
  private static final int STEPS = 101;

  private final PowerGrey grey;
  private final @Nullable Overlay overlay;
  private final List<Outline> outlines;
  private final RegionLabels regions;

  MapLegend(
      PowerGrey grey, @Nullable Overlay overlay, List<Outline> outlines, RegionLabels regions) {
    this.grey = grey;
    this.overlay = overlay;
    this.outlines = outlines;
    this.regions = regions;
  }

  /** Height that {@link #draw} needs. */
  double height() {
    double values = overlay == null ? 0 : BAR_HEIGHT + 34 + 2 * LINE + 5 + 2 * LINE + 8;
    return 8 + values + LINE * outlines.size() + 58 + LINE * regions.regions().size();
  }

  /** Draws from the top of the picture. */
  void draw(Svg svg, double left) {
    double y = 8;
    if (overlay != null) {
      y = values(svg, left, y, overlay);
    }
    for (Outline o : outlines) {
      y = line(svg, left, y, o);
    }
    y = power(svg, left, y + 4);
    for (int r = 0; r < regions.regions().size(); r++) {
      String name = regions.regions().get(r).name();
      svg.box(left, y, 12, 12, "fill=\"none\" stroke-width=\"2\" stroke=\"" + colour(r) + "\"");
      svg.text(left + 20, y + 10, "start", Svg.fit((r + 1) + "  " + name, WIDTH - 24));
      y += LINE;
    }
  }

  private static String colour(int region) {
    return Palette.css(Palette.category(region));
  }

  private double values(Svg svg, double left, double from, Overlay shown) {
    svg.text(left, from + 10, "start", Svg.fit(shown.heading(), WIDTH));
    double top = from + 22;
    int[] bar = new int[STEPS];
    for (int i = 0; i < STEPS; i++) {
      bar[i] = 0xff000000 | Palette.diverging(1 - 2.0 * i / (STEPS - 1));
    }
    svg.image(left, top, BAR_WIDTH, BAR_HEIGHT, PngImage.base64(1, STEPS, bar));
    svg.box(left, top, BAR_WIDTH, BAR_HEIGHT, "fill=\"none\" stroke=\"currentColor\"");
    NiceTicks ticks = NiceTicks.between(-shown.limit(), shown.limit(), 7);
    for (double v : ticks.values()) {
      double y = top + (1 - v / shown.limit()) / 2 * BAR_HEIGHT;
      svg.line(left + BAR_WIDTH, y, left + BAR_WIDTH + 4, y, 1);
      svg.text(left + BAR_WIDTH + 8, y + 4, "start", ticks.label(v));
    }
    svg.text(left + 74, top + 10, "start", "increase");
    svg.text(left + 74, top + BAR_HEIGHT - 2, "start", "decrease");
    return notes(svg, left, top + BAR_HEIGHT + 12);
  }

  private double notes(Svg svg, double left, double from) {
    double y = from + 10;
    svg.text(left, y, "start", "faint: not significant,");
    svg.text(left, y + LINE, "start", "the weaker |t| the fainter");
    svg.text(left, y + 2 * LINE + 5, "start", "(after Allen, Erhardt &");
    svg.text(left, y + 3 * LINE + 5, "start", "Calhoun 2012, Neuron 74:603)");
    return y + 4 * LINE + 3;
  }

  private double line(Svg svg, double left, double y, Outline o) {
    String dashes = o.stroke() == Outline.Stroke.DASHED ? " stroke-dasharray=\"3.5 2.5\"" : "";
    svg.add(
        "<path d=\"M"
            + Svg.number(left)
            + " "
            + Svg.number(y + 6)
            + "h24\" fill=\"none\""
            + " stroke=\"currentColor\" stroke-width=\"1.4\""
            + dashes
            + "/>");
    svg.text(left + 32, y + 10, "start", Svg.fit(o.label(), WIDTH - 34));
    return y + LINE;
  }

  private double power(Svg svg, double left, double y) {
    int[] bar = new int[STEPS];
    for (int i = 0; i < STEPS; i++) {
      bar[i] = PngImage.grey(255 * i / (STEPS - 1));
    }
    double width = WIDTH - 70;
    svg.text(left, y + 10, "start", "mean power (dB, logarithmic)");
    svg.image(left, y + 17, width, 10, PngImage.base64(STEPS, 1, bar));
    svg.box(left, y + 17, width, 10, "fill=\"none\" stroke=\"currentColor\"");
    String low = String.format(Locale.ROOT, "\u2212%.1f", grey.rangeDecibel());
    svg.text(left, y + 41, "start", low);
    svg.text(left + width, y + 41, "end", "0");
    return y + 54;
  }
}
