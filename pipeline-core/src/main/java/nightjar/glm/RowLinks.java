package nightjar.glm;

import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;

/**
 * How the kept rows follow each other on the frame grid: for each row the lag to the row before it
 * in the same segment. Immutable.
 */
final class RowLinks {
  private final int[] lags;
  private final int[] longLags;
  private final int neighbours;

  private RowLinks(int[] lags) {
    this.lags = lags;
    this.longLags = java.util.Arrays.stream(lags).filter(h -> h > 1).distinct().sorted().toArray();
    this.neighbours = (int) java.util.Arrays.stream(lags).filter(h -> h == 1).count();
  }

  static RowLinks of(KeptFrames kept) {
    FrameTimes times = kept.times();
    int[] lags = new int[kept.count()];
    for (int r = 1; r < lags.length; r++) {
      int before = kept.frame(r - 1);
      int now = kept.frame(r);
      lags[r] =
          times.segment(before) == times.segment(now)
              ? times.gridPosition(now) - times.gridPosition(before)
              : 0;
    }
    return new RowLinks(lags);
  }

  int rows() {
    return lags.length;
  }

  /** Grid positions from the row before; 0 for the first row of a segment. */
  int lag(int row) {
    return lags[row];
  }

  boolean isFirst(int row) {
    return lags[row] == 0;
  }

  boolean isLast(int row) {
    return row + 1 == lags.length || lags[row + 1] == 0;
  }

  /** Number of rows whose row before is the neighbouring frame. */
  int neighbours() {
    return neighbours;
  }

  /** The lags above 1 that occur, ascending. */
  int[] longLags() {
    return longLags.clone();
  }

  /** Number of moments: total, neighbours, ends, and two for each long lag. */
  int moments() {
    return 3 + 2 * longLags.length;
  }

  /**
   * The moment that collects both rows of a pair at lag {@code h} by themselves; the next one
   * collects their product.
   */
  int momentOfLag(int h) {
    return 3 + 2 * java.util.Arrays.binarySearch(longLags, h);
  }
}
