package stillwarden.describe;

import java.time.Duration;
import java.time.Instant;
import java.time.LocalDate;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The site's own limits and duties. {@link #NONE} is a site without a policy: the defaults of {@code rules/limits} hold.
 *
 * @param limits by key, SI values
 * @param words limit keys that take a word ({@code dichloromethane: forbidden})
 * @param permits practice left to the site; absent means no
 * @param coolant {@code before-heat, tempered, held-off} or absent
 */
public record Policy(
    String file,
    String site,
    Map<String, String> contacts,
    Map<String, Double> limits,
    Map<String, String> words,
    Map<String, Boolean> permits,
    Optional<String> coolant,
    Map<String, Duration> shelfLife,
    List<Waiver> waivers,
    String digest) {

  public static final Policy NONE =
      new Policy("", "", Map.of(), Map.of(), Map.of(), Map.of(), Optional.empty(), Map.of(), List.of(), "");

  /** A named, dated loosening of one limit. */
  public record Waiver(String limit, String who, String why, String until) {
    /** {@code until} is an instant, or a day that counts to its end in UTC. */
    boolean holds(Instant at) {
      Instant end = until.contains("T")
          ? OffsetDateTime.parse(until).toInstant()
          : LocalDate.parse(until).plusDays(1).atStartOfDay(ZoneOffset.UTC).toInstant().minusNanos(1);
      return !at.isAfter(end);
    }
  }

  /** The waivers that are over at an instant; all of them when no instant is known, for then nothing dated is in force. */
  public List<Waiver> expired(Optional<Instant> at) {
    return waivers.stream().filter(w -> at.isEmpty() || !w.holds(at.get())).toList();
  }

  /** The policy at an instant: limits that only an expired waiver loosened are gone, so that the defaults hold again. */
  public Policy asOf(Optional<Instant> at) {
    List<Waiver> over = expired(at);
    List<Waiver> held = waivers.stream().filter(w -> !over.contains(w)).toList();
    Map<String, Double> left = new LinkedHashMap<>(limits);
    over.stream()
        .map(Waiver::limit)
        .filter(l -> limits.containsKey(l) && held.stream().noneMatch(w -> w.limit().equals(l)))
        .filter(l -> SiteLimits.all().get(l).looser(limits.get(l)))
        .forEach(left::remove);
    return new Policy(file, site, contacts, left, words, permits, coolant, shelfLife, held, digest);
  }

  public boolean permits(String what) {
    return permits.getOrDefault(what, false);
  }
}
