package nightjar.plan;

import java.util.List;
import nightjar.design.DoubleGammaKernel;
import nightjar.design.GammaKernel;
import nightjar.design.Kernel;

/**
 * Plan section {@code kernel}.
 *
 * @param kernel response to a brief stimulus
 * @param derivative whether each stimulus gets a slope column
 */
record KernelSection(Kernel kernel, boolean derivative) {
  private static final double PEAK_SECONDS = 2.1;
  private static final double WIDTH_SECONDS = 2.9;
  private static final Range SECONDS = Range.above(0, 60);
  private static final List<String> UNDERSHOOT =
      List.of("undershoot_peak_s", "undershoot_fwhm_s", "undershoot_ratio");

  static KernelSection read(Section top) {
    Section s = top.section("kernel");
    s.lacks("bin_s", "the finite impulse response", List.of("null"));
    s.lacks("until_s", "the finite impulse response", List.of("null"));
    s.lacks("file", "kernels from a table", List.of("null"));
    String shape =
        s.word("shape", "gamma", List.of("gamma", "double_gamma", "finite_impulse", "table"));
    if (shape.equals("finite_impulse") || shape.equals("table")) {
      throw s.refusal("shape", "this version does not have the kernel shape")
          .found("kernel.shape: " + shape)
          .expected("gamma or double_gamma")
          .remedy("take one of these");
    }
    if (shape.equals("gamma")) {
      refuseUndershoot(s);
    }
    GammaKernel response =
        gamma(
            s,
            "peak_s",
            s.number("peak_s", PEAK_SECONDS, SECONDS),
            s.number("fwhm_s", WIDTH_SECONDS, SECONDS));
    Kernel kernel = response;
    if (shape.equals("double_gamma")) {
      GammaKernel undershoot =
          gamma(
              s,
              "undershoot_peak_s",
              s.number("undershoot_peak_s", SECONDS),
              s.number("undershoot_fwhm_s", SECONDS));
      kernel =
          new DoubleGammaKernel(
              response, undershoot, s.number("undershoot_ratio", Range.of(0, 0.99)));
    }
    boolean derivative = s.flag("derivative", false);
    s.done();
    return new KernelSection(kernel, derivative);
  }

  private static void refuseUndershoot(Section s) {
    for (String key : UNDERSHOOT) {
      if (s.has(key) && !s.isNull(key)) {
        throw s.refusal(key, "only the kernel double_gamma has an undershoot")
            .found("kernel." + key)
            .remedy("write shape: double_gamma or leave the key out");
      }
    }
  }

  private static GammaKernel gamma(Section s, String key, double peak, double width) {
    try {
      return GammaKernel.of(peak, width);
    } catch (IllegalArgumentException e) {
      throw s.refusal(key, "no gamma kernel has this peak and width")
          .found("peak " + peak + " s, width " + width + " s")
          .expected("a width of about 0.12 to 14 times the peak")
          .remedy("change one of them");
    }
  }
}
