package nightjar.mask;

import java.util.concurrent.atomic.AtomicLong;
import nightjar.film.FloatRows;
import nightjar.film.PercentSeries;
import nightjar.film.Scratch;
import nightjar.numeric.Workers;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.Progress;
import nightjar.recording.VoxelOrder;
import nightjar.refusal.RefusedInput;

/**
 * From power to percent of each voxel's baseline, the mean b over kept frames (numerics section 5):
 * 100 (y/b - 1) or 100 ln(y/b). A value whose content was outside the field takes the voxel's value
 * of the kept frame before.
 */
public final class SeriesScaling {
  private static final int VOXELS_A_BLOCK = 1024;

  private final FloatRows film;
  private final VoxelOrder order;
  private final KeptFrames kept;
  private final Scale scale;
  private final FloatRows out;
  private final double[] baselines;

  private SeriesScaling(
      FloatRows film, VoxelOrder order, KeptFrames kept, Scale scale, FloatRows out) {
    this.film = film;
    this.order = order;
    this.kept = kept;
    this.scale = scale;
    this.out = out;
    this.baselines = new double[order.size()];
  }

  /**
   * Scales the mask's voxels.
   *
   * @param film aligned, every frame by every voxel; not modified
   * @throws RefusedInput where logarithms are wanted and the mask holds values that are not
   *     positive
   */
  public static PercentSeries scale(
      FloatRows film,
      Mask mask,
      KeptFrames kept,
      Scale scale,
      Scratch scratch,
      Workers workers,
      Progress progress) {
    VoxelOrder order = mask.order();
    FloatRows out = scratch.allocate(kept.count(), order.size());
    SeriesScaling s = new SeriesScaling(film, order, kept, scale, out);
    AtomicLong done = new AtomicLong();
    try {
      workers.forEachBlock(
          order.size(),
          VOXELS_A_BLOCK,
          (first, end) -> {
            s.block(first, end);
            progress.report((double) done.addAndGet(end - first) / order.size());
          });
    } catch (RuntimeException e) {
      out.close();
      throw e;
    }
    return new PercentSeries(out, order, kept, s.baselines);
  }

  private void block(int first, int end) {
    int from = order.voxel(first);
    float[] row = new float[order.voxel(end - 1) - from + 1];
    int[] at = new int[end - first];
    for (int k = 0; k < at.length; k++) {
      at[k] = order.voxel(first + k) - from;
    }
    double[] sum = new double[at.length];
    int[] count = new int[at.length];
    for (int i = 0; i < kept.count(); i++) {
      film.read(kept.frame(i), from, row.length, row, 0);
      for (int k = 0; k < at.length; k++) {
        float y = row[at[k]];
        if (!Float.isNaN(y)) {
          sum[k] += y;
          count[k]++;
        }
      }
    }
    for (int k = 0; k < at.length; k++) {
      baselines[first + k] = sum[k] / count[k];
    }
    float[] scaled = new float[at.length];
    for (int i = 0; i < kept.count(); i++) {
      film.read(kept.frame(i), from, row.length, row, 0);
      for (int k = 0; k < at.length; k++) {
        float y = row[at[k]];
        if (!Float.isNaN(y)) {
          scaled[k] = percent(y, baselines[first + k]);
        }
      }
      out.write(i, first, scaled.length, scaled, 0);
    }
  }

  private float percent(float y, double baseline) {
    if (scale == Scale.PERCENT) {
      return (float) (100 * (y / baseline - 1));
    }
    if (!(y > 0)) {
      throw RefusedInput.because("the plan takes logarithms, and the mask holds power of " + y)
          .at("scale log_percent")
          .remedy("use scale: percent or a mask without such voxels");
    }
    return (float) (100 * Math.log(y / baseline));
  }
}
