package nightjar.storage;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.CoderResult;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import nightjar.refusal.RefusedInput;

/** Reads a text file whole: UTF-8, with or without a byte-order mark, of limited size. */
final class WholeText {
  private static final int MEGABYTE = 1_000_000;
  private static final int LONGEST_SHOWN = 40;

  private WholeText() {}

  /**
   * The text of a file without its byte-order mark.
   *
   * @throws RefusedInput if the file cannot be read, is empty, has more than {@code mostMegabytes}
   *     (of a million bytes), or is not UTF-8
   */
  static String read(Path file, int mostMegabytes) {
    byte[] bytes = bytes(file, mostMegabytes);
    String text = decoded(bytes, file);
    text = text.startsWith("\uFEFF") ? text.substring(1) : text;
    if (text.isBlank()) {
      throw refusal(file, "the file is empty")
          .found(bytes.length + " bytes")
          .remedy("export it again");
    }
    return text;
  }

  /** Begins a refusal that names the file. */
  static RefusedInput refusal(Path file, String what) {
    return RefusedInput.because(what).in(name(file));
  }

  static String name(Path file) {
    return String.valueOf(file.getFileName());
  }

  /** A piece of the file for people: in quotation marks, short, every character visible. */
  static String shown(String piece) {
    StringBuilder s = new StringBuilder("\"");
    piece
        .codePoints()
        .limit(LONGEST_SHOWN)
        .forEach(
            c -> {
              if (isVisible(c)) {
                s.appendCodePoint(c);
              } else {
                s.append(String.format(Locale.ROOT, "<U+%04X>", c));
              }
            });
    boolean whole = piece.codePointCount(0, piece.length()) <= LONGEST_SHOWN;
    return s.append(whole ? "\"" : "...\"").toString();
  }

  /** Whether people see that the character is there: no control, format or line separator. */
  static boolean isVisible(int codePoint) {
    return switch (Character.getType(codePoint)) {
      case Character.CONTROL,
          Character.FORMAT,
          Character.LINE_SEPARATOR,
          Character.PARAGRAPH_SEPARATOR ->
          false;
      default -> true;
    };
  }

  private static byte[] bytes(Path file, int mostMegabytes) {
    int most = mostMegabytes * MEGABYTE;
    if (!Files.isRegularFile(file)) {
      throw refusal(file, Files.exists(file) ? "this is not a file" : "there is no such file")
          .remedy("check the name and the folder");
    }
    try (InputStream in = Files.newInputStream(file)) {
      byte[] bytes = in.readNBytes(most + 1);
      if (bytes.length > most) {
        throw refusal(file, "the file is too large")
            .found(Files.size(file) + " bytes")
            .expected("at most " + mostMegabytes + " MB")
            .remedy("check that it is the right file, or leave rows out");
      }
      return bytes;
    } catch (IOException e) {
      throw refusal(file, "the file cannot be read")
          .found(e.getClass().getSimpleName())
          .remedy("check its permissions");
    }
  }

  private static String decoded(byte[] bytes, Path file) {
    CharsetDecoder decoder =
        StandardCharsets.UTF_8
            .newDecoder()
            .onMalformedInput(CodingErrorAction.REPORT)
            .onUnmappableCharacter(CodingErrorAction.REPORT);
    ByteBuffer in = ByteBuffer.wrap(bytes);
    CharBuffer out = CharBuffer.allocate(bytes.length);
    CoderResult result = decoder.decode(in, out, true);
    if (result.isError()) {
      int line = 1;
      for (int i = 0; i < in.position(); i++) {
        line += bytes[i] == '\n' ? 1 : 0;
      }
      throw refusal(file, "the text is not UTF-8")
          .at("line " + line)
          .found(String.format(Locale.ROOT, "byte 0x%02X", bytes[in.position()]))
          .remedy("save it with the encoding UTF-8");
    }
    return out.flip().toString();
  }
}
