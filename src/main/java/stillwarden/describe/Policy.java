package stillwarden.describe;

import java.time.Duration;
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
  public record Waiver(String limit, String who, String why, String until) {}

  public boolean permits(String what) {
    return permits.getOrDefault(what, false);
  }
}
