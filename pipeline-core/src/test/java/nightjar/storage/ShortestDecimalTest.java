package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ShortestDecimalTest {
  @ParameterizedTest
  @CsvSource({
    "0.1, 0.1",
    "0.30000000000000004, 0.30000000000000004",
    "-0.0, 0",
    "3, 3",
    "-250, -250",
    "1e15, 1000000000000000",
    "1e17, 1E+17",
    "0.000001, 0.000001",
    "0.00000125, 0.00000125",
    "1.25e-7, 1.25E-7",
    "4.5e-300, 4.5E-300",
    "Infinity, Infinity",
    "-Infinity, -Infinity"
  })
  void writesOrdinaryNumbersPlainly(double value, String text) {
    assertEquals(text, ShortestDecimal.of(value));
  }

  /**
   * Where {@code Double.toString} depends on the version of Java: 17.0.15 gives
   * 1.9999999999999998E23, 9.999999999999999E22 and 8.409999999999999E21, 25 gives these digits
   * (measured).
   */
  @ParameterizedTest
  @CsvSource({"2e23, 2E+23", "1e23, 1E+23", "8.41e21, 8.41E+21"})
  void findsTheShortestOfHardCases(double value, String text) {
    assertEquals(text, ShortestDecimal.of(value));
  }

  /** 2^-44 = 5.68434188608080148...E-14; its 16 rounded digits, ...801, read back as another. */
  @Test
  void roundsAtAPowerOfTwoThoughTheWrongLastDigitWouldReadBackToo() {
    assertEquals(0x1p-44, Double.parseDouble("5.684341886080802E-14"), 0);
    assertEquals("5.6843418860808015E-14", ShortestDecimal.of(0x1p-44));
  }

  @Test
  void everyDoubleReadsBackToTheBit() {
    SplittableRandom random = new SplittableRandom(41);
    for (int i = 0; i < 100_000; i++) {
      double x = Double.longBitsToDouble(random.nextLong());
      if (Double.isFinite(x) && x != 0) {
        assertEquals(x, Double.parseDouble(ShortestDecimal.of(x)), 0, "seed 41, number " + i);
      }
    }
    for (double x : new double[] {Double.MIN_VALUE, Double.MIN_NORMAL, Double.MAX_VALUE}) {
      assertEquals(x, Double.parseDouble(ShortestDecimal.of(x)), 0);
    }
  }

  @Test
  void everyFloatReadsBackToTheBitAndIsNoLongerThanAFloatNeeds() {
    SplittableRandom random = new SplittableRandom(42);
    for (int i = 0; i < 100_000; i++) {
      float x = Float.intBitsToFloat(random.nextInt());
      if (Float.isFinite(x) && x != 0) {
        String text = ShortestDecimal.of(x);
        assertEquals(x, Float.parseFloat(text), 0, "seed 42, number " + i);
        assertTrue(new BigDecimal(text).stripTrailingZeros().precision() <= 9, text);
      }
    }
    assertEquals("0.1", ShortestDecimal.of(0.1f));
    assertEquals("16777216", ShortestDecimal.of(16777216f));
  }

  @Test
  void decimalsOfFewDigitsComeBackAsTheyWere() {
    SplittableRandom random = new SplittableRandom(43);
    for (int i = 0; i < 20_000; i++) {
      BigDecimal d = BigDecimal.valueOf(random.nextLong(1, 1_000_000_000_000L), 6);
      BigDecimal text = new BigDecimal(ShortestDecimal.of(d.doubleValue()));
      assertEquals(0, d.compareTo(text), d + " became " + text);
    }
  }
}
