package nightjar.plan;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import nightjar.refusal.NearestName;
import nightjar.refusal.RefusedInput;
import org.jspecify.annotations.Nullable;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;

/**
 * One mapping of a plan. Keys are asked for one by one, each with its type, its range and its
 * default; {@link #done} refuses those that nobody asked for.
 */
final class Section {
  private final String fileName;
  private final String path;
  private final String place;
  private final Map<String, Value> keys = new LinkedHashMap<>();
  private final Map<String, Value> values = new LinkedHashMap<>();
  private final Set<String> known = new TreeSet<>();

  Section(String fileName, String path, MappingNode node) {
    this(fileName, path, PlanText.place(node));
    for (NodeTuple t : node.getValue()) {
      Value key = new Value(fileName, path, t.getKeyNode());
      if (!(t.getKeyNode() instanceof ScalarNode s)) {
        throw key.refusal("a key must be a word").found(key.shown()).remedy("write key: value");
      }
      String name = s.getValue();
      if (values.put(name, new Value(fileName, full(name), t.getValueNode())) != null) {
        throw key.refusal("the key occurs twice").found(full(name)).remedy("keep one of them");
      }
      keys.put(name, key);
    }
  }

  /** An absent section: all its keys have their defaults. */
  private Section(String fileName, String path, String place) {
    this.fileName = fileName;
    this.path = path;
    this.place = place;
  }

  /** A refusal at the value of {@code key}, or at the section where it is absent. */
  RefusedInput refusal(String key, String what) {
    Value value = values.get(key);
    return value == null ? RefusedInput.because(what).in(fileName).at(place) : value.refusal(what);
  }

  private String full(String key) {
    return path.isEmpty() ? Names.shown(key) : path + "." + Names.shown(key);
  }

  private @Nullable Value value(String key) {
    known.add(key);
    return values.get(key);
  }

  boolean has(String key) {
    return value(key) != null;
  }

  Set<String> names() {
    return values.keySet();
  }

  /** Whether the key is there and null. */
  boolean isNull(String key) {
    Value value = value(key);
    return value != null && value.isNull();
  }

  /** A number within the range, or its default. */
  double number(String key, double otherwise, Range range) {
    Value value = value(key);
    return value == null ? otherwise : value.number(range);
  }

  /** A number that must be there. */
  double number(String key, Range range) {
    Value value = value(key);
    if (value == null) {
      throw refusal(key, full(key) + " is missing").expected(range.words()).remedy("add it");
    }
    return value.number(range);
  }

  /** A whole number within the range, or its default. */
  int integer(String key, int otherwise, Range range) {
    Value value = value(key);
    return value == null ? otherwise : value.integer(range);
  }

  boolean flag(String key, boolean otherwise) {
    Value value = value(key);
    return value == null ? otherwise : value.flag();
  }

  /** A text; empty where the key is absent or null. */
  Optional<String> text(String key) {
    Value value = value(key);
    return value == null || value.isNull() ? Optional.empty() : Optional.of(value.text());
  }

  /** One of the given words, or its default. */
  String word(String key, String otherwise, List<String> allowed) {
    Value value = value(key);
    return value == null ? otherwise : value.word(allowed);
  }

  /** Whether the key is there and holds exactly this word. */
  boolean isWord(String key, String word) {
    Value value = value(key);
    return value != null && value.node() instanceof ScalarNode s && s.getValue().equals(word);
  }

  /** A mapping below; empty where the key is absent. */
  Section section(String key) {
    Value value = value(key);
    return value == null ? new Section(fileName, full(key), place) : value.section();
  }

  private List<Value> list(String key) {
    Value value = value(key);
    return value == null ? List.of() : value.list();
  }

  /** A list of maps. */
  List<Section> sections(String key) {
    return list(key).stream().map(Value::section).toList();
  }

  /** A list of words out of the allowed ones. */
  List<String> words(String key, List<String> allowed) {
    List<String> found = new ArrayList<>();
    for (Value value : list(key)) {
      String word = value.word(allowed);
      if (found.contains(word)) {
        throw value.refusal(full(key) + " holds a word twice").found(word).remedy("give it once");
      }
      found.add(word);
    }
    return found;
  }

  /** Two numbers in ascending order, or their defaults. */
  double[] pair(String key, double[] otherwise, Range range) {
    if (!has(key)) {
      return otherwise;
    }
    List<Value> both = list(key);
    if (both.size() != 2) {
      throw refusal(key, full(key) + " needs two numbers")
          .found(both.size())
          .remedy("give [from, to]");
    }
    double from = both.get(0).number(range);
    double to = both.get(1).number(range);
    if (!(from < to)) {
      throw refusal(key, full(key) + " is not ascending")
          .found(Range.plain(from) + ", " + Range.plain(to))
          .remedy("give [from, to] with from below to");
    }
    return new double[] {from, to};
  }

  /** Refuses a key whose feature this version lacks, unless it holds what switches it off. */
  void lacks(String key, String feature, List<String> off) {
    Value value = value(key);
    if (value != null && !off.contains(value.plain())) {
      throw value
          .refusal("this version does not have " + feature)
          .found(full(key) + ": " + value.shown())
          .remedy("leave " + full(key) + " out");
    }
  }

  /** Refuses keys other than these, before any of them is read. */
  void only(List<String> keysToCome) {
    known.addAll(keysToCome);
    done();
  }

  /** Refuses keys that nobody asked for. */
  void done() {
    keys.forEach(
        (name, key) -> {
          if (!known.contains(name)) {
            throw key.refusal("the key is unknown")
                .found(full(name))
                .expected(String.join(", ", known))
                .remedy(
                    NearestName.of(name, known)
                        .map(n -> "did you mean " + n)
                        .orElse("leave it out"));
          }
        });
  }
}
