package quietspan.input;

import java.util.Iterator;
import java.util.Optional;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Compose;
import org.snakeyaml.engine.v2.api.lowlevel.Parse;
import org.snakeyaml.engine.v2.events.Event;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.ReaderException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlVersionException;
import org.snakeyaml.engine.v2.nodes.MappingNode;
import org.snakeyaml.engine.v2.nodes.Node;
import org.snakeyaml.engine.v2.nodes.SequenceNode;
import org.snakeyaml.engine.v2.nodes.Tag;
import org.snakeyaml.engine.v2.schema.CoreSchema;

/** Reads YAML 1.2 into nodes that know their line and column. */
final class YamlFile {

  private static final int DEEPEST = 30;
  private static final int MOST_ALIASES = 500;

  private static final LoadSettings SETTINGS =
      LoadSettings.builder()
          .setSchema(new CoreSchema())
          .setAllowDuplicateKeys(true) // complained about by the block, with their place
          .setMaxAliasesForCollections(MOST_ALIASES)
          .build();

  private YamlFile() {}

  /** The block that fills the file; complains and gives nothing when there is none. */
  static Optional<Values> read(String text, Block table, Source source) {
    return root(text, source).flatMap(node -> table.read(Spot.of(node, "", source)));
  }

  private static Optional<Node> root(String text, Source source) {
    try {
      if (isTooDeep(text, source)) {
        return Optional.empty();
      }
      Iterator<Node> documents = new Compose(SETTINGS).composeAllFromString(text).iterator();
      Optional<Node> first = documents.hasNext() ? Optional.of(documents.next()) : Optional.empty();
      if (first.filter(node -> !node.getTag().equals(Tag.NULL)).isEmpty()) {
        source.problems().error(source.whole(), "", "is empty", "a YAML document");
        return Optional.empty();
      }
      if (documents.hasNext()) {
        source
            .problems()
            .error(
                Spot.place(documents.next(), source),
                "",
                "a second YAML document begins here",
                "one document in a file");
        return Optional.empty();
      }
      return first;
    } catch (MarkedYamlEngineException e) {
      refuse(e, source);
    } catch (ReaderException e) {
      String before = text.substring(0, Math.min(e.getPosition(), text.length()));
      int line = (int) before.chars().filter(c -> c == '\n').count() + 1;
      source
          .problems()
          .error(
              source.at(line, before.length() - before.lastIndexOf('\n')),
              "",
              String.format(java.util.Locale.ROOT, "holds the character U+%04X", e.getCodePoint()),
              "printable characters");
    } catch (YamlVersionException e) {
      source.problems().error(source.whole(), "", "asks for another version of YAML", "YAML 1.2");
    } catch (YamlEngineException e) {
      source.problems().error(source.whole(), "", "is not YAML: " + firstLine(e), "YAML 1.2");
    }
    return Optional.empty();
  }

  private static void refuse(MarkedYamlEngineException e, Source source) {
    boolean tab = e.getProblem() != null && e.getProblem().contains("\\t(TAB)");
    source
        .problems()
        .error(
            e.getProblemMark()
                .or(e::getContextMark)
                .map(mark -> source.at(mark.getLine() + 1, mark.getColumn() + 1))
                .orElse(source.whole()),
            "",
            tab ? "a tab stands where YAML wants spaces" : "is not YAML: " + firstLine(e),
            tab ? "indent with spaces" : "YAML 1.2");
  }

  private static String firstLine(YamlEngineException e) {
    String text =
        e instanceof MarkedYamlEngineException marked && marked.getProblem() != null
            ? marked.getProblem()
            : String.valueOf(e.getMessage());
    return text.lines().findFirst().orElse("");
  }

  /** Looks before nodes are made, because nested nodes are made by recursion. */
  private static boolean isTooDeep(String text, Source source) {
    int depth = 0;
    for (Event event : new Parse(SETTINGS).parseString(text)) {
      switch (event.getEventId()) {
        case MappingStart, SequenceStart -> depth++;
        case MappingEnd, SequenceEnd -> depth--;
        default -> {}
      }
      if (depth > DEEPEST) {
        source
            .problems()
            .error(
                event
                    .getStartMark()
                    .map(mark -> source.at(mark.getLine() + 1, mark.getColumn() + 1))
                    .orElse(source.whole()),
                "",
                "is nested more than " + DEEPEST + " deep",
                "the fields of this file are nested less deep");
        return true;
      }
    }
    return false;
  }

  /** A node from a text of our own, such as a default value. */
  static Node parsed(String text) {
    return new Compose(SETTINGS)
        .composeString(text)
        .orElseThrow(() -> new IllegalArgumentException("no YAML: " + text));
  }

  /** What a node is, in words. */
  static String shape(Node node) {
    if (node instanceof MappingNode) {
      return "a block of keys";
    }
    return node instanceof SequenceNode ? "a list" : "a single value";
  }
}
