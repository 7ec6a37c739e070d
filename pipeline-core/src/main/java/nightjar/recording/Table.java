package nightjar.recording;

import java.util.List;
import org.jspecify.annotations.Nullable;

/**
 * A neutral table for a result file.
 *
 * @param columns header
 * @param rows cells: String, Integer, Long, Double, Float, Boolean or null; null and NaN are
 *     written as empty fields, Boolean as 1 and 0
 */
public record Table(List<String> columns, List<List<@Nullable Object>> rows) {}
