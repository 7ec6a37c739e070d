package nightjar.picture;

import nightjar.recording.Axis;
import nightjar.recording.Grid;

/**
 * Where the planes of a contact sheet lie, pixels.
 *
 * @param columns planes side by side
 * @param panelWidth width of one plane
 * @param panelHeight height of one plane
 * @param headed whether a line of text stands over each plane
 */
record SheetLayout(int columns, double panelWidth, double panelHeight, boolean headed) {
  private static final double PLANES_WIDTH = 680;
  private static final double SHEET_HEIGHT = 760;
  private static final double LARGEST_HEIGHT = 420;
  private static final double LEFT = 52;
  private static final double BETWEEN = 14;
  private static final double HEAD = 20;
  private static final double FOOT = 24;

  /** The largest planes that fit. */
  static SheetLayout of(Grid grid) {
    int planes = grid.planes().size();
    double aspect = extent(grid.laterals(), grid) / extent(grid.depths(), grid);
    for (int columns = 1; ; columns++) {
      double widest = (PLANES_WIDTH - (columns - 1) * BETWEEN) / columns;
      double width = Math.max(16, Math.min(widest, LARGEST_HEIGHT * aspect));
      SheetLayout layout = new SheetLayout(columns, width, width / aspect, grid.hasPlaneAxis());
      if (columns == planes || layout.height(planes) <= SHEET_HEIGHT) {
        return layout;
      }
    }
  }

  /** Length of an axis from edge to edge, mm. */
  static double extent(Axis axis, Grid grid) {
    return axis.size() * spacing(axis, grid);
  }

  /** Spacing of an axis; one with a single position borrows that of another, or takes 0.1 mm. */
  static double spacing(Axis axis, Grid grid) {
    double own = axis.spacingMillimetres();
    double other =
        Math.max(grid.depths().spacingMillimetres(), grid.laterals().spacingMillimetres());
    return own > 0 ? own : other > 0 ? other : 0.1;
  }

  private double rowHeight() {
    return (headed ? HEAD : 6) + panelHeight + BETWEEN;
  }

  private int rows(int planes) {
    return (planes + columns - 1) / columns;
  }

  /** Left edge of plane {@code p}. */
  double left(int p) {
    return LEFT + p % columns * (panelWidth + BETWEEN);
  }

  /** Upper edge of plane {@code p}. */
  double top(int p) {
    int row = p / columns;
    return row * rowHeight() + (headed ? HEAD : 6);
  }

  /** Right edge of the planes. */
  double width() {
    return left(columns - 1) + panelWidth;
  }

  /** Height of the sheet with the lateral axis under it. */
  double height(int planes) {
    return rows(planes) * rowHeight() - BETWEEN + FOOT + Svg.LETTERS;
  }

  /** Whether plane {@code p} has the depth axis. */
  boolean atLeft(int p) {
    return p % columns == 0;
  }

  /** Whether plane {@code p} has the lateral axis: no plane lies under it. */
  boolean atBottom(int p, int planes) {
    return p + columns >= planes;
  }
}
