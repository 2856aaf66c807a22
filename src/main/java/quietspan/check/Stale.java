package quietspan.check;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.TreeMap;
import java.util.TreeSet;
import quietspan.model.Bound;
import quietspan.model.ClassOutcome;
import quietspan.model.ContactOutcome;
import quietspan.model.Finding;
import quietspan.model.InputFile;
import quietspan.model.Outcome;
import quietspan.model.Plan;
import quietspan.model.StorePoint;
import quietspan.model.StoreTrace;
import quietspan.model.Waiver;

/**
 * What a stored plan says beyond its decisions, against what it should say. A plan edited by hand
 * is stale until it is written again, which harms nobody; a plan whose inputs or waivers are not
 * those of the scenario was judged by other limits than it shows.
 *
 * @param differences in the order of the plan: inputs, waivers, derived values
 */
public record Stale(List<Difference> differences) {

  /** What differs. */
  public enum Kind {
    INPUT,
    WAIVER,
    DERIVED
  }

  /** Whether the plan can be trusted as it is stored. */
  public enum Verdict {
    /** It says what follows from its decisions. */
    FRESH,
    /** Only derived values differ: exit 0 where no rule is broken. */
    STALE,
    /** The inputs or the waivers differ: exit 3. */
    ALTERED
  }

  /** One difference, both sides as text. */
  public record Difference(Kind kind, String what, String stored, String now) {

    @Override
    public String toString() {
      return what + ": stored " + stored + ", now " + now;
    }
  }

  /** Latencies and other fractions are compared to this (in their unit). */
  private static final double SAME = 0.01;

  public Stale {
    differences = List.copyOf(differences);
  }

  /** The worst that the differences mean. */
  public Verdict verdict() {
    if (differences.isEmpty()) {
      return Verdict.FRESH;
    }
    return differences.stream().allMatch(each -> each.kind == Kind.DERIVED)
        ? Verdict.STALE
        : Verdict.ALTERED;
  }

  /**
   * Compares a stored plan with what follows from its decisions and its scenario today.
   *
   * @param recount {@link CheckReport#recount}
   * @param inputs the files of the scenario as they are now
   * @param waivers as the scenario gives them now
   */
  public static Stale compare(
      Plan stored, Outcome recount, List<InputFile> inputs, List<Waiver> waivers) {
    List<Difference> found = new ArrayList<>();
    compareInputs(found, stored.provenance().inputs(), inputs);
    compareWaivers(found, stored.provenance().waivers(), waivers);
    compareOutcomes(found, stored.outcome(), recount);
    stored.bound().ifPresent(bound -> compareBound(found, bound, recount));
    return new Stale(found);
  }

  private static void compareInputs(
      List<Difference> found, List<InputFile> stored, List<InputFile> now) {
    Map<String, String> before = new TreeMap<>();
    stored.forEach(each -> before.put(each.path(), each.sha256()));
    Map<String, String> after = new TreeMap<>();
    now.forEach(each -> after.put(each.path(), each.sha256()));
    TreeSet<String> paths = new TreeSet<>(before.keySet());
    paths.addAll(after.keySet());
    for (String path : paths) {
      add(
          found,
          Kind.INPUT,
          "input " + path,
          before.getOrDefault(path, "absent"),
          after.getOrDefault(path, "absent"));
    }
  }

  private static void compareWaivers(
      List<Difference> found, List<Waiver> stored, List<Waiver> now) {
    List<Waiver> added = new ArrayList<>(stored);
    now.forEach(added::remove);
    List<Waiver> missing = new ArrayList<>(now);
    stored.forEach(missing::remove);
    added.forEach(each -> add(found, Kind.WAIVER, name(each), words(each), "absent"));
    missing.forEach(each -> add(found, Kind.WAIVER, name(each), "absent", words(each)));
  }

  private static String name(Waiver waiver) {
    return String.join(
            " ", List.of("waiver", waiver.rule().name(), waiver.craft(), waiver.dataClass()))
        .strip();
  }

  private static String words(Waiver waiver) {
    return waiver.relaxedLimit().toSeconds()
        + " s from "
        + waiver.begin()
        + " to "
        + waiver.end()
        + " ("
        + waiver.reason()
        + ")";
  }

  private static void compareOutcomes(List<Difference> found, Outcome stored, Outcome now) {
    add(found, "science seconds", stored.scienceSeconds(), now.scienceSeconds());
    add(found, "pauses", stored.pauses(), now.pauses());
    add(found, "quiet spans", stored.quietSpans(), now.quietSpans());
    addNumber(found, "contact hours", stored.contactHours(), now.contactHours());
    addNumber(found, "station cost units", stored.stationCostUnits(), now.stationCostUnits());
    compareContacts(found, stored.contacts(), now.contacts());
    compareClasses(found, stored.classes(), now.classes());
    compareStores(found, stored.stores(), now.stores());
    compareFindings(found, stored.findings(), now.findings());
  }

  private static void compareContacts(
      List<Difference> found, List<ContactOutcome> stored, List<ContactOutcome> now) {
    Map<String, ContactOutcome> before = new TreeMap<>();
    stored.forEach(each -> before.put(each.contact(), each));
    Map<String, ContactOutcome> after = new TreeMap<>();
    now.forEach(each -> after.put(each.contact(), each));
    TreeSet<String> ids = new TreeSet<>(before.keySet());
    ids.addAll(after.keySet());
    for (String id : ids) {
      String what = "contact " + id;
      ContactOutcome was = before.get(id);
      ContactOutcome is = after.get(id);
      if (was == null || is == null) {
        add(found, what, was == null ? "absent" : "present", is == null ? "absent" : "present");
        continue;
      }
      add(found, what + " on board", was.onboard(), is.onboard());
      add(found, what + " capacity in bit", was.capacity().bits(), is.capacity().bits());
      add(found, what + " delivered bit", was.delivered().bits(), is.delivered().bits());
      if (was.longestLatencySeconds().isPresent()) {
        addLatency(found, what, was.longestLatencySeconds(), is.longestLatencySeconds());
      }
    }
  }

  private static void compareClasses(
      List<Difference> found, List<ClassOutcome> stored, List<ClassOutcome> now) {
    add(found, "number of data classes", stored.size(), now.size());
    for (int i = 0; i < Math.min(stored.size(), now.size()); i++) {
      ClassOutcome was = stored.get(i);
      ClassOutcome is = now.get(i);
      String what = "class " + was.dataClass();
      add(found, what, was.dataClass(), is.dataClass());
      add(found, what + " delivered bit", was.deliveredBits(), is.deliveredBits());
      add(found, what + " late bit", was.lateBits(), is.lateBits());
      add(found, what + " lost bit", was.lostBits(), is.lostBits());
      addLatency(found, what, was.longestLatencySeconds(), is.longestLatencySeconds());
    }
  }

  private static void compareStores(
      List<Difference> found, List<StoreTrace> stored, List<StoreTrace> now) {
    add(found, "number of stores", stored.size(), now.size());
    for (int i = 0; i < Math.min(stored.size(), now.size()); i++) {
      StoreTrace was = stored.get(i);
      StoreTrace is = now.get(i);
      String what = "store of " + was.craft();
      add(found, what, was.craft(), is.craft());
      add(found, what + ", bit at start", was.startBits(), is.startBits());
      add(found, what + ", bit generated", was.generatedBits(), is.generatedBits());
      add(found, what + ", bit received", was.receivedBits(), is.receivedBits());
      add(found, what + ", bit forwarded", was.forwardedBits(), is.forwardedBits());
      add(found, what + ", bit downlinked", was.downlinkedBits(), is.downlinkedBits());
      add(found, what + ", bit lost", was.lostBits(), is.lostBits());
      add(found, what + ", bit at end", was.endBits(), is.endBits());
      add(found, what + ", highest bit", was.highestBits(), is.highestBits());
      comparePoints(found, what, was.points(), is.points());
    }
  }

  /** Only instants at which both have a point, and only the first that differs. */
  private static void comparePoints(
      List<Difference> found, String what, List<StorePoint> stored, List<StorePoint> now) {
    Map<Long, StorePoint> recounted = new TreeMap<>();
    now.forEach(each -> recounted.put(each.onboardEpochSecond(), each));
    for (StorePoint was : stored) {
      StorePoint is = recounted.get(was.onboardEpochSecond());
      if (is != null && !is.equals(was)) {
        add(
            found,
            what + " at " + Instant.ofEpochSecond(was.onboardEpochSecond()),
            was.bitsByClass(),
            is.bitsByClass());
        return;
      }
    }
  }

  /** Findings by rule and by whom they concern; words and fractions of amounts do not matter. */
  private static void compareFindings(
      List<Difference> found, List<Finding> stored, List<Finding> now) {
    Map<String, Integer> before = counted(stored);
    Map<String, Integer> after = counted(now);
    TreeSet<String> names = new TreeSet<>(before.keySet());
    names.addAll(after.keySet());
    for (String name : names) {
      add(
          found,
          "number of findings " + name,
          before.getOrDefault(name, 0),
          after.getOrDefault(name, 0));
    }
  }

  private static Map<String, Integer> counted(List<Finding> findings) {
    Map<String, Integer> counts = new TreeMap<>();
    for (Finding each : findings) {
      String name =
          String.join(
                  " ", List.of(each.rule().name(), each.craft(), each.station(), each.subject()))
              .strip()
              .replaceAll(" +", " ");
      counts.merge(name, 1, Integer::sum);
    }
    return counts;
  }

  /** The bound itself is the planner's; here only that the plan does not surpass it. */
  private static void compareBound(List<Difference> found, Bound bound, Outcome now) {
    bound
        .scienceSeconds()
        .filter(most -> now.findings().isEmpty() && now.scienceSeconds() > most)
        .ifPresent(most -> add(found, "science bound in seconds", most, now.scienceSeconds()));
  }

  private static void addLatency(
      List<Difference> found, String what, OptionalDouble stored, OptionalDouble now) {
    boolean same =
        stored.isPresent() == now.isPresent() && Math.abs(stored.orElse(0) - now.orElse(0)) <= SAME;
    if (!same) {
      add(found, what + " longest latency in seconds", words(stored), words(now));
    }
  }

  private static String words(OptionalDouble value) {
    return value.isPresent() ? Findings.number(value.getAsDouble()) : "none";
  }

  private static void addNumber(List<Difference> found, String what, double stored, double now) {
    if (Math.abs(stored - now) > SAME) {
      add(
          found,
          what,
          String.format(Locale.ROOT, "%.3f", stored),
          String.format(Locale.ROOT, "%.3f", now));
    }
  }

  private static void add(List<Difference> found, String what, Object stored, Object now) {
    add(found, Kind.DERIVED, what, stored, now);
  }

  private static void add(
      List<Difference> found, Kind kind, String what, Object stored, Object now) {
    if (!stored.equals(now)) {
      found.add(new Difference(kind, what, stored.toString(), now.toString()));
    }
  }
}
