package nightjar.report;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import nightjar.alignment.AlignmentSettings;
import nightjar.design.DesignRequest;
import nightjar.design.DriftSettings;
import nightjar.design.GammaKernel;
import nightjar.design.ModelledStimulus;
import nightjar.design.NuisanceSettings;
import nightjar.design.SessionDesign;
import nightjar.glm.Contrast;
import nightjar.glm.NoiseSettings;
import nightjar.inference.InferenceSettings;
import nightjar.mask.MaskSettings;
import nightjar.mask.Scale;
import nightjar.plan.Plan;
import nightjar.recording.Axis;
import nightjar.recording.FrameMotion;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.NamedSeries;
import nightjar.recording.Region;
import nightjar.recording.RegionLabels;
import nightjar.recording.RigidMotion;
import nightjar.recording.Trial;
import nightjar.regions.RegionContrast;
import nightjar.regions.RegionSource;
import nightjar.regions.ResponseBin;
import nightjar.regions.ResponseSettings;
import nightjar.report.ContrastMap.ContrastSummary;
import nightjar.screening.ScreeningSettings;
import nightjar.verdict.Reason;
import nightjar.verdict.Verdict;
import nightjar.verdict.VerdictLimits;
import org.jspecify.annotations.Nullable;

/** Invented facts for the page: two blobs of response in a brain-shaped field. */
final class SampleReport {
  static final int FRAMES = 750;
  static final double INTERVAL = 0.4;

  private final SplittableRandom random = new SplittableRandom(20260301);
  final Grid grid;
  final KeptFrames kept;
  final List<ModelledStimulus> stimuli;

  SampleReport(int planes) {
    this.grid = grid(planes);
    double[] seconds =
        IntStream.range(0, FRAMES)
            .mapToDouble(t -> (t + 0.5) * INTERVAL + (t >= 400 ? 60 : 0))
            .toArray();
    FrameTimes times = FrameTimes.of(seconds);
    List<@Nullable String> reasons = new ArrayList<>(Collections.nCopies(FRAMES, null));
    for (int t : new int[] {50, 51, 52, 300, 555}) {
      reasons.set(t, t == 300 ? "power+displacement" : "power");
    }
    this.kept = new KeptFrames(times, reasons);
    this.stimuli =
        List.of(stimulus("left_puff", 10), stimulus("right_puff", 20), stimulus("sham_puff", 30));
  }

  private static Grid grid(int planes) {
    double[] p = IntStream.range(0, planes).mapToDouble(i -> -1.2 + 0.4 * i).toArray();
    double[] z = IntStream.range(0, 64).mapToDouble(i -> 1.5 + 0.11 * i).toArray();
    double[] x = IntStream.range(0, 96).mapToDouble(i -> -5.225 + 0.11 * i).toArray();
    return new Grid(Axis.of(p), Axis.of(z), Axis.of(x), planes > 1);
  }

  private static ModelledStimulus stimulus(String name, double first) {
    List<Trial> trials = new ArrayList<>();
    for (double onset = first; onset < 340; onset += 30) {
      trials.add(new Trial(name, onset, 2, null, Map.of(), 2));
    }
    return new ModelledStimulus(name, trials);
  }

  private double noise() {
    return random.nextDouble() + random.nextDouble() + random.nextDouble() - 1.5;
  }

  private boolean brain(int v) {
    double z = (grid.depthOf(v) - 30) / 28.0;
    double x = (grid.lateralOf(v) - 48) / 44.0;
    return z * z + x * x < 1;
  }

  private static double blob(double z, double x, double z0, double x0, double width) {
    double d = (z - z0) * (z - z0) + (x - x0) * (x - x0);
    return Math.exp(-d / (2 * width * width));
  }

  BrainMaps maps() {
    float[] power = new float[grid.voxels()];
    for (int v = 0; v < power.length; v++) {
      double vessel = blob(grid.depthOf(v) % 13, 0, 6, 0, 1.5) * 2;
      power[v] = (float) Math.exp((brain(v) ? 8 : 5) + vessel + 0.8 * noise());
    }
    return new BrainMaps(
        grid,
        Mask.of(grid.voxels(), this::brain),
        power,
        new RegionLabels(
            List.of(
                region("barrel_left", 20, 24),
                region("barrel_right", 20, 72),
                region("thalamus", 44, 48),
                new Region("quiet_cortex", Mask.of(grid.voxels(), v -> false)))),
        List.of(contrast("left_over_sham", 72, 24), contrast("right_over_sham", 24, 72)));
  }

  private Region region(String name, int z, int x) {
    return new Region(
        name,
        Mask.of(grid.voxels(), v -> Math.hypot(grid.depthOf(v) - z, grid.lateralOf(v) - x) < 7));
  }

  private ContrastMap contrast(String name, int rise, int fall) {
    int n = grid.voxels();
    float[] effect = new float[n];
    float[] t = new float[n];
    double[] q = new double[n];
    Arrays.fill(effect, Float.NaN);
    Arrays.fill(t, Float.NaN);
    Arrays.fill(q, Double.NaN);
    for (int v = 0; v < n; v++) {
      if (brain(v)) {
        int z = grid.depthOf(v);
        int x = grid.lateralOf(v);
        double e = 9 * blob(z, x, 20, rise, 6) - 5 * blob(z, x, 22, fall, 5) + 0.8 * noise();
        effect[v] = (float) e;
        t[v] = (float) (e / 0.55);
        q[v] = Math.min(1, 30 * Math.exp(-Math.abs(t[v]) * 1.6));
      }
    }
    int discovered = (int) Arrays.stream(q).filter(x -> x < 0.05).count();
    ContrastSummary summary =
        new ContrastSummary(
            name, discovered + 40, discovered, new ContrastMap.Peak(0, 3.7, 2.7, 17.2));
    return new ContrastMap(summary, effect, t, q);
  }

  ReportedRegions regions() {
    List<RegionContrast> rows = new ArrayList<>();
    for (String c : List.of("left_over_sham", "right_over_sham")) {
      rows.add(row("barrel_left", c, c.startsWith("left") ? 0.21 : 7.9, 0.4));
      rows.add(row("barrel_right", c, c.startsWith("left") ? 8.31 : -0.3, 0.5));
      rows.add(row("thalamus", c, 1.2, 0.6));
      double no = Double.NaN;
      rows.add(new RegionContrast("quiet_cortex", 0, c, no, no, no, no, no, no, no, no));
    }
    List<ResponseBin> bins = new ArrayList<>();
    List<NamedSeries> courses = new ArrayList<>();
    GammaKernel kernel = GammaKernel.of(2.1, 2.9);
    for (String r : List.of("barrel_left", "barrel_right", "thalamus")) {
      for (int s = 0; s < stimuli.size(); s++) {
        for (int j = -12; j <= 50; j++) {
          double mean = (2 - s) * 12 * kernel.at(j * INTERVAL) + 0.2 * noise();
          bins.add(new ResponseBin(r, stimuli.get(s).name(), j * INTERVAL, mean, 0.5, 11));
        }
      }
      double[] v = new double[FRAMES];
      for (int t = 0; t < FRAMES; t++) {
        v[t] = kept.isKept(t) ? 2 * noise() + 3 * Math.sin(t / 12.0) : Double.NaN;
      }
      courses.add(new NamedSeries(r, v));
    }
    return new ReportedRegions(rows, bins, courses);
  }

  private static RegionContrast row(String region, String contrast, double effect, double se) {
    double t = effect / se;
    double p = Math.min(1, 2 * Math.exp(-Math.abs(t) * 1.4));
    return new RegionContrast(
        region, 149, contrast, effect, se, effect - 2 * se, effect + 2 * se, t, 512.3, p, p);
  }

  ReportedFrames frames() {
    List<List<RigidMotion>> motions = new ArrayList<>();
    double[][] displacement = new double[FRAMES][grid.planes().size()];
    for (int t = 0; t < FRAMES; t++) {
      List<RigidMotion> units = new ArrayList<>();
      for (int p = 0; p < grid.planes().size(); p++) {
        double jerk = t > 295 && t < 303 ? 0.25 : 0;
        units.add(new RigidMotion(jerk + 0.01 * noise(), 0.01 * noise(), 0, 0.1 * noise(), 0, 0));
        displacement[t][p] = jerk + 0.01 * Math.abs(noise());
      }
      motions.add(units);
    }
    double[] power = IntStream.range(0, FRAMES).mapToDouble(t -> 8 + 0.01 * noise()).toArray();
    double[] change = IntStream.range(0, FRAMES).mapToDouble(t -> 0.2 + 0.01 * noise()).toArray();
    return new ReportedFrames(
        kept,
        new FrameMotion(false, motions, displacement),
        stimuli,
        List.of(new NamedSeries("log_power", power), new NamedSeries("change", change)));
  }

  SessionDesign design() {
    return SessionDesign.build(
        new DesignRequest(
            stimuli, GammaKernel.of(2.1, 2.9), false, DriftSettings.DEFAULT, true, List.of()),
        kept,
        new double[] {0});
  }

  static Plan plan() {
    Map<String, Double> weights = new LinkedHashMap<>();
    weights.put("left_puff", 1.0);
    weights.put("sham_puff", -1.0);
    return new Plan(
        "plan.yaml",
        "whisker-puff",
        null,
        null,
        ScreeningSettings.DEFAULT,
        AlignmentSettings.DEFAULT,
        0,
        MaskSettings.AUTO,
        Scale.PERCENT,
        GammaKernel.of(2.1, 2.9),
        false,
        List.of(),
        DriftSettings.DEFAULT,
        NuisanceSettings.DEFAULT,
        NoiseSettings.DEFAULT,
        List.of(new Contrast("left_over_sham", weights)),
        InferenceSettings.DEFAULT,
        RegionSource.RECORDING,
        ResponseSettings.DEFAULT,
        VerdictLimits.DEFAULT);
  }

  MethodsFacts methods(Plan plan) {
    return new MethodsFacts(
        plan,
        "0.1.0",
        grid,
        kept,
        new MethodsFacts.ModelSize(4021, 5, 11, 734),
        stimuli.stream()
            .map(s -> new MethodsFacts.StimulusFact(s.name(), s.trials().size(), 0.0667))
            .toList());
  }

  ReportContent content() {
    return new ReportContent(
        new ReportContent.Heading(
            "rat04_session2.nc",
            "whisker-puff",
            "0.1.0",
            List.of(
                new ReportContent.Input("recording", "rat04_session2.nc", "9f".repeat(32)),
                new ReportContent.Input("events", "rat04_session2_events.tsv", "3c".repeat(32)))),
        new Verdict(
            Verdict.Word.REVIEW,
            List.of(
                new Reason(
                    "tsnr", "The median temporal signal-to-noise ratio is 4.1, below 5.", 4.1, 5),
                new Reason("trials", "right_puff has 4 complete trials, fewer than 5.", 4, 5))),
        List.of("Drift explains 0.53 of the variance of left_puff, more than 0.5."),
        List.of(
            new ReportContent.Fact("frames", "750 (745 kept)"),
            new ReportContent.Fact("median interval", "0.4 s"),
            new ReportContent.Fact("median tSNR", "4.1")),
        maps(),
        regions(),
        frames(),
        design().ofPlane(0),
        0.05,
        MethodsText.of(methods(plan())));
  }
}
