package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import nightjar.recording.Axis;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.PlaneOffsets;
import nightjar.recording.Region;
import nightjar.recording.RegionLabels;
import nightjar.recording.SessionMetadata;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import ucar.ma2.Array;
import ucar.nc2.NetcdfFile;
import ucar.nc2.Variable;

/** Recordings read back with NetCDF-Java, which shares no code with the writer. */
class RecordingWriterTest {
  private static final Grid GRID =
      new Grid(Axis.of(0, 0.4), Axis.of(1, 1.1, 1.2), Axis.of(-0.1, 0, 0.1), true);

  private static final RecordingHeader HEADER =
      new RecordingHeader(
          GRID,
          FrameTimes.of(new double[] {0.2, 0.6, 1.0}),
          PlaneOffsets.of(0, 0.2),
          new RegionLabels(
              List.of(
                  new Region("one", Mask.of(18, v -> v == 4)),
                  new Region("two", Mask.of(18, v -> v > 15)))),
          new SessionMetadata(Map.of("animal", "m\u00fcller-1")),
          0.5);

  @Test
  void anIndependentReaderFindsEverything(@TempDir Path folder) throws IOException {
    float[] frames = new float[3 * 18];
    for (int i = 0; i < frames.length; i++) {
      frames[i] = i * 0.5f;
    }
    frames[7] = Float.NaN;
    frames[8] = 1e9f;
    frames[9] = 2.2f; // nearest step 2.0
    Path file = folder.resolve("r.nc");
    try (RecordingWriter writer = RecordingWriter.create(file, HEADER)) {
      writer.write(frames, 2);
      writer.write(java.util.Arrays.copyOfRange(frames, 36, 54), 1);
    }
    try (NetcdfFile nc = NetcdfFile.open(file.toString())) {
      assertEquals("m\u00fcller-1", nc.findGlobalAttribute("animal").getStringValue());
      assertArrayEquals(new double[] {0.2, 0.6, 1.0}, doubles(nc, "time"), 0);
      assertArrayEquals(new double[] {0, 0.4}, doubles(nc, "plane"), 0);
      assertArrayEquals(new double[] {1, 1.1, 1.2}, doubles(nc, "depth"), 0);
      assertArrayEquals(new double[] {-0.1, 0, 0.1}, doubles(nc, "lateral"), 0);
      assertArrayEquals(new double[] {0, 0.2}, doubles(nc, "plane_time_offset"), 0);
      Variable roi = variable(nc, "roi");
      assertEquals("one two", roi.findAttribute("flag_meanings").getStringValue());
      double[] labels = doubles(nc, "roi");
      assertEquals(1, labels[4], 0);
      assertEquals(2, labels[17], 0);
      assertEquals(0, labels[0], 0);
      Variable power = variable(nc, "power_doppler");
      assertEquals("time plane depth lateral", power.getDimensionsString());
      assertEquals(0.5, power.findAttribute("scale_factor").getNumericValue().doubleValue(), 0);
      double[] packed = doubles(nc, "power_doppler");
      for (int i = 0; i < packed.length; i++) {
        double expected = i == 7 ? -32768 : i == 8 ? 32767 : i == 9 ? 4 : i;
        assertEquals(expected, packed[i], 0, "value " + i);
      }
      assertEquals(-32768, power.findAttribute("_FillValue").getNumericValue().doubleValue(), 0);
    }
  }

  private static Variable variable(NetcdfFile nc, String name) {
    Variable v = nc.findVariable(name);
    assertTrue(v != null, name);
    return v;
  }

  private static double[] doubles(NetcdfFile nc, String name) throws IOException {
    Array a = variable(nc, name).read();
    return (double[]) a.get1DJavaArray(double.class);
  }

  @Test
  void leavesNothingBehindWhenFramesAreMissing(@TempDir Path folder) throws IOException {
    RecordingWriter writer = RecordingWriter.create(folder.resolve("r.nc"), HEADER);
    writer.write(new float[36], 2);
    writer.close();
    try (Stream<Path> left = Files.list(folder)) {
      assertEquals(0, left.count());
    }
  }

  @Test
  void theFileAppearsOnlyWhenItIsComplete(@TempDir Path folder) {
    Path file = folder.resolve("r.nc");
    RecordingWriter writer = RecordingWriter.create(file, HEADER);
    writer.write(new float[54], 3);
    assertFalse(Files.exists(file));
    writer.close();
    assertTrue(Files.exists(file));
  }

  @Test
  void takesNoMoreFramesThanTimes(@TempDir Path folder) {
    try (RecordingWriter writer = RecordingWriter.create(folder.resolve("r.nc"), HEADER)) {
      assertThrows(IllegalArgumentException.class, () -> writer.write(new float[72], 4));
    }
  }
}
