package nightjar.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import nightjar.design.DoubleGammaKernel;
import nightjar.design.GammaKernel;
import nightjar.design.Kernel;
import nightjar.design.NuisanceSettings;
import nightjar.design.StimulusSettings;
import nightjar.glm.NoiseSettings;
import nightjar.plan.Plan;
import nightjar.report.References.Published;

/** The linear model and its noise. */
final class ModelMethods {
  private final MethodsFacts facts;
  private final Plan plan;
  private final References references;

  ModelMethods(MethodsFacts facts, References references) {
    this.facts = facts;
    this.plan = facts.plan();
    this.references = references;
  }

  String text() {
    return "Model. One linear model holds stimuli, drift and nuisance together "
        + references.cite(Published.LINDQUIST)
        + ". "
        + stimuli()
        + kernel(plan.kernel())
        + (plan.kernelDerivative() ? " Its time derivative is a second column a stimulus." : "")
        + drift()
        + nuisance()
        + size()
        + "\n\n"
        + noise();
  }

  private String stimuli() {
    String modelled =
        facts.stimuli().stream()
            .map(s -> Words.name(s.name()) + " (" + Words.count(s.trials(), "trial") + ")")
            .collect(Collectors.joining(", ", "Stimuli: ", "."));
    String renamed =
        plan.stimuli().stream()
            .filter(s -> !s.ignored() && !s.loggedAs().equals(s.name()))
            .map(s -> Words.name(s.name()) + " was logged as " + Words.name(s.loggedAs()) + ".")
            .collect(Collectors.joining(" "));
    List<String> ignored =
        plan.stimuli().stream()
            .filter(StimulusSettings::ignored)
            .map(s -> Words.name(s.loggedAs()))
            .toList();
    return modelled
        + (renamed.isEmpty() ? "" : " " + renamed)
        + (ignored.isEmpty() ? "" : " Left out of the model: " + Words.list(ignored) + ".")
        + " Each trial was convolved in closed form with ";
  }

  private String kernel(Kernel kernel) {
    if (kernel instanceof GammaKernel g) {
      return "a gamma kernel of unit area "
          + references.cite(Published.BOYNTON)
          + " that peaks at "
          + shape(g)
          + ".";
    }
    if (kernel instanceof DoubleGammaKernel d) {
      return "a kernel of unit area made of two gamma densities "
          + references.cite(Published.GLOVER)
          + ": the response peaks at "
          + shape(d.response())
          + ", the undershoot at "
          + shape(d.undershoot())
          + ", ratio "
          + Words.plain(d.ratio())
          + ".";
    }
    return "a kernel of unit area that peaks at "
        + Words.plain(kernel.peakSeconds())
        + " s with a full width at half maximum of "
        + Words.plain(kernel.widthSeconds())
        + " s.";
  }

  private static String shape(GammaKernel g) {
    return Words.plain(g.peakSeconds())
        + " s with a full width at half maximum of "
        + Words.plain(g.widthSeconds())
        + " s";
  }

  private String drift() {
    double cutoff = plan.drift().cutoffSeconds();
    return Double.isInfinite(cutoff)
        ? " No drift was modelled."
        : " Drift: "
            + Words.count(facts.model().driftColumns(), "cosine")
            + " over recorded time (cut-off "
            + Words.plain(cutoff)
            + " s).";
  }

  private String nuisance() {
    NuisanceSettings n = plan.nuisance();
    List<String> parts = new ArrayList<>();
    n.motion().stream()
        .sorted()
        .forEach(m -> parts.add("motion " + m.name().toLowerCase(Locale.ROOT)));
    if (n.segments()) {
      parts.add("a step for each segment after the first");
    }
    return parts.isEmpty()
        ? " No nuisance columns."
        : " Nuisance columns: " + Words.list(parts) + ".";
  }

  private String size() {
    MethodsFacts.ModelSize m = facts.model();
    return " The matrix has rank "
        + m.rank()
        + ", which leaves "
        + m.residualDegreesOfFreedom()
        + " residual degrees of freedom (frames kept minus rank).";
  }

  private String noise() {
    NoiseSettings noise = plan.noise();
    if (noise.model() == NoiseSettings.Model.WHITE) {
      return "Noise. Frames were taken as independent (ordinary least squares).";
    }
    String smoothed =
        noise.smoothingMillimetres() > 0
            ? " after smoothing over the mask by a Gaussian of "
                + Words.plain(noise.smoothingMillimetres())
                + " mm full width at half maximum"
            : ", voxel by voxel without smoothing";
    return "Noise. A first-order autoregression within segments (ar1), its coefficient estimated from"
        + " the residuals of ordinary least squares by inverting their exact expected lag-1"
        + " correlation (in the spirit of "
        + references.cite(Published.WORSLEY)
        + ")"
        + smoothed
        + " and limited to -0.2 to 0.95; then generalised least squares, exact for missing frames. "
        + degrees(noise);
  }

  private String degrees(NoiseSettings noise) {
    return noise.degreesOfFreedom() == NoiseSettings.DegreesOfFreedom.EFFECTIVE
        ? "P values use effective degrees of freedom for each voxel and contrast, reduced for the"
            + " estimation of the noise model "
            + references.cite(Published.SATTERTHWAITE, Published.KENWARD)
            + "."
        : "P values use the residual degrees of freedom.";
  }
}
