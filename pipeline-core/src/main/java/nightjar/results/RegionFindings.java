package nightjar.results;

import java.util.List;
import nightjar.recording.RegionLabels;
import nightjar.regions.EventLockedResponses;
import nightjar.regions.RegionContrast;
import nightjar.regions.RegionFits;

/**
 * What was found region by region.
 *
 * @param labels the session's regions in order
 * @param fits the model fitted to the regions that have voxels
 * @param contrasts region by region, contrast by contrast
 * @param responses event-locked
 */
public record RegionFindings(
    RegionLabels labels,
    RegionFits fits,
    List<RegionContrast> contrasts,
    EventLockedResponses responses) {}
