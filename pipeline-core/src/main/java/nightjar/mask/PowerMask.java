package nightjar.mask;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.BitSet;
import nightjar.recording.Grid;
import nightjar.recording.Mask;

/**
 * Brain by its power (numerics section 4): in each plane the voxels whose ln(power) exceeds Otsu's
 * threshold, of these the largest connected component (neighbours share a face or an edge), holes
 * filled.
 */
public final class PowerMask {
  /** Power is floored at this share of the recording's median before logarithms. */
  public static final double FLOOR_SHARE = 1e-3;

  private final int depths;
  private final int laterals;

  private PowerMask(Grid grid) {
    this.depths = grid.depths().size();
    this.laterals = grid.laterals().size();
  }

  /**
   * The mask of an image.
   *
   * @param power one value a voxel of the grid; NaN is outside
   * @param medianPower of the whole recording; positive
   */
  public static Mask of(float[] power, Grid grid, double medianPower) {
    PowerMask shape = new PowerMask(grid);
    double floor = FLOOR_SHARE * medianPower;
    BitSet inside = new BitSet(grid.voxels());
    for (int p = 0; p < grid.planes().size(); p++) {
      int first = p * grid.planeVoxels();
      double[] log = new double[grid.planeVoxels()];
      for (int v = 0; v < log.length; v++) {
        float y = power[first + v];
        log[v] = Float.isNaN(y) ? Double.NaN : Math.log(Math.max(y, floor));
      }
      BitSet plane = shape.ofPlane(log);
      plane.stream().forEach(v -> inside.set(first + v));
    }
    return Mask.of(grid.voxels(), inside::get);
  }

  private BitSet ofPlane(double[] log) {
    double threshold = Otsu.threshold(log);
    BitSet above = new BitSet(log.length);
    for (int v = 0; v < log.length; v++) {
      if (log[v] > threshold) {
        above.set(v);
      }
    }
    return filled(largestComponent(above));
  }

  private BitSet largestComponent(BitSet above) {
    BitSet left = (BitSet) above.clone();
    BitSet largest = new BitSet();
    for (int v = left.nextSetBit(0); v >= 0; v = left.nextSetBit(v)) {
      BitSet component = spread(v, left, true);
      left.andNot(component);
      if (component.cardinality() > largest.cardinality()) {
        largest = component;
      }
    }
    return largest;
  }

  /** Adds what the outside cannot reach over faces. */
  private BitSet filled(BitSet component) {
    BitSet outside = new BitSet(depths * laterals);
    outside.set(0, depths * laterals);
    outside.andNot(component);
    BitSet reached = new BitSet();
    for (int v = outside.nextSetBit(0); v >= 0; v = outside.nextSetBit(v + 1)) {
      int z = v / laterals;
      int x = v % laterals;
      boolean border = z == 0 || x == 0 || z == depths - 1 || x == laterals - 1;
      if (border && !reached.get(v)) {
        reached.or(spread(v, outside, false));
      }
    }
    BitSet filled = new BitSet(depths * laterals);
    filled.set(0, depths * laterals);
    filled.andNot(reached);
    return component.isEmpty() ? component : filled;
  }

  /** All voxels of {@code within} that are connected with {@code start}. */
  private BitSet spread(int start, BitSet within, boolean overEdges) {
    BitSet seen = new BitSet(depths * laterals);
    ArrayDeque<Integer> open = new ArrayDeque<>(Arrays.asList(start));
    seen.set(start);
    while (!open.isEmpty()) {
      int v = open.remove();
      int z = v / laterals;
      int x = v % laterals;
      for (int dz = -1; dz <= 1; dz++) {
        for (int dx = -1; dx <= 1; dx++) {
          boolean allowed = overEdges || dz == 0 || dx == 0;
          if (allowed && z + dz >= 0 && z + dz < depths && x + dx >= 0 && x + dx < laterals) {
            int w = v + dz * laterals + dx;
            if (within.get(w) && !seen.get(w)) {
              seen.set(w);
              open.add(w);
            }
          }
        }
      }
    }
    return seen;
  }
}
