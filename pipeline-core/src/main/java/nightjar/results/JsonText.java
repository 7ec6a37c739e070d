package nightjar.results;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import com.fasterxml.jackson.databind.ObjectMapper;
import org.jspecify.annotations.Nullable;

/** Maps, lists and plain values as indented JSON with LF line ends, keys in the maps' order. */
final class JsonText {
  private static final ObjectMapper MAPPER = new ObjectMapper();

  private JsonText() {}

  static String of(Object value) {
    DefaultIndenter indenter = new DefaultIndenter("  ", "\n");
    DefaultPrettyPrinter printer =
        new DefaultPrettyPrinter().withObjectIndenter(indenter).withArrayIndenter(indenter);
    try {
      return MAPPER.writer(printer).writeValueAsString(value) + "\n";
    } catch (JsonProcessingException e) {
      throw new IllegalStateException(e);
    }
  }

  /** JSON has no NaN: a missing number is null. */
  static @Nullable Double number(double value) {
    return Double.isNaN(value) || Double.isInfinite(value) ? null : value;
  }
}
