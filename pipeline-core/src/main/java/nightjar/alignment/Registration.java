package nightjar.alignment;

import nightjar.numeric.Median;

/**
 * Finds how the content of a frame is displaced from the reference: inverse compositional
 * Gauss-Newton [Lucas & Kanade 1981, Proc 7th IJCAI: 674; Baker & Matthews 2004, IJCV 56:221] on
 * smoothed logarithms of power. Gain and offset are free in every frame, and Tukey's biweight on
 * residuals, scaled by their median absolute value, takes away the parts that change with blood
 * volume. As the derivatives belong to the reference alone, the noise of a frame and the linear
 * interpolation do not draw the result towards whole voxels. Holds scratch arrays: one instance a
 * thread.
 */
final class Registration {
  private static final double CONVERGED_VOXELS = 1e-3;
  private static final int MOST_STEPS = 30;

  /** Weights stay fixed from this step on, so that the steps converge. */
  private static final int REWEIGHTED_STEPS = 10;

  /**
   * Limit of the biweight per normal standard deviation, 85 % efficient under normal noise
   * [Maronna, Martin & Yohai 2006, Robust Statistics; value from memory]. The usual 4.685 (95 %)
   * lets more of blood volume and drift through: measured on simulated sessions, 0.014 voxel
   * against 0.013.
   */
  private static final double TUNING = 3.44;

  private static final double SD_PER_MEDIAN_DEVIATION = 1.4826;

  /** Too little of the reference in sight to say anything. */
  private static final double LEAST_IN_SIGHT = 0.25;

  /** Gains below this (a frame without contrast) would make the steps explode. */
  private static final double LEAST_GAIN = 0.2;

  /** A start that differs less from rest than this needs no second start. */
  private static final double NEAR_VOXELS = 1.5;

  /**
   * A result that leaves residuals larger by more than this than the start has gone astray. A
   * smaller difference is chance, since the steps make weighted squares small and not the median.
   */
  private static final double WORSE = 1.2;

  private static final int MEDIAN_SAMPLES = 4096;

  private final Template template;
  private final Sampling sampling;
  private final ShiftSearch search;
  private final int n;
  private final double[] reference;
  private final NormalEquations equations;
  private final double[] residuals;
  private final double[] weights;
  private final double[] sorted;
  private final double[] step;
  private double gain;
  private double offset;

  /** A pose and the median absolute residual that is left there. */
  private record Fit(Pose pose, double scale) {}

  Registration(Template template) {
    this.template = template;
    sampling = new Sampling(template);
    search = new ShiftSearch(template.slab());
    n = template.columns().length;
    reference = template.columns()[n - 2];
    equations = new NormalEquations(template.columns());
    residuals = new double[template.size()];
    weights = new double[template.size()];
    sorted = new double[template.size()];
    step = new double[n];
  }

  /**
   * The displacement of the content of {@code image}; none where the image shows nothing to hold on
   * to.
   *
   * @param image smoothed logarithms of the slab
   */
  Pose find(float[] image) {
    Pose start = search.find(template.gradientSpectra(), image);
    Fit best = refine(image, start);
    if (voxels(start.shift(0), start.shift(1), start.shift(2)) > NEAR_VOXELS) {
      Fit atRest = refine(image, Pose.IDENTITY);
      best = atRest.scale < best.scale ? atRest : best;
    }
    return best.scale < Double.POSITIVE_INFINITY ? best.pose : Pose.IDENTITY;
  }

  private Fit refine(float[] image, Pose start) {
    Fit lost = new Fit(start, Double.POSITIVE_INFINITY);
    Pose pose = start;
    double startScale = Double.POSITIVE_INFINITY;
    gain = 1;
    offset = 0;
    for (int i = 0; i < MOST_STEPS; i++) {
      if (sampling.sample(image, pose) < LEAST_IN_SIGHT * template.size()) {
        return lost;
      }
      takeResiduals();
      if (i <= REWEIGHTED_STEPS) {
        weigh(i == 0 ? Double.POSITIVE_INFINITY : TUNING * scale());
        if (!equations.factor(weights)) {
          return lost;
        }
      }
      equations.solve(weights, residuals, step);
      gain += step[n - 2];
      offset += step[n - 1];
      if (i == 0) {
        takeResiduals();
        startScale = scale();
      }
      Pose change = change();
      pose = pose.afterInverseOf(change);
      if (i >= 2 && size(change) < CONVERGED_VOXELS) {
        break;
      }
    }
    double scale = scale();
    return scale <= WORSE * startScale ? new Fit(pose, scale) : new Fit(start, startScale);
  }

  /** Sampled values minus the reference at the present gain and offset; 0 where not in sight. */
  private void takeResiduals() {
    double[] values = sampling.values();
    for (int k = 0; k < residuals.length; k++) {
      double r = values[k] - offset - gain * reference[k];
      residuals[k] = Double.isNaN(r) ? 0 : r;
    }
  }

  /** Robust standard deviation of the residuals in sight. */
  private double scale() {
    double[] values = sampling.values();
    int stride = Math.max(1, residuals.length / MEDIAN_SAMPLES);
    int found = 0;
    for (int k = 0; k < residuals.length; k += stride) {
      if (!Double.isNaN(values[k])) {
        sorted[found++] = Math.abs(residuals[k]);
      }
    }
    return SD_PER_MEDIAN_DEVIATION * Median.selecting(sorted, found);
  }

  private void weigh(double limit) {
    double[] values = sampling.values();
    double perLimit = limit > 1e-12 ? 1 / limit : 0;
    for (int k = 0; k < weights.length; k++) {
      double u = residuals[k] * perLimit;
      double w = Math.max(0, 1 - u * u);
      weights[k] = Double.isNaN(values[k]) ? 0 : w * w;
    }
  }

  /** The displacement that the last step of the linear model speaks for. */
  private Pose change() {
    double[] shift = new double[3];
    double rotation = 0;
    double tiltDepth = 0;
    double tiltLateral = 0;
    for (int j = 0; j < template.parameters().size(); j++) {
      double d = step[j] / Math.max(gain, LEAST_GAIN);
      switch (template.parameters().get(j)) {
        case SHIFT_PLANE -> shift[0] = d;
        case SHIFT_DEPTH -> shift[1] = d;
        case SHIFT_LATERAL -> shift[2] = d;
        case ROTATION -> rotation = d;
        case TILT_DEPTH -> tiltDepth = d;
        case TILT_LATERAL -> tiltLateral = d;
      }
    }
    return Pose.of(shift, rotation, tiltDepth, tiltLateral);
  }

  /** Largest displacement of a corner of the field along an axis, in voxels. */
  private double size(Pose change) {
    Slab s = template.slab();
    double plane = s.planeMillimetres(0);
    double depth = s.depthMillimetres(0);
    double lateral = s.lateralMillimetres(0);
    double[] reach = new double[3];
    for (int i = 0; i < 3; i++) {
      reach[i] =
          Math.abs(change.shift(i))
              + Math.abs((change.turn(i, 0) - (i == 0 ? 1 : 0)) * plane)
              + Math.abs((change.turn(i, 1) - (i == 1 ? 1 : 0)) * depth)
              + Math.abs((change.turn(i, 2) - (i == 2 ? 1 : 0)) * lateral);
    }
    return voxels(reach[0], reach[1], reach[2]);
  }

  private double voxels(double plane, double depth, double lateral) {
    Slab s = template.slab();
    return Math.max(
        Math.abs(plane / s.planeStep()),
        Math.max(Math.abs(depth / s.depthStep()), Math.abs(lateral / s.lateralStep())));
  }
}
