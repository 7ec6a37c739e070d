package nightjar.glm;

import java.util.ArrayList;
import java.util.List;
import nightjar.design.DesignBasis;
import nightjar.design.DesignRequest;
import nightjar.design.DriftSettings;
import nightjar.design.GammaKernel;
import nightjar.design.SessionDesign;
import nightjar.film.FloatRows;
import nightjar.film.Scratch;
import nightjar.recording.FrameTimes;
import nightjar.recording.KeptFrames;
import nightjar.recording.NamedSeries;
import org.jspecify.annotations.Nullable;

/** Designs and series for tests. */
final class Designs {
  static final NoiseSettings WHITE =
      new NoiseSettings(NoiseSettings.Model.WHITE, 0, NoiseSettings.DegreesOfFreedom.EFFECTIVE);

  private Designs() {}

  /** A design of the given columns and a level over frames one second apart. */
  static DesignBasis of(List<NamedSeries> columns, KeptFrames kept) {
    DesignRequest request =
        new DesignRequest(
            List.of(),
            GammaKernel.of(2.1, 2.9),
            false,
            new DriftSettings(Double.POSITIVE_INFINITY),
            false,
            columns);
    SessionDesign design = SessionDesign.build(request, kept, new double[] {0});
    return DesignBasis.of(design.ofPlane(0), kept);
  }

  static KeptFrames everySecond(int n) {
    double[] t = new double[n];
    for (int i = 0; i < n; i++) {
      t[i] = i;
    }
    return KeptFrames.all(FrameTimes.of(t));
  }

  /**
   * Frames one second apart with a gap after {@code gapAfter}, of which those in {@code rejected}
   * are left out.
   */
  static KeptFrames withGap(int n, int gapAfter, List<Integer> rejected) {
    double[] t = new double[n];
    for (int i = 0; i < n; i++) {
      t[i] = i > gapAfter ? i + 30 : i;
    }
    List<@Nullable String> reasons = new ArrayList<>();
    for (int i = 0; i < n; i++) {
      reasons.add(rejected.contains(i) ? "test" : null);
    }
    return new KeptFrames(FrameTimes.of(t), reasons);
  }

  /** Series as rows; {@code series[v][row]}. */
  static FloatRows rows(double[]... series) {
    FloatRows rows = Scratch.ofThisMachine().allocate(series[0].length, series.length);
    for (int r = 0; r < rows.rows(); r++) {
      float[] row = new float[series.length];
      for (int v = 0; v < row.length; v++) {
        row[v] = (float) series[v][r];
      }
      rows.write(r, 0, row.length, row, 0);
    }
    return rows;
  }
}
