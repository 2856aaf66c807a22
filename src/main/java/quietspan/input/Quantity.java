package quietspan.input;

import java.math.BigDecimal;
import java.time.Duration;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import quietspan.units.Angle;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;
import quietspan.units.Distance;

/**
 * A number with its unit, such as {@code 2.5 deg}. The number is read and scaled as a decimal, so
 * that nothing is rounded before the value is made.
 */
final class Quantity<T> extends Scalar<T> {

  /** A unit and how many base units it is. */
  record Unit(String symbol, BigDecimal factor) {}

  private interface Conversion<T> {
    T of(BigDecimal baseUnits, String text) throws Refusal;
  }

  /** A limit on the value; {@code open} when the limit itself is not allowed. */
  private record Edge(String text, BigDecimal baseUnits, boolean open) {}

  private static final String NUMBER =
      "[+-]?(?:[0-9]+(?:\\.[0-9]*)?|\\.[0-9]+)(?:[eE][+-]?[0-9]+)?";
  private static final Pattern SHAPE = Pattern.compile("(" + NUMBER + ")\\s*(\\S.*)?");
  private static final int LONGEST_NUMBER = 40;
  private static final int LARGEST_EXPONENT = 30;

  static final Quantity<Angle> ANGLE =
      new Quantity<>(
          "an angle",
          "2.5 deg",
          units("deg", "1", "arcmin", "1/60", "arcsec", "1/3600", "rad", "57.29577951308232087680"),
          (degrees, text) -> Angle.ofDegrees(degrees.doubleValue()));
  static final Quantity<Duration> DURATION =
      new Quantity<>(
              "a length of time",
              "20 min",
              units("s", "1", "min", "60", "h", "3600", "d", "86400"),
              (seconds, text) -> Duration.ofSeconds(whole(seconds, text, "s")))
          .atLeast("0 s")
          .atMost("10000 d");
  static final Quantity<DataVolume> VOLUME =
      new Quantity<>(
              "a data volume",
              "48 Gbit",
              units(
                  "bit", "1", "kbit", "1e3", "Mbit", "1e6", "Gbit", "1e9", "Tbit", "1e12", "byte",
                  "8", "kbyte", "8e3", "Mbyte", "8e6", "Gbyte", "8e9"),
              (bits, text) -> new DataVolume(whole(bits, text, "bit")))
          .atLeast("0 bit")
          .atMost("1000 Tbit");
  static final Quantity<DataRate> RATE =
      new Quantity<>(
              "a data rate",
              "180 kbit/s",
              units("bit/s", "1", "kbit/s", "1e3", "Mbit/s", "1e6", "Gbit/s", "1e9"),
              (bits, text) -> new DataRate(whole(bits, text, "bit/s")))
          .atLeast("0 bit/s")
          .atMost("1000 Gbit/s");
  static final Quantity<Distance> DISTANCE =
      new Quantity<>(
          "a length",
          "1.6e6 km",
          units("m", "1", "km", "1e3", "au", "149597870700"),
          (metres, text) -> Distance.ofMetres(metres.doubleValue()));

  /** In hertz. */
  static final Quantity<Double> FREQUENCY =
      plain("a frequency", "8.42 GHz", units("Hz", "1", "kHz", "1e3", "MHz", "1e6", "GHz", "1e9"));

  /** In decibels. */
  static final Quantity<Double> DECIBEL = plain("a ratio", "3 dB", units("dB", "1"));

  /** In decibels over one watt. */
  static final Quantity<Double> POWER = plain("a power", "49.2 dBW", units("dBW", "1"));

  /** In decibels per kelvin. */
  static final Quantity<Double> GAIN_OVER_TEMPERATURE =
      plain("a figure of merit", "50.4 dB/K", units("dB/K", "1"));

  /** As a fraction of one. */
  static final Quantity<Double> SHARE =
      plain("a share", "80 %", units("%", "0.01", "percent", "0.01"));

  private final List<Unit> units;
  private final Conversion<T> conversion;
  private final Optional<Edge> low;
  private final Optional<Edge> high;

  private Quantity(
      String noun,
      String example,
      List<Unit> units,
      Conversion<T> conversion,
      Optional<Edge> low,
      Optional<Edge> high) {
    super(noun, example);
    this.units = units;
    this.conversion = conversion;
    this.low = low;
    this.high = high;
  }

  private Quantity(String noun, String example, List<Unit> units, Conversion<T> conversion) {
    this(noun, example, units, conversion, Optional.empty(), Optional.empty());
  }

  private static Quantity<Double> plain(String noun, String example, List<Unit> units) {
    return new Quantity<>(noun, example, units, (number, text) -> number.doubleValue());
  }

  private static List<Unit> units(String... symbolsAndFactors) {
    List<Unit> units = new ArrayList<>();
    for (int i = 0; i < symbolsAndFactors.length; i += 2) {
      String[] parts = symbolsAndFactors[i + 1].split("/", -1);
      BigDecimal factor = new BigDecimal(parts[0]);
      if (parts.length > 1) {
        factor = factor.divide(new BigDecimal(parts[1]), java.math.MathContext.DECIMAL128);
      }
      units.add(new Unit(symbolsAndFactors[i], factor));
    }
    return List.copyOf(units);
  }

  private static long whole(BigDecimal amount, String text, String unit) throws Refusal {
    try {
      return amount.longValueExact();
    } catch (ArithmeticException e) {
      throw new Refusal(
          Refusal.quoted(text) + " is not a whole number of " + unit, "a whole number of " + unit);
    }
  }

  /** The same kind with another example in its complaints. */
  Quantity<T> like(String otherExample) {
    return new Quantity<>(noun(), otherExample, units, conversion, low, high);
  }

  Quantity<T> atLeast(String limit) {
    return new Quantity<>(noun(), example(), units, conversion, edge(limit, false), high);
  }

  Quantity<T> atMost(String limit) {
    return new Quantity<>(noun(), example(), units, conversion, low, edge(limit, false));
  }

  Quantity<T> above(String limit) {
    return new Quantity<>(noun(), example(), units, conversion, edge(limit, true), high);
  }

  Quantity<T> below(String limit) {
    return new Quantity<>(noun(), example(), units, conversion, low, edge(limit, true));
  }

  private Optional<Edge> edge(String limit, boolean open) {
    try {
      return Optional.of(new Edge(limit, baseUnits(limit), open));
    } catch (Refusal refusal) {
      throw new IllegalArgumentException("a limit that cannot be read: " + limit, refusal);
    }
  }

  List<String> symbols() {
    return units.stream().map(Unit::symbol).toList();
  }

  /** The limits in words, such as {@code above 0 deg, at most 90 deg}; empty without limits. */
  String limits() {
    List<String> words = new ArrayList<>();
    low.ifPresent(edge -> words.add((edge.open() ? "above " : "at least ") + edge.text()));
    high.ifPresent(edge -> words.add((edge.open() ? "below " : "at most ") + edge.text()));
    return String.join(", ", words);
  }

  @Override
  T parse(String text) throws Refusal {
    BigDecimal amount = baseUnits(text);
    if (low.isPresent() && outside(amount.compareTo(low.get().baseUnits()), low.get())) {
      throw new Refusal(
          Refusal.quoted(text)
              + " is "
              + (low.get().open() ? "not above " : "below ")
              + low.get().text(),
          limits());
    }
    if (high.isPresent() && outside(-amount.compareTo(high.get().baseUnits()), high.get())) {
      throw new Refusal(
          Refusal.quoted(text)
              + " is "
              + (high.get().open() ? "not below " : "above ")
              + high.get().text(),
          limits());
    }
    return conversion.of(amount, text);
  }

  private static boolean outside(int inward, Edge edge) {
    return inward < 0 || (edge.open() && inward == 0);
  }

  private BigDecimal baseUnits(String text) throws Refusal {
    Matcher shape = SHAPE.matcher(text);
    if (!shape.matches()) {
      throw new Refusal(Refusal.quoted(text) + " is not " + noun(), right());
    }
    BigDecimal number = number(shape.group(1));
    String symbol = shape.group(2);
    if (symbol == null) {
      throw new Refusal(
          Refusal.quoted(text) + " has no unit", "write the unit, such as " + example());
    }
    for (Unit unit : units) {
      if (unit.symbol().equals(symbol)) {
        return number.multiply(unit.factor());
      }
    }
    if (symbol.matches(",[0-9].*")) {
      throw new Refusal(
          Refusal.quoted(text) + " has a decimal comma", "a decimal point, such as " + example());
    }
    throw new Refusal(
        "the unit in " + Refusal.quoted(text) + " is none of " + noun(),
        "one of " + String.join(", ", symbols()) + "; such as " + example());
  }

  /** A decimal number of sane size; its text has the shape of a number already. */
  static BigDecimal number(String text) throws Refusal {
    int exponentAt = Math.max(text.indexOf('e'), text.indexOf('E'));
    String exponent = exponentAt < 0 ? "0" : text.substring(exponentAt + 1);
    if (text.length() > LONGEST_NUMBER
        || exponent.length() > 4
        || Math.abs(Integer.parseInt(exponent)) > LARGEST_EXPONENT) {
      throw new Refusal(
          Refusal.quoted(text) + " is too long or too large a number",
          "at most "
              + LONGEST_NUMBER
              + " characters and an exponent of at most "
              + LARGEST_EXPONENT);
    }
    return new BigDecimal(text);
  }

  static boolean isNumber(String text) {
    return text.matches(NUMBER);
  }

  @Override
  public Map<String, Object> schema() {
    String symbols = symbols().stream().map(Quantity::escaped).collect(Collectors.joining("|"));
    Map<String, Object> schema = new LinkedHashMap<>();
    schema.put("type", "string");
    schema.put("pattern", "^" + NUMBER + "\\s*(?:" + symbols + ")$");
    schema.put("examples", List.of(example()));
    return schema;
  }

  private static String escaped(String symbol) {
    return symbol.replace("/", "\\/");
  }
}
