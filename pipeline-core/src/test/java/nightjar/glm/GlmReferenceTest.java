package nightjar.glm;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import nightjar.checks.CheckValues;
import nightjar.design.DesignBasis;
import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.NamedSeries;
import nightjar.recording.Progress;
import nightjar.refusal.RefusedInput;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/**
 * Certified regressions (NIST Statistical Reference Datasets, linear regression) and generalised
 * least squares of other programs; sources stand in the files. Series are stored as float32, so
 * data with decimals carry a relative error of 6e-8.
 */
class GlmReferenceTest {
  private static DesignBasis polynomial(double[] x, int degree) {
    List<NamedSeries> columns = new ArrayList<>();
    for (int d = 1; d <= degree; d++) {
      double[] c = new double[x.length];
      for (int i = 0; i < c.length; i++) {
        c[i] = Math.pow(x[i], d);
      }
      columns.add(new NamedSeries("B" + d, c));
    }
    return Designs.of(columns, Designs.everySecond(x.length));
  }

  private static GlmFit ordinary(DesignBasis basis, double[] y) {
    List<String> names = basis.design().names();
    List<Contrast> contrasts = names.stream().map(n -> new Contrast(n, Map.of(n, 1.0))).toList();
    LinearModel model = LinearModel.of(basis, contrasts, List.of(), Designs.WHITE);
    try (Workers one = new Workers(1)) {
      return Glm.fit(Designs.rows(y), List.of(new Glm.Part(model, 0, 1)), one, Progress.SILENT);
    }
  }

  private static void assertCertified(
      String dataset, DesignBasis basis, GlmFit fit, double tolerance) {
    for (CheckValues.Row row : CheckValues.read("glm/nist_lls_certified.csv")) {
      if (row.text("dataset").equals(dataset)) {
        String name = row.text("parameter").equals("B0") ? "level" : row.text("parameter");
        int c = basis.design().indexOf(name);
        double want = row.number("certified_estimate");
        double se = row.number("certified_se");
        double scale = Math.max(se, Math.abs(want));
        assertEquals(want, fit.effect(c)[0], tolerance * scale, dataset + " " + name);
        assertEquals(se, fit.standardError(c)[0], tolerance * scale, dataset + " " + name);
      }
    }
  }

  @Test
  void fitsLongleyAsCertified() {
    List<CheckValues.Row> rows = CheckValues.read("glm/nist_lls_data_longley.csv");
    List<NamedSeries> columns = new ArrayList<>();
    for (int j = 1; j <= 6; j++) {
      columns.add(new NamedSeries("B" + j, CheckValues.column(rows, "x" + j)));
    }
    DesignBasis basis = Designs.of(columns, Designs.everySecond(rows.size()));
    // Whole numbers below 2^24 are exact in float32; the condition number of 5e9 leaves 6 to 7
    // digits of 16.
    assertCertified("Longley", basis, ordinary(basis, CheckValues.column(rows, "y")), 1e-7);
  }

  @ParameterizedTest
  @CsvSource({
    "Norris,1,3e-5",
    "Wampler1,5,1e-8",
    "Wampler2,5,1e-4",
    "Wampler3,5,1e-8",
    "Wampler4,5,1e-8",
    "Wampler5,5,1e-6"
  })
  void fitsPolynomialsAsCertified(String dataset, int degree, double tolerance) {
    List<CheckValues.Row> rows =
        CheckValues.read(
            "glm/nist_lls_data_" + dataset.toLowerCase(java.util.Locale.ROOT) + ".csv");
    DesignBasis basis = polynomial(CheckValues.column(rows, "x"), degree);
    GlmFit fit = ordinary(basis, CheckValues.column(rows, "y"));
    if (dataset.equals("Wampler1") || dataset.equals("Wampler2")) {
      // An exact fit: no residual variance, which the fit says by leaving the
      // series out.
      assertTrue(Double.isNaN(fit.t(0)[0]));
      return;
    }
    assertCertified(dataset, basis, fit, tolerance);
  }

  @Test
  void aPolynomialOfDegreeTenIsTooCloseToDependence() {
    List<CheckValues.Row> rows = CheckValues.read("glm/nist_lls_data_filip.csv");
    DesignBasis basis = polynomial(CheckValues.column(rows, "x"), 10);
    assertTrue(basis.rank() < 11, "columns below 1e-7 of their own norm are left out");
  }

  @ParameterizedTest
  @ValueSource(doubles = {0, 0.3, 0.5, 0.8, 0.95})
  void fitsLakeHuronAtFixedRhoAsOtherProgramsDo(double rho) {
    List<CheckValues.Row> data = CheckValues.read("glm/lakehuron_data.csv");
    double[] y = new double[data.size()];
    double[] year = new double[y.length];
    String[] names = data.get(0).cells().keySet().toArray(new String[0]);
    for (int i = 0; i < y.length; i++) {
      y[i] = data.get(i).number(names[0]);
      year[i] = data.get(i).number(names[1]) - 1920;
    }
    DesignBasis basis =
        Designs.of(List.of(new NamedSeries("t", year)), Designs.everySecond(y.length));
    LinearModel model =
        LinearModel.of(
            basis,
            List.of(
                new Contrast("(Intercept)", Map.of("level", 1.0)),
                new Contrast("t", Map.of("t", 1.0))),
            List.of(),
            NoiseSettings.DEFAULT);
    FloatRows rows = Designs.rows(y);
    VoxelMoments moments = new VoxelMoments(model.moments(), 1);
    moments.sum(rows, 0, 1);
    GlmFit fit = new GlmFit(1, 2, 0);
    new SeriesSolver(model).solveAt(rho, moments, 0, fit, 0);
    int found = 0;
    for (CheckValues.Row row : CheckValues.read("glm/gls_lakehuron_fixed_rho.csv")) {
      if (row.text("method").equals("REML fixed rho")
          && Math.abs(row.number("rho") - rho) < 1e-12) {
        int c = row.text("term").equals("t") ? 1 : 0;
        found++;
        // float32 of 579.xx is off by up to 3e-5 in each value.
        assertEquals(row.number("estimate"), fit.effect(c)[0], 2e-5);
        assertEquals(row.number("se"), fit.standardError(c)[0], 2e-5);
      }
    }
    assertEquals(2, found);
  }

  @Test
  void varianceInflationOfLongleyIsAsPublished() {
    List<CheckValues.Row> rows = CheckValues.read("glm/nist_lls_data_longley.csv");
    String[] names = {"GNP.deflator", "GNP", "Unemployed", "Armed.Forces", "Population", "Year"};
    List<NamedSeries> columns = new ArrayList<>();
    for (int j = 1; j <= 6; j++) {
      columns.add(new NamedSeries(names[j - 1], CheckValues.column(rows, "x" + j)));
    }
    DesignBasis basis = Designs.of(columns, Designs.everySecond(rows.size()));
    int found = 0;
    for (CheckValues.Row row : CheckValues.read("glm/longley_collinearity.csv")) {
      if (row.text("quantity").startsWith("VIF_")) {
        int j = basis.design().indexOf(row.text("quantity").substring(4));
        assertEquals(row.number("value"), basis.varianceInflation(j), 1e-6 * row.number("value"));
        found++;
      }
    }
    assertEquals(6, found);
  }

  @Test
  void refusesAContrastOfAnUnknownColumn() {
    DesignBasis basis =
        Designs.of(
            List.of(new NamedSeries("a", new double[] {0, 1, 0, 2, 0, 1})), Designs.everySecond(6));
    List<Contrast> contrasts = List.of(new Contrast("c", Map.of("b", 1.0)));
    RefusedInput refused =
        assertThrows(
            RefusedInput.class, () -> LinearModel.of(basis, contrasts, List.of(), Designs.WHITE));
    assertTrue(refused.getMessage().contains("found b, expected one of a, level"));
  }
}
