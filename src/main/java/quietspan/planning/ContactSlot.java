package quietspan.planning;

import java.util.List;
import org.optaplanner.core.api.domain.entity.PlanningEntity;
import org.optaplanner.core.api.domain.lookup.PlanningId;
import org.optaplanner.core.api.domain.variable.PlanningVariable;

/**
 * One pass of an antenna over the formation, with the use that is made of it or none. The craft
 * pass close together, so a slot may hear any of those that have a window in it. Public because the
 * solver asks for it.
 */
@PlanningEntity
public final class ContactSlot {

  @PlanningId private int id;

  /** Windows of this pass, by craft and begin; of one antenna. */
  private List<Links.Window> windows;

  @PlanningVariable(valueRangeProviderRefs = Polishing.USES, nullable = true)
  private Use use;

  /** For the solver's own clones. */
  public ContactSlot() {}

  ContactSlot(int id, List<Links.Window> windows, Use use) {
    this.id = id;
    this.windows = List.copyOf(windows);
    this.use = use;
  }

  int id() {
    return id;
  }

  List<Links.Window> windows() {
    return windows;
  }

  /** What is made of the pass; null for nothing. */
  Use use() {
    return use;
  }

  void use(Use next) {
    use = next;
  }
}
