package nightjar.alignment;

import java.util.List;
import java.util.stream.IntStream;
import nightjar.recording.Axis;
import nightjar.recording.Grid;

/**
 * Neighbouring planes that move as one: a single plane or the whole volume. Steps are mm a voxel,
 * negative where the coordinate falls.
 */
record Slab(
    int firstPlane,
    int planes,
    int depths,
    int laterals,
    double planeStep,
    double depthStep,
    double lateralStep) {

  /** The slabs of a grid; a volume of one plane is a plane. */
  static List<Slab> of(Grid grid, AlignmentSettings.Scope scope) {
    if (scope == AlignmentSettings.Scope.VOLUME && grid.planes().size() > 1) {
      return List.of(of(grid, 0, grid.planes().size()));
    }
    return IntStream.range(0, grid.planes().size()).mapToObj(p -> of(grid, p, 1)).toList();
  }

  private static Slab of(Grid grid, int firstPlane, int planes) {
    return new Slab(
        firstPlane,
        planes,
        grid.depths().size(),
        grid.laterals().size(),
        step(grid.planes()),
        step(grid.depths()),
        step(grid.laterals()));
  }

  private static double step(Axis a) {
    int n = a.size();
    double step = n == 1 ? 0 : (a.at(n - 1) - a.at(0)) / (n - 1);
    return step == 0 ? 1 : step;
  }

  /** Number of voxels. */
  int voxels() {
    return planes * depths * laterals;
  }

  /** The grid's number of the first voxel. */
  int firstVoxel() {
    return firstPlane * depths * laterals;
  }

  /** Distance of plane {@code p} of the slab from the centre of the field, mm. */
  double planeMillimetres(int p) {
    return (p - 0.5 * (planes - 1)) * planeStep;
  }

  /** Distance of depth position {@code z} from the centre of the field, mm. */
  double depthMillimetres(int z) {
    return (z - 0.5 * (depths - 1)) * depthStep;
  }

  /** Distance of lateral position {@code x} from the centre of the field, mm. */
  double lateralMillimetres(int x) {
    return (x - 0.5 * (laterals - 1)) * lateralStep;
  }
}
