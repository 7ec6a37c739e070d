package nightjar.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;

/** Values from colorbrewer2.org, PuOr with 11 classes and Dark2 with 8 (from memory). */
class PaletteTest {
  @Test
  void increaseEndsInTheDarkestOrange() {
    assertEquals("#7f3b08", Palette.css(Palette.diverging(1)));
    assertEquals("#7f3b08", Palette.css(Palette.diverging(7)));
  }

  @Test
  void decreaseEndsInTheDarkestPurple() {
    assertEquals("#2d004b", Palette.css(Palette.diverging(-1)));
    assertEquals("#2d004b", Palette.css(Palette.diverging(Double.NEGATIVE_INFINITY)));
  }

  @Test
  void passesThroughThePublishedColours() {
    String[] published = {
      "#7f3b08", "#b35806", "#e08214", "#fdb863", "#fee0b6", "#f7f7f7", "#d8daeb", "#b2abd2",
      "#8073ac", "#542788", "#2d004b"
    };
    for (int i = 0; i < published.length; i++) {
      assertEquals(published[i], Palette.css(Palette.diverging(1 - i / 5.0)));
    }
  }

  @Test
  void liesHalfwayBetweenNeighbours() {
    assertEquals("#994a07", Palette.css(Palette.diverging(0.9)));
  }

  @Test
  void namedThingsTakeDark2InOrder() {
    assertEquals("#1b9e77", Palette.css(Palette.category(0)));
    assertEquals("#d95f02", Palette.css(Palette.category(1)));
    assertEquals("#666666", Palette.css(Palette.category(7)));
    assertEquals(Palette.category(0), Palette.category(8));
  }
}
