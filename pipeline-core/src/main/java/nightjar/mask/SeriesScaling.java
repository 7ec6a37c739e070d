package nightjar.mask;

import nightjar.film.FloatRows;
import nightjar.film.PercentSeries;
import nightjar.film.Scratch;
import nightjar.numeric.Workers;
import nightjar.recording.Mask;
import nightjar.recording.Progress;
import nightjar.recording.VoxelOrder;
import nightjar.refusal.RefusedInput;

/**
 * From power to percent of each voxel's baseline (numerics section 5). Two passes over the film.
 */
public final class SeriesScaling {
  private static final int FRAMES_A_BLOCK = 32;

  private SeriesScaling() {}

  /**
   * Scales the kept frames: {@code 100 (y/b - 1)} or {@code 100 ln(y/b)}, b the mean over kept
   * frames.
   *
   * @param film not modified; no value is missing in the mask
   * @param mask a final mask
   * @return owned by the caller
   * @throws RefusedInput where the scale takes logarithms and the mask holds a value that is not
   *     positive, or the scratch folder is too small
   * @throws IllegalArgumentException where a mask voxel has no positive baseline
   */
  public static PercentSeries scale(
      KeptFilm film, Mask mask, Scale scale, Scratch scratch, Workers workers, Progress progress) {
    VoxelOrder order = mask.order();
    double[] baseline = baseline(film, order, workers, share -> progress.report(share / 2));
    FloatRows rows = scratch.allocate(film.kept().count(), order.size());
    try {
      workers.forEachBlock(
          rows.rows(),
          FRAMES_A_BLOCK,
          share -> progress.report((1 + share) / 2),
          (first, end) -> {
            float[] frame = new float[film.film().width()];
            float[] series = new float[order.size()];
            for (int r = first; r < end; r++) {
              film.film().read(film.kept().frame(r), 0, frame.length, frame, 0);
              gather(frame, order, series);
              switch (scale) {
                case PERCENT -> percent(series, baseline);
                case LOG_PERCENT -> logPercent(series, baseline, film, order, r);
              }
              rows.write(r, 0, series.length, series, 0);
            }
          });
      return new PercentSeries(rows, order, film.kept(), baseline);
    } catch (RuntimeException e) {
      rows.close();
      throw e;
    }
  }

  private static double[] baseline(
      KeptFilm film, VoxelOrder order, Workers workers, Progress progress) {
    double[] mean = new double[order.size()];
    workers.forEachBlock(
        film.film().width(),
        VoxelTally.TILE,
        progress,
        (first, end) -> {
          int from = order.firstAtOrAfter(first);
          int to = order.firstAtOrAfter(end);
          float[] row = new float[end - first];
          for (int r = 0; r < film.kept().count(); r++) {
            film.film().read(film.kept().frame(r), first, row.length, row, 0);
            for (int k = from; k < to; k++) {
              mean[k] += row[order.voxel(k) - first];
            }
          }
          for (int k = from; k < to; k++) {
            mean[k] /= film.kept().count();
            if (!(mean[k] > 0)) {
              throw new IllegalArgumentException(
                  "baseline " + mean[k] + " of mask voxel " + order.voxel(k));
            }
          }
        });
    return mean;
  }

  private static void gather(float[] frame, VoxelOrder order, float[] series) {
    for (int k = 0; k < series.length; k++) {
      series[k] = frame[order.voxel(k)];
    }
  }

  private static void percent(float[] y, double[] b) {
    for (int k = 0; k < y.length; k++) {
      y[k] = (float) (100 * (y[k] / b[k] - 1));
    }
  }

  private static void logPercent(float[] y, double[] b, KeptFilm film, VoxelOrder order, int row) {
    for (int k = 0; k < y.length; k++) {
      if (!(y[k] > 0)) {
        throw RefusedInput.because("log_percent needs positive power in the mask")
            .in(film.recordingName())
            .at("frame " + film.kept().frame(row) + ", " + film.place(order.voxel(k)))
            .found(y[k])
            .remedy("set the plan's scale to percent");
      }
      y[k] = (float) (100 * Math.log(y[k] / b[k]));
    }
  }
}
