package nightjar.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.util.Arrays;
import java.util.Base64;
import java.util.List;
import java.util.stream.IntStream;
import javax.imageio.ImageIO;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.Region;
import nightjar.recording.RegionLabels;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;

class MapFigureTest {
  private static Grid grid(int planes, int depths, int laterals) {
    return new Grid(axis(planes, 0.5), axis(depths, 0.1), axis(laterals, 0.1), planes > 1);
  }

  private static Axis axis(int n, double step) {
    return Axis.of(IntStream.range(0, n).mapToDouble(i -> 1 + i * step).toArray());
  }

  private static float[] filled(Grid grid, float value) {
    float[] v = new float[grid.voxels()];
    Arrays.fill(v, value);
    return v;
  }

  private static int pixel(Document svg, int image, int x, int z) {
    Element e = (Element) svg.getElementsByTagName("image").item(image);
    String base64 = e.getAttribute("href").substring("data:image/png;base64,".length());
    try {
      BufferedImage png =
          ImageIO.read(new ByteArrayInputStream(Base64.getDecoder().decode(base64)));
      return png.getRGB(x, z);
    } catch (IOException error) {
      throw new AssertionError(error);
    }
  }

  @Test
  void drawsOneImageAPlaneAndTheLegendBesideIt() {
    for (int planes : new int[] {1, 2, 7, 40}) {
      Grid g = grid(planes, 8, 10);
      Document svg = Svgs.parse(MapFigure.ofPower("power", g, filled(g, 3)).svg());
      assertEquals(planes + 1, Svgs.count(svg, "image"));
    }
  }

  @Test
  void showsIncreaseInOrangeAndDecreaseInPurpleAndFadesTheRest() {
    Grid g = grid(1, 2, 3);
    float[] effect = {10, -10, 5, Float.NaN, 0, -5};
    float[] t = {8, -8, 2, Float.NaN, 0, -1};
    Mask significant = Mask.of(6, v -> v < 2);
    Document svg =
        Svgs.parse(
            MapFigure.ofPower("map", g, filled(g, 3))
                .withOverlay(new Overlay("effect", "%", effect, t, significant))
                .svg());
    assertEquals(0xff7f3b08, pixel(svg, 1, 0, 0));
    assertEquals(0xff2d004b, pixel(svg, 1, 1, 0));
    int weak = pixel(svg, 1, 2, 0) >>> 24;
    int weaker = pixel(svg, 1, 2, 1) >>> 24;
    assertTrue(weak > weaker && weak < 255 && weaker > 0, weak + " " + weaker);
    assertEquals(0, pixel(svg, 1, 0, 1) >>> 24);
  }

  @Test
  void powerIsLogarithmicGrey() {
    Grid g = grid(1, 1, 3);
    Document svg = Svgs.parse(MapFigure.ofPower("power", g, new float[] {1, 100, 10_000}).svg());
    assertEquals(0xff000000, pixel(svg, 0, 0, 0));
    // Percentiles of three values: 1 is black, 100 is the 99.5th rounded down and already white.
    assertEquals(0xffffffff, pixel(svg, 0, 2, 0));
    PowerGrey grey = new PowerGrey(Math.log(1), Math.log(10_000));
    assertEquals(128, grey.level(100));
    assertEquals(40, grey.rangeDecibel(), 1e-9);
  }

  @Test
  void survivesValuesThatAreAllMissing() {
    Grid g = grid(3, 4, 5);
    float[] none = filled(g, Float.NaN);
    Document svg =
        Svgs.parse(
            MapFigure.ofPower("nothing", g, none)
                .withOverlay(new Overlay("t", "", none, none, Mask.of(g.voxels(), v -> false)))
                .withOutlines(
                    List.of(
                        new Outline(
                            "q < 0.05", Mask.of(g.voxels(), v -> false), Outline.Stroke.DASHED)))
                .svg());
    assertEquals(0, pixel(svg, 1, 2, 2) >>> 24);
  }

  @Test
  void drawsASingleVoxel() {
    Grid g = grid(1, 1, 1);
    assertEquals(
        2, Svgs.count(Svgs.parse(MapFigure.ofPower("dot", g, filled(g, 1)).svg()), "image"));
  }

  @Test
  void outlinesAreDashedForSharesOfFalseDiscoveriesAndSolidForFamilyWiseLimits() {
    Grid g = grid(1, 3, 3);
    Mask middle = Mask.of(9, v -> v == 4);
    MapFigure figure = MapFigure.ofPower("map", g, filled(g, 1));
    Outline dashed = new Outline("q", middle, Outline.Stroke.DASHED);
    Outline solid = new Outline("p", middle, Outline.Stroke.SOLID);
    assertTrue(figure.withOutlines(List.of(dashed)).svg().contains("stroke-dasharray"));
    assertFalse(figure.withOutlines(List.of(solid)).svg().contains("stroke-dasharray"));
  }

  @Test
  void regionsCarryTheNumberOfTheirLineInTheLegend() {
    Grid g = grid(1, 30, 30);
    RegionLabels two =
        new RegionLabels(
            List.of(
                new Region("empty", Mask.of(900, v -> false)),
                new Region("middle", Mask.of(900, v -> v > 400 && v < 500))));
    String svg = MapFigure.ofPower("map", g, filled(g, 1)).withRegions(two).svg();
    assertTrue(svg.contains("paint-order=\"stroke\">2</text>"));
    assertFalse(svg.contains("paint-order=\"stroke\">1</text>"));
    assertTrue(svg.contains("2  middle"));
  }

  @Test
  void hostileNamesStayText() {
    Grid g = grid(2, 3, 3);
    String hostile = "<script>alert('\"&')</script>";
    Document svg =
        Svgs.parse(
            MapFigure.ofPower(hostile, g, filled(g, 1))
                .withRegions(new RegionLabels(List.of(new Region(hostile, Mask.all(g.voxels())))))
                .svg());
    assertEquals(0, Svgs.count(svg, "script"));
    assertEquals(hostile, Svgs.title(svg));
  }

  @Test
  void refusesValuesOfAnotherGrid() {
    assertThrows(
        IllegalArgumentException.class,
        () -> MapFigure.ofPower("map", grid(1, 2, 2), new float[5]));
  }
}
