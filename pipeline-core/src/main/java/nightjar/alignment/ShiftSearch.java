package nightjar.alignment;

import nightjar.numeric.ImageTransform;

/**
 * The shift within the plane at which an image resembles the reference most, to a fraction of a
 * voxel: the start of the refinement, so that jerks of many voxels are found too. The peak of the
 * cross-correlation of the images' gradients (which do not see gain, offset or slow shading), by
 * Fourier transforms of tapered images at half resolution; planes add up. Holds scratch arrays: one
 * instance a thread.
 */
final class ShiftSearch {
  private static final int SMALLEST_HALVED = 48;
  private static final double TAPERED_SHARE = 0.125;

  private final Slab slab;
  private final int bin;
  private final int depths;
  private final int laterals;
  private final int rows;
  private final int columns;
  private final double[] depthTaper;
  private final double[] lateralTaper;
  private final ImageTransform transform;
  private final double[] spectrum;
  private final double[] correlation;

  ShiftSearch(Slab slab) {
    this.slab = slab;
    bin = Math.min(slab.depths(), slab.laterals()) >= SMALLEST_HALVED ? 2 : 1;
    depths = slab.depths() / bin;
    laterals = slab.laterals() / bin;
    rows = fastSize(depths);
    columns = fastSize(laterals);
    depthTaper = taper(depths);
    lateralTaper = taper(laterals);
    transform = new ImageTransform(rows, columns);
    spectrum = new double[transform.length()];
    correlation = new double[transform.length()];
  }

  /** Spectra of the gradients of a reference, one a plane, for {@link #find}. */
  double[][] gradients(float[] reference) {
    double[][] spectra = new double[slab.planes()][];
    for (int p = 0; p < spectra.length; p++) {
      transformPlane(reference, p);
      for (int a = 0; a < rows; a++) {
        for (int b = 0; b < columns; b++) {
          double squared =
              4 - 2 * Math.cos(2 * Math.PI * a / rows) - 2 * Math.cos(2 * Math.PI * b / columns);
          spectrum[2 * (a * columns + b)] *= squared;
          spectrum[2 * (a * columns + b) + 1] *= squared;
        }
      }
      spectra[p] = spectrum.clone();
    }
    return spectra;
  }

  /** The displacement of the image's content from the reference. */
  Pose find(double[][] gradients, float[] image) {
    java.util.Arrays.fill(correlation, 0);
    for (int p = 0; p < gradients.length; p++) {
      transformPlane(image, p);
      addConjugateProduct(gradients[p]);
    }
    transform.inverse(correlation);
    int bestDepth = 0;
    int bestLateral = 0;
    for (int z = -depths / 3; z <= depths / 3; z++) {
      for (int x = -laterals / 3; x <= laterals / 3; x++) {
        if (value(z, x) > value(bestDepth, bestLateral)) {
          bestDepth = z;
          bestLateral = x;
        }
      }
    }
    double c = value(bestDepth, bestLateral);
    double depth =
        bestDepth + vertex(value(bestDepth - 1, bestLateral), c, value(bestDepth + 1, bestLateral));
    double lateral =
        bestLateral
            + vertex(value(bestDepth, bestLateral - 1), c, value(bestDepth, bestLateral + 1));
    double[] shift = {0, depth * bin * slab.depthStep(), lateral * bin * slab.lateralStep()};
    return Pose.of(shift, 0, 0, 0);
  }

  private double value(int z, int x) {
    return correlation[2 * (Math.floorMod(z, rows) * columns + Math.floorMod(x, columns))];
  }

  private void addConjugateProduct(double[] reference) {
    for (int i = 0; i < spectrum.length; i += 2) {
      correlation[i] += reference[i] * spectrum[i] + reference[i + 1] * spectrum[i + 1];
      correlation[i + 1] += reference[i] * spectrum[i + 1] - reference[i + 1] * spectrum[i];
    }
  }

  /** Spectrum of one plane: binned, its mean removed, tapered; missing values count as the mean. */
  private void transformPlane(float[] image, int plane) {
    java.util.Arrays.fill(spectrum, 0);
    double sum = 0;
    int found = 0;
    for (int z = 0; z < depths; z++) {
      for (int x = 0; x < laterals; x++) {
        double v = binned(image, plane, z, x);
        spectrum[2 * (z * columns + x)] = v;
        if (!Double.isNaN(v)) {
          sum += v;
          found++;
        }
      }
    }
    double mean = sum / Math.max(1, found);
    for (int z = 0; z < depths; z++) {
      for (int x = 0; x < laterals; x++) {
        int i = 2 * (z * columns + x);
        double v = spectrum[i];
        spectrum[i] = Double.isNaN(v) ? 0 : (v - mean) * depthTaper[z] * lateralTaper[x];
      }
    }
    transform.forward(spectrum);
  }

  private double binned(float[] image, int plane, int z, int x) {
    int nx = slab.laterals();
    int at = (plane * slab.depths() + z * bin) * nx + x * bin;
    return bin == 1
        ? image[at]
        : 0.25 * ((double) image[at] + image[at + 1] + image[at + nx] + image[at + nx + 1]);
  }

  /** Vertex of the parabola through three values at -1, 0, 1 of which the middle is largest. */
  private static double vertex(double before, double peak, double after) {
    double curvature = before - 2 * peak + after;
    return curvature < 0 ? Math.max(-0.5, Math.min(0.5, 0.5 * (before - after) / curvature)) : 0;
  }

  private static double[] taper(int n) {
    double[] w = new double[n];
    double width = Math.max(1, TAPERED_SHARE * n);
    for (int i = 0; i < n; i++) {
      double edge = Math.min(1, (Math.min(i, n - 1 - i) + 0.5) / width);
      double s = Math.sin(0.5 * Math.PI * edge);
      w[i] = s * s;
    }
    return w;
  }

  /** The smallest size from n on whose prime factors are 2, 3 and 5. */
  private static int fastSize(int n) {
    for (int size = n; ; size++) {
      int rest = size;
      for (int factor : new int[] {2, 3, 5}) {
        while (rest % factor == 0) {
          rest /= factor;
        }
      }
      if (rest == 1) {
        return size;
      }
    }
  }
}
