package nightjar.demo;

/** The named areas of the invented brain and what they answer, in percent at a lasting stimulus. */
enum DemoRegion {
  BARREL_LEFT(0.32, 0.26, 0.080),
  BARREL_RIGHT(0.32, 0.74, 0.080),
  THALAMUS(0.66, 0.50, 0.090),
  QUIET_CORTEX(0.24, 0.50, 0.065);

  /** Width of the rim outside the labelled disc over which the response fades, of the depth. */
  private static final double RIM = 0.05;

  private final double depthShare;
  private final double lateralShare;
  private final double radiusShare;

  DemoRegion(double depthShare, double lateralShare, double radiusShare) {
    this.depthShare = depthShare;
    this.lateralShare = lateralShare;
    this.radiusShare = radiusShare;
  }

  /** Name in files. */
  String label() {
    return name().toLowerCase(java.util.Locale.ROOT);
  }

  /** Plateau of the response to a lasting stimulus, percent of the power at rest. */
  double percent(DemoStimulus stimulus) {
    return switch (this) {
      case BARREL_LEFT -> stimulus.choose(2, 10, 0);
      case BARREL_RIGHT -> stimulus.choose(10, 2, 0);
      case THALAMUS -> stimulus.choose(5, 5, 1);
      case QUIET_CORTEX -> 0;
    };
  }

  /** Whether the labelled disc holds the place; in voxels. */
  boolean holds(double depth, double lateral, DemoScan scan) {
    double radius = radiusShare * scan.depths();
    return squaredDistance(depth, lateral, scan) <= radius * radius;
  }

  /** 1 in the labelled disc, falling to 0 over a rim outside it; in voxels. */
  double weight(double depth, double lateral, DemoScan scan) {
    double squared = squaredDistance(depth, lateral, scan);
    double inner = radiusShare * scan.depths();
    double outer = (radiusShare + RIM) * scan.depths();
    if (squared <= inner * inner) {
      return 1;
    }
    if (squared >= outer * outer) {
      return 0;
    }
    double u = (outer - Math.sqrt(squared)) / (outer - inner);
    return u * u * (3 - 2 * u);
  }

  private double squaredDistance(double depth, double lateral, DemoScan scan) {
    double dz = depth - depthShare * (scan.depths() - 1);
    double dx = lateral - lateralShare * (scan.laterals() - 1);
    return dz * dz + dx * dx;
  }
}
