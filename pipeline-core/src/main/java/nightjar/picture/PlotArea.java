package nightjar.picture;

import java.util.List;

/**
 * The rectangle that data are drawn in and its two scales.
 *
 * @param left pixels
 * @param right pixels
 * @param top pixels
 * @param bottom pixels, below top
 * @param horizontal values at left and right
 * @param vertical values at bottom and top
 */
record PlotArea(
    double left, double right, double top, double bottom, Range horizontal, Range vertical) {
  private static final double GUTTER = 62;
  private static final double FOOT = 38;
  private static final double TICK_WIDTH = 70;
  private static final double TICK_HEIGHT = 28;

  /** Two different finite ends. */
  record Range(double low, double high) {
    /** The range of what is finite of it; 0 to 1 where nothing is, and never a single point. */
    static Range around(double low, double high) {
      if (!(low <= high) || Double.isInfinite(low) || Double.isInfinite(high)) {
        return new Range(0, 1);
      }
      double pad = high > low ? 0 : Math.max(Math.abs(low), 1) / 2;
      return new Range(low - pad, high + pad);
    }

    Range widened(double share) {
      double pad = (high - low) * share;
      return new Range(low - pad, high + pad);
    }
  }

  static PlotArea of(
      ChartFrame frame, List<Curve> curves, List<Span> spans, double above, double lanes) {
    Ends x = new Ends();
    Ends y = new Ends();
    for (Curve c : curves) {
      for (int i = 0; i < c.size(); i++) {
        x.take(c.x(i));
        y.take(c.y(i) - c.half(i));
        y.take(c.y(i) + c.half(i));
      }
    }
    if (curves.isEmpty()) {
      spans.forEach(s -> x.take(s.from()));
      spans.forEach(s -> x.take(s.to()));
    }
    double top = above + lanes + 8;
    double bottom = above + frame.height() - FOOT;
    Range vertical = y.range().widened(0.06);
    double labels = widest(ticks(vertical, bottom - top, TICK_HEIGHT));
    return new PlotArea(
        Math.max(GUTTER, labels + 34), frame.width() - 12, top, bottom, x.range(), vertical);
  }

  private static double widest(NiceTicks ticks) {
    return ticks.values().stream().mapToDouble(v -> Svg.widthOf(ticks.label(v))).max().orElse(0);
  }

  private static NiceTicks ticks(Range range, double pixels, double each) {
    return NiceTicks.between(range.low(), range.high(), Math.max(2, (int) (pixels / each)));
  }

  private static final class Ends {
    private double low = Double.POSITIVE_INFINITY;
    private double high = Double.NEGATIVE_INFINITY;

    void take(double v) {
      if (Double.isFinite(v)) {
        low = Math.min(low, v);
        high = Math.max(high, v);
      }
    }

    Range range() {
      return Range.around(low, high);
    }
  }

  double x(double value) {
    return left
        + (value - horizontal.low()) / (horizontal.high() - horizontal.low()) * (right - left);
  }

  double y(double value) {
    return bottom - (value - vertical.low()) / (vertical.high() - vertical.low()) * (bottom - top);
  }

  /** Frame lines, ticks and names of the axes. */
  void axes(Svg svg, ChartFrame frame) {
    NiceTicks across = ticks(horizontal, right - left, TICK_WIDTH);
    for (double v : across.values()) {
      svg.line(x(v), bottom, x(v), bottom + 4, 1);
      svg.text(x(v), bottom + 16, "middle", across.label(v));
    }
    NiceTicks up = ticks(vertical, bottom - top, TICK_HEIGHT);
    for (double v : up.values()) {
      svg.line(left, y(v), right, y(v), v == 0 ? 0.5 : 0.13);
      svg.text(left - 6, y(v) + 4, "end", up.label(v));
    }
    svg.line(left, bottom, right, bottom, 1);
    svg.text((left + right) / 2, bottom + 32, "middle", frame.abscissa());
    svg.textUpwards(13, (top + bottom) / 2, Svg.fit(frame.ordinate(), bottom - top + 40));
  }
}
