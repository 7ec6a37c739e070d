package nightjar.report;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import nightjar.alignment.AlignmentSettings;
import nightjar.design.DoubleGammaKernel;
import nightjar.design.DriftSettings;
import nightjar.design.GammaKernel;
import nightjar.design.NuisanceSettings;
import nightjar.design.StimulusSettings;
import nightjar.glm.Contrast;
import nightjar.glm.NoiseSettings;
import nightjar.inference.InferenceSettings;
import nightjar.mask.MaskSettings;
import nightjar.mask.Scale;
import nightjar.plan.Plan;
import nightjar.regions.RegionSource;
import nightjar.regions.ResponseSettings;
import nightjar.screening.ScreeningSettings;
import nightjar.verdict.VerdictLimits;
import org.junit.jupiter.api.Test;

class MethodsTextTest {
  private static final SampleReport SESSION = new SampleReport(1);

  private static String text(Plan plan) {
    return MethodsText.of(SESSION.methods(plan));
  }

  /** Every number differs from every default, so that each must come from its own setting. */
  private static Plan unusual() {
    Map<String, Double> weights = new LinkedHashMap<>();
    weights.put("left_puff", 0.625);
    weights.put("sham_puff", -0.375);
    return new Plan(
        "plan.yaml",
        "odd-plan",
        "doppler_power",
        0.411,
        new ScreeningSettings(true, 4.17, 0.063, 1.71, 37, 0.29),
        new AlignmentSettings(
            AlignmentSettings.Model.TRANSLATION,
            AlignmentSettings.Scope.VOLUME,
            new AlignmentSettings.Reference(41)),
        0.173,
        MaskSettings.RECORDING,
        Scale.LOG_PERCENT,
        new DoubleGammaKernel(GammaKernel.of(2.23, 2.87), GammaKernel.of(7.31, 4.43), 0.211),
        true,
        List.of(
            new StimulusSettings("left_puff", "L1", false),
            new StimulusSettings("click", "calibration_click", true)),
        new DriftSettings(141.5),
        new NuisanceSettings(Set.of(NuisanceSettings.MotionColumns.SQUARE), false),
        new NoiseSettings(NoiseSettings.Model.AR1, 0.317, NoiseSettings.DegreesOfFreedom.RESIDUAL),
        List.of(new Contrast("odd_contrast", weights)),
        new InferenceSettings(InferenceSettings.Adjustment.BY, 0.0213),
        RegionSource.DRAWN,
        new ResponseSettings(4.7, 17.3, 1.3, 6.9),
        new VerdictLimits(
            0.111, 0.333, 0.515, 5.17, 19, 5.23, 0.313, 0.257, 0.0307, 0.0811, 0.00517, 0.207,
            0.509));
  }

  @Test
  void namesEveryParameterOfThePlanAsUsed() {
    String text = text(unusual());
    for (String expected :
        List.of(
            "odd-plan",
            "doppler_power",
            "given by the plan",
            "4.17",
            "0.063",
            "1.71",
            "37 frames",
            "0.29 mm",
            "translation, the volume as a whole",
            "frame 41",
            "0.173 mm",
            "recording's own mask",
            "100 ln(y/b)",
            "2.23 s",
            "2.87 s",
            "7.31 s",
            "4.43 s",
            "0.211",
            "time derivative",
            "`L1`",
            "`calibration_click`",
            "141.5 s",
            "motion square",
            "ar1",
            "0.317 mm",
            "residual degrees of freedom.",
            "`odd_contrast`",
            "+0.625",
            "-0.375",
            "Benjamini and Yekutieli",
            "0.0213",
            "polygons",
            "4.7 s",
            "17.3 s",
            "1.3 to 6.9 s",
            "0.111",
            "0.333",
            "0.515",
            "5.17",
            "stimulus 19",
            "5.23",
            "0.509")) {
      assertTrue(text.contains(expected), expected + " in:\n" + text);
    }
  }

  @Test
  void saysWhatTheSessionBrought() {
    String text = text(SampleReport.plan());
    for (String expected :
        List.of(
            "750 frames",
            "1 plane",
            "64 x 96",
            "0.11 x 0.11 mm",
            "0.4 s",
            "2 segments",
            "745 of 750 frames were kept, 5 rejected (`power` 4, `power+displacement` 1)",
            "4021 voxels",
            "5 cosines",
            "rank 11",
            "734 residual",
            "`left_puff` (11 trials)",
            "`left_puff` x = 0.0667",
            "1/(1 + beta x/100)",
            "Nightjar 0.1.0",
            "Nothing is corrected over contrasts")) {
      assertTrue(text.contains(expected), expected + " in:\n" + text);
    }
  }

  @Test
  void listsTheReferencesThatItCitesAndNoOthers() {
    for (Plan plan : List.of(SampleReport.plan(), unusual())) {
      String text = text(plan);
      int list = text.indexOf("## References");
      Set<Integer> cited = new TreeSet<>();
      Matcher m = Pattern.compile("\\[([\\d, ]+)\\]").matcher(text.substring(0, list));
      while (m.find()) {
        for (String n : m.group(1).split(", ", -1)) {
          cited.add(Integer.parseInt(n));
        }
      }
      Set<Integer> listed = new TreeSet<>();
      m = Pattern.compile("(?m)^(\\d+)\\. ").matcher(text.substring(list));
      while (m.find()) {
        listed.add(Integer.parseInt(m.group(1)));
      }
      assertEquals(listed, cited);
      assertEquals(listed.size(), listed.stream().mapToInt(i -> i).max().orElse(0));
    }
  }

  @Test
  void leavesOutTheReferencesOfMethodsThatWereNotUsed() {
    assertTrue(text(SampleReport.plan()).contains("Otsu"));
    String text = text(unusual());
    assertFalse(text.contains("Otsu"));
    assertFalse(text.contains("Satterthwaite"));
    assertFalse(text.contains("Benjamini Y, Hochberg Y"));
    assertTrue(text.contains("Glover GH (1999)"));
  }

  @Test
  void saysWhatWasLeftOut() {
    String text =
        text(
            with(
                new ScreeningSettings(false, 3.5, 0.05, 1.5, 31, 0.3),
                new AlignmentSettings(
                    AlignmentSettings.Model.NONE,
                    AlignmentSettings.Scope.PLANE,
                    AlignmentSettings.Reference.TYPICAL),
                new DriftSettings(Double.POSITIVE_INFINITY),
                new NoiseSettings(
                    NoiseSettings.Model.WHITE, 0, NoiseSettings.DegreesOfFreedom.RESIDUAL),
                RegionSource.NONE));
    for (String expected :
        List.of(
            "not judged by their power",
            "were not aligned",
            "No drift",
            "independent (ordinary least squares)",
            "Regions. None")) {
      assertTrue(text.contains(expected), expected + " in:\n" + text);
    }
    assertFalse(text.contains("Worsley"));
    assertFalse(text.contains("Iglewicz"));
  }

  private static Plan with(
      ScreeningSettings screening,
      AlignmentSettings alignment,
      DriftSettings drift,
      NoiseSettings noise,
      RegionSource regions) {
    Plan p = SampleReport.plan();
    return new Plan(
        p.fileName(),
        p.name(),
        p.variable(),
        p.frameIntervalSeconds(),
        screening,
        alignment,
        p.smoothingMillimetres(),
        p.mask(),
        p.scale(),
        p.kernel(),
        p.kernelDerivative(),
        p.stimuli(),
        drift,
        p.nuisance(),
        noise,
        p.contrasts(),
        p.inference(),
        regions,
        p.responses(),
        p.verdict());
  }

  @Test
  void numbersHaveNoNeedlessDigits() {
    assertEquals("0.05", Words.plain(0.05));
    assertEquals("120", Words.plain(120));
    assertEquals("0", Words.plain(-0.0));
    assertEquals("1000000", Words.plain(1e6));
    assertEquals("0.333333", Words.plain(1.0 / 3));
    assertEquals("–", Words.plain(Double.NaN));
  }

  @Test
  void becomesHtmlWithoutLettingMarkupThrough() {
    String html =
        MethodsHtml.of("# Methods\n\nA `b<c` & <i>.\n\n## References\n\n1. First.\n2. Second.\n");
    assertEquals(
        "<p>A <code>b&lt;c</code> &amp; &lt;i&gt;.</p>\n<h3>References</h3>\n"
            + "<ol><li>First.</li><li>Second.</li></ol>",
        html);
  }
}
