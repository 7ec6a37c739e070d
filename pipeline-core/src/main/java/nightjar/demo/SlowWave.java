package nightjar.demo;

import java.util.ArrayList;
import java.util.List;

/** A sum of cosines with random phases, of unit root mean square over long times. */
final class SlowWave {
  private record Part(double amplitude, double cyclesPerSecond, double phase) {}

  private final List<Part> parts = new ArrayList<>();

  /** Four cosines with periods between the two given, s. */
  SlowWave(double shortestSeconds, double longestSeconds, NormalStream random) {
    int count = 4;
    for (int k = 0; k < count; k++) {
      double period = random.uniform(shortestSeconds, longestSeconds);
      parts.add(
          new Part(StrictMath.sqrt(2.0 / count), 1 / period, random.uniform(0, 2 * StrictMath.PI)));
    }
  }

  /** Value at a time, s. */
  double at(double seconds) {
    double sum = 0;
    for (Part p : parts) {
      sum +=
          p.amplitude * StrictMath.cos(2 * StrictMath.PI * p.cyclesPerSecond * seconds + p.phase);
    }
    return sum;
  }
}
