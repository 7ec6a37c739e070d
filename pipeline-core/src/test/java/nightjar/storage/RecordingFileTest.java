package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.Arrays;
import java.util.stream.IntStream;
import nightjar.numeric.Workers;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import ucar.ma2.DataType;

class RecordingFileTest {
  @TempDir private Path folder;

  private RecordingFile open(RecordingBuilder b) {
    return open(b, RecordingRequest.DEFAULT);
  }

  private RecordingFile open(RecordingBuilder b, RecordingRequest request) {
    return RecordingFile.open(b.write(folder.resolve("made.nc")), request);
  }

  @ParameterizedTest
  @ValueSource(
      strings = {
        "plain_float",
        "packed_short",
        "records",
        "one_record_variable",
        "planes_double",
        "packed_int",
        "chunked_deflate",
        "contiguous_float",
        "unlimited_unsigned"
      })
  void framesDoNotDependOnHowManyAreReadAtOnceNorOnThreads(String name) {
    try (RecordingFile r = Fixture.open(name, folder);
        Workers four = new Workers(4)) {
      float[] expected = Fixture.all(r);
      int v = r.grid().voxels();
      for (int block : new int[] {1, 2, 5, 7, 23}) {
        float[] found = new float[expected.length];
        four.forEachBlock(
            Fixture.FRAMES, block, (first, end) -> r.read(first, end - first, found, first * v));
        assertArrayEquals(expected, found, "blocks of " + block);
      }
    }
  }

  @Test
  void readLeavesTheRestOfTheArrayAlone() {
    try (RecordingFile r = Fixture.open("packed_short", folder)) {
      float[] into = new float[40];
      Arrays.fill(into, -1);
      r.read(23, 1, into, 20);
      assertEquals(-1, into[19]);
      assertEquals(0.5f * 23 + 2, into[20]);
      assertEquals(-1, into[35]);
      assertThrows(IndexOutOfBoundsException.class, () -> r.read(23, 2, into, 0));
      assertThrows(IndexOutOfBoundsException.class, () -> r.read(0, 1, into, 26));
    }
  }

  @Test
  void longRowsAreReadInPiecesWithoutSeams() {
    int laterals = 5000; // more values a row than are converted at once
    RecordingBuilder b =
        new RecordingBuilder()
            .dimension("lateral", laterals)
            .variable("lateral", DataType.DOUBLE, "lateral", RecordingBuilder.steps(laterals, 0, 1))
            .variable(
                "power_doppler",
                DataType.DOUBLE,
                "time depth lateral",
                RecordingBuilder.steps(24 * 5 * laterals, 0, 1));
    try (RecordingFile r = open(b)) {
      float[] values = Fixture.all(r);
      for (int i = 0; i < values.length; i++) {
        assertEquals((float) i, values[i]);
      }
    }
  }

  @Test
  void findsTheOnlyVariableThatFits() {
    RecordingBuilder b =
        new RecordingBuilder()
            .renamed("power_doppler", "cbv")
            .zeros("quality", DataType.BYTE, "time depth lateral")
            .zeros("anatomy", DataType.FLOAT, "depth lateral");
    try (RecordingFile r = open(b)) {
      assertEquals("cbv", r.variableName());
    }
  }

  @Test
  void readsTheVariableThatIsNamed() {
    RecordingBuilder b = new RecordingBuilder().zeros("cbv", DataType.INT, "time depth lateral");
    try (RecordingFile r = open(b, new RecordingRequest("cbv", null, 1000))) {
      assertEquals("int", r.valueType());
    }
  }

  @Test
  void theIntervalOfThePlanStandsBeforeThatOfTheFile() {
    RecordingBuilder b =
        new RecordingBuilder().without("time").attribute("", "frame_interval_s", 0.5);
    try (RecordingFile r = open(b)) {
      assertEquals(0.25, r.times().at(0), 0);
      assertEquals(11.75, r.times().at(23), 0);
    }
    try (RecordingFile r = open(b, new RecordingRequest(null, 2.0, 1000))) {
      assertEquals(1, r.times().at(0), 0);
    }
  }

  @Test
  void theTimeAxisStandsBeforeAnyInterval() {
    RecordingBuilder b = new RecordingBuilder().attribute("", "frame_interval_s", 0.5);
    try (RecordingFile r = open(b, new RecordingRequest(null, 2.0, 1000))) {
      assertEquals(0.4, r.times().intervalSeconds(), 1e-12);
    }
  }

  @ParameterizedTest
  @CsvSource({
    "s, 0.2",
    "sec, 0.2",
    "seconds, 0.2",
    "ms, 0.0002",
    "milliseconds, 0.0002",
    "seconds since 2026-03-01, 0.2",
    "seconds since 2026-03-01T21:40:00Z, 0.2",
    "s since 2026-3-1 21:40:00 +1:00, 0.2",
    "milliseconds since 2026-03-01 21:40, 0.0002"
  })
  void knowsTheUnitsOfTime(String unit, double first) {
    try (RecordingFile r = open(new RecordingBuilder().attribute("time", "units", unit))) {
      assertEquals(first, r.times().at(0), 0);
    }
  }

  @ParameterizedTest
  @CsvSource({
    "mm, 1",
    "millimeter, 1",
    "Millimetres, 1",
    "um, 0.001",
    "\u00b5m, 0.001",
    "\u03bcm, 0.001",
    "micrometer, 0.001",
    "microns, 0.001",
    "m, 1000",
    "meters, 1000"
  })
  void knowsTheUnitsOfLength(String unit, double first) {
    try (RecordingFile r = open(new RecordingBuilder().attribute("depth", "units", unit))) {
      assertEquals(first, r.grid().depths().at(0), 0);
    }
  }

  @Test
  void acceptsStepsThatDifferByLessThanAHundredth() {
    RecordingBuilder b = new RecordingBuilder().value("depth", 2, 1.2004);
    try (RecordingFile r = open(b)) {
      assertEquals(1.2004, r.grid().depths().at(2), 0);
    }
  }

  @Test
  void boundsAndMissingValuesOfPackedNumbersMayBeGivenInTrueValues() {
    // NetCDF User's Guide, appendix A: a valid_range of the type of scale_factor, wider than the
    // stored type, is in unpacked units; a short one is in stored units.
    RecordingBuilder b =
        new RecordingBuilder()
            .variable(
                "power_doppler",
                DataType.SHORT,
                "time depth lateral",
                RecordingBuilder.steps(360, 0, 1))
            .attribute("power_doppler", "scale_factor", -0.5)
            .attribute("power_doppler", "valid_min", -100.0)
            .attribute("power_doppler", "valid_max", (short) 190)
            .attribute("power_doppler", "missing_value", -25.0);
    try (RecordingFile r = open(b)) {
      float[] values = Fixture.all(r);
      for (int i = 0; i < values.length; i++) {
        float expected = i > 190 || i == 50 ? Float.NaN : 0 - 0.5f * i;
        assertEquals(expected, values[i], "value " + i);
      }
    }
  }

  @Test
  void blanksFillMissingAndInvalidFloats() {
    RecordingBuilder b =
        new RecordingBuilder()
            .attribute("power_doppler", "_FillValue", 101f)
            .attribute("power_doppler", "missing_value", 102.0)
            .attribute("power_doppler", "valid_min", 100.5f)
            .attribute("power_doppler", "valid_max", 455f);
    try (RecordingFile r = open(b)) {
      float[] values = Fixture.all(r);
      int[] missing = IntStream.range(0, 360).filter(i -> Float.isNaN(values[i])).toArray();
      assertArrayEquals(new int[] {0, 1, 2, 356, 357, 358, 359}, missing);
      assertEquals(103, values[3]);
    }
  }

  @ParameterizedTest
  @CsvSource({"FLOAT, Infinity", "FLOAT, -Infinity", "DOUBLE, Infinity", "DOUBLE, 1e39"})
  void aValueThatNoFloatCanHoldIsMissing(DataType type, double value) {
    RecordingBuilder b =
        new RecordingBuilder()
            .variable(
                "power_doppler", type, "time depth lateral", RecordingBuilder.steps(360, 100, 1))
            .value("power_doppler", 4, value);
    try (RecordingFile r = open(b)) {
      assertTrue(Float.isNaN(Fixture.all(r)[4]));
      assertEquals(105, Fixture.all(r)[5]);
    }
  }

  @Test
  void knowsSha256OfAPublishedMessage() {
    // FIPS 180-2, appendix B.1: the message "abc".
    Path abc = Fixture.file("abc", new byte[] {'a', 'b', 'c'}, folder);
    assertEquals(
        "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad", Checksum.sha256(abc));
  }
}
