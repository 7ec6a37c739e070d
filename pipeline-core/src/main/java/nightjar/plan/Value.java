package nightjar.plan;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import nightjar.refusal.NearestName;
import nightjar.refusal.RefusedInput;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.ScalarNode;
import org.snakeyaml.engine.v2.nodes.SequenceNode;
import org.snakeyaml.engine.v2.nodes.Tag;

/**
 * One value of a plan with its place; read as what it should be, or refused there.
 *
 * @param fileName for messages
 * @param key the whole key, such as {@code screening.z_limit}
 */
record Value(String fileName, String key, Node node) {

  /** A refusal at this value. */
  RefusedInput refusal(String what) {
    return RefusedInput.because(what).in(fileName).at(PlanText.place(node));
  }

  private RefusedInput wrongType(String wanted) {
    return refusal(key + " has the wrong type")
        .found(shown())
        .expected(wanted)
        .remedy("give " + wanted);
  }

  /** The value in short, for messages. */
  String shown() {
    if (node instanceof ScalarNode s) {
      return s.getValue().isEmpty() ? "nothing" : Names.shown(s.getValue());
    }
    return node instanceof SequenceNode ? "a list" : "a map";
  }

  boolean isNull() {
    return has(Tag.NULL);
  }

  private boolean has(Tag tag) {
    return node instanceof ScalarNode && node.getTag().equals(tag);
  }

  double number(Range range) {
    double x = number();
    if (!range.holds(x)) {
      throw refusal(key + " is out of range")
          .found(Range.plain(x))
          .expected(range.words())
          .remedy("give a value in this range");
    }
    return x;
  }

  private double number() {
    if (!(node instanceof ScalarNode s) || !(has(Tag.INT) || has(Tag.FLOAT))) {
      throw wrongType("a number");
    }
    try {
      double x = Double.parseDouble(s.getValue());
      if (Double.isFinite(x)) {
        return x;
      }
    } catch (NumberFormatException e) {
      throw wrongType("a decimal number");
    }
    throw wrongType("a finite number");
  }

  int integer(Range range) {
    double x = number(range);
    if (x != Math.rint(x)) {
      throw refusal(key + " is no whole number").found(x).remedy("give a whole number");
    }
    return (int) x;
  }

  boolean flag() {
    if (node instanceof ScalarNode s && has(Tag.BOOL)) {
      return s.getValue().equalsIgnoreCase("true");
    }
    throw wrongType("true or false");
  }

  String text() {
    if (node instanceof ScalarNode s && !isNull() && !s.getValue().isBlank()) {
      return s.getValue();
    }
    throw wrongType("a word");
  }

  /** One of the given words. */
  String word(List<String> allowed) {
    String found = text();
    if (!allowed.contains(found)) {
      throw refusal(key + " is none of the words it can be")
          .found(Names.shown(found))
          .expected(String.join(", ", allowed))
          .remedy(
              NearestName.of(found, allowed)
                  .map(n -> "did you mean " + n)
                  .orElse("take one of these"));
    }
    return found;
  }

  Section section() {
    if (node instanceof MappingNode m) {
      return new Section(fileName, key, m);
    }
    throw wrongType("a map of keys");
  }

  /** A list's elements; each names itself by its number from 1 in messages. */
  List<Value> list() {
    if (!(node instanceof SequenceNode s)) {
      throw wrongType("a list");
    }
    List<Value> all = new ArrayList<>();
    for (Node element : s.getValue()) {
      all.add(new Value(fileName, key + "[" + (all.size() + 1) + "]", element));
    }
    return all;
  }

  /** The value in one spelling, so that 0.0 equals 0 and False equals false. */
  String plain() {
    if (node instanceof SequenceNode) {
      return list().stream().map(Value::plain).collect(Collectors.joining(", ", "[", "]"));
    }
    if (node instanceof MappingNode m) {
      return m.getValue().isEmpty() ? "{}" : "a map";
    }
    if (isNull()) {
      return "null";
    }
    String text = ((ScalarNode) node).getValue();
    if (has(Tag.BOOL)) {
      return text.toLowerCase(Locale.ROOT);
    }
    return has(Tag.INT) || has(Tag.FLOAT) ? plainNumber(text) : text;
  }

  private static String plainNumber(String text) {
    try {
      return Range.plain(Double.parseDouble(text));
    } catch (NumberFormatException e) {
      return text;
    }
  }
}
