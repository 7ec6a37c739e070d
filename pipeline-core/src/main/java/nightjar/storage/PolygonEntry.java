package nightjar.storage;

import com.fasterxml.jackson.databind.JsonNode;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Pattern;
import nightjar.recording.Grid;
import nightjar.refusal.NearestName;
import nightjar.refusal.RefusedInput;

/**
 * One entry of a list of polygons.
 *
 * @param name of its region
 * @param plane from 0
 * @param polygon its outline
 */
record PolygonEntry(String name, int plane, Polygon polygon) {
  private static final List<String> KEYS = List.of("name", "plane", "points");
  private static final Pattern NAME = Pattern.compile("[A-Za-z0-9_.-]{1,64}");

  /** Checks and takes over entry {@code number} (from 0) of a file. */
  static PolygonEntry of(Path file, int number, JsonNode entry, Grid grid) {
    return new Reader(file, number, entry).entry(grid.planes().size());
  }

  /** Begins a refusal that names the file and the polygon. */
  static RefusedInput refusal(Path file, int number, String what) {
    return WholeText.refusal(file, what).at("polygon " + (number + 1));
  }

  private record Reader(Path file, int number, JsonNode entry) {
    PolygonEntry entry(int planes) {
      if (!entry.isObject()) {
        throw refusal("the entry is not a polygon")
            .found(shown(entry))
            .expected("{\"name\": ..., \"plane\": ..., \"points\": ...}")
            .remedy("write it in that form");
      }
      entry.fieldNames().forEachRemaining(this::checkKey);
      return new PolygonEntry(name(), plane(planes), polygon());
    }

    private void checkKey(String key) {
      if (!KEYS.contains(key)) {
        throw refusal("there is an unknown key")
            .found(WholeText.shown(key))
            .expected(String.join(", ", KEYS))
            .remedy(
                NearestName.of(key, KEYS)
                    .map(n -> "rename it, did you mean " + n)
                    .orElse("delete it"));
      }
    }

    private String name() {
      JsonNode name = required("name");
      if (!name.isTextual() || !NAME.matcher(name.textValue()).matches()) {
        throw refusal("the name of the region is not allowed")
            .found(shown(name))
            .expected("1 to 64 of the characters A-Z, a-z, 0-9, _, - and .")
            .remedy("rename the region");
      }
      return name.textValue();
    }

    private int plane(int planes) {
      JsonNode plane = entry.get("plane");
      if (plane == null && planes == 1) {
        return 0;
      }
      JsonNode given = required("plane");
      boolean inRange =
          given.isIntegralNumber()
              && given.canConvertToInt()
              && given.intValue() >= 0
              && given.intValue() < planes;
      if (!inRange) {
        throw refusal("the recording does not have this plane")
            .found(shown(given))
            .expected(planes == 1 ? "0" : "0 to " + (planes - 1))
            .remedy("count the planes from 0");
      }
      return given.intValue();
    }

    private Polygon polygon() {
      JsonNode points = required("points");
      if (!points.isArray() || points.size() < 3) {
        throw refusal("the polygon has too few points")
            .found(points.isArray() ? points.size() : shown(points))
            .expected("at least 3 points [lateral, depth] in mm")
            .remedy("draw the polygon again");
      }
      double[] lateral = new double[points.size()];
      double[] depth = new double[points.size()];
      for (int i = 0; i < points.size(); i++) {
        JsonNode point = points.get(i);
        boolean isPair = point.isArray() && point.size() == 2;
        lateral[i] = isPair ? coordinate(point.get(0)) : Double.NaN;
        depth[i] = isPair ? coordinate(point.get(1)) : Double.NaN;
        if (!Double.isFinite(lateral[i]) || !Double.isFinite(depth[i])) {
          throw refusal("point " + (i + 1) + " is not a pair of finite numbers")
              .found(shown(point))
              .expected("[lateral, depth] in mm")
              .remedy("write two numbers in [ ]");
        }
      }
      return new Polygon(lateral, depth);
    }

    private static double coordinate(JsonNode node) {
      return node.isNumber() ? node.doubleValue() : Double.NaN;
    }

    private JsonNode required(String key) {
      JsonNode value = entry.get(key);
      if (value == null) {
        throw refusal("the key " + key + " is missing")
            .found(shown(entry))
            .remedy("add \"" + key + "\"");
      }
      return value;
    }

    private RefusedInput refusal(String what) {
      return PolygonEntry.refusal(file, number, what);
    }

    private static String shown(JsonNode node) {
      return WholeText.shown(node.toString());
    }
  }
}
