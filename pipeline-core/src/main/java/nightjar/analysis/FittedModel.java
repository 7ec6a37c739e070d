package nightjar.analysis;

import java.util.ArrayList;
import java.util.List;
import java.util.function.UnaryOperator;
import nightjar.design.DesignBasis;
import nightjar.design.DesignColumn;
import nightjar.design.DesignMatrix;
import nightjar.design.DesignRequest;
import nightjar.design.MotionColumns;
import nightjar.design.SessionDesign;
import nightjar.film.FloatRows;
import nightjar.glm.Glm;
import nightjar.glm.GlmFit;
import nightjar.glm.LinearModel;
import nightjar.inference.AdjustedTests;
import nightjar.mask.Smoothing;
import nightjar.plan.Plan;
import nightjar.recording.Grid;
import nightjar.recording.KeptFrames;
import nightjar.recording.Mask;
import nightjar.recording.Progress;
import nightjar.recording.VoxelOrder;
import nightjar.results.MapFindings;

/**
 * The one linear model of the session: columns, noise, contrasts (numerics 6 to 9), fitted to every
 * voxel.
 *
 * @param request what the design was made from
 * @param design as fitted
 * @param models one, or one a plane
 * @param fit of every mask voxel
 */
record FittedModel(
    DesignRequest request, SessionDesign design, List<LinearModel> models, GlmFit fit) {

  static FittedModel of(OpenedSession session, PreparedFilm film, Machine machine) {
    Plan plan = session.plan();
    KeptFrames kept = film.judgement().kept();
    DesignRequest request =
        EarlyDesignCheck.request(plan, session.stimuli())
            .withNuisance(
                MotionColumns.of(film.motion(), session.recording().times(), plan.nuisance()));
    SessionDesign design = SessionDesign.build(request, kept, session.offsets().clocks());
    Progress progress = machine.stages().begin("fitting the model", StageShares.FITTING);
    List<LinearModel> models = new ArrayList<>();
    for (DesignMatrix matrix : design.planes()) {
      models.add(
          LinearModel.of(
              DesignBasis.of(matrix, kept),
              plan.contrasts(),
              stimulusColumns(matrix),
              plan.noise()));
    }
    List<Glm.Part> parts = parts(models, film.series().order(), session);
    GlmFit fit =
        plan.noise().smoothingMillimetres() > 0
            ? Glm.fitWithSmoothedCorrelation(
                film.series().rows(),
                parts,
                smoothing(session, film.series().order(), machine),
                machine.workers(),
                progress)
            : Glm.fit(film.series().rows(), parts, machine.workers(), progress);
    return new FittedModel(request, design, models, fit);
  }

  private static List<String> stimulusColumns(DesignMatrix matrix) {
    return matrix.columns().stream()
        .filter(DesignColumn::isOfStimulus)
        .map(DesignColumn::name)
        .toList();
  }

  /** All voxels, or those of each plane with the model of its clock. */
  private static List<Glm.Part> parts(
      List<LinearModel> models, VoxelOrder order, OpenedSession session) {
    if (models.size() == 1) {
      return List.of(new Glm.Part(models.get(0), 0, order.size()));
    }
    int planeVoxels = session.recording().grid().planeVoxels();
    List<Glm.Part> parts = new ArrayList<>();
    for (int p = 0; p < models.size(); p++) {
      int first = order.firstAtOrAfter(p * planeVoxels);
      int end = order.firstAtOrAfter((p + 1) * planeVoxels);
      parts.add(new Glm.Part(models.get(p), first, end));
    }
    return parts;
  }

  private static UnaryOperator<double[]> smoothing(
      OpenedSession session, VoxelOrder order, Machine machine) {
    double width = session.plan().noise().smoothingMillimetres();
    Grid grid = session.recording().grid();
    return q -> {
      float[] image = new float[q.length];
      for (int k = 0; k < image.length; k++) {
        image[k] = (float) q[k];
      }
      image = order.spread(image, Float.NaN);
      float[] spread = image;
      try (FloatRows one = machine.scratch().allocate(1, image.length)) {
        one.write(0, 0, image.length, image, 0);
        Mask mask = Mask.of(image.length, v -> !Float.isNaN(spread[v]));
        Smoothing.smooth(one, grid, mask, width, machine.workers());
        one.read(0, 0, image.length, image, 0);
      }
      double[] smooth = new double[q.length];
      for (int k = 0; k < smooth.length; k++) {
        smooth[k] = image[order.voxel(k)];
      }
      return smooth;
    };
  }

  /** The maps' part of the results. */
  MapFindings maps(OpenedSession session, PreparedFilm film) {
    Plan plan = session.plan();
    return new MapFindings(
        film.series(),
        film.meanPower(),
        fit,
        AdjustedTests.of(fit, plan.contrasts().size(), plan.inference()),
        new MapFindings.Model(
            stimulusColumns(design.ofPlane(0)),
            plan.contrasts(),
            plan.inference(),
            models.get(0).residualDegreesOfFreedom()));
  }
}
