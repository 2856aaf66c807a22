package quietspan.planning.simulation;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.TreeSet;
import quietspan.model.Craft;
import quietspan.model.DataRules;
import quietspan.model.Generation;
import quietspan.model.Pause;
import quietspan.model.Profile;
import quietspan.model.Scenario;
import quietspan.time.OnboardInstant;

/** Cuts the period into stretches: everything the stores depend on but themselves. */
final class Timeline {

  private final Scenario scenario;
  private final Stores stores;
  private final List<Image> images;
  private final List<Pause> pauses;
  private final long seconds;
  private final long forwardAhead;
  private final boolean crossLinksInPauses;

  private long[] cuts;
  private Stretch[] stretches;

  /**
   * Bits generated from the begin of the period to the begin of a stretch, by stretch and craft.
   */
  private long[][] generatedBefore;

  private Timeline(Scenario scenario, Stores stores, List<Image> images, List<Pause> pauses) {
    this.scenario = scenario;
    this.stores = stores;
    this.images = images;
    this.pauses = pauses;
    this.seconds = scenario.period().length().toSeconds();
    DataRules rules = scenario.rules().data();
    this.forwardAhead = rules.forwardAhead().toSeconds();
    this.crossLinksInPauses = rules.crossLinksInPauses();
  }

  static List<Stretch> stretches(
      Scenario scenario, Stores stores, List<Image> images, List<Pause> pauses) {
    Timeline timeline = new Timeline(scenario, stores, images, pauses);
    timeline.cut();
    timeline.generate();
    timeline.contact();
    return List.of(timeline.stretches);
  }

  private void cut() {
    TreeSet<Long> at = new TreeSet<>();
    at.add(0L);
    at.add(seconds);
    for (Image image : images) {
      at.add(image.begin() - forwardAhead);
      at.add(image.begin());
      at.add(image.end());
      for (Image.Piece piece : image.pieces()) {
        at.add(piece.begin());
        at.add(piece.end());
      }
    }
    for (Pause pause : pauses) {
      at.add(begin(pause));
      at.add(end(pause));
    }
    for (Craft craft : scenario.craft()) {
      for (Generation generation : craft.generation()) {
        for (Profile.Step step : generation.profile().steps()) {
          at.add(second(step.from().ceilToSecond()));
        }
      }
    }
    cuts = at.subSet(0L, true, seconds, true).stream().mapToLong(Long::longValue).toArray();
    stretches = new Stretch[cuts.length - 1];
    for (int i = 0; i < stretches.length; i++) {
      stretches[i] = new Stretch(cuts[i], cuts[i + 1], stores.craft(), stores.classes());
    }
  }

  private long second(OnboardInstant instant) {
    return instant.epochSecond() - scenario.period().begin().epochSecond();
  }

  /** First second that overlaps the pause. */
  private long begin(Pause pause) {
    return second(pause.during().begin().floorToSecond());
  }

  private long end(Pause pause) {
    return second(pause.during().end().ceilToSecond());
  }

  private void generate() {
    generatedBefore = new long[cuts.length][stores.craft()];
    int pause = 0;
    for (int i = 0; i < stretches.length; i++) {
      Stretch stretch = stretches[i];
      while (pause < pauses.size() && end(pauses.get(pause)) <= stretch.begin) {
        pause++;
      }
      boolean paused = pause < pauses.size() && begin(pauses.get(pause)) <= stretch.begin;
      OnboardInstant at = scenario.period().begin().plusSeconds(stretch.begin);
      for (int c = 0; c < stores.craft(); c++) {
        for (Generation generation : scenario.craft().get(c).generation()) {
          var rate = generation.profile().at(at);
          long bits = (paused ? rate.share(generation.shareInPauses()) : rate).bitsPerSecond();
          stretch.generated[stores.index(c, generation.dataClass())] += bits;
          stretch.generatedByCraft[c] += bits;
        }
        generatedBefore[i + 1][c] =
            generatedBefore[i][c] + stretch.generatedByCraft[c] * (stretch.end - stretch.begin);
      }
      stretch.paused = paused;
    }
  }

  private void contact() {
    List<Image> coming = new ArrayList<>(images);
    coming.sort(Comparator.comparingLong(Image::begin).thenComparingInt(Image::craft));
    List<Image> running = new ArrayList<>();
    int next = 0;
    for (int i = 0; i < stretches.length; i++) {
      Stretch stretch = stretches[i];
      while (next < coming.size() && coming.get(next).begin() <= stretch.begin) {
        running.add(coming.get(next++));
      }
      running.removeIf(image -> image.end() <= stretch.begin);
      if (!running.isEmpty()) {
        run(stretch, i, running);
      } else if (next < coming.size() && coming.get(next).begin() - stretch.begin <= forwardAhead) {
        Image ahead = coming.get(next);
        receive(stretch, i, ahead.craft(), ahead.begin());
      }
    }
  }

  private void run(Stretch stretch, int index, List<Image> running) {
    int first = Integer.MAX_VALUE;
    for (Image image : running) {
      int c = image.craft();
      first = Math.min(first, c);
      stretch.sink[c] = true;
      long rate = image.bitsPerSecond(stretch.begin);
      boolean better = rate > stretch.rate[c];
      boolean earlier = rate == stretch.rate[c] && image.place() < stretch.image[c];
      if (better || earlier) {
        stretch.rate[c] = rate;
        stretch.image[c] = image.place();
      }
    }
    long until = 0;
    for (Image image : running) {
      if (image.craft() == first) {
        until = Math.max(until, image.end());
      }
    }
    receive(stretch, index, first, until);
  }

  /** The other craft send to this one, which keeps room for what it generates until then. */
  private void receive(Stretch stretch, int index, int craft, long until) {
    if (stretch.paused && !crossLinksInPauses) {
      return;
    }
    int last = Arrays.binarySearch(cuts, Math.min(until, seconds));
    long own =
        generatedBefore[last][craft]
            - generatedBefore[index][craft]
            - stretch.generatedByCraft[craft];
    stretch.receiver = craft;
    stretch.sink[craft] = true;
    stretch.allowance = stores.plannedFill(craft) - own;
  }
}
