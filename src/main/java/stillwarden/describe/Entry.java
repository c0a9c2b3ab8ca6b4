package stillwarden.describe;

import java.time.Instant;
import java.time.OffsetDateTime;
import java.util.Optional;

/**
 * One line of a run log: something seen or something done.
 *
 * @param line number in the file, from 1
 * @param who {@code by} or {@code from}
 * @param instrument true for {@code from}
 * @param verb {@code saw} or {@code did}
 * @param id the observation or the deed
 * @param part the part named, or empty
 * @param text the value's word ({@code yes} when none was written; {@code not-sure} is unknown), or the quantity as
 *     written; for a spill the word of {@code what}, where it says what was spilt
 * @param reach for injuries: is the switch in reach; empty when not said
 */
public record Entry(
    int line,
    OffsetDateTime when,
    String who,
    boolean instrument,
    Verb verb,
    String id,
    String part,
    String text,
    Optional<Quantity> measured,
    Optional<String> entryId,
    Optional<String> corrects,
    Optional<String> reach) {

  /** What a log line reports. */
  public enum Verb {
    SAW,
    DID
  }

  public Instant at() {
    return when.toInstant();
  }
}
