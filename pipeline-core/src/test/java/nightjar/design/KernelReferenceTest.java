package nightjar.design;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import nightjar.checks.CheckValues;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** Kernels against published forms; sources stand in the files. */
class KernelReferenceTest {
  @Test
  void shapeAndScaleFollowFromPeakAndWidth() {
    for (CheckValues.Row row : CheckValues.read("design/gamma_kernel_facts.csv")) {
      double peak = row.number("peak_time") - row.number("delay");
      GammaKernel k = GammaKernel.of(peak, row.number("fwhm"));
      assertEquals(row.number("shape"), k.shape(), 1e-9 * row.number("shape"), row.text("name"));
      assertEquals(row.number("scale"), k.scaleSeconds(), 1e-9 * row.number("scale"));
      assertEquals(row.number("peak_height"), k.at(peak), 1e-10);
    }
  }

  @Test
  void theDefaultKernelsShape() {
    // The shape that follows from peak 2.1 s and width 2.9 s, as printed to six digits.
    assertEquals(3.98358, GammaKernel.of(2.1, 2.9).shape(), 5e-6);
  }

  @Test
  void samplesAreThoseOfBoyntonAndColleagues() {
    GammaKernel k = GammaKernel.of(2 * 1.08, 3.66625512451395);
    for (CheckValues.Row row : CheckValues.read("design/boynton_kernel_samples.csv")) {
      assertEquals(row.number("h"), k.at(row.number("t_s") - 2.05), 1e-10);
    }
  }

  @Test
  void aBoxcarThroughAGammaIsADifferenceOfIncompleteGammas() {
    GammaKernel k = GammaKernel.of(5, 5.306181771776528);
    for (CheckValues.Row row : CheckValues.read("design/boxcar_gamma_convolution.csv")) {
      double t = row.number("t_s");
      assertEquals(row.number("response"), k.cumulative(t) - k.cumulative(t - 5), 1e-10);
    }
  }

  @Test
  void theDoubleGammaIsTheDifferenceOfTwoGammas() {
    // gamma(6,1) - gamma(16,1)/6; ours is scaled to unit area, the published form integrates to
    // 5/6.
    GammaKernel first = GammaKernel.of(5, 5.306181771776528);
    GammaKernel second = new GammaKernel(15, Double.NaN, 16, 1);
    DoubleGammaKernel k = new DoubleGammaKernel(first, second, 1.0 / 6);
    for (CheckValues.Row row : CheckValues.read("design/double_gamma_6_16.csv")) {
      assertEquals(row.number("h"), 5.0 / 6 * k.at(row.number("t_s")), 1e-10);
    }
  }

  @Test
  void glovers1999KernelHasItsPublishedTurningPoints() {
    for (CheckValues.Row row : CheckValues.read("design/glover_double_gamma_facts.csv")) {
      GammaKernel g1 = lobe(row.number("n1"), row.number("t1"));
      GammaKernel g2 = lobe(row.number("n2"), row.number("t2"));
      // Lobes of unit height there, of unit area here.
      double h1 = 1 / g1.at(g1.peakSeconds());
      double h2 = row.number("a2") / g2.at(g2.peakSeconds());
      DoubleGammaKernel k = new DoubleGammaKernel(g1, g2, h2 / h1);
      double scale = h1 * (1 - h2 / h1);
      assertEquals(row.number("peak_value"), scale * k.at(row.number("peak_time")), 1e-9);
      assertEquals(0, k.slope(row.number("peak_time")), 1e-7);
      assertEquals(
          row.number("undershoot_value"), scale * k.at(row.number("undershoot_time")), 1e-9);
      assertEquals(0, k.at(row.number("zero_crossing")), 1e-9);
      assertEquals(row.number("integral"), scale * k.cumulative(200), 1e-7);
    }
  }

  private static GammaKernel lobe(double n, double t) {
    return new GammaKernel(n * t, Double.NaN, n + 1, t);
  }

  @ParameterizedTest
  @CsvSource({"2.1,2.9", "1.6,2.2033", "0.5,0.2", "5,6"})
  void cumulativeAndSlopeBelongToTheDensity(double peak, double width) {
    GammaKernel k = GammaKernel.of(peak, width);
    double h = 1e-5;
    for (double t = 0.05; t < 6 * peak; t += 0.13) {
      assertEquals(k.at(t), (k.cumulative(t + h) - k.cumulative(t - h)) / (2 * h), 1e-7);
      assertEquals(k.slope(t), (k.at(t + h) - k.at(t - h)) / (2 * h), 1e-4);
    }
    assertEquals(0, k.at(0));
    assertEquals(0, k.cumulative(-1));
    assertEquals(1, k.cumulative(1e6));
    assertEquals(k.at(peak) / 2, k.at(halfRise(k, peak)), 1e-9);
  }

  private static double halfRise(GammaKernel k, double peak) {
    double low = 0;
    double high = peak;
    for (int i = 0; i < 100; i++) {
      double mid = (low + high) / 2;
      if (k.at(mid) < k.at(peak) / 2) {
        low = mid;
      } else {
        high = mid;
      }
    }
    // The other root lies the stated width further on.
    assertEquals(k.at(peak) / 2, k.at(low + k.widthSeconds()), 1e-9);
    return low;
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, -1, Double.NaN, 60})
  void refusesWidthsThatNoGammaHas(double width) {
    assertThrows(IllegalArgumentException.class, () -> GammaKernel.of(2.1, width));
  }

  @Test
  void theDefaultKernelLiesWithinPublishedBands() {
    // Sanity only: common practice, no source: time to peak awake 1 to 2.5 s, width 1.5 to 4 s.
    GammaKernel k = GammaKernel.of(2.1, 2.9);
    assertTrue(k.peakSeconds() > 1 && k.peakSeconds() < 2.5);
    assertTrue(k.widthSeconds() > 1.5 && k.widthSeconds() < 4);
  }
}
