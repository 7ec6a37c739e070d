package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.RegionLabels;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import ucar.ma2.DataType;

class LabelFileTest {
  private static final Grid GRID =
      new Grid(Axis.of(0), Axis.of(1, 1.1, 1.2, 1.3, 1.4), Axis.of(-0.2, 0, 0.2), false);

  @TempDir private Path folder;

  private static RecordingBuilder labels() {
    return new RecordingBuilder()
        .without("power_doppler")
        .without("time")
        .zeros("roi", DataType.SHORT, "depth lateral")
        .value("roi", 7, 4)
        .attribute("roi", "flag_values", new int[] {0, 4})
        .attribute("roi", "flag_meanings", "none septum");
  }

  private RegionLabels read(RecordingBuilder b, Grid grid) {
    return LabelFile.read(b.write(folder.resolve("labels.nc")), grid, "night.nc");
  }

  private String refusal(RecordingBuilder b, Grid grid) {
    return assertThrows(RefusedInput.class, () -> read(b, grid)).getMessage();
  }

  @Test
  void readsLabelsOnTheSameGridAndLeavesZeroOut() {
    RegionLabels r = read(labels(), GRID);
    assertEquals(1, r.regions().size());
    assertEquals("septum", r.regions().get(0).name());
    assertEquals(1, r.regions().get(0).voxels().count());
    assertTrue(r.regions().get(0).voxels().contains(7));
  }

  @Test
  void readsLabelsWithoutCoordinates() {
    assertEquals(1, read(labels().without("depth").without("lateral"), GRID).regions().size());
  }

  @Test
  void readsCoordinatesInOtherUnits() {
    RecordingBuilder b =
        labels()
            .variable("depth", DataType.FLOAT, "depth", 1000, 1100, 1200, 1300, 1400)
            .attribute("depth", "units", "um");
    assertEquals(1, read(b, GRID).regions().size());
  }

  @Test
  void refusesAnotherSize() {
    Grid other = new Grid(GRID.planes(), GRID.depths(), Axis.of(0, 0.2), false);
    String s = refusal(labels(), other);
    assertTrue(s.startsWith("labels.nc, variable roi: the labels are on another grid"), s);
    assertTrue(s.contains("(depth=5, lateral=3)") && s.contains("(depth=5, lateral=2)"), s);
  }

  @Test
  void refusesOnePlaneForARecordingOfSeveral() {
    Grid other = new Grid(Axis.of(0, 0.4), GRID.depths(), GRID.laterals(), true);
    assertTrue(refusal(labels(), other).contains("(plane=2, depth=5, lateral=3)"));
  }

  @Test
  void refusesAnotherPlaceInSpace() {
    RecordingBuilder b = labels();
    for (int i = 0; i < 5; i++) {
      b.value("depth", i, 1.002 + 0.1 * i);
    }
    String s = refusal(b, GRID);
    assertTrue(s.contains("variable depth") && s.contains("than night.nc, position 0"), s);
    assertTrue(s.contains("1.002 mm") && s.contains("expected 1 mm"), s);
  }

  @Test
  void refusesAFileWithoutLabels() {
    String s = refusal(labels().without("roi"), GRID);
    assertTrue(s.startsWith("labels.nc, variable roi: the file has no labels"), s);
  }
}
