package nightjar.demo;

/**
 * What spoils a session.
 *
 * @param wanderMillimetres root mean square of the slow motion along each axis
 * @param jerks sudden displacements of two to four frames
 * @param flashes bursts of power of one to four frames
 */
public record DemoDisturbance(double wanderMillimetres, int jerks, int flashes) {
  /** Nothing moves and nothing flashes. */
  public static final DemoDisturbance NONE = new DemoDisturbance(0, 0, 0);

  /** An ordinary good session. */
  public static final DemoDisturbance ORDINARY = new DemoDisturbance(0.03, 2, 3);

  /** A session that nobody should use. */
  public static final DemoDisturbance SPOILED = new DemoDisturbance(0.06, 25, 100);
}
