package nightjar.analysis;

import java.nio.file.Path;
import nightjar.plan.Plan;
import nightjar.recording.RegionLabels;
import nightjar.refusal.RefusedInput;
import nightjar.regions.RegionSource;
import nightjar.storage.LabelFile;
import nightjar.storage.PolygonFile;
import nightjar.storage.RecordingFile;
import org.jspecify.annotations.Nullable;

/** The regions that the plan asks for, from where it says. */
final class SessionRegions {
  private SessionRegions() {}

  static RegionLabels of(Plan plan, @Nullable Path file, RecordingFile recording) {
    boolean fromFile = plan.regions() == RegionSource.FILE || plan.regions() == RegionSource.DRAWN;
    if (file == null) {
      if (fromFile) {
        throw refusal(plan, "the plan takes regions from a file, and none was given")
            .remedy("give the file with --regions or set regions: {source: recording}");
      }
      return plan.regions() == RegionSource.RECORDING
          ? recording.labels().orElse(RegionLabels.NONE)
          : RegionLabels.NONE;
    }
    if (!fromFile) {
      throw refusal(plan, "a regions file was given, and the plan does not use one")
          .remedy(
              "set regions: {source: file} for labels or {source: drawn} for polygons, or leave"
                  + " --regions out");
    }
    return plan.regions() == RegionSource.FILE
        ? LabelFile.read(file, recording.grid(), recording.fileName())
        : PolygonFile.read(file, recording.grid());
  }

  private static RefusedInput refusal(Plan plan, String what) {
    return RefusedInput.because(what)
        .in(plan.fileName())
        .at("regions")
        .found("source: " + plan.regions().name().toLowerCase(java.util.Locale.ROOT));
  }
}
