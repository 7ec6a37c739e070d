package nightjar.plan;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import nightjar.refusal.RefusedInput;
import org.jspecify.annotations.Nullable;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.NodeTuple;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.SequenceNode;
import org.snakeyaml.engine.v2.nodes.Tag;

/**
 * One mapping of a plan. Keys are asked for one by one, each with its type, its range and its
 * default; {@link #done} refuses those that nobody asked for.
 */
final class Section {
  private final String fileName;
  private final String path;
  private final Map<String, Node> keys = new LinkedHashMap<>();
  private final Map<String, Node> values = new LinkedHashMap<>();
  private final Set<String> known = new TreeSet<>();
  private final String place;

  Section(String fileName, String path, MappingNode node) {
    this.fileName = fileName;
    this.path = path;
    this.place = PlanText.place(node);
    for (NodeTuple t : node.getValue()) {
      if (!(t.getKeyNode() instanceof ScalarNode key)) {
        throw refusal(t.getKeyNode(), "a key must be a word").remedy("write key: value");
      }
      if (values.put(key.getValue(), t.getValueNode()) != null) {
        throw refusal(key, "the key occurs twice").found(key.getValue()).remedy("keep one of them");
      }
      keys.put(key.getValue(), key);
    }
  }

  private Section(String fileName, String path, String place) {
    this.fileName = fileName;
    this.path = path;
    this.place = place;
  }

  /** A refusal at a node. */
  RefusedInput refusal(Node node, String what) {
    return RefusedInput.because(what).in(fileName).at(PlanText.place(node));
  }

  /** A refusal at the value of {@code key}, or at the section where it is absent. */
  RefusedInput refusal(String key, String what) {
    Node node = values.get(key);
    return RefusedInput.because(what).in(fileName).at(node == null ? place : PlanText.place(node));
  }

  private String full(String key) {
    return path.isEmpty() ? key : path + "." + key;
  }

  private @Nullable Node value(String key) {
    known.add(key);
    return values.get(key);
  }

  boolean has(String key) {
    known.add(key);
    return values.containsKey(key);
  }

  Set<String> names() {
    return values.keySet();
  }

  private static boolean isNull(@Nullable Node node) {
    return node instanceof ScalarNode s && s.getTag().equals(Tag.NULL);
  }

  /** Whether the key is there and null. */
  boolean isNull(String key) {
    return isNull(value(key));
  }

  private RefusedInput wrongType(String key, Node node, String wanted) {
    return refusal(node, full(key) + " has the wrong type")
        .found(shown(node))
        .expected(wanted)
        .remedy("give " + wanted);
  }

  private static String shown(Node node) {
    if (node instanceof ScalarNode s) {
      String v = s.getValue().replaceAll("\\p{Cntrl}", "?");
      return v.length() > 40 ? v.substring(0, 40) + "..." : v.isEmpty() ? "nothing" : v;
    }
    return node instanceof SequenceNode ? "a list" : "a map";
  }

  /** A number within the range, or its default. */
  double number(String key, double otherwise, Range range) {
    Node node = value(key);
    return node == null ? otherwise : range.check(this, full(key), node, number(key, node));
  }

  /** A number that must be there. */
  double number(String key, Range range) {
    Node node = value(key);
    if (node == null) {
      throw refusal(key, full(key) + " is missing").expected(range.words()).remedy("add it");
    }
    return range.check(this, full(key), node, number(key, node));
  }

  private double number(String key, Node node) {
    if (node instanceof ScalarNode s
        && (s.getTag().equals(Tag.INT) || s.getTag().equals(Tag.FLOAT))) {
      try {
        double x = Double.parseDouble(s.getValue());
        if (Double.isFinite(x)) {
          return x;
        }
      } catch (NumberFormatException e) {
        throw wrongType(key, node, "a decimal number");
      }
    }
    throw wrongType(key, node, "a number");
  }

  /** A whole number within the range, or its default. */
  int integer(String key, int otherwise, Range range) {
    double x = number(key, otherwise, range);
    if (x != Math.rint(x)) {
      throw refusal(key, full(key) + " is no whole number").found(x).remedy("give a whole number");
    }
    return (int) x;
  }

  boolean flag(String key, boolean otherwise) {
    Node node = value(key);
    if (node == null) {
      return otherwise;
    }
    if (node instanceof ScalarNode s && s.getTag().equals(Tag.BOOL)) {
      return s.getValue().equalsIgnoreCase("true");
    }
    throw wrongType(key, node, "true or false");
  }

  /** A text, or its default. */
  Optional<String> text(String key) {
    Node node = value(key);
    if (node == null || isNull(node)) {
      return Optional.empty();
    }
    return Optional.of(text(key, node));
  }

  private String text(String key, Node node) {
    if (node instanceof ScalarNode s && !s.getTag().equals(Tag.NULL) && !s.getValue().isBlank()) {
      return s.getValue();
    }
    throw wrongType(key, node, "a word");
  }

  /** One of the given words, or its default. */
  String word(String key, String otherwise, List<String> allowed) {
    Node node = value(key);
    if (node == null) {
      return otherwise;
    }
    String found = text(key, node);
    if (!allowed.contains(found)) {
      throw refusal(node, full(key) + " is none of the words it can be")
          .found(found)
          .expected(String.join(", ", allowed))
          .remedy(
              NearestName.of(found, allowed)
                  .map(n -> "did you mean " + n)
                  .orElse("take one of these"));
    }
    return found;
  }

  /** Whether the key is there and holds exactly this word. */
  boolean isWord(String key, String word) {
    return value(key) instanceof ScalarNode s && s.getValue().equals(word);
  }

  /** A mapping below; empty where the key is absent. */
  Section section(String key) {
    Node node = value(key);
    if (node == null) {
      return new Section(fileName, full(key), place);
    }
    if (node instanceof MappingNode m) {
      return new Section(fileName, full(key), m);
    }
    throw wrongType(key, node, "a map of keys");
  }

  /** A list's elements; empty where the key is absent. */
  List<Node> list(String key) {
    Node node = value(key);
    if (node == null) {
      return List.of();
    }
    if (node instanceof SequenceNode s) {
      return s.getValue();
    }
    throw wrongType(key, node, "a list");
  }

  /** A list of maps; each element names itself by its number in refusals. */
  List<Section> sections(String key) {
    List<Section> all = new ArrayList<>();
    for (Node node : list(key)) {
      if (!(node instanceof MappingNode m)) {
        throw wrongType(key, node, "a list of maps");
      }
      all.add(new Section(fileName, full(key) + "[" + (all.size() + 1) + "]", m));
    }
    return all;
  }

  /** A list of words out of the allowed ones. */
  List<String> words(String key, List<String> allowed) {
    List<String> found = new ArrayList<>();
    for (Node node : list(key)) {
      String w = text(key, node);
      if (!allowed.contains(w) || found.contains(w)) {
        throw refusal(node, full(key) + " holds an unknown or repeated word")
            .found(w)
            .expected("any of " + String.join(", ", allowed))
            .remedy("take these, each once");
      }
      found.add(w);
    }
    return found;
  }

  /** Two numbers in ascending order, or their defaults. */
  double[] pair(String key, double[] otherwise, Range range) {
    List<Node> nodes = list(key);
    if (!has(key)) {
      return otherwise;
    }
    if (nodes.size() != 2) {
      throw refusal(key, full(key) + " needs two numbers").remedy("give [from, to]");
    }
    double a = range.check(this, full(key), nodes.get(0), number(key, nodes.get(0)));
    double b = range.check(this, full(key), nodes.get(1), number(key, nodes.get(1)));
    if (!(a < b)) {
      throw refusal(key, full(key) + " is not ascending")
          .found(a + ", " + b)
          .remedy("give [from, to] with from below to");
    }
    return new double[] {a, b};
  }

  /** Refuses a key whose feature this version lacks, unless it holds what switches it off. */
  void lacks(String key, String feature, List<String> off) {
    Node node = value(key);
    if (node == null) {
      return;
    }
    boolean isOff =
        (node instanceof ScalarNode s
                && (off.contains(s.getValue()) || (isNull(s) && off.contains("null"))))
            || (node instanceof SequenceNode l && l.getValue().isEmpty() && off.contains("[]"))
            || (node instanceof MappingNode m && m.getValue().isEmpty() && off.contains("{}"));
    if (!isOff) {
      throw refusal(node, "this version does not have " + feature)
          .found(full(key) + ": " + shown(node))
          .remedy("leave " + full(key) + " out");
    }
  }

  /** Refuses keys that nobody asked for. */
  void done() {
    for (Map.Entry<String, Node> e : keys.entrySet()) {
      if (!known.contains(e.getKey())) {
        throw refusal(e.getValue(), "the key is unknown")
            .found(full(e.getKey()))
            .expected(known.stream().collect(Collectors.joining(", ")))
            .remedy(
                NearestName.of(e.getKey(), known)
                    .map(n -> "did you mean " + n)
                    .orElse("leave it out"));
      }
    }
  }
}
