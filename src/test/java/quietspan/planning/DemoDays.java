package quietspan.planning;

import java.nio.file.Path;
import java.util.Collection;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicBoolean;
import quietspan.astro.GeometryFactory;
import quietspan.input.ScenarioReader;
import quietspan.model.Geometry;
import quietspan.model.Scenario;
import quietspan.model.Waiver;
import quietspan.rules.Waivers;

/** The demo in the planner's numbers, with its first plan before and after trimming. */
final class DemoDays {

  private static DemoDays made;

  final Scenario scenario;
  final Geometry geometry;
  final List<Waiver> waivers;
  final Tables tables;
  final Links links;
  final Collection<Use> fixed;

  private final Roster full;
  private final Roster trimmed;

  private DemoDays() {
    Path folder = Path.of("stations-demo");
    scenario = ScenarioReader.read(folder, Optional.empty()).scenario();
    geometry = GeometryFactory.geometry(scenario, folder, Optional.empty());
    waivers = Waivers.of(scenario, geometry);
    Planner planner =
        Planner.of(
            scenario, geometry, waivers, Planner.Options.DEFAULT, what -> {}, new AtomicBoolean());
    tables = planner.tables();
    links = planner.links();
    Seed seed = planner.seed();
    full = seed.roster();
    trimmed = full.under(Seed.FIRST_GUARD);
    new Trimmer(trimmed, seed.fixed()).trim();
    fixed = seed.fixed();
  }

  /** Made once. */
  static synchronized DemoDays get() {
    if (made == null) {
      made = new DemoDays();
    }
    return made;
  }

  /** A copy of the first plan with every contact that fits. */
  Roster full() {
    return full.under(Seed.FIRST_GUARD);
  }

  /** A copy of the first plan with as few contacts as the trimmer leaves. */
  Roster trimmed() {
    return trimmed.under(Seed.FIRST_GUARD);
  }
}
