package nightjar.picture;

import java.awt.image.BufferedImage;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.Base64;
import javax.imageio.ImageIO;
import javax.imageio.stream.MemoryCacheImageOutputStream;

/** Pixels as a PNG file in base64. */
final class PngImage {
  private PngImage() {}

  /** {@code argb} holds {@code height} rows of {@code width} pixels, {@code 0xAARRGGBB}. */
  static String base64(int width, int height, int[] argb) {
    BufferedImage image = new BufferedImage(width, height, BufferedImage.TYPE_INT_ARGB);
    image.setRGB(0, 0, width, height, argb, 0, width);
    ByteArrayOutputStream bytes = new ByteArrayOutputStream();
    // The stream is given so that ImageIO keeps no cache file on disk.
    try (MemoryCacheImageOutputStream out = new MemoryCacheImageOutputStream(bytes)) {
      if (!ImageIO.write(image, "png", out)) {
        throw new IllegalStateException("this Java has no writer for PNG");
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return Base64.getEncoder().encodeToString(bytes.toByteArray());
  }

  /** An opaque grey pixel. */
  static int grey(int level) {
    return 0xff000000 | level << 16 | level << 8 | level;
  }

  /** A pixel of the given colour and opacity from 0 to 1. */
  static int translucent(int rgb, double opacity) {
    return (int) Math.round(255 * Math.max(0, Math.min(1, opacity))) << 24 | rgb;
  }
}
