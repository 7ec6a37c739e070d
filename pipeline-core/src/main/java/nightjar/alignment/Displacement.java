package nightjar.alignment;

import java.util.stream.IntStream;
import nightjar.recording.Mask;

/** How far the content of a slab's masked voxels is from the reference. Immutable. */
final class Displacement {
  private final double[] planes;
  private final double[] depths;
  private final double[] laterals;

  /** Over the voxels of the slab that are in {@code mask}, or over all where there are none. */
  Displacement(Slab slab, Mask mask) {
    int first = slab.firstVoxel();
    int[] masked =
        IntStream.range(0, slab.voxels()).filter(v -> mask.contains(first + v)).toArray();
    int[] voxels = masked.length > 0 ? masked : IntStream.range(0, slab.voxels()).toArray();
    planes = new double[voxels.length];
    depths = new double[voxels.length];
    laterals = new double[voxels.length];
    for (int k = 0; k < voxels.length; k++) {
      planes[k] = slab.planeMillimetres(voxels[k] / (slab.depths() * slab.laterals()));
      depths[k] = slab.depthMillimetres(voxels[k] / slab.laterals() % slab.depths());
      laterals[k] = slab.lateralMillimetres(voxels[k] % slab.laterals());
    }
  }

  /** Mean length of the displacement vectors, mm. */
  double mean(Pose pose) {
    double sum = 0;
    for (int k = 0; k < planes.length; k++) {
      sum += pose.displacement(planes[k], depths[k], laterals[k]);
    }
    return sum / planes.length;
  }
}
