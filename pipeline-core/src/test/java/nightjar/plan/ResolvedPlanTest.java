package nightjar.plan;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import nightjar.alignment.AlignmentSettings;
import nightjar.design.StimulusSettings;
import nightjar.inference.InferenceSettings;
import nightjar.mask.MaskSettings;
import nightjar.regions.RegionSource;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;

class ResolvedPlanTest {
  /** Names that YAML would take for something else unless they were quoted. */
  private static final List<String> NAMES =
      List.of("null", "Null", "TRUE", "false", "123", "1e5", "0x1F", "-", ".inf", "on", "a.b");

  static List<Long> seeds() {
    return new Random(7).longs(200).boxed().toList();
  }

  @ParameterizedTest
  @MethodSource("seeds")
  void yamlReadsBackToTheSamePlan(long seed) {
    Plan plan = PlanFile.parse(text(new Random(seed)), "p.yaml");
    List<String> names =
        plan.stimuli().stream().filter(s -> !s.ignored()).map(StimulusSettings::name).toList();
    String yaml = ResolvedPlan.toYaml(plan, names);
    assertEquals(plan, PlanFile.parse(yaml, "p.yaml"), () -> "seed " + seed + "\n" + yaml);
  }

  @Test
  void stimuliWithoutAnEntryGetOne() {
    Plan plan = Plans.with("stimuli: {b: {logged_as: B}, z: ignore}");
    String yaml = ResolvedPlan.toYaml(plan, List.of("b", "a"));
    assertEquals(
        List.of(
            new StimulusSettings("b", "B", false),
            new StimulusSettings("z", "z", true),
            new StimulusSettings("a", "a", false)),
        PlanFile.parse(yaml, "p.yaml").stimuli());
  }

  @Test
  void aPlanThatIsResolvedAlreadyStaysAsItIs() {
    Plan plan = Plans.with("drift: null\nalignment: {reference: 12}");
    String once = ResolvedPlan.toYaml(plan, List.of("a", "b"));
    assertEquals(once, ResolvedPlan.toYaml(PlanFile.parse(once, "q.yaml"), List.of("a", "b")));
  }

  private static String text(Random r) {
    StringBuilder t = new StringBuilder();
    t.append("name: '").append(pick(r, NAMES)).append("'\n");
    t.append("recording: {variable: '" + pick(r, NAMES) + "', frame_interval_s: ");
    t.append(r.nextBoolean() ? "null" : number(r, 0.01, 5)).append("}\n");
    t.append("screening: {enabled: ").append(r.nextBoolean());
    t.append(", z_limit: ").append(number(r, 1, 9));
    t.append(", min_power_deviation: ").append(number(r, 0, 1e-4));
    t.append(", window_frames: ").append(3 + 2 * r.nextInt(40)).append("}\n");
    t.append("alignment: {model: ").append(word(r, AlignmentSettings.Model.values()));
    t.append(", scope: ").append(word(r, AlignmentSettings.Scope.values()));
    t.append(", reference: ").append(pick(r, List.of("typical", "first", "7"))).append("}\n");
    t.append("smoothing: {fwhm_mm: ").append(number(r, 0, 1)).append("}\n");
    t.append("mask: {source: ").append(word(r, MaskSettings.values())).append("}\n");
    t.append("kernel: {peak_s: ").append(number(r, 1.5, 3));
    t.append(", fwhm_s: ").append(number(r, 1.5, 3));
    t.append(", derivative: ").append(r.nextBoolean());
    if (r.nextBoolean()) {
      t.append(", shape: double_gamma, undershoot_peak_s: ").append(number(r, 8, 12));
      t.append(", undershoot_fwhm_s: ").append(number(r, 4, 9));
      t.append(", undershoot_ratio: ").append(number(r, 0, 0.9));
    }
    t.append("}\n");
    stimuli(r, t);
    t.append("drift: {cutoff_s: ").append(r.nextBoolean() ? "null" : number(r, 50, 500));
    t.append("}\n");
    t.append("nuisance: {motion: ");
    t.append(pick(r, List.of("[]", "[square]", "[difference, position]")));
    t.append(", segments: ").append(r.nextBoolean()).append("}\n");
    t.append("noise: {model: ").append(pick(r, List.of("white", "ar1")));
    t.append(", df: ").append(pick(r, List.of("effective", "residual"))).append("}\n");
    t.append("inference: {method: ").append(word(r, InferenceSettings.Adjustment.values()));
    t.append(", level: ").append(number(r, 1e-5, 0.4)).append("}\n");
    t.append("regions: {source: ").append(word(r, RegionSource.values())).append("}\n");
    t.append("responses: {window_s: [").append(number(r, -5, 0)).append(", 1e1]}\n");
    t.append("verdict: {trials: ").append(r.nextInt(20));
    t.append(", sham_p001: ").append(number(r, 0, 1e-3)).append("}\n");
    return t.toString();
  }

  /** Some stimuli, an ignored one anywhere among them, and a contrast of the first. */
  private static void stimuli(Random r, StringBuilder t) {
    List<String> names = new ArrayList<>(NAMES);
    java.util.Collections.shuffle(names, r);
    t.append("stimuli:\n");
    int ignored = r.nextInt(5);
    for (int i = 0; i < 5; i++) {
      if (i == ignored) {
        t.append("  'left out': ignore\n");
        continue;
      }
      t.append("  '").append(names.get(i)).append("': {logged_as: '");
      t.append(pick(r, List.of("x: y ", "# ", "' '' ", "ignore ", "é ")).replace("'", "''"));
      t.append(i).append("'}\n");
    }
    t.append("contrasts:\n- {name: '").append(names.get(5)).append("', weights: {'");
    t.append(names.get(0)).append("': ").append(number(r, 1e-5, 2)).append("}}\n");
  }

  private static String number(Random r, double low, double high) {
    return Double.toString(low + (high - low) * r.nextDouble());
  }

  private static String word(Random r, Enum<?>[] values) {
    return values[r.nextInt(values.length)].name().toLowerCase(java.util.Locale.ROOT);
  }

  private static String pick(Random r, List<String> all) {
    return all.get(r.nextInt(all.size()));
  }
}
