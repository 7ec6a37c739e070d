package nightjar.analysis;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import nightjar.recording.Axis;
import nightjar.recording.FrameTimes;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.Region;
import nightjar.recording.RegionLabels;
import nightjar.storage.RecordingFile;

/** What a recording says of itself before its frames are read. */
final class RecordingFacts {
  private RecordingFacts() {}

  static Map<String, Object> of(RecordingFile r) {
    Map<String, Object> m = new LinkedHashMap<>();
    m.put("file", r.fileName());
    m.put("format", r.formatName());
    m.put("variable", r.variableName());
    m.put("value_type", r.valueType());
    grid(m, r.grid());
    times(m, r.times());
    if (r.hasPlaneTimeOffsets()) {
      List<Double> offsets = new ArrayList<>();
      for (double s : r.planeTimeOffsetsSeconds()) {
        offsets.add(s);
      }
      m.put("plane_time_offsets_s", offsets);
    }
    Optional<Mask> mask = r.brainMask();
    mask.ifPresent(x -> m.put("brain_mask_voxels", x.count()));
    m.put("regions", voxels(r.labels().orElse(RegionLabels.NONE)));
    m.put("attributes", r.metadata().attributes());
    return m;
  }

  private static void grid(Map<String, Object> m, Grid g) {
    if (g.hasPlaneAxis()) {
      m.put("planes", g.planes().size());
      m.put("plane_spacing_mm", rounded(g.planes()));
    }
    m.put("depths", g.depths().size());
    m.put("depth_spacing_mm", rounded(g.depths()));
    m.put("laterals", g.laterals().size());
    m.put("lateral_spacing_mm", rounded(g.laterals()));
  }

  private static void times(Map<String, Object> m, FrameTimes times) {
    int last = times.size() - 1;
    m.put("frames", times.size());
    m.put("interval_s", rounded(times.intervalSeconds()));
    m.put("first_frame_s", rounded(times.at(0)));
    m.put("last_frame_s", rounded(times.at(last)));
    m.put("duration_s", rounded(times.at(last) - times.at(0) + times.intervalSeconds()));
    m.put("missing_frames", times.gridPosition(last) - last);
    m.put("gaps", times.segments() - 1);
  }

  /** Voxels of each region by name. */
  static Map<String, Integer> voxels(RegionLabels labels) {
    Map<String, Integer> m = new LinkedHashMap<>();
    for (Region region : labels.regions()) {
      m.put(region.name(), region.voxels().count());
    }
    return m;
  }

  private static double rounded(Axis axis) {
    return rounded(axis.spacingMillimetres());
  }

  /** Nine significant digits: enough for every clock and ruler, free of float noise. */
  static double rounded(double x) {
    return new java.math.BigDecimal(x).round(new java.math.MathContext(9)).doubleValue();
  }
}
