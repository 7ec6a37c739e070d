package nightjar.glm;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;

/**
 * A weighted sum of columns of the design that is tested against zero.
 *
 * @param name unique within a plan
 * @param weights by column name, in the plan's order
 */
public record Contrast(String name, Map<String, Double> weights) {
  public Contrast {
    weights = Collections.unmodifiableMap(new LinkedHashMap<>(weights));
  }
}
