package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class ModifiedScoreReferenceTest {
  /**
   * Uranium isotope ratios [Tietjen & Moore 1972; NIST/SEMATECH e-Handbook 1.3.5.17.1, whose
   * verdict is that 245.57 is the only outlier]; data from memory, median 201.37 and MAD 0.995 by
   * hand. The rule is |z| > 3.5 [Iglewicz & Hoaglin 1993].
   */
  private static final double[] RATIOS = {
    199.31, 199.53, 200.19, 200.82, 201.92, 201.95, 202.18, 245.57
  };

  @Test
  void findsTheOutlierOfThePublishedExample() {
    ModifiedScore score = ModifiedScore.of(RATIOS);
    assertEquals(201.37, score.median(), 1e-10);
    assertEquals(0.995, score.deviation(), 1e-10);
    assertEquals(0.6745 * 44.2 / 0.995, score.z(245.57), 1e-9);
    for (int i = 0; i < 7; i++) {
      assertTrue(Math.abs(score.z(RATIOS[i])) < 3.5, "value " + i);
    }
  }

  @Test
  void missingValuesEnterNothing() {
    ModifiedScore score = ModifiedScore.of(new double[] {1, Double.NaN, 2, 3, 4, 5});
    assertEquals(new ModifiedScore(3, 1), score);
    assertEquals(Double.NaN, score.z(Double.NaN));
  }

  @Test
  void equalValuesScoreZeroAndAnyOtherIsInfinite() {
    ModifiedScore score = ModifiedScore.of(new double[] {2, 2, 2, 7});
    assertEquals(0, score.z(2));
    assertEquals(Double.POSITIVE_INFINITY, score.z(7));
  }
}
