package nightjar.mask;

import java.util.ArrayList;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.Progress;
import nightjar.refusal.RefusedInput;

/**
 * The voxels that are analysed (numerics section 4), found once from the kept frames of the aligned
 * film. Immutable.
 */
public final class FinalMask {
  /** A voxel whose content leaves the field in a larger share of the kept frames is left out. */
  private static final double MOST_OUTSIDE = 0.05;

  private final Mask mask;
  private final float[] meanPower;
  private final List<String> leftOut;

  private FinalMask(Mask mask, float[] meanPower, List<String> leftOut) {
    this.mask = mask;
    this.meanPower = meanPower;
    this.leftOut = List.copyOf(leftOut);
  }

  /**
   * What the mask is made from.
   *
   * @param recordingName for messages
   * @param grid of the recording
   * @param settings where voxels come from
   * @param brainMask the recording's own, where it has one
   * @param medianPower of the whole recording; positive
   */
  public record Source(
      String recordingName,
      Grid grid,
      MaskSettings settings,
      Optional<Mask> brainMask,
      double medianPower) {}

  /**
   * Finds the mask.
   *
   * @param film aligned, every frame by every voxel; NaN where missing or outside the field
   * @param framesOutside per voxel, the number of kept frames in which its content was outside the
   *     field; not modified
   * @throws RefusedInput where the recording lacks the mask that the plan names, or none is left
   */
  public static FinalMask of(
      FloatRows film,
      KeptFrames kept,
      int[] framesOutside,
      Source source,
      Workers workers,
      Progress progress) {
    FilmMoments moments = FilmMoments.of(film, kept, workers, progress);
    float[] mean = new float[film.width()];
    for (int v = 0; v < mean.length; v++) {
      mean[v] = (float) moments.mean(v);
    }
    Mask candidates = candidates(source, mean);
    Map<Cause, Integer> counts = new EnumMap<>(Cause.class);
    Mask mask =
        Mask.of(
            candidates.size(),
            v -> {
              if (!candidates.contains(v)) {
                return false;
              }
              Optional<Cause> cause = cause(moments, v, framesOutside[v], kept.count());
              cause.ifPresent(c -> counts.merge(c, 1, Integer::sum));
              return cause.isEmpty();
            });
    List<String> leftOut = sentences(counts);
    if (mask.count() == 0) {
      throw RefusedInput.because("no voxel is left to analyse")
          .in(source.recordingName())
          .found(candidates.count() + " candidates; " + String.join(" ", leftOut).replace(".", ""))
          .remedy("look at the recording, or name another mask source in the plan");
    }
    return new FinalMask(mask, mean, leftOut);
  }

  private static Mask candidates(Source source, float[] mean) {
    return switch (source.settings()) {
      case AUTO -> PowerMask.of(mean, source.grid(), source.medianPower());
      case ALL -> Mask.all(mean.length);
      case RECORDING ->
          source
              .brainMask()
              .orElseThrow(
                  () ->
                      RefusedInput.because("the recording has no variable brain_mask")
                          .in(source.recordingName())
                          .remedy("set mask: {source: auto} in the plan or add the variable"));
    };
  }

  /** Why a voxel leaves the mask. */
  private enum Cause {
    MISSING("a missing value in a kept frame"),
    OUTSIDE("their content outside the field in over 5 % of the kept frames"),
    NOT_POSITIVE("a baseline that is not positive"),
    CONSTANT("a constant value");

    private final String words;

    Cause(String words) {
      this.words = words;
    }
  }

  private static Optional<Cause> cause(FilmMoments m, int v, int outside, int frames) {
    if (outside > MOST_OUTSIDE * frames) {
      return Optional.of(Cause.OUTSIDE);
    }
    if (m.missing(v) > outside) {
      return Optional.of(Cause.MISSING);
    }
    if (!(m.mean(v) > 0)) {
      return Optional.of(Cause.NOT_POSITIVE);
    }
    return m.isConstant(v) ? Optional.of(Cause.CONSTANT) : Optional.empty();
  }

  private static List<String> sentences(Map<Cause, Integer> counts) {
    List<String> s = new ArrayList<>();
    counts.forEach(
        (cause, n) ->
            s.add(
                n
                    + (n == 1 ? " voxel of the mask was" : " voxels of the mask were")
                    + " left out for "
                    + cause.words
                    + "."));
    return s;
  }

  /** The voxels. */
  public Mask mask() {
    return mask;
  }

  /** Mean power over the kept frames, one a voxel of the grid; shared, not copied. */
  public float[] meanPower() {
    return meanPower;
  }

  /** How many voxels were left out, and why; sentences. */
  public List<String> leftOut() {
    return leftOut;
  }
}
