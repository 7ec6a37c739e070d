package nightjar.storage;

import java.io.IOException;
import java.nio.DoubleBuffer;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.stream.IntStream;
import ucar.ma2.Array;
import ucar.ma2.DataType;
import ucar.ma2.InvalidRangeException;
import ucar.nc2.Attribute;
import ucar.nc2.NetcdfFileWriter;
import ucar.nc2.Variable;

/**
 * Writes small recordings with the NetCDF library, whose writer shares no code with our reader.
 * Begins as a good recording of 24 frames of 5 x 3 voxels; a test then spoils it in one place.
 */
final class RecordingBuilder {
  static final int FRAMES = 24;
  static final int DEPTHS = 5;
  static final int LATERALS = 3;

  private record Column(DataType type, String dimensions, DoubleBuffer values) {}

  private final Map<String, Integer> dimensions = new LinkedHashMap<>();
  private final Map<String, Column> columns = new LinkedHashMap<>();
  private final Map<String, Map<String, Object>> attributes = new LinkedHashMap<>();

  RecordingBuilder() {
    dimension("time", FRAMES).dimension("depth", DEPTHS).dimension("lateral", LATERALS);
    variable("time", DataType.DOUBLE, "time", steps(FRAMES, 0.2, 0.4))
        .attribute("time", "units", "s");
    variable("depth", DataType.DOUBLE, "depth", steps(DEPTHS, 1, 0.1));
    variable("lateral", DataType.DOUBLE, "lateral", steps(LATERALS, -0.2, 0.2));
    attribute("depth", "units", "mm").attribute("lateral", "units", "mm");
    variable(
        "power_doppler",
        DataType.FLOAT,
        "time depth lateral",
        steps(FRAMES * DEPTHS * LATERALS, 100, 1));
  }

  static double[] steps(int n, double first, double step) {
    return IntStream.range(0, n).mapToDouble(i -> first + step * i).toArray();
  }

  RecordingBuilder dimension(String name, int length) {
    dimensions.put(name, length);
    return this;
  }

  RecordingBuilder variable(String name, DataType type, String dims, double... values) {
    columns.put(name, new Column(type, dims, DoubleBuffer.wrap(values)));
    return this;
  }

  /** All zero, of the size of its dimensions. */
  RecordingBuilder zeros(String name, DataType type, String dims) {
    int n = Arrays.stream(dims.split(" ")).mapToInt(dimensions::get).reduce(1, (a, b) -> a * b);
    return variable(name, type, dims, new double[n]);
  }

  RecordingBuilder without(String name) {
    columns.remove(name);
    return this;
  }

  RecordingBuilder renamed(String from, String to) {
    columns.put(to, Objects.requireNonNull(columns.remove(from)));
    return this;
  }

  RecordingBuilder value(String variable, int index, double value) {
    Objects.requireNonNull(columns.get(variable)).values().put(index, value);
    return this;
  }

  /** A String, a Number or an int[] (bytes); the variable "" is the whole file. */
  RecordingBuilder attribute(String variable, String name, Object value) {
    attributes.computeIfAbsent(variable, v -> new LinkedHashMap<>()).put(name, value);
    return this;
  }

  Path write(Path file) {
    try {
      NetcdfFileWriter w =
          NetcdfFileWriter.createNew(NetcdfFileWriter.Version.netcdf3, file.toString());
      dimensions.forEach((name, n) -> w.addDimension(null, name, n));
      Map<String, Variable> added = new LinkedHashMap<>();
      columns.forEach((n, c) -> added.put(n, w.addVariable(null, n, c.type(), c.dimensions())));
      for (Map.Entry<String, Map<String, Object>> of : attributes.entrySet()) {
        Variable v = added.get(of.getKey());
        for (Map.Entry<String, Object> a : of.getValue().entrySet()) {
          if (v != null) {
            v.addAttribute(attribute(a.getKey(), a.getValue()));
          } else if (of.getKey().isEmpty()) {
            w.addGroupAttribute(null, attribute(a.getKey(), a.getValue()));
          }
        }
      }
      w.create();
      for (Map.Entry<String, Column> e : columns.entrySet()) {
        Variable v = Objects.requireNonNull(added.get(e.getKey()));
        Array a = Array.factory(e.getValue().type(), v.getShape());
        for (int i = 0; i < e.getValue().values().limit(); i++) {
          a.setDouble(i, e.getValue().values().get(i));
        }
        w.write(v, a);
      }
      w.close();
      return file;
    } catch (IOException | InvalidRangeException e) {
      throw new IllegalStateException(e);
    }
  }

  private static Attribute attribute(String name, Object value) {
    if (value instanceof String s) {
      return new Attribute(name, s);
    }
    if (value instanceof Number n) {
      return new Attribute(name, n);
    }
    List<Byte> bytes = Arrays.stream((int[]) value).mapToObj(i -> (byte) i).toList();
    return new Attribute(name, bytes);
  }
}
