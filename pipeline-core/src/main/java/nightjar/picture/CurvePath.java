package nightjar.picture;

/** Curves as the {@code d} of SVG paths. */
final class CurvePath {
  private CurvePath() {}

  /**
   * The line. Of more points than two a pixel only the lowest and the highest of each column of
   * pixels are drawn, which looks the same.
   */
  static String line(Curve c, PlotArea area) {
    boolean dense = c.size() > 2 * (area.right() - area.left());
    StringBuilder d = new StringBuilder();
    boolean down = false;
    int i = 0;
    while (i < c.size()) {
      if (!Double.isFinite(c.y(i))) {
        down = false;
        i++;
        continue;
      }
      int end = dense ? endOfColumn(c, area, i) : i + 1;
      int low = extreme(c, i, end, -1);
      int high = extreme(c, i, end, 1);
      down = point(d, area, c.x(Math.min(low, high)), c.y(Math.min(low, high)), down);
      if (low != high) {
        down = point(d, area, c.x(Math.max(low, high)), c.y(Math.max(low, high)), down);
      }
      i = end;
    }
    return d.toString();
  }

  private static int endOfColumn(Curve c, PlotArea area, int from) {
    long column = (long) area.x(c.x(from));
    int i = from + 1;
    while (i < c.size() && Double.isFinite(c.y(i)) && (long) area.x(c.x(i)) == column) {
      i++;
    }
    return i;
  }

  private static int extreme(Curve c, int from, int to, int sign) {
    int best = from;
    for (int i = from + 1; i < to; i++) {
      best = sign * c.y(i) > sign * c.y(best) ? i : best;
    }
    return best;
  }

  /** A lone point becomes a dot: the line of length 0 that a square cap makes visible. */
  private static boolean point(StringBuilder d, PlotArea area, double x, double y, boolean down) {
    String place = Svg.number(area.x(x)) + " " + Svg.number(area.y(y));
    if (down) {
      d.append('L').append(place);
    } else {
      d.append('M').append(place).append("h.5");
    }
    return true;
  }

  /** The band, one closed piece for each stretch without NaN. */
  static String band(Curve c, PlotArea area) {
    StringBuilder d = new StringBuilder();
    int from = 0;
    while (from < c.size()) {
      int to = from;
      while (to < c.size() && Double.isFinite(c.y(to))) {
        to++;
      }
      for (int i = from; i < to; i++) {
        d.append(i == from ? 'M' : 'L').append(place(c, area, i, 1));
      }
      for (int i = to - 1; i >= from; i--) {
        d.append('L').append(place(c, area, i, -1));
      }
      d.append(to > from ? "z" : "");
      from = to + 1;
    }
    return d.toString();
  }

  private static String place(Curve c, PlotArea area, int i, int sign) {
    return Svg.number(area.x(c.x(i))) + " " + Svg.number(area.y(c.y(i) + sign * c.half(i)));
  }
}
