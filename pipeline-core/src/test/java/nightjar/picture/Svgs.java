package nightjar.picture;

import java.io.IOException;
import java.io.StringReader;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.w3c.dom.Document;
import org.xml.sax.InputSource;
import org.xml.sax.SAXException;

/** Reads a picture back as XML: what a browser would refuse fails here. */
final class Svgs {
  private Svgs() {}

  static Document parse(String svg) {
    try {
      return DocumentBuilderFactory.newDefaultInstance()
          .newDocumentBuilder()
          .parse(new InputSource(new StringReader(svg)));
    } catch (SAXException | IOException | ParserConfigurationException e) {
      throw new AssertionError(svg, e);
    }
  }

  static int count(Document d, String element) {
    return d.getElementsByTagName(element).getLength();
  }

  static String title(Document d) {
    return d.getElementsByTagName("title").item(0).getTextContent();
  }
}
