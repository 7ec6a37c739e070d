package nightjar.demo;

/**
 * Paints branching vessels into a finely sampled image: vessels along the surface, penetrating ones
 * from the surface downwards, and deep trunks.
 */
final class VesselTree {
  private static final int DEEPEST_BRANCH = 3;
  private static final double BRANCHES_A_VOXEL = 0.07;

  private final float[] image;
  private final int depths;
  private final int laterals;
  private final int fine;
  private final double[] surface;
  private final NormalStream random;

  /**
   * @param image modified, {@code [depths][laterals]}
   * @param surface depth of the brain's surface at each lateral sample
   * @param fine samples a voxel
   */
  VesselTree(float[] image, double[] surface, int fine, NormalStream random) {
    this.image = image;
    this.surface = surface;
    this.laterals = surface.length;
    this.depths = image.length / laterals;
    this.fine = fine;
    this.random = random;
  }

  /** A vessel from a place (samples) in a direction (0 = deeper, a quarter turn = lateral). */
  private record Course(
      double depth, double lateral, double angle, double length, double power, int order) {}

  /** Grows all vessels of a brain about {@code height} samples high. */
  void grow(double height) {
    for (int k = 0; k < 20; k++) {
      int x = (int) ((k + random.uniform()) / 20 * (laterals - 1));
      double bend = (x - 0.5 * laterals) / laterals;
      double length = random.uniform(0.15, 0.4) * height;
      // Penetrating vessels follow the curve of the surface inwards.
      paint(new Course(surface[x], x, -0.8 * bend, length, random.uniform(8, 25), 0));
    }
    for (int k = 0; k < 7; k++) {
      double angle = random.uniform(0.25, 0.75) * StrictMath.PI * (k % 2 == 0 ? 1 : -1);
      double depth = random.uniform(0.45, 0.85) * height;
      double lateral = random.uniform(0.2, 0.8) * laterals;
      double length = random.uniform(0.2, 0.45) * height;
      paint(new Course(depth, lateral, angle, length, random.uniform(15, 45), 0));
    }
    for (int x = 0; x < laterals; x++) {
      add(surface[x] + 0.5 * fine, x, 5 + 3 * StrictMath.sin(0.11 * x / fine));
    }
  }

  private void paint(Course course) {
    double depth = course.depth;
    double lateral = course.lateral;
    double angle = course.angle;
    double step = 0.5;
    for (double s = 0; s < course.length; s += step) {
      depth += step * StrictMath.cos(angle);
      lateral += step * StrictMath.sin(angle);
      angle += 0.12 * StrictMath.sqrt(step / fine) * random.normal();
      double left = 1 - s / course.length;
      add(depth, lateral, step * course.power * (0.3 + 0.7 * left));
      if (course.order < DEEPEST_BRANCH && random.uniform() < BRANCHES_A_VOXEL * step / fine) {
        double turn = random.uniform(0.4, 1.1) * (random.uniform() < 0.5 ? -1 : 1);
        double length = 0.6 * left * course.length;
        paint(
            new Course(depth, lateral, angle + turn, length, 0.6 * course.power, course.order + 1));
      }
    }
  }

  private void add(double depth, double lateral, double power) {
    int z = (int) depth;
    int x = (int) lateral;
    if (x >= 0 && x < laterals && z >= surface[x] && z < depths) {
      image[z * laterals + x] += (float) power;
    }
  }
}
