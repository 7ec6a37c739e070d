package nightjar.glm;

import java.util.List;
import java.util.concurrent.atomic.AtomicLong;
import java.util.function.UnaryOperator;
import nightjar.film.FloatRows;
import nightjar.numeric.Workers;
import nightjar.recording.Progress;

/**
 * Fits the linear model to every series of a set of rows, in blocks of series that share one pass
 * over the rows.
 */
public final class Glm {
  private static final int BLOCK = 256;

  private Glm() {}

  /**
   * A range of series with the model that holds for them.
   *
   * @param model its rows are those of the series
   * @param first first series
   * @param end one after the last series
   */
  public record Part(LinearModel model, int first, int end) {}

  /**
   * Fits each series with its own noise estimate.
   *
   * @param rows kept frames by series
   * @param parts cover all series, with equal contrasts and estimates
   */
  public static GlmFit fit(FloatRows rows, List<Part> parts, Workers workers, Progress progress) {
    GlmFit fit = empty(rows, parts);
    blocks(
        rows,
        parts,
        workers,
        progress,
        (model, moments, first, end) -> {
          SeriesSolver solver = new SeriesSolver(model);
          for (int v = first; v < end; v++) {
            double q =
                model.firstOrder().isPresent() ? solver.laggedCorrelation(moments, v - first) : 0;
            solver.solve(moments, v - first, q, fit, v);
          }
        });
    return fit;
  }

  /**
   * Fits each series with lagged correlations that {@code smoothing} has made from those of all
   * series, before they are turned into AR(1) coefficients; two passes over the rows.
   */
  public static GlmFit fitWithSmoothedCorrelation(
      FloatRows rows,
      List<Part> parts,
      UnaryOperator<double[]> smoothing,
      Workers workers,
      Progress progress) {
    double[] q = new double[rows.width()];
    blocks(
        rows,
        parts,
        workers,
        share -> progress.report(share / 2),
        (model, moments, first, end) -> {
          SeriesSolver solver = new SeriesSolver(model);
          for (int v = first; v < end; v++) {
            q[v] = solver.laggedCorrelation(moments, v - first);
          }
        });
    double[] smooth = smoothing.apply(q);
    GlmFit fit = empty(rows, parts);
    blocks(
        rows,
        parts,
        workers,
        share -> progress.report(0.5 + share / 2),
        (model, moments, first, end) -> {
          SeriesSolver solver = new SeriesSolver(model);
          for (int v = first; v < end; v++) {
            solver.solve(moments, v - first, smooth[v], fit, v);
          }
        });
    return fit;
  }

  private static GlmFit empty(FloatRows rows, List<Part> parts) {
    LinearModel first = parts.get(0).model();
    return new GlmFit(rows.width(), first.contrasts(), first.estimates());
  }

  @FunctionalInterface
  private interface BlockWork {
    void run(LinearModel model, VoxelMoments moments, int first, int end);
  }

  private static void blocks(
      FloatRows rows, List<Part> parts, Workers workers, Progress progress, BlockWork work) {
    AtomicLong done = new AtomicLong();
    for (Part part : parts) {
      workers.forEachBlock(
          part.end() - part.first(),
          BLOCK,
          (from, to) -> {
            VoxelMoments moments = new VoxelMoments(part.model().moments(), to - from);
            moments.sum(rows, part.first() + from, part.first() + to);
            work.run(part.model(), moments, part.first() + from, part.first() + to);
            progress.report((double) done.addAndGet(to - from) / rows.width());
          });
    }
  }
}
