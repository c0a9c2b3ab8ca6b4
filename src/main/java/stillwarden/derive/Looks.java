package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Entry;
import stillwarden.describe.Observation;
import stillwarden.describe.Vocabulary;

/** How old each look is. A look is fresh up to and including its shelf life; past twice that it counts as never made. */
final class Looks {
  static final String NOT_SURE = "not-sure";

  /** Age of a look against its shelf life. */
  enum Age {
    FRESH,
    /** past its shelf life, not past twice */
    STALE,
    /** past twice its shelf life, or somebody looked and was not sure, or nobody ever looked */
    OVERDUE
  }

  /**
   * @param entry the last look, or empty where only the rig file, or nothing, speaks
   * @param from when the age began to count: the look, or when it first could be otherwise
   */
  record Look(Optional<Entry> entry, Age age, Instant from) {
    boolean fresh() {
      return age == Age.FRESH;
    }

    Optional<String> word() {
      return entry.map(Entry::text).filter(t -> !t.equals(NOT_SURE));
    }
  }

  private final RunState run;

  Looks(RunState run) {
    this.run = run;
  }

  /**
   * @param first when the rig file's own statement was last looked at (heat-on), or null when it states nothing
   * @param clock before this moment the thing could not change by itself, so its age starts there; may be null
   */
  Look at(String id, Duration shelf, Instant first, Instant clock) {
    Optional<Entry> last = worstOfLast(id);
    if (last.filter(e -> e.text().equals(NOT_SURE)).isPresent()) {
      return new Look(last, Age.OVERDUE, last.get().at());
    }
    Instant from = last.map(Entry::at).orElse(first);
    if (from == null) {
      return new Look(last, Age.OVERDUE, null);
    }
    Instant start = clock != null && clock.isAfter(from) ? clock : from;
    return new Look(last, age(Duration.between(start, run.at()), shelf), start);
  }

  private static Age age(Duration age, Duration shelf) {
    if (age.compareTo(shelf) <= 0) {
      return Age.FRESH;
    }
    return age.compareTo(shelf.multipliedBy(2)) <= 0 ? Age.STALE : Age.OVERDUE;
  }

  /** Of several looks at one moment the worse counts. */
  Optional<Entry> worstOfLast(String id) {
    List<Entry> all = run.saw(id);
    if (all.isEmpty()) {
      return Optional.empty();
    }
    Entry worst = all.get(all.size() - 1);
    for (Entry e : all) {
      if (e.at().equals(worst.at()) && badness(e) > badness(worst)) {
        worst = e;
      }
    }
    return Optional.of(worst);
  }

  private static int badness(Entry e) {
    if (e.text().equals(NOT_SURE)) {
      // worse than calm, but one person's doubt does not undo what another has seen
      return 1;
    }
    List<String> values = Vocabulary.get().observation(e.id()).map(Observation::key).map(k -> k.values()).orElse(List.of());
    return 2 * values.indexOf(e.text());
  }
}
