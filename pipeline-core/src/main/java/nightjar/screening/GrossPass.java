package nightjar.screening;

import java.util.Arrays;
import java.util.List;
import java.util.stream.IntStream;
import nightjar.numeric.FlooredLog;
import nightjar.numeric.ModifiedScore;
import nightjar.numeric.Workers;
import nightjar.recording.FrameSource;
import nightjar.recording.Progress;
import nightjar.refusal.RefusedInput;

/**
 * What the unaligned frames tell. It only keeps artefacts out of the reference that frames are
 * aligned to, and out of the provisional mask; the judgement of frames comes after alignment.
 * Immutable.
 */
public final class GrossPass {
  /** Modified z-score, mean ln(power) and share of missing values that make a gross artefact. */
  private static final double Z_LIMIT = 3.5;

  private static final double POWER_LIMIT = 0.05;
  private static final double MISSING_LIMIT = 0.05;

  /** Frames that the median image is made of, fewer where they would fill the memory. */
  private static final int IMAGE_FRAMES = 101;

  private static final long IMAGE_VALUES = 50_000_000;

  /**
   * Frames among which the typical ones are sought, evenly spread over those that passed. A choice
   * out of many more would hang on the last digit of their distances: packed to 16 bits, a
   * recording got another reference, and its maps moved by ten times the packing's own error.
   */
  private static final int CANDIDATES = 101;

  private final FrameSums sums;
  private final boolean[] passed;
  private final double medianPower;
  private final float[] medianImage;
  private final List<Integer> typical;

  private GrossPass(
      FrameSums sums,
      boolean[] passed,
      double medianPower,
      float[] medianImage,
      List<Integer> typical) {
    this.sums = sums;
    this.passed = passed;
    this.medianPower = medianPower;
    this.medianImage = medianImage;
    this.typical = typical;
  }

  /**
   * Reads all frames once, and samples of them up to three times.
   *
   * @param recordingName for messages
   * @throws RefusedInput where the recording has no value, no positive value or one value only
   */
  public static GrossPass over(
      String recordingName, FrameSource source, Workers workers, Progress progress) {
    double sampled = SampledPower.median(source);
    // Without a positive value in the sample, any floor will do until the whole is seen.
    FlooredLog log = FlooredLog.ofMedianPower(sampled > 0 ? sampled : 1);
    FrameSums sums = FrameSums.of(source, log, workers, share -> progress.report(0.8 * share));
    double largest = refuseEmptyOrConstant(recordingName, sums);
    double medianPower = sampled > 0 ? sampled : largest;
    boolean[] passed = judge(sums, source.grid().voxels());
    int[] good = IntStream.range(0, passed.length).filter(t -> passed[t]).toArray();
    int imageFrames =
        (int) Math.max(5, Math.min(IMAGE_FRAMES, IMAGE_VALUES / source.grid().voxels()));
    float[] image = TypicalImage.median(source, sample(good, imageFrames), workers);
    progress.report(0.9);
    List<Integer> typical =
        TypicalImage.nearestFirst(source, sample(good, CANDIDATES), image, medianPower, workers);
    progress.report(1);
    return new GrossPass(sums, passed, medianPower, image, typical);
  }

  private static int[] sample(int[] frames, int most) {
    return Arrays.stream(EvenSample.of(frames.length, most)).map(i -> frames[i]).toArray();
  }

  private static double refuseEmptyOrConstant(String recordingName, FrameSums sums) {
    float low = Float.POSITIVE_INFINITY;
    float high = Float.NEGATIVE_INFINITY;
    for (int t = 0; t < sums.missing.length; t++) {
      low = Math.min(low, sums.smallest[t]);
      high = Math.max(high, sums.largest[t]);
    }
    if (low > high) {
      throw RefusedInput.because("the recording holds no value, every one is missing")
          .in(recordingName)
          .remedy("check the fill value and the valid range of its variable");
    }
    if (low == high) {
      throw RefusedInput.because("the recording is constant, every value is the same")
          .in(recordingName)
          .found(low)
          .remedy("check that the right variable was exported");
    }
    if (!(high > 0)) {
      throw RefusedInput.because("the recording holds no positive power")
          .in(recordingName)
          .found("a largest value of " + high)
          .remedy("export power, not its logarithm");
    }
    return high;
  }

  private static boolean[] judge(FrameSums sums, int voxels) {
    double[] share = Arrays.stream(sums.missing).mapToDouble(n -> (double) n / voxels).toArray();
    ModifiedScore power = ModifiedScore.of(sums.meanLogPower);
    ModifiedScore missing = ModifiedScore.of(share);
    boolean[] passed = new boolean[share.length];
    for (int t = 0; t < passed.length; t++) {
      double off = Math.abs(sums.meanLogPower[t] - power.median());
      boolean odd = Math.abs(power.z(sums.meanLogPower[t])) > Z_LIMIT && off > POWER_LIMIT;
      boolean holed = missing.z(share[t]) > Z_LIMIT && share[t] - missing.median() > MISSING_LIMIT;
      passed[t] = sums.missing[t] < voxels && !odd && !holed;
    }
    return passed;
  }

  /** Whether frame {@code t} is no gross artefact; true for at least one frame. */
  public boolean passed(int t) {
    return passed[t];
  }

  /** Number of voxels of the field without a value in frame {@code t}. */
  public int missing(int t) {
    return sums.missing[t];
  }

  /**
   * The recording's median power, positive: an estimate from a fixed sample of at most 101 frames
   * by 10,007 voxels; where half of the sample is not positive, the median of what is.
   */
  public double medianPower() {
    return medianPower;
  }

  /** The smallest value of the whole recording; negative where power was written below zero. */
  public double smallestPower() {
    float low = Float.POSITIVE_INFINITY;
    for (float y : sums.smallest) {
      low = Math.min(low, y);
    }
    return low;
  }

  /**
   * The most typical frames among those that passed, the most typical first: those whose ln(power)
   * is nearest to that of the median image, gain and position included. Sought among at most 501
   * passed frames spread evenly.
   *
   * @return at most {@code n}, fewer where fewer are there
   */
  public List<Integer> typicalFrames(int n) {
    return typical.subList(0, Math.min(n, typical.size()));
  }

  /**
   * Median power per voxel over at most 101 passed frames spread evenly; NaN where all of them lack
   * the voxel; a copy.
   */
  public float[] medianImage() {
    return medianImage.clone();
  }
}
