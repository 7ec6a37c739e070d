package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class CubicSplineTest {
  /** Values are up to 10 and the coefficients are floats: a few units in their last place. */
  private static final double ROUNDING = 2e-5;

  @ParameterizedTest
  @CsvSource({"1,1,1", "1,1,2", "1,2,3", "1,7,5", "1,40,33", "2,3,4", "5,6,30"})
  void goesThroughEveryVoxel(int planes, int depths, int laterals) {
    float[] values = random(planes * depths * laterals);
    CubicSpline spline = new CubicSpline(planes, depths, laterals);
    spline.fit(values, 0);
    for (int v = 0; v < values.length; v++) {
      int p = v / (depths * laterals);
      assertEquals(
          values[v], spline.at(p, v / laterals % depths, v % laterals), ROUNDING, "voxel " + v);
    }
  }

  @ParameterizedTest
  @CsvSource({"1,1,2", "1,2,3", "1,7,5", "1,40,33", "2,3,4", "5,6,30"})
  void agreesWithTheSplineFoundBySolvingTheInterpolationEquations(
      int planes, int depths, int laterals) {
    float[] values = random(planes * depths * laterals);
    CubicSpline spline = new CubicSpline(planes, depths, laterals);
    spline.fit(values, 0);
    double[] coefficients = solved(values, planes, depths, laterals);
    Random random = new Random(3);
    for (int i = 0; i < 200; i++) {
      double p = random.nextDouble() * planes - 0.5;
      double z = random.nextDouble() * depths - 0.5;
      double x = random.nextDouble() * laterals - 0.5;
      double want = plain(coefficients, new int[] {planes, depths, laterals}, p, z, x);
      assertEquals(want, spline.at(p, z, x), 2 * ROUNDING, p + " " + z + " " + x);
      if (planes == 1) {
        assertEquals(want, spline.at(z, x), 2 * ROUNDING);
      }
    }
  }

  @Test
  void isConstantWhereTheVoxelsAre() {
    float[] values = new float[4 * 9 * 11];
    java.util.Arrays.fill(values, 3.25f);
    CubicSpline spline = new CubicSpline(4, 9, 11);
    spline.fit(values, 0);
    Random random = new Random(4);
    for (int i = 0; i < 500; i++) {
      double p = random.nextDouble() * 4 - 0.5;
      double z = random.nextDouble() * 9 - 0.5;
      double x = random.nextDouble() * 11 - 0.5;
      assertEquals(3.25, spline.at(p, z, x), ROUNDING);
    }
  }

  @Test
  void followsAWaveOfEightVoxelsWithinAThousandth() {
    // A cubic spline's error falls with the fourth power of the spacing: about (pi/8)^4 / 90.
    int n = 64;
    float[] values = new float[n * n];
    for (int v = 0; v < values.length; v++) {
      int z = v / n;
      values[v] = (float) wave(z, v % n);
    }
    CubicSpline spline = new CubicSpline(1, n, n);
    spline.fit(values, 0);
    Random random = new Random(5);
    for (int i = 0; i < 500; i++) {
      double z = 8 + random.nextDouble() * 48;
      double x = 8 + random.nextDouble() * 48;
      assertEquals(wave(z, x), spline.at(z, x), 1e-3);
    }
  }

  @Test
  void beginsAtTheOffset() {
    float[] values = {9, 9, 1, 2, 3, 4};
    CubicSpline spline = new CubicSpline(1, 2, 2);
    spline.fit(values, 2);
    assertEquals(2.5, spline.at(0.5, 0.5), ROUNDING);
    assertEquals(1, spline.at(0, 0), ROUNDING);
  }

  private static double wave(double z, double x) {
    return Math.cos(2 * Math.PI * (0.6 * z + 0.8 * x) / 8);
  }

  private static float[] random(int n) {
    Random random = new Random(n);
    float[] values = new float[n];
    for (int i = 0; i < n; i++) {
      values[i] = (float) (10 * random.nextDouble());
    }
    return values;
  }

  /** The cubic B-spline, by its pieces (Unser 1999, IEEE Signal Process Mag 16(6):22). */
  private static double basis(double t) {
    double a = Math.abs(t);
    if (a >= 2) {
      return 0;
    }
    return a < 1 ? 2.0 / 3 - a * a + a * a * a / 2 : (2 - a) * (2 - a) * (2 - a) / 6;
  }

  private static int mirrored(int i, int n) {
    int k = i;
    while (n > 1 && (k < 0 || k >= n)) {
      k = k < 0 ? -k : 2 * (n - 1) - k;
    }
    return n == 1 ? 0 : k;
  }

  /** Coefficients along one axis after the other by dense linear equations. */
  private static double[] solved(float[] values, int planes, int depths, int laterals) {
    double[] c = new double[values.length];
    for (int i = 0; i < c.length; i++) {
      c[i] = values[i];
    }
    solveAlong(c, planes, depths * laterals);
    solveAlong(c, depths, laterals);
    solveAlong(c, laterals, 1);
    return c;
  }

  private static void solveAlong(double[] c, int n, int stride) {
    DMatrixRMaj m = new DMatrixRMaj(n, n);
    for (int i = 0; i < n; i++) {
      for (int k = i - 1; k <= i + 1; k++) {
        m.add(i, mirrored(k, n), basis(i - k));
      }
    }
    for (int first = 0; first < c.length; first++) {
      if (first / stride % n == 0) {
        DMatrixRMaj y = new DMatrixRMaj(n, 1);
        for (int i = 0; i < n; i++) {
          y.set(i, 0, c[first + i * stride]);
        }
        DMatrixRMaj x = new DMatrixRMaj(n, 1);
        assertEquals(true, CommonOps_DDRM.solve(m, y, x));
        for (int i = 0; i < n; i++) {
          c[first + i * stride] = x.get(i, 0);
        }
      }
    }
  }

  private static double plain(double[] c, int[] size, double p, double z, double x) {
    double sum = 0;
    for (int i = -3; i < size[0] + 3; i++) {
      for (int j = -3; j < size[1] + 3; j++) {
        for (int k = -3; k < size[2] + 3; k++) {
          int at =
              (mirrored(i, size[0]) * size[1] + mirrored(j, size[1])) * size[2]
                  + mirrored(k, size[2]);
          sum += basis(p - i) * basis(z - j) * basis(x - k) * c[at];
        }
      }
    }
    return sum;
  }
}
