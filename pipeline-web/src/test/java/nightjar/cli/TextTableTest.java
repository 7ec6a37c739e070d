package nightjar.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.List;
import org.junit.jupiter.api.Test;

class TextTableTest {
  @Test
  void textStandsLeftAndNumbersRight() {
    TextTable table = new TextTable(List.of("region", "t", "95 % interval", "q"));
    table.add(List.of("barrel_left", "-2.5", "-1.00 to 2.00", "3.0e-18"));
    table.add(List.of("thalamus", "10.25", "", "0.5"));
    assertEquals(
        """
        region           t  95 % interval        q
        barrel_left   -2.5  -1.00 to 2.00  3.0e-18
        thalamus     10.25                     0.5
        """,
        table.toString());
  }

  @Test
  void aColumnWithOneWordIsText() {
    TextTable table = new TextTable(List.of("a", "b"));
    table.add(List.of("1", "1"));
    table.add(List.of("none", "22"));
    assertEquals("a      b\n1      1\nnone  22\n", table.toString());
  }

  @Test
  void aRowOfAnotherLengthIsOurFault() {
    TextTable table = new TextTable(List.of("a", "b"));
    assertThrows(IllegalArgumentException.class, () -> table.add(List.of("1")));
  }
}
