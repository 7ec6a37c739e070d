package nightjar.alignment;

import java.util.function.IntPredicate;
import java.util.stream.IntStream;

/** How a reference image changes with each parameter of motion, by differences of neighbours. */
final class Gradient {
  /** Planes from which on the outermost ones, with derivatives to one side only, are left out. */
  private static final int THICK = 5;

  private final Slab slab;
  private final float[] image;

  Gradient(Slab slab, float[] image) {
    this.slab = slab;
    this.image = image;
  }

  /**
   * The voxels of {@code chosen} that have a value, and neighbours with a value on both sides in
   * depth and lateral; of a thick volume only those between planes.
   */
  int[] voxels(IntPredicate chosen) {
    return IntStream.range(0, slab.voxels()).filter(chosen).filter(this::isKnown).toArray();
  }

  private boolean isKnown(int v) {
    int z = v / slab.laterals() % slab.depths();
    int x = v % slab.laterals();
    return (slab.planes() < THICK || isBetweenPlanes(v))
        && z > 0
        && z < slab.depths() - 1
        && x > 0
        && x < slab.laterals() - 1
        && !Double.isNaN(image[v] + byDepth(v) + byLateral(v) + byPlane(v));
  }

  private boolean isBetweenPlanes(int v) {
    int size = slab.depths() * slab.laterals();
    return v >= size && v < image.length - size;
  }

  /** Change of the image at the content of voxel {@code v} per mm or radian of displacement. */
  double by(Template.Parameter parameter, int v) {
    double plane = slab.planeMillimetres(v / (slab.depths() * slab.laterals()));
    double depth = slab.depthMillimetres(v / slab.laterals() % slab.depths());
    double lateral = slab.lateralMillimetres(v % slab.laterals());
    return switch (parameter) {
      case SHIFT_DEPTH -> byDepth(v);
      case SHIFT_LATERAL -> byLateral(v);
      case SHIFT_PLANE -> byPlane(v);
      case ROTATION -> byLateral(v) * depth - byDepth(v) * lateral;
      case TILT_DEPTH -> byDepth(v) * plane - byPlane(v) * depth;
      case TILT_LATERAL -> byLateral(v) * plane - byPlane(v) * lateral;
    };
  }

  private double byDepth(int v) {
    int step = slab.laterals();
    return ((double) image[v + step] - image[v - step]) / (2 * slab.depthStep());
  }

  private double byLateral(int v) {
    return ((double) image[v + 1] - image[v - 1]) / (2 * slab.lateralStep());
  }

  /** One-sided in the outermost planes; 0 in a single plane. */
  private double byPlane(int v) {
    int size = slab.depths() * slab.laterals();
    int before = v >= size ? v - size : v;
    int after = v + size < image.length ? v + size : v;
    int steps = (after - before) / size;
    double change = (double) image[after] - image[before];
    return steps == 0 ? 0 : change / (steps * slab.planeStep());
  }
}
