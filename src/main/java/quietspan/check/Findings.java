package quietspan.check;

import java.time.Instant;
import java.util.Locale;
import quietspan.model.Contact;
import quietspan.model.Finding;
import quietspan.model.Repoint;
import quietspan.model.RuleId;

/** Words and numbers of findings. */
final class Findings {

  private Findings() {}

  static Finding of(RuleId rule, Contact contact, Instant at, double amount, String detail) {
    return new Finding(rule, at, contact.craft(), contact.station(), contact.id(), amount, detail);
  }

  static Finding of(RuleId rule, Repoint repoint, Instant at, double amount, String detail) {
    return new Finding(rule, at, repoint.craft(), "", repoint.id(), amount, detail);
  }

  static String name(Contact contact) {
    return "contact "
        + contact.id()
        + " of "
        + contact.craft()
        + " at "
        + contact.station()
        + " "
        + contact.antenna();
  }

  static String name(Repoint repoint) {
    return "repoint " + repoint.id() + " of " + repoint.craft();
  }

  /** A number with at most three decimals, without trailing zeros. */
  static String number(double value) {
    String text = String.format(Locale.ROOT, "%.3f", value);
    return text.replaceFirst("\\.?0+$", "");
  }

  static String seconds(double value) {
    return number(value) + " s";
  }

  static String degrees(double radians) {
    return number(Math.toDegrees(radians)) + " deg";
  }
}
