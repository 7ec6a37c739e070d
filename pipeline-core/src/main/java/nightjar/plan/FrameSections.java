package nightjar.plan;

import java.util.List;
import nightjar.alignment.AlignmentSettings;
import nightjar.screening.ScreeningSettings;

/** Plan sections {@code screening} and {@code alignment}. */
final class FrameSections {
  private FrameSections() {}

  static ScreeningSettings screening(Section top) {
    Section s = top.section("screening");
    ScreeningSettings d = ScreeningSettings.DEFAULT;
    ScreeningSettings settings =
        new ScreeningSettings(
            s.flag("enabled", d.enabled()),
            s.number("z_limit", d.zLimit(), Range.above(0, 100)),
            s.number("min_power_deviation", d.minPowerDeviation(), Range.of(0, 10)),
            s.number("min_change_ratio", d.minChangeRatio(), Range.of(0, 100)),
            s.integer("window_frames", d.windowFrames(), Range.of(3, 9999)),
            s.number("max_displacement_mm", d.maxDisplacementMillimetres(), Range.above(0, 100)));
    if (settings.windowFrames() % 2 == 0) {
      throw s.refusal("window_frames", "screening.window_frames is even")
          .found(settings.windowFrames())
          .remedy("give an odd number");
    }
    s.done();
    return settings;
  }

  static AlignmentSettings alignment(Section top) {
    Section s = top.section("alignment");
    AlignmentSettings.Model model =
        switch (s.word("model", "rigid", List.of("none", "translation", "rigid"))) {
          case "none" -> AlignmentSettings.Model.NONE;
          case "translation" -> AlignmentSettings.Model.TRANSLATION;
          default -> AlignmentSettings.Model.RIGID;
        };
    AlignmentSettings.Scope scope =
        s.word("scope", "plane", List.of("plane", "volume")).equals("plane")
            ? AlignmentSettings.Scope.PLANE
            : AlignmentSettings.Scope.VOLUME;
    AlignmentSettings settings = new AlignmentSettings(model, scope, reference(s));
    s.done();
    return settings;
  }

  private static AlignmentSettings.Reference reference(Section s) {
    String text = s.text("reference").orElse("typical");
    if (text.equals("typical")) {
      return AlignmentSettings.Reference.TYPICAL;
    }
    if (text.equals("first")) {
      return AlignmentSettings.Reference.FIRST;
    }
    if (text.matches("[0-9]{1,8}")) {
      return new AlignmentSettings.Reference(Integer.parseInt(text));
    }
    throw s.refusal("reference", "alignment.reference is none of the words it can be")
        .found(Names.shown(text))
        .expected("typical, first or a frame's number from 0")
        .remedy("take one of these");
  }
}
