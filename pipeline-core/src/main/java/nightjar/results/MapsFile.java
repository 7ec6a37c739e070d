package nightjar.results;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.function.IntFunction;
import nightjar.recording.GridVariable;

/**
 * {@code maps.nc}: the maps on the recording's grid. Values outside the mask are missing, but for
 * {@code mask} and {@code mean_power}, which cover the field.
 */
public final class MapsFile {
  /** Name in the result folder. */
  public static final String NAME = "maps.nc";

  private static final List<String> SPACE = List.of("plane", "depth", "lateral");
  private static final List<String> CONTRASTS = List.of("contrast", "plane", "depth", "lateral");
  private static final List<String> STIMULI = List.of("stimulus", "plane", "depth", "lateral");

  private final MapFindings maps;
  private final List<GridVariable> variables = new ArrayList<>();

  private MapsFile(MapFindings maps) {
    this.maps = maps;
  }

  /** The file's own dimensions. */
  static Map<String, Integer> dimensions(MapFindings maps) {
    Map<String, Integer> d = new LinkedHashMap<>();
    d.put("contrast", maps.model().contrasts().size());
    d.put("stimulus", maps.model().stimuli().size());
    return d;
  }

  /** The file's variables in order. */
  static List<GridVariable> variables(MapFindings maps) {
    MapsFile f = new MapsFile(maps);
    f.names();
    f.voxels();
    f.contrasts();
    return List.copyOf(f.variables);
  }

  /** The file's global attributes. */
  static Map<String, Object> attributes(Provenance from) {
    Map<String, Object> a = new LinkedHashMap<>();
    a.put("Conventions", "CF-1.8");
    a.put("title", "Stimulus contrasts of one session");
    a.put("source", "Nightjar " + from.version());
    a.put("plan", from.planName());
    for (InputFile f : from.inputs()) {
      a.put(f.role() + "_file", f.name());
      a.put(f.role() + "_sha256", f.sha256());
    }
    from.metadata().attributes().forEach(a::putIfAbsent);
    return a;
  }

  private void names() {
    List<String> contrasts = maps.model().contrasts().stream().map(c -> c.name()).toList();
    add("contrast_name", List.of("contrast"), contrasts, Map.of());
    add(
        "kind",
        List.of("contrast"),
        contrasts.stream().map(c -> "t").toList(),
        Map.of("long_name", "kind of contrast"));
    add("stimulus_name", List.of("stimulus"), maps.model().stimuli(), Map.of());
  }

  private void voxels() {
    byte[] mask = new byte[maps.order().gridVoxels()];
    float[] baseline = new float[maps.order().size()];
    float[] tsnr = new float[baseline.length];
    for (int k = 0; k < baseline.length; k++) {
      mask[maps.order().voxel(k)] = 1;
      baseline[k] = (float) maps.series().baseline(k);
      tsnr[k] = (float) (100 / maps.fit().residualSd()[k]);
    }
    add(
        "mean_power",
        SPACE,
        maps.meanPower().values(),
        described("mean power Doppler over kept frames", "1"));
    add("mask", SPACE, mask, described("1 = analysed", "1"));
    add("baseline", SPACE, spread(baseline), described("baseline power of the scale", "1"));
    add(
        "tsnr",
        SPACE,
        spread(tsnr),
        described("temporal signal-to-noise ratio: baseline over residual sd", "1"));
    add(
        "ar1",
        SPACE,
        spread(floats(maps.fit().autocorrelation())),
        described("AR(1) coefficient as used, per frame interval", "1"));
    add(
        "residual_sd",
        SPACE,
        spread(floats(maps.fit().residualSd())),
        described("standard deviation of ordinary residuals", "percent"));
    add(
        "beta",
        STIMULI,
        stacked(maps.model().stimuli().size(), e -> maps.fit().estimate(e)),
        described("coefficient of the stimulus column", "percent"));
  }

  private void contrasts() {
    int n = maps.model().contrasts().size();
    add(
        "effect",
        CONTRASTS,
        stacked(n, maps.fit()::effect),
        described("effect of the contrast", "percent"));
    add(
        "effect_se",
        CONTRASTS,
        stacked(n, maps.fit()::standardError),
        described("standard error of the effect", "percent"));
    Map<String, Object> t = described("effect over its standard error", "1");
    t.put("degrees_of_freedom", (double) maps.model().residualDegreesOfFreedom());
    add("t", CONTRASTS, stacked(n, maps.fit()::t), t);
    add(
        "df",
        CONTRASTS,
        stacked(n, maps.fit()::degreesOfFreedom),
        described("effective degrees of freedom, used by p", "1"));
    add("p", CONTRASTS, stackedDoubles(n, maps.fit()::p), described("two-sided p", "1"));
    Map<String, Object> q = described("p adjusted over the mask within the contrast", "1");
    q.put("method", maps.model().inference().adjustment().name().toLowerCase(Locale.ROOT));
    add("q", CONTRASTS, stackedDoubles(n, maps.tests()::q), q);
  }

  private static Map<String, Object> described(String longName, String unit) {
    Map<String, Object> a = new LinkedHashMap<>();
    a.put("long_name", longName);
    a.put("units", unit);
    return a;
  }

  private void add(
      String name, List<String> dimensions, Object values, Map<String, Object> attributes) {
    variables.add(new GridVariable(name, dimensions, values, attributes));
  }

  private float[] spread(float[] values) {
    return maps.order().spread(values, Float.NaN);
  }

  private static float[] floats(double[] values) {
    float[] f = new float[values.length];
    for (int k = 0; k < f.length; k++) {
      f[k] = (float) values[k];
    }
    return f;
  }

  private float[] stacked(int n, IntFunction<double[]> layer) {
    int voxels = maps.order().gridVoxels();
    float[] all = new float[n * voxels];
    for (int i = 0; i < n; i++) {
      System.arraycopy(spread(floats(layer.apply(i))), 0, all, i * voxels, voxels);
    }
    return all;
  }

  private double[] stackedDoubles(int n, IntFunction<double[]> layer) {
    int voxels = maps.order().gridVoxels();
    double[] all = new double[n * voxels];
    for (int i = 0; i < n; i++) {
      System.arraycopy(maps.order().spread(layer.apply(i), Double.NaN), 0, all, i * voxels, voxels);
    }
    return all;
  }
}
