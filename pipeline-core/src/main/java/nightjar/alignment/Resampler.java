package nightjar.alignment;

import nightjar.numeric.CubicSpline;
import nightjar.numeric.LocalFill;

/**
 * Puts a frame's content back where the reference has it: one cubic B-spline interpolation of the
 * power itself. Holds scratch arrays: one instance a thread.
 */
final class Resampler {
  /** A value of which missing neighbours would make up more than this is missing too. */
  private static final double MOST_MISSING = 0.01;

  private final Slab slab;
  private final CubicSpline spline;
  private final float[] values;
  private boolean anyMissing;
  private boolean nonNegative;

  Resampler(Slab slab) {
    this.slab = slab;
    spline = new CubicSpline(slab.planes(), slab.depths(), slab.laterals());
    values = new float[slab.voxels()];
  }

  /**
   * Resamples the slab.
   *
   * @param frame the whole grid as recorded, NaN = missing; not modified
   * @param place where the content of the reference's voxels lies in the frame
   * @param aligned modified: the slab's part of the aligned frame; NaN outside the field and next
   *     to missing values
   */
  void resample(float[] frame, Placement place, float[] aligned) {
    fit(frame);
    for (int p = 0; p < slab.planes(); p++) {
      for (int z = 0; z < slab.depths(); z++) {
        resampleRow(frame, place, aligned, p, z);
      }
    }
  }

  private void fit(float[] frame) {
    System.arraycopy(frame, slab.firstVoxel(), values, 0, values.length);
    anyMissing = false;
    nonNegative = true;
    for (float v : values) {
      anyMissing |= Float.isNaN(v);
      nonNegative &= !(v < 0);
    }
    if (anyMissing) {
      int size = slab.depths() * slab.laterals();
      for (int p = 0; p < slab.planes(); p++) {
        LocalFill.fill(values, p * size, slab.depths(), slab.laterals());
      }
    }
    spline.fit(values, 0);
  }

  private void resampleRow(float[] frame, Placement place, float[] aligned, int p, int z) {
    int row = slab.firstVoxel() + (p * slab.depths() + z) * slab.laterals();
    int first = place.firstInField(p, z);
    int end = place.endInField(p, z, first);
    java.util.Arrays.fill(aligned, row, row + first, Float.NaN);
    java.util.Arrays.fill(aligned, row + end, row + slab.laterals(), Float.NaN);
    for (int x = first; x < end; x++) {
      double depth = place.depth(p, z, x);
      double lateral = place.lateral(p, z, x);
      double v =
          slab.planes() == 1
              ? spline.at(depth, lateral)
              : spline.at(place.plane(p, z, x), depth, lateral);
      aligned[row + x] = (float) (nonNegative ? Math.max(0, v) : v);
    }
    if (anyMissing) {
      for (int x = first; x < end; x++) {
        if (missingShare(frame, place, p, z, x) > MOST_MISSING) {
          aligned[row + x] = Float.NaN;
        }
      }
    }
  }

  /** Share of missing voxels in a linear interpolation at the place of a voxel's content. */
  private double missingShare(float[] frame, Placement place, int p, int z, int x) {
    double plane = place.plane(p, z, x);
    double depth = place.depth(p, z, x);
    double lateral = place.lateral(p, z, x);
    double share = 0;
    for (int corner = 0; corner < 8; corner++) {
      int pp = (int) Math.floor(plane) + (corner >> 2);
      int zz = (int) Math.floor(depth) + (corner >> 1 & 1);
      int xx = (int) Math.floor(lateral) + (corner & 1);
      double weight =
          (1 - Math.abs(plane - pp)) * (1 - Math.abs(depth - zz)) * (1 - Math.abs(lateral - xx));
      if (Float.isNaN(frame[nearest(pp, zz, xx)])) {
        share += weight;
      }
    }
    return share;
  }

  private int nearest(int p, int z, int x) {
    int pp = Math.max(0, Math.min(slab.planes() - 1, p));
    int zz = Math.max(0, Math.min(slab.depths() - 1, z));
    int xx = Math.max(0, Math.min(slab.laterals() - 1, x));
    return slab.firstVoxel() + (pp * slab.depths() + zz) * slab.laterals() + xx;
  }
}
