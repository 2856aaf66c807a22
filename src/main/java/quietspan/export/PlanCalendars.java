package quietspan.export;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import quietspan.model.Contact;
import quietspan.model.Contact.Status;
import quietspan.model.Craft;
import quietspan.model.Pause;
import quietspan.model.Plan;
import quietspan.model.QuietSpan;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.Station;

/**
 * The calendars of a plan: one per station on the ground clock, one per craft and one for science
 * on the on-board clock, and one with everything.
 */
final class PlanCalendars {

  private static final String CAUTION =
      "Planning aid, not an authorisation: what counts is the booking confirmed by the station.";

  private static final String ONBOARD = "Times are on-board UTC: the instant at the craft.";

  private static final String GROUND = "Times are ground UTC: the instant at the station.";

  private final Scenario scenario;
  private final Plan plan;
  private final boolean shortfall;
  private final List<ContactClocks> contacts;

  private PlanCalendars(Scenario scenario, Plan plan, List<ContactClocks> contacts) {
    this.scenario = scenario;
    this.plan = plan;
    this.shortfall = Summary.of(scenario, plan).shortfall();
    this.contacts = contacts;
  }

  /** Calendars by the name of their file, without its ending. */
  static Map<String, CalendarSheet> of(Scenario scenario, Plan plan, List<ContactClocks> contacts) {
    return new PlanCalendars(scenario, plan, contacts).all();
  }

  private Map<String, CalendarSheet> all() {
    Map<String, CalendarSheet> all = new LinkedHashMap<>();
    List<CalendarEntry> everything = new ArrayList<>();
    for (Station station : scenario.stations()) {
      List<CalendarEntry> entries =
          contacts.stream()
              .filter(each -> each.contact().station().equals(station.name()))
              .map(this::atStation)
              .toList();
      everything.addAll(entries);
      put(all, "station-" + station.name(), station.name() + " contacts", GROUND, entries);
    }
    for (Craft craft : scenario.craft()) {
      List<CalendarEntry> entries = new ArrayList<>();
      contacts.stream()
          .filter(each -> each.contact().craft().equals(craft.name()))
          .map(this::aboard)
          .forEach(entries::add);
      List<CalendarEntry> repoints =
          plan.decisions().repoints().stream()
              .filter(repoint -> repoint.craft().equals(craft.name()))
              .map(this::repoint)
              .toList();
      entries.addAll(repoints);
      everything.addAll(repoints);
      put(all, "craft-" + craft.name(), craft.name() + " on board", ONBOARD, entries);
    }
    List<CalendarEntry> science = new ArrayList<>(pauses());
    science.addAll(quietSpans());
    everything.addAll(science);
    put(all, "science", "science", ONBOARD, science);
    put(
        all,
        "all",
        "whole plan",
        "Contacts are in ground UTC at the station; repoints, pauses and quiet spans are in"
            + " on-board UTC.",
        everything);
    return all;
  }

  private void put(
      Map<String, CalendarSheet> all,
      String file,
      String title,
      String clock,
      List<CalendarEntry> entries) {
    CalendarSheet sheet =
        new CalendarSheet(
            headed(plan.mission() + ": " + title),
            clock + " " + CAUTION,
            plan.provenance().version(),
            scenario.identity().issued(),
            entries);
    all.put(FileNames.free(file, all.keySet()), sheet);
  }

  private String headed(String text) {
    return shortfall ? "SHORTFALL " + text : text;
  }

  private CalendarEntry atStation(ContactClocks each) {
    Contact contact = each.contact();
    return entry(
        "contact-ground",
        contact.id(),
        each.busy().begin().utc(),
        each.busy().end().utc(),
        contact.craft() + " at " + contact.station() + " " + contact.antenna(),
        "Setup to teardown of a contact, on the ground clock.\n" + clocks(each),
        "CONTACT",
        contact.status(),
        false);
  }

  private CalendarEntry aboard(ContactClocks each) {
    Contact contact = each.contact();
    return entry(
        "contact-onboard",
        contact.id(),
        each.onboard().begin().utc(),
        each.onboard().end().utc(),
        contact.craft() + " transmits to " + contact.station() + " (on board)",
        "Transmitter on to off, on the on-board clock.\n" + clocks(each),
        "CONTACT",
        contact.status(),
        false);
  }

  /** Every clock of a contact, one to a line. */
  private static String clocks(ContactClocks each) {
    Contact contact = each.contact();
    return String.join(
        "\n",
        "Craft: " + contact.craft(),
        "Station: " + contact.station() + ", antenna " + contact.antenna(),
        "Services: "
            + contact.services().stream().map(PlanJson::word).collect(Collectors.joining(", ")),
        "Rate: " + rates(contact),
        "Setup begins (ground): " + stamp(each.busy().begin().utc()),
        "Receive begins (ground): " + stamp(contact.during().begin().utc()),
        "Receive ends (ground): " + stamp(contact.during().end().utc()),
        "Teardown ends (ground): " + stamp(each.busy().end().utc()),
        "Transmit on (on board): " + stamp(each.onboard().begin().utc()),
        "Transmit off (on board): " + stamp(each.onboard().end().utc()),
        "Uplink transmit (ground): from "
            + stamp(contact.during().begin().utc())
            + " to "
            + stamp(contact.during().end().utc()),
        "Uplink arrives (on board): from "
            + stamp(each.uplinkBegin().utc())
            + " to "
            + stamp(each.uplinkEnd().utc()),
        "One-way light time down: " + Decimal.fixed(each.owltSeconds(), 3) + " s",
        "At begin: azimuth "
            + Words.degrees(each.begin().azimuthRadians())
            + " deg, elevation "
            + Words.degrees(each.begin().elevationRadians())
            + " deg",
        "At end: azimuth "
            + Words.degrees(each.end().azimuthRadians())
            + " deg, elevation "
            + Words.degrees(each.end().elevationRadians())
            + " deg",
        "Contact: " + contact.id());
  }

  private static String rates(Contact contact) {
    return contact.steps().size() == 1
        ? Words.kilobits(contact.steps().get(0).rate().bitsPerSecond())
        : contact.steps().stream().map(PlanCalendars::rate).collect(Collectors.joining("; "));
  }

  private static String rate(RateStep step) {
    return Words.kilobits(step.rate().bitsPerSecond()) + " from " + stamp(step.from().utc());
  }

  /** An instant with its day of year, as operators count days. */
  private static String stamp(Instant instant) {
    return instant + " (day " + Words.dayOfYear(instant) + ")";
  }

  private CalendarEntry repoint(Repoint repoint) {
    var antenna = scenario.craft(repoint.craft()).antenna();
    Instant start = repoint.start().utc();
    Instant moved = start.plus(antenna.move());
    Instant settled = start.plus(antenna.repointLength());
    String aim =
        "azimuth "
            + Words.degrees(repoint.aim().azimuthCentidegrees())
            + " deg, elevation "
            + Words.degrees(repoint.aim().elevationCentidegrees())
            + " deg";
    return entry(
        "repoint",
        repoint.id(),
        start,
        settled,
        repoint.craft() + " repoints to " + aim + " (on board)",
        String.join(
            "\n",
            "Craft: " + repoint.craft(),
            "Aim in the body frame: " + aim,
            "Antenna moves (on board): from " + stamp(start) + " to " + stamp(moved),
            "Settled (on board): " + stamp(settled),
            "Repoint: " + repoint.id()),
        "REPOINT",
        standing(),
        false);
  }

  private List<CalendarEntry> pauses() {
    List<CalendarEntry> entries = new ArrayList<>();
    Map<String, Integer> labels = new HashMap<>();
    for (Pause pause : plan.outcome().pauses()) {
      List<String> lines = new ArrayList<>();
      if (!pause.repoints().isEmpty()) {
        lines.add("Repoints: " + String.join(", ", pause.repoints()));
      }
      if (!pause.interruptions().isEmpty()) {
        lines.add("Interruptions: " + String.join(", ", pause.interruptions()));
      }
      lines.add("Length: " + hours(pause.during().length()));
      entries.add(
          entry(
              "pause",
              identity(pause, labels),
              pause.during().begin().utc(),
              pause.during().end().utc(),
              "Science pause (on board)",
              String.join("\n", lines),
              "PAUSE",
              standing(),
              false));
    }
    return entries;
  }

  /**
   * A pause is known by its first repoint, or by its first interruption and how often that came.
   */
  private static String identity(Pause pause, Map<String, Integer> labels) {
    if (!pause.repoints().isEmpty()) {
      return "repoint/" + pause.repoints().get(0);
    }
    String label = String.join("/", pause.interruptions());
    return "interruption/" + label + "/" + labels.merge(label, 1, Integer::sum);
  }

  private List<CalendarEntry> quietSpans() {
    List<CalendarEntry> entries = new ArrayList<>();
    Map<String, Integer> labels = new HashMap<>();
    Map<Instant, String> pauseByEnd = new HashMap<>();
    for (Pause pause : plan.outcome().pauses()) {
      pauseByEnd.put(pause.during().end().utc(), identity(pause, labels));
    }
    for (QuietSpan span : plan.outcome().quietSpans()) {
      String before = pauseByEnd.getOrDefault(span.during().begin().utc(), "begin of the period");
      entries.add(
          entry(
              "quiet-span",
              "after " + before,
              span.during().begin().utc(),
              span.during().end().utc(),
              "Quiet span (on board)",
              "Length: "
                  + hours(Duration.ofSeconds(span.lengthSeconds()))
                  + "\nCounts as science: "
                  + hours(Duration.ofSeconds(span.valueSeconds())),
              "QUIET SPAN",
              standing(),
              true));
    }
    return entries;
  }

  private static String hours(Duration length) {
    return Decimal.hours(length.toSeconds()).toPlainString() + " h";
  }

  /** What is ours alone to decide stands, unless the plan as a whole falls short. */
  private Status standing() {
    return shortfall ? Status.TENTATIVE : Status.CONFIRMED;
  }

  private CalendarEntry entry(
      String kind,
      String id,
      Instant begin,
      Instant end,
      String title,
      String description,
      String category,
      Status status,
      boolean free) {
    boolean cancelled = status == Status.CANCELLED;
    return new CalendarEntry(
        NameUuid.of(plan.mission(), kind, id),
        begin,
        end,
        headed(title),
        headed(description) + "\n" + CAUTION,
        category,
        shortfall && !cancelled ? Status.TENTATIVE : status,
        free);
  }
}
