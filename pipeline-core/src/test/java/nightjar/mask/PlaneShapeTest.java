package nightjar.mask;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.stream.IntStream;
import nightjar.checks.CheckValues;
import org.junit.jupiter.api.Test;

class PlaneShapeTest {
  @Test
  void largestComponentHasTheSizeThatAnIndependentLabellingGives() {
    List<String> rows =
        CheckValues.read("mask/cluster_grid2d.csv").stream().map(r -> r.text("row")).toList();
    String sizes =
        CheckValues.read("mask/cluster_sizes.csv").stream()
            .filter(r -> r.text("connectivity").equals("8"))
            .map(r -> r.text("sizes_descending"))
            .findFirst()
            .orElseThrow();
    boolean[] inside = cells(String.join("", rows));
    boolean[] largest = new PlaneShape(12, 14).largestComponent(inside);
    assertEquals(Integer.parseInt(sizes.substring(0, sizes.indexOf(" "))), count(largest));
    for (int i = 0; i < inside.length; i++) {
      assertEquals(true, inside[i] || !largest[i]);
    }
  }

  @Test
  void fillsWhatAClosedOutlineSurroundsAndNothingElse() {
    // The outline on the left is closed over edges only; the one on the right is open.
    String outline =
        """
        .......
        ..#.###
        .#.##..
        ..#.###
        .......
        """;
    String filled =
        """
        .......
        ..#.###
        .####..
        ..#.###
        .......
        """;
    assertArrayEquals(cells(filled), new PlaneShape(5, 7).holesFilled(cells(outline)));
  }

  @Test
  void nothingInsideStaysNothing() {
    boolean[] none = new boolean[12];
    assertArrayEquals(none, new PlaneShape(3, 4).largestComponent(none));
    assertArrayEquals(none, new PlaneShape(3, 4).holesFilled(none));
  }

  static boolean[] cells(String picture) {
    String flat = picture.replace("\n", "");
    boolean[] inside = new boolean[flat.length()];
    for (int i = 0; i < inside.length; i++) {
      inside[i] = flat.charAt(i) == '#' || flat.charAt(i) == '1';
    }
    return inside;
  }

  private static long count(boolean[] cells) {
    return IntStream.range(0, cells.length).filter(i -> cells[i]).count();
  }
}
