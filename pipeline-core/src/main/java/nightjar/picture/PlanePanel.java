package nightjar.picture;

import java.util.function.IntUnaryOperator;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.Mask;

/** Draws one plane of a contact sheet. */
final class PlanePanel {
  private static final double TICK = 4;
  // Panels narrower than this have no room for words.
  private static final double SMALL = 80;
  private static final double DEPTH_TICKS = 28;
  private static final double LATERAL_TICKS = 38;

  private final Svg svg;
  private final SheetLayout layout;
  private final Grid grid;
  private final int plane;
  private final double left;
  private final double top;

  PlanePanel(Svg svg, SheetLayout layout, Grid grid, int plane) {
    this.svg = svg;
    this.layout = layout;
    this.grid = grid;
    this.plane = plane;
    this.left = layout.left(plane);
    this.top = layout.top(plane);
  }

  /** Lays pixels over the plane; {@code pixel} gives the colour of a voxel of the grid. */
  void image(IntUnaryOperator pixel) {
    int first = plane * grid.planeVoxels();
    int[] argb = new int[grid.planeVoxels()];
    for (int i = 0; i < argb.length; i++) {
      argb[i] = pixel.applyAsInt(first + i);
    }
    String png = PngImage.base64(grid.laterals().size(), grid.depths().size(), argb);
    svg.image(left, top, layout.panelWidth(), layout.panelHeight(), png);
  }

  /** A line on a light ground, so that it is seen over dark and bright voxels alike. */
  void outline(Outline outline) {
    String path = boundary(outline.voxels());
    path(path, "stroke=\"#fff\" stroke-opacity=\"0.85\" stroke-width=\"2.4\"");
    String dashes =
        outline.stroke() == Outline.Stroke.DASHED ? " stroke-dasharray=\"3.5 2.5\"" : "";
    path(path, "stroke=\"#000\" stroke-width=\"1.1\"" + dashes);
  }

  /** The outline of the {@code i}th region, from 0. */
  void region(Mask voxels, int i) {
    String path = boundary(voxels);
    path(path, "stroke=\"#fff\" stroke-opacity=\"0.7\" stroke-width=\"3\"");
    path(path, "stroke=\"" + Palette.css(Palette.category(i)) + "\" stroke-width=\"1.8\"");
  }

  /** The number of the {@code i}th region at its middle, from 1: colours alone do not tell it. */
  void number(Mask voxels, int i) {
    double x = 0;
    double z = 0;
    int n = 0;
    for (int v = plane * grid.planeVoxels(); v < (plane + 1) * grid.planeVoxels(); v++) {
      if (voxels.contains(v)) {
        x += grid.lateralOf(v) + 0.5;
        z += grid.depthOf(v) + 0.5;
        n++;
      }
    }
    if (n > 0 && layout.panelWidth() >= SMALL) {
      double right = x / n / grid.laterals().size() * layout.panelWidth();
      double down = z / n / grid.depths().size() * layout.panelHeight();
      onPicture(left + right, top + down + 4, "middle", Integer.toString(i + 1));
    }
  }

  /** White letters in a black rim. */
  private void onPicture(double x, double y, String anchor, String words) {
    svg.add(
        "<text x=\""
            + Svg.number(x)
            + "\" y=\""
            + Svg.number(y)
            + "\" text-anchor=\""
            + anchor
            + "\" fill=\"#fff\" stroke=\"#000\" stroke-width=\"3\" stroke-linejoin=\"round\""
            + " paint-order=\"stroke\">"
            + words
            + "</text>");
  }

  private String boundary(Mask voxels) {
    int first = plane * grid.planeVoxels();
    return BoundaryPath.of(
        grid.laterals().size(), grid.depths().size(), i -> voxels.contains(first + i));
  }

  private void path(String path, String stroke) {
    if (path.isEmpty()) {
      return;
    }
    // Six decimals: a hundredth of a scale would shift the far edge by pixels.
    String scale =
        String.format(
            java.util.Locale.ROOT,
            "%.6f %.6f",
            layout.panelWidth() / grid.laterals().size(),
            layout.panelHeight() / grid.depths().size());
    svg.add(
        "<path fill=\"none\" vector-effect=\"non-scaling-stroke\" "
            + stroke
            + " transform=\"translate("
            + Svg.number(left)
            + " "
            + Svg.number(top)
            + ") scale("
            + scale
            + ")\" d=\""
            + path
            + "\"/>");
  }

  /** Frame, ticks in mm, the plane's place and, on the first plane, the scale bar. */
  void axes() {
    svg.box(
        left,
        top,
        layout.panelWidth(),
        layout.panelHeight(),
        "fill=\"none\" stroke=\"currentColor\"");
    if (grid.hasPlaneAxis()) {
      svg.text(left + layout.panelWidth() / 2, top - 6, "middle", place());
    }
    if (layout.atLeft(plane)) {
      depthAxis();
    }
    if (layout.atBottom(plane, grid.planes().size())) {
      lateralAxis();
    }
    if (plane == 0 && Math.min(layout.panelWidth(), layout.panelHeight()) >= SMALL / 2) {
      scaleBar();
    }
  }

  private String place() {
    String number = "plane " + plane;
    double mm = grid.planes().at(plane);
    String full = number + ", " + String.format(java.util.Locale.ROOT, "%.2f mm", mm);
    String signed = full.replace("-", "\u2212");
    return Svg.widthOf(signed) <= layout.panelWidth() + 10 ? signed : Integer.toString(plane);
  }

  private void depthAxis() {
    NiceTicks ticks = ticks(grid.depths(), layout.panelHeight() / DEPTH_TICKS);
    for (double mm : ticks.values()) {
      double y = top + share(grid.depths(), mm) * layout.panelHeight();
      svg.line(left - TICK, y, left, y, 1);
      svg.text(left - TICK - 3, y + 4, "end", ticks.label(mm));
    }
    svg.textUpwards(
        left - 38,
        top + layout.panelHeight() / 2,
        layout.panelHeight() < SMALL - 15 ? "mm" : "depth (mm)");
  }

  private void lateralAxis() {
    double bottom = top + layout.panelHeight();
    NiceTicks ticks = ticks(grid.laterals(), layout.panelWidth() / LATERAL_TICKS);
    for (double mm : ticks.values()) {
      double x = left + share(grid.laterals(), mm) * layout.panelWidth();
      svg.line(x, bottom, x, bottom + TICK, 1);
      svg.text(x, bottom + TICK + 12, "middle", ticks.label(mm));
    }
    String name = layout.panelWidth() < SMALL ? "mm" : "lateral (mm)";
    svg.text(left + layout.panelWidth() / 2, bottom + TICK + 27, "middle", name);
  }

  private NiceTicks ticks(Axis axis, double most) {
    double half = SheetLayout.spacing(axis, grid) / 2;
    double a = axis.at(0);
    double b = axis.at(axis.size() - 1);
    return NiceTicks.between(Math.min(a, b) - half, Math.max(a, b) + half, Math.max(2, (int) most));
  }

  /** Where a coordinate lies between the outer edges of the first and the last voxel, 0 to 1. */
  private double share(Axis axis, double mm) {
    int n = axis.size();
    double step =
        n == 1 ? SheetLayout.spacing(axis, grid) : (axis.at(n - 1) - axis.at(0)) / (n - 1);
    return ((mm - axis.at(0)) / step + 0.5) / n;
  }

  private void scaleBar() {
    double extent = SheetLayout.extent(grid.laterals(), grid);
    NiceTicks ticks = NiceTicks.between(0, extent, 9);
    double length = ticks.step() / extent * layout.panelWidth();
    double x = left + layout.panelWidth() - length - 8;
    double y = top + layout.panelHeight() - 9;
    svg.box(x - 1, y - 1, length + 2, 5, "fill=\"#000\" fill-opacity=\"0.8\"");
    svg.box(x, y, length, 3, "fill=\"#fff\"");
    onPicture(x + length, y - 5, "end", ticks.label(ticks.step()) + " mm");
  }
}
