package nightjar.demo;

/** The invented stimuli: gentle air puffs to the whiskers of one side, or beside the head. */
enum DemoStimulus {
  LEFT_PUFF,
  RIGHT_PUFF,
  SHAM_PUFF;

  /** Name in the event table. */
  String label() {
    return name().toLowerCase(java.util.Locale.ROOT);
  }

  /** The value that belongs to this stimulus. */
  double choose(double leftPuff, double rightPuff, double shamPuff) {
    return switch (this) {
      case LEFT_PUFF -> leftPuff;
      case RIGHT_PUFF -> rightPuff;
      case SHAM_PUFF -> shamPuff;
    };
  }
}
