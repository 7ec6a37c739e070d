package nightjar.demo;

/** Numbers that give each random part of a session a stream of its own. */
final class Purpose {
  static final long TRIALS = 1;
  static final long MOTION = 2;
  static final long FLASHES = 3;
  static final long SLOW = 4;

  private Purpose() {}

  /** The vessels of a plane. */
  static long vessels(int plane) {
    return 1_000L + plane;
  }

  /** The speckle of a frame. */
  static long speckle(int frame) {
    return 1_000_000L + frame;
  }
}
