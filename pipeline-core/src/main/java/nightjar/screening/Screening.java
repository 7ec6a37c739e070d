package nightjar.screening;

import java.util.ArrayList;
import java.util.EnumSet;
import java.util.List;
import nightjar.numeric.FlooredLog;
import nightjar.numeric.Workers;
import nightjar.recording.KeptFrames;
import nightjar.recording.Progress;
import org.jspecify.annotations.Nullable;

/**
 * Decides which aligned frames are kept (numerics section 1). Each plane is judged by itself; a
 * frame rejected in one is rejected in all.
 */
public final class Screening {
  private Screening() {}

  /**
   * Judges every frame, in one pass over the film.
   *
   * <p>With {@code settings.enabled()} false only frames with more than half of the mask outside
   * the field or missing are rejected: there is nothing to fit.
   */
  public static FrameJudgement judge(
      ScreeningInput in, ScreeningSettings settings, Workers workers, Progress progress) {
    int planes = in.grid().planes().size();
    FlooredLog log = FlooredLog.ofMedianPower(in.medianPower());
    List<EnumSet<RejectionReason>> reasons = new ArrayList<>();
    for (int t = 0; t < in.times().size(); t++) {
      reasons.add(EnumSet.noneOf(RejectionReason.class));
    }
    PlaneJudge judge = new PlaneJudge(in.times(), settings, reasons);
    OverPlanes over = new OverPlanes(in.times().size());
    for (int p = 0; p < planes; p++) {
      int plane = p;
      PlaneVoxels voxels = PlaneVoxels.of(p, in.grid(), in.mask(), in.film(), log);
      PlaneTraces traces =
          PlaneTraces.of(
              voxels, in, log, workers, share -> progress.report((plane + share) / planes));
      int unit = in.motion().wholeVolume() ? 0 : p;
      double[] displacement = MedianPosition.distances(in.motion(), unit, in.grid(), in.mask());
      judge.judge(traces, voxels.mask.length, in.stimuliOf(p), displacement);
      over.add(traces, voxels);
    }
    List<@Nullable String> codes = new ArrayList<>();
    for (EnumSet<RejectionReason> r : reasons) {
      codes.add(r.isEmpty() ? null : RejectionReason.codes(r));
    }
    return new FrameJudgement(new KeptFrames(in.times(), codes), over.logPower(), over.change());
  }

  /** Means over the inner voxels of all planes. */
  private static final class OverPlanes {
    final double[] power;
    final double[] square;
    final double[] voxels;
    double level;
    int inner;

    OverPlanes(int frames) {
      power = new double[frames];
      square = new double[frames];
      voxels = new double[frames];
    }

    void add(PlaneTraces traces, PlaneVoxels plane) {
      int n = plane.inner.length;
      if (n == 0) {
        return;
      }
      for (int t = 0; t < power.length; t++) {
        if (!Double.isNaN(traces.power[t])) {
          power[t] += n * traces.power[t];
          square[t] += n * traces.change[t] * traces.change[t];
          voxels[t] += n;
        }
      }
      level += n * plane.meanLevel();
      inner += n;
    }

    double[] logPower() {
      double[] mean = new double[power.length];
      for (int t = 0; t < mean.length; t++) {
        mean[t] = level / inner + power[t] / voxels[t];
      }
      return mean;
    }

    double[] change() {
      double[] rms = new double[square.length];
      for (int t = 0; t < rms.length; t++) {
        rms[t] = Math.sqrt(square[t] / voxels[t]);
      }
      return rms;
    }
  }
}
