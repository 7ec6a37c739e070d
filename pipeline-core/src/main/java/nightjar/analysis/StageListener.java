package nightjar.analysis;

import nightjar.recording.Progress;

/** Hears which stage of an analysis runs. */
@FunctionalInterface
public interface StageListener {
  /** Nobody listens. */
  StageListener SILENT = (name, share) -> Progress.SILENT;

  /**
   * A stage begins; the one before has ended.
   *
   * @param name for people, such as "aligning"
   * @param share of the whole run that the stage is expected to take; all shares sum to 1
   * @return hears how far the stage is
   */
  Progress stage(String name, double share);
}
