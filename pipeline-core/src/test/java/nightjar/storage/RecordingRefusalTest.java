package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.params.provider.Arguments.arguments;

import java.nio.file.Path;
import java.util.Arrays;
import java.util.function.Consumer;
import java.util.stream.Stream;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;
import ucar.ma2.DataType;

/** Each recording is good but for one fault; the refusal names file, variable, value and remedy. */
class RecordingRefusalTest {
  @TempDir private Path folder;

  private static Arguments fault(Consumer<RecordingBuilder> spoil, String... said) {
    return arguments(spoil, Arrays.asList(said));
  }

  private static RecordingBuilder withRegions(RecordingBuilder b) {
    return b.zeros("roi", DataType.BYTE, "depth lateral")
        .value("roi", 4, 2)
        .attribute("roi", "flag_values", new int[] {1, 2})
        .attribute("roi", "flag_meanings", "barrel thalamus");
  }

  static Stream<Arguments> faults() {
    return Stream.of(
        fault(b -> b.without("power_doppler"), "no variable holds frames", "time[time]"),
        fault(
            b -> b.renamed("power_doppler", "a").zeros("b", DataType.INT, "time depth lateral"),
            "several variables",
            "a[time, depth, lateral]",
            "recording: variable"),
        fault(
            b -> b.zeros("power_doppler", DataType.FLOAT, "time depth"),
            "variable power_doppler",
            "2 (time=24, depth=5)",
            "[time, depth, lateral]"),
        fault(
            b -> b.zeros("power_doppler", DataType.FLOAT, "depth lateral time"),
            "order",
            "[depth, lateral, time]"),
        fault(
            b -> b.zeros("power_doppler", DataType.BYTE, "time depth lateral"),
            "type byte",
            "short, int, float or double"),
        fault(b -> b.zeros("power_doppler", DataType.CHAR, "time depth lateral"), "type char"),
        fault(
            b ->
                b.dimension("time", 19)
                    .zeros("time", DataType.DOUBLE, "time")
                    .zeros("power_doppler", DataType.FLOAT, "time depth lateral"),
            "too few frames (found 19, expected at least 20)"),
        fault(b -> b.without("time"), "no time axis", "frame_interval_s"),
        fault(
            b -> b.without("time").attribute("", "frame_interval_s", "0.4 s"),
            "frame_interval_s",
            "\"0.4 s\""),
        fault(b -> b.without("time").attribute("", "frame_interval_s", -0.4), "found -0.4"),
        fault(b -> b.attribute("time", "units", "min"), "variable time", "\"min\"", "s, ms"),
        fault(b -> b.attribute("time", "units", "seconds since yesterday"), "since yesterday"),
        fault(b -> b.attribute("time", "units", " "), "variable time", "units are missing"),
        fault(
            b -> b.value("time", 7, 0.2 + 0.4 * 6),
            "variable time",
            "from frame 6 to 7",
            "2.6 s, then 2.6 s"),
        fault(b -> b.value("time", 7, Double.NaN), "variable time", "position 7 has no value"),
        fault(b -> b.zeros("time", DataType.CHAR, "time"), "variable time", "type char"),
        fault(b -> b.zeros("time", DataType.DOUBLE, "depth"), "variable time", "(depth=5)"),
        fault(b -> b.without("depth"), "variable depth", "missing", "mm, um or m"),
        fault(b -> b.attribute("lateral", "units", "cm"), "variable lateral", "\"cm\""),
        fault(b -> b.attribute("lateral", "units", 5), "variable lateral", "\"5\""),
        fault(
            b -> b.value("depth", 2, 1.21),
            "variable depth",
            "positions 1 and 2 are not equally spaced",
            "within 1 %"),
        fault(b -> b.zeros("depth", DataType.DOUBLE, "depth"), "variable depth", "spaced"),
        fault(
            b -> b.attribute("power_doppler", "scale_factor", 0.0),
            "variable power_doppler",
            "scale_factor 0.0"),
        fault(
            b -> b.attribute("power_doppler", "add_offset", "none"),
            "variable power_doppler",
            "add_offset",
            "\"none\""),
        fault(
            b -> withRegions(b).attribute("roi", "flag_meanings", "barrel barrel"),
            "variable roi",
            "same name (found barrel)"),
        fault(
            b -> withRegions(b).attribute("roi", "flag_meanings", "barrel"),
            "1 names for 2 labels"),
        fault(
            b -> withRegions(b).attribute("roi", "flag_values", new int[] {2, 2}),
            "gives a label twice (found 2)"),
        fault(b -> b.zeros("roi", DataType.BYTE, "depth lateral"), "no names", "flag_meanings"),
        fault(
            b -> withRegions(b).value("roi", 5, 9), "depth 1, lateral 2", "found 9", "flag_values"),
        fault(
            b -> withRegions(b).zeros("roi", DataType.BYTE, "lateral depth"),
            "another grid",
            "(lateral=3, depth=5)",
            "(depth=5, lateral=3)"),
        fault(
            b -> withRegions(b).zeros("roi", DataType.FLOAT, "depth lateral"),
            "variable roi",
            "type float"),
        fault(
            b -> b.zeros("brain_mask", DataType.BYTE, "depth lateral"),
            "variable brain_mask",
            "no voxel is inside"),
        fault(
            b -> b.zeros("brain_mask", DataType.BYTE, "depth lateral").value("brain_mask", 3, 2),
            "variable brain_mask",
            "depth 1, lateral 0",
            "found 2"),
        fault(
            b -> b.zeros("plane_time_offset", DataType.DOUBLE, "depth"),
            "variable plane_time_offset",
            "no planes"));
  }

  @ParameterizedTest
  @MethodSource("faults")
  void refusesInOneSentence(Consumer<RecordingBuilder> spoil, java.util.List<String> said) {
    RecordingBuilder b = new RecordingBuilder();
    spoil.accept(b);
    String sentence = refusal(b, RecordingRequest.DEFAULT);
    for (String s : said) {
      assertTrue(sentence.contains(s), sentence);
    }
  }

  private String refusal(RecordingBuilder b, RecordingRequest request) {
    return refusal(b.write(folder.resolve("night.nc")), request);
  }

  private static String refusal(Path file, RecordingRequest request) {
    RefusedInput refused =
        assertThrows(RefusedInput.class, () -> RecordingFile.open(file, request).close());
    String sentence = refused.getMessage();
    assertTrue(sentence.startsWith(file.getFileName() + ""), sentence);
    assertTrue(refused.facts().containsKey("remedy"), sentence);
    assertFalse(sentence.contains("\n"), sentence);
    return sentence;
  }

  @Test
  void refusesAPlaneWithoutCoordinates() {
    RecordingBuilder b =
        new RecordingBuilder()
            .dimension("plane", 2)
            .zeros("power_doppler", DataType.FLOAT, "time plane depth lateral");
    assertTrue(refusal(b, RecordingRequest.DEFAULT).contains("variable plane"));
    b.variable("plane", DataType.DOUBLE, "plane", 0, 400).attribute("plane", "units", "um");
    b.zeros("plane_time_offset", DataType.DOUBLE, "plane");
    assertTrue(
        refusal(b, RecordingRequest.DEFAULT).contains("variable plane_time_offset: the units"));
  }

  @Test
  void refusesMoreVoxelFramesThanTheLimit() {
    RecordingBuilder b = new RecordingBuilder();
    RecordingFile.open(b.write(folder.resolve("fits.nc")), new RecordingRequest(null, null, 360))
        .close();
    String sentence = refusal(b, new RecordingRequest(null, null, 359));
    assertTrue(sentence.contains("at most 359 voxels x frames"), sentence);
  }

  @Test
  void refusesAVariableThatIsNotThere() {
    String sentence = refusal(new RecordingBuilder(), new RecordingRequest("cbv", null, 1000));
    assertTrue(sentence.contains("variable cbv"), sentence);
    assertTrue(sentence.contains("power_doppler[time, depth, lateral]"), sentence);
  }

  @Test
  void refusesAnIntervalOfThePlanThatIsNoLengthOfTime() {
    RecordingBuilder b = new RecordingBuilder().without("time");
    assertTrue(refusal(b, new RecordingRequest(null, 0.0, 1000)).contains("found 0.0"));
    assertTrue(refusal(b, new RecordingRequest(null, Double.NaN, 1000)).contains("found NaN"));
  }

  @Test
  void refusesFilesThatAreNotNetcdf() {
    byte[] gzip = {0x1f, (byte) 0x8b, 8, 0, 0, 0, 0, 0, 0, 0};
    assertTrue(refusal(file("a.nc", gzip), RecordingRequest.DEFAULT).contains("gzip"));
    assertTrue(refusal(file("b.nc", new byte[0]), RecordingRequest.DEFAULT).contains("empty"));
    byte[] text = "onset\tduration".getBytes(java.nio.charset.StandardCharsets.UTF_8);
    assertTrue(refusal(file("c.nc", text), RecordingRequest.DEFAULT).contains("6f 6e 73"));
    byte[] cdf5 = {'C', 'D', 'F', 5, 0, 0, 0, 0};
    String sentence = refusal(file("d.nc", cdf5), RecordingRequest.DEFAULT);
    assertTrue(sentence.contains("convert the file to 64-bit offset or netCDF-4"), sentence);
    byte[] cdf3 = {'C', 'D', 'F', 3, 0, 0, 0, 0};
    assertTrue(refusal(file("e.nc", cdf3), RecordingRequest.DEFAULT).contains("version 3"));
    String missing = refusal(folder.resolve("f.nc"), RecordingRequest.DEFAULT);
    assertEquals("f.nc: there is no such file; check the name and the folder.", missing);
    assertTrue(refusal(folder, RecordingRequest.DEFAULT).contains("no such file"));
  }

  private Path file(String name, byte[] bytes) {
    return Fixture.file(name, bytes, folder);
  }
}
