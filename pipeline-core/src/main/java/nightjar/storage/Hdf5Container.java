package nightjar.storage;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.Deque;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;

/**
 * A netCDF-4 file, read with the NetCDF library.
 *
 * <p>A handle of the library bears one thread and unpacking is slow, so there are as many handles
 * as threads that read, up to four.
 *
 * <p>Compressed data come in chunks of several frames, and a chunk is unpacked as a whole. So rows
 * are fetched in blocks as deep as the chunks, and the latest blocks are kept: reading frame by
 * frame unpacks each chunk once, as long as a block fits into a sixteenth of the memory.
 */
final class Hdf5Container implements Container {
  private static final long LARGEST_CHUNK_BYTES = 512L << 20;
  private static final long PIECE_BYTES = 16L << 20;
  private static final int KEPT_BLOCKS = 4;
  private static final int MOST_HANDLES = 4;

  private record Block(String variable, long firstRow) {}

  private final Path path;
  private final String fileName;
  private final Hdf5Handle first;
  private final List<Hdf5Handle> handles = new ArrayList<>();
  private final Deque<Hdf5Handle> free = new ArrayDeque<>();
  private final Map<Block, FutureTask<Object>> kept = new LinkedHashMap<>(16, 0.75f, true);

  private Hdf5Container(Path path, String fileName) {
    this.path = path;
    this.fileName = fileName;
    this.first = Hdf5Handle.open(path, fileName);
    handles.add(first);
    free.add(first);
  }

  /** Opens a file that begins with the signature of HDF5. */
  static Hdf5Container open(Path path) {
    String name = Container.fileNameOf(path);
    try (FileChannel channel = FileChannel.open(path, StandardOpenOption.READ)) {
      Hdf5Superblock.check(channel, name);
    } catch (IOException e) {
      throw Container.unreadable(name);
    }
    return new Hdf5Container(path, name);
  }

  @Override
  public String fileName() {
    return fileName;
  }

  @Override
  public String formatName() {
    return "netCDF-4";
  }

  @Override
  public List<StoredVariable> variables() {
    return first.variables();
  }

  @Override
  public Map<String, Attribute> attributes() {
    return first.attributes();
  }

  @Override
  public void read(StoredVariable variable, long firstRow, long rows, RawValues into) {
    Objects.checkFromIndexSize(firstRow, rows, variable.rows());
    if (variable.values() == 0) {
      return;
    }
    long depth = Math.min(chunkDepth(variable), variable.rows());
    long rowBytes = StoredVariable.times(variable.rowValues(), variable.type().bytes());
    long blockBytes = StoredVariable.times(depth, rowBytes);
    boolean keep = depth > 1 && blockBytes <= Runtime.getRuntime().maxMemory() / 16;
    long most = keep ? depth : Math.max(1, PIECE_BYTES / rowBytes);
    long end = firstRow + rows;
    for (long row = firstRow; row < end; ) {
      long from = keep ? row / depth * depth : row;
      long n = Math.min(end, from + most) - row;
      Object values =
          keep
              ? block(variable, from, Math.min(depth, variable.rows() - from))
              : fetch(variable, row, n);
      into.take(
          values, (int) ((row - from) * variable.rowValues()), (int) (n * variable.rowValues()));
      row += n;
    }
  }

  /** A block, unpacked by the first thread that asks for it; others wait for that one. */
  private Object block(StoredVariable variable, long firstRow, long rows) {
    Block key = new Block(variable.name(), firstRow);
    FutureTask<Object> block;
    synchronized (kept) {
      block = kept.get(key);
      if (block == null) {
        if (kept.size() >= KEPT_BLOCKS) {
          kept.remove(kept.keySet().iterator().next());
        }
        block = new FutureTask<>(() -> fetch(variable, firstRow, rows));
        kept.put(key, block);
      }
    }
    block.run();
    try {
      return block.get();
    } catch (ExecutionException e) {
      synchronized (kept) {
        kept.remove(key, block);
      }
      if (e.getCause() instanceof RuntimeException r) {
        throw r;
      }
      throw new IllegalStateException(e.getCause());
    } catch (InterruptedException e) {
      Thread.currentThread().interrupt();
      throw new CancellationException("interrupted");
    }
  }

  private Object fetch(StoredVariable variable, long firstRow, long rows) {
    Hdf5Handle handle = borrow();
    try {
      return handle.fetch(variable, firstRow, rows);
    } finally {
      giveBack(handle);
    }
  }

  private synchronized Hdf5Handle borrow() {
    while (free.isEmpty() && handles.size() == MOST_HANDLES) {
      try {
        wait();
      } catch (InterruptedException e) {
        Thread.currentThread().interrupt();
        throw new CancellationException("interrupted");
      }
    }
    if (free.isEmpty()) {
      Hdf5Handle another = Hdf5Handle.open(path, fileName);
      handles.add(another);
      return another;
    }
    return free.pop();
  }

  private synchronized void giveBack(Hdf5Handle handle) {
    free.push(handle);
    notifyAll();
  }

  /** Rows a chunk; 1 where the values lie in one piece. */
  private long chunkDepth(StoredVariable variable) {
    int[] chunk = first.chunk(variable);
    if (chunk.length == 0) {
      return 1;
    }
    long bytes = variable.type().bytes();
    for (int n : chunk) {
      bytes = StoredVariable.times(bytes, Math.max(0, n));
    }
    if (bytes <= 0 || bytes > LARGEST_CHUNK_BYTES) {
      throw refusal(variable, "its compressed pieces are too large")
          .found(Arrays.toString(chunk))
          .expected("at most " + (LARGEST_CHUNK_BYTES >> 20) + " MB a chunk")
          .remedy("write the file again with smaller chunks");
    }
    return chunk[0];
  }

  @Override
  public synchronized void close() {
    handles.forEach(Hdf5Handle::close);
    free.clear();
  }
}
