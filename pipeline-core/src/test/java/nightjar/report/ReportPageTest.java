package nightjar.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.List;
import java.util.regex.Pattern;
import nightjar.recording.FrameMotion;
import nightjar.recording.Mask;
import nightjar.recording.RegionLabels;
import nightjar.report.ContrastMap.ContrastSummary;
import nightjar.verdict.Reason;
import nightjar.verdict.Verdict;
import org.junit.jupiter.api.Test;

class ReportPageTest {
  private static final Pattern ADDRESS = Pattern.compile("(?i)(https?:|ftp:|\"//|@import|url\\()");
  private static final String HOSTILE = "<script>alert('x')</script>\"&";

  private static String page(int planes) {
    return ReportPage.render(new SampleReport(planes).content());
  }

  private static ReportContent with(ReportContent c, Verdict verdict, BrainMaps maps) {
    return new ReportContent(
        c.heading(),
        verdict,
        c.warnings(),
        c.facts(),
        maps,
        c.regions(),
        c.frames(),
        c.design(),
        c.level(),
        c.methods());
  }

  @Test
  void needsNothingButItself() {
    String page = page(2).replace("http://www.w3.org/2000/svg", "");
    assertFalse(ADDRESS.matcher(page).find(), "an address in the page");
    assertFalse(page.contains("<script"));
    assertFalse(page.contains("<link"));
  }

  @Test
  void equalContentGivesEqualText() {
    assertEquals(page(3), page(3));
  }

  @Test
  void tellsTheVerdictInWordAndShapeBeforeEverythingElse() {
    ReportContent c = new SampleReport(1).content();
    String usable =
        ReportPage.render(with(c, new Verdict(Verdict.Word.USABLE, List.of()), c.maps()));
    String review = ReportPage.render(c);
    assertTrue(usable.contains("<p class=\"word\">usable</p>"));
    assertTrue(review.contains("<p class=\"word\">review</p>"));
    assertTrue(review.indexOf("class=\"word\"") < review.indexOf("id=\"contrasts\""));
    assertTrue(review.contains("The median temporal signal-to-noise ratio is 4.1, below 5."));
    assertTrue(usable.contains("No reason against this session"));
    assertNotEquals(VerdictSign.svg(Verdict.Word.USABLE), VerdictSign.svg(Verdict.Word.REVIEW));
    assertNotEquals(VerdictSign.svg(Verdict.Word.REVIEW), VerdictSign.svg(Verdict.Word.UNUSABLE));
  }

  @Test
  void showsEveryPart() {
    String page = page(1);
    for (String part :
        List.of(
            "Drift explains 0.53",
            "Map: effect of left_over_sham",
            "Map: t of right_over_sham",
            "Region effects of left_over_sham",
            "Event-locked responses of thalamus",
            "Time course of barrel_right",
            "Design matrix as fitted",
            "rotation (°)",
            "log_power",
            "9f".repeat(32),
            "median tSNR",
            "Benjamini",
            "not for diagnosis or treatment",
            "Neuron 74:603")) {
      assertTrue(page.contains(part), part);
    }
  }

  @Test
  void hostileTextStaysText() {
    ReportContent c = new SampleReport(1).content();
    ReportContent hostile =
        new ReportContent(
            new ReportContent.Heading(
                HOSTILE,
                HOSTILE,
                HOSTILE,
                List.of(new ReportContent.Input(HOSTILE, HOSTILE, HOSTILE))),
            new Verdict(Verdict.Word.UNUSABLE, List.of(new Reason(HOSTILE, HOSTILE, 1, 2))),
            List.of(HOSTILE),
            List.of(new ReportContent.Fact(HOSTILE, HOSTILE)),
            c.maps(),
            c.regions(),
            c.frames(),
            c.design(),
            c.level(),
            HOSTILE);
    String page = ReportPage.render(hostile);
    assertFalse(page.contains("<script"));
    assertTrue(page.contains("&lt;script&gt;"));
  }

  @Test
  void aSessionWithoutRegionsOrMotionOrContrastsIsStillAPage() {
    SampleReport s = new SampleReport(1);
    ReportContent c = s.content();
    BrainMaps bare =
        new BrainMaps(s.grid, c.maps().mask(), c.maps().meanPower(), RegionLabels.NONE, List.of());
    String page =
        ReportPage.render(
            new ReportContent(
                c.heading(),
                c.verdict(),
                List.of(),
                List.of(),
                bare,
                ReportedRegions.NONE,
                new ReportedFrames(
                    s.kept, FrameMotion.none(SampleReport.FRAMES, 1), List.of(), List.of()),
                c.design(),
                0.05,
                c.methods()));
    assertTrue(page.contains("No regions were analysed."));
    assertTrue(page.contains("No motion was recorded"));
    assertFalse(page.contains("Warnings"));
  }

  @Test
  void mapsWithoutASingleNumberAreStillDrawn() {
    SampleReport s = new SampleReport(4);
    float[] none = new float[s.grid.voxels()];
    Arrays.fill(none, Float.NaN);
    double[] q = new double[none.length];
    Arrays.fill(q, Double.NaN);
    ContrastMap empty = new ContrastMap(new ContrastSummary("empty", 0, 0, null), none, none, q);
    BrainMaps maps =
        new BrainMaps(
            s.grid, Mask.of(none.length, v -> false), none, RegionLabels.NONE, List.of(empty));
    ReportContent c = s.content();
    String page = ReportPage.render(with(c, c.verdict(), maps));
    assertTrue(page.contains("Map: effect of empty"));
    assertTrue(page.contains("<td>–</td>"));
    assertFalse(page.contains("NaN"));
  }
}
