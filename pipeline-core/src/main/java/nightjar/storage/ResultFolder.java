package nightjar.storage;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.Comparator;
import java.util.List;
import java.util.UUID;
import java.util.stream.Stream;
import nightjar.refusal.RefusedInput;

/**
 * A result folder that is complete or absent: files are written beside it and the whole is renamed
 * at the end. What is unfinished disappears on {@link #close} and when the process is told to stop
 * (SIGINT, SIGTERM). Methods may be called from any thread.
 */
public final class ResultFolder implements AutoCloseable {
  private enum State {
    OPEN,
    COMPLETE,
    REMOVED
  }

  private final Path target;
  private final Path unfinished;
  private final Thread onStop;
  private State state = State.OPEN;

  private ResultFolder(Path target, Path unfinished) {
    this.target = target;
    this.unfinished = unfinished;
    this.onStop = new Thread(this::remove, "nightjar-cleaning");
    Runtime.getRuntime().addShutdownHook(onStop);
  }

  /**
   * Begins a folder that will be called {@code target}; folders above it are made where missing.
   *
   * @throws RefusedInput where it exists and is not an empty folder, or cannot be made
   */
  public static ResultFolder begin(Path target) {
    Path absolute = target.toAbsolutePath().normalize();
    Path parent = absolute.getParent();
    if (parent == null) {
      throw refused(target, "this cannot be a result folder").remedy("name a folder below it");
    }
    try {
      checkFree(target, absolute);
      Files.createDirectories(parent);
      // Not createTempDirectory, whose folder only its owner could read once it is renamed.
      return new ResultFolder(absolute, Files.createDirectory(beside(absolute, "part")));
    } catch (IOException e) {
      throw refused(target, "the result folder cannot be made")
          .found(e.getClass().getSimpleName() + " " + e.getMessage())
          .remedy("name a folder that you may write to");
    }
  }

  private static Path beside(Path absolute, String state) {
    return absolute.resolveSibling(
        "." + absolute.getFileName() + "." + state + "-" + UUID.randomUUID());
  }

  private static void checkFree(Path target, Path absolute) throws IOException {
    if (Files.isDirectory(absolute)) {
      try (Stream<Path> inside = Files.list(absolute)) {
        if (inside.findAny().isPresent()) {
          throw taken(target, "the result folder exists and is not empty");
        }
      }
    } else if (Files.exists(absolute)) {
      throw taken(target, "the result folder's name is taken by a file");
    }
  }

  private static RefusedInput taken(Path target, String what) {
    return refused(target, what).remedy("name another folder or move this one away");
  }

  private static RefusedInput refused(Path target, String what) {
    return RefusedInput.because(what).in(target.toString()).at("--out");
  }

  /** Where the file called {@code name} is to be written. */
  public Path file(String name) {
    return unfinished.resolve(name);
  }

  /**
   * Forces the files to disk and gives the folder its name.
   *
   * @throws RefusedInput if something else has taken the name in the meantime
   * @throws IllegalStateException if the folder is complete already or was removed
   */
  public synchronized void complete() {
    if (state != State.OPEN) {
      throw new IllegalStateException(target + " is " + state);
    }
    try {
      for (Path path : contents(unfinished)) {
        force(path);
      }
      checkFree(target, target);
      // Replaces an empty folder in one step, and fails for one with content.
      Files.move(unfinished, target, StandardCopyOption.ATOMIC_MOVE);
      state = State.COMPLETE;
      force(target.resolveSibling("."));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private static void force(Path path) throws IOException {
    try (FileChannel c = FileChannel.open(path, StandardOpenOption.READ)) {
      c.force(true);
    }
  }

  /** Removes the folder unless it is complete. */
  @Override
  public void close() {
    remove();
    try {
      Runtime.getRuntime().removeShutdownHook(onStop);
    } catch (IllegalStateException e) {
      // The process is stopping: the hook runs, and has nothing left to do.
      return;
    }
  }

  /** Waits for a completion that has begun, so that no half of a folder gets the name. */
  private synchronized void remove() {
    if (state != State.OPEN) {
      return;
    }
    state = State.REMOVED;
    try {
      // The name goes first, so that a thread that still writes can add no further file.
      Path removed = beside(target, "removed");
      Files.move(unfinished, removed, StandardCopyOption.ATOMIC_MOVE);
      for (Path path : contents(removed)) {
        Files.delete(path);
      }
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Everything in a folder and at last the folder itself. */
  private static List<Path> contents(Path folder) throws IOException {
    try (Stream<Path> all = Files.walk(folder)) {
      return all.sorted(Comparator.reverseOrder()).toList();
    }
  }
}
