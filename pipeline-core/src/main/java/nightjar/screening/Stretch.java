package nightjar.screening;

import java.util.ArrayList;
import java.util.List;
import nightjar.recording.FrameTimes;

/**
 * Neighbouring frames.
 *
 * @param first frame, inclusive
 * @param end frame, exclusive
 */
record Stretch(int first, int end) {
  /** The segments of a recording. */
  static List<Stretch> segments(FrameTimes times) {
    List<Stretch> segments = new ArrayList<>();
    int first = 0;
    for (int t = 1; t <= times.size(); t++) {
      if (t == times.size() || times.segment(t) != times.segment(first)) {
        segments.add(new Stretch(first, t));
        first = t;
      }
    }
    return segments;
  }
}
