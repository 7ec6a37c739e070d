package nightjar.storage;

import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.nio.file.Path;
import java.util.BitSet;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import nightjar.recording.Grid;
import nightjar.recording.Mask;
import nightjar.recording.Region;
import nightjar.recording.RegionLabels;
import nightjar.refusal.RefusedInput;

/**
 * Regions as a JSON list of polygons {@code {"name": ..., "plane": ..., "points": [[lateral_mm,
 * depth_mm], ...]}}; {@code plane} counts from 0 and may be left out where the recording has one.
 */
public final class PolygonFile {
  private static final int MOST_MEGABYTES = 10;
  private static final int MOST_POLYGONS = 2000;
  private static final JsonMapper JSON =
      JsonMapper.builder()
          .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
          .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
          .build();

  private final Path file;
  private final Grid grid;
  private final Map<String, BitSet> regions = new LinkedHashMap<>();
  private final Set<List<Object>> drawn = new HashSet<>();

  private PolygonFile(Path file, Grid grid) {
    this.file = file;
    this.grid = grid;
  }

  /**
   * Reads the regions: a voxel belongs to a region where its centre lies within the region's
   * polygon on that plane by the even-odd rule. Polygons of one name on several planes are one
   * region; regions may overlap, and some may have no voxel.
   *
   * @throws RefusedInput if the file cannot be read (missing, over 10 MB, not UTF-8, not JSON), is
   *     not such a list, has an unknown key, a name that is not 1 to 64 of the characters {@code
   *     A-Z a-z 0-9 _ - .}, a name twice on one plane, a plane that the recording does not have,
   *     fewer than three points, a coordinate that is no finite number, or no voxel in any polygon
   */
  public static RegionLabels read(Path file, Grid grid) {
    return new PolygonFile(file, grid).labels();
  }

  private RegionLabels labels() {
    JsonNode list = parsed(WholeText.read(file, MOST_MEGABYTES));
    if (!list.isArray() || list.isEmpty() || list.size() > MOST_POLYGONS) {
      throw WholeText.refusal(file, "this is not a list of polygons")
          .found(list.isArray() ? list.size() + " polygons" : WholeText.shown(list.toString()))
          .expected("1 to " + MOST_POLYGONS + " polygons in [ ]")
          .remedy("write [{\"name\": ..., \"plane\": ..., \"points\": [[lateral, depth], ...]}]");
    }
    for (int i = 0; i < list.size(); i++) {
      add(PolygonEntry.of(file, i, list.get(i), grid), i);
    }
    checkAnyVoxel(list);
    return new RegionLabels(
        regions.entrySet().stream()
            .map(r -> new Region(r.getKey(), Mask.of(grid.voxels(), r.getValue()::get)))
            .toList());
  }

  private void add(PolygonEntry entry, int number) {
    if (!drawn.add(List.of(entry.name(), entry.plane()))) {
      throw PolygonEntry.refusal(
              file, number, "the region is there twice on plane " + entry.plane())
          .found(entry.name())
          .remedy("rename or delete one of the two polygons");
    }
    BitSet voxels = regions.computeIfAbsent(entry.name(), n -> new BitSet(grid.voxels()));
    entry.polygon().fill(grid, entry.plane(), voxels);
  }

  private void checkAnyVoxel(JsonNode list) {
    if (regions.values().stream().allMatch(BitSet::isEmpty)) {
      throw WholeText.refusal(file, "no voxel lies within any polygon")
          .found("a first point " + WholeText.shown(list.get(0).get("points").get(0).toString()))
          .expected(
              "lateral "
                  + range(grid.laterals().toArray())
                  + ", depth "
                  + range(grid.depths().toArray()))
          .remedy("write the points as [lateral, depth] in mm on the axes of the recording");
    }
  }

  private static String range(double[] mm) {
    return AxisValues.shown(mm[0]) + " to " + AxisValues.shown(mm[mm.length - 1]) + " mm";
  }

  private JsonNode parsed(String text) {
    try {
      return JSON.readTree(text);
    } catch (JsonProcessingException e) {
      JsonLocation where = e.getLocation();
      int line = where == null ? 1 : Math.max(1, where.getLineNr());
      int column = where == null ? 1 : Math.max(1, where.getColumnNr());
      boolean twice = e.getOriginalMessage().startsWith("Duplicate");
      throw WholeText.refusal(file, twice ? "a key is there twice" : "the text is not valid JSON")
          .at("line " + line + ", column " + column)
          .found(WholeText.shown(text.lines().skip(line - 1).findFirst().orElse("").strip()))
          .remedy(twice ? "delete one of the two" : "correct the text there or just before");
    }
  }
}
