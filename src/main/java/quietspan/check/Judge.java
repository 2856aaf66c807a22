package quietspan.check;

import java.util.List;
import quietspan.model.Finding;

/** Judges one rule. */
@FunctionalInterface
interface Judge {
  List<Finding> findings(Evidence evidence);
}
