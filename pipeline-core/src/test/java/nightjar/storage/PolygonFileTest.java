package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.Region;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PolygonFileTest {
  /** Voxels of 0.05 mm deep and 0.1 mm wide: lateral -5 to 5 mm, depth 2 to 10 mm. */
  private static final Grid GRID =
      new Grid(Axis.of(0), axis(2, 0.05, 161), axis(-5, 0.1, 101), false);

  private static final Grid PLANES =
      new Grid(Axis.of(0, 0.5, 1), GRID.depths(), GRID.laterals(), true);
  private static final String TRIANGLE = "[[0, 3], [1, 3], [0, 4]]";

  @TempDir private Path folder;

  private static Axis axis(double from, double step, int n) {
    return Axis.of(IntStream.range(0, n).mapToDouble(i -> from + step * i).toArray());
  }

  private List<Region> read(String json, Grid grid) {
    byte[] bytes = json.getBytes(StandardCharsets.UTF_8);
    return PolygonFile.read(Fixture.file("regions.json", bytes, folder), grid).regions();
  }

  private Mask only(String points) {
    return read("[" + polygon("a", points) + "]", GRID).get(0).voxels();
  }

  private String refusal(String json, Grid grid) {
    return assertThrows(RefusedInput.class, () -> read(json, grid)).getMessage();
  }

  private static String polygon(String name, String points) {
    return "{\"name\": \"" + name + "\", \"points\": " + points + "}";
  }

  private static String polygon(String name, int plane, String points) {
    return "{\"name\": \"" + name + "\", \"plane\": " + plane + ", \"points\": " + points + "}";
  }

  private static String circle(double x, double z, double radius, int corners) {
    StringBuilder s = new StringBuilder("[");
    for (int i = 0; i < corners; i++) {
      double a = 2 * Math.PI * i / corners;
      s.append(i == 0 ? "" : ",")
          .append(
              String.format(
                  Locale.ROOT, "[%.9f,%.9f]", x + radius * Math.cos(a), z + radius * Math.sin(a)));
    }
    return s.append("]").toString();
  }

  @Test
  void aRectangleHoldsExactlyTheCentresWithin() {
    Mask m = only("[[-0.04, 2.96], [0.24, 2.96], [0.24, 3.07], [-0.04, 3.07]]");
    assertEquals(3 * 2, m.count(), "laterals 0, 0.1, 0.2 and depths 3, 3.05");
  }

  /** Each voxel counted wrongly lies within half a voxel of the outline. */
  @Test
  void areasAreThoseOfGeometry() {
    assertArea(Math.PI * 4, 4 * Math.PI, circle(0.013, 6.007, 2, 3600));
    assertArea(0.5 * 4 * 3, 12, "[[-2.013, 4.007], [1.987, 4.007], [-2.013, 7.007]]");
    assertArea(
        1.5 * 0.25 + 0.25 * 0.75 + 0.25 * 2.25,
        9.5,
        "[[0,3],[1.5,3],[1.5,4],[1.25,4],[1.25,3.25],[0.25,3.25],[0.25,5.5],[0,5.5]]");
  }

  private void assertArea(double area, double outline, String points) {
    Grid fine = new Grid(Axis.of(0), axis(2, 0.01, 801), axis(-5, 0.02, 501), false);
    int voxels = read("[" + polygon("a", points) + "]", fine).get(0).voxels().count();
    assertEquals(area, voxels * 0.01 * 0.02, outline * 0.02 / 2);
  }

  @Test
  void theEvenOddRuleLeavesThePentagonOfAStarOut() {
    StringBuilder s = new StringBuilder("[");
    for (int i = 0; i < 5; i++) {
      double a = 2 * Math.PI * (2 * i) / 5;
      s.append(i == 0 ? "" : ",")
          .append(String.format(Locale.ROOT, "[%.9f,%.9f]", 2 * Math.sin(a), 6 - 2 * Math.cos(a)));
    }
    Mask star = only(s.append("]").toString());
    assertFalse(star.contains(GRID.index(0, 80, 50)), "the centre is crossed twice");
    assertTrue(star.contains(GRID.index(0, 45, 50)), "the upper tip is crossed once");
  }

  @Test
  void directionAndFirstCornerMakeNoDifference() {
    Mask wanted = only("[[0, 3], [2, 3.5], [1, 6]]");
    assertTrue(wanted.count() > 100);
    assertEquals(wanted, only("[[1, 6], [2, 3.5], [0, 3]]"));
    assertEquals(wanted, only("[[2, 3.5], [1, 6], [0, 3]]"));
    assertEquals(wanted, only("[[0, 3], [2, 3.5], [1, 6], [0, 3]]"), "closed by the writer");
  }

  /** A field cut into triangles around random points: every centre lies in exactly one. */
  @Test
  void polygonsWithCommonEdgesShareNoVoxelAndLeaveNoneOut() {
    SplittableRandom random = new SplittableRandom(11);
    for (int i = 0; i < 30; i++) {
      // Half of the apexes lie on voxel centres, so that edges run through centres.
      double x = random.nextInt(-40, 40) * 0.1 + (i % 2) * random.nextDouble();
      double z = 3 + random.nextInt(100) * 0.05 + (i % 2) * random.nextDouble();
      String apex = "[" + x + "," + z + "]";
      String[] corner = {"[-5.01,1.99]", "[5.01,1.99]", "[5.01,10.01]", "[-5.01,10.01]"};
      StringBuilder s = new StringBuilder("[");
      for (int k = 0; k < 4; k++) {
        String points = "[" + apex + "," + corner[k] + "," + corner[(k + 1) % 4] + "]";
        s.append(k == 0 ? "" : ",").append(polygon("r" + k, points));
      }
      int sum = 0;
      Mask union = Mask.of(GRID.voxels(), v -> false);
      for (Region r : read(s.append("]").toString(), GRID)) {
        sum += r.voxels().count();
        Mask before = union;
        union = Mask.of(GRID.voxels(), v -> before.contains(v) || r.voxels().contains(v));
      }
      assertEquals(GRID.voxels(), union.count(), "apex " + apex);
      assertEquals(GRID.voxels(), sum, "apex " + apex);
    }
  }

  @Test
  void polygonsOfOneNameOnSeveralPlanesAreOneRegion() {
    List<Region> regions =
        read(
            "["
                + String.join(
                    ",",
                    polygon("V1", 2, TRIANGLE),
                    polygon("septum.left-2_b", 0, TRIANGLE),
                    polygon("V1", 0, TRIANGLE))
                + "]",
            PLANES);
    assertEquals(List.of("V1", "septum.left-2_b"), regions.stream().map(Region::name).toList());
    Mask v1 = regions.get(0).voxels();
    assertEquals(2 * regions.get(1).voxels().count(), v1.count());
    assertTrue(v1.contains(PLANES.index(2, 22, 52)) && v1.contains(PLANES.index(0, 22, 52)));
    assertFalse(v1.contains(PLANES.index(1, 22, 52)));
  }

  @Test
  void aRegionOutsideTheFieldIsEmpty() {
    String far = "[[50, 3], [51, 3], [50, 4]]";
    List<Region> r = read("[" + polygon("a", far) + "," + polygon("b", TRIANGLE) + "]", GRID);
    assertEquals(0, r.get(0).voxels().count());
  }

  @Test
  void refusesMicrometres() {
    String s = refusal("[" + polygon("a", "[[100,3000],[900,3000],[100,4000]]") + "]", GRID);
    assertTrue(s.startsWith("regions.json: no voxel lies within any polygon"), s);
    assertTrue(s.contains("[100,3000]") && s.contains("lateral -5 to 5 mm, depth 2 to 10 mm"), s);
  }

  @ParameterizedTest
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      value = {
        "{} | regions.json: this is not a list of polygons (found \"{}\"",
        "[] | regions.json: this is not a list of polygons (found 0 polygons",
        "null | regions.json: this is not a list of polygons (found \"null\"",
        "[3] | regions.json, polygon 1: the entry is not a polygon (found \"3\"",
        "[{'name':'a','plan':0,'points':T}] | polygon 1: there is an unknown key (found \"plan\"",
        "[{'points':T}] | polygon 1: the key name is missing",
        "[{'name':'a'}] | polygon 1: the key points is missing",
        "[{'name':'a b','points':T}] | polygon 1: the name of the region is not allowed (found",
        "[{'name':'','points':T}] | the name of the region is not allowed",
        "[{'name':'é','points':T}] | the name of the region is not allowed",
        "[{'name':'a\\n','points':T}] | the name of the region is not allowed",
        "[{'name':7,'points':T}] | the name of the region is not allowed (found \"7\"",
        "[{'name':'a','plane':1,'points':T}] | does not have this plane (found \"1\", expected 0)",
        "[{'name':'a','plane':-1,'points':T}] | does not have this plane (found \"-1\"",
        "[{'name':'a','plane':0.5,'points':T}] | does not have this plane (found \"0.5\"",
        "[{'name':'a','plane':4294967296,'points':T}] | does not have this plane",
        "[{'name':'a','plane':null,'points':T}] | does not have this plane (found \"null\"",
        "[{'name':'a','points':[[0,3],[1,3]]}] | the polygon has too few points (found 2",
        "[{'name':'a','points':{}}] | the polygon has too few points (found \"{}\"",
        "[{'name':'a','points':[[0,3],[1,3],[1]]}] | point 3 is not a pair of finite numbers",
        "[{'name':'a','points':[[0,3],[1,'3'],[1,1]]}] | point 2 is not a pair of finite numbers",
        "[{'name':'a','points':[[0,1e999],[1,3],[1,1]]}] | point 1 is not a pair of finite",
        "[{'name':'a','points':T},{'name':'a','plane':0,'points':T}] | polygon 2: the region is there twice on plane 0 (found a)",
      })
  void refusesInOneSentence(String json, String what) {
    String s = refusal(json.replace('\'', '"').replace("T", TRIANGLE), GRID);
    assertTrue(s.startsWith("regions.json") && s.contains(what), s);
    assertTrue(s.contains("; ") && s.endsWith("."), s);
  }

  @Test
  void refusesLongNamesAndAcceptsSixtyFourLetters() {
    assertEquals(1, read("[" + polygon("n".repeat(64), TRIANGLE) + "]", GRID).size());
    assertTrue(refusal("[" + polygon("n".repeat(65), TRIANGLE) + "]", GRID).contains("1 to 64"));
  }

  @Test
  void refusesAPolygonWithoutPlaneWhereThereAreSeveral() {
    String s = refusal("[" + polygon("a", TRIANGLE) + "]", PLANES);
    assertTrue(s.contains("polygon 1: the key plane is missing"), s);
    assertTrue(refusal("[" + polygon("a", 3, TRIANGLE) + "]", PLANES).contains("expected 0 to 2"));
  }

  @Test
  void refusesBadJsonWithLineAndColumn() {
    String s = refusal("[\n  {\"name\": \"a\",\n   \"points\": [[0, 3] [1, 3]]}\n]", GRID);
    assertTrue(s.startsWith("regions.json, line 3, column 22: the text is not valid JSON"), s);
    s = refusal("[{\"name\": \"a\", \"name\": \"b\"}]", GRID);
    assertTrue(s.startsWith("regions.json, line 1, column 22: a key is there twice"), s);
    assertTrue(refusal("[", GRID).contains("not valid JSON"));
    assertTrue(refusal("[] []", GRID).contains("not valid JSON"));
    assertTrue(refusal("[".repeat(100_000), GRID).contains("not valid JSON"));
    assertTrue(refusal("[NaN]", GRID).contains("not valid JSON"));
    assertTrue(refusal(" ", GRID).contains("the file is empty"));
  }

  @Test
  void damagedTextIsReadOrRefused() {
    String whole = "[" + polygon("V1", 2, TRIANGLE) + "," + polygon("M1", 0, TRIANGLE) + "]";
    String nasty = "{}[],:\"\\0123456789.-+eE \n/aNn";
    SplittableRandom random = new SplittableRandom(20260303);
    int good = 0;
    for (int i = 0; i < 3000; i++) {
      StringBuilder s = new StringBuilder(whole);
      for (int k = random.nextInt(1, 4); k > 0; k--) {
        s.setCharAt(random.nextInt(s.length()), nasty.charAt(random.nextInt(nasty.length())));
      }
      try {
        read(s.toString(), PLANES);
        good++;
      } catch (RefusedInput e) {
        assertTrue(e.getMessage().matches("regions\\.json[,:] .*"), e.getMessage());
      }
    }
    assertTrue(good > 50 && good < 2950, good + " of 3000 were read: the damage is no test");
  }
}
