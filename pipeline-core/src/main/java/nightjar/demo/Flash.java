package nightjar.demo;

import java.util.ArrayList;
import java.util.List;

/**
 * One frame whose power is raised.
 *
 * @param frame from 0
 * @param factor multiplies the power
 * @param haze is added to it, in units of tissue at the surface
 */
record Flash(int frame, double factor, double haze) {
  private static final int EDGE_FRAMES = 5;

  /** Bursts of one to four frames; later bursts on the same frame win. */
  static List<Flash> draw(int bursts, int frames, NormalStream random) {
    Flash[] byFrame = new Flash[frames];
    for (int b = 0; b < bursts; b++) {
      int first = EDGE_FRAMES + random.below(frames - 2 * EDGE_FRAMES);
      int length = 1 + random.below(4);
      for (int t = first; t < Math.min(frames, first + length); t++) {
        byFrame[t] = new Flash(t, random.uniform(1.5, 3), random.uniform(0.3, 1.5));
      }
    }
    List<Flash> flashes = new ArrayList<>();
    for (Flash flash : byFrame) {
      if (flash != null) {
        flashes.add(flash);
      }
    }
    return List.copyOf(flashes);
  }
}
