package quietspan.input;

import java.time.DateTimeException;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.function.Function;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import quietspan.time.GroundInstant;
import quietspan.time.OnboardInstant;

/** An instant in whole seconds; which clock it is on stands in the name of its field. */
final class Moment<T> extends Scalar<T> {

  private static final String SHAPE =
      "([0-9]{4})-([0-9]{2})-([0-9]{2})T([0-9]{2}):([0-9]{2})(?::([0-9]{2}))?";
  private static final Pattern DIGITS = Pattern.compile(SHAPE + "(.*)");

  static final Moment<OnboardInstant> ONBOARD =
      new Moment<>("an on-board UTC instant", "2031-09-01T00:00:00Z", true, OnboardInstant::new);
  static final Moment<GroundInstant> GROUND =
      new Moment<>("a ground UTC instant", "2031-09-01T00:00:00Z", true, GroundInstant::new);
  static final Moment<Instant> UTC =
      new Moment<>("a UTC instant", "2031-08-20T12:00:00Z", true, Function.identity());

  /** The digits of a TDB date, kept as if they were UTC. */
  static final Moment<Instant> TDB =
      new Moment<>("a TDB date without zone", "2031-10-16T00:00:00", false, Function.identity());

  private final boolean utc;
  private final Function<Instant, T> made;

  private Moment(String noun, String example, boolean utc, Function<Instant, T> made) {
    super(noun, example);
    this.utc = utc;
    this.made = made;
  }

  @Override
  T parse(String text) throws Refusal {
    Matcher shape = DIGITS.matcher(text);
    if (!shape.matches()) {
      throw new Refusal(Refusal.quoted(text) + " is not " + noun(), right());
    }
    String rest = shape.group(7);
    if (rest.startsWith(".")) {
      throw new Refusal(Refusal.quoted(text) + " has a fraction of a second", "whole seconds");
    }
    if (utc && !rest.equals("Z")) {
      throw new Refusal(
          Refusal.quoted(text) + (rest.isEmpty() ? " has no Z for UTC" : " is not UTC"), right());
    }
    if (!utc && !rest.isEmpty()) {
      throw new Refusal(
          Refusal.quoted(text) + " carries a zone, but TDB is not a zone's time", right());
    }
    try {
      return made.apply(
          LocalDateTime.of(
                  number(shape, 1),
                  number(shape, 2),
                  number(shape, 3),
                  number(shape, 4),
                  number(shape, 5),
                  shape.group(6) == null ? 0 : number(shape, 6))
              .toInstant(ZoneOffset.UTC));
    } catch (DateTimeException e) {
      throw new Refusal(Refusal.quoted(text) + " is no date of the calendar", right());
    }
  }

  private static int number(Matcher shape, int group) {
    return Integer.parseInt(shape.group(group));
  }

  @Override
  public Map<String, Object> schema() {
    Map<String, Object> schema = new TreeMap<>();
    schema.put("examples", List.of(example()));
    schema.put("pattern", "^" + SHAPE.replace("(?:", "(").replace("(", "(?:") + (utc ? "Z$" : "$"));
    schema.put("type", "string");
    return schema;
  }
}
