package nightjar.demo;

import java.util.List;
import nightjar.recording.EventTable;
import nightjar.recording.RigidMotion;

/** Everything that was drawn for a session before a frame was made. */
record DemoTruth(EventTable events, List<RigidMotion> motion, List<Flash> flashes) {
  DemoTruth {
    motion = List.copyOf(motion);
    flashes = List.copyOf(flashes);
  }

  static DemoTruth draw(DemoSession session) {
    var trials = TrialSchedule.of(session.scan(), new NormalStream(session.seed(), Purpose.TRIALS));
    return new DemoTruth(
        new EventTable(session.name() + "_events.tsv", trials),
        List.of(HeadMotion.draw(session, trials)),
        Flash.draw(
            session.disturbance().flashes(),
            session.scan().frames(),
            new NormalStream(session.seed(), Purpose.FLASHES)));
  }
}
