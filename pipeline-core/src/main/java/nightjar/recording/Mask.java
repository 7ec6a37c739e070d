package nightjar.recording;

import java.util.BitSet;
import java.util.function.IntPredicate;

/** A set of voxels of a grid. Immutable. */
public final class Mask {
  private final BitSet bits;
  private final int size;

  private Mask(BitSet bits, int size) {
    this.bits = bits;
    this.size = size;
  }

  /** The voxels from 0 to {@code size - 1} that satisfy {@code inside}. */
  public static Mask of(int size, IntPredicate inside) {
    BitSet b = new BitSet(size);
    for (int v = 0; v < size; v++) {
      if (inside.test(v)) {
        b.set(v);
      }
    }
    return new Mask(b, size);
  }

  /** Every voxel of a grid of {@code size} voxels. */
  public static Mask all(int size) {
    return of(size, v -> true);
  }

  /** Number of voxels of the grid. */
  public int size() {
    return size;
  }

  /** Number of voxels inside. */
  public int count() {
    return bits.cardinality();
  }

  /** Whether voxel {@code v} is inside. */
  public boolean contains(int v) {
    return bits.get(v);
  }

  /** Voxels in both masks. */
  public Mask and(Mask other) {
    return of(size, v -> bits.get(v) && other.bits.get(v));
  }

  /** The voxels inside in ascending order. */
  public VoxelOrder order() {
    return VoxelOrder.of(bits.stream().toArray(), size);
  }

  @Override
  public boolean equals(Object o) {
    return o instanceof Mask m && m.size == size && m.bits.equals(bits);
  }

  @Override
  public int hashCode() {
    return bits.hashCode();
  }
}
