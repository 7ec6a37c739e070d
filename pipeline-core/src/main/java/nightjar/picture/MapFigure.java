package nightjar.picture;

import java.util.List;
import nightjar.recording.Grid;
import nightjar.recording.RegionLabels;
import org.jspecify.annotations.Nullable;

/**
 * A contact sheet of all planes with depth downwards and lateral to the right in mm, the legend
 * beside it: power in grey, values laid over it, outlines, regions. Immutable; arrays are shared
 * and must not be changed.
 */
public final class MapFigure {
  private final String title;
  private final Grid grid;
  private final float[] power;
  private final @Nullable Overlay overlay;
  private final List<Outline> outlines;
  private final RegionLabels regions;

  private MapFigure(
      String title,
      Grid grid,
      float[] power,
      @Nullable Overlay overlay,
      List<Outline> outlines,
      RegionLabels regions) {
    this.title = title;
    this.grid = grid;
    this.power = power;
    this.overlay = overlay;
    this.outlines = outlines;
    this.regions = regions;
  }

  /**
   * The mean power alone.
   *
   * @param title read aloud in place of the picture
   * @param power {@code [plane][depth][lateral]}, linear
   */
  public static MapFigure ofPower(String title, Grid grid, float[] power) {
    if (power.length != grid.voxels()) {
      throw new IllegalArgumentException(
          power.length + " values for a grid of " + grid.voxels() + " voxels");
    }
    return new MapFigure(title, grid, power, null, List.of(), RegionLabels.NONE);
  }

  /** The same sheet with values over the power. */
  public MapFigure withOverlay(Overlay values) {
    return new MapFigure(title, grid, power, values, outlines, regions);
  }

  /** The same sheet with lines around sets of voxels. */
  public MapFigure withOutlines(List<Outline> lines) {
    return new MapFigure(title, grid, power, overlay, List.copyOf(lines), regions);
  }

  /** The same sheet with the outlines of regions. */
  public MapFigure withRegions(RegionLabels labels) {
    return new MapFigure(title, grid, power, overlay, outlines, labels);
  }

  /** The picture as one SVG element. */
  public String svg() {
    int planes = grid.planes().size();
    SheetLayout layout = SheetLayout.of(grid);
    PowerGrey grey = PowerGrey.of(power);
    MapLegend legend = new MapLegend(grey, overlay, outlines, regions);
    double legendLeft = layout.width() + 26;
    double height = Math.max(layout.height(planes), legend.height());
    Svg svg = new Svg(title, legendLeft + MapLegend.WIDTH, height);
    for (int p = 0; p < planes; p++) {
      draw(new PlanePanel(svg, layout, grid, p), grey);
    }
    legend.draw(svg, legendLeft);
    return svg.finish();
  }

  private void draw(PlanePanel panel, PowerGrey grey) {
    panel.image(v -> PngImage.grey(grey.level(power[v])));
    if (overlay != null) {
      panel.image(overlay::pixel);
    }
    for (int r = 0; r < regions.regions().size(); r++) {
      panel.region(regions.regions().get(r).voxels(), r);
    }
    outlines.forEach(panel::outline);
    for (int r = 0; r < regions.regions().size(); r++) {
      panel.number(regions.regions().get(r).voxels(), r);
    }
    panel.axes();
  }
}
