package nightjar.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class NiceTicksTest {
  private static List<String> labels(double low, double high, int most) {
    NiceTicks ticks = NiceTicks.between(low, high, most);
    return ticks.values().stream().map(ticks::label).toList();
  }

  @Test
  void areRoundNumbersWithinTheAxis() {
    assertEquals(List.of("\u22125", "0", "5"), labels(-5.2, 5.2, 4));
    assertEquals(List.of("0.00", "0.02", "0.04"), labels(0, 0.05, 5));
    assertEquals(List.of("8.0", "8.5"), labels(7.9, 8.6, 3));
    assertEquals(List.of("20000", "40000"), labels(1, 50_000, 3));
  }

  @Test
  void zeroHasNoSign() {
    assertEquals(List.of("\u22120.2", "0.0", "0.2"), labels(-0.3, 0.3, 3));
  }

  @Test
  void endsThatAreRoundAreTicksInSpiteOfRounding() {
    assertEquals(List.of("0.1", "0.2", "0.3"), labels(0.1, 0.1 + 0.2, 4));
  }

  @Test
  void areAtMostTheNumberAskedForOnAnyAxis() {
    for (int seed = 0; seed < 2000; seed++) {
      SplittableRandom random = new SplittableRandom(seed);
      double low = (random.nextDouble() - 0.5) * Math.pow(10, random.nextInt(-6, 7));
      double high = low + random.nextDouble(1e-3, 1) * Math.pow(10, random.nextInt(-6, 7));
      int most = random.nextInt(1, 12);
      NiceTicks ticks = NiceTicks.between(low, high, most);
      assertTrue(ticks.values().size() <= most, "seed " + seed);
      double slack = ticks.step() * 1e-6;
      assertTrue(
          ticks.values().stream().allMatch(v -> v >= low - slack && v <= high + slack),
          "seed " + seed);
      // Of steps 1, 2, 5 the next finer one is at worst 2.5 times finer: few ticks means few fit.
      assertTrue(ticks.values().size() >= Math.floor(most / 2.5) - 1, "seed " + seed);
    }
  }

  @Test
  void refusesAnAxisWithoutLength() {
    assertThrows(IllegalArgumentException.class, () -> NiceTicks.between(1, 1, 5));
    assertThrows(IllegalArgumentException.class, () -> NiceTicks.between(Double.NaN, 1, 5));
    assertThrows(
        IllegalArgumentException.class, () -> NiceTicks.between(0, Double.POSITIVE_INFINITY, 5));
  }
}
