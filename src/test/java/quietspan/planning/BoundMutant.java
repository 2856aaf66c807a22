package quietspan.planning;

import java.util.List;
import java.util.Set;
import quietspan.model.ContactRules;
import quietspan.model.Geometry;
import quietspan.model.Rules;
import quietspan.model.Scenario;
import quietspan.model.Waiver;

/**
 * Bounds that are wrong on purpose, each by one thing that a bound is easily wrong in: every one of
 * them claims less science, or more pauses, than some legal plan has.
 */
enum BoundMutant {
  NONE,
  /** The Earth is never let out of the beams for longer than a night. */
  COVERAGE_GAP_FORBIDDEN,
  /** No aim serves for longer than a day: a cap, here one that a tiny world can meet. */
  HOLDS_CAPPED,
  ONE_LINK_ONLY,
  BEAMS_NOT_WIDENED,
  RATE_NOT_WIDENED,
  /** A new aim begins a cell late. */
  ROUNDED_UP,
  WAIVERS_IGNORED,
  LONGEST_PAUSE_CHARGED,
  NO_DRAIN_IN_PAUSES,
  GENERATION_KEPT_IN_PAUSES,
  /** One beam at a time, until it has lost the Earth. */
  EACH_CRAFT_ONCE_IN_SEQUENCE,
  /** Windows as the planner is offered them, a second inside the passes. */
  GUARDED_WINDOWS;

  BoundSearch search(TinyWorld world, long work) {
    Scenario scenario = world.scenario();
    Set<Relaxation> relaxed =
        switch (this) {
          case BEAMS_NOT_WIDENED -> Relaxation.allBut(Relaxation.BEAM_CELLS);
          case RATE_NOT_WIDENED -> Relaxation.allBut(Relaxation.BEST_RATE);
          default -> Relaxation.all();
        };
    if (this == ONE_LINK_ONLY) {
      scenario = withOneLink(scenario);
    }
    List<Waiver> waivers = this == WAIVERS_IGNORED ? List.of() : world.waivers();
    Geometry geometry = world.geometry();
    if (this == GUARDED_WINDOWS) {
      geometry = new Geometry(geometry.sightLines(), geometry.passes(), 0, geometry.sources());
    }
    Tables tables = Tables.of(scenario, geometry);
    Links links = Links.of(tables, world.opportunities());
    return new BoundSearch(tables, links, waivers, relaxed, work) {
      @Override
      Cells cells(int cellLength) {
        return mutated(tables, links(), waivers, relaxed, cellLength);
      }
    };
  }

  private Cells mutated(
      Tables tables, Links links, List<Waiver> waivers, Set<Relaxation> relaxed, int cellLength) {
    return switch (this) {
      case COVERAGE_GAP_FORBIDDEN ->
          new Honest(tables, links, waivers, relaxed, cellLength) {
            @Override
            int gapLimit(int cell) {
              return Math.min(super.gapLimit(cell), 20 * 3600);
            }

            @Override
            boolean watchesGaps() {
              return true;
            }
          };
      case HOLDS_CAPPED ->
          new Honest(tables, links, waivers, relaxed, cellLength) {
            @Override
            boolean serves(int craft, int opened, int cell) {
              return cell - opened <= 86_400 / cellLength && super.serves(craft, opened, cell);
            }
          };
      case ROUNDED_UP ->
          new Honest(tables, links, waivers, relaxed, cellLength) {
            @Override
            int availableAfterMove(int craft, int cell, int pauseStart) {
              return super.availableAfterMove(craft, cell, pauseStart) + 1;
            }
          };
      case LONGEST_PAUSE_CHARGED ->
          new Honest(tables, links, waivers, relaxed, cellLength) {
            @Override
            int levelLength(int pauseLevel) {
              return longestRepoint();
            }

            @Override
            PauseOption pause(int cell, int pauseLevel) {
              return super.pause(cell, levels() - 1);
            }
          };
      case NO_DRAIN_IN_PAUSES ->
          new Honest(tables, links, waivers, relaxed, cellLength) {
            @Override
            long capacityBeforePause(long whole, int cell, int pauseStart) {
              return 0;
            }
          };
      case GENERATION_KEPT_IN_PAUSES ->
          new Honest(tables, links, waivers, relaxed, cellLength) {
            @Override
            long generated(int prefix, int cell, boolean inPause) {
              return super.generated(prefix, cell, false);
            }
          };
      case EACH_CRAFT_ONCE_IN_SEQUENCE ->
          new Honest(tables, links, waivers, relaxed, cellLength) {
            @Override
            long setCapacity(int mask, int cell) {
              return Integer.bitCount(mask) > 1 ? 0 : super.setCapacity(mask, cell);
            }
          };
      default -> new Honest(tables, links, waivers, relaxed, cellLength);
    };
  }

  private static class Honest extends Cells {
    Honest(
        Tables tables, Links links, List<Waiver> waivers, Set<Relaxation> relaxed, int cellLength) {
      super(tables, links, waivers, relaxed, Shade.NONE, cellLength);
    }
  }

  private static Scenario withOneLink(Scenario scenario) {
    Rules rules = scenario.rules();
    ContactRules contacts = rules.contacts();
    ContactRules one =
        new ContactRules(
            contacts.lockUp(),
            contacts.rateSteps(),
            contacts.relock(),
            1,
            contacts.craftSwitch(),
            contacts.overheadShare());
    return new Scenario(
        scenario.identity(),
        scenario.period(),
        scenario.craft(),
        scenario.stations(),
        new Rules(
            rules.science(), one, rules.data(), rules.margins(), rules.link(), rules.classes()),
        scenario.calendars(),
        scenario.start());
  }
}
