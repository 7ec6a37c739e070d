package nightjar.picture;

import java.util.List;

/**
 * Lines over one horizontal axis: time courses with stimuli shaded and rejected frames marked,
 * responses around the onset, traces of motion.
 *
 * @param frame axes and size
 * @param curves drawn in order
 * @param spans shaded stretches
 * @param rejected places of rejected frames on the horizontal axis
 */
public record CurveChart(
    ChartFrame frame, List<Curve> curves, List<Span> spans, List<Double> rejected) {
  private static final double LANE = 5;

  public CurveChart {
    curves = List.copyOf(curves);
    spans = List.copyOf(spans);
    rejected = List.copyOf(rejected);
  }

  /** The picture as one SVG element. */
  public String svg() {
    List<String> lanes = spans.stream().map(Span::name).distinct().toList();
    ChartLegend legend = ChartLegend.of(curves, lanes, !rejected.isEmpty(), frame.width());
    Svg svg = new Svg(frame.title(), frame.width(), frame.height() + legend.height());
    legend.draw(svg);
    PlotArea area = PlotArea.of(frame, curves, spans, legend.height(), LANE * lanes.size());
    for (Span s : spans) {
      shade(svg, area, s, lanes.indexOf(s.name()));
    }
    area.axes(svg, frame);
    for (Curve c : curves) {
      band(svg, area, c);
      svg.add(
          "<path d=\""
              + CurvePath.line(c, area)
              + "\" fill=\"none\" stroke-linejoin=\"round\""
              + " stroke-width=\"1.6\" stroke=\""
              + c.colour()
              + "\""
              + c.dashes()
              + "/>");
    }
    reject(svg, area);
    return svg.finish();
  }

  private static void shade(Svg svg, PlotArea area, Span s, int lane) {
    double from = Math.max(area.left(), area.x(s.from()));
    double width = Math.max(1, Math.min(area.right(), area.x(s.to())) - from);
    if (from >= area.right() || area.x(s.to()) < area.left()) {
      return;
    }
    String paint = "fill=\"" + Palette.css(Palette.category(lane)) + "\"";
    double height = area.bottom() - area.top();
    svg.box(from, area.top(), width, height, paint + " fill-opacity=\"0.16\"");
    svg.box(from, area.top() - LANE * (lane + 1), width, LANE - 1, paint);
  }

  private static void band(Svg svg, PlotArea area, Curve c) {
    if (c.hasBand()) {
      svg.add(
          "<path d=\""
              + CurvePath.band(c, area)
              + "\" fill-opacity=\"0.2\" fill=\""
              + c.colour()
              + "\"/>");
    }
  }

  private void reject(Svg svg, PlotArea area) {
    StringBuilder d = new StringBuilder();
    for (double x : rejected) {
      d.append('M').append(Svg.number(area.x(x))).append(' ').append(Svg.number(area.bottom()));
      d.append("v-7");
    }
    if (d.length() > 0) {
      svg.add("<path d=\"" + d + "\" stroke=\"currentColor\" stroke-width=\"1.5\"/>");
    }
  }
}
