package nightjar.storage;

import static nightjar.storage.Fixture.index;
import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.Map;
import java.util.function.DoubleUnaryOperator;
import nightjar.recording.Grid;
import nightjar.recording.Region;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Recordings written by scipy 1.17 and by the netCDF C library 4.9.0. */
class RecordingFileReferenceTest {
  @TempDir private Path folder;

  /** What the scripts stored, unpacked in float64 and rounded once, with the given exceptions. */
  private void assertFrames(RecordingFile r, DoubleUnaryOperator unpack, int... missing) {
    Grid g = r.grid();
    float[] expected = new float[Fixture.FRAMES * g.voxels()];
    for (int i = 0; i < expected.length; i++) {
      int v = i % g.voxels();
      double s = Fixture.stored(i / g.voxels(), g.planeOf(v), g.depthOf(v), g.lateralOf(v));
      expected[i] = (float) unpack.applyAsDouble(s);
    }
    for (int m : missing) {
      expected[m] = Float.NaN;
    }
    assertArrayEquals(expected, Fixture.all(r));
  }

  @ParameterizedTest
  @CsvSource({
    "plain_float, classic, float",
    "packed_short, 64-bit offset, short",
    "records, 64-bit offset, short",
    "one_record_variable, classic, short",
    "planes_double, 64-bit offset, double",
    "packed_int, classic, int",
    "chunked_deflate, netCDF-4, short",
    "contiguous_float, netCDF-4, float",
    "unlimited_unsigned, netCDF-4, short"
  })
  void namesFormatAndType(String name, String format, String type) {
    try (RecordingFile r = Fixture.open(name, folder)) {
      assertEquals(name + ".nc", r.fileName());
      assertEquals(format, r.formatName());
      assertEquals(type, r.valueType());
      assertEquals(Fixture.FRAMES, r.times().size());
      assertEquals(0.2, r.times().at(0), 1e-8); // the attribute 0.4 s is a float32 in one file
      assertEquals(0.4, r.times().intervalSeconds(), 1e-8);
      assertEquals(Fixture.DEPTHS, r.grid().depths().size());
      assertEquals(Fixture.LATERALS, r.grid().laterals().size());
      assertEquals(0.1, r.grid().depths().spacingMillimetres(), 1e-6); // float32 in one file
      assertEquals(1, r.grid().depths().at(0), 1e-6);
      assertEquals(0.2, r.grid().laterals().spacingMillimetres(), 1e-6);
    }
  }

  @Test
  void readsFloatWithLabelsMaskAndMetadata() {
    try (RecordingFile r = Fixture.open("plain_float", folder)) {
      assertFrames(r, s -> s);
      assertEquals("power_doppler", r.variableName());
      assertEquals(
          Map.of(
              "title", "a plain recording",
              "animal", "R1",
              "acquired", "2026-03-01T21:40:00Z",
              "probe_frequency_mhz", "15.6",
              "ensemble_duration_s", "0.25"),
          r.metadata().attributes());
      var regions = r.labels().orElseThrow().regions();
      assertEquals(
          java.util.List.of("barrel_left", "barrel_right", "thalamus"),
          regions.stream().map(Region::name).toList());
      assertEquals(2, regions.get(0).voxels().count());
      assertTrue(regions.get(0).voxels().contains(r.grid().index(0, 1, 1)));
      assertTrue(regions.get(1).voxels().contains(r.grid().index(0, 3, 2)));
      assertEquals(0, regions.get(2).voxels().count());
      assertEquals(12, r.brainMask().orElseThrow().count());
      assertFalse(r.brainMask().orElseThrow().contains(2));
      assertFalse(r.hasPlaneTimeOffsets());
      assertArrayEquals(new double[] {0}, r.planeTimeOffsetsSeconds());
    }
  }

  @Test
  void unpacksShortsAndBlanksMissingOnes() {
    try (RecordingFile r = Fixture.open("packed_short", folder)) {
      assertFrames(r, s -> 0.5 * s + 2, index(3, 0, 0), index(4, 0, 1), index(5, 1, 1));
      assertTrue(r.labels().isEmpty());
      assertTrue(r.brainMask().isEmpty());
    }
  }

  @Test
  void readsPaddedRecordsOfAnUnlimitedTime() {
    try (RecordingFile r = Fixture.open("records", folder)) {
      assertEquals("doppler", r.variableName());
      assertFrames(r, s -> s);
    }
  }

  @Test
  void readsRecordsWithoutPaddingWhereOneVariableHasThem() {
    try (RecordingFile r = Fixture.open("one_record_variable", folder)) {
      assertFrames(r, s -> s);
    }
  }

  @Test
  void readsPlanesWithTheirTimes() {
    try (RecordingFile r = Fixture.open("planes_double", folder)) {
      assertFrames(r, s -> s, (7 * 2 + 1) * 15 + 2 * 3 + 2);
      assertTrue(r.grid().hasPlaneAxis());
      assertEquals(0.4, r.grid().planes().at(1), 1e-12);
      assertTrue(r.hasPlaneTimeOffsets());
      assertArrayEquals(new double[] {-0.1, 0.1}, r.planeTimeOffsetsSeconds(), 1e-15);
      Region thalamus = r.labels().orElseThrow().regions().get(0);
      assertEquals(3, thalamus.voxels().count());
      assertTrue(thalamus.voxels().contains(r.grid().index(1, 4, 0)));
    }
  }

  @Test
  void unpacksIntegersBeforeItRounds() {
    try (RecordingFile r = Fixture.open("packed_int", folder)) {
      assertFrames(r, s -> s);
    }
  }

  @Test
  void readsChunkedDeflatedShorts() {
    try (RecordingFile r = Fixture.open("chunked_deflate", folder)) {
      assertFrames(r, s -> 0.5 * s + 2, index(3, 0, 0));
      assertEquals("R1", r.metadata().attributes().get("animal"));
      assertEquals(2, r.labels().orElseThrow().regions().get(0).voxels().count());
    }
  }

  @Test
  void readsContiguousPlanesOfNetcdf4() {
    try (RecordingFile r = Fixture.open("contiguous_float", folder)) {
      assertFrames(r, s -> s, (7 * 2 + 1) * 15 + 2 * 3 + 2);
    }
  }

  @Test
  void takesUnsignedShortsAsSuchAndAFrameNeverWrittenAsMissing() {
    try (RecordingFile r = Fixture.open("unlimited_unsigned", folder)) {
      int[] frame5 = java.util.stream.IntStream.range(75, 90).toArray();
      assertFrames(r, s -> 60000 + s, frame5);
    }
  }
}
