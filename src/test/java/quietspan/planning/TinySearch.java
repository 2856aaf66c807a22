package quietspan.planning;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import quietspan.model.Aim;
import quietspan.model.ConfirmedContact;
import quietspan.model.Contact;
import quietspan.model.Decisions;
import quietspan.model.Outcome;
import quietspan.model.Pause;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.planning.simulation.Simulation;
import quietspan.planning.simulation.Spans;
import quietspan.rules.Opportunity;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.DataRate;

/**
 * Searches a {@link TinyWorld} through over a grid of decisions: at most two pauses (three for one
 * craft) that start every few hours or beside an interruption, aims at the middle of a pass or
 * between passes, each pass given whole or in halves to a craft or left. Pauses are tried by
 * falling science, so the first legal plan is the best. A contact is left out only where it stands
 * against another one, since a further contact breaks no data rule that it does not mend.
 */
final class TinySearch {

  /**
   * What was found.
   *
   * @param best the legal plan with most science, and among these with fewest pauses
   * @param exhausted every candidate that could be better was judged
   */
  record Found(Optional<Decisions> best, long science, int pauses, boolean exhausted, int judged) {}

  /** Repoints of one instant: who moves. */
  private record Event(int start, int moved) {}

  private record Layout(List<Event> events, long science, int pauses) {}

  private final TinyWorld world;
  private final Tables tables;
  private final Simulation simulation;
  private final int limit;
  private final Map<List<Object>, Hold> held = new HashMap<>();
  private int judged;
  private int patience;

  TinySearch(TinyWorld world, Tables tables, int limit) {
    this.world = world;
    this.tables = tables;
    this.simulation = Simulation.of(world.scenario(), world.geometry().sightLines());
    this.limit = limit;
    this.patience = 100 * limit;
  }

  Found search() {
    for (Layout layout : layouts()) {
      Optional<Decisions> legal = legal(layout);
      if (legal.isPresent()) {
        return new Found(legal, layout.science(), layout.pauses(), true, judged);
      }
      if (judged > limit) {
        return new Found(Optional.empty(), 0, 0, false, judged);
      }
    }
    return new Found(Optional.empty(), 0, 0, true, judged);
  }

  // ---------------------------------------------------------------- when and who

  private List<Layout> layouts() {
    List<Event> events = new ArrayList<>();
    int all = (1 << tables.craftCount) - 1;
    for (int start : starts()) {
      for (int moved = 1; moved <= all; moved++) {
        events.add(new Event(start, moved));
      }
    }
    List<Layout> layouts = new ArrayList<>();
    int most = tables.craftCount == 1 ? 3 : 2;
    extend(List.of(), events, 0, most, layouts);
    layouts.sort(
        Comparator.comparingLong((Layout layout) -> -layout.science())
            .thenComparingInt(Layout::pauses));
    return layouts;
  }

  private void extend(
      List<Event> chosen, List<Event> events, int from, int left, List<Layout> layouts) {
    if (!isLegal(chosen)) {
      return;
    }
    List<Repoint> repoints = new ArrayList<>();
    for (Event event : chosen) {
      for (int c = 0; c < tables.craftCount; c++) {
        if ((event.moved() >> c & 1) != 0) {
          repoints.add(repoint(c, event.start(), new Aim(0, 0)));
        }
      }
    }
    Spans spans = Spans.of(world.scenario(), repoints);
    if (keepsProtected(spans.pauses())) {
      int pauses = (int) spans.pauses().stream().filter(one -> !one.repoints().isEmpty()).count();
      layouts.add(new Layout(chosen, spans.scienceSeconds(), pauses));
    }
    for (int i = from; i < events.size() && left > 0; i++) {
      List<Event> more = new ArrayList<>(chosen);
      more.add(events.get(i));
      extend(more, events, i + 1, left - 1, layouts);
    }
  }

  private Set<Integer> starts() {
    int grid = tables.craftCount == 1 ? 4 * 3600 : 6 * 3600;
    TreeSet<Integer> starts = new TreeSet<>();
    for (int s = 0; s < tables.length; s += grid) {
      starts.add(s);
    }
    if (world.features().contains(TinyWorld.Feature.OFF_GRID_INTERRUPTION)) {
      for (int[] stop : tables.stops) {
        starts.add(stop[0]);
        starts.add(stop[1]);
        for (int length : tables.repoint) {
          starts.add(stop[0] - length);
          starts.add(stop[1] - length);
        }
      }
    }
    for (int length : tables.repoint) {
      starts.add(tables.length - length);
    }
    starts.removeIf(s -> s < 0);
    return starts;
  }

  private boolean isLegal(List<Event> events) {
    for (int i = 0; i < events.size(); i++) {
      for (int c = 0; c < tables.craftCount; c++) {
        if ((events.get(i).moved() >> c & 1) == 0) {
          continue;
        }
        if (events.get(i).start() + tables.repoint[c] > tables.length) {
          return false;
        }
        for (int j = 0; j < i; j++) {
          int apart = events.get(i).start() - events.get(j).start();
          boolean both = (events.get(j).moved() >> c & 1) != 0;
          if (both && apart < Math.max(tables.spacing[c], tables.repoint[c])) {
            return false;
          }
        }
      }
    }
    return true;
  }

  private boolean keepsProtected(List<Pause> pauses) {
    return pauses.stream()
        .noneMatch(
            pause ->
                !pause.repoints().isEmpty()
                    && world.scenario().calendars().guarded().stream()
                        .anyMatch(guarded -> guarded.during().overlaps(pause.during())));
  }

  // ---------------------------------------------------------------- whereto

  private Optional<Decisions> legal(Layout layout) {
    List<List<Way>> perCraft = new ArrayList<>();
    for (int c = 0; c < tables.craftCount; c++) {
      List<Way> ways = ways(layout, c);
      if (ways.isEmpty()) {
        return Optional.empty();
      }
      perCraft.add(ways);
    }
    Needs needs = new Needs(world, tables, pauses(layout));
    return combine(layout, perCraft, new ArrayList<>(), needs);
  }

  private List<int[]> pauses(Layout layout) {
    List<int[]> parts = new ArrayList<>(tables.stops);
    for (Event event : layout.events()) {
      for (int c = 0; c < tables.craftCount; c++) {
        if ((event.moved() >> c & 1) != 0) {
          parts.add(new int[] {event.start(), event.start() + tables.repoint[c]});
        }
      }
    }
    return parts;
  }

  /** How one craft's antenna is held through the period, and the contacts that this allows. */
  private record Way(List<Hold> holds, List<Use> pieces) {}

  /** Ways to aim a craft, without those that allow no contact that another does not allow, too. */
  private List<Way> ways(Layout layout, int craft) {
    List<Way> all = new ArrayList<>();
    Set<List<Use>> seen = new HashSet<>();
    for (List<Hold> holds : holds(layout, craft)) {
      if (coversEnd(craft, holds.get(holds.size() - 1))) {
        List<Use> pieces = pieces(craft, holds);
        boolean mayGap = world.features().contains(TinyWorld.Feature.COVERAGE_GAP);
        if (seen.add(pieces) || !mayGap) {
          all.add(new Way(holds, pieces));
        }
      }
    }
    if (!world.features().contains(TinyWorld.Feature.COVERAGE_GAP)) {
      return all;
    }
    List<Way> best = new ArrayList<>();
    for (Way way : all) {
      boolean beaten =
          all.stream()
              .anyMatch(
                  other ->
                      other.pieces().size() > way.pieces().size()
                          && other.pieces().containsAll(way.pieces()));
      if (!beaten) {
        best.add(way);
      }
    }
    return best;
  }

  /** Nearly: the simulation has the last word. */
  private boolean coversEnd(int craft, Hold last) {
    int asked =
        tables.scenario.rules().data().endCoverage().map(one -> (int) one.toSeconds()).orElse(0);
    for (int second = tables.length; asked > 0 && second <= tables.length + asked; second += 600) {
      if (last.off(second / Tables.STEP) > tables.usable[craft] + 1e-4) {
        return false;
      }
    }
    return true;
  }

  /** Every way to aim one craft through the period. */
  private List<List<Hold>> holds(Layout layout, int craft) {
    List<List<Hold>> ways = new ArrayList<>();
    ways.add(List.of());
    Aim first = world.scenario().start().of(world.scenario().craft().get(craft).name()).aim();
    List<Event> mine =
        layout.events().stream().filter(event -> (event.moved() >> craft & 1) != 0).toList();
    for (int i = 0; i <= mine.size(); i++) {
      int begin = i == 0 ? 0 : mine.get(i - 1).start() + tables.repoint[craft];
      int until = i == mine.size() ? tables.length : mine.get(i).start();
      Set<Aim> aims = i == 0 ? Set.of(first) : aims(craft, begin, until);
      List<List<Hold>> longer = new ArrayList<>();
      for (List<Hold> way : ways) {
        for (Aim aim : aims) {
          List<Hold> next = new ArrayList<>(way);
          next.add(hold(craft, aim, begin, until));
          longer.add(next);
        }
      }
      ways = longer;
    }
    return ways;
  }

  private Hold hold(int craft, Aim aim, int begin, int until) {
    return held.computeIfAbsent(
        List.of(craft, aim, begin, until), key -> new Hold(tables, craft, aim, begin, until));
  }

  private Set<Aim> aims(int craft, int begin, int until) {
    List<Integer> middles = new ArrayList<>();
    String name = world.scenario().craft().get(craft).name();
    for (Opportunity one : world.opportunities()) {
      int b = Math.max(begin, second(one.during().begin()));
      int e = Math.min(until, second(one.during().end()));
      if (one.craft().equals(name) && b < e) {
        middles.add((b + e) / 2);
      }
    }
    // An aim at the end of the period, for the coverage asked after it.
    int end =
        world
            .scenario()
            .rules()
            .data()
            .endCoverage()
            .map(asked -> tables.length + (int) asked.toSeconds() / 2)
            .orElse(-1);
    Set<Aim> aims = new java.util.LinkedHashSet<>();
    for (int i = 0; i < middles.size(); i++) {
      aims.add(Aiming.at(tables, craft, middles.get(i)));
      if (i > 0) {
        aims.add(Aiming.at(tables, craft, (middles.get(i - 1) + middles.get(i)) / 2));
      }
    }
    if (end >= 0 && until == tables.length) {
      aims.add(Aiming.at(tables, craft, end));
      for (int middle : middles) {
        aims.add(Aiming.at(tables, craft, (middle + end) / 2));
      }
    }
    if (aims.isEmpty()) {
      aims.add(Aiming.at(tables, craft, begin));
    }
    return aims;
  }

  private int second(GroundInstant instant) {
    return tables.second(instant.epochSecond());
  }

  private Optional<Decisions> combine(
      Layout layout, List<List<Way>> ways, List<Way> chosen, Needs needs) {
    if (judged > limit || --patience < 0) {
      judged = limit + 1;
      return Optional.empty();
    }
    int c = chosen.size();
    if (c < ways.size()) {
      for (Way way : ways.get(c)) {
        chosen.add(way);
        Optional<Decisions> found = combine(layout, ways, chosen, needs);
        chosen.remove(c);
        if (found.isPresent()) {
          return found;
        }
      }
      return Optional.empty();
    }
    List<Use> pieces = new ArrayList<>();
    chosen.forEach(way -> pieces.addAll(way.pieces()));
    List<List<Hold>> holds = chosen.stream().map(Way::holds).toList();
    boolean mayGap = world.features().contains(TinyWorld.Feature.COVERAGE_GAP);
    if ((!mayGap && hasGap(holds)) || !keepsConfirmed(pieces) || !needs.couldBeMet(pieces)) {
      return Optional.empty();
    }
    pieces.sort(
        Comparator.comparingInt(Use::begin)
            .thenComparingInt(Use::craft)
            .thenComparingInt(Use::antenna));
    return choose(layout, holds, pieces, 0, new ArrayList<>());
  }

  private boolean hasGap(List<List<Hold>> chosen) {
    List<int[]> covered = new ArrayList<>();
    for (List<Hold> holds : chosen) {
      for (Hold hold : holds) {
        covered.addAll(hold.covered);
        covered.add(new int[] {hold.from - tables.repoint[hold.craft], hold.from});
      }
    }
    covered.sort(Comparator.comparingInt(part -> part[0]));
    int until = 0;
    for (int[] part : covered) {
      if (part[0] > until + 5) {
        return true;
      }
      until = Math.max(until, part[1]);
    }
    return until < tables.length - 5;
  }

  // ---------------------------------------------------------------- contacts

  /** The longest contact of each hold in each opportunity. */
  private List<Use> pieces(int craft, List<Hold> holds) {
    List<Use> pieces = new ArrayList<>();
    String name = tables.scenario.craft().get(craft).name();
    for (Opportunity one : world.opportunities()) {
      for (Hold hold : one.craft().equals(name) ? holds : List.<Hold>of()) {
        for (int[] part : hold.covered) {
          int begin = Math.max(second(one.during().begin()), tables.groundCeil(craft, part[0]) + 1);
          int end = Math.min(second(one.during().end()), tables.groundFloor(craft, part[1]) - 1);
          piece(craft, antenna(one), begin, end, hold).ifPresent(pieces::add);
        }
      }
    }
    return pieces;
  }

  private Optional<Use> piece(int craft, int antenna, int begin, int end, Hold hold) {
    var dish = tables.antennas.get(antenna);
    int until = Math.min(end, begin + dish.longest());
    int b = tables.onboardFloor(craft, begin);
    int e = tables.onboardCeil(craft, until);
    if (until - begin < dish.shortest() || b < 0 || e > tables.length) {
      return Optional.empty();
    }
    int step = tables.rateStep(hold, antenna, b, e);
    return step < 0 ? Optional.empty() : Optional.of(new Use(craft, antenna, begin, until, step));
  }

  private int craft(String name) {
    for (int c = 0; c < tables.craftCount; c++) {
      if (tables.scenario.craft().get(c).name().equals(name)) {
        return c;
      }
    }
    throw new IllegalArgumentException(name);
  }

  private int antenna(Opportunity one) {
    return tables.antennas.stream()
        .filter(
            antenna ->
                antenna.station().name().equals(one.station())
                    && antenna.dish().name().equals(one.antenna()))
        .findFirst()
        .orElseThrow()
        .index();
  }

  private Optional<Decisions> choose(
      Layout layout, List<List<Hold>> holds, List<Use> pieces, int at, List<Use> taken) {
    if (judged > limit || --patience < 0) {
      judged = limit + 1;
      return Optional.empty();
    }
    if (at == pieces.size()) {
      return judge(layout, holds, taken);
    }
    Use whole = pieces.get(at);
    boolean rivals = false;
    for (Use other : pieces) {
      rivals |= !other.equals(whole) && conflict(whole, other, false);
    }
    int middle = (whole.begin() + whole.end()) / 2;
    int turn = 35 * 60;
    List<int[]> options = new ArrayList<>();
    options.add(new int[] {whole.begin(), whole.end()});
    if (rivals) {
      options.add(new int[] {whole.begin(), middle - turn});
      options.add(new int[] {middle + turn, whole.end()});
    }
    boolean placed = false;
    for (int[] option : options) {
      Use use = new Use(whole.craft(), whole.antenna(), option[0], option[1], whole.step());
      boolean shorter = option[1] - option[0] < tables.antennas.get(use.antenna()).shortest();
      if (shorter || taken.stream().anyMatch(one -> conflict(one, use, true))) {
        continue;
      }
      placed = true;
      taken.add(use);
      Optional<Decisions> found = choose(layout, holds, pieces, at + 1, taken);
      taken.remove(taken.size() - 1);
      if (found.isPresent()) {
        return found;
      }
    }
    return placed && !rivals ? Optional.empty() : choose(layout, holds, pieces, at + 1, taken);
  }

  /** Whether two contacts cannot both be; judged narrowly, {@code check} has the last word. */
  private boolean conflict(Use one, Use other, boolean exactly) {
    var antenna = tables.antennas.get(one.antenna());
    boolean same = one.antenna() == other.antenna();
    int apart =
        same ? antenna.busyBefore() + antenna.busyAfter() : one.craft() == other.craft() ? 0 : 600;
    boolean near = one.begin() < other.end() + apart && other.begin() < one.end() + apart;
    boolean overlap = one.begin() < other.end() && other.begin() < one.end();
    if (!near || (same && near) || one.craft() == other.craft()) {
      return near && (same || overlap);
    }
    int atOnce = tables.scenario.rules().contacts().contactsAtOnce();
    return exactly ? atOnce == 1 || !overlap : atOnce <= tables.craftCount;
  }

  private boolean tooMany(List<Use> taken) {
    int atOnce = tables.scenario.rules().contacts().contactsAtOnce();
    for (Use one : taken) {
      long running =
          taken.stream()
              .filter(other -> other.begin() <= one.begin() && one.begin() < other.end())
              .count();
      if (running > atOnce) {
        return true;
      }
    }
    return false;
  }

  private Optional<Decisions> judge(Layout layout, List<List<Hold>> holds, List<Use> taken) {
    if (tooMany(taken) || !keepsConfirmed(taken)) {
      return Optional.empty();
    }
    judged++;
    Decisions decisions = decisions(layout, holds, taken);
    Outcome outcome = simulation.outcome(decisions, world.waivers());
    return outcome.findings().isEmpty() ? Optional.of(decisions) : Optional.empty();
  }

  private boolean keepsConfirmed(List<Use> taken) {
    for (ConfirmedContact one : world.scenario().calendars().confirmed()) {
      boolean kept =
          taken.stream()
              .anyMatch(
                  use ->
                      use.craft() == craft(one.craft())
                          && tables
                              .antennas
                              .get(use.antenna())
                              .station()
                              .name()
                              .equals(one.station())
                          && use.begin() <= second(one.during().begin())
                          && use.end() >= second(one.during().end()));
      if (!kept) {
        return false;
      }
    }
    return true;
  }

  private Decisions decisions(Layout layout, List<List<Hold>> holds, List<Use> taken) {
    List<Repoint> repoints = new ArrayList<>();
    for (int c = 0; c < tables.craftCount; c++) {
      int number = 1;
      for (Event event : layout.events()) {
        if ((event.moved() >> c & 1) != 0) {
          repoints.add(repoint(c, event.start(), holds.get(c).get(number++).aim));
        }
      }
    }
    List<Contact> contacts = new ArrayList<>();
    for (Use use : taken) {
      var antenna = tables.antennas.get(use.antenna());
      GroundInstant begin = GroundInstant.ofEpochSecond(tables.epoch + use.begin());
      contacts.add(
          new Contact(
              "c" + contacts.size(),
              antenna.station().name(),
              antenna.dish().name(),
              tables.scenario.craft().get(use.craft()).name(),
              Interval.of(begin, GroundInstant.ofEpochSecond(tables.epoch + use.end())),
              List.of(new RateStep(begin, new DataRate(tables.ladder[use.craft()][use.step()]))),
              Set.of(Contact.Service.TELEMETRY),
              Contact.Status.TENTATIVE));
    }
    return new Decisions(repoints, contacts);
  }

  private Repoint repoint(int craft, int start, Aim aim) {
    return new Repoint(
        "r" + craft + "-" + start,
        tables.scenario.craft().get(craft).name(),
        OnboardInstant.ofEpochSecond(tables.epoch + start),
        aim);
  }
}
