package nightjar.recording;

/**
 * Frames that can be read in any order, any number of times. Reads may come from several threads at
 * once.
 */
public interface FrameSource {
  /** The spatial grid. */
  Grid grid();

  /** The times of the frames. */
  FrameTimes times();

  /**
   * Reads whole frames as they were recorded, unpacked; a missing value is NaN.
   *
   * @param first first frame
   * @param count number of frames
   * @param into modified: {@code count * grid().voxels()} values from {@code offset}, {@code
   *     [t][p][z][x]}
   * @param offset where to begin in {@code into}
   */
  void read(int first, int count, float[] into, int offset);
}
