package nightjar.demo;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import nightjar.recording.Region;
import nightjar.storage.RecordingFile;
import nightjar.storage.RecordingRequest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class DemoSessionTest {
  private static final DemoAnimal STARTLED = new DemoAnimal("aged-9", "aged", 0.5, 0.06);

  @Test
  void writesSweptPlanesThatAreReadBackWithEverything(@TempDir Path folder) throws IOException {
    DemoScan scan = new DemoScan(3, 32, 40, 60, 1.2, 0.4);
    DemoSession session =
        new DemoSession("swept", 9, scan, STARTLED, DemoDisturbance.ORDINARY, 0.35);
    DemoFiles files = session.writeTo(folder.resolve("new"));
    float[][] made = FilmMakerTest.film(session, DemoTruth.draw(session));
    try (RecordingFile recording =
        RecordingFile.open(files.recording(), RecordingRequest.DEFAULT)) {
      assertEquals(60, recording.times().size());
      assertEquals(0.6, recording.times().at(0), 1e-12);
      assertEquals(3, recording.grid().planes().size());
      assertEquals(0.3, recording.grid().depths().spacingMillimetres(), 1e-12);
      assertEquals(0.8, recording.planeTimeOffsetsSeconds()[2], 1e-12);
      assertEquals("aged-9", recording.metadata().attributes().get("animal"));
      assertEquals(
          List.of("barrel_left", "barrel_right", "thalamus", "quiet_cortex"),
          recording.labels().orElseThrow().regions().stream().map(Region::name).toList());
      float[] frame = new float[recording.grid().voxels()];
      for (int t = 0; t < 60; t++) {
        recording.read(t, 1, frame, 0);
        for (int v = 0; v < frame.length; v++) {
          // Packed to steps of 0.002.
          assertEquals(made[t][v], frame[v], 0.0011);
        }
      }
    }
  }

  @Test
  void truthNamesThePlateausAndOneShiftAFrame(@TempDir Path folder) throws IOException {
    DemoScan scan = new DemoScan(1, 24, 24, 40, 0.4, 0);
    DemoFiles files =
        new DemoSession("s", 9, scan, STARTLED, DemoDisturbance.NONE, 0.35).writeTo(folder);
    String truth = Files.readString(files.truth());
    assertTrue(
        truth.contains(
            "\"left_puff\": {\"barrel_left\": 1.0000, \"barrel_right\": 5.0000,"
                + " \"thalamus\": 2.5000, \"quiet_cortex\": 0.0000}"));
    assertTrue(truth.contains("\"flashes\": []"));
    String shifts = truth.substring(truth.indexOf("shift_depth_mm"), truth.indexOf("shift_lat"));
    assertEquals(40, shifts.split("\\.", -1).length - 1);
    assertEquals("onset\tduration\ttrial_type", Files.readAllLines(files.events()).get(0));
  }

  @Test
  void refusesSettingsThatNoScannerHas() {
    assertThrows(IllegalArgumentException.class, () -> new DemoScan(3, 48, 48, 100, 0.4, 0.2));
    DemoScan scan = new DemoScan(1, 48, 48, 100, 0.4, 0);
    assertThrows(
        IllegalArgumentException.class,
        () -> new DemoSession("s", 1, scan, STARTLED, DemoDisturbance.NONE, 1));
  }
}
