package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.GridVariable;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import ucar.nc2.Attribute;
import ucar.nc2.NetcdfFile;
import ucar.nc2.Variable;

/** Files read back with NetCDF-Java, which shares no code with the writer. */
class GridFileTest {
  private static final Grid FLAT =
      new Grid(Axis.of(0), Axis.of(2, 2.1, 2.2), Axis.of(-0.3, -0.1, 0.1, 0.3, 0.5), false);
  private static final Grid PLANES =
      new Grid(Axis.of(0, 0.4), FLAT.depths(), FLAT.laterals(), true);
  private static final List<String> SPACE = List.of("plane", "depth", "lateral");
  private static final List<String> CONTRASTS = List.of("contrast", "plane", "depth", "lateral");
  private static final Map<String, Integer> TWO = Map.of("contrast", 2);

  @TempDir Path folder;

  private NetcdfFile written(
      Grid grid, Map<String, Integer> dimensions, List<GridVariable> variables) throws IOException {
    return written(grid, dimensions, variables, Map.of());
  }

  private NetcdfFile written(
      Grid grid,
      Map<String, Integer> dimensions,
      List<GridVariable> variables,
      Map<String, Object> attributes)
      throws IOException {
    Path file = folder.resolve("maps.nc");
    GridFile.write(file, grid, dimensions, variables, attributes);
    return NetcdfFile.open(file.toString());
  }

  private static Variable variable(NetcdfFile nc, String name) {
    Variable v = nc.findVariable(name);
    assertNotNull(v, name);
    return v;
  }

  private static Object values(NetcdfFile nc, String name) throws IOException {
    return variable(nc, name).read().copyTo1DJavaArray();
  }

  private static String text(NetcdfFile nc, String variable, String attribute) {
    return variable(nc, variable).findAttribute(attribute).getStringValue();
  }

  private static float[] randomFloats(int n, long seed) {
    SplittableRandom random = new SplittableRandom(seed);
    float[] x = new float[n];
    for (int i = 0; i < n; i++) {
      x[i] = (float) random.nextDouble(-5, 5);
    }
    return x;
  }

  private static GridVariable variable(String name, List<String> dimensions, Object values) {
    return new GridVariable(name, dimensions, values, Map.of());
  }

  @Test
  void coordinatesCarryUnitsAndAxes() throws IOException {
    try (NetcdfFile nc = written(PLANES, Map.of(), List.of())) {
      assertArrayEquals(new double[] {0, 0.4}, (double[]) values(nc, "plane"));
      assertArrayEquals(new double[] {2, 2.1, 2.2}, (double[]) values(nc, "depth"));
      assertArrayEquals(new double[] {-0.3, -0.1, 0.1, 0.3, 0.5}, (double[]) values(nc, "lateral"));
      for (String axis : SPACE) {
        assertEquals("mm", text(nc, axis, "units"));
      }
      assertEquals("Z", text(nc, "depth", "axis"));
      assertEquals("down", text(nc, "depth", "positive"));
      assertEquals("X", text(nc, "lateral", "axis"));
      assertEquals("Y", text(nc, "plane", "axis"));
    }
  }

  @Test
  void everyTypeComesBack() throws IOException {
    float[] t = randomFloats(60, 1);
    double[] p = new double[60];
    int[] clusters = new int[30];
    byte[] mask = new byte[30];
    for (int i = 0; i < 60; i++) {
      p[i] = Math.pow(10, -5.0 * i);
      clusters[i / 2] = i * 70_000 - 1_000_000;
      mask[i / 2] = (byte) (i % 3 - 1);
    }
    List<GridVariable> variables =
        List.of(
            variable("mask", SPACE, mask),
            variable("t", CONTRASTS, t),
            variable("clusters", SPACE, clusters),
            variable("p", CONTRASTS, p));
    try (NetcdfFile nc = written(PLANES, TWO, variables)) {
      assertEquals("contrast plane depth lateral", variable(nc, "t").getDimensionsString());
      assertEquals("plane depth lateral", variable(nc, "mask").getDimensionsString());
      assertArrayEquals(t, (float[]) values(nc, "t"));
      assertArrayEquals(p, (double[]) values(nc, "p"));
      assertArrayEquals(clusters, (int[]) values(nc, "clusters"));
      assertArrayEquals(mask, (byte[]) values(nc, "mask"));
    }
  }

  @Test
  void leavesThePlaneOutWhereTheRecordingHasNone() throws IOException {
    float[] t = randomFloats(30, 2);
    try (NetcdfFile nc = written(FLAT, TWO, List.of(variable("t", CONTRASTS, t)))) {
      assertEquals("contrast depth lateral", variable(nc, "t").getDimensionsString());
      assertArrayEquals(t, (float[]) values(nc, "t"));
      assertNull(nc.findVariable("plane"));
      assertNull(nc.findDimension("plane"));
    }
  }

  /** The default fill values of the format: NC_FILL_FLOAT and NC_FILL_DOUBLE of netcdf.h. */
  @Test
  void missingValuesAreTheFillValueThatTheVariableNames() throws IOException {
    float[] t = randomFloats(15, 3);
    double[] p = new double[15];
    t[4] = Float.NaN;
    p[5] = Double.NaN;
    t[6] = Float.NEGATIVE_INFINITY;
    List<GridVariable> variables = List.of(variable("t", SPACE, t), variable("p", SPACE, p));
    try (NetcdfFile nc = written(FLAT, Map.of(), variables)) {
      float[] storedT = (float[]) values(nc, "t");
      double[] storedP = (double[]) values(nc, "p");
      assertEquals(9.96921e+36f, storedT[4], 0);
      assertEquals(9.969209968386869e+36, storedP[5], 0);
      assertEquals(Float.NEGATIVE_INFINITY, storedT[6], 0);
      Attribute fillT = variable(nc, "t").findAttribute("_FillValue");
      Attribute fillP = variable(nc, "p").findAttribute("_FillValue");
      assertEquals(storedT[4], fillT.getNumericValue());
      assertEquals(storedP[5], fillP.getNumericValue());
    }
  }

  @Test
  void namesAreCharactersOfTheWidthOfTheLongest() throws IOException {
    List<GridVariable> variables =
        List.of(
            variable("contrast_name", List.of("contrast"), List.of("left", "m\u00fcde_puff")),
            variable("kind", List.of("contrast"), List.of("", "")));
    try (NetcdfFile nc = written(FLAT, TWO, variables)) {
      Variable names = variable(nc, "contrast_name");
      assertEquals("contrast contrast_name_length", names.getDimensionsString());
      assertEquals(10, names.getShape(1), "UTF-8 bytes");
      byte[] stored = names.read().getDataAsByteBuffer().array();
      byte[] expected =
          "left\0\0\0\0\0\0m\u00fcde_puff".getBytes(java.nio.charset.StandardCharsets.UTF_8);
      assertArrayEquals(expected, stored);
      assertEquals(1, variable(nc, "kind").getShape(1), "no dimension of length 0");
    }
  }

  @Test
  void attributesKeepTheirTypesAndOrder() throws IOException {
    Map<String, Object> a = new LinkedHashMap<>();
    a.put("units", "percent");
    a.put("degrees_of_freedom", 312.5);
    a.put("window", new double[] {1, 6, 7.5});
    a.put("seed", 20260301L);
    a.put("many", 1L << 40);
    a.put("count", 3);
    a.put("empty", "");
    GridVariable v = new GridVariable("t", SPACE, new float[15], a);
    try (NetcdfFile nc =
        written(FLAT, Map.of(), List.of(v), Map.of("title", "caf\u00e9", "n", 2.5f))) {
      Variable t = variable(nc, "t");
      List<String> names = t.getAttributes().stream().map(Attribute::getShortName).toList();
      assertEquals(
          List.of(
              "units",
              "degrees_of_freedom",
              "window",
              "seed",
              "many",
              "count",
              "empty",
              "_FillValue"),
          names);
      assertEquals("percent", text(nc, "t", "units"));
      assertEquals(312.5, t.findAttribute("degrees_of_freedom").getNumericValue());
      assertEquals(3, t.findAttribute("window").getLength());
      assertEquals(7.5, t.findAttribute("window").getNumericValue(2));
      assertEquals(20260301, t.findAttribute("seed").getNumericValue());
      assertEquals(0x1p40, t.findAttribute("many").getNumericValue());
      assertEquals(3, t.findAttribute("count").getNumericValue());
      assertEquals("caf\u00e9", nc.findGlobalAttribute("title").getStringValue());
      assertEquals(2.5f, nc.findGlobalAttribute("n").getNumericValue());
    }
  }

  /** Sizes around the writer's buffer of 2^18 bytes, with bytes that shift what follows. */
  @ParameterizedTest
  @ValueSource(ints = {1, 3, 32767, 32768, 65535, 65536, 262_143, 262_145})
  void longVariablesComeBackWhole(int laterals) throws IOException {
    double[] lateral = new double[laterals];
    Arrays.setAll(lateral, i -> 0.1 * i);
    Grid grid = new Grid(Axis.of(0), Axis.of(1), Axis.of(lateral), false);
    byte[] mask = new byte[laterals];
    new java.util.Random(5).nextBytes(mask);
    float[] t = randomFloats(laterals, 6);
    List<GridVariable> variables =
        List.of(
            variable("mask", SPACE, mask), variable("t", SPACE, t), variable("x", SPACE, lateral));
    try (NetcdfFile nc = written(grid, Map.of(), variables)) {
      assertArrayEquals(mask, (byte[]) values(nc, "mask"));
      assertArrayEquals(t, (float[]) values(nc, "t"));
      assertArrayEquals(lateral, (double[]) values(nc, "x"));
    }
  }

  @Test
  void theSameInputGivesTheSameBytes() throws IOException {
    List<GridVariable> variables =
        List.of(
            variable("t", SPACE, randomFloats(15, 8)),
            variable("kind", List.of("contrast"), List.of("t", "f")));
    GridFile.write(folder.resolve("a.nc"), FLAT, TWO, variables, Map.of("title", "x"));
    GridFile.write(folder.resolve("b.nc"), FLAT, TWO, variables, Map.of("title", "x"));
    assertEquals(-1, Files.mismatch(folder.resolve("a.nc"), folder.resolve("b.nc")));
    byte[] magic = Arrays.copyOf(Files.readAllBytes(folder.resolve("a.nc")), 4);
    assertArrayEquals(new byte[] {'C', 'D', 'F', 2}, magic);
  }

  @Test
  void replacesALongerFileWhole() throws IOException {
    Path file = folder.resolve("maps.nc");
    Files.write(file, new byte[1_000_000]);
    try (NetcdfFile nc = written(FLAT, Map.of(), List.of(variable("m", SPACE, new byte[15])))) {
      assertNotNull(nc.findVariable("m"));
    }
    assertTrue(Files.size(file) < 2000, Files.size(file) + " bytes");
  }

  @Test
  void refusesWhatWouldMakeAFileThatSaysSomethingElse() {
    assertRefused("t has 14 values", TWO, variable("t", SPACE, new float[14]));
    assertRefused("no dimension stimulus", TWO, variable("b", List.of("stimulus"), new float[2]));
    assertRefused("contrast = 0", Map.of("contrast", 0), variable("m", SPACE, new byte[15]));
    assertRefused("depth = 3", Map.of("depth", 4), variable("m", SPACE, new byte[15]));
    assertRefused("two variables depth", TWO, variable("depth", List.of("depth"), new double[3]));
    assertRefused("class [J", TWO, variable("t", SPACE, new long[15]));
    GridVariable odd = new GridVariable("t", SPACE, new float[15], Map.of("when", List.of()));
    assertRefused("attribute when", TWO, odd);
  }

  private void assertRefused(String part, Map<String, Integer> dimensions, GridVariable v) {
    Path file = folder.resolve("refused.nc");
    IllegalArgumentException e =
        assertThrows(
            IllegalArgumentException.class,
            () -> GridFile.write(file, FLAT, dimensions, List.of(v), Map.of()));
    assertTrue(String.valueOf(e.getMessage()).contains(part), e.getMessage());
    assertTrue(!Files.exists(file), "nothing is written");
  }
}
