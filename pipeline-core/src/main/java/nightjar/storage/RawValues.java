package nightjar.storage;

/** Takes stored values as they stand in the file, piece by piece in storage order. */
@FunctionalInterface
interface RawValues {
  /**
   * Takes {@code count} values.
   *
   * @param primitives not modified: byte[], short[], int[], long[], float[] or double[]; valid
   *     during the call only
   * @param first where the values begin in it
   * @param count number of values
   */
  void take(Object primitives, int first, int count);
}
