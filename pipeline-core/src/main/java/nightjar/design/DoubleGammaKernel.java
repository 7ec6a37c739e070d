package nightjar.design;

/**
 * A response with an undershoot: {@code (g1 - r g2) / (1 - r)}, both parts gamma densities [Glover
 * 1999, NeuroImage 9:416].
 *
 * @param response g1
 * @param undershoot g2
 * @param ratio r, 0 to below 1
 */
public record DoubleGammaKernel(GammaKernel response, GammaKernel undershoot, double ratio)
    implements Kernel {
  public DoubleGammaKernel {
    if (!(ratio >= 0 && ratio < 1)) {
      throw new IllegalArgumentException("undershoot ratio " + ratio);
    }
  }

  @Override
  public double at(double seconds) {
    return (response.at(seconds) - ratio * undershoot.at(seconds)) / (1 - ratio);
  }

  @Override
  public double cumulative(double seconds) {
    return (response.cumulative(seconds) - ratio * undershoot.cumulative(seconds)) / (1 - ratio);
  }

  @Override
  public double slope(double seconds) {
    return (response.slope(seconds) - ratio * undershoot.slope(seconds)) / (1 - ratio);
  }

  @Override
  public double peakSeconds() {
    return response.peakSeconds();
  }

  @Override
  public double widthSeconds() {
    return response.widthSeconds();
  }
}
