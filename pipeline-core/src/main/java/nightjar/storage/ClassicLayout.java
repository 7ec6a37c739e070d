package nightjar.storage;

import static nightjar.storage.StoredVariable.plus;
import static nightjar.storage.StoredVariable.times;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import nightjar.refusal.RefusedInput;

/**
 * Where the values of a classic file lie, worked out from its header and checked against the length
 * of the file: every variable ends within the file and none overlaps another or the header.
 *
 * <p>Variables without the record dimension lie each in one piece. The others share records: record
 * r holds row r of each of them in turn, each padded to four bytes (unless there is only one).
 */
final class ClassicLayout {
  /** A header that says so leaves the number of records to the length of the file. */
  private static final long STREAMING = 0xffffffffL;

  /**
   * Where the rows of a variable lie.
   *
   * @param begin offset of the first row
   * @param rowBytes bytes a row
   * @param stride bytes from row to row
   */
  record Place(long begin, long rowBytes, long stride) {}

  private record Extent(String of, long begin, long end) {}

  private final ClassicHeader header;
  private final HeaderBytes bytes;
  private final String fileName;
  private final Map<StoredVariable, Place> places = new LinkedHashMap<>();

  ClassicLayout(ClassicHeader header, HeaderBytes bytes, String fileName) {
    this.header = header;
    this.bytes = bytes;
    this.fileName = fileName;
    List<ClassicHeader.Entry> records = header.entries().stream().filter(this::isRecord).toList();
    long recordBytes = recordBytes(records);
    long firstRecord =
        records.stream().mapToLong(ClassicHeader.Entry::begin).min().orElse(bytes.fileBytes());
    long count = recordCount(records, recordBytes, firstRecord);
    List<Extent> extents = new ArrayList<>();
    extents.add(new Extent("the header", 0, bytes.position()));
    for (ClassicHeader.Entry e : header.entries()) {
      StoredVariable v = variable(e, count);
      long rowBytes = rowBytes(e);
      long stride = isRecord(e) ? recordBytes : rowBytes;
      places.put(v, new Place(e.begin(), rowBytes, stride));
      if (v.values() > 0) {
        long all = isRecord(e) ? rowBytes : times(v.rows(), rowBytes);
        extents.add(new Extent(e.name(), e.begin(), plus(e.begin(), all)));
        checkWrittenSize(e, v, rowBytes);
        checkEnd(v, new Place(e.begin(), rowBytes, stride));
      }
    }
    checkOverlaps(extents);
    if (count > 1 && !records.isEmpty()) {
      checkRecords(extents, records, plus(firstRecord, recordBytes));
    }
  }

  /** The variables with their places, in the order of the header. */
  Map<StoredVariable, Place> places() {
    return places;
  }

  private boolean isRecord(ClassicHeader.Entry e) {
    return !e.dimensions().isEmpty() && e.dimensions().get(0) == header.recordDimension();
  }

  private StoredVariable variable(ClassicHeader.Entry e, long records) {
    List<StoredDimension> dims = new ArrayList<>();
    for (int number : e.dimensions()) {
      StoredDimension d = header.dimensions().get(number);
      dims.add(number == header.recordDimension() ? new StoredDimension(d.name(), records) : d);
    }
    return new StoredVariable(e.name(), e.type(), dims, e.attributes());
  }

  private long rowBytes(ClassicHeader.Entry e) {
    long n = e.type().bytes();
    for (int i = 1; i < e.dimensions().size(); i++) {
      n = times(n, header.dimensions().get(e.dimensions().get(i)).length());
    }
    return n;
  }

  private long recordBytes(List<ClassicHeader.Entry> records) {
    long sum = 0;
    for (ClassicHeader.Entry e : records) {
      long n = rowBytes(e);
      sum = plus(sum, records.size() == 1 ? n : padded(n));
    }
    return sum;
  }

  private static long padded(long n) {
    return n > Long.MAX_VALUE - 3 ? n : (n + 3) & ~3L;
  }

  private long recordCount(List<ClassicHeader.Entry> records, long recordBytes, long firstRecord) {
    if (header.recordCount() != STREAMING) {
      return header.recordCount();
    }
    if (records.isEmpty() || recordBytes == 0 || firstRecord >= bytes.fileBytes()) {
      return 0;
    }
    // The padding of the very last row may be absent.
    int padding = records.size() == 1 ? 0 : 3;
    return (bytes.fileBytes() - firstRecord + padding) / recordBytes;
  }

  private void checkEnd(StoredVariable v, Place place) {
    long lastRow = times(v.rows() - 1, place.stride());
    long end = plus(plus(place.begin(), lastRow), place.rowBytes());
    if (place.begin() < 0 || end > bytes.fileBytes()) {
      throw RefusedInput.because("the file is cut off: the values do not fit into it")
          .in(fileName)
          .at("variable " + v.name())
          .found(bytes.fileBytes() + " bytes")
          .expected("at least " + (end == Long.MAX_VALUE ? "2^63" : end))
          .remedy("copy the file again from where it was recorded");
    }
  }

  /**
   * The header says the size of a variable twice: by its dimensions and in so many bytes. Where the
   * two differ one of them was damaged, and frames of the wrong size would be read as garbage.
   */
  private void checkWrittenSize(ClassicHeader.Entry e, StoredVariable v, long rowBytes) {
    long size = isRecord(e) ? rowBytes : times(v.rows(), rowBytes);
    boolean tooLargeToWrite = padded(size) > STREAMING - 3;
    if (!tooLargeToWrite && e.writtenSize() != size && e.writtenSize() != padded(size)) {
      throw RefusedInput.because("the header is damaged: it gives two sizes of the variable")
          .in(fileName)
          .at("variable " + v.name())
          .found(e.writtenSize() + " bytes")
          .expected(size + " bytes for " + v.shape())
          .remedy("copy the file again from where it was recorded");
    }
  }

  private void checkOverlaps(List<Extent> extents) {
    List<Extent> sorted = new ArrayList<>(extents);
    sorted.sort(Comparator.comparingLong(Extent::begin).thenComparingLong(Extent::end));
    for (int i = 1; i < sorted.size(); i++) {
      if (sorted.get(i).begin() < sorted.get(i - 1).end()) {
        throw overlap(sorted.get(i - 1).of(), sorted.get(i).of());
      }
    }
  }

  /** Records are the last part of the file, and one record ends where the next begins. */
  private void checkRecords(
      List<Extent> extents, List<ClassicHeader.Entry> records, long firstRecordEnd) {
    long first = records.stream().mapToLong(ClassicHeader.Entry::begin).min().orElseThrow();
    for (Extent x : extents) {
      if (x.begin() >= first && x.end() > firstRecordEnd) {
        throw overlap(x.of(), "the next record");
      }
    }
  }

  private RefusedInput overlap(String one, String other) {
    return RefusedInput.because("the header is damaged: " + one + " and " + other + " overlap")
        .in(fileName)
        .remedy("copy the file again from where it was recorded");
  }
}
