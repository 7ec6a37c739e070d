package nightjar.storage;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.lang.reflect.Array;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.GridVariable;

/**
 * Writes variables on a recording's grid as NetCDF of the 64-bit offset variant [NetCDF Classic
 * Format Specification, Unidata], readable by any NetCDF tool; the same input gives the same bytes.
 * Coordinates are in mm; NaN is written as {@code _FillValue}, the format's own default.
 */
public final class GridFile {
  /** The default fill value of doubles; rounded to a float, that of floats. */
  private static final double FILL = 9.969209968386869e36;

  private static final String PLANE = "plane";

  private final Grid grid;
  private final List<GridVariable> variables;

  private GridFile(Grid grid, List<GridVariable> variables) {
    this.grid = grid;
    this.variables = variables;
  }

  /**
   * Writes a file, replacing one of the same name.
   *
   * @param dimensions sizes of the dimensions besides the spatial ones, at least 1
   * @param variables their dimension {@code plane} is left out where the grid has no plane axis; a
   *     list of names gets a further dimension {@code <variable>_length}
   * @param attributes of the file: text, numbers or double[], stored in the map's order (that of
   *     {@code Map.of} changes from run to run)
   * @throws IllegalArgumentException if a variable's values are not as many as its dimensions say,
   *     it names an unknown dimension, or a name is there twice
   */
  public static void write(
      Path file,
      Grid grid,
      Map<String, Integer> dimensions,
      List<GridVariable> variables,
      Map<String, Object> attributes) {
    GridFile f = new GridFile(grid, variables);
    byte[] header = f.definition(dimensions, attributes).bytes();
    try (ValueWriter out = new ValueWriter(file)) {
      out.bytes(header);
      for (Axis axis : f.axes().values()) {
        out.doubles(axis.toArray(), FILL);
      }
      for (GridVariable v : variables) {
        write(v, out);
      }
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
        d.dimension(lengthName(v), width(names));
      }
    }
    axes()
        .keySet()
        .forEach(n -> d.variable(n, List.of(n), ClassicDefinition.Type.DOUBLE, axisAttributes(n)));
    for (GridVariable v : variables) {
      ClassicDefinition.Type type = type(v);
      checkLength(v, d);
      d.variable(v.name(), storedDimensions(v), type, storedAttributes(v));
    }
    return d;
  }

  private Map<String, Axis> axes() {
    Map<String, Axis> axes = new LinkedHashMap<>();
    if (grid.hasPlaneAxis()) {
      axes.put(PLANE, grid.planes());
    }
    axes.put("depth", grid.depths());
    axes.put("lateral", grid.laterals());
    return axes;
  }

  /** The letters of {@code axis} and the direction are those of the CF conventions. */
  private static Map<String, Object> axisAttributes(String name) {
    Map<String, Object> a = new LinkedHashMap<>();
    a.put("units", "mm");
    switch (name) {
      case PLANE -> a.put("axis", "Y");
      case "depth" -> {
        a.put("axis", "Z");
        a.put("positive", "down");
      }
      default -> a.put("axis", "X");
    }
    return a;
  }

  private List<String> dimensions(GridVariable v) {
    return v.dimensions().stream().filter(d -> grid.hasPlaneAxis() || !d.equals(PLANE)).toList();
  }

  private List<String> storedDimensions(GridVariable v) {
    List<String> names = new ArrayList<>(dimensions(v));
    if (v.values() instanceof List) {
      names.add(lengthName(v));
    }
    return names;
  }

  private static String lengthName(GridVariable v) {
    return v.name() + "_length";
  }

  private void checkLength(GridVariable v, ClassicDefinition d) {
    int length = v.values() instanceof List<?> names ? names.size() : Array.getLength(v.values());
    if (length != d.values(dimensions(v))) {
      throw new IllegalArgumentException(
          v.name() + " has " + length + " values over " + dimensions(v));
    }
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

  private static Map<String, Object> storedAttributes(GridVariable v) {
    Map<String, Object> a = new LinkedHashMap<>(v.attributes());
    if (v.values() instanceof float[]) {
      a.put("_FillValue", (float) FILL);
    } else if (v.values() instanceof double[]) {
      a.put("_FillValue", FILL);
    }
    return a;
  }

  private static void write(GridVariable v, ValueWriter out) throws IOException {
    if (v.values() instanceof float[] values) {
      out.floats(values, (float) FILL);
    } else if (v.values() instanceof double[] values) {
      out.doubles(values, FILL);
    } else if (v.values() instanceof int[] values) {
      out.ints(values);
    } else if (v.values() instanceof byte[] values) {
      out.bytes(values);
    } else if (v.values() instanceof List<?> names) {
      out.bytes(characters(names));
    }
  }

  /** Names of fixed width, filled up with zeros. */
  private static byte[] characters(List<?> names) {
    int width = width(names);
    byte[] all = new byte[names.size() * width];
    for (int i = 0; i < names.size(); i++) {
      byte[] text = utf8(names.get(i));
      System.arraycopy(text, 0, all, i * width, text.length);
    }
    return all;
  }

  private static int width(List<?> names) {
    return Math.max(1, names.stream().mapToInt(n -> utf8(n).length).max().orElse(1));
  }

  private static byte[] utf8(Object name) {
    return String.valueOf(name).getBytes(StandardCharsets.UTF_8);
  }
}
