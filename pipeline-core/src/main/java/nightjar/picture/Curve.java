package nightjar.picture;

/**
 * A line of a chart, optionally in a band. A value that is NaN breaks the line. Immutable; arrays
 * are shared and must not be changed.
 */
public final class Curve {
  /** A curve in the colour of the text. */
  private static final int INK = -1;

  private static final String[] DASHES = {"", "6 3", "2 2.5", "8 3 2 3"};

  private final String name;
  private final double[] x;
  private final double[] y;
  private final double[] half;
  private final int category;

  private Curve(String name, double[] x, double[] y, double[] half, int category) {
    if (x.length != y.length || (half.length != 0 && half.length != y.length)) {
      throw new IllegalArgumentException(
          x.length + " places and " + half.length + " bands for " + y.length + " values");
    }
    this.name = name;
    this.x = x;
    this.y = y;
    this.half = half;
    this.category = category;
  }

  /** A line in the colour of the text; {@code x} ascending. */
  public static Curve of(String name, double[] x, double[] y) {
    return new Curve(name, x, y, new double[0], INK);
  }

  /** The same line in a band that reaches {@code half} up and down. */
  public Curve withBand(double[] reach) {
    return new Curve(name, x, y, reach, category);
  }

  /** The same line in the colour, and with the dashes, of the {@code i}th named thing. */
  public Curve ofCategory(int i) {
    return new Curve(name, x, y, half, i);
  }

  String name() {
    return name;
  }

  int size() {
    return x.length;
  }

  double x(int i) {
    return x[i];
  }

  double y(int i) {
    return y[i];
  }

  boolean hasBand() {
    return half.length > 0;
  }

  /** Half the width of the band; 0 where it is not known. */
  double half(int i) {
    return half.length == 0 || !Double.isFinite(half[i]) ? 0 : half[i];
  }

  String colour() {
    return category == INK ? "currentColor" : Palette.css(Palette.category(category));
  }

  /** So that lines differ in more than colour. */
  String dashes() {
    // Shifted by one a round of colours: no two of 32 curves look alike.
    int round = category / Palette.CATEGORIES;
    String d = category == INK ? "" : DASHES[(category + round) % DASHES.length];
    return d.isEmpty() ? "" : " stroke-dasharray=\"" + d + "\"";
  }
}
