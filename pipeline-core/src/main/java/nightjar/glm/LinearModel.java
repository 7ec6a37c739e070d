package nightjar.glm;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import nightjar.design.DesignBasis;
import nightjar.design.DesignMatrix;
import nightjar.refusal.RefusedInput;

/**
 * All of a model that does not depend on the data: basis, quadratic forms, contrasts, what is
 * expected of the noise estimate. Immutable; made once a design, used by any number of threads.
 */
public final class LinearModel {
  private final DesignBasis basis;
  private final DesignMoments moments;
  private final double[][] contrasts;
  private final double[][] estimates;
  private final NoiseSettings noise;
  private final Optional<FirstOrderNoise> firstOrder;

  /** What AR(1) needs. */
  record FirstOrderNoise(
      ExpectedCorrelation expected, CorrelationVariance variance, PrecisionWeights weights) {}

  private LinearModel(
      DesignBasis basis,
      DesignMoments moments,
      double[][] contrasts,
      double[][] estimates,
      NoiseSettings noise,
      Optional<FirstOrderNoise> firstOrder) {
    this.basis = basis;
    this.moments = moments;
    this.contrasts = contrasts;
    this.estimates = estimates;
    this.noise = noise;
    this.firstOrder = firstOrder;
  }

  private static Optional<FirstOrderNoise> firstOrder(DesignMoments moments, NoiseSettings noise) {
    if (noise.model() != NoiseSettings.Model.AR1) {
      return Optional.empty();
    }
    ExpectedCorrelation expected = new ExpectedCorrelation(moments);
    return Optional.of(
        new FirstOrderNoise(
            expected,
            new CorrelationVariance(moments, expected),
            new PrecisionWeights(moments.links())));
  }

  /**
   * Prepares a model.
   *
   * @param contrasts tested against zero
   * @param estimates names of columns whose coefficients are wanted
   * @throws RefusedInput where a contrast names a column that the design lacks
   */
  public static LinearModel of(
      DesignBasis basis, List<Contrast> contrasts, List<String> estimates, NoiseSettings noise) {
    DesignMatrix design = basis.design();
    List<double[]> c = new ArrayList<>();
    for (Contrast contrast : contrasts) {
      double[] weights = new double[design.columns().size()];
      for (Map.Entry<String, Double> w : contrast.weights().entrySet()) {
        weights[column(design, w.getKey(), "contrast " + contrast.name())] = w.getValue();
      }
      c.add(basis.functional(weights));
    }
    List<double[]> e = new ArrayList<>();
    for (String name : estimates) {
      e.add(basis.coefficient(column(design, name, "estimate")));
    }
    DesignMoments moments = new DesignMoments(basis, RowLinks.of(basis.kept()));
    return new LinearModel(
        basis,
        moments,
        c.toArray(double[][]::new),
        e.toArray(double[][]::new),
        noise,
        firstOrder(moments, noise));
  }

  private static int column(DesignMatrix design, String name, String place) {
    int j = design.indexOf(name);
    if (j < 0) {
      throw RefusedInput.because("no column of the model has this name")
          .at(place)
          .found(name)
          .expected("one of " + String.join(", ", design.names()))
          .remedy("name a stimulus or another column that the model holds");
    }
    return j;
  }

  /**
   * The same model with other coefficients asked for; what is costly is shared.
   *
   * @throws RefusedInput where the design lacks a column
   */
  public LinearModel withEstimates(List<String> names) {
    double[][] e =
        names.stream()
            .map(name -> basis.coefficient(column(basis.design(), name, "estimate")))
            .toArray(double[][]::new);
    return new LinearModel(basis, moments, contrasts, e, noise, firstOrder);
  }

  /** The basis of the design. */
  public DesignBasis basis() {
    return basis;
  }

  /** Kept frames minus rank. */
  public int residualDegreesOfFreedom() {
    return basis.kept().count() - basis.rank();
  }

  /** Number of contrasts. */
  public int contrasts() {
    return contrasts.length;
  }

  /** Number of coefficients asked for. */
  public int estimates() {
    return estimates.length;
  }

  DesignMoments moments() {
    return moments;
  }

  /** Contrast {@code c} in the basis; shared. */
  double[] contrast(int c) {
    return contrasts[c];
  }

  /** Coefficient {@code e} in the basis; shared. */
  double[] estimate(int e) {
    return estimates[e];
  }

  NoiseSettings noise() {
    return noise;
  }

  Optional<FirstOrderNoise> firstOrder() {
    return firstOrder;
  }
}
