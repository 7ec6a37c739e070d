package nightjar.regions;

import java.util.List;
import java.util.stream.IntStream;
import nightjar.film.FloatRows;
import nightjar.film.Scratch;
import nightjar.numeric.Workers;
import nightjar.recording.Grid;
import nightjar.recording.Region;
import nightjar.recording.VoxelOrder;

/** Means of the percent series over the mask voxels of each region that has any. */
public final class RegionSeries implements AutoCloseable {
  private static final int FRAMES_A_BLOCK = 64;

  private final FloatRows rows;
  private final List<RegionVoxels> regions;

  /** A region's places within the series' rows. */
  private static final class RegionVoxels {
    final Region region;
    final int[] positions;
    final double[] planeShares;

    RegionVoxels(Region region, VoxelOrder order, Grid grid) {
      this.region = region;
      this.positions =
          IntStream.range(0, order.size())
              .filter(k -> region.voxels().contains(order.voxel(k)))
              .toArray();
      this.planeShares = new double[grid.planes().size()];
      for (int k : positions) {
        planeShares[grid.planeOf(order.voxel(k))] += 1.0 / positions.length;
      }
    }
  }

  private RegionSeries(FloatRows rows, List<RegionVoxels> regions) {
    this.rows = rows;
    this.regions = regions;
  }

  /** Averages; regions without mask voxels are left out. */
  public static RegionSeries of(
      FloatRows series,
      VoxelOrder order,
      Grid grid,
      List<Region> regions,
      Scratch scratch,
      Workers workers) {
    List<RegionVoxels> present =
        regions.stream()
            .map(r -> new RegionVoxels(r, order, grid))
            .filter(r -> r.positions.length > 0)
            .toList();
    FloatRows means = scratch.allocate(series.rows(), present.size());
    workers.forEachBlock(
        series.rows(),
        FRAMES_A_BLOCK,
        (first, end) -> {
          float[] row = new float[series.width()];
          float[] mean = new float[present.size()];
          for (int t = first; t < end; t++) {
            series.read(t, 0, row.length, row, 0);
            for (int r = 0; r < mean.length; r++) {
              double sum = 0;
              for (int k : present.get(r).positions) {
                sum += row[k];
              }
              mean[r] = (float) (sum / present.get(r).positions.length);
            }
            means.write(t, 0, mean.length, mean, 0);
          }
        });
    return new RegionSeries(means, present);
  }

  /** Number of regions with voxels. */
  public int size() {
    return regions.size();
  }

  /** Region {@code r}. */
  public Region region(int r) {
    return regions.get(r).region;
  }

  /** Its number of mask voxels. */
  public int voxels(int r) {
    return regions.get(r).positions.length;
  }

  /** Share of its voxels in each plane; shared, not copied. */
  double[] planeShares(int r) {
    return regions.get(r).planeShares;
  }

  /** Kept frames by regions, percent. */
  public FloatRows rows() {
    return rows;
  }

  @Override
  public void close() {
    rows.close();
  }
}
