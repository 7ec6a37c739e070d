package nightjar.mask;

import java.util.Arrays;
import java.util.EnumMap;
import java.util.Map;
import java.util.stream.IntStream;
import nightjar.numeric.FlooredLog;
import nightjar.numeric.Workers;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.OutsideField;
import nightjar.recording.Progress;
import nightjar.refusal.RefusedInput;
import org.jspecify.annotations.Nullable;

/**
 * The voxels to be analysed, decided once from the kept frames of the aligned film (numerics
 * section 4). Immutable.
 */
public final class FinalMask {
  /** A voxel outside the field in a larger share of the kept frames leaves the mask. */
  public static final double LARGEST_SHARE_OUTSIDE = 0.05;

  private final Mask mask;
  private final double[] meanPower;
  private final LeftOut leftOut;

  private FinalMask(Mask mask, double[] meanPower, LeftOut leftOut) {
    this.mask = mask;
    this.meanPower = meanPower;
    this.leftOut = leftOut;
  }

  /**
   * Takes the voxels of the source and leaves out those that cannot be fitted: outside the field in
   * over 5 % of the kept frames, without a value that the recording should have in a kept frame,
   * without a positive baseline, or without variance. A voxel outside the field in fewer kept
   * frames stays; there its value is filled in by the nearest kept one in time.
   *
   * @param film its rows are modified where values are filled in
   * @param outside tells for a missing value whether displacement is the cause
   * @throws RefusedInput where no frame was kept, the recording lacks the brain mask that the plan
   *     asks for, or no voxel is left
   */
  public static FinalMask of(
      KeptFilm film, MaskSource source, OutsideField outside, Workers workers, Progress progress) {
    if (film.kept().count() == 0) {
      throw RefusedInput.because("no frame was kept")
          .in(film.recordingName())
          .remedy("look at the recording, or widen the limits of the plan's screening");
    }
    VoxelTally tally = VoxelTally.of(film, outside, workers, progress);
    double[] mean = new double[tally.sum.length];
    Arrays.setAll(mean, v -> tally.sum[v] / tally.values[v]);
    Mask start = start(film, source, mean);
    int frames = film.kept().count();
    int[] filled =
        IntStream.range(0, mean.length)
            .filter(v -> start.contains(v) && judge(tally, v, frames) == null)
            .filter(v -> tally.outside[v] > 0)
            .toArray();
    EdgeFilling.fill(film, filled, tally.sum, workers);
    for (int v : filled) {
      mean[v] = tally.sum[v] / frames;
    }
    Mask mask = Mask.of(mean.length, v -> start.contains(v) && judge(tally, v, frames) == null);
    LeftOut left = count(tally, start, frames);
    if (mask.count() == 0) {
      throw empty(film, start, left);
    }
    return new FinalMask(mask, mean, left);
  }

  private static Mask start(KeptFilm film, MaskSource source, double[] mean) {
    Grid grid = film.grid();
    return switch (source.setting()) {
      case AUTO -> PowerMask.of(mean, grid, FlooredLog.ofMedianPower(source.medianPower()));
      case ALL -> Mask.all(grid.voxels());
      case RECORDING -> recordingMask(film, source.recordingMask());
    };
  }

  private static Mask recordingMask(KeptFilm film, @Nullable Mask given) {
    if (given == null) {
      throw RefusedInput.because("the plan takes the mask from the recording, which has none")
          .in(film.recordingName())
          .at("variable brain_mask")
          .remedy("add the variable, or set the plan's mask source to auto or all");
    }
    if (given.size() != film.grid().voxels()) {
      throw new IllegalArgumentException(
          given.size() + " voxels of a mask on a grid of " + film.grid().voxels());
    }
    return given;
  }

  private enum Cause {
    LEFT_FIELD,
    MISSING_VALUE,
    NON_POSITIVE_BASELINE,
    NO_VARIANCE
  }

  private static @Nullable Cause judge(VoxelTally tally, int v, int frames) {
    if (tally.outside[v] > LARGEST_SHARE_OUTSIDE * frames) {
      return Cause.LEFT_FIELD;
    }
    if (tally.values[v] + tally.outside[v] < frames || tally.values[v] == 0) {
      return Cause.MISSING_VALUE;
    }
    if (!(tally.sum[v] > 0)) {
      return Cause.NON_POSITIVE_BASELINE;
    }
    return tally.smallest[v] == tally.largest[v] ? Cause.NO_VARIANCE : null;
  }

  private static LeftOut count(VoxelTally tally, Mask start, int frames) {
    Map<Cause, Integer> n = new EnumMap<>(Cause.class);
    for (int v = 0; v < start.size(); v++) {
      Cause cause = start.contains(v) ? judge(tally, v, frames) : null;
      if (cause != null) {
        n.merge(cause, 1, Integer::sum);
      }
    }
    return new LeftOut(
        n.getOrDefault(Cause.LEFT_FIELD, 0),
        n.getOrDefault(Cause.MISSING_VALUE, 0),
        n.getOrDefault(Cause.NON_POSITIVE_BASELINE, 0),
        n.getOrDefault(Cause.NO_VARIANCE, 0));
  }

  private static RefusedInput empty(KeptFilm film, Mask start, LeftOut left) {
    return RefusedInput.because("no voxel is left to analyse")
        .in(film.recordingName())
        .found(
            String.format(
                "%d voxels in the mask's source, of which %d left the field, %d miss a value, %d"
                    + " have no positive mean, %d never change",
                start.count(),
                left.leftField(),
                left.missingValue(),
                left.nonPositiveBaseline(),
                left.noVariance()))
        .remedy("check the recording's values, or set the plan's mask source to all");
  }

  /** The voxels to be analysed; at least one. */
  public Mask mask() {
    return mask;
  }

  /**
   * Mean power over the kept frames of voxel {@code v} of the grid, in the mask or not, values
   * filled in included; NaN where it never has one. In the mask this is the baseline of the film as
   * it stands, before any smoothing.
   */
  public double meanPower(int v) {
    return meanPower[v];
  }

  /** How many voxels of the source left, and why. */
  public LeftOut leftOut() {
    return leftOut;
  }
}
