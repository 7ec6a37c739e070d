package nightjar.plan;

import java.util.EnumSet;
import java.util.List;
import java.util.Locale;
import java.util.Set;
import nightjar.design.NuisanceSettings;
import nightjar.glm.NoiseSettings;

/** Plan sections {@code nuisance} and {@code noise}. */
final class ModelSections {
  private ModelSections() {}

  static NuisanceSettings nuisance(Section top) {
    Section s = top.section("nuisance");
    s.lacks("components", "components of a noise region", List.of("0"));
    s.lacks("noise_region", "other noise regions", List.of("outside_mask"));
    s.lacks("mask_mean", "the mask's mean as nuisance", List.of("false"));
    s.lacks("traces", "traces as nuisance", List.of("[]"));
    Set<NuisanceSettings.MotionColumns> motion =
        EnumSet.noneOf(NuisanceSettings.MotionColumns.class);
    for (String word : s.words("motion", List.of("position", "square", "difference"))) {
      motion.add(NuisanceSettings.MotionColumns.valueOf(word.toUpperCase(Locale.ROOT)));
    }
    NuisanceSettings settings =
        new NuisanceSettings(motion, s.flag("segments", NuisanceSettings.DEFAULT.segments()));
    s.done();
    return settings;
  }

  static NoiseSettings noise(Section top) {
    Section s = top.section("noise");
    String model =
        s.word("model", "ar1", List.of("white", "ar1", "ar2", "ar3", "ar4", "ar5", "ar6"));
    if (model.startsWith("ar") && !model.equals("ar1")) {
      throw s.refusal("model", "this version does not have the noise model")
          .found("noise.model: " + model)
          .expected("white or ar1")
          .remedy("take one of these");
    }
    NoiseSettings settings =
        new NoiseSettings(
            model.equals("white") ? NoiseSettings.Model.WHITE : NoiseSettings.Model.AR1,
            s.number("smoothing_mm", 0, Range.of(0, 10)),
            s.word("df", "effective", List.of("effective", "residual")).equals("effective")
                ? NoiseSettings.DegreesOfFreedom.EFFECTIVE
                : NoiseSettings.DegreesOfFreedom.RESIDUAL);
    s.done();
    return settings;
  }
}
