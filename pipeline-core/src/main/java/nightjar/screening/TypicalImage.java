package nightjar.screening;

import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.stream.IntStream;
import nightjar.numeric.FlooredLog;
import nightjar.numeric.Median;
import nightjar.numeric.Workers;
import nightjar.recording.FrameSource;

/** The voxelwise median of some frames, and which frames are nearest to it. */
final class TypicalImage {
  private static final int VOXELS_A_BLOCK = 1024;
  private static final int FRAMES_A_BLOCK = 8;

  private TypicalImage() {}

  /** Median of the given frames per voxel, NaN left out. */
  static float[] median(FrameSource source, int[] frames, Workers workers) {
    int voxels = source.grid().voxels();
    float[][] rows = new float[frames.length][voxels];
    workers.forEachBlock(
        frames.length,
        FRAMES_A_BLOCK,
        (first, end) -> {
          for (int i = first; i < end; i++) {
            source.read(frames[i], 1, rows[i], 0);
          }
        });
    float[] median = new float[voxels];
    workers.forEachBlock(
        voxels,
        VOXELS_A_BLOCK,
        (first, end) -> {
          float[] values = new float[rows.length];
          for (int v = first; v < end; v++) {
            for (int i = 0; i < values.length; i++) {
              values[i] = rows[i][v];
            }
            median[v] = Median.sorting(values, values.length);
          }
        });
    return median;
  }

  /**
   * The given frames, the nearest to {@code image} first. Only voxels of at least {@code
   * medianPower} are compared: in dim ones outside the brain logarithms show the noise alone.
   */
  static List<Integer> nearestFirst(
      FrameSource source, int[] frames, float[] image, double medianPower, Workers workers) {
    FlooredLog log = FlooredLog.ofMedianPower(medianPower);
    int[] bright = IntStream.range(0, image.length).filter(v -> image[v] >= medianPower).toArray();
    double[] reference = Arrays.stream(bright).mapToDouble(v -> log.of(image[v])).toArray();
    double[] distance = new double[frames.length];
    workers.forEachBlock(
        frames.length,
        FRAMES_A_BLOCK,
        (first, end) -> {
          float[] frame = new float[image.length];
          for (int i = first; i < end; i++) {
            source.read(frames[i], 1, frame, 0);
            distance[i] = distance(frame, bright, reference, log);
          }
        });
    return IntStream.range(0, frames.length)
        .boxed()
        .sorted(Comparator.<Integer>comparingDouble(i -> distance[i]).thenComparing(i -> frames[i]))
        .map(i -> frames[i])
        .toList();
  }

  /** Mean square difference of ln(power) over the voxels that both have. */
  private static double distance(float[] frame, int[] voxels, double[] reference, FlooredLog log) {
    double sum = 0;
    int values = 0;
    for (int k = 0; k < voxels.length; k++) {
      double d = log.of(frame[voxels[k]]) - reference[k];
      if (!Double.isNaN(d)) {
        sum += d * d;
        values++;
      }
    }
    return values == 0 ? Double.POSITIVE_INFINITY : sum / values;
  }
}
