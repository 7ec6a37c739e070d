package nightjar.demo;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import java.util.Arrays;
import java.util.List;
import java.util.Map;
import nightjar.recording.Trial;
import org.junit.jupiter.api.Test;

class FilmMakerTest {
  private static final DemoAnimal CALM = new DemoAnimal("a", "young", 1, 0);

  @Test
  void plantsTheResponseInTheRegionMean() {
    DemoScan scan = new DemoScan(1, 96, 112, 600, 0.4, 0);
    DemoSession session = new DemoSession("s", 7, scan, CALM, DemoDisturbance.NONE, 0);
    DemoTruth truth = DemoTruth.draw(session);
    float[][] film = film(session, truth);

    List<Trial> left = truth.events().of("left_puff");
    List<Trial> right = truth.events().of("right_puff");
    double[] barrel = mean(film, DemoRegion.BARREL_RIGHT, scan);
    double[] quiet = mean(film, DemoRegion.QUIET_CORTEX, scan);
    // Least squares on both puffs, a constant and nine cosines for the drift.
    double[][] columns = new double[12][scan.frames()];
    for (int t = 0; t < scan.frames(); t++) {
      columns[0][t] = 0.01 * convolved(scan.frameSeconds(t), left);
      columns[1][t] = 0.01 * convolved(scan.frameSeconds(t), right);
      for (int k = 0; k < 10; k++) {
        columns[2 + k][t] = Math.cos(Math.PI * k * (t + 0.5) / scan.frames());
      }
    }
    // Region means of 120 to 190 voxels of 5 % noise, five of which count as one for being
    // neighbours, and the ripple leave 1.3 % a frame; over a column's squared sum of about 15 that
    // is 0.33. Baselines include the responses: 10 % reads about 9.7 %.
    double[] barrelBeta = leastSquares(columns, barrel);
    assertEquals(9.7, barrelBeta[0], 1.0);
    assertEquals(2, barrelBeta[1], 1.0);
    double[] quietBeta = leastSquares(columns, quiet);
    assertEquals(0, quietBeta[0], 1.0);
    assertEquals(0, quietBeta[1], 1.0);
  }

  @Test
  void theSameSeedWithoutResponsesDiffersByTheResponseAlone() {
    DemoScan scan = new DemoScan(1, 48, 56, 100, 0.4, 0);
    DemoAnimal silent = new DemoAnimal("b", "young", 0, 0);
    DemoSession with = new DemoSession("s", 7, scan, CALM, DemoDisturbance.NONE, 0.3);
    DemoSession without = new DemoSession("s", 7, scan, silent, DemoDisturbance.NONE, 0.3);
    DemoTruth truth = DemoTruth.draw(with);
    float[][] responding = film(with, truth);
    float[][] quiet = film(without, truth);
    int v = 15 * 56 + 41; // in barrel_right
    int outside = 45 * 56 + 2;
    for (int t = 0; t < scan.frames(); t++) {
      double s = scan.frameSeconds(t);
      double expected =
          0.1 * convolved(s, truth.events().of("left_puff"))
              + 0.02 * convolved(s, truth.events().of("right_puff"));
      // The response is a share of the power at rest, the ratio one of the power with drift, which
      // differs by up to 8 %: 0.008 for 10 %.
      assertEquals(expected, responding[t][v] / quiet[t][v] - 1, 0.008);
      assertEquals(1, responding[t][outside] / quiet[t][outside], 0);
    }
  }

  @Test
  void noiseHasTheStatedAutocorrelationAndSpread() {
    DemoScan scan = new DemoScan(1, 24, 24, 2000, 0.4, 0);
    Speckle speckle = new Speckle(scan, 0.35);
    double[][] x = new double[576][2000];
    for (int t = 0; t < 2000; t++) {
      speckle.next(new NormalStream(3, t), t == 0);
      for (int v = 0; v < 576; v++) {
        x[v][t] = speckle.factor(v);
      }
    }
    double square = 0;
    double product = 0;
    double sum = 0;
    for (double[] series : x) {
      for (int t = 1; t < 2000; t++) {
        sum += series[t];
        square += (series[t] - 1) * (series[t] - 1);
        product += (series[t] - 1) * (series[t - 1] - 1);
      }
    }
    double n = 576 * 1999.0;
    // Over 10^6 values, some ten of which count as one for being neighbours.
    assertEquals(1, sum / n, 0.001);
    assertEquals(1 / Math.sqrt(Speckle.SHAPE), Math.sqrt(square / n), 0.001);
    assertEquals(0.35, product / square, 0.01);
  }

  @Test
  void theSameSettingsGiveTheSameFramesAndAnotherSeedOthers() {
    DemoScan scan = new DemoScan(2, 24, 28, 40, 0.4, 0.1);
    DemoSession one = new DemoSession("s", 1, scan, CALM, DemoDisturbance.ORDINARY, 0.3);
    DemoSession two = new DemoSession("s", 2, scan, CALM, DemoDisturbance.ORDINARY, 0.3);
    float[][] first = film(one, DemoTruth.draw(one));
    float[][] again = film(one, DemoTruth.draw(one));
    for (int t = 0; t < first.length; t++) {
      assertArrayEquals(first[t], again[t]);
    }
    assertFalse(Arrays.equals(first[5], film(two, DemoTruth.draw(two))[5]));
  }

  @Test
  void sceneIsInterpolatedToAThousandthOfABlob() {
    int depths = (24 + 16) * Scene.FINE;
    int laterals = (24 + 16) * Scene.FINE;
    float[] samples = new float[depths * laterals];
    double sigma = 0.75 * Scene.FINE;
    for (int z = 0; z < depths; z++) {
      for (int x = 0; x < laterals; x++) {
        samples[z * laterals + x] = (float) blob(z - 80, x - 80, sigma);
      }
    }
    Scene scene = Scene.of(samples, depths, laterals);
    for (double dz = -2; dz < 2; dz += 0.13) {
      for (double dx = -2; dx < 2; dx += 0.17) {
        double exact = blob(dz * Scene.FINE, dx * Scene.FINE, sigma);
        // (80 / 4 - 8) voxels is the blob's centre.
        assertEquals(exact, scene.at(12 + dz, 12 + dx), 2e-3);
      }
    }
  }

  private static double blob(double z, double x, double sigma) {
    return Math.exp(-0.5 * (z * z + x * x) / (sigma * sigma));
  }

  @Test
  void curveIsThatOfTheGammaDistribution() {
    // Nothing before the onset; a lasting stimulus reaches one, rising most steeply at the mode.
    ResponseCurve curve = new ResponseCurve();
    List<Trial> lasting = List.of(new Trial("x", 10, 1000, null, Map.of(), 2));
    assertEquals(0, curve.at(9.9, lasting), 0);
    assertEquals(1, curve.at(60, lasting), 1e-9);
    double best = 0;
    double at = 0;
    for (double s = 10; s < 20; s += 0.01) {
      double rise = curve.at(s + 0.005, lasting) - curve.at(s - 0.005, lasting);
      if (rise > best) {
        best = rise;
        at = s;
      }
    }
    assertEquals(12.1, at, 0.02);
  }

  static float[][] film(DemoSession session, DemoTruth truth) {
    DemoScan scan = session.scan();
    float[][] film = new float[scan.frames()][scan.planes() * scan.depths() * scan.laterals()];
    FilmMaker maker = new FilmMaker(session, truth);
    for (float[] frame : film) {
      maker.next(frame);
    }
    assertFalse(maker.hasNext());
    return film;
  }

  /** Mean over a region of each voxel's share of its own mean over time. */
  private static double[] mean(float[][] film, DemoRegion region, DemoScan scan) {
    double[] mean = new double[film.length];
    int n = 0;
    for (int v = 0; v < film[0].length; v++) {
      int depth = v / scan.laterals();
      int lateral = v % scan.laterals();
      if (region.holds(depth, lateral, scan)) {
        n++;
        double baseline = 0;
        for (float[] frame : film) {
          baseline += frame[v] / film.length;
        }
        for (int t = 0; t < film.length; t++) {
          mean[t] += film[t][v] / baseline;
        }
      }
    }
    for (int t = 0; t < mean.length; t++) {
      mean[t] /= n;
    }
    return mean;
  }

  /** A boxcar smoothed by the gamma density of mode 2.1 s and FWHM 2.9 s, by plain summing. */
  private static double convolved(double seconds, List<Trial> trials) {
    double shape = 3.98358;
    double scale = 2.1 / (shape - 1);
    double area = 0;
    double sum = 0;
    for (double lag = 0.005; lag < 30; lag += 0.01) {
      double density = Math.pow(lag, shape - 1) * Math.exp(-lag / scale);
      area += density;
      for (Trial trial : trials) {
        double since = seconds - lag - trial.onsetSeconds();
        if (since >= 0 && since < trial.durationSeconds()) {
          sum += density;
        }
      }
    }
    return sum / area;
  }

  private static double[] leastSquares(double[][] columns, double[] y) {
    int p = columns.length;
    double[][] m = new double[p][p + 1];
    for (int i = 0; i < p; i++) {
      for (int t = 0; t < y.length; t++) {
        for (int j = 0; j < p; j++) {
          m[i][j] += columns[i][t] * columns[j][t];
        }
        m[i][p] += columns[i][t] * y[t];
      }
    }
    for (int i = 0; i < p; i++) {
      for (int k = 0; k < p; k++) {
        if (k != i) {
          double f = m[k][i] / m[i][i];
          for (int j = i; j <= p; j++) {
            m[k][j] -= f * m[i][j];
          }
        }
      }
    }
    double[] beta = new double[p];
    for (int i = 0; i < p; i++) {
      beta[i] = m[i][p] / m[i][i];
    }
    return beta;
  }
}
