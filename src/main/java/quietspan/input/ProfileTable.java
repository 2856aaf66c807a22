package quietspan.input;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import quietspan.model.Profile;
import quietspan.time.OnboardInstant;

/** A generation profile from a table with the header {@code from_onboard_utc,rate [kbit/s]}. */
final class ProfileTable {

  private static final Pattern HEADER = Pattern.compile("from_onboard_utc,rate \\[([^\\]]*)\\]");

  private ProfileTable() {}

  /** The steps; complains at each cell that cannot be taken. */
  static List<Profile.Step> read(String text, Source source) {
    String[] lines = text.split("\r\n|\n", -1);
    Matcher header = HEADER.matcher(lines[0].strip());
    if (!header.matches() || !Quantity.RATE.symbols().contains(header.group(1))) {
      source.refuse(
          1,
          "",
          Refusal.quoted(lines[0]) + " is not the header of a profile",
          "from_onboard_utc,rate [kbit/s], or another unit of rate");
      return List.of();
    }
    List<Profile.Step> steps = new ArrayList<>();
    boolean good = true;
    for (int i = 1; i < lines.length; i++) {
      if (!lines[i].isBlank()) {
        good &= add(lines[i], i + 1, header.group(1), steps, source);
      }
    }
    if (good && steps.isEmpty()) {
      source.refuse(1, "", "the table has no rows", "at least one instant with its rate");
    }
    return steps;
  }

  private static boolean add(
      String row, int line, String unit, List<Profile.Step> steps, Source source) {
    int comma = row.indexOf(',');
    if (comma < 0 || row.indexOf(',', comma + 1) >= 0) {
      source.refuse(line, "", "the row has not two cells", "an instant and a rate");
      return false;
    }
    try {
      OnboardInstant from = Moment.ONBOARD.parse(row.substring(0, comma).strip());
      if (!steps.isEmpty() && !steps.get(steps.size() - 1).from().isBefore(from)) {
        source.refuse(line, "from_onboard_utc", "is not after the row before", "rising order");
        return false;
      }
      String number = row.substring(comma + 1).strip();
      try {
        steps.add(new Profile.Step(from, Quantity.RATE.parse(number + " " + unit)));
        return true;
      } catch (Refusal refusal) {
        source
            .problems()
            .error(source.at(line, comma + 2), "rate", refusal.what(), refusal.right());
      }
    } catch (Refusal refusal) {
      source.refuse(line, "from_onboard_utc", refusal.what(), refusal.right());
    }
    return false;
  }
}
