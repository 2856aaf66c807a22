package quietspan.export;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonLocation;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import quietspan.problem.Place;
import quietspan.problem.Problems;

/** Reads JSON to a tree that knows where everything stands. */
final class JsonTree {

  private static final JsonFactory JSON = new JsonFactory();

  private final String file;
  private final JsonParser parser;
  private final Problems problems;

  private JsonTree(String file, JsonParser parser, Problems problems) {
    this.file = file;
    this.parser = parser;
    this.problems = problems;
  }

  /** The value in the file; absent, with a complaint, when the file is no JSON. */
  static Optional<JsonValue> read(String file, byte[] bytes, Problems problems) {
    String text;
    try {
      text = StandardCharsets.UTF_8.newDecoder().decode(ByteBuffer.wrap(bytes)).toString();
    } catch (CharacterCodingException e) {
      problems.error(Place.wholeFile(file), "", "is not UTF-8 text", "a JSON file in UTF-8");
      return Optional.empty();
    }
    // Some editors put a byte order mark in front.
    String content = text.startsWith("\uFEFF") ? text.substring(1) : text;
    try (JsonParser parser = JSON.createParser(content)) {
      JsonTree tree = new JsonTree(file, parser, problems);
      parser.nextToken();
      JsonValue value = tree.value("");
      if (parser.nextToken() != null) {
        problems.error(tree.here(), "", "goes on after its end", "one object and nothing else");
      }
      return Optional.of(value);
    } catch (JsonProcessingException e) {
      problems.error(
          place(file, e.getLocation()),
          "",
          "is no JSON: " + e.getOriginalMessage().lines().findFirst().orElse(""),
          "");
      return Optional.empty();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  private Place here() {
    return place(file, parser.currentTokenLocation());
  }

  private static Place place(String file, JsonLocation location) {
    return location == null
        ? Place.wholeFile(file)
        : new Place(file, location.getLineNr(), location.getColumnNr());
  }

  private JsonValue value(String path) throws IOException {
    Place place = here();
    JsonToken token = parser.currentToken();
    if (token == null) {
      problems.error(Place.wholeFile(file), "", "is empty", "a plan");
      return new JsonValue.Literal(place, "nothing");
    }
    return switch (token) {
      case START_OBJECT -> members(place, path);
      case START_ARRAY -> {
        List<JsonValue> items = new ArrayList<>();
        while (parser.nextToken() != JsonToken.END_ARRAY) {
          items.add(value(path + "[" + items.size() + "]"));
        }
        yield new JsonValue.Items(place, items);
      }
      case VALUE_STRING -> new JsonValue.Text(place, parser.getText());
      case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> new JsonValue.Digits(place, parser.getText());
      default -> new JsonValue.Literal(place, parser.getText());
    };
  }

  private JsonValue members(Place place, String path) throws IOException {
    Map<String, JsonValue.Member> members = new LinkedHashMap<>();
    while (parser.nextToken() != JsonToken.END_OBJECT) {
      String key = parser.currentName();
      String keyPath = JsonFields.join(path, key);
      Place keyPlace = here();
      parser.nextToken();
      JsonValue value = value(keyPath);
      if (members.putIfAbsent(key, new JsonValue.Member(keyPlace, value)) != null) {
        problems.error(keyPlace, keyPath, "stands here a second time", "each key once");
      }
    }
    return new JsonValue.Members(place, members);
  }
}
