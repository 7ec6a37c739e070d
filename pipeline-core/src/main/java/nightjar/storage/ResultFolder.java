package nightjar.storage;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.channels.FileChannel;
import java.nio.file.FileVisitResult;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.SimpleFileVisitor;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.nio.file.attribute.BasicFileAttributes;
import java.util.List;
import java.util.stream.Stream;
import nightjar.refusal.RefusedInput;

/**
 * A result folder that is complete or absent: files are written beside it and the whole is renamed
 * at the end. What is unfinished disappears on {@link #close} and when the process is stopped.
 */
public final class ResultFolder implements AutoCloseable {
  private final Path target;
  private final Path unfinished;
  private final Thread onStop;
  private boolean complete;

  private ResultFolder(Path target, Path unfinished) {
    this.target = target;
    this.unfinished = unfinished;
    this.onStop = new Thread(() -> deleteAll(unfinished), "nightjar-cleaning");
    Runtime.getRuntime().addShutdownHook(onStop);
  }

  /**
   * Begins a folder that will be called {@code target}.
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
      if (Files.exists(absolute) && !isEmptyFolder(absolute)) {
        throw refused(
                target,
                Files.isDirectory(absolute)
                    ? "the result folder exists and is not empty"
                    : "the result folder's name is taken by a file")
            .remedy("name another folder or move this one away");
      }
      Files.createDirectories(parent);
      return new ResultFolder(
          absolute, Files.createTempDirectory(parent, "." + absolute.getFileName() + ".part-"));
    } catch (IOException e) {
      throw refused(target, "the result folder cannot be made")
          .found(String.valueOf(e.getMessage()))
          .remedy("name a folder that you may write to");
    }
  }

  private static RefusedInput refused(Path target, String what) {
    return RefusedInput.because(what).in(target.toString()).at("--out");
  }

  private static boolean isEmptyFolder(Path path) throws IOException {
    if (!Files.isDirectory(path)) {
      return false;
    }
    try (Stream<Path> inside = Files.list(path)) {
      return inside.findAny().isEmpty();
    }
  }

  /** Where the file called {@code name} is to be written. */
  public Path file(String name) {
    return unfinished.resolve(name);
  }

  /** Forces the files to disk and gives the folder its name. */
  public void complete() {
    try {
      List<Path> files;
      try (Stream<Path> inside = Files.list(unfinished)) {
        files = inside.toList();
      }
      for (Path file : files) {
        try (FileChannel c = FileChannel.open(file, StandardOpenOption.WRITE)) {
          c.force(true);
        }
      }
      Files.deleteIfExists(target);
      Files.move(unfinished, target, StandardCopyOption.ATOMIC_MOVE);
      complete = true;
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Removes the folder unless it is complete. */
  @Override
  public void close() {
    if (!complete) {
      deleteAll(unfinished);
    }
    try {
      Runtime.getRuntime().removeShutdownHook(onStop);
    } catch (IllegalStateException e) {
      // The process is stopping: the hook runs, and has nothing left to do.
      return;
    }
  }

  private static void deleteAll(Path folder) {
    if (!Files.exists(folder)) {
      return;
    }
    try {
      Files.walkFileTree(
          folder,
          new SimpleFileVisitor<>() {
            @Override
            public FileVisitResult visitFile(Path file, BasicFileAttributes a) throws IOException {
              Files.delete(file);
              return FileVisitResult.CONTINUE;
            }

            @Override
            public FileVisitResult postVisitDirectory(
                Path dir, @org.jspecify.annotations.Nullable IOException e) throws IOException {
              Files.delete(dir);
              return FileVisitResult.CONTINUE;
            }
          });
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }
}
