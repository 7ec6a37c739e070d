package nightjar.storage;

import java.io.BufferedOutputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.GridVariable;

/**
 * Writes variables on a recording's grid as NetCDF of the 64-bit offset variant, readable by any
 * NetCDF tool; the same input gives the same bytes. Coordinates are in mm; NaN is written as {@code
 * _FillValue}, the format's own default.
 */
public final class GridFile {
  private static final double FILL = 9.969209968386869e36;
  private static final List<String> SPACE = List.of("plane", "depth", "lateral");

  private final Grid grid;
  private final List<GridVariable> variables;

  private GridFile(Grid grid, List<GridVariable> variables) {
    this.grid = grid;
    this.variables = variables;
  }

  /**
   * Writes a file, replacing one of the same name.
   *
   * @param dimensions sizes of the dimensions besides the spatial ones
   * @param variables their dimension {@code plane} is left out where the grid has no plane axis
   * @param attributes of the file: text or numbers
   */
  public static void write(
      Path file,
      Grid grid,
      Map<String, Integer> dimensions,
      List<GridVariable> variables,
      Map<String, Object> attributes) {
    GridFile f = new GridFile(grid, variables);
    ClassicDefinition definition = f.definition(dimensions, attributes);
    try (DataOutputStream out =
        new DataOutputStream(new BufferedOutputStream(Files.newOutputStream(file), 1 << 16))) {
      out.write(definition.bytes());
      f.data(out);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private ClassicDefinition definition(
      Map<String, Integer> dimensions, Map<String, Object> attributes) {
    ClassicDefinition d = new ClassicDefinition(attributes);
    dimensions.forEach(d::dimension);
    axes().forEach((name, axis) -> d.dimension(name, axis.size()));
    for (GridVariable v : variables) {
      if (v.values() instanceof List<?> names) {
        d.dimension(v.name() + "_length", longest(names));
      }
    }
    axes()
        .forEach(
            (name, axis) ->
                d.variable(
                    name, List.of(name), ClassicDefinition.Type.DOUBLE, Map.of("units", "mm")));
    for (GridVariable v : variables) {
      d.variable(v.name(), dimensions(v), type(v), attributes(v));
    }
    return d;
  }

  private Map<String, Axis> axes() {
    Map<String, Axis> axes = new LinkedHashMap<>();
    if (grid.hasPlaneAxis()) {
      axes.put("plane", grid.planes());
    }
    axes.put("depth", grid.depths());
    axes.put("lateral", grid.laterals());
    return axes;
  }

  private List<String> dimensions(GridVariable v) {
    List<String> names = new ArrayList<>(v.dimensions());
    if (!grid.hasPlaneAxis()) {
      names.remove(SPACE.get(0));
    }
    if (v.values() instanceof List) {
      names.add(v.name() + "_length");
    }
    return names;
  }

  private static int longest(List<?> names) {
    return names.stream().mapToInt(n -> utf8(n).length).max().orElse(1);
  }

  private static byte[] utf8(Object name) {
    return String.valueOf(name).getBytes(StandardCharsets.UTF_8);
  }

  private static ClassicDefinition.Type type(GridVariable v) {
    if (v.values() instanceof float[]) {
      return ClassicDefinition.Type.FLOAT;
    } else if (v.values() instanceof double[]) {
      return ClassicDefinition.Type.DOUBLE;
    } else if (v.values() instanceof int[]) {
      return ClassicDefinition.Type.INT;
    } else if (v.values() instanceof byte[]) {
      return ClassicDefinition.Type.BYTE;
    } else if (v.values() instanceof List) {
      return ClassicDefinition.Type.CHAR;
    }
    throw new IllegalArgumentException(v.name() + " holds " + v.values().getClass());
  }

  private static Map<String, Object> attributes(GridVariable v) {
    Map<String, Object> a = new LinkedHashMap<>(v.attributes());
    if (v.values() instanceof float[]) {
      a.put("_FillValue", (float) FILL);
    } else if (v.values() instanceof double[]) {
      a.put("_FillValue", FILL);
    }
    return a;
  }

  private void data(DataOutputStream out) throws IOException {
    for (Axis axis : axes().values()) {
      for (int i = 0; i < axis.size(); i++) {
        out.writeDouble(axis.at(i));
      }
    }
    for (GridVariable v : variables) {
      values(out, v);
    }
  }

  private static void values(DataOutputStream out, GridVariable v) throws IOException {
    if (v.values() instanceof float[] values) {
      for (float x : values) {
        out.writeFloat(Float.isNaN(x) ? (float) FILL : x);
      }
    } else if (v.values() instanceof double[] values) {
      for (double x : values) {
        out.writeDouble(Double.isNaN(x) ? FILL : x);
      }
    } else if (v.values() instanceof int[] values) {
      for (int x : values) {
        out.writeInt(x);
      }
    } else if (v.values() instanceof byte[] values) {
      padded(out, values);
    } else if (v.values() instanceof List<?> names) {
      int width = longest(names);
      byte[] all = new byte[names.size() * width];
      for (int i = 0; i < names.size(); i++) {
        byte[] text = utf8(names.get(i));
        System.arraycopy(text, 0, all, i * width, text.length);
      }
      padded(out, all);
    }
  }

  private static void padded(DataOutputStream out, byte[] bytes) throws IOException {
    out.write(bytes);
    out.write(new byte[(4 - bytes.length % 4) % 4]);
  }
}
