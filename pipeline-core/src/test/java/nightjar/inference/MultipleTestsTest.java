package nightjar.inference;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import nightjar.checks.CheckValues;
import nightjar.inference.InferenceSettings.Adjustment;
import org.junit.jupiter.api.Test;

class MultipleTestsTest {
  private static void assertColumn(List<CheckValues.Row> rows, String column, Adjustment a) {
    double[] q = MultipleTests.adjust(CheckValues.column(rows, "p"), a);
    assertArrayEquals(CheckValues.column(rows, column), q, 1e-14, column);
  }

  @Test
  void agreesWithTheExampleOfBenjaminiAndHochberg1995() {
    List<CheckValues.Row> rows = CheckValues.read("inference/bh1995_example.csv");
    assertColumn(rows, "BH", Adjustment.BH);
    assertColumn(rows, "BY", Adjustment.BY);
    assertColumn(rows, "bonferroni", Adjustment.BONFERRONI);
    assertColumn(rows, "sidak_stable", Adjustment.SIDAK);
    double[] q = MultipleTests.adjust(CheckValues.column(rows, "p"), Adjustment.BH);
    assertEquals(4, Arrays.stream(q).filter(x -> x < 0.05).count());
  }

  @Test
  void keepsTheOrderAndHandlesTies() {
    List<CheckValues.Row> rows = CheckValues.read("inference/padjust_unsorted_ties.csv");
    assertColumn(rows, "BH", Adjustment.BH);
    assertColumn(rows, "BY", Adjustment.BY);
    assertColumn(rows, "bonferroni", Adjustment.BONFERRONI);
    assertColumn(rows, "sidak", Adjustment.SIDAK);
  }

  @Test
  void missingValuesAreNoTests() {
    double[] with = MultipleTests.adjust(new double[] {0.01, Double.NaN, 0.5}, Adjustment.BH);
    assertArrayEquals(new double[] {0.02, Double.NaN, 0.5}, with, 1e-15);
    assertTrue(MultipleTests.adjust(new double[0], Adjustment.BY).length == 0);
  }
}
