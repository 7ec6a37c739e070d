package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import nightjar.checks.CheckValues;
import org.junit.jupiter.api.Test;

class StudentTTest {
  @Test
  void tailsAgreeWithTheDefinitionFarOut() {
    for (CheckValues.Row row : CheckValues.read("numeric/tail_t_to_p_z.csv")) {
      double want = 2 * row.number("upper_p");
      double got = StudentT.twoSided(row.number("t"), row.number("df"));
      if (want > 1e-300) {
        assertEquals(want, got, 1e-9 * want, row.toString());
      }
    }
  }

  @Test
  void quantilesAgreeWithTheHandbookTable() {
    for (CheckValues.Row row : CheckValues.read("numeric/quantiles_t.csv")) {
      double want = row.number("exact");
      // The root search stops at 1e-9 in the value.
      assertEquals(
          want,
          StudentT.quantile(row.number("upper"), row.number("df")),
          1e-7 * Math.max(1, want),
          row.toString());
    }
  }

  @Test
  void isEvenAndOneAtZeroAndNeverZeroBeforeTheSmallestDoubles() {
    assertEquals(1, StudentT.twoSided(0, 7.5));
    assertEquals(StudentT.twoSided(-2.5, 30.25), StudentT.twoSided(2.5, 30.25));
    assertTrue(StudentT.twoSided(60, 800) > 0);
    assertTrue(Double.isNaN(StudentT.twoSided(Double.NaN, 5)));
  }
}
