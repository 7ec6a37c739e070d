package nightjar.report;

import java.util.List;
import nightjar.recording.NamedSeries;
import nightjar.regions.RegionContrast;
import nightjar.regions.ResponseBin;

/**
 * Results by region.
 *
 * @param contrasts one row a region and contrast
 * @param responses mean responses around the onset
 * @param timeCourses percent, drift and nuisance removed, one value a frame of the recording, NaN
 *     at rejected frames
 */
public record ReportedRegions(
    List<RegionContrast> contrasts, List<ResponseBin> responses, List<NamedSeries> timeCourses) {
  /** No regions. */
  public static final ReportedRegions NONE = new ReportedRegions(List.of(), List.of(), List.of());

  public ReportedRegions {
    contrasts = List.copyOf(contrasts);
    responses = List.copyOf(responses);
    timeCourses = List.copyOf(timeCourses);
  }

  /** The rows of one contrast. */
  public List<RegionContrast> of(String contrast) {
    return contrasts.stream().filter(r -> r.contrast().equals(contrast)).toList();
  }

  /** Regions that have responses, in order. */
  public List<String> responding() {
    return responses.stream().map(ResponseBin::region).distinct().toList();
  }
}
