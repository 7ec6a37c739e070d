package nightjar.checks;

import java.util.stream.IntStream;
import nightjar.recording.Axis;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;

/** Small grids and clocks. */
public final class Grids {
  private Grids() {}

  /** Spacing 0.1 mm within planes, 0.4 mm between them. */
  public static Grid of(int planes, int depths, int laterals) {
    return new Grid(axis(planes, 0.4), axis(depths, 0.1), axis(laterals, 0.1), planes > 1);
  }

  /** Frames every 0.4 s. */
  public static FrameTimes everyFrame(int frames) {
    return FrameTimes.of(IntStream.range(0, frames).mapToDouble(t -> 0.4 * t).toArray());
  }

  /** Frames every 0.4 s, 17 s of gap before frame {@code gapBefore}. */
  public static FrameTimes withGap(int frames, int gapBefore) {
    return FrameTimes.of(
        IntStream.range(0, frames).mapToDouble(t -> 0.4 * t + (t < gapBefore ? 0 : 17)).toArray());
  }

  private static Axis axis(int n, double spacing) {
    return Axis.of(IntStream.range(0, n).mapToDouble(i -> spacing * i).toArray());
  }
}
