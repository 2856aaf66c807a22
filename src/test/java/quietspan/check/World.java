package quietspan.check;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.Set;
import java.util.function.Consumer;
import java.util.function.UnaryOperator;
import quietspan.fixture.SyntheticSky;
import quietspan.fixture.TestScenario;
import quietspan.model.Aim;
import quietspan.model.Blocked;
import quietspan.model.Calendars;
import quietspan.model.ConfirmedContact;
import quietspan.model.Contact;
import quietspan.model.ContactRules;
import quietspan.model.Craft;
import quietspan.model.CraftState;
import quietspan.model.DataClass;
import quietspan.model.DataRules;
import quietspan.model.Decisions;
import quietspan.model.Dish;
import quietspan.model.Frozen;
import quietspan.model.Generation;
import quietspan.model.Guarded;
import quietspan.model.HighGainAntenna;
import quietspan.model.Interruption;
import quietspan.model.Margins;
import quietspan.model.Profile;
import quietspan.model.RateLadder;
import quietspan.model.RateStep;
import quietspan.model.Repoint;
import quietspan.model.Scenario;
import quietspan.model.Station;
import quietspan.model.Steering;
import quietspan.model.Waiver;
import quietspan.time.GroundInstant;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;
import quietspan.units.Angle;
import quietspan.units.DataRate;
import quietspan.units.DataVolume;

/**
 * A small world whose plan is legal with room to spare, to be bent until one rule breaks: three
 * days, and each evening a contact of Hask at Vellmarch from 19:00 to 23:00 ground time. Values are
 * invented.
 */
final class World {

  static final Instant MIDNIGHT = Instant.parse("2031-09-01T00:00:00Z");
  static final long DAY = 86_400;
  static final long PERIOD_SECONDS = 3 * DAY;

  final TestScenario scenario;
  final List<Contact> contacts = new ArrayList<>();
  final List<Repoint> repoints = new ArrayList<>();
  List<Waiver> waivers = new ArrayList<>();
  Optional<Frozen> frozen = Optional.empty();
  List<Blocked> blocked = new ArrayList<>();
  List<Guarded> guarded = new ArrayList<>();
  List<Interruption> interruptions = new ArrayList<>();
  List<ConfirmedContact> confirmed = new ArrayList<>();
  UnaryOperator<SyntheticSky> sky = UnaryOperator.identity();

  private World(TestScenario scenario) {
    this.scenario = scenario;
    scenario.begin = MIDNIGHT;
    scenario.days = 3;
    scenario.contacts =
        new ContactRules(
            Duration.ofMinutes(5), 1, Duration.ofMinutes(1), 1, Duration.ofMinutes(10), 0.1);
    scenario.data = data(Optional.of(Duration.ofHours(30)), Optional.empty(), 0.5);
    classes(Duration.ofDays(4), Duration.ofDays(4));
    for (int i = 0; i < scenario.craft.size(); i++) {
      makes(i, 200, 2_000);
      holds(i, 100_000_000);
    }
    evening("c0", 0, 19 * 3600);
    evening("c1", 1, 19 * 3600);
    evening("c2", 2, 19 * 3600);
  }

  static World three() {
    return new World(TestScenario.three());
  }

  static World one() {
    return new World(TestScenario.one());
  }

  static World three(Consumer<World> bend) {
    World world = three();
    bend.accept(world);
    return world;
  }

  void evening(String id, int day, long secondOfDay) {
    long begin = day * DAY + secondOfDay;
    contact(id, "Vellmarch", "Hask", begin, day * DAY + 23 * 3600, 64_000);
  }

  Scenario build() {
    scenario.calendars = new Calendars(blocked, guarded, interruptions, confirmed);
    return scenario.build();
  }

  SyntheticSky sky() {
    return sky.apply(new SyntheticSky(build()));
  }

  Decisions decisions() {
    return new Decisions(repoints, contacts);
  }

  CheckReport check() {
    return Check.check(build(), sky(), decisions(), waivers, frozen);
  }

  static GroundInstant ground(long second) {
    return new GroundInstant(MIDNIGHT).plusSeconds(second);
  }

  static OnboardInstant onboard(long second) {
    return new OnboardInstant(MIDNIGHT).plusSeconds(second);
  }

  static Interval<GroundInstant> ground(long from, long to) {
    return Interval.of(ground(from), ground(to));
  }

  static Interval<OnboardInstant> onboard(long from, long to) {
    return Interval.of(onboard(from), onboard(to));
  }

  static long second(GroundInstant instant) {
    return instant.epochSecond() - MIDNIGHT.getEpochSecond();
  }

  static long second(OnboardInstant instant) {
    return instant.epochSecond() - MIDNIGHT.getEpochSecond();
  }

  static Contact made(
      String id, String station, String craft, Interval<GroundInstant> during, long rate) {
    return new Contact(
        id,
        station,
        "main",
        craft,
        during,
        List.of(new RateStep(during.begin(), new DataRate(rate))),
        Set.of(Contact.Service.TELEMETRY),
        Contact.Status.TENTATIVE);
  }

  /** Adds a contact, in seconds of ground time after midnight; replaces one of the same id. */
  void contact(String id, String station, String craft, long from, long to, long rate) {
    contacts.removeIf(each -> each.id().equals(id));
    contacts.add(made(id, station, craft, ground(from, to), rate));
  }

  /** Gives a contact a second rate. */
  void secondRate(String id, long from, long rate) {
    contacts.replaceAll(
        each ->
            each.id().equals(id)
                ? new Contact(
                    id,
                    each.station(),
                    each.antenna(),
                    each.craft(),
                    each.during(),
                    List.of(each.steps().get(0), new RateStep(ground(from), new DataRate(rate))),
                    each.services(),
                    each.status())
                : each);
  }

  void cancel(String id) {
    contacts.replaceAll(
        each ->
            each.id().equals(id)
                ? new Contact(
                    id,
                    each.station(),
                    each.antenna(),
                    each.craft(),
                    each.during(),
                    each.steps(),
                    each.services(),
                    Contact.Status.CANCELLED)
                : each);
  }

  Contact contact(String id) {
    return contacts.stream().filter(each -> each.id().equals(id)).findFirst().orElseThrow();
  }

  /** Adds a repoint that leaves the antenna where it was, in on-board seconds after midnight. */
  void repoint(String id, String craft, long from) {
    repoint(id, craft, from, scenario.build().start().of(craft).aim());
  }

  void repoint(String id, String craft, long from, Aim aim) {
    repoints.add(new Repoint(id, craft, onboard(from), aim));
  }

  void classes(Duration quicklook, Duration bulk) {
    scenario.classes =
        List.of(new DataClass("quicklook", 1, quicklook), new DataClass("bulk", 2, bulk));
  }

  static DataRules data(Optional<Duration> gap, Optional<Duration> direct, double endShare) {
    return new DataRules(
        gap, direct, Optional.of(endShare), Optional.empty(), Duration.ofHours(1), true);
  }

  void endCoverage(Duration asked) {
    DataRules data = scenario.data;
    scenario.data =
        new DataRules(
            data.gapLimit(),
            data.directLimit(),
            data.endFillShare(),
            Optional.of(asked),
            data.forwardAhead(),
            data.crossLinksInPauses());
  }

  void endFillShare(Optional<Double> share) {
    DataRules data = scenario.data;
    scenario.data =
        new DataRules(
            data.gapLimit(),
            data.directLimit(),
            share,
            data.endCoverage(),
            data.forwardAhead(),
            data.crossLinksInPauses());
  }

  void contactRules(int rateSteps, int atOnce, Duration craftSwitch) {
    ContactRules rules = scenario.contacts;
    scenario.contacts =
        new ContactRules(
            rules.lockUp(), rateSteps, rules.relock(), atOnce, craftSwitch, rules.overheadShare());
  }

  void plannedFill(double share) {
    var margins = scenario.margins;
    scenario.margins =
        new Margins(
            margins.usableVolumeShare(),
            share,
            margins.pointingAllowance(),
            margins.coneAllowance());
  }

  private void craft(int index, UnaryOperator<Craft> change) {
    scenario.craft.set(index, change.apply(scenario.craft.get(index)));
  }

  void store(int index, long bits, long crossLink) {
    craft(
        index,
        craft ->
            new Craft(
                craft.name(),
                craft.orbit(),
                craft.attitude(),
                craft.antenna(),
                craft.rates(),
                new DataVolume(bits),
                new DataRate(crossLink),
                craft.generation()));
  }

  void makes(int index, long quicklook, long bulk) {
    List<Generation> generation = List.of(made("quicklook", quicklook), made("bulk", bulk));
    craft(
        index,
        craft ->
            new Craft(
                craft.name(),
                craft.orbit(),
                craft.attitude(),
                craft.antenna(),
                craft.rates(),
                craft.store(),
                craft.crossLink(),
                generation));
  }

  void rates(int index, RateLadder rates) {
    craft(
        index,
        craft ->
            new Craft(
                craft.name(),
                craft.orbit(),
                craft.attitude(),
                craft.antenna(),
                rates,
                craft.store(),
                craft.crossLink(),
                craft.generation()));
  }

  private static Generation made(String dataClass, long rate) {
    Profile profile =
        new Profile(List.of(new Profile.Step(new OnboardInstant(MIDNIGHT), new DataRate(rate))));
    return new Generation(dataClass, profile, 0.15);
  }

  void holds(int index, long bulk) {
    startFill(index, bulk, Optional.empty());
  }

  void startFill(int index, long bulk, Optional<OnboardInstant> oldest) {
    CraftState state = scenario.states.get(index);
    scenario.states.set(
        index,
        new CraftState(
            state.craft(),
            state.aim(),
            List.of(new CraftState.Fill("bulk", new DataVolume(bulk), oldest)),
            state.lastContactEnd(),
            state.lastRepoint()));
  }

  void lastRepoint(int index, long second) {
    CraftState state = scenario.states.get(index);
    scenario.states.set(
        index,
        new CraftState(
            state.craft(),
            state.aim(),
            state.fill(),
            state.lastContactEnd(),
            Optional.of(onboard(second))));
  }

  void antenna(int index, Steering steering, double ratedHalfConeDegrees, Duration repointSpacing) {
    craft(
        index,
        craft ->
            new Craft(
                craft.name(),
                craft.orbit(),
                craft.attitude(),
                new HighGainAntenna(
                    steering,
                    Angle.ofDegrees(ratedHalfConeDegrees),
                    craft.antenna().halfPowerWidth(),
                    craft.antenna().move(),
                    craft.antenna().settle(),
                    repointSpacing),
                craft.rates(),
                craft.store(),
                craft.crossLink(),
                craft.generation()));
  }

  private void station(String name, UnaryOperator<Station> change) {
    scenario.stations.replaceAll(each -> each.name().equals(name) ? change.apply(each) : each);
  }

  void mask(String name, Station.MaskPoint... corners) {
    station(
        name,
        each ->
            new Station(
                each.name(),
                each.latitude(),
                each.longitude(),
                each.altitude(),
                List.of(corners),
                each.sepLimit(),
                each.deliveryDelay(),
                each.zone(),
                each.dishes()));
  }

  void sepLimit(String name, double degrees) {
    station(
        name,
        each ->
            new Station(
                each.name(),
                each.latitude(),
                each.longitude(),
                each.altitude(),
                each.mask(),
                Angle.ofDegrees(degrees),
                each.deliveryDelay(),
                each.zone(),
                each.dishes()));
  }

  void dish(String name, UnaryOperator<Dish> change) {
    station(
        name,
        each ->
            new Station(
                each.name(),
                each.latitude(),
                each.longitude(),
                each.altitude(),
                each.mask(),
                each.sepLimit(),
                each.deliveryDelay(),
                each.zone(),
                List.of(change.apply(each.dishes().get(0)))));
  }

  void lengths(String name, Duration minimum, Duration maximum) {
    dish(
        name,
        dish ->
            new Dish(
                dish.name(),
                dish.gOverT(),
                dish.zenithAttenuationDb(),
                dish.lowestElevation(),
                dish.highestElevation(),
                dish.deadZones(),
                dish.setup(),
                dish.teardown(),
                dish.changeover(),
                minimum,
                maximum,
                dish.costPerHour(),
                dish.costPerContact()));
  }

  void looks(String name, double lowestRadians, double highestRadians, Dish.Sector... zones) {
    dish(
        name,
        dish ->
            new Dish(
                dish.name(),
                dish.gOverT(),
                dish.zenithAttenuationDb(),
                Angle.ofRadians(lowestRadians),
                Angle.ofRadians(highestRadians),
                List.of(zones),
                dish.setup(),
                dish.teardown(),
                dish.changeover(),
                dish.minimumContact(),
                dish.maximumContact(),
                dish.costPerHour(),
                dish.costPerContact()));
  }
}
