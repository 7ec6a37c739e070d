package nightjar.analysis;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** What must not change the results of a whole analysis. */
class SessionInvariantsTest {
  private static final String PLAIN =
      "alignment: {model: none}\nscreening: {enabled: false}\nmask: {source: all}";

  @TempDir Path folder;

  private static void assertSame(double[] expected, double[] found, double tolerance) {
    assertEquals(expected.length, found.length);
    for (int i = 0; i < expected.length; i++) {
      if (Double.isNaN(expected[i])) {
        assertEquals(expected[i], found[i], "value " + i);
      } else {
        assertEquals(expected[i], found[i], tolerance * Math.max(1, Math.abs(expected[i])));
      }
    }
  }

  @Test
  void theUnitOfPowerDoesNotMatter() {
    SmallSession s = new SmallSession(folder);
    Path plan = s.plan("");
    Path one = s.analyse(s.variant("one", f -> f, 0, 1), s.files().events(), plan, 2);
    Path many = s.analyse(s.variant("many", f -> f, 0, 1000), s.files().events(), plan, 2);
    assertSame(SmallSession.map(one, "mask"), SmallSession.map(many, "mask"), 0);
    // Power is float32 (6e-8); alignment takes its logarithm, and t reacts at most a hundredfold.
    assertSame(SmallSession.map(one, "t"), SmallSession.map(many, "t"), 2e-3);
    assertSame(
        SmallSession.map(one, "mean_power"),
        java.util.Arrays.stream(SmallSession.map(many, "mean_power")).map(x -> x / 1000).toArray(),
        1e-3);
  }

  @Test
  void aLaterClockDoesNotMatter() {
    SmallSession s = new SmallSession(folder);
    Path plan = s.plan("");
    Path now = s.analyse(s.variant("now", f -> f, 0, 1), s.files().events(), plan, 2);
    Path later = s.analyse(s.variant("later", f -> f, 1024, 1), s.eventsLater(1024), plan, 2);
    // Times of 1000 s carry 1e-13 s.
    assertSame(SmallSession.map(now, "t"), SmallSession.map(later, "t"), 1e-6);
    assertSame(SmallSession.map(now, "q"), SmallSession.map(later, "q"), 1e-6);
  }

  @Test
  void voxelsAreFittedWhereverTheyLie() {
    SmallSession s = new SmallSession(folder);
    Path plan = s.plan(PLAIN);
    Path plain = s.analyse(s.variant("plain", f -> f, 0, 1), s.files().events(), plan, 2);
    double[] t = SmallSession.map(plain, "t");
    int voxels = SmallSession.map(plain, "mask").length;
    int[] order = shuffled(voxels, 3);
    Path mixed =
        s.analyse(
            s.variant(
                "mixed",
                f -> {
                  float[] g = new float[f.length];
                  for (int v = 0; v < f.length; v++) {
                    g[v] = f[order[v]];
                  }
                  return g;
                },
                0,
                1),
            s.files().events(),
            plan,
            2);
    double[] found = SmallSession.map(mixed, "t");
    double[] expected = new double[t.length];
    for (int i = 0; i < t.length; i++) {
      expected[i] = t[i / voxels * voxels + order[i % voxels]];
    }
    assertArrayEquals(expected, found);
  }

  private static int[] shuffled(int n, long seed) {
    int[] order = new int[n];
    SplittableRandom random = new SplittableRandom(seed);
    for (int i = 0; i < n; i++) {
      int j = random.nextInt(i + 1);
      order[i] = order[j];
      order[j] = i;
    }
    return order;
  }

  @Test
  void threadsDoNotMatterToAnyByte() throws IOException {
    SmallSession s = new SmallSession(folder);
    Path plan = s.plan("smoothing: {fwhm_mm: 0.2}\nnoise: {smoothing_mm: 0.3}");
    Path one = s.analyse(s.files().recording(), s.files().events(), plan, 1);
    for (int threads : List.of(2, 4)) {
      Path more = s.analyse(s.files().recording(), s.files().events(), plan, threads);
      try (Stream<Path> files = Files.list(one)) {
        for (Path f : files.filter(p -> !p.endsWith("run.json")).toList()) {
          assertEquals(
              -1, Files.mismatch(f, more.resolve(f.getFileName())), threads + " threads: " + f);
        }
      }
    }
  }
}
