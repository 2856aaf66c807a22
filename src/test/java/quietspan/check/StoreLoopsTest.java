package quietspan.check;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import quietspan.model.ClassOutcome;
import quietspan.model.ContactOutcome;
import quietspan.model.DataRules;
import quietspan.model.Outcome;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;

/**
 * Numbers that can be worked out by hand. Of 64 kbit/s, 90 % are payload and 90 % of that are
 * counted on: 51 840 bit/s.
 */
final class StoreLoopsTest {

  private static final long RATE = 51_840;
  private static final long LOCK = 300;
  private static final long EVENING = 19 * 3600;

  private static Outcome recount(World world) {
    return world.check().recount();
  }

  private static StoreTrace store(World world, int craft) {
    return recount(world).stores().get(craft);
  }

  private static long fillAt(StoreTrace trace, long second) {
    return trace.points().stream()
        .filter(point -> point.onboardEpochSecond() == World.onboard(second).epochSecond())
        .mapToLong(StorePoint::fillBits)
        .findFirst()
        .orElseThrow();
  }

  private static long imageBegin(World world, long ground) {
    return World.second(world.sky().onboard("Hask", World.ground(ground)).ceilToSecond());
  }

  private static long imageEnd(World world, long ground) {
    return World.second(world.sky().onboard("Hask", World.ground(ground)).floorToSecond());
  }

  @Test
  void aFullStoreUsesTheWholeCapacityAfterLockUp() {
    World world = World.one();
    world.holds(0, 9_000_000_000L);
    ContactOutcome outcome = recount(world).contacts().get(0);
    long length = imageEnd(world, 23 * 3600) - imageBegin(world, EVENING);
    assertThat(outcome.capacity().bits()).isEqualTo((length - LOCK) * RATE);
    assertThat(outcome.delivered().bits()).isEqualTo(outcome.capacity().bits());
  }

  @Test
  void aSecondRateBeginsAfterItsLock() {
    World world = World.one();
    world.contactRules(2, 1, Duration.ZERO);
    world.secondRate("c0", EVENING + 7200, 48_000);
    long change = imageBegin(world, EVENING + 7200);
    long first = change - imageBegin(world, EVENING) - LOCK;
    long second = imageEnd(world, 23 * 3600) - change - 60;
    assertThat(recount(world).contacts().get(0).capacity().bits())
        .isEqualTo(first * RATE + second * 38_880);
  }

  @Test
  void anEmptyStoreDeliversWhatItMakesAndNoMore() {
    World world = World.one();
    world.holds(0, 0);
    Outcome outcome = recount(world);
    long sent = imageEnd(world, 23 * 3600);
    assertThat(outcome.contacts().get(0).delivered().bits()).isEqualTo(sent * 2_200);
    assertThat(fillAt(outcome.stores().get(0), sent)).isZero();
  }

  @Test
  void higherPriorityGoesFirst() {
    World world = World.one();
    world.holds(0, 9_000_000_000L);
    List<ClassOutcome> classes = recount(world).classes();
    long sent = imageEnd(world, 2 * 86_400 + 23 * 3600);
    assertThat(classes.get(0).deliveredBits()).isEqualTo(sent * 200);
    assertThat(classes.get(1).lostBits()).isZero();
  }

  @Test
  void othersForwardAheadAtTheirCrossLinkRate() {
    World world = World.three();
    world.makes(1, 0, 0);
    world.makes(2, 0, 0);
    world.holds(1, 100_000_000);
    world.holds(2, 100_000_000);
    long begin = imageBegin(world, EVENING);
    StoreTrace merle = store(world, 1);
    assertThat(fillAt(merle, begin - 3600)).isEqualTo(100_000_000);
    // 44 kbit/s empty it in 2273 s, long before the contact.
    assertThat(fillAt(merle, begin)).isZero();
    assertThat(merle.forwardedBits()).isEqualTo(100_000_000);
    StoreTrace hask = store(world, 0);
    assertThat(hask.receivedBits()).isEqualTo(200_000_000);
    assertThat(fillAt(hask, begin) - fillAt(hask, begin - 3600))
        .isEqualTo(200_000_000 + 3600 * 2_200);
  }

  @Test
  void nobodyForwardsBeforeTheTimeAheadOrWithoutIt() {
    World world = World.three();
    DataRules data = world.scenario.data;
    world.scenario.data =
        new DataRules(
            data.gapLimit(),
            data.directLimit(),
            data.endFillShare(),
            data.endCoverage(),
            Duration.ZERO,
            true);
    long begin = imageBegin(world, EVENING);
    assertThat(fillAt(store(world, 1), begin)).isEqualTo(100_000_000 + begin * 2_200);
  }

  @Test
  void aSinkKeepsRoomForWhatItWillMake() {
    World world = World.three();
    world.makes(1, 0, 0);
    world.makes(2, 0, 0);
    world.holds(1, 3_000_000_000L);
    world.holds(2, 0);
    // Hask may hold 400 Mbit.
    world.store(0, 500_000_000, 44_000);
    world.plannedFill(0.8);
    StoreTrace hask = store(world, 0);
    long begin = imageBegin(world, EVENING);
    // When the contact begins it is exactly at its planned fill, with nothing left to make.
    assertThat(fillAt(hask, begin)).isEqualTo(400_000_000);
    assertThat(fillAt(hask, imageEnd(world, 23 * 3600))).isLessThan(400_000_000);
  }

  @Test
  void theNewestBitsOfTheLowestPriorityAreLost() {
    World world = World.one();
    world.holds(0, 0);
    world.contacts.clear();
    world.store(0, 100_000_000, 0);
    Outcome outcome = recount(world);
    long made = World.PERIOD_SECONDS * 2_200;
    assertThat(outcome.lostBits()).isEqualTo(made - 100_000_000);
    assertThat(outcome.classes().get(0).lostBits()).isZero();
    StorePoint end =
        outcome.stores().get(0).points().get(outcome.stores().get(0).points().size() - 1);
    assertThat(end.bitsByClass().get(0)).isEqualTo(World.PERIOD_SECONDS * 200);
    assertThat(end.fillBits()).isEqualTo(100_000_000);
  }

  @Test
  void pausesMakeTheirShareAndCanCloseTheCrossLinks() {
    World world = World.three();
    world.repoint("r0", "Tovin", 3600);
    long paused = 30 * 60 + 5 * 3600;
    long expected = World.PERIOD_SECONDS * 2_200 - paused * (170 + 1_700);
    assertThat(store(world, 1).generatedBits()).isEqualTo(expected);
  }

  @Test
  void agesOfTheStartFillAreLinearToTheBeginOfThePeriod() {
    World world = World.one();
    world.makes(0, 0, 0);
    world.classes(Duration.ofDays(4), Duration.ofSeconds(World.PERIOD_SECONDS + 7));
    world.contacts.clear();
    // Ten seconds hold 103 bit: 10 11 10 11 10 10 10 10 10 11, by rounding down i * 103 / 10.
    world.startFill(0, 103, Optional.of(World.onboard(-10)));
    // At the end, bits made 8 s or more before the period are late: three seconds.
    assertThat(recount(world).classes().get(1).lateBits()).isEqualTo(10 + 10 + 10);
    assertThat(recount(world).classes().get(1).longestLatencySeconds())
        .hasValue(World.PERIOD_SECONDS + 10);
  }

  @Test
  void twoContactsOfOneCraftAtOnceSendAtTheHigherRate() {
    World world = World.three();
    world.holds(0, 9_000_000_000L);
    world.plannedFill(1);
    // The evening at Corrin Downs overlaps by an hour; its 32 kbit/s do not add.
    world.contact("x", "Corrin Downs", "Hask", EVENING - 3600, EVENING + 3600, 32_000);
    List<ContactOutcome> contacts = recount(world).contacts();
    assertThat(contacts.get(0).contact()).isEqualTo("x");
    assertThat(contacts.get(1).delivered()).isEqualTo(contacts.get(1).capacity());
    long alone = imageBegin(world, EVENING) + LOCK - imageBegin(world, EVENING - 3600) - LOCK;
    assertThat(contacts.get(0).delivered().bits()).isEqualTo(alone * 25_920);
  }
}
