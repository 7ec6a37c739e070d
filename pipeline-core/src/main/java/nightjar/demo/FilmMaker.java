package nightjar.demo;

import java.util.Arrays;
import java.util.List;
import nightjar.recording.RigidMotion;
import nightjar.recording.Trial;

/** Makes the frames of a session one after the other. */
final class FilmMaker {
  private static final List<DemoRegion> REGIONS = List.of(DemoRegion.values());

  private final DemoSession session;
  private final DemoTruth truth;
  private final ResponseCurve curve = new ResponseCurve();
  private final Scene[] scenes;
  private final SlowChanges slow;
  private final Speckle speckle;
  private final double[] flashFactor;
  private final double[] flashHaze;
  private int next;

  FilmMaker(DemoSession session, DemoTruth truth) {
    this.session = session;
    this.truth = truth;
    DemoScan scan = session.scan();
    scenes = new Scene[scan.planes()];
    for (int p = 0; p < scenes.length; p++) {
      scenes[p] = Scene.grow(scan, new NormalStream(session.seed(), Purpose.vessels(p)));
    }
    slow = new SlowChanges(scan, new NormalStream(session.seed(), Purpose.SLOW));
    speckle = new Speckle(scan, session.rho());
    flashFactor = new double[scan.frames()];
    flashHaze = new double[scan.frames()];
    Arrays.fill(flashFactor, 1);
    for (Flash flash : truth.flashes()) {
      flashFactor[flash.frame()] = flash.factor();
      flashHaze[flash.frame()] = flash.haze();
    }
  }

  /** Whether a frame is left. */
  boolean hasNext() {
    return next < session.scan().frames();
  }

  /**
   * Makes the next frame; {@code into} is modified, {@code [p][z][x]}, power in units of tissue.
   */
  void next(float[] into) {
    speckle.next(new NormalStream(session.seed(), Purpose.speckle(next)), next == 0);
    for (int p = 0; p < scenes.length; p++) {
      plane(p, into);
    }
    next++;
  }

  private void plane(int p, float[] into) {
    DemoScan scan = session.scan();
    double seconds = scan.frameSeconds(next) + p * scan.sweepSeconds();
    double[] response = responses(seconds);
    SlowChanges.Frame changes = slow.at(seconds);
    Rest rest = new Rest(truth.motion().get(next), scan);
    int planeVoxels = scan.depths() * scan.laterals();
    for (int z = 0; z < scan.depths(); z++) {
      for (int x = 0; x < scan.laterals(); x++) {
        int v = z * scan.laterals() + x;
        double depth = rest.depth(z, x);
        double lateral = rest.lateral(z, x);
        double relative = 1 + slow.at(changes, v);
        for (int k = 0; k < response.length; k++) {
          if (response[k] != 0) {
            relative += response[k] * REGIONS.get(k).weight(depth, lateral, scan);
          }
        }
        double power = scenes[p].at(depth, lateral) * relative;
        double raised = power * flashFactor[next] + flashHaze[next];
        into[p * planeVoxels + v] = (float) (raised * speckle.factor(p * planeVoxels + v));
      }
    }
  }

  /** Relative change of each region at a time. */
  private double[] responses(double seconds) {
    double[] response = new double[REGIONS.size()];
    for (DemoStimulus stimulus : DemoStimulus.values()) {
      List<Trial> trials = truth.events().of(stimulus.label());
      double now = curve.at(seconds, trials);
      for (int k = 0; k < response.length; k++) {
        response[k] += now * session.percent(REGIONS.get(k), stimulus) / 100;
      }
    }
    return response;
  }

  /** Where the tissue seen at a voxel lies at rest. */
  private static final class Rest {
    private final double shiftDepth;
    private final double shiftLateral;
    private final double cos;
    private final double sin;
    private final double centreDepth;
    private final double centreLateral;

    Rest(RigidMotion motion, DemoScan scan) {
      shiftDepth = motion.shiftDepthMillimetres() / scan.spacingMillimetres();
      shiftLateral = motion.shiftLateralMillimetres() / scan.spacingMillimetres();
      double angle = StrictMath.toRadians(motion.rotationDegrees());
      cos = StrictMath.cos(angle);
      sin = StrictMath.sin(angle);
      centreDepth = 0.5 * (scan.depths() - 1);
      centreLateral = 0.5 * (scan.laterals() - 1);
    }

    double depth(int z, int x) {
      double dz = z - shiftDepth - centreDepth;
      double dx = x - shiftLateral - centreLateral;
      return centreDepth + cos * dz + sin * dx;
    }

    double lateral(int z, int x) {
      double dz = z - shiftDepth - centreDepth;
      double dx = x - shiftLateral - centreLateral;
      return centreLateral - sin * dz + cos * dx;
    }
  }
}
