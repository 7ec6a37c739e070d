package nightjar.plan;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import nightjar.glm.Contrast;

/** Plan section {@code contrasts}. */
final class ContrastsSection {
  private static final Range WEIGHT = Range.of(-1e6, 1e6);
  private static final int MOST = 100;

  private ContrastsSection() {}

  static List<Contrast> read(Section top) {
    List<Section> sections = top.sections("contrasts");
    if (sections.isEmpty() || sections.size() > MOST) {
      throw top.refusal(
              "contrasts",
              sections.isEmpty() ? "the plan has no contrasts" : "the plan has too many contrasts")
          .found(sections.size())
          .expected("1 to " + MOST)
          .remedy("write contrasts: [{name: a_over_b, weights: {a: 1, b: -1}}]");
    }
    List<Contrast> contrasts = new ArrayList<>();
    for (Section s : sections) {
      Contrast c = contrast(s);
      if (contrasts.stream().anyMatch(o -> o.name().equals(c.name()))) {
        throw s.refusal("name", "two contrasts have the same name")
            .found(c.name())
            .remedy("rename one of them");
      }
      contrasts.add(c);
    }
    return contrasts;
  }

  private static Contrast contrast(Section s) {
    s.lacks("any_of", "F contrasts", List.of());
    s.lacks("all_of", "conjunctions", List.of());
    Optional<String> given = s.text("name");
    Section weights = s.section("weights");
    // Before anything is missed, so that a mistyped key is what is told.
    s.done();
    String name =
        given.orElseThrow(
            () ->
                s.refusal("name", "a contrast has no name")
                    .remedy("add name: a_word, of letters, digits and _ - ."));
    Names.check(s, "name", name, "a contrast");
    Map<String, Double> map = new LinkedHashMap<>();
    boolean any = false;
    for (String column : List.copyOf(weights.names())) {
      double w = weights.number(column, WEIGHT);
      any |= w != 0;
      map.put(column, w);
    }
    if (!any) {
      throw s.refusal("weights", "the contrast " + name + " has no weight other than 0")
          .remedy("write weights: {stimulus: 1, other: -1}");
    }
    return new Contrast(name, map);
  }
}
