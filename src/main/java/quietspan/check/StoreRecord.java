package quietspan.check;

import java.util.List;
import quietspan.model.ClassOutcome;
import quietspan.model.ContactOutcome;
import quietspan.model.StoreTrace;

/**
 * What the store loops saw.
 *
 * @param overflows stretches with loss; amounts in bits
 * @param overfills stretches above the planned fill; amounts in bit seconds
 * @param late late deliveries
 * @param lateAboard by data class: bits aboard at the end that are older than their limit
 */
record StoreRecord(
    List<StoreTrace> traces,
    List<ContactOutcome> contacts,
    List<ClassOutcome> classes,
    List<Excess> overflows,
    List<Excess> overfills,
    List<LateBook.Run> late,
    List<Long> lateAboard) {}
