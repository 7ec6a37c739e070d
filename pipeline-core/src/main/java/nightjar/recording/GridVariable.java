package nightjar.recording;

import java.util.List;
import java.util.Map;

/**
 * A variable of a NetCDF result: values over named dimensions, slowest first. Values are shared,
 * not copied.
 *
 * @param name variable name
 * @param dimensions names of its dimensions; the spatial ones are {@code plane, depth, lateral}
 * @param values float[], double[], int[], byte[] or a List of String (a fixed-width character
 *     variable); NaN is written as the fill value
 * @param attributes String, Number or double[]; in order
 */
public record GridVariable(
    String name, List<String> dimensions, Object values, Map<String, Object> attributes) {
  public GridVariable {
    dimensions = List.copyOf(dimensions);
  }
}
