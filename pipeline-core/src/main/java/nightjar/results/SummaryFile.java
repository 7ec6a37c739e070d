package nightjar.results;

import static nightjar.results.JsonText.number;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.stream.Collectors;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.regions.RegionContrast;
import org.jspecify.annotations.Nullable;

/** {@code summary.json}: the session in short, for programs. */
public final class SummaryFile {
  /** Name in the result folder. */
  public static final String NAME = "summary.json";

  private static final double UNCORRECTED = 0.001;
  private static final double ADJUSTED = 0.05;

  private SummaryFile() {}

  /** The file's text. */
  static String text(Findings f) {
    return JsonText.of(map(f));
  }

  private static Map<String, @Nullable Object> map(Findings f) {
    Map<String, @Nullable Object> m = new LinkedHashMap<>();
    m.put("version", f.provenance().version());
    m.put("inputs", inputs(f.provenance()));
    m.put("plan", f.provenance().plan());
    m.put("attributes", f.provenance().metadata().attributes());
    m.put("grid", grid(f.provenance().grid(), f.maps()));
    m.put("frames", frames(f.frames().kept()));
    m.put("stimuli", stimuli(f.frames(), f.maps().model().stimuli()));
    m.put("verdict", verdict(f));
    m.put("warnings", warnings(f.warnings()));
    m.put("noise", noise(f.maps()));
    m.put("contrasts", contrasts(f.maps(), f.provenance().grid()));
    m.put("regions", regions(f.regions()));
    m.put("sham_check", null);
    return m;
  }

  private static Map<String, Object> inputs(Provenance p) {
    Map<String, Object> m = new LinkedHashMap<>();
    for (InputFile file : p.inputs()) {
      Map<String, Object> entry = new LinkedHashMap<>();
      entry.put("name", file.name());
      entry.put("sha256", file.sha256());
      m.put(file.role(), entry);
    }
    return m;
  }

  private static Map<String, Object> grid(Grid g, MapFindings maps) {
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("planes", g.planes().size());
    m.put("depths", g.depths().size());
    m.put("laterals", g.laterals().size());
    m.put("plane_spacing_mm", g.planes().spacingMillimetres());
    m.put("depth_spacing_mm", g.depths().spacingMillimetres());
    m.put("lateral_spacing_mm", g.laterals().spacingMillimetres());
    m.put("mask_voxels", maps.order().size());
    return m;
  }

  private static Map<String, Object> frames(KeptFrames kept) {
    Map<String, Integer> reasons = new TreeMap<>();
    for (int t = 0; t < kept.frames(); t++) {
      kept.reason(t).ifPresent(r -> reasons.merge(r, 1, Integer::sum));
    }
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("total", kept.frames());
    m.put("kept", kept.count());
    m.put("rejected", reasons);
    m.put("interval_s", kept.times().intervalSeconds());
    m.put("recorded_s", kept.times().recordedLengthSeconds());
    m.put("segments", kept.times().segments());
    return m;
  }

  /** Mean of each column over kept frames: how much an effect reads low (numerics section 5). */
  private static List<Map<String, Object>> stimuli(FrameFindings frames, List<String> names) {
    List<Map<String, Object>> list = new ArrayList<>();
    for (String name : names) {
      Map<String, Object> m = new LinkedHashMap<>();
      m.put("name", name);
      m.put("column_mean", ColumnMean.of(frames, name));
      list.add(m);
    }
    return list;
  }

  private static Map<String, Object> verdict(Findings f) {
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("word", f.verdict().word().text());
    m.put(
        "reasons",
        f.verdict().reasons().stream()
            .map(
                r -> {
                  Map<String, @Nullable Object> x = new LinkedHashMap<>();
                  x.put("code", r.code());
                  x.put("sentence", r.sentence());
                  x.put("value", number(r.value()));
                  x.put("limit", number(r.limit()));
                  return x;
                })
            .toList());
    return m;
  }

  private static List<Map<String, String>> warnings(List<Warning> warnings) {
    return warnings.stream()
        .map(
            w -> {
              Map<String, String> x = new LinkedHashMap<>();
              x.put("code", w.code());
              x.put("sentence", w.sentence());
              return x;
            })
        .collect(Collectors.toList());
  }

  private static Map<String, @Nullable Object> noise(MapFindings maps) {
    double sum = 0;
    int n = 0;
    for (double r : maps.fit().autocorrelation()) {
      if (!Double.isNaN(r)) {
        sum += r;
        n++;
      }
    }
    Map<String, @Nullable Object> m = new LinkedHashMap<>();
    m.put("mean_ar1", number(sum / n));
    m.put("residual_degrees_of_freedom", maps.model().residualDegreesOfFreedom());
    return m;
  }

  private static List<Map<String, @Nullable Object>> contrasts(MapFindings maps, Grid grid) {
    List<Map<String, @Nullable Object>> list = new ArrayList<>();
    for (int c = 0; c < maps.model().contrasts().size(); c++) {
      Map<String, @Nullable Object> counts = new LinkedHashMap<>();
      counts.put("p001", below(maps.fit().p(c), UNCORRECTED));
      counts.put("q05", below(maps.tests().q(c), ADJUSTED));
      counts.put("fwe05", null);
      Map<String, @Nullable Object> m = new LinkedHashMap<>();
      m.put("name", maps.model().contrasts().get(c).name());
      m.put("kind", "t");
      m.put("voxels", counts);
      m.put("peak", peak(maps, c, grid));
      list.add(m);
    }
    return list;
  }

  private static int below(double[] values, double level) {
    int n = 0;
    for (double v : values) {
      n += v < level ? 1 : 0;
    }
    return n;
  }

  private static @Nullable Map<String, @Nullable Object> peak(MapFindings maps, int c, Grid grid) {
    int k = MapPeak.of(maps.fit().t(c));
    if (k < 0) {
      return null;
    }
    int v = maps.order().voxel(k);
    Map<String, @Nullable Object> m = new LinkedHashMap<>();
    m.put("plane", grid.planeOf(v));
    m.put("depth_mm", grid.depths().at(grid.depthOf(v)));
    m.put("lateral_mm", grid.laterals().at(grid.lateralOf(v)));
    m.put("t", number(maps.fit().t(c)[k]));
    return m;
  }

  private static List<Map<String, Object>> regions(RegionFindings regions) {
    Map<String, List<RegionContrast>> byName = new LinkedHashMap<>();
    for (RegionContrast c : regions.contrasts()) {
      byName.computeIfAbsent(c.region(), name -> new ArrayList<>()).add(c);
    }
    List<Map<String, Object>> list = new ArrayList<>();
    byName.forEach(
        (name, contrasts) -> {
          Map<String, Object> m = new LinkedHashMap<>();
          m.put("name", name);
          m.put("voxels", contrasts.get(0).voxels());
          m.put("contrasts", contrasts.stream().map(SummaryFile::regionContrast).toList());
          list.add(m);
        });
    return list;
  }

  private static Map<String, @Nullable Object> regionContrast(RegionContrast c) {
    Map<String, @Nullable Object> m = new LinkedHashMap<>();
    m.put("name", c.contrast());
    m.put("effect_percent", number(c.effectPercent()));
    m.put("se_percent", number(c.standardErrorPercent()));
    m.put("t", number(c.t()));
    m.put("df", number(c.degreesOfFreedom()));
    m.put("p", number(c.p()));
    m.put("q", number(c.q()));
    return m;
  }
}
