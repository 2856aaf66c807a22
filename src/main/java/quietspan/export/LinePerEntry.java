package quietspan.export;

import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.PrettyPrinter;
import java.io.IOException;

/** Breaks lines down to a given level; what lies deeper stands on one line. */
final class LinePerEntry implements PrettyPrinter {

  private final int deepest;
  private int depth;

  LinePerEntry(int deepest) {
    this.deepest = deepest;
  }

  @Override
  public void writeRootValueSeparator(JsonGenerator json) throws IOException {
    json.writeRaw('\n');
  }

  @Override
  public void writeStartObject(JsonGenerator json) throws IOException {
    json.writeRaw('{');
    depth++;
  }

  @Override
  public void beforeObjectEntries(JsonGenerator json) throws IOException {
    lineOrNothing(json);
  }

  @Override
  public void writeObjectFieldValueSeparator(JsonGenerator json) throws IOException {
    json.writeRaw(": ");
  }

  @Override
  public void writeObjectEntrySeparator(JsonGenerator json) throws IOException {
    separator(json);
  }

  @Override
  public void writeEndObject(JsonGenerator json, int entries) throws IOException {
    end(json, entries, '}');
  }

  @Override
  public void writeStartArray(JsonGenerator json) throws IOException {
    json.writeRaw('[');
    depth++;
  }

  @Override
  public void beforeArrayValues(JsonGenerator json) throws IOException {
    lineOrNothing(json);
  }

  @Override
  public void writeArrayValueSeparator(JsonGenerator json) throws IOException {
    separator(json);
  }

  @Override
  public void writeEndArray(JsonGenerator json, int values) throws IOException {
    end(json, values, ']');
  }

  private void separator(JsonGenerator json) throws IOException {
    json.writeRaw(',');
    if (depth > deepest) {
      json.writeRaw(' ');
    }
    lineOrNothing(json);
  }

  private void end(JsonGenerator json, int entries, char bracket) throws IOException {
    boolean lines = depth <= deepest && entries > 0;
    depth--;
    if (lines) {
      line(json);
    }
    json.writeRaw(bracket);
  }

  private void lineOrNothing(JsonGenerator json) throws IOException {
    if (depth <= deepest) {
      line(json);
    }
  }

  private void line(JsonGenerator json) throws IOException {
    json.writeRaw("\n" + "  ".repeat(depth));
  }
}
