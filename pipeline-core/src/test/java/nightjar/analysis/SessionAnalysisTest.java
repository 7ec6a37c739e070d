package nightjar.analysis;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;
import java.util.concurrent.CancellationException;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** One whole analysis of the small synthetic session, and every file that it leaves. */
class SessionAnalysisTest {
  private static final ObjectMapper JSON = new ObjectMapper();

  @TempDir static Path folder;

  private static SmallSession session;
  private static Path out;

  @BeforeAll
  static void analyse() {
    session = new SmallSession(folder);
    out =
        session.analyse(session.files().recording(), session.files().events(), session.plan(""), 2);
  }

  private static List<String[]> table(String name) throws IOException {
    return Files.readAllLines(out.resolve(name)).stream().map(l -> l.split(",", -1)).toList();
  }

  @Test
  void leavesTheFilesOfTheContractAndNothingElse() throws IOException {
    try (Stream<Path> files = Files.list(out)) {
      assertEquals(
          new TreeSet<>(
              List.of(
                  "maps.nc",
                  "region_contrasts.csv",
                  "region_timecourses.csv",
                  "region_responses.csv",
                  "region_trials.csv",
                  "design.csv",
                  "frames.csv",
                  "motion.csv",
                  "summary.json",
                  "run.json",
                  "report.html",
                  "methods.md")),
          files
              .map(f -> String.valueOf(f.getFileName()))
              .collect(Collectors.toCollection(TreeSet::new)));
    }
  }

  @Test
  void headersAreTheContracts() throws IOException {
    assertEquals(
        "region,voxels,contrast,effect_percent,se_percent,ci_low_percent,ci_high_percent,t,df,p,q",
        String.join(",", table("region_contrasts.csv").get(0)));
    assertEquals(
        "frame,time_s,kept,left_puff,right_puff,sham_puff,slow_1,slow_2,level",
        String.join(",", table("design.csv").get(0)));
    assertEquals(
        "frame,time_s,kept,barrel_left,barrel_right,thalamus,quiet_cortex",
        String.join(",", table("region_timecourses.csv").get(0)));
    assertEquals(
        "region,stimulus,lag_s,mean_percent,sem_percent,trials",
        String.join(",", table("region_responses.csv").get(0)));
    assertEquals(
        "region,stimulus,trial,onset_s,duration_s,mean_percent,frames",
        String.join(",", table("region_trials.csv").get(0)));
    assertEquals(
        "frame,time_s,kept,reason,shift_depth_mm,shift_lateral_mm,rotation_deg,displacement_mm,"
            + "log_power,change",
        String.join(",", table("frames.csv").get(0)));
    assertEquals(
        "frame,plane,shift_depth_mm,shift_lateral_mm,shift_plane_mm,rotation_deg,tilt_depth_deg,"
            + "tilt_lateral_deg,displacement_mm",
        String.join(",", table("motion.csv").get(0)));
  }

  @Test
  void filesAgreeOnTheKeptFrames() throws IOException {
    List<String> kept = new ArrayList<>();
    for (String name : List.of("frames.csv", "design.csv", "region_timecourses.csv")) {
      kept.add(table(name).stream().skip(1).map(r -> r[2]).collect(Collectors.joining()));
    }
    assertEquals(kept.get(0), kept.get(1));
    assertEquals(kept.get(0), kept.get(2));
    JsonNode frames = JSON.readTree(out.resolve("summary.json").toFile()).path("frames");
    assertEquals(400, frames.path("total").asInt());
    assertEquals(kept.get(0).chars().filter(c -> c == '1').count(), frames.path("kept").asLong());
    int rejected = 0;
    for (JsonNode n : frames.path("rejected")) {
      rejected += n.asInt();
    }
    assertEquals(400, frames.path("kept").asInt() + rejected);
    List<String[]> rows = table("frames.csv");
    for (JsonNode flash : JSON.readTree(session.files().truth().toFile()).path("flashes")) {
      assertEquals("0", rows.get(flash.asInt() + 1)[2], "flash at frame " + flash);
    }
  }

  /** Truth beside the recording; 3.5 standard errors and 5 % for the baseline's own bias. */
  @Test
  void regionEffectsAreTheTruth() throws IOException {
    JsonNode truth = JSON.readTree(session.files().truth().toFile());
    int checked = 0;
    for (String[] row : table("region_contrasts.csv").stream().skip(1).toList()) {
      String other = row[2].equals("left_over_sham") ? "sham_puff" : "right_puff";
      double expected = planted(truth, row[0], "left_puff") - planted(truth, row[0], other);
      double limit = 3.5 * Double.parseDouble(row[4]) + 0.05 * Math.abs(expected);
      assertEquals(expected, Double.parseDouble(row[3]), limit, String.join(",", row));
      checked++;
    }
    assertEquals(8, checked);
  }

  private static double planted(JsonNode truth, String region, String stimulus) {
    return truth.path("plateau_percent").path(stimulus).path(region).asDouble(Double.NaN);
  }

  @Test
  void mapsAgreeWithTheSummary() throws IOException {
    double[] mask = SmallSession.map(out, "mask");
    double[] p = SmallSession.map(out, "p");
    double[] q = SmallSession.map(out, "q");
    double[] t = SmallSession.map(out, "t");
    int voxels = (int) Arrays.stream(mask).sum();
    JsonNode summary = JSON.readTree(out.resolve("summary.json").toFile());
    assertEquals(voxels, summary.path("grid").path("mask_voxels").asInt());
    for (int c = 0; c < 2; c++) {
      double[] pc = Arrays.copyOfRange(p, c * mask.length, (c + 1) * mask.length);
      double[] qc = Arrays.copyOfRange(q, c * mask.length, (c + 1) * mask.length);
      double[] tc = Arrays.copyOfRange(t, c * mask.length, (c + 1) * mask.length);
      JsonNode contrast = summary.path("contrasts").get(c);
      assertEquals(
          Arrays.stream(pc).filter(x -> x < 0.001).count(),
          contrast.path("voxels").path("p001").asLong());
      assertEquals(
          Arrays.stream(qc).filter(x -> x < 0.05).count(),
          contrast.path("voxels").path("q05").asLong());
      assertEquals(
          Arrays.stream(tc).map(Math::abs).filter(x -> !Double.isNaN(x)).max().orElseThrow(),
          Math.abs(contrast.path("peak").path("t").asDouble()),
          1e-5);
      assertEquals(voxels, Arrays.stream(tc).filter(x -> !Double.isNaN(x)).count());
    }
    for (String key :
        List.of(
            "version",
            "inputs",
            "plan",
            "grid",
            "frames",
            "verdict",
            "warnings",
            "noise",
            "contrasts",
            "regions",
            "sham_check")) {
      assertTrue(summary.has(key), key);
    }
    assertTrue(summary.path("version").asText().matches("[0-9]+[.][0-9]+[.][0-9]+.*"));
  }

  @Test
  void theReportNeedsNothingFromOutside() throws IOException {
    String page = Files.readString(out.resolve("report.html")).replace("http://www.w3.org", "");
    assertFalse(page.contains("http://"));
    assertFalse(page.contains("src=\"/"));
    assertTrue(Files.readString(out.resolve("methods.md")).contains("120"));
  }

  @Test
  void aRefusedSessionLeavesNothing() throws IOException {
    Path bad = Files.writeString(folder.resolve("bad.tsv"), "onset\tduration\n1\t2\n");
    Path target = folder.resolve("refused");
    assertThrows(
        RefusedInput.class,
        () ->
            SessionAnalysis.run(
                new SessionFiles(session.files().recording(), bad, session.plan(""), null, null),
                target,
                RunSettings.ofThisMachine().withThreads(1),
                StageListener.SILENT));
    assertNothing(target);
  }

  @Test
  void aStoppedAnalysisLeavesNothing() {
    Path target = folder.resolve("stopped");
    assertThrows(
        CancellationException.class,
        () ->
            SessionAnalysis.run(
                new SessionFiles(
                    session.files().recording(),
                    session.files().events(),
                    session.plan(""),
                    null,
                    null),
                target,
                RunSettings.ofThisMachine().withThreads(2),
                (stage, share) ->
                    done -> {
                      if (stage.startsWith("align")) {
                        throw new CancellationException("stop");
                      }
                    }));
    assertNothing(target);
  }

  private static void assertNothing(Path target) {
    try (Stream<Path> files = Files.list(folder)) {
      assertEquals(
          List.of(),
          files
              .map(f -> String.valueOf(f.getFileName()))
              .filter(n -> n.contains(String.valueOf(target.getFileName())))
              .toList());
    } catch (IOException e) {
      throw new java.io.UncheckedIOException(e);
    }
  }
}
