package quietspan.check;

import java.util.ArrayList;
import java.util.List;
import java.util.SortedSet;
import java.util.TreeSet;
import quietspan.model.Craft;
import quietspan.model.DataClass;
import quietspan.model.Generation;
import quietspan.model.Pause;
import quietspan.model.Profile;
import quietspan.model.Scenario;
import quietspan.time.Interval;
import quietspan.time.OnboardInstant;

/**
 * The period cut into stretches of whole on-board seconds within which nothing changes that rules a
 * second of the stores: rates of generation, pauses, contacts, sinks.
 */
final class Timeline {

  private final Scenario scenario;
  private final List<Pause> pauses;
  private final List<Image> images;
  private final long begin;
  private final long seconds;
  private final List<Stretch> stretches = new ArrayList<>();

  Timeline(Scenario scenario, List<Pause> pauses, List<Image> images) {
    this.scenario = scenario;
    this.pauses = pauses;
    this.images = images.stream().filter(image -> image.begin() < image.end()).toList();
    this.begin = scenario.period().begin().epochSecond();
    this.seconds = scenario.period().length().toSeconds();
    Long from = null;
    for (Long edge : edges()) {
      if (from != null) {
        stretches.add(stretch(from, edge));
      }
      from = edge;
    }
  }

  List<Stretch> stretches() {
    return stretches;
  }

  /** What a craft makes in the seconds before this one, from the begin of the period. */
  long generatedBefore(int craft, long second) {
    long bits = 0;
    for (Stretch stretch : stretches) {
      if (stretch.from >= second) {
        break;
      }
      long perSecond = 0;
      for (long rate : stretch.generation[craft]) {
        perSecond += rate;
      }
      bits += perSecond * (Math.min(stretch.to, second) - stretch.from);
    }
    return bits;
  }

  private SortedSet<Long> edges() {
    TreeSet<Long> edges = new TreeSet<>(List.of(0L, seconds));
    for (Pause pause : pauses) {
      edges.add(pause.during().begin().epochSecond() - begin);
      edges.add(pause.during().end().ceilToSecond().epochSecond() - begin);
    }
    long ahead = Seconds.roundedDown(scenario.rules().data().forwardAhead());
    for (Image image : images) {
      edges.add(image.begin());
      edges.add(image.begin() - ahead);
      edges.add(image.end());
      for (Image.Sending sending : image.data()) {
        edges.add(sending.from());
        edges.add(sending.to());
      }
    }
    for (Craft craft : scenario.craft()) {
      for (Generation generation : craft.generation()) {
        for (Profile.Step step : generation.profile().steps()) {
          edges.add(step.from().ceilToSecond().epochSecond() - begin);
        }
      }
    }
    return edges.subSet(0L, true, seconds, true);
  }

  private Stretch stretch(long from, long to) {
    int count = scenario.craft().size();
    boolean paused = paused(from);
    Stretch stretch = new Stretch(from, to, count);
    for (int craft = 0; craft < count; craft++) {
      stretch.generation[craft] = generation(scenario.craft().get(craft), from, paused);
      for (Image image : images) {
        if (image.craft() == craft && image.rateAt(from) > stretch.rate[craft]) {
          stretch.sending[craft] = image;
          stretch.rate[craft] = image.rateAt(from);
        }
      }
    }
    chooseSinks(stretch, paused);
    return stretch;
  }

  private boolean paused(long second) {
    Interval<OnboardInstant> wholeSecond =
        Interval.of(
            OnboardInstant.ofEpochSecond(begin + second),
            OnboardInstant.ofEpochSecond(begin + second + 1));
    return pauses.stream().anyMatch(pause -> pause.during().overlaps(wholeSecond));
  }

  private long[] generation(Craft craft, long second, boolean paused) {
    List<DataClass> classes = scenario.rules().classes();
    long[] rates = new long[classes.size()];
    OnboardInstant at = OnboardInstant.ofEpochSecond(begin + second);
    for (Generation generation : craft.generation()) {
      int index = classes.indexOf(scenario.rules().dataClass(generation.dataClass()));
      var rate = generation.profile().at(at);
      rates[index] += (paused ? rate.share(generation.shareInPauses()) : rate).bitsPerSecond();
    }
    return rates;
  }

  /**
   * Data gather at the craft in contact: those outside a contact send to the first of them; with
   * none in contact, to the craft of the next contact if it is near enough.
   */
  private void chooseSinks(Stretch stretch, boolean paused) {
    if (paused && !scenario.rules().data().crossLinksInPauses()) {
      return;
    }
    int first = -1;
    for (Image image : images) {
      if (image.holds(stretch.from)) {
        int craft = image.craft();
        stretch.sinkUntil[craft] = Math.max(stretch.sinkUntil[craft], image.end());
        first = first < 0 ? craft : Math.min(first, craft);
      }
    }
    boolean inContact = first >= 0;
    if (!inContact) {
      Image next = nextContact(stretch.from);
      if (next == null) {
        return;
      }
      first = next.craft();
      stretch.sinkUntil[first] = next.begin();
    }
    for (int craft = 0; craft < stretch.sink.length; craft++) {
      boolean isSink = inContact ? stretch.sinkUntil[craft] > 0 : craft == first;
      stretch.sink[craft] = isSink ? -1 : first;
    }
  }

  private Image nextContact(long second) {
    long ahead = Seconds.roundedDown(scenario.rules().data().forwardAhead());
    Image next = null;
    for (Image image : images) {
      boolean near = image.begin() > second && image.begin() - second <= ahead;
      boolean sooner =
          next == null
              || image.begin() < next.begin()
              || (image.begin() == next.begin() && image.craft() < next.craft());
      if (near && sooner) {
        next = image;
      }
    }
    return next;
  }
}
