package nightjar.mask;

import java.util.Arrays;
import nightjar.numeric.FlooredLog;
import nightjar.recording.Grid;
import nightjar.recording.Mask;

/**
 * The brain by its power: Otsu's threshold on ln(power) over all planes together, the largest
 * component of each plane (neighbours share a face or an edge in the plane), holes filled (numerics
 * section 4).
 */
public final class PowerMask {
  private PowerMask() {}

  /**
   * The mask that alignment and screening work with.
   *
   * @param medianImage median power per voxel of the grid; NaN where there is none
   * @param medianPower of the recording, positive; power is floored at 1/1000 of it
   * @return never a voxel without power; may be empty in some planes
   */
  public static Mask provisional(float[] medianImage, Grid grid, double medianPower) {
    double[] power = new double[medianImage.length];
    Arrays.setAll(power, v -> medianImage[v]);
    return of(power, grid, FlooredLog.ofMedianPower(medianPower));
  }

  static Mask of(double[] power, Grid grid, FlooredLog log) {
    double[] ln = Arrays.stream(power).map(log::of).toArray();
    double threshold = Otsu.threshold(ln);
    int cells = grid.planeVoxels();
    PlaneShape shape = new PlaneShape(grid.depths().size(), grid.laterals().size());
    boolean[] inside = new boolean[ln.length];
    for (int p = 0; p < grid.planes().size(); p++) {
      boolean[] above = new boolean[cells];
      for (int i = 0; i < cells; i++) {
        above[i] = ln[p * cells + i] > threshold;
      }
      boolean[] brain = shape.holesFilled(shape.largestComponent(above));
      System.arraycopy(brain, 0, inside, p * cells, cells);
    }
    return Mask.of(inside.length, v -> inside[v] && !Double.isNaN(ln[v]));
  }
}
