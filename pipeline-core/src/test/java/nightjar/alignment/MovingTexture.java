package nightjar.alignment;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.stream.IntStream;
import nightjar.film.Scratch;
import nightjar.numeric.Workers;
import nightjar.recording.Axis;
import nightjar.recording.FrameSource;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.Progress;
import nightjar.recording.RigidMotion;

/**
 * A recording in closed form: Gaussian blobs on a dim ground, moved as a whole by a known motion in
 * every frame, so that no interpolation is needed. A motion turns about one axis at a time.
 */
final class MovingTexture implements FrameSource {
  /** Changes the power of one voxel of one frame. */
  @FunctionalInterface
  interface Retouch {
    double apply(int frame, int voxel, double power);
  }

  private record Blob(double power, double p, double z, double x, double width) {}

  private static final double GROUND = 0.15;

  private final Grid grid;
  private final List<RigidMotion> motions;
  private final List<Blob> blobs = new ArrayList<>();
  private final List<Retouch> retouches = new ArrayList<>();

  /** Blobs all over the field and around it, drawn with {@code seed}. */
  MovingTexture(Grid grid, List<RigidMotion> motions, long seed) {
    this.grid = grid;
    this.motions = motions;
    Random random = new Random(seed);
    double step = grid.smallerSpacingMillimetres();
    int count = grid.planeVoxels() / 40 * (grid.planes().size() > 1 ? 4 : 1);
    for (int i = 0; i < count; i++) {
      blobs.add(
          new Blob(
              0.3 + random.nextDouble(),
              grid.planes().size() == 1 ? 0 : spot(random, grid.planes()),
              spot(random, grid.depths()),
              spot(random, grid.laterals()),
              step * (1.8 + 1.5 * random.nextDouble())));
    }
  }

  private static double spot(Random random, Axis axis) {
    double half = 0.5 * axis.size() * axis.spacingMillimetres() + 0.5;
    return (2 * random.nextDouble() - 1) * half;
  }

  static Axis axis(int size, double step) {
    return Axis.of(IntStream.range(0, size).mapToDouble(i -> 2 + step * i).toArray());
  }

  static Grid plane(int depths, int laterals) {
    return new Grid(Axis.of(0), axis(depths, 0.1), axis(laterals, 0.1), false);
  }

  static RigidMotion shifted(double depthMillimetres, double lateralMillimetres) {
    return new RigidMotion(depthMillimetres, lateralMillimetres, 0, 0, 0, 0);
  }

  MovingTexture with(Retouch retouch) {
    retouches.add(retouch);
    return this;
  }

  /** Power of the content that rests at a voxel, without retouches. */
  double atRest(int voxel) {
    return power(place(voxel));
  }

  @Override
  public Grid grid() {
    return grid;
  }

  @Override
  public FrameTimes times() {
    return FrameTimes.of(IntStream.range(0, motions.size()).mapToDouble(t -> 0.4 * t).toArray());
  }

  @Override
  public void read(int first, int count, float[] into, int offset) {
    int at = offset;
    for (int t = first; t < first + count; t++) {
      for (int v = 0; v < grid.voxels(); v++) {
        double value = power(before(motions.get(t), place(v)));
        for (Retouch r : retouches) {
          value = r.apply(t, v, value);
        }
        into[at++] = (float) value;
      }
    }
  }

  /** Distance of a voxel from the centre of the field: plane, depth, lateral in mm. */
  private double[] place(int v) {
    return new double[] {
      fromCentre(grid.planes(), grid.planeOf(v)),
      fromCentre(grid.depths(), grid.depthOf(v)),
      fromCentre(grid.laterals(), grid.lateralOf(v))
    };
  }

  private static double fromCentre(Axis axis, int i) {
    return axis.at(i) - 0.5 * (axis.at(0) + axis.at(axis.size() - 1));
  }

  /** Where content that a motion brought to {@code u} had been: the inverse motion. */
  private static double[] before(RigidMotion m, double[] u) {
    double[] b = {
      u[0] - m.shiftPlaneMillimetres(),
      u[1] - m.shiftDepthMillimetres(),
      u[2] - m.shiftLateralMillimetres()
    };
    turnBack(b, 1, 2, m.rotationDegrees());
    turnBack(b, 0, 1, m.tiltDepthDegrees());
    turnBack(b, 0, 2, m.tiltLateralDegrees());
    return b;
  }

  /** Undoes a turn from axis {@code from} towards axis {@code to}. */
  private static void turnBack(double[] b, int from, int to, double degrees) {
    double c = Math.cos(Math.toRadians(degrees));
    double s = Math.sin(Math.toRadians(degrees));
    double f = c * b[from] + s * b[to];
    b[to] = -s * b[from] + c * b[to];
    b[from] = f;
  }

  private double power(double[] u) {
    double sum = GROUND;
    for (Blob b : blobs) {
      double dp = (u[0] - b.p) / (3 * b.width);
      double dz = (u[1] - b.z) / b.width;
      double dx = (u[2] - b.x) / b.width;
      double squared = dp * dp + dz * dz + dx * dx;
      if (squared < 60) {
        sum += b.power * Math.exp(-0.5 * squared);
      }
    }
    return sum;
  }

  /** Aligns all of it with two threads; every frame is typical, the whole field is masked. */
  AlignedFilm align(AlignmentSettings.Model model, AlignmentSettings.Scope scope) {
    return align(
        new AlignmentSettings(model, scope, AlignmentSettings.Reference.FIRST),
        new Scratch(java.nio.file.Path.of("unused"), Long.MAX_VALUE),
        2);
  }

  AlignedFilm align(AlignmentSettings settings, Scratch scratch, int threads) {
    List<Integer> all = IntStream.range(0, motions.size()).boxed().toList();
    ReferenceFrames reference = new ReferenceFrames(all, Mask.all(grid.voxels()), 2 * GROUND);
    try (Workers workers = new Workers(threads)) {
      return Alignment.align(this, settings, reference, scratch, workers, Progress.SILENT);
    }
  }
}
