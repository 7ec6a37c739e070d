package nightjar.regions;

import java.util.List;
import nightjar.design.DesignRequest;
import nightjar.design.SessionDesign;
import nightjar.glm.Contrast;
import nightjar.glm.LinearModel;
import nightjar.glm.NoiseSettings;
import nightjar.inference.InferenceSettings;
import nightjar.recording.KeptFrames;
import nightjar.recording.PlaneOffsets;

/**
 * The session's model as it is fitted to regions.
 *
 * @param voxelModel what voxels (of the first plane, where planes have clocks of their own) were
 *     fitted with
 * @param design columns, one design or one a plane
 * @param request what the design was made from
 * @param offsets the planes' clocks
 * @param kept rows of the fit
 * @param contrasts tested against zero
 * @param noise noise model
 * @param inference adjustment over regions
 */
public record RegionModel(
    LinearModel voxelModel,
    SessionDesign design,
    DesignRequest request,
    PlaneOffsets offsets,
    KeptFrames kept,
    List<Contrast> contrasts,
    NoiseSettings noise,
    InferenceSettings inference) {}
