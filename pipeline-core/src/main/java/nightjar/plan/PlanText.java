package nightjar.plan;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.Optional;
import nightjar.refusal.RefusedInput;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Compose;
import org.snakeyaml.engine.v2.api.lowlevel.Parse;
import org.snakeyaml.engine.v2.events.AliasEvent;
import org.snakeyaml.engine.v2.events.CollectionEndEvent;
import org.snakeyaml.engine.v2.events.CollectionStartEvent;
import org.snakeyaml.engine.v2.events.DocumentStartEvent;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.events.NodeEvent;
import org.snakeyaml.engine.v2.events.ScalarEvent;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.schema.CoreSchema;

/**
 * The text of a plan as a tree of nodes with their places: YAML 1.2, core schema, one document, no
 * anchors, aliases or tags, at most 1 MB and 20 levels.
 *
 * @param fileName for messages
 */
record PlanText(String fileName) {
  private static final int LARGEST = 1_000_000;
  private static final int DEEPEST = 20;

  static String load(Path file) {
    String name = String.valueOf(file.getFileName());
    try {
      if (Files.size(file) > LARGEST) {
        throw new PlanText(name).tooLarge(Files.size(file) + " bytes");
      }
      byte[] bytes = Files.readAllBytes(file);
      return StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
    } catch (CharacterCodingException e) {
      throw RefusedInput.because("the plan is not UTF-8 text")
          .in(name)
          .remedy("save it as UTF-8 text");
    } catch (NoSuchFileException e) {
      throw RefusedInput.because("there is no such file")
          .in(file.toString())
          .remedy("check the path of the plan");
    } catch (IOException e) {
      throw RefusedInput.because("the plan cannot be read")
          .in(file.toString())
          .found(String.valueOf(e.getMessage()))
          .remedy("check the path and its rights");
    }
  }

  /** The top mapping. */
  MappingNode parse(String text) {
    if (text.length() > LARGEST) {
      throw tooLarge(text.length() + " characters");
    }
    LoadSettings settings =
        LoadSettings.builder()
            .setLabel(fileName)
            .setSchema(new CoreSchema())
            .setCodePointLimit(LARGEST)
            // The library stumbles where its buffer ends between halves of a character.
            .setBufferSize(Math.max(1, text.length()))
            .setAllowDuplicateKeys(true)
            .setMaxAliasesForCollections(1)
            .build();
    try {
      refuseWhatPlansDoNotUse(new Parse(settings).parseString(text));
      Optional<Node> root = new Compose(settings).composeString(text);
      if (root.isPresent() && root.get() instanceof MappingNode m) {
        return m;
      }
      throw RefusedInput.because("the plan holds no keys")
          .in(fileName)
          .at(root.map(PlanText::place).orElse("line 1, column 1"))
          .remedy("give at least contrasts");
    } catch (MarkedYamlEngineException e) {
      Optional<Mark> mark = e.getProblemMark().or(e::getContextMark);
      RefusedInput r =
          RefusedInput.because("the plan is not valid YAML, " + plain(e.getProblem()))
              .in(fileName)
              .remedy("mend the line; lists and maps must be closed and indented alike");
      throw mark.isPresent() ? r.at(place(mark.get())) : r;
    } catch (YamlEngineException e) {
      throw RefusedInput.because(
              "the plan is not valid YAML, " + plain(String.valueOf(e.getMessage())))
          .in(fileName)
          .remedy("mend it");
    }
  }

  private RefusedInput tooLarge(String size) {
    return RefusedInput.because("the plan is too large")
        .in(fileName)
        .found(size)
        .expected("at most " + LARGEST)
        .remedy("give a YAML plan");
  }

  private static String plain(String message) {
    String line = message.strip().split("\\R", 2)[0].replaceAll("\\p{Cntrl}", "?");
    return line.endsWith(".") ? line.substring(0, line.length() - 1) : line;
  }

  private void refuseWhatPlansDoNotUse(Iterable<Event> events) {
    int depth = 0;
    int documents = 0;
    for (Event e : events) {
      if (e instanceof AliasEvent) {
        throw refused(e, "aliases are not allowed in a plan").remedy("write the value out");
      }
      if (e instanceof NodeEvent n && n.getAnchor().isPresent()) {
        throw refused(e, "anchors are not allowed in a plan").remedy("leave the & name out");
      }
      boolean tagged =
          (e instanceof ScalarEvent s && s.getTag().isPresent())
              || (e instanceof CollectionStartEvent c && c.getTag().isPresent());
      if (tagged) {
        throw refused(e, "tags are not allowed in a plan").remedy("leave the ! tag out");
      }
      documents += e instanceof DocumentStartEvent ? 1 : 0;
      depth += e instanceof CollectionStartEvent ? 1 : e instanceof CollectionEndEvent ? -1 : 0;
      if (depth > DEEPEST || documents > 1) {
        throw refused(
                e, depth > DEEPEST ? "the plan is nested too deeply" : "two plans in one file")
            .remedy("give one plan a file, with the keys of the contract");
      }
    }
  }

  private RefusedInput refused(Event e, String what) {
    RefusedInput r = RefusedInput.because(what).in(fileName);
    Optional<Mark> mark = e.getStartMark();
    return mark.isPresent() ? r.at(place(mark.get())) : r;
  }

  /** The place of a node. */
  static String place(Node node) {
    return node.getStartMark().map(PlanText::place).orElse("an unknown line");
  }

  private static String place(Mark mark) {
    return "line " + (mark.getLine() + 1) + ", column " + (mark.getColumn() + 1);
  }
}
