package nightjar.demo;

import java.util.List;
import nightjar.recording.RigidMotion;
import nightjar.recording.Trial;

/**
 * How the brain moves under the probe: slow wandering, breathing, jerks and, in a startled animal,
 * a twitch at each whisker puff. Positive shifts are deeper and towards larger lateral.
 */
final class HeadMotion {
  private static final double BREATHING_HERTZ = 1.1;
  private static final double BREATHING_SHARE = 0.15;
  private static final double DEGREES_A_MILLIMETRE = 3;
  private static final double TWITCH_SECONDS = 0.8;
  private static final int EDGE_FRAMES = 20;

  private HeadMotion() {}

  /** One motion a frame, the same for all planes. */
  static RigidMotion[] draw(DemoSession session, List<Trial> trials) {
    DemoScan scan = session.scan();
    double wander = session.disturbance().wanderMillimetres();
    NormalStream random = new NormalStream(session.seed(), Purpose.MOTION);
    SlowWave depth = new SlowWave(30, 200, random);
    SlowWave lateral = new SlowWave(30, 200, random);
    SlowWave turn = new SlowWave(40, 200, random);
    double[][] jerks = jerks(session.disturbance().jerks(), scan, random);
    RigidMotion[] motion = new RigidMotion[scan.frames()];
    for (int t = 0; t < motion.length; t++) {
      double s = scan.frameSeconds(t);
      double breath = BREATHING_SHARE * StrictMath.sin(2 * StrictMath.PI * BREATHING_HERTZ * s);
      double twitch = session.animal().startleMillimetres() * twitch(s, trials);
      motion[t] =
          new RigidMotion(
              wander * (depth.at(s) + breath) + jerks[t][0] + twitch,
              wander * lateral.at(s) + jerks[t][1] - 0.5 * twitch,
              0,
              DEGREES_A_MILLIMETRE * wander * turn.at(s),
              0,
              0);
    }
    return motion;
  }

  /** Displacements of two to five voxels that last two to four frames; {@code [frame][2]}, mm. */
  private static double[][] jerks(int count, DemoScan scan, NormalStream random) {
    double[][] shift = new double[scan.frames()][2];
    for (int j = 0; j < count; j++) {
      int first = EDGE_FRAMES + random.below(scan.frames() - 2 * EDGE_FRAMES);
      int length = 2 + random.below(3);
      double size = random.uniform(2, 5) * scan.spacingMillimetres();
      double angle = random.uniform(0, 2 * StrictMath.PI);
      for (int t = first; t < first + length; t++) {
        shift[t][0] = size * StrictMath.cos(angle);
        shift[t][1] = size * StrictMath.sin(angle);
      }
    }
    return shift;
  }

  /** At once on a whisker puff, over within seconds; the sham puff startles nobody. */
  private static double twitch(double seconds, List<Trial> trials) {
    double sum = 0;
    for (Trial trial : trials) {
      double since = seconds - trial.onsetSeconds();
      if (since >= 0 && !trial.stimulus().equals(DemoStimulus.SHAM_PUFF.label())) {
        sum += StrictMath.exp(-since / TWITCH_SECONDS);
      }
    }
    return sum;
  }
}
