package nightjar.alignment;

/**
 * A frame's smoothed image at the places where the compared voxels of the reference lie in it, by
 * linear interpolation. Holds scratch arrays: one instance a thread.
 */
final class Sampling {
  private final Slab slab;
  private final int[] planes;
  private final int[] depths;
  private final int[] laterals;
  private final double[] values;

  Sampling(Template template) {
    slab = template.slab();
    int n = template.size();
    planes = new int[n];
    depths = new int[n];
    laterals = new int[n];
    values = new double[n];
    for (int k = 0; k < n; k++) {
      int v = template.voxel(k);
      planes[k] = v / (slab.depths() * slab.laterals());
      depths[k] = v / slab.laterals() % slab.depths();
      laterals[k] = v % slab.laterals();
    }
  }

  /** The last sample, one value a compared voxel; NaN where it is missing or not in sight. */
  double[] values() {
    return values;
  }

  /** Samples {@code image} and returns the number of values that are not missing. */
  int sample(float[] image, Pose pose) {
    Placement place = new Placement(slab, pose);
    int found = 0;
    for (int k = 0; k < values.length; k++) {
      int p = planes[k];
      int z = depths[k];
      int x = laterals[k];
      double depth = place.depth(p, z, x);
      double lateral = place.lateral(p, z, x);
      values[k] =
          slab.planes() == 1
              ? inPlane(image, 0, depth, lateral)
              : between(image, place.plane(p, z, x), depth, lateral);
      if (!Double.isNaN(values[k])) {
        found++;
      }
    }
    return found;
  }

  /** Beyond the outermost planes, up to half a plane, the line is carried on. */
  private double between(float[] image, double plane, double depth, double lateral) {
    if (!(plane >= -0.5 && plane <= slab.planes() - 0.5)) {
      return Double.NaN;
    }
    int p = Math.max(0, Math.min(slab.planes() - 2, (int) plane));
    double before = inPlane(image, p, depth, lateral);
    return before + (plane - p) * (inPlane(image, p + 1, depth, lateral) - before);
  }

  private double inPlane(float[] image, int plane, double depth, double lateral) {
    int nz = slab.depths();
    int nx = slab.laterals();
    int z = (int) depth;
    int x = (int) lateral;
    if (!(depth >= 0 && lateral >= 0) || z >= nz - 1 || x >= nx - 1) {
      return Double.NaN;
    }
    double f = depth - z;
    double g = lateral - x;
    int i = (plane * nz + z) * nx + x;
    double upper = image[i] + g * (image[i + 1] - image[i]);
    double lower = image[i + nx] + g * (image[i + nx + 1] - image[i + nx]);
    return upper + f * (lower - upper);
  }
}
