package nightjar.picture;

import java.util.Locale;

/**
 * Colours of maps and charts, {@code 0xRRGGBB}. Both scales are from ColorBrewer by Cynthia A.
 * Brewer, Pennsylvania State University (Apache License 2.0): PuOr with 11 classes and Dark2 with
 * 8.
 */
public final class Palette {
  /** From the largest increase to the largest decrease. */
  private static final int[] PUOR = {
    0x7f3b08, 0xb35806, 0xe08214, 0xfdb863, 0xfee0b6, 0xf7f7f7, 0xd8daeb, 0xb2abd2, 0x8073ac,
    0x542788, 0x2d004b
  };

  private static final int[] DARK2 = {
    0x1b9e77, 0xd95f02, 0x7570b3, 0xe7298a, 0x66a61e, 0xe6ab02, 0xa6761d, 0x666666
  };

  /** How many named things differ in colour. */
  static final int CATEGORIES = DARK2.length;

  private Palette() {}

  /**
   * The diverging scale: 1 is the darkest orange (increase), 0 nearly white, -1 the darkest purple
   * (decrease); linear between the published colours, values beyond the ends take the ends.
   */
  public static int diverging(double share) {
    double place = (1 - Math.max(-1, Math.min(1, share))) / 2 * (PUOR.length - 1);
    int below = Math.min(PUOR.length - 2, (int) place);
    double rest = place - below;
    int rgb = 0;
    for (int shift = 16; shift >= 0; shift -= 8) {
      int a = PUOR[below] >> shift & 0xff;
      int b = PUOR[below + 1] >> shift & 0xff;
      rgb |= (int) Math.round(a + rest * (b - a)) << shift;
    }
    return rgb;
  }

  /** Colour of the {@code i}th named thing, from 0; after the eighth they repeat. */
  public static int category(int i) {
    return DARK2[Math.floorMod(i, DARK2.length)];
  }

  /** As CSS writes it. */
  public static String css(int rgb) {
    return String.format(Locale.ROOT, "#%06x", rgb);
  }
}
