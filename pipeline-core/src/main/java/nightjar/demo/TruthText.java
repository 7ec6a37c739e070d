package nightjar.demo;

import java.util.Arrays;
import java.util.List;
import java.util.function.ToDoubleFunction;
import java.util.stream.Collectors;
import nightjar.recording.RigidMotion;

/** The truth of a session as JSON, with fixed digits. */
final class TruthText {
  private TruthText() {}

  static String of(DemoSession session, DemoTruth truth) {
    List<String> lines =
        List.of(
            entry("session", DemoText.quoted(session.name())),
            entry("seed", Long.toString(session.seed())),
            entry("animal", DemoText.quoted(session.animal().name())),
            entry("cohort", DemoText.quoted(session.animal().cohort())),
            entry(
                "kernel",
                "{\"shape\": \"gamma\", \"peak_s\": %s, \"fwhm_s\": %s, \"area\": 1}"
                    .formatted(
                        DemoText.decimal(ResponseCurve.PEAK_SECONDS, 1),
                        DemoText.decimal(ResponseCurve.WIDTH_SECONDS, 1))),
            entry("plateau_percent", plateaus(session)),
            entry("rho", DemoText.decimal(session.rho(), 4)),
            entry("noise_percent", DemoText.decimal(100 / Math.sqrt(Speckle.SHAPE), 4)),
            entry("flashes", DemoText.array(truth.flashes(), f -> Integer.toString(f.frame()))),
            entry("shift_depth_mm", series(truth, RigidMotion::shiftDepthMillimetres)),
            entry("shift_lateral_mm", series(truth, RigidMotion::shiftLateralMillimetres)),
            entry("rotation_deg", series(truth, RigidMotion::rotationDegrees)));
    return lines.stream().collect(Collectors.joining(",\n", "{\n", "\n}\n"));
  }

  private static String entry(String key, String value) {
    return "  " + DemoText.quoted(key) + ": " + value;
  }

  private static String plateaus(DemoSession session) {
    return Arrays.stream(DemoStimulus.values())
        .map(s -> "    " + DemoText.quoted(s.label()) + ": " + plateaus(session, s))
        .collect(Collectors.joining(",\n", "{\n", "\n  }"));
  }

  private static String plateaus(DemoSession session, DemoStimulus stimulus) {
    return Arrays.stream(DemoRegion.values())
        .map(
            r ->
                DemoText.quoted(r.label())
                    + ": "
                    + DemoText.decimal(session.percent(r, stimulus), 4))
        .collect(Collectors.joining(", ", "{", "}"));
  }

  private static String series(DemoTruth truth, ToDoubleFunction<RigidMotion> part) {
    return DemoText.array(truth.motion(), m -> DemoText.decimal(part.applyAsDouble(m), 5));
  }
}
