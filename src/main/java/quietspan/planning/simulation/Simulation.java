package quietspan.planning.simulation;

import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Locale;
import quietspan.model.ClassOutcome;
import quietspan.model.Contact;
import quietspan.model.ContactOutcome;
import quietspan.model.CraftState;
import quietspan.model.Decisions;
import quietspan.model.Dish;
import quietspan.model.Finding;
import quietspan.model.Outcome;
import quietspan.model.RuleId;
import quietspan.model.Scenario;
import quietspan.model.SightLines;
import quietspan.model.StoreTrace;
import quietspan.model.Waiver;
import quietspan.time.OnboardInstant;
import quietspan.units.DataVolume;

/**
 * From decisions to their outcome: pauses, quiet spans, what the contacts carry, what the stores
 * hold, and every data rule that breaks. Rules of contacts and repoints are judged elsewhere; what
 * breaks them is simulated as it stands, and only inside the period.
 *
 * <p>On board, time runs in whole seconds. In each: data are generated, sent over cross-links, sent
 * to the ground, and what a store cannot hold is lost. Cancelled contacts do nothing and have no
 * outcome. Of two contacts of one craft at one time the one with the higher rate counts, of equal
 * ones the one that stands first. Classes of equal priority are sent in the order in which the
 * scenario lists them.
 *
 * <p>Immutable; may be shared between threads.
 */
public final class Simulation {

  private final Scenario scenario;
  private final SightLines sightLines;
  private final Stores stores;
  private final LightTable light;

  private Simulation(Scenario scenario, SightLines sightLines) {
    this.scenario = scenario;
    this.sightLines = sightLines;
    this.stores = Stores.of(scenario);
    this.light = LightTable.of(scenario, sightLines);
  }

  /** Prepared for many decisions on one scenario. */
  public static Simulation of(Scenario scenario, SightLines sightLines) {
    return new Simulation(scenario, sightLines);
  }

  /** One outcome. */
  public static Outcome simulate(
      Scenario scenario, SightLines sightLines, Decisions decisions, List<Waiver> waivers) {
    return of(scenario, sightLines).outcome(decisions, waivers);
  }

  /** What follows from the decisions, with the limits relaxed by the waivers. */
  public Outcome outcome(Decisions decisions, List<Waiver> waivers) {
    return new Run(decisions, waivers).outcome();
  }

  private final class Run {

    private final OnboardInstant origin = scenario.period().begin();
    private final long seconds = scenario.period().length().toSeconds();
    private final Decisions decisions;
    private final List<Waiver> waivers;
    private final List<Contact> contacts;
    private final Spans spans;
    private final List<Image> images = new ArrayList<>();
    private final List<Finding> findings = new ArrayList<>();

    private final Flow flow;
    private final Deliveries deliveries;
    private final Trace[] traces;
    private final FillWatch[] watches;
    private final long[] deliveredByImage;
    private final long[] deliveredByClass;
    private final long[] lostByClass;

    Run(Decisions decisions, List<Waiver> waivers) {
      this.decisions = decisions;
      this.waivers = waivers;
      this.contacts =
          decisions.contacts().stream()
              .filter(contact -> contact.status() != Contact.Status.CANCELLED)
              .toList();
      this.spans = Spans.of(scenario, decisions.repoints());
      for (Contact contact : contacts) {
        int craft = stores.craftIndex(contact.craft());
        images.add(Image.of(scenario, sightLines, images.size(), craft, contact));
      }
      Ages[] ages = startAges();
      long[] held = new long[ages.length];
      for (int i = 0; i < held.length; i++) {
        held[i] = ages[i].bits();
      }
      this.flow = new Flow(stores, held);
      this.deliveries =
          new Deliveries(
              stores,
              light,
              scenario.rules().classes().stream()
                  .map(dataClass -> Limits.of(scenario, dataClass.name(), waivers))
                  .toArray(Limits[]::new),
              contacts.stream()
                  .mapToLong(
                      contact -> scenario.station(contact.station()).deliveryDelay().toNanos())
                  .toArray(),
              ages);
      this.traces = new Trace[stores.craft()];
      this.watches = new FillWatch[stores.craft()];
      for (int c = 0; c < stores.craft(); c++) {
        long start = flow.heldBy(c);
        traces[c] = new Trace(c, stores.classes(), origin, start);
        watches[c] =
            new FillWatch(stores.craftName(c), stores.plannedFill(c), start, origin, findings);
      }
      this.deliveredByImage = new long[images.size()];
      this.deliveredByClass = new long[stores.classes()];
      this.lostByClass = new long[stores.classes()];
    }

    /** Data aboard at the begin: all made then where no oldest instant is given. */
    private Ages[] startAges() {
      Ages[] ages = new Ages[stores.craft() * stores.classes()];
      for (int i = 0; i < ages.length; i++) {
        ages[i] = new Ages();
      }
      for (CraftState state : scenario.start().craft()) {
        int c = stores.craftIndex(state.craft());
        for (CraftState.Fill fill : state.fill()) {
          Ages store = ages[stores.index(c, fill.dataClass())];
          long age =
              fill.oldest().map(oldest -> origin.epochSecond() - oldest.epochSecond()).orElse(0L);
          if (age > 0) {
            store.addSpread(fill.volume().bits(), age);
          } else {
            store.add(0, 1, fill.volume().bits());
          }
        }
      }
      return ages;
    }

    Outcome outcome() {
      List<Image> heard = images.stream().filter(image -> image.begin() < image.end()).toList();
      for (Stretch stretch : Timeline.stretches(scenario, stores, heard, spans.pauses())) {
        long second = stretch.begin;
        while (second < stretch.end) {
          long repeats = flow.settle(stretch, second);
          pass(stretch, second, repeats);
          flow.advance(repeats);
          second += repeats;
        }
      }
      List<StoreTrace> storeTraces = new ArrayList<>();
      for (int c = 0; c < stores.craft(); c++) {
        long highest = watches[c].finish();
        storeTraces.add(traces[c].finish(stores.craftName(c), flow, seconds, highest));
      }
      judgeLatency();
      storeTraces.forEach(this::judgeEndFill);
      findings.addAll(ContactGaps.findings(scenario, sightLines, contacts, waivers));
      findings.addAll(EndCoverage.findings(scenario, sightLines, decisions.repoints()));
      findings.sort(
          Comparator.comparing(Finding::at)
              .thenComparing(Finding::rule)
              .thenComparing(Finding::craft)
              .thenComparing(Finding::station)
              .thenComparing(Finding::subject));
      return new Outcome(
          spans.pauses(),
          spans.quietSpans(),
          spans.scienceSeconds(),
          contactOutcomes(),
          storeTraces,
          classOutcomes(),
          contactHours(),
          stationCost(),
          findings);
    }

    private void pass(Stretch stretch, long second, long repeats) {
      for (int c = 0; c < stores.craft(); c++) {
        traces[c].pass(stretch, flow, second, repeats);
        watches[c].pass(second, repeats, flow.heldBy(c), flow.changeOf(c), flow.sum(flow.lost, c));
        if (stretch.rate[c] > 0) {
          deliveredByImage[stretch.image[c]] += flow.sum(flow.down, c) * repeats;
        }
        for (int k = 0; k < stores.classes(); k++) {
          deliveredByClass[k] += flow.down[c * stores.classes() + k] * repeats;
          lostByClass[k] += flow.lost[c * stores.classes() + k] * repeats;
        }
      }
      deliveries.advance(stretch, flow, second, repeats);
    }

    private void judgeLatency() {
      for (Deliveries.LateRun run : deliveries.lateRuns()) {
        Image image = images.get(run.image());
        long received = light.receivedNanos(image.craft(), run.firstSecond() + 1);
        findings.add(
            new Finding(
                RuleId.LATENCY,
                origin.utc().plusNanos(received),
                image.contact().craft(),
                image.contact().station(),
                stores.className(run.dataClass()),
                (double) run.bits(),
                String.format(
                    Locale.ROOT,
                    "contact %s delivers %d bit late",
                    image.contact().id(),
                    run.bits())));
      }
      Instant end = sightLines.ground(stores.craftName(0), scenario.period().end()).utc();
      for (int k = 0; k < stores.classes(); k++) {
        long late = deliveries.lateAboard(k, seconds);
        if (late > 0) {
          findings.add(
              new Finding(
                  RuleId.LATENCY,
                  end,
                  "",
                  "",
                  stores.className(k),
                  (double) late,
                  String.format(
                      Locale.ROOT, "%d bit aboard at the end are older than allowed", late)));
        }
      }
    }

    private void judgeEndFill(StoreTrace trace) {
      DataVolume capacity = scenario.craft(trace.craft()).store();
      long limit =
          scenario
              .rules()
              .data()
              .endFillShare()
              .map(share -> capacity.share(share).bits())
              .orElseGet(() -> Math.max(trace.startBits(), capacity.share(0.25).bits()));
      long over = trace.endBits() - limit;
      if (over > 0) {
        findings.add(
            new Finding(
                RuleId.END_FILL,
                scenario.period().end().utc(),
                trace.craft(),
                "",
                "",
                (double) over,
                String.format(
                    Locale.ROOT, "%d bit aboard at the end, %d allowed", trace.endBits(), limit)));
      }
    }

    private List<ContactOutcome> contactOutcomes() {
      return images.stream()
          .map(
              image ->
                  new ContactOutcome(
                      image.contact().id(),
                      image.interval(origin),
                      new DataVolume(image.capacityBits(seconds)),
                      new DataVolume(deliveredByImage[image.place()])))
          .toList();
    }

    private List<ClassOutcome> classOutcomes() {
      List<ClassOutcome> outcomes = new ArrayList<>();
      for (int k = 0; k < stores.classes(); k++) {
        outcomes.add(
            new ClassOutcome(
                stores.className(k),
                deliveredByClass[k],
                deliveries.lateBits(k) + deliveries.lateAboard(k, seconds),
                lostByClass[k],
                deliveries.longestLatency(k, seconds)));
      }
      return outcomes;
    }

    private double contactHours() {
      return contacts.stream().mapToLong(contact -> contact.during().length().toSeconds()).sum()
          / 3600.0;
    }

    private double stationCost() {
      double cost = 0;
      for (Contact contact : contacts) {
        Dish dish =
            scenario
                .station(contact.station())
                .dish(contact.antenna())
                .orElseThrow(
                    () ->
                        new IllegalArgumentException(
                            "no antenna " + contact.antenna() + " at " + contact.station()));
        double hours = contact.during().length().toSeconds() / 3600.0;
        cost += dish.costPerHour() * hours + dish.costPerContact();
      }
      return cost;
    }
  }
}
