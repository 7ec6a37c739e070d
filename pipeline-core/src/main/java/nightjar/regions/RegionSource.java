package nightjar.regions;

/** Plan section {@code regions}: where named areas come from. */
public enum RegionSource {
  /** The recording's roi variable, where it has one. */
  RECORDING,
  /** A label file given with the session. */
  FILE,
  /** A list of polygons given with the session. */
  DRAWN,
  /** No regions. */
  NONE
}
