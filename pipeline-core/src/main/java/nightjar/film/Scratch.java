package nightjar.film;

import java.io.File;
import java.nio.file.Path;
import nightjar.refusal.RefusedInput;

/**
 * Where rows live: on the heap while they fit the budget, else on a mapped file in the scratch
 * folder.
 *
 * @param folder for scratch files
 * @param heapBytes the largest array of rows that is kept on the heap
 */
public record Scratch(Path folder, long heapBytes) {
  /** A quarter of this machine's heap limit, and the system's folder for temporary files. */
  public static Scratch ofThisMachine() {
    return new Scratch(
        Path.of(System.getProperty("java.io.tmpdir")), Runtime.getRuntime().maxMemory() / 4);
  }

  /**
   * Rows filled with zeros.
   *
   * @throws RefusedInput where the scratch folder has too little space
   */
  public FloatRows allocate(int rows, int width) {
    long bytes = 4L * rows * width;
    if (bytes <= heapBytes) {
      return new HeapRows(rows, width);
    }
    long free = new File(folder.toString()).getUsableSpace();
    if (free < bytes) {
      throw RefusedInput.because("the scratch folder has too little space")
          .in(folder.toString())
          .found(free / 1_000_000 + " MB free")
          .expected("at least " + bytes / 1_000_000 + " MB")
          .remedy("free some space or set TMPDIR to a larger disk");
    }
    return new MappedRows(rows, width, folder);
  }
}
