package nightjar.analysis;

import nightjar.plan.Plan;
import nightjar.recording.KeptFrames;
import nightjar.recording.Progress;
import nightjar.regions.EventLockedResponses;
import nightjar.regions.RegionFits;
import nightjar.regions.RegionModel;
import nightjar.regions.RegionSeries;
import nightjar.results.RegionFindings;

/** Region series, region fits, event-locked responses (numerics 12). */
final class RegionStage {
  private RegionStage() {}

  static RegionFindings of(
      OpenedSession session, PreparedFilm film, FittedModel model, Machine machine) {
    Progress progress = machine.stages().begin("averaging regions", StageShares.REGIONS);
    Plan plan = session.plan();
    KeptFrames kept = film.judgement().kept();
    RegionModel regionModel =
        new RegionModel(
            model.models().get(0),
            model.design(),
            model.request(),
            session.offsets(),
            kept,
            plan.contrasts(),
            plan.noise(),
            plan.inference());
    RegionSeries series =
        RegionSeries.of(
            film.series().rows(),
            film.series().order(),
            session.recording().grid(),
            session.regions().regions(),
            machine.scratch(),
            machine.workers());
    RegionFits fits = RegionFits.of(regionModel, series, machine.workers());
    progress.report(0.5);
    RegionFindings findings =
        new RegionFindings(
            session.regions(),
            fits,
            fits.contrasts(session.regions().regions()),
            EventLockedResponses.of(fits, plan.responses()));
    progress.report(1);
    return findings;
  }
}
