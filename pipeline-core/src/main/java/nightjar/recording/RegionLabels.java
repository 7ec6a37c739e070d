package nightjar.recording;

import java.util.List;

/**
 * The named areas of a session, in the order of their source.
 *
 * @param regions names are unique
 */
public record RegionLabels(List<Region> regions) {
  /** No regions. */
  public static final RegionLabels NONE = new RegionLabels(List.of());

  public RegionLabels {
    regions = List.copyOf(regions);
    if (regions.stream().map(Region::name).distinct().count() != regions.size()) {
      throw new IllegalArgumentException("region names repeat");
    }
  }
}
