package nightjar.storage;

import java.io.BufferedOutputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.recording.Axis;
import nightjar.recording.Grid;
import nightjar.recording.Region;

/**
 * Writes a recording frame by frame: NetCDF of the 64-bit offset variant, power packed to 16-bit
 * numbers. The file appears under its name when all frames are written, or not at all. Not
 * thread-safe.
 */
public final class RecordingWriter implements AutoCloseable {
  private static final short MISSING = Short.MIN_VALUE;

  private final Path file;
  private final Path unfinished;
  private final RecordingHeader header;
  private final DataOutputStream out;
  private int written;

  private RecordingWriter(
      Path file, Path unfinished, RecordingHeader header, DataOutputStream out) {
    this.file = file;
    this.unfinished = unfinished;
    this.header = header;
    this.out = out;
  }

  /** Begins a file; one of the same name is replaced in the end. */
  public static RecordingWriter create(Path file, RecordingHeader header) {
    Path unfinished = file.resolveSibling(file.getFileName() + ".part");
    try {
      DataOutputStream out =
          new DataOutputStream(
              new BufferedOutputStream(Files.newOutputStream(unfinished), 1 << 16));
      RecordingWriter writer = new RecordingWriter(file, unfinished, header, out);
      out.write(writer.definition().bytes());
      writer.coordinates();
      return writer;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private ClassicDefinition definition() {
    Grid grid = header.grid();
    Map<String, String> global = new LinkedHashMap<>();
    global.put("Conventions", "CF-1.11");
    global.putAll(header.metadata().attributes());
    ClassicDefinition d = new ClassicDefinition(global);
    d.dimension("time", header.times().size());
    List<String> space = new ArrayList<>();
    if (grid.hasPlaneAxis()) {
      d.dimension("plane", grid.planes().size());
      space.add("plane");
    }
    d.dimension("depth", grid.depths().size());
    d.dimension("lateral", grid.laterals().size());
    space.addAll(List.of("depth", "lateral"));
    d.variable("time", List.of("time"), ClassicDefinition.Type.DOUBLE, Map.of("units", "s"));
    for (String axis : space) {
      d.variable(axis, List.of(axis), ClassicDefinition.Type.DOUBLE, Map.of("units", "mm"));
    }
    if (isSwept()) {
      d.variable(
          "plane_time_offset",
          List.of("plane"),
          ClassicDefinition.Type.DOUBLE,
          Map.of("units", "s"));
    }
    if (hasRegions()) {
      d.variable("roi", space, ClassicDefinition.Type.BYTE, flags());
    }
    List<String> all = new ArrayList<>(List.of("time"));
    all.addAll(space);
    d.variable("power_doppler", all, ClassicDefinition.Type.SHORT, packing());
    return d;
  }

  private boolean isSwept() {
    return header.grid().hasPlaneAxis() && header.offsets().areSwept();
  }

  private boolean hasRegions() {
    return !header.regions().regions().isEmpty();
  }

  private Map<String, Object> flags() {
    List<Region> regions = header.regions().regions();
    byte[] values = new byte[regions.size()];
    for (int k = 0; k < values.length; k++) {
      values[k] = (byte) (k + 1);
    }
    Map<String, Object> flags = new LinkedHashMap<>();
    flags.put("flag_values", values);
    flags.put("flag_meanings", String.join(" ", regions.stream().map(Region::name).toList()));
    return flags;
  }

  private Map<String, Object> packing() {
    Map<String, Object> attributes = new LinkedHashMap<>();
    attributes.put("long_name", "power Doppler");
    attributes.put("units", "1");
    attributes.put("_FillValue", MISSING);
    attributes.put("scale_factor", header.packedStep());
    attributes.put("add_offset", 0.0);
    return attributes;
  }

  private void coordinates() throws IOException {
    Grid grid = header.grid();
    for (int t = 0; t < header.times().size(); t++) {
      out.writeDouble(header.times().at(t));
    }
    if (grid.hasPlaneAxis()) {
      write(grid.planes());
    }
    write(grid.depths());
    write(grid.laterals());
    if (isSwept()) {
      for (int p = 0; p < grid.planes().size(); p++) {
        out.writeDouble(header.offsets().seconds(p));
      }
    }
    if (hasRegions()) {
      out.write(labels());
    }
  }

  private void write(Axis axis) throws IOException {
    for (int i = 0; i < axis.size(); i++) {
      out.writeDouble(axis.at(i));
    }
  }

  private byte[] labels() {
    int voxels = header.grid().voxels();
    byte[] labels = new byte[(voxels + 3) / 4 * 4];
    List<Region> regions = header.regions().regions();
    for (int k = 0; k < regions.size(); k++) {
      for (int v = 0; v < voxels; v++) {
        if (regions.get(k).voxels().contains(v)) {
          labels[v] = (byte) (k + 1);
        }
      }
    }
    return labels;
  }

  /**
   * Writes the next frames.
   *
   * @param frames not modified, at least {@code count} frames {@code [t][p][z][x]}
   * @param count number of frames
   */
  public void write(float[] frames, int count) {
    if (written + count > header.times().size()) {
      throw new IllegalArgumentException(
          (written + count) + " frames for " + header.times().size() + " times");
    }
    int values = count * header.grid().voxels();
    byte[] packed = new byte[2 * values];
    for (int i = 0; i < values; i++) {
      double steps = Math.rint(frames[i] / header.packedStep());
      short s =
          Double.isNaN(steps)
              ? MISSING
              : (short) Math.max(-Short.MAX_VALUE, Math.min(Short.MAX_VALUE, steps));
      packed[2 * i] = (byte) (s >> 8);
      packed[2 * i + 1] = (byte) s;
    }
    try {
      out.write(packed);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    written += count;
  }

  /** Finishes the file, or takes it away where frames are missing. */
  @Override
  public void close() {
    try {
      if (written < header.times().size()) {
        out.close();
        Files.deleteIfExists(unfinished);
        return;
      }
      long bytes = 2L * written * header.grid().voxels();
      out.write(new byte[(int) ((4 - bytes % 4) % 4)]);
      out.close();
      Files.move(unfinished, file, StandardCopyOption.REPLACE_EXISTING);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
