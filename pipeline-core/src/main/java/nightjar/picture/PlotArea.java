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
    return new PlotArea(
        GUTTER,
        frame.width() - 12,
        above + lanes + 8,
        above + frame.height() - FOOT,
        x.range(),
        y.range().widened(0.06));
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
    NiceTicks across =
        NiceTicks.between(horizontal.low(), horizontal.high(), most(right - left, 70));
    for (double v : across.values()) {
      svg.line(x(v), bottom, x(v), bottom + 4, 1);
      svg.text(x(v), bottom + 16, "middle", across.label(v));
    }
    NiceTicks up = NiceTicks.between(vertical.low(), vertical.high(), most(bottom - top, 28));
    for (double v : up.values()) {
      svg.line(left, y(v), right, y(v), v == 0 ? 0.5 : 0.13);
      svg.text(left - 6, y(v) + 4, "end", up.label(v));
    }
    svg.line(left, bottom, right, bottom, 1);
    svg.text((left + right) / 2, bottom + 32, "middle", frame.abscissa());
    svg.textUpwards(13, (top + bottom) / 2, Svg.fit(frame.ordinate(), bottom - top + 40));
  }

  private static int most(double pixels, double each) {
    return Math.max(2, (int) (pixels / each));
  }
}
