package nightjar.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ImageTransformTest {
  @ParameterizedTest
  @CsvSource({"1,1", "2,3", "8,5", "6,15", "7,11"})
  void agreesWithTheDefinitionAndComesBack(int rows, int columns) {
    double[] image = new Random(2).doubles(2L * rows * columns).toArray();
    ImageTransform transform = new ImageTransform(rows, columns);
    assertEquals(image.length, transform.length());
    double[] spectrum = image.clone();
    transform.forward(spectrum);
    assertArrayEquals(plain(image, rows, columns), spectrum, 1e-10);
    transform.inverse(spectrum);
    assertArrayEquals(image, spectrum, 1e-12);
  }

  private static double[] plain(double[] f, int rows, int columns) {
    double[] sum = new double[f.length];
    for (int a = 0; a < rows; a++) {
      for (int b = 0; b < columns; b++) {
        for (int r = 0; r < rows; r++) {
          for (int c = 0; c < columns; c++) {
            double angle = -2 * Math.PI * ((double) a * r / rows + (double) b * c / columns);
            double re = f[2 * (r * columns + c)];
            double im = f[2 * (r * columns + c) + 1];
            sum[2 * (a * columns + b)] += re * Math.cos(angle) - im * Math.sin(angle);
            sum[2 * (a * columns + b) + 1] += re * Math.sin(angle) + im * Math.cos(angle);
          }
        }
      }
    }
    return sum;
  }
}
