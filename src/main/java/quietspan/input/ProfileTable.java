package quietspan.input;

import java.math.BigDecimal;
import java.math.RoundingMode;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import quietspan.model.Profile;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;

/** A generation profile from a table with the header {@code from_onboard_utc,rate [kbit/s]}. */
final class ProfileTable {

  private static final Pattern HEADER =
      Pattern.compile("from_onboard_utc,rate \\[(bit/s|kbit/s|Mbit/s|Gbit/s)\\]");
  private static final Map<String, Integer> POWER =
      Map.of("bit/s", 0, "kbit/s", 3, "Mbit/s", 6, "Gbit/s", 9);

  private ProfileTable() {}

  static List<Profile.Step> read(String text, Source source) {
    String[] lines = text.split("\r\n|\n", -1);
    Matcher header = HEADER.matcher(lines[0].strip());
    List<Profile.Step> steps = new ArrayList<>();
    if (!header.matches()) {
      source
          .problems()
          .error(
              source.at(1, 1),
              "",
              Refusal.quoted(lines[0]) + " is not the header of a profile",
              "from_onboard_utc,rate [kbit/s]");
      return steps;
    }
    int power = POWER.get(header.group(1));
    for (int i = 1; i < lines.length; i++) {
      if (lines[i].isBlank()) {
        continue;
      }
      try {
        String[] cells = lines[i].split(",", -1);
        if (cells.length != 2) {
          throw new Refusal("the row has " + cells.length + " cells", "an instant and a rate");
        }
        OnboardInstant from = Moment.ONBOARD.parse(cells[0].strip());
        if (!Quantity.isNumber(cells[1].strip())) {
          throw new Refusal(Refusal.quoted(cells[1]) + " is not a number", "a rate without unit");
        }
        BigDecimal rate = Quantity.number(cells[1].strip()).movePointRight(power);
        if (rate.signum() < 0) {
          throw new Refusal(Refusal.quoted(cells[1]) + " is negative", "a rate of at least 0");
        }
        if (!steps.isEmpty() && !steps.get(steps.size() - 1).from().isBefore(from)) {
          throw new Refusal("the row is not later than the one before", "rising instants");
        }
        steps.add(
            new Profile.Step(
                from, new DataRate(rate.setScale(0, RoundingMode.HALF_UP).longValueExact())));
      } catch (Refusal refusal) {
        source.problems().error(source.at(i + 1, 1), "", refusal.what(), refusal.right());
      } catch (ArithmeticException large) {
        source.problems().error(source.at(i + 1, 1), "", "the rate is too large", "a real rate");
      }
    }
    if (steps.isEmpty() && !source.problems().hasErrors()) {
      source.problems().error(source.whole(), "", "holds no rows", "at least one");
    }
    return steps;
  }
}
