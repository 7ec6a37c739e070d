package nightjar.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.BitSet;
import java.util.SplittableRandom;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;

class BoundaryPathTest {
  private static final Pattern STEP = Pattern.compile("([Mhv])(-?\\d+)(?: (\\d+))?");

  @Test
  void goesAroundASinglePixel() {
    assertEquals("M1 1h1v1h-1v-1z", BoundaryPath.of(3, 3, v -> v == 4));
  }

  @Test
  void joinsNeighboursAndKeepsCornersApart() {
    assertEquals("M0 0h2v1h-2v-1z", BoundaryPath.of(2, 2, v -> v < 2));
    assertEquals("M0 0h1v1h-1v-1zM1 1h1v1h-1v-1z", BoundaryPath.of(2, 2, v -> v == 0 || v == 3));
  }

  @Test
  void isEmptyForNothing() {
    assertEquals("", BoundaryPath.of(5, 4, v -> false));
  }

  /** Green's theorem: clockwise rings, holes against it, sum to the number of pixels. */
  @Test
  void enclosesAsManyPixelsAsAreInside() {
    for (int seed = 0; seed < 300; seed++) {
      SplittableRandom random = new SplittableRandom(seed);
      int width = random.nextInt(1, 12);
      int height = random.nextInt(1, 12);
      BitSet inside = new BitSet();
      for (int v = 0; v < width * height; v++) {
        inside.set(v, random.nextDouble() < 0.6);
      }
      String path = BoundaryPath.of(width, height, inside::get);
      assertEquals(inside.cardinality(), area(path), "seed " + seed + ": " + path);
    }
  }

  private static int area(String path) {
    int x = 0;
    int z = 0;
    int area = 0;
    Matcher m = STEP.matcher(path);
    while (m.find()) {
      int n = Integer.parseInt(m.group(2));
      switch (m.group(1)) {
        case "M" -> {
          x = n;
          z = Integer.parseInt(m.group(3));
        }
        case "h" -> x += n;
        default -> {
          area += x * n;
          z += n;
        }
      }
    }
    return z >= 0 ? area : -1;
  }
}
