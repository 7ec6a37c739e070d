package nightjar.cli;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class InspectCommandTest {
  @TempDir private Path folder;

  private static Ran inspect(String... files) {
    List<String> all = new ArrayList<>(List.of("inspect"));
    all.addAll(List.of(files));
    return Ran.of(all.toArray(String[]::new));
  }

  private static Ran session(String plan, String... more) {
    List<String> all =
        new ArrayList<>(
            List.of("--recording", Ran.RECORDING, "--events", Ran.EVENTS, "--plan", plan));
    all.addAll(List.of(more));
    return inspect(all.toArray(String[]::new));
  }

  private String plan(String rest) throws IOException {
    String contrast = "contrasts: [{name: c, weights: {left_puff: 1, sham_puff: -1}}]\n";
    return Files.writeString(folder.resolve("plan.yaml"), contrast + rest).toString();
  }

  private static JsonNode json(Ran ran) throws IOException {
    return new ObjectMapper().readTree(ran.out());
  }

  @Test
  void aWholeSessionIsToldForReading() {
    Ran ran = session(Ran.PLAN);
    assertEquals(0, ran.code(), ran.err());
    assertEquals("", ran.err());
    // What the generator was told: 48 x 56 voxels of 0.2 mm, 400 frames of 0.4 s, 7 trials each.
    for (String line :
        List.of(
            "  format               64-bit offset",
            "  depths               48",
            "  lateral spacing, mm  0.2",
            "  frames               400",
            "  interval, s          0.4",
            "  duration, s          160",
            "  gaps                 0",
            "    left_puff        7            2           2          10.789        119.002",
            "  kernel     shape gamma, peak_s 2.1, fwhm_s 2.9, derivative false",
            "  smoothing  fwhm_mm 0")) {
      assertTrue(ran.out().lines().anyMatch(line::equals), line + "\nin\n" + ran.out());
    }
    assertTrue(ran.out().contains("  heap, MB "), ran.out());
  }

  @Test
  void aWholeSessionIsToldAsJson() throws IOException {
    JsonNode found = json(session(Ran.PLAN, "--json"));
    assertEquals("power_doppler", found.at("/recording/variable").asText());
    assertEquals(400, found.at("/recording/frames").asInt());
    assertEquals(0.4, found.at("/recording/interval_s").asDouble());
    assertEquals(46, found.at("/recording/regions/barrel_left").asInt());
    assertEquals("young-1", found.at("/recording/attributes/animal").asText());
    assertEquals(7, found.at("/events/stimuli/sham_puff/trials").asInt());
    assertEquals("left_over_sham", found.at("/plan/contrasts/0").asText());
    assertEquals(120, found.at("/plan/drift/cutoff_s").asDouble());
    assertTrue(found.path("heap_mb").asInt() > 0);
    // Two films of 48 x 56 x 400 float32 values: 8.6 MB.
    assertEquals(9, found.path("scratch_mb").asInt());
    assertTrue(found.path("warnings").isArray());
    assertEquals(0, found.path("refused").size());
  }

  @Test
  void anyFileIsInspectedAlone() throws IOException {
    assertEquals(
        400, json(inspect("--recording", Ran.RECORDING, "--json")).at("/recording/frames").asInt());
    assertEquals(21, json(inspect("--events", Ran.EVENTS, "--json")).at("/events/trials").asInt());
    assertEquals(
        "whisker-puff", json(inspect("--plan", Ran.PLAN, "--json")).at("/plan/name").asText());
    Path traces = Files.writeString(folder.resolve("t.csv"), "time,speed\n0,1\n1,2\n2,3\n");
    assertEquals(
        "speed",
        json(inspect("--traces", traces.toString(), "--json")).at("/traces/traces/0").asText());
  }

  @Test
  void regionsAreCountedBesideTheirRecording() throws IOException {
    Path polygons =
        Files.writeString(
            folder.resolve("r.json"),
            "[{\"name\": \"patch\", \"plane\": 0, \"points\": [[-2, 2], [2, 2], [2, 4], [-2, 4]]}]");
    JsonNode found =
        json(inspect("--recording", Ran.RECORDING, "--regions", polygons.toString(), "--json"));
    assertTrue(found.at("/regions/voxels/patch").asInt() > 0, found.toString());
    Ran alone = inspect("--regions", polygons.toString());
    assertEquals(0, alone.code());
    assertTrue(alone.out().contains("can be checked only beside its recording"), alone.out());
  }

  @Test
  void faultsOfSeparateFilesAreAllTold() throws IOException {
    Path events = Files.writeString(folder.resolve("e.tsv"), "onset\tduration\n1\t2\n");
    Path recording = Files.writeString(folder.resolve("r.nc"), "no recording");
    Ran ran =
        inspect(
            "--recording",
            recording.toString(),
            "--events",
            events.toString(),
            "--plan",
            plan("nois: {}\n"),
            "--json");
    assertEquals(2, ran.code());
    List<String> sentences = ran.err().lines().toList();
    assertEquals(3, sentences.size(), ran.err());
    assertTrue(sentences.get(0).startsWith("plan.yaml, line 2, column 1: "), ran.err());
    assertTrue(sentences.get(1).startsWith("e.tsv"), ran.err());
    assertTrue(sentences.get(2).startsWith("r.nc"), ran.err());
    JsonNode refused = json(ran).path("refused");
    assertEquals(3, refused.size());
    assertEquals(sentences.get(0), refused.at("/0/sentence").asText());
    assertEquals("line 2, column 1", refused.at("/0/place").asText());
    assertFalse(json(ran).has("heap_mb"));
  }

  @Test
  void driftThatTakesAStimulusAwayIsRefused() throws IOException {
    Ran ran = session(plan("drift: {cutoff_s: 2}\n"));
    assertEquals(2, ran.code());
    assertEquals(1, ran.err().lines().count(), ran.err());
    assertTrue(ran.err().contains("plan.yaml"), ran.err());
    assertTrue(ran.err().contains("drift removal would take the stimulus"), ran.err());
    assertTrue(ran.out().contains("Recording\n"), "facts are told all the same");
  }

  @Test
  void whatThePlanTakesFromTheRecordingMustBeThere() throws IOException {
    Ran ran = session(plan("mask: {source: recording}\nregions: {source: drawn}\n"));
    assertEquals(2, ran.code());
    assertEquals(2, ran.err().lines().count(), ran.err());
    assertTrue(ran.err().contains("plan.yaml, mask.source: the plan takes the mask"), ran.err());
    assertTrue(ran.err().contains("plan.yaml, regions: the plan takes regions"), ran.err());
    assertEquals(0, session(plan("alignment: {reference: 399}\n")).code());
    assertEquals(2, session(plan("alignment: {reference: 400}\n")).code());
    assertEquals(0, session(plan("alignment: {model: none, reference: 400}\n")).code());
  }

  @Test
  void eventsOfAnotherRecordingAreRefused() throws IOException {
    Path events =
        Files.writeString(
            folder.resolve("e.tsv"), "onset\tduration\ttrial_type\n1\t2\ta\n500\t2\ta\n");
    Ran ran = inspect("--recording", Ran.RECORDING, "--events", events.toString());
    assertEquals(2, ran.code());
    assertTrue(ran.err().contains("seems to belong to another recording"), ran.err());
  }
}
