package nightjar.screening;

import java.util.stream.IntStream;

/** Positions spread evenly over a range: a sample that is the same every time. */
final class EvenSample {
  private EvenSample() {}

  /** At most {@code most} different positions of 0 to {@code n - 1}, ascending. */
  static int[] of(int n, int most) {
    int m = Math.min(n, most);
    return IntStream.range(0, m).map(k -> (int) ((2L * k + 1) * n / (2L * m))).toArray();
  }
}
