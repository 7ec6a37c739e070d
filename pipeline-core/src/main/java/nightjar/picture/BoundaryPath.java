package nightjar.picture;

import java.util.function.IntPredicate;

/**
 * The boundary of a set of pixels as the {@code d} of an SVG path, in pixels, along the pixels'
 * edges. Every ring runs clockwise around what is inside; pixels that touch in a corner only are
 * kept apart.
 */
final class BoundaryPath {
  private static final int[] STEP_X = {1, 0, -1, 0};
  private static final int[] STEP_Z = {0, 1, 0, -1};

  private final int width;
  private final int height;
  // Per corner, one bit for each direction (right, down, left, up) that a boundary leaves in.
  private final byte[] leaving;
  private final StringBuilder path = new StringBuilder();

  private BoundaryPath(int width, int height) {
    this.width = width;
    this.height = height;
    this.leaving = new byte[(width + 1) * (height + 1)];
  }

  /** Pixel {@code z * width + x} is inside where {@code inside} says so; empty for an empty set. */
  static String of(int width, int height, IntPredicate inside) {
    BoundaryPath b = new BoundaryPath(width, height);
    b.mark(inside);
    for (int corner = 0; corner < b.leaving.length; corner++) {
      while (b.leaving[corner] != 0) {
        b.follow(corner);
      }
    }
    return b.path.toString();
  }

  private void mark(IntPredicate inside) {
    for (int z = 0; z < height; z++) {
      for (int x = 0; x < width; x++) {
        int v = z * width + x;
        if (inside.test(v)) {
          leave(x, z, 0, z == 0 || !inside.test(v - width));
          leave(x + 1, z, 1, x == width - 1 || !inside.test(v + 1));
          leave(x + 1, z + 1, 2, z == height - 1 || !inside.test(v + width));
          leave(x, z + 1, 3, x == 0 || !inside.test(v - 1));
        }
      }
    }
  }

  private void leave(int x, int z, int direction, boolean isEdge) {
    if (isEdge) {
      leaving[z * (width + 1) + x] |= (byte) (1 << direction);
    }
  }

  private void follow(int start) {
    int x = start % (width + 1);
    int z = start / (width + 1);
    int direction = Integer.numberOfTrailingZeros(leaving[start]);
    path.append('M').append(x).append(' ').append(z);
    int run = 0;
    while (true) {
      leaving[z * (width + 1) + x] &= (byte) ~(1 << direction);
      x += STEP_X[direction];
      z += STEP_Z[direction];
      run++;
      int next = turn(leaving[z * (width + 1) + x], direction);
      if (next != direction) {
        path.append(direction % 2 == 0 ? 'h' : 'v').append(direction < 2 ? run : -run);
        run = 0;
      }
      if (next < 0) {
        path.append('z');
        return;
      }
      direction = next;
    }
  }

  /** The next direction: right, then ahead, then left; -1 where the ring is closed. */
  private static int turn(int leaving, int direction) {
    for (int t : new int[] {1, 0, 3}) {
      int next = (direction + t) % 4;
      if ((leaving >> next & 1) != 0) {
        return next;
      }
    }
    return -1;
  }
}
