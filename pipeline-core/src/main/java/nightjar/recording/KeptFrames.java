package nightjar.recording;

import java.util.List;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/** Which frames enter the model, and why the others do not. Immutable. */
public final class KeptFrames {
  private final FrameTimes times;
  private final int[] kept;
  private final List<Optional<String>> reasons;

  /**
   * @param times all frames
   * @param reasons per frame, null = kept, else the reason's code (several joined by {@code +})
   */
  public KeptFrames(FrameTimes times, List<@Nullable String> reasons) {
    this.times = times;
    this.reasons = reasons.stream().<Optional<String>>map(Optional::ofNullable).toList();
    this.kept =
        java.util.stream.IntStream.range(0, times.size())
            .filter(i -> this.reasons.get(i).isEmpty())
            .toArray();
  }

  /** Every frame kept. */
  public static KeptFrames all(FrameTimes times) {
    return new KeptFrames(times, java.util.Collections.nCopies(times.size(), null));
  }

  /** Times of all frames. */
  public FrameTimes times() {
    return times;
  }

  /** Number of kept frames. */
  public int count() {
    return kept.length;
  }

  /** Number of all frames. */
  public int frames() {
    return times.size();
  }

  /** The frame of row {@code row} of a series of kept frames. */
  public int frame(int row) {
    return kept[row];
  }

  /** Whether frame {@code i} is kept. */
  public boolean isKept(int i) {
    return reasons.get(i).isEmpty();
  }

  /** Why frame {@code i} was rejected; empty where it is kept. */
  public Optional<String> reason(int i) {
    return reasons.get(i);
  }
}
