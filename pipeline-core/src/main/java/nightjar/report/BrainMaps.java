package nightjar.report;

import java.util.List;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.RegionLabels;

/** The images of a session. Immutable; arrays are shared and must not be changed. */
public final class BrainMaps {
  private final Grid grid;
  private final Mask mask;
  private final float[] meanPower;
  private final RegionLabels regions;
  private final List<ContrastMap> contrasts;

  /**
   * @param mask analysed voxels
   * @param meanPower {@code [plane][depth][lateral]}, linear
   * @param regions named areas
   * @param contrasts in the plan's order, the first is the headline
   */
  public BrainMaps(
      Grid grid, Mask mask, float[] meanPower, RegionLabels regions, List<ContrastMap> contrasts) {
    this.grid = grid;
    this.mask = mask;
    this.meanPower = meanPower;
    this.regions = regions;
    this.contrasts = List.copyOf(contrasts);
  }

  /** Where the voxels lie. */
  public Grid grid() {
    return grid;
  }

  /** Analysed voxels. */
  public Mask mask() {
    return mask;
  }

  float[] meanPower() {
    return meanPower;
  }

  /** Named areas. */
  public RegionLabels regions() {
    return regions;
  }

  /** In the plan's order. */
  public List<ContrastMap> contrasts() {
    return contrasts;
  }
}
