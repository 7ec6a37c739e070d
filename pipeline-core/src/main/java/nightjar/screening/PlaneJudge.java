package nightjar.screening;

import java.util.EnumSet;
import java.util.List;
import nightjar.numeric.Median;
import nightjar.numeric.ModifiedScore;
import nightjar.recording.FrameTimes;
import nightjar.recording.NamedSeries;

/** Judges the frames of one plane by its traces (numerics section 1). */
final class PlaneJudge {
  /** A frame with a larger share of the mask outside the field or missing is no frame. */
  private static final double LARGEST_SHARE_LOST = 0.5;

  private final FrameTimes times;
  private final ScreeningSettings settings;
  private final List<EnumSet<RejectionReason>> reasons;

  /**
   * @param reasons one set a frame; reasons are added to it
   */
  PlaneJudge(FrameTimes times, ScreeningSettings settings, List<EnumSet<RejectionReason>> reasons) {
    this.times = times;
    this.settings = settings;
    this.reasons = reasons;
  }

  /**
   * Adds this plane's reasons.
   *
   * @param maskVoxels number of mask voxels of the plane; a plane without any judges nothing
   * @param displacement from the median position, mm, per frame
   */
  void judge(PlaneTraces traces, int maskVoxels, List<NamedSeries> stimuli, double[] displacement) {
    if (maskVoxels == 0) {
      return;
    }
    double[] power = traces.power.clone();
    double[] change = traces.change.clone();
    for (int t = 0; t < times.size(); t++) {
      if (lost(traces, t, maskVoxels)) {
        // What is left of such a frame says nothing about the others.
        power[t] = Double.NaN;
        change[t] = Double.NaN;
      }
    }
    if (!settings.enabled()) {
      return;
    }
    for (int t = 0; t < times.size(); t++) {
      if (displacement[t] > settings.maxDisplacementMillimetres()) {
        reasons.get(t).add(RejectionReason.DISPLACEMENT);
      }
    }
    judgePower(StimulusFit.without(stimuli, power, times, settings.windowFrames()));
    judgeChange(change);
  }

  private boolean lost(PlaneTraces traces, int t, int maskVoxels) {
    double most = LARGEST_SHARE_LOST * maskVoxels;
    if (traces.outside[t] + traces.missing[t] <= most) {
      return false;
    }
    boolean outside = traces.outside[t] > most;
    reasons.get(t).add(outside ? RejectionReason.OUTSIDE : RejectionReason.MISSING);
    return true;
  }

  private void judgePower(double[] power) {
    double[] running = new double[power.length];
    for (Stretch s : Stretch.segments(times)) {
      Median.running(power, s.first(), s.end(), settings.windowFrames(), running);
    }
    double[] deviation = new double[power.length];
    for (int t = 0; t < power.length; t++) {
      deviation[t] = power[t] - running[t];
    }
    ModifiedScore score = ModifiedScore.of(deviation);
    for (int t = 0; t < power.length; t++) {
      if (Math.abs(score.z(deviation[t])) > settings.zLimit()
          && Math.abs(deviation[t]) > settings.minPowerDeviation()) {
        reasons.get(t).add(RejectionReason.POWER);
      }
    }
  }

  private void judgeChange(double[] change) {
    ModifiedScore score = ModifiedScore.of(change);
    for (int t = 0; t < change.length; t++) {
      if (score.z(change[t]) > settings.zLimit()
          && change[t] > settings.minChangeRatio() * score.median()) {
        reasons.get(t).add(RejectionReason.CHANGE);
      }
    }
  }
}
