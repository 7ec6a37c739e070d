package nightjar.regions;

import java.util.ArrayList;
import java.util.List;
import nightjar.design.DesignBasis;
import nightjar.design.DesignColumn;
import nightjar.design.DesignMatrix;
import nightjar.glm.Contrast;
import nightjar.glm.Glm;
import nightjar.glm.GlmFit;
import nightjar.glm.LinearModel;
import nightjar.inference.MultipleTests;
import nightjar.numeric.StudentT;
import nightjar.numeric.Workers;
import nightjar.recording.Progress;
import nightjar.recording.Region;

/**
 * The session's model fitted to each region's mean series, with its own noise estimate. Immutable.
 */
public final class RegionFits {
  private static final double TAIL_OF_95_PERCENT = 0.025;

  private final RegionModel model;
  private final RegionSeries series;
  private final List<DesignMatrix> designs;
  private final GlmFit fit;

  private RegionFits(
      RegionModel model, RegionSeries series, List<DesignMatrix> designs, GlmFit fit) {
    this.model = model;
    this.series = series;
    this.designs = designs;
    this.fit = fit;
  }

  /**
   * Fits every region of {@code series}; a region over planes with own clocks uses the columns
   * averaged over its voxels.
   */
  public static RegionFits of(RegionModel model, RegionSeries series, Workers workers) {
    List<Glm.Part> parts = new ArrayList<>();
    List<DesignMatrix> designs = new ArrayList<>();
    for (int r = 0; r < series.size(); r++) {
      boolean swept = model.design().isSwept();
      DesignMatrix design =
          swept
              ? DesignMatrix.average(model.design().planes(), series.planeShares(r))
              : model.design().ofPlane(0);
      designs.add(design);
      LinearModel own =
          swept
              ? LinearModel.of(
                  DesignBasis.of(design, model.kept()),
                  model.contrasts(),
                  design.names(),
                  model.noise())
              : model.voxelModel().withEstimates(design.names());
      parts.add(new Glm.Part(own, r, r + 1));
    }
    GlmFit fit =
        parts.isEmpty()
            ? GlmFit.ofNothing()
            : Glm.fit(series.rows(), parts, workers, Progress.SILENT);
    return new RegionFits(model, series, designs, fit);
  }

  /** Number of regions that have voxels, each with a fit. */
  public int size() {
    return series.size();
  }

  /** Name of region {@code r} of those that have voxels. */
  public String name(int r) {
    return series.region(r).name();
  }

  /** The region's series, not modified. */
  RegionSeries series() {
    return series;
  }

  RegionModel model() {
    return model;
  }

  /** Fitted value of the columns that satisfy {@code which} at frame {@code t}. */
  double fitted(int r, int t, java.util.function.Predicate<DesignColumn> which) {
    double sum = 0;
    List<DesignColumn> columns = designs.get(r).columns();
    for (int j = 0; j < columns.size(); j++) {
      if (which.test(columns.get(j))) {
        sum += fit.estimate(j)[r] * columns.get(j).at(t);
      }
    }
    return sum;
  }

  /** Coefficient of column {@code name} for region {@code r}. */
  double coefficient(int r, String name) {
    return fit.estimate(designs.get(r).indexOf(name))[r];
  }

  /** Rows region by region, every contrast; regions without voxels keep their row. */
  public List<RegionContrast> contrasts(List<Region> regions) {
    List<RegionContrast> rows = new ArrayList<>();
    double[][] q = new double[model.contrasts().size()][];
    for (int c = 0; c < q.length; c++) {
      q[c] =
          series.size() == 0
              ? new double[0]
              : MultipleTests.adjust(fit.p(c), model.inference().adjustment());
    }
    for (Region region : regions) {
      int r = position(region);
      for (int c = 0; c < q.length; c++) {
        Contrast contrast = model.contrasts().get(c);
        rows.add(r < 0 ? withoutVoxels(region, contrast) : row(r, c, contrast.name(), q[c][r]));
      }
    }
    return rows;
  }

  private int position(Region region) {
    for (int r = 0; r < series.size(); r++) {
      if (series.region(r).name().equals(region.name())) {
        return r;
      }
    }
    return -1;
  }

  private RegionContrast row(int r, int c, String contrast, double q) {
    double effect = fit.effect(c)[r];
    double se = fit.standardError(c)[r];
    double df = fit.degreesOfFreedom(c)[r];
    double half = Double.isNaN(df) ? Double.NaN : StudentT.quantile(TAIL_OF_95_PERCENT, df) * se;
    return new RegionContrast(
        series.region(r).name(),
        series.voxels(r),
        contrast,
        effect,
        se,
        effect - half,
        effect + half,
        fit.t(c)[r],
        df,
        fit.p(c)[r],
        q);
  }

  private static RegionContrast withoutVoxels(Region region, Contrast contrast) {
    double no = Double.NaN;
    return new RegionContrast(region.name(), 0, contrast.name(), no, no, no, no, no, no, no, no);
  }

  /**
   * Region means with the fitted drift, steps and nuisance taken off and the mean kept, percent.
   *
   * @return {@code [region][kept row]}
   */
  public double[][] timeCourses() {
    double[][] courses = new double[series.size()][series.rows().rows()];
    float[] row = new float[series.size()];
    for (int i = 0; i < series.rows().rows(); i++) {
      series.rows().read(i, 0, row.length, row, 0);
      int t = model.kept().frame(i);
      for (int r = 0; r < row.length; r++) {
        courses[r][i] = row[r] - fitted(r, t, RegionFits::isUnwanted);
      }
    }
    return courses;
  }

  private static boolean isUnwanted(DesignColumn c) {
    return switch (c.kind()) {
      case DRIFT, NUISANCE, STEP -> true;
      case STIMULUS, SLOPE, LEVEL -> false;
    };
  }
}
