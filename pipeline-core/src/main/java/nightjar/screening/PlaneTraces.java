package nightjar.screening;

import java.util.Arrays;
import nightjar.film.FloatRows;
import nightjar.numeric.FlooredLog;
import nightjar.numeric.Workers;
import nightjar.recording.FrameTimes;
import nightjar.recording.OutsideField;
import nightjar.recording.Progress;

/**
 * The figures of every frame in one plane, from one pass over the film. ln(power) is taken once a
 * value and kept in a ring of five frames.
 */
final class PlaneTraces {
  private static final int FRAMES_A_BLOCK = 64;
  private static final int HALF_WINDOW = 2;
  private static final int WINDOW = 2 * HALF_WINDOW + 1;

  /** Mean over the inner voxels of ln(power) minus the voxel's level; NaN without a value. */
  final double[] power;

  /** Root mean square difference to the voxelwise median around; NaN without a value. */
  final double[] change;

  /** Mask voxels outside the field. */
  final int[] outside;

  /** Mask voxels without a value that the recording should have. */
  final int[] missing;

  private PlaneTraces(int frames) {
    power = new double[frames];
    change = new double[frames];
    outside = new int[frames];
    missing = new int[frames];
  }

  static PlaneTraces of(
      PlaneVoxels voxels, ScreeningInput in, FlooredLog log, Workers workers, Progress progress) {
    PlaneTraces traces = new PlaneTraces(in.times().size());
    workers.forEachBlock(
        in.times().size(),
        FRAMES_A_BLOCK,
        progress,
        (first, end) -> new Ring(voxels, in.film(), in.outside(), log, traces).run(first, end, in));
    return traces;
  }

  /** First frame of the window around {@code t}, cut at segment borders. */
  private static int from(FrameTimes times, int t) {
    int f = t;
    while (f > 0 && f > t - HALF_WINDOW && times.segment(f - 1) == times.segment(t)) {
      f--;
    }
    return f;
  }

  /** The frame after the window around {@code t}, cut at segment borders. */
  private static int to(FrameTimes times, int t) {
    int e = t + 1;
    while (e < times.size() && e <= t + HALF_WINDOW && times.segment(e) == times.segment(t)) {
      e++;
    }
    return e;
  }

  /** One thread's view: ln(power) minus level of the frames around the current one. */
  private static final class Ring {
    final PlaneVoxels voxels;
    final FloatRows film;
    final OutsideField field;
    final FlooredLog log;
    final PlaneTraces traces;
    final float[] frame;
    final float[][] slots;
    final float[][] window = new float[WINDOW][];
    final float[] median;
    final float[] scratch = new float[WINDOW];
    final int width;

    Ring(
        PlaneVoxels voxels,
        FloatRows film,
        OutsideField field,
        FlooredLog log,
        PlaneTraces traces) {
      this.voxels = voxels;
      this.film = film;
      this.field = field;
      this.log = log;
      this.traces = traces;
      this.width = voxels.inner.length;
      this.frame = new float[voxels.span()];
      this.slots = new float[WINDOW][width];
      this.median = new float[width];
    }

    void run(int first, int end, ScreeningInput in) {
      int loaded = from(in.times(), first);
      for (int t = first; t < end; t++) {
        int from = from(in.times(), t);
        int to = to(in.times(), t);
        for (; loaded < to; loaded++) {
          load(loaded, loaded >= first && loaded < end);
        }
        change(t, from, to);
      }
    }

    private void load(int t, boolean own) {
      film.read(t, voxels.first, frame.length, frame, 0);
      float[] ln = slots[t % WINDOW];
      double sum = 0;
      int values = 0;
      for (int k = 0; k < width; k++) {
        float d = (float) (log.of(frame[voxels.inner[k]]) - voxels.level[k]);
        ln[k] = d;
        if (!Float.isNaN(d)) {
          sum += d;
          values++;
        }
      }
      // The frames around a block are other blocks' to report.
      if (own) {
        traces.power[t] = values == 0 ? Double.NaN : sum / values;
        countGaps(t);
      }
    }

    private void countGaps(int t) {
      for (int i : voxels.mask) {
        if (Float.isNaN(frame[i])) {
          if (field.at(t, voxels.first + i)) {
            traces.outside[t]++;
          } else {
            traces.missing[t]++;
          }
        }
      }
    }

    private void change(int t, int from, int to) {
      int count = to - from;
      for (int i = 0; i < count; i++) {
        window[i] = slots[(from + i) % WINDOW];
      }
      if (count == WINDOW) {
        MedianOfFive.ofFull(window, median, width);
      } else {
        Arrays.fill(median, Float.NaN);
      }
      float[] here = slots[t % WINDOW];
      double sum = 0;
      int values = 0;
      for (int k = 0; k < width; k++) {
        if (Float.isNaN(here[k])) {
          continue;
        }
        // A cut window or a missing neighbour takes the slow way.
        float middle =
            Float.isNaN(median[k]) ? MedianOfFive.of(window, count, k, scratch) : median[k];
        double d = here[k] - middle;
        sum += d * d;
        values++;
      }
      traces.change[t] = values == 0 ? Double.NaN : Math.sqrt(sum / values);
    }
  }
}
