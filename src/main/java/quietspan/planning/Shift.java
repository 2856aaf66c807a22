package quietspan.planning;

import java.util.ArrayList;
import java.util.List;
import org.optaplanner.core.api.score.director.ScoreDirector;
import org.optaplanner.core.impl.heuristic.move.AbstractMove;

/** Slots that take other values together. */
final class Shift extends AbstractMove<Polishing> {

  private static final String USE = "use";
  private static final String MOVE = "move";

  /** A contact slot and what it takes; null for nothing. */
  record Contact(ContactSlot slot, Use use) {}

  /** A repoint slot and what it takes; null for nothing. */
  record Turn(RepointSlot slot, Move move) {}

  private final List<Turn> turns;
  private final List<Contact> contacts;

  Shift(List<Turn> turns, List<Contact> contacts) {
    this.turns = List.copyOf(turns);
    this.contacts = List.copyOf(contacts);
  }

  @Override
  public boolean isMoveDoable(ScoreDirector<Polishing> director) {
    return !turns.isEmpty() || !contacts.isEmpty();
  }

  @Override
  protected Shift createUndoMove(ScoreDirector<Polishing> director) {
    List<Turn> turnsBack = new ArrayList<>();
    turns.forEach(turn -> turnsBack.add(0, new Turn(turn.slot(), turn.slot().move())));
    List<Contact> contactsBack = new ArrayList<>();
    contacts.forEach(one -> contactsBack.add(0, new Contact(one.slot(), one.slot().use())));
    return new Shift(turnsBack, contactsBack);
  }

  @Override
  protected void doMoveOnGenuineVariables(ScoreDirector<Polishing> director) {
    for (Turn turn : turns) {
      director.beforeVariableChanged(turn.slot(), MOVE);
      turn.slot().move(turn.move());
      director.afterVariableChanged(turn.slot(), MOVE);
    }
    for (Contact contact : contacts) {
      director.beforeVariableChanged(contact.slot(), USE);
      contact.slot().use(contact.use());
      director.afterVariableChanged(contact.slot(), USE);
    }
  }

  @Override
  public Shift rebase(ScoreDirector<Polishing> other) {
    return new Shift(
        turns.stream()
            .map(turn -> new Turn(other.lookUpWorkingObject(turn.slot()), turn.move()))
            .toList(),
        contacts.stream()
            .map(one -> new Contact(other.lookUpWorkingObject(one.slot()), one.use()))
            .toList());
  }

  @Override
  public String toString() {
    return turns + " " + contacts;
  }
}
