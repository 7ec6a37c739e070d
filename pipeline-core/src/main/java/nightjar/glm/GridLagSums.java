package nightjar.glm;

import java.util.ArrayList;
import java.util.List;
import nightjar.numeric.LagSums;

/**
 * Sums of products of row vectors at every lag of the frame grid, within segments and added up over
 * them; missing grid positions count as zero.
 */
final class GridLagSums {
  private final RowLinks links;
  private final List<Integer> starts = new ArrayList<>();
  private final List<Integer> lengths = new ArrayList<>();
  private final List<LagSums> segments = new ArrayList<>();
  private int longest;

  GridLagSums(RowLinks links) {
    this.links = links;
    int start = 0;
    int position = 0;
    for (int r = 1; r <= links.rows(); r++) {
      if (r == links.rows() || links.isFirst(r)) {
        starts.add(start);
        lengths.add(position + 1);
        segments.add(new LagSums(position + 1));
        longest = Math.max(longest, position + 1);
        start = r;
        position = 0;
      } else {
        position += links.lag(r);
      }
    }
  }

  /** Adds {@code weight * sum_i x_i y_(i+k)} to every lag k. */
  void add(double[] x, double[] y, double weight) {
    for (int s = 0; s < segments.size(); s++) {
      double[] gx = spread(x, s);
      segments.get(s).add(gx, x == y ? gx : spread(y, s), weight);
    }
  }

  private double[] spread(double[] rows, int s) {
    double[] g = new double[lengths.get(s)];
    int position = 0;
    for (int r = starts.get(s);
        r < links.rows() && (r == starts.get(s) || !links.isFirst(r));
        r++) {
      position += r == starts.get(s) ? 0 : links.lag(r);
      g[position] = rows[r];
    }
    return g;
  }

  /** The sums so far, from lag 0 to the longest segment. */
  double[] sums() {
    double[] total = new double[longest];
    for (LagSums s : segments) {
      double[] part = s.sums();
      for (int k = 0; k < part.length; k++) {
        total[k] += part[k];
      }
    }
    return total;
  }
}
