package nightjar.recording;

import java.util.Arrays;

/**
 * Times of the frames' centres and the frame grid made of them: a step between frames is {@code h =
 * round(step / dt)} grid positions, dt the median interval; h of 2 to 10 are missing frames, a
 * longer step is a gap and starts a new segment. Immutable.
 */
public final class FrameTimes {
  /** A step of more than this many median intervals is a gap. */
  public static final int LONGEST_STEP = 10;

  private final double[] seconds;
  private final int[] gridPositions;
  private final int[] segments;
  private final double[] recordedSeconds;
  private final double intervalSeconds;

  private FrameTimes(
      double[] seconds, int[] gridPositions, int[] segments, double[] recorded, double interval) {
    this.seconds = seconds;
    this.gridPositions = gridPositions;
    this.segments = segments;
    this.recordedSeconds = recorded;
    this.intervalSeconds = interval;
  }

  /** Times in seconds, strictly increasing, at least two; copied. */
  public static FrameTimes of(double[] times) {
    int n = times.length;
    if (n < 2) {
      throw new IllegalArgumentException("at least two frames are needed, not " + n);
    }
    double[] steps = new double[n - 1];
    for (int i = 1; i < n; i++) {
      steps[i - 1] = times[i] - times[i - 1];
      if (!(steps[i - 1] > 0)) {
        throw new IllegalArgumentException("time does not increase at frame " + i);
      }
    }
    double[] sorted = steps.clone();
    Arrays.sort(sorted);
    int m = sorted.length;
    double dt = m % 2 == 1 ? sorted[m / 2] : 0.5 * (sorted[m / 2 - 1] + sorted[m / 2]);
    int[] position = new int[n];
    int[] segment = new int[n];
    double[] recorded = new double[n];
    recorded[0] = dt / 2;
    for (int i = 1; i < n; i++) {
      long h = Math.max(1, Math.round(steps[i - 1] / dt));
      boolean gap = h > LONGEST_STEP;
      position[i] = position[i - 1] + (gap ? 1 : (int) h);
      segment[i] = segment[i - 1] + (gap ? 1 : 0);
      recorded[i] = recorded[i - 1] + (gap ? dt : steps[i - 1]);
    }
    return new FrameTimes(times.clone(), position, segment, recorded, dt);
  }

  /** Number of frames. */
  public int size() {
    return seconds.length;
  }

  /** Centre of frame {@code i}, s. */
  public double at(int i) {
    return seconds[i];
  }

  /** A copy of the times, s. */
  public double[] toArray() {
    return seconds.clone();
  }

  /** The median interval between frames, s. */
  public double intervalSeconds() {
    return intervalSeconds;
  }

  /** Position of frame {@code i} on the frame grid, segments laid end to end. */
  public int gridPosition(int i) {
    return gridPositions[i];
  }

  /** Segment of frame {@code i}, from 0. */
  public int segment(int i) {
    return segments[i];
  }

  /** Number of segments. */
  public int segments() {
    return segments[segments.length - 1] + 1;
  }

  /**
   * Recorded time of frame {@code i}, s: gaps closed to one interval, zero half an interval before
   * the first frame.
   */
  public double recordedSeconds(int i) {
    return recordedSeconds[i];
  }

  /**
   * Total recorded time, s: from half an interval before the first to half an interval after the
   * last frame.
   */
  public double recordedLengthSeconds() {
    return recordedSeconds[recordedSeconds.length - 1] + intervalSeconds / 2;
  }
}
