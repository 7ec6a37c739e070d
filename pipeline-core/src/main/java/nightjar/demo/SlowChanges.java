package nightjar.demo;

/**
 * Relative changes of power that have nothing to do with stimuli: two slow drifts with their own
 * patterns over the field, a common change, and the ripple of breathing and heartbeat.
 */
final class SlowChanges {
  private static final double DRIFT_SHARE = 0.03;
  private static final double COMMON_SHARE = 0.006;
  private static final double BREATHING_HERTZ = 1.1;
  private static final double BREATHING_SHARE = 0.006;
  private static final double HEART_HERTZ = 5.8;
  private static final double HEART_SHARE = 0.004;

  private final SlowWave first;
  private final SlowWave second;
  private final SlowWave common;
  private final float[] firstPattern;
  private final float[] secondPattern;

  SlowChanges(DemoScan scan, NormalStream random) {
    first = new SlowWave(200, 700, random);
    second = new SlowWave(150, 400, random);
    common = new SlowWave(25, 90, random);
    firstPattern = pattern(scan, random);
    secondPattern = pattern(scan, random);
  }

  private static float[] pattern(DemoScan scan, NormalStream random) {
    double turn = random.uniform(0, 2 * StrictMath.PI);
    double phase = random.uniform(0, 2 * StrictMath.PI);
    float[] pattern = new float[scan.depths() * scan.laterals()];
    for (int z = 0; z < scan.depths(); z++) {
      for (int x = 0; x < scan.laterals(); x++) {
        double along =
            StrictMath.cos(turn) * z / scan.depths() + StrictMath.sin(turn) * x / scan.laterals();
        pattern[z * scan.laterals() + x] = (float) StrictMath.cos(4 * along + phase);
      }
    }
    return pattern;
  }

  /** What a frame needs: two weights of the patterns and a change common to all voxels. */
  record Frame(double first, double second, double common) {}

  /** The changes at a time, s. */
  Frame at(double seconds) {
    double breath = StrictMath.sin(2 * StrictMath.PI * BREATHING_HERTZ * seconds);
    double heart = StrictMath.sin(2 * StrictMath.PI * HEART_HERTZ * seconds);
    return new Frame(
        DRIFT_SHARE * first.at(seconds),
        DRIFT_SHARE * 0.5 * second.at(seconds),
        COMMON_SHARE * common.at(seconds) + BREATHING_SHARE * breath + HEART_SHARE * heart);
  }

  /** Relative change of a plane's voxel {@code v}. */
  double at(Frame frame, int v) {
    return frame.first * firstPattern[v] + frame.second * secondPattern[v] + frame.common;
  }
}
