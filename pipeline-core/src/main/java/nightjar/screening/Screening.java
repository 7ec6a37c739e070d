package nightjar.screening;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import nightjar.numeric.Workers;
import nightjar.recording.KeptFrames;
import nightjar.recording.Progress;
import nightjar.recording.VoxelOrder;
import org.jspecify.annotations.Nullable;

/**
 * Judges aligned frames (numerics section 1): {@code power} and {@code change} by modified z-scores
 * that must also matter in practice, {@code displacement}, {@code outside} and {@code missing} by
 * plain limits. A frame rejected in one plane is rejected in all; it is left out of the model,
 * never filled in.
 */
public final class Screening {
  private static final double FLOOR_SHARE = 1e-3;
  private static final double MOST_LOST = 0.5;

  private final ScreeningInput input;
  private final ScreeningSettings settings;
  private final List<Set<String>> reasons = new ArrayList<>();

  private Screening(ScreeningInput input, ScreeningSettings settings) {
    this.input = input;
    this.settings = settings;
    for (int t = 0; t < input.times().size(); t++) {
      reasons.add(new LinkedHashSet<>());
    }
  }

  /** Judges every frame. Where screening is off only lost frames are rejected. */
  public static FrameJudgement judge(
      ScreeningInput input, ScreeningSettings settings, Workers workers, Progress progress) {
    Screening s = new Screening(input, settings);
    int planes = input.grid().planes().size();
    int frames = input.times().size();
    double[] logPower = new double[frames];
    double[] change = new double[frames];
    double voxels = 0;
    for (int p = 0; p < planes; p++) {
      VoxelOrder inner = ShrunkMask.ofPlane(input.mask(), input.grid(), p);
      if (inner.size() == 0) {
        continue;
      }
      int plane = p;
      LogPowerSeries series =
          LogPowerSeries.of(
              input.film(),
              input.times(),
              inner,
              FLOOR_SHARE * input.medianPower(),
              workers,
              share -> progress.report((plane + share) / planes));
      s.judgePlane(series, p);
      for (int t = 0; t < frames; t++) {
        logPower[t] += inner.size() * series.logPower[t];
        change[t] += inner.size() * series.change[t];
      }
      voxels += inner.size();
    }
    for (int t = 0; t < frames; t++) {
      logPower[t] /= voxels;
      change[t] /= voxels;
    }
    s.judgePlaces();
    return new FrameJudgement(s.kept(), logPower, change);
  }

  private void judgePlane(LogPowerSeries series, int plane) {
    for (int t = 0; t < reasons.size(); t++) {
      if (series.missing[t] > MOST_LOST && input.outsideShare().applyAsDouble(t) <= MOST_LOST) {
        reasons.get(t).add("missing");
      }
    }
    if (!settings.enabled()) {
      return;
    }
    double[] response =
        StimulusShare.of(
            series.logPower, input.stimuli().apply(plane), input.times(), settings.windowFrames());
    double[] rest = new double[response.length];
    Arrays.setAll(rest, t -> series.logPower[t] - response[t]);
    double[] base = RunningMedian.of(rest, settings.windowFrames(), input.times());
    double[] deviation = new double[rest.length];
    Arrays.setAll(deviation, t -> rest[t] - base[t]);
    double[] powerZ = ModifiedZ.of(deviation);
    double[] changeZ = ModifiedZ.of(series.change);
    double usualChange = ModifiedZ.median(series.change);
    for (int t = 0; t < rest.length; t++) {
      if (Math.abs(powerZ[t]) > settings.zLimit()
          && Math.abs(deviation[t]) > settings.minPowerDeviation()) {
        reasons.get(t).add("power");
      }
      if (changeZ[t] > settings.zLimit()
          && series.change[t] > settings.minChangeRatio() * usualChange) {
        reasons.get(t).add("change");
      }
    }
  }

  private void judgePlaces() {
    double[] displacement = Displacements.of(input.motion(), input.grid());
    for (int t = 0; t < reasons.size(); t++) {
      if (settings.enabled() && displacement[t] > settings.maxDisplacementMillimetres()) {
        reasons.get(t).add("displacement");
      }
      if (input.outsideShare().applyAsDouble(t) > MOST_LOST) {
        reasons.get(t).add("outside");
      }
    }
  }

  private KeptFrames kept() {
    List<@Nullable String> joined = new ArrayList<>();
    for (Set<String> r : reasons) {
      joined.add(r.isEmpty() ? null : String.join("+", r));
    }
    return new KeptFrames(input.times(), joined);
  }
}
