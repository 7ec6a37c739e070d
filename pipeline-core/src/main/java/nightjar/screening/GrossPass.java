package nightjar.screening;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import java.util.stream.IntStream;
import nightjar.film.FloatRows;
import nightjar.film.Scratch;
import nightjar.numeric.Selection;
import nightjar.numeric.Workers;
import nightjar.recording.FrameSource;
import nightjar.recording.Progress;
import nightjar.refusal.RefusedInput;

/**
 * A first look at the unaligned frames that only keeps artefacts out of the alignment's reference
 * and the provisional mask: frames of unusual mean ln(power) or with most values missing do not
 * pass. Immutable.
 */
public final class GrossPass {
  private static final double Z_LIMIT = 3.5;
  private static final double LEAST_DEVIATION = 0.05;
  private static final double MOST_MISSING = 0.5;
  private static final double FLOOR_SHARE = 1e-3;
  private static final int SAMPLED_FRAMES = 101;
  private static final int SAMPLED_VOXELS = 4096;
  private static final long BLOCK_VALUES = 1L << 20;

  private final boolean[] passed;
  private final double medianPower;
  private final float[] medianImage;
  private final List<Integer> byTypicality;

  private GrossPass(
      boolean[] passed, double medianPower, float[] medianImage, List<Integer> byTypicality) {
    this.passed = passed;
    this.medianPower = medianPower;
    this.medianImage = medianImage;
    this.byTypicality = List.copyOf(byTypicality);
  }

  /**
   * Streams every frame once and a sample of them again.
   *
   * @param recordingName for messages
   * @throws RefusedInput where the recording holds no value, no positive one, or the same
   *     everywhere
   */
  public static GrossPass over(
      FrameSource source,
      String recordingName,
      Scratch scratch,
      Workers workers,
      Progress progress) {
    double medianPower = medianPower(source, recordingName);
    FrameSums sums = new FrameSums(source, FLOOR_SHARE * medianPower);
    sums.run(workers, share -> progress.report(0.7 * share));
    boolean[] passed = passed(sums);
    int[] sample = sample(passed);
    try (FloatRows frames = scratch.allocate(sample.length, source.grid().voxels())) {
      float[] one = new float[frames.width()];
      for (int i = 0; i < sample.length; i++) {
        source.read(sample[i], 1, one, 0);
        frames.write(i, 0, one.length, one, 0);
        progress.report(0.7 + 0.2 * (i + 1) / sample.length);
      }
      float[] median = medianImage(frames, workers);
      double[] distance = distances(frames, median, FLOOR_SHARE * medianPower, workers);
      List<Integer> order =
          IntStream.range(0, sample.length)
              .boxed()
              .sorted(Comparator.comparingDouble(i -> distance[i]))
              .map(i -> sample[i])
              .toList();
      progress.report(1);
      return new GrossPass(passed, medianPower, median, order);
    }
  }

  /** Median of a fixed sample of frames and voxels. */
  private static double medianPower(FrameSource source, String recordingName) {
    int frames = source.times().size();
    int voxels = source.grid().voxels();
    int step = Math.max(1, voxels / SAMPLED_VOXELS);
    int sampled = Math.min(frames, SAMPLED_FRAMES);
    double[] values = new double[sampled * ((voxels + step - 1) / step)];
    float[] one = new float[voxels];
    int n = 0;
    boolean differ = false;
    for (int i = 0; i < sampled; i++) {
      source.read((int) ((long) i * frames / sampled), 1, one, 0);
      for (int v = 0; v < voxels; v += step) {
        if (!Float.isNaN(one[v])) {
          values[n++] = one[v];
          differ |= one[v] != values[0];
        }
      }
    }
    if (n == 0) {
      throw RefusedInput.because("the recording holds no value, all are missing")
          .in(recordingName)
          .remedy("export the power-Doppler frames again");
    }
    if (!differ) {
      throw RefusedInput.because("the recording holds the same value everywhere")
          .in(recordingName)
          .found(values[0])
          .remedy("export the power-Doppler frames again");
    }
    double median = Selection.median(values, n);
    if (!(median > 0)) {
      throw RefusedInput.because("the recording's median power is not positive")
          .in(recordingName)
          .found(median)
          .expected("power, not decibels or differences")
          .remedy("export linear power-Doppler values");
    }
    return median;
  }

  /** Mean ln(power) and missing share of every frame. */
  private static final class FrameSums {
    private final FrameSource source;
    private final float floor;
    private final double[] logPower;
    private final double[] missing;

    FrameSums(FrameSource source, double floor) {
      this.source = source;
      this.floor = (float) floor;
      logPower = new double[source.times().size()];
      missing = new double[logPower.length];
    }

    void run(Workers workers, Progress progress) {
      int voxels = source.grid().voxels();
      int block = (int) Math.max(1, Math.min(64, BLOCK_VALUES / voxels));
      AtomicLong done = new AtomicLong();
      workers.forEachBlock(
          logPower.length,
          block,
          (first, end) -> {
            float[] frames = new float[(end - first) * voxels];
            source.read(first, end - first, frames, 0);
            for (int t = first; t < end; t++) {
              sum(t, frames, (t - first) * voxels, voxels);
            }
            progress.report((double) done.addAndGet(end - first) / logPower.length);
          });
    }

    /** Every voxel for what is missing, a sample of them for the mean. */
    private void sum(int t, float[] frames, int offset, int voxels) {
      int lost = 0;
      for (int v = 0; v < voxels; v++) {
        lost += Float.isNaN(frames[offset + v]) ? 1 : 0;
      }
      int step = Math.max(1, voxels / SAMPLED_VOXELS);
      double sum = 0;
      int n = 0;
      for (int v = 0; v < voxels; v += step) {
        float y = frames[offset + v];
        if (!Float.isNaN(y)) {
          sum += Math.log(Math.max(y, floor));
          n++;
        }
      }
      logPower[t] = sum / n;
      missing[t] = (double) lost / voxels;
    }
  }

  private static boolean[] passed(FrameSums sums) {
    double median = ModifiedZ.median(sums.logPower);
    double[] z = ModifiedZ.of(sums.logPower);
    boolean[] passed = new boolean[z.length];
    int n = 0;
    for (int t = 0; t < z.length; t++) {
      boolean usual =
          Math.abs(z[t]) <= Z_LIMIT || Math.abs(sums.logPower[t] - median) <= LEAST_DEVIATION;
      passed[t] = usual && sums.missing[t] <= MOST_MISSING;
      n += passed[t] ? 1 : 0;
    }
    if (n == 0) {
      Arrays.fill(passed, true);
    }
    return passed;
  }

  private static int[] sample(boolean[] passed) {
    int[] all = IntStream.range(0, passed.length).filter(t -> passed[t]).toArray();
    int n = Math.min(all.length, SAMPLED_FRAMES);
    return IntStream.range(0, n).map(i -> all[(int) ((long) i * all.length / n)]).toArray();
  }

  private static float[] medianImage(FloatRows frames, Workers workers) {
    float[] median = new float[frames.width()];
    workers.forEachBlock(
        median.length,
        1024,
        (first, end) -> {
          float[][] rows = new float[frames.rows()][end - first];
          for (int i = 0; i < rows.length; i++) {
            frames.read(i, first, end - first, rows[i], 0);
          }
          double[] values = new double[rows.length];
          for (int v = first; v < end; v++) {
            int n = 0;
            for (float[] row : rows) {
              if (!Float.isNaN(row[v - first])) {
                values[n++] = row[v - first];
              }
            }
            median[v] = (float) Selection.median(values, n);
          }
        });
    return median;
  }

  /** Standard deviation over voxels of the ln difference to the median image, one a frame. */
  private static double[] distances(
      FloatRows frames, float[] median, double floor, Workers workers) {
    double[] distance = new double[frames.rows()];
    workers.forEachBlock(
        distance.length,
        1,
        (first, end) -> {
          float[] row = new float[frames.width()];
          frames.read(first, 0, row.length, row, 0);
          double sum = 0;
          double squares = 0;
          int n = 0;
          for (int v = 0; v < row.length; v++) {
            if (!Float.isNaN(row[v]) && !Float.isNaN(median[v])) {
              double d = Math.log(Math.max(row[v], floor) / Math.max(median[v], floor));
              sum += d;
              squares += d * d;
              n++;
            }
          }
          distance[first] = n == 0 ? Double.POSITIVE_INFINITY : squares / n - (sum / n) * (sum / n);
        });
    return distance;
  }

  /** Whether frame {@code t} shows no gross artefact. */
  public boolean passed(int t) {
    return passed[t];
  }

  /** Median power of the recording, from a fixed sample of frames and voxels; positive. */
  public double medianPower() {
    return medianPower;
  }

  /** Voxelwise median over a sample of the frames that passed; shared, not copied. */
  public float[] medianImage() {
    return medianImage;
  }

  /** The {@code n} sampled frames (or fewer) that are nearest to the median image. */
  public List<Integer> typicalFrames(int n) {
    return new ArrayList<>(byTypicality.subList(0, Math.min(n, byTypicality.size())));
  }
}
