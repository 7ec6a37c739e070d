package nightjar.mask;

/**
 * Connected components of the cells {@code [depth][lateral]} of one plane. Inside, neighbours share
 * a face or an edge (8); outside, they share a face (4), so that a closed outline has an interior.
 */
final class PlaneShape {
  private static final int[][] FACES = {{-1, 0}, {1, 0}, {0, -1}, {0, 1}};
  private static final int[][] FACES_AND_EDGES = {
    {-1, 0}, {1, 0}, {0, -1}, {0, 1}, {-1, -1}, {-1, 1}, {1, -1}, {1, 1}
  };

  private final int depths;
  private final int laterals;
  private final int[] stack;

  PlaneShape(int depths, int laterals) {
    this.depths = depths;
    this.laterals = laterals;
    this.stack = new int[depths * laterals];
  }

  /** The component with most cells (the first of equals); empty where {@code inside} is. */
  boolean[] largestComponent(boolean[] inside) {
    int[] label = new int[inside.length];
    int largest = 0;
    int size = 0;
    int labels = 0;
    for (int i = 0; i < inside.length; i++) {
      if (inside[i] && label[i] == 0) {
        int n = flood(inside, label, i, ++labels, FACES_AND_EDGES);
        if (n > size) {
          size = n;
          largest = labels;
        }
      }
    }
    boolean[] kept = new boolean[inside.length];
    for (int i = 0; i < kept.length; i++) {
      kept[i] = size > 0 && label[i] == largest;
    }
    return kept;
  }

  /** Adds the cells outside that no path of outside cells joins to the plane's border. */
  boolean[] holesFilled(boolean[] inside) {
    boolean[] outside = new boolean[inside.length];
    for (int i = 0; i < outside.length; i++) {
      outside[i] = !inside[i];
    }
    int[] label = new int[inside.length];
    for (int i = 0; i < outside.length; i++) {
      if (outside[i] && label[i] == 0 && onBorder(i)) {
        flood(outside, label, i, 1, FACES);
      }
    }
    boolean[] filled = new boolean[inside.length];
    for (int i = 0; i < filled.length; i++) {
      filled[i] = label[i] == 0;
    }
    return filled;
  }

  private boolean onBorder(int i) {
    int z = i / laterals;
    int x = i % laterals;
    return z == 0 || x == 0 || z == depths - 1 || x == laterals - 1;
  }

  /** Labels the cells joined to {@code seed} and tells how many there are. */
  private int flood(boolean[] cells, int[] label, int seed, int name, int[][] neighbours) {
    int waiting = 0;
    int size = 0;
    stack[waiting++] = seed;
    label[seed] = name;
    while (waiting > 0) {
      int i = stack[--waiting];
      size++;
      for (int[] step : neighbours) {
        int z = i / laterals + step[0];
        int x = i % laterals + step[1];
        int j = z * laterals + x;
        if (z >= 0 && x >= 0 && z < depths && x < laterals && cells[j] && label[j] == 0) {
          label[j] = name;
          stack[waiting++] = j;
        }
      }
    }
    return size;
  }
}
