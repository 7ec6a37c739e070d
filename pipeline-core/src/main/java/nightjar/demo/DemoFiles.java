package nightjar.demo;

import java.nio.file.Path;

/** The files of a written session. */
public record DemoFiles(Path recording, Path events, Path truth) {
  static DemoFiles in(Path folder, String name) {
    return new DemoFiles(
        folder.resolve(name + ".nc"),
        folder.resolve(name + "_events.tsv"),
        folder.resolve(name + "_truth.json"));
  }
}
