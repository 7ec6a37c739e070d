package nightjar.analysis;

/** Share of a run's time that each stage usually takes; they sum to 1. */
final class StageShares {
  static final double OPENING = 0.02;
  static final double READING = 0.08;
  static final double ALIGNING = 0.50;
  static final double SCREENING = 0.15;
  static final double SCALING = 0.05;
  static final double FITTING = 0.15;
  static final double REGIONS = 0.02;
  static final double WRITING = 0.03;

  private StageShares() {}
}
