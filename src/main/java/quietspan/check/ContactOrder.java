package quietspan.check;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.TreeSet;
import quietspan.model.Blocked;
import quietspan.model.Contact;
import quietspan.model.Dish;
import quietspan.model.Finding;
import quietspan.model.RuleId;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;

/** Rules on contacts beside each other. Ground time. */
final class ContactOrder {

  private ContactOrder() {}

  /** An antenna serves one user at a time, and needs its setup and teardown. */
  static List<Finding> antennaFree(Evidence evidence) {
    List<Finding> findings = new ArrayList<>();
    for (TurnRound turn : TurnRound.all(evidence)) {
      if (turn.spareSeconds() < 0) {
        String detail =
            Findings.name(turn.later())
                + " begins "
                + Findings.seconds(turn.gapSeconds())
                + " after the end of "
                + Findings.name(turn.earlier())
                + "; the antenna needs "
                + Findings.seconds(turn.neededSeconds())
                + ".";
        findings.add(
            Findings.of(
                RuleId.ANTENNA_FREE,
                turn.later(),
                turn.later().during().begin().utc(),
                -turn.spareSeconds(),
                detail));
      }
    }
    for (Contact contact : evidence.contacts()) {
      Interval<GroundInstant> busy = busy(evidence, contact);
      for (Blocked blocked : evidence.scenario().calendars().blocked()) {
        if (blocked.concerns(contact.station(), contact.antenna())) {
          busy.intersection(blocked.during())
              .ifPresent(both -> findings.add(notOurs(contact, blocked, both)));
        }
      }
    }
    return findings;
  }

  static Interval<GroundInstant> busy(Evidence evidence, Contact contact) {
    Dish dish = evidence.dish(contact);
    return contact.during().widened(dish.setup(), dish.teardown());
  }

  private static Finding notOurs(Contact contact, Blocked blocked, Interval<GroundInstant> both) {
    String detail =
        Findings.name(contact)
            + ", setup to teardown, runs "
            + Findings.seconds(both.seconds())
            + " into "
            + (blocked.why() == Blocked.Why.OUTAGE ? "the outage" : "the lent slot")
            + " "
            + blocked.label()
            + ".";
    return Findings.of(RuleId.ANTENNA_FREE, contact, both.begin().utc(), both.seconds(), detail);
  }

  /** So many links can be run at one time; two antennas on one craft are one link. */
  static List<Finding> atOnce(Evidence evidence) {
    int most = evidence.scenario().rules().contacts().contactsAtOnce();
    TreeSet<GroundInstant> edges = new TreeSet<>();
    for (Contact contact : evidence.contacts()) {
      edges.add(contact.during().begin());
      edges.add(contact.during().end());
    }
    List<Finding> findings = new ArrayList<>();
    GroundInstant tooManySince = null;
    Contact cause = null;
    for (GroundInstant edge : edges) {
      List<Contact> running =
          evidence.contacts().stream().filter(each -> each.during().contains(edge)).toList();
      boolean tooMany = running.stream().map(Contact::craft).distinct().count() > most;
      if (tooMany && tooManySince == null) {
        tooManySince = edge;
        cause = running.get(running.size() - 1);
      } else if (!tooMany && tooManySince != null) {
        findings.add(crowd(cause, tooManySince, edge, most));
        tooManySince = null;
      }
    }
    return findings;
  }

  private static Finding crowd(Contact cause, GroundInstant from, GroundInstant to, int most) {
    double seconds = to.secondsSince(from);
    String detail =
        Findings.name(cause)
            + " makes more links at a time than the "
            + most
            + " allowed, for "
            + Findings.seconds(seconds)
            + ".";
    return Findings.of(RuleId.AT_ONCE, cause, from.utc(), seconds, detail);
  }

  /** The operators need time to change from one craft to another. */
  static List<Finding> craftSwitch(Evidence evidence) {
    Duration least = evidence.scenario().rules().contacts().craftSwitch();
    List<Finding> findings = new ArrayList<>();
    for (Contact earlier : evidence.contacts()) {
      for (Contact later : evidence.contacts()) {
        boolean inTurn = !later.during().begin().isBefore(earlier.during().end());
        if (!inTurn || earlier.craft().equals(later.craft())) {
          continue;
        }
        double gap = later.during().begin().secondsSince(earlier.during().end());
        double missing = Seconds.of(least) - gap;
        if (missing > 0) {
          String detail =
              Findings.name(later)
                  + " begins "
                  + Findings.seconds(gap)
                  + " after "
                  + Findings.name(earlier)
                  + " ends; a change of craft takes "
                  + Findings.seconds(Seconds.of(least))
                  + ".";
          findings.add(
              Findings.of(
                  RuleId.CRAFT_SWITCH, later, later.during().begin().utc(), missing, detail));
        }
      }
    }
    return findings;
  }
}
