package quietspan.planning;

import java.util.ArrayList;
import java.util.List;
import quietspan.model.Aim;

/** Turns a solution of the programme into repoints with aims. */
final class Skeleton {

  private final Tables tables;
  private final Cells cells;

  Skeleton(Tables tables, Cells cells) {
    this.tables = tables;
    this.cells = cells;
  }

  List<Move> moves(Programme.Solution solution) {
    List<Move> moves = new ArrayList<>();
    for (int c = 0; c < tables.craftCount; c++) {
      int craft = c;
      List<Programme.PauseStep> mine =
          solution.pauses().stream()
              .filter(pause -> (pause.movedMask() >> craft & 1) != 0)
              .toList();
      for (int i = 0; i < mine.size(); i++) {
        int from = mine.get(i).start() + tables.repoint[c];
        int until = i + 1 < mine.size() ? mine.get(i + 1).start() : tables.length;
        int opening = opening(solution, c, mine.get(i).cell(), from, until);
        if (opening >= 0) {
          moves.add(new Move(c, mine.get(i).start(), aim(solution, c, opening, from, until)));
        }
      }
    }
    return moves;
  }

  private int opening(Programme.Solution solution, int craft, int pauseCell, int from, int until) {
    for (Programme.Opening opening : solution.openings()) {
      if (opening.craft() == craft
          && opening.cell() > pauseCell
          && cells.begin(opening.cell()) < until
          && cells.end(opening.cell()) > from) {
        return opening.cell();
      }
    }
    return -1;
  }

  /** Holds what is needed between its opening and the next one in the middle of the beam. */
  private Aim aim(Programme.Solution solution, int craft, int opening, int from, int until) {
    int begin = Math.max(from, cells.begin(opening));
    int exit = Math.min(until, cells.end(Math.min(cells.exit(craft, opening), cells.count() - 1)));
    int needed = exit;
    for (Programme.Opening next : solution.openings()) {
      if (next.cell() > opening && cells.end(next.cell()) > begin) {
        needed = Math.min(needed, cells.end(next.cell()));
        break;
      }
    }
    int middle = begin + (Math.max(needed, begin + 3600) - begin) / 2;
    return Aiming.at(tables, craft, middle);
  }
}
