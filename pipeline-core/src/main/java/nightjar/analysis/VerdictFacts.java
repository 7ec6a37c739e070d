package nightjar.analysis;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import nightjar.design.DesignColumn;
import nightjar.design.DesignMatrix;
import nightjar.design.ModelledStimulus;
import nightjar.design.SessionDesign;
import nightjar.glm.LinearModel;
import nightjar.plan.Plan;
import nightjar.recording.FrameMotion;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.VoxelOrder;
import nightjar.results.FrameFindings;
import nightjar.verdict.SessionFacts;
import nightjar.verdict.TrialCount;

/** Gathers what the verdict rests on (numerics section 14). */
final class VerdictFacts {
  private static final double IN_RESPONSE = 0.5;

  private VerdictFacts() {}

  static SessionFacts of(
      OpenedSession session,
      FrameFindings frames,
      VoxelOrder mask,
      List<LinearModel> models,
      double[] residualSd) {
    Plan plan = session.plan();
    KeptFrames kept = frames.kept();
    boolean[] response = responseFrames(frames.design());
    int inResponse = 0;
    int rejectedInResponse = 0;
    for (int t = 0; t < response.length; t++) {
      inResponse += response[t] ? 1 : 0;
      rejectedInResponse += response[t] && !kept.isKept(t) ? 1 : 0;
    }
    return new SessionFacts(
        kept.frames(),
        kept.frames() - kept.count(),
        inResponse,
        rejectedInResponse,
        medianDisplacement(frames.motion(), kept, mask, session.recording().grid()),
        medianTsnr(residualSd),
        TrialCount.of(session.stimuli(), plan.kernel(), kept),
        inflations(session.stimuli(), models),
        coverage(kept));
  }

  private static boolean[] responseFrames(SessionDesign design) {
    boolean[] in = new boolean[design.ofPlane(0).frames()];
    for (DesignMatrix d : design.planes()) {
      for (DesignColumn c : d.columns()) {
        for (int t = 0; t < in.length && c.kind() == DesignColumn.Kind.STIMULUS; t++) {
          in[t] |= c.at(t) > IN_RESPONSE;
        }
      }
    }
    return in;
  }

  /** Median over kept frames of the mean over mask voxels, in voxels of the smaller spacing. */
  private static double medianDisplacement(
      FrameMotion motion, KeptFrames kept, VoxelOrder mask, Grid grid) {
    double[] shares = new double[motion.units()];
    for (int k = 0; k < mask.size(); k++) {
      shares[shares.length == 1 ? 0 : grid.planeOf(mask.voxel(k))] += 1.0 / mask.size();
    }
    double[] d = new double[kept.count()];
    for (int i = 0; i < d.length; i++) {
      for (int u = 0; u < shares.length; u++) {
        d[i] += shares[u] * motion.displacementMillimetres(kept.frame(i), u);
      }
    }
    return median(d) / grid.smallerSpacingMillimetres();
  }

  private static double medianTsnr(double[] residualSd) {
    return median(Arrays.stream(residualSd).filter(s -> s > 0).map(s -> 100 / s).toArray());
  }

  private static List<SessionFacts.Inflation> inflations(
      List<ModelledStimulus> stimuli, List<LinearModel> models) {
    List<SessionFacts.Inflation> list = new ArrayList<>();
    for (ModelledStimulus s : stimuli) {
      double largest =
          models.stream()
              .mapToDouble(m -> m.basis().varianceInflation(m.basis().design().indexOf(s.name())))
              .max()
              .orElse(Double.NaN);
      list.add(new SessionFacts.Inflation(s.name(), largest));
    }
    return list;
  }

  private static double coverage(KeptFrames kept) {
    FrameTimes times = kept.times();
    double dt = times.intervalSeconds();
    return kept.count() * dt / (times.at(times.size() - 1) - times.at(0) + dt);
  }

  /** NaN for no values. */
  private static double median(double[] values) {
    double[] v = values.clone();
    Arrays.sort(v);
    int n = v.length;
    if (n == 0) {
      return Double.NaN;
    }
    return n % 2 == 1 ? v[n / 2] : 0.5 * (v[n / 2 - 1] + v[n / 2]);
  }
}
