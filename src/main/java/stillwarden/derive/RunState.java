package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import stillwarden.describe.Entry;

/**
 * What the log says up to one moment: usable lines in order of time, corrections applied, instruments' readings
 * only once they have stood for the hold time. Immutable; history is kept, nothing is averaged.
 */
public final class RunState {
  /** By time; at one moment deeds before looks, and of one thing the worse last, so that the order of lines says nothing. */
  public static final Comparator<Entry> ORDER = Comparator.comparing(Entry::at).thenComparing(Entry::verb, Comparator.reverseOrder())
      .thenComparing(Entry::id).thenComparing(Entry::part).thenComparingDouble(Badness::of).thenComparing(Entry::text).thenComparing(Entry::who)
      .thenComparing(Entry::line);

  private final List<Entry> entries;
  private final Instant at;
  private final ZoneOffset offset;
  private final Map<String, List<Entry>> saw = new HashMap<>();
  private final Map<String, List<Entry>> did = new HashMap<>();

  private RunState(List<Entry> entries, Instant at, ZoneOffset offset) {
    this.entries = entries;
    this.at = at;
    this.offset = offset;
    for (Entry e : entries) {
      (e.verb() == Entry.Verb.SAW ? saw : did).computeIfAbsent(e.id(), k -> new ArrayList<>()).add(e);
    }
  }

  /** A rig that nobody has started: no lines. */
  public static RunState none(Instant at, ZoneOffset offset) {
    return new RunState(List.of(), at, offset);
  }

  /**
   * @param lines usable lines in file order
   * @param hold how long an instrument's changed value must have stood before it counts
   */
  public static RunState of(List<Entry> lines, Instant at, Duration hold) {
    Set<String> replaced = new HashSet<>();
    for (Entry e : lines) {
      if (!e.at().isAfter(at)) {
        e.corrects().ifPresent(replaced::add);
      }
    }
    List<Entry> kept = new ArrayList<>();
    for (Entry e : lines) {
      if (!e.at().isAfter(at) && e.entryId().filter(replaced::contains).isEmpty()) {
        kept.add(e);
      }
    }
    kept.sort(ORDER);
    ZoneOffset offset = kept.isEmpty() ? ZoneOffset.UTC : kept.get(kept.size() - 1).when().getOffset();
    return new RunState(standing(held(kept, at, hold)), at, offset);
  }

  /** Somebody not being sure never clears an alarm that a look raised: it stands until the thing is seen otherwise. */
  private static List<Entry> standing(List<Entry> sorted) {
    Map<String, Entry> last = new HashMap<>();
    List<Entry> out = new ArrayList<>();
    for (Entry e : sorted) {
      String thing = e.id() + " " + e.part();
      boolean unsure = e.text().equals(Looks.NOT_SURE);
      if (!unsure || last.get(thing) == null || !Badness.alarming(last.get(thing))) {
        out.add(e);
      }
      if (!unsure) {
        last.put(thing, e);
      }
    }
    return List.copyOf(out);
  }

  /**
   * A first word from an instrument counts once it, or a later word like it, has stood for the hold time; numbers
   * count as they come, since what is drawn from them (head high, head fell) has its own hold.
   */
  private static List<Entry> held(List<Entry> sorted, Instant at, Duration hold) {
    List<Entry> out = new ArrayList<>();
    for (int i = 0; i < sorted.size(); i++) {
      Entry e = sorted.get(i);
      if (!e.instrument() || e.measured().isPresent() || stood(sorted, i, at, hold)) {
        out.add(e);
      }
    }
    return List.copyOf(out);
  }

  private static boolean stood(List<Entry> sorted, int i, Instant at, Duration hold) {
    Entry e = sorted.get(i);
    Instant from = e.at();
    for (int j = i - 1; j >= 0; j--) {
      Entry before = sorted.get(j);
      if (same(before, e)) {
        if (!before.text().equals(e.text())) {
          break;
        }
        from = before.at();
      }
    }
    Instant until = at;
    for (int j = i + 1; j < sorted.size(); j++) {
      Entry after = sorted.get(j);
      if (same(after, e) && !after.text().equals(e.text())) {
        until = after.at();
        break;
      }
    }
    return !until.isBefore(from.plus(hold));
  }

  private static boolean same(Entry a, Entry b) {
    return a.instrument() && a.verb() == b.verb() && a.id().equals(b.id()) && a.part().equals(b.part()) && a.who().equals(b.who());
  }

  public Instant at() {
    return at;
  }

  public ZoneOffset offset() {
    return offset;
  }

  /** All lines that count, oldest first. */
  public List<Entry> entries() {
    return entries;
  }

  public List<Entry> saw(String id) {
    return saw.getOrDefault(id, List.of());
  }

  public List<Entry> did(String id) {
    return did.getOrDefault(id, List.of());
  }

  public Optional<Entry> lastSaw(String id) {
    List<Entry> l = saw(id);
    return l.isEmpty() ? Optional.empty() : Optional.of(l.get(l.size() - 1));
  }

  /** The last of several deeds. */
  public Optional<Entry> lastDid(String... ids) {
    Entry best = null;
    for (String id : ids) {
      for (Entry e : did(id)) {
        if (best == null || !e.at().isBefore(best.at())) {
          best = e;
        }
      }
    }
    return Optional.ofNullable(best);
  }

  /** Was any of the deeds logged at or after a moment? */
  public boolean didSince(Instant from, String... ids) {
    return lastDid(ids).filter(e -> !e.at().isBefore(from)).isPresent();
  }

  public boolean sawValue(String id, String... values) {
    return lastSaw(id).filter(e -> List.of(values).contains(e.text())).isPresent();
  }

  public Duration age(Entry e) {
    return Duration.between(e.at(), at);
  }
}
