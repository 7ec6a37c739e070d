package nightjar.demo;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;

/**
 * A synthetic session of the invented whisker-puff experiment; the same settings give the same
 * bytes on every machine.
 *
 * @param name first part of the file names
 * @param seed of everything random
 * @param scan how it is recorded
 * @param animal whom
 * @param disturbance what spoils it
 * @param rho first-order autocorrelation of the voxel noise
 */
public record DemoSession(
    String name,
    long seed,
    DemoScan scan,
    DemoAnimal animal,
    DemoDisturbance disturbance,
    double rho) {
  public DemoSession {
    if (!(rho >= 0 && rho < 1)) {
      throw new IllegalArgumentException("autocorrelation " + rho + " is not in [0, 1)");
    }
  }

  /**
   * Writes {@code <name>.nc}, {@code <name>_events.tsv} and {@code <name>_truth.json}, frame by
   * frame, into an existing or new folder; files of these names are replaced.
   */
  public DemoFiles writeTo(Path folder) {
    DemoTruth truth = DemoTruth.draw(this);
    DemoFiles files = DemoFiles.in(folder, name);
    try {
      Files.createDirectories(folder);
      DemoRecording.write(this, truth, files.recording());
      Files.writeString(files.events(), TrialSchedule.text(truth.events()));
      Files.writeString(files.truth(), TruthText.of(this, truth));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
    return files;
  }

  /** Planted plateau of a region's response, percent of the power at rest. */
  double percent(DemoRegion region, DemoStimulus stimulus) {
    return animal.responseShare() * region.percent(stimulus);
  }
}
