package nightjar.storage;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.nio.ByteBuffer;
import java.util.Arrays;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.Test;

class ClassicDefinitionTest {
  /**
   * The example of the NetCDF Classic Format Specification (Unidata, appendix "Examples"): a file
   * with the dimension {@code dim} of 5 and the short variable {@code vx(dim)}. The example is in
   * the variant of 32-bit offsets; here the version is 2 and {@code begin} has eight bytes.
   */
  @Test
  void theExampleOfTheSpecificationHasItsBytes() {
    ClassicDefinition d = new ClassicDefinition(Map.of());
    d.dimension("dim", 5);
    d.variable("vx", List.of("dim"), ClassicDefinition.Type.SHORT, Map.of());
    String expected =
        "43444602" // CDF, version
            + "00000000" // no records
            + "0000000a00000001" // one dimension
            + "0000000364696d00" // dim
            + "00000005"
            + "0000000000000000" // no global attributes
            + "0000000b00000001" // one variable
            + "0000000276780000" // vx
            + "0000000100000000" // of one dimension, the first
            + "0000000000000000" // no attributes
            + "00000003" // short
            + "0000000c" // 5 shorts padded to 12 bytes
            + "0000000000000054"; // begin
    assertEquals(expected, HexFormat.of().formatHex(d.bytes()));
    assertEquals(0x54, d.bytes().length, "data follow at once");
  }

  @Test
  void offsetsGoBeyondFourGigabytes() {
    ClassicDefinition d = new ClassicDefinition(Map.of());
    d.dimension("time", 1_000_000);
    d.dimension("voxel", 4000);
    d.variable("a", List.of("time"), ClassicDefinition.Type.FLOAT, Map.of());
    d.variable("b", List.of("time", "voxel"), ClassicDefinition.Type.BYTE, Map.of());
    d.variable("c", List.of("time", "voxel"), ClassicDefinition.Type.FLOAT, Map.of());
    byte[] bytes = d.bytes();
    long begin = bytes.length + 4_000_000L + 4_000_000_000L;
    byte[] end = Arrays.copyOfRange(bytes, bytes.length - 12, bytes.length);
    byte[] expected = ByteBuffer.allocate(12).putInt(0xFFFFFFFF).putLong(begin).array();
    assertArrayEquals(expected, end, "size 2^32 - 1 stands for larger, then the offset");
  }

  @Test
  void onlyTheLastVariableMayHaveFourGigabytes() {
    ClassicDefinition d = new ClassicDefinition(Map.of());
    d.dimension("time", 1_000_000);
    d.dimension("voxel", 4000);
    d.variable("big", List.of("time", "voxel"), ClassicDefinition.Type.FLOAT, Map.of());
    d.variable("after", List.of("time"), ClassicDefinition.Type.FLOAT, Map.of());
    assertThrows(IllegalArgumentException.class, d::bytes);
  }
}
