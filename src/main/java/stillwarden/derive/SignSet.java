package stillwarden.derive;

import java.time.Instant;
import java.util.ArrayList;
import java.util.Collection;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import stillwarden.describe.Knowledge;

/** Collects signs. One place decides what an unknown becomes: several POSSIBLE signs, or the counted worst one. */
final class SignSet {
  private static final Map<String, List<String>> DOMAINS = new ConcurrentHashMap<>();

  private final List<Sign> signs = new ArrayList<>();
  private final boolean live;

  /** @param live while energy is in: only then is a worst value counted, before heat it is asked for */
  SignSet(boolean live) {
    this.live = live;
  }

  /** What was made so far; grows with it. */
  List<Sign> all() {
    return Collections.unmodifiableList(signs);
  }

  void addAll(List<Sign> more) {
    signs.addAll(more);
  }

  /** The values of a derived sign, from calm to worst. */
  static List<String> domain(String about) {
    return DOMAINS.computeIfAbsent(about, a -> {
      List<String> values = Knowledge.section("words").get("signs").get(a).words("values");
      if (values.isEmpty()) {
        throw new IllegalArgumentException("no sign `" + a + "` in rules/words/signs.yaml");
      }
      return values;
    });
  }

  void seen(String about, String value, String evidence) {
    seen(about, "", value, evidence, null, about);
  }

  void seen(String about, String value, String evidence, Instant since) {
    seen(about, "", value, evidence, since, about);
  }

  void seen(String about, String part, String value, String evidence, Instant since, String... looks) {
    signs.add(new Sign(about, part, value, Standing.SEEN, evidence, since, List.of(looks)));
  }

  void seenIf(boolean holds, String about, String evidence) {
    seen(about, holds ? "yes" : "no", evidence);
  }

  /** Unknown, and nothing counts as worst: it stands in every value it could have. */
  void possible(String about, String part, Collection<String> values, String evidence, Collection<String> looks) {
    for (String v : values) {
      signs.add(new Sign(about, part, v, Standing.POSSIBLE, evidence, null, List.copyOf(looks)));
    }
  }

  void possible(String about, String evidence, String... looks) {
    possible(about, "", domain(about), evidence, List.of(looks));
  }

  /** Unknown: the worst credible value counts while energy is in; before heat it is asked for. */
  void unknown(String about, String part, String worst, String evidence, Collection<String> looks) {
    if (live) {
      signs.add(new Sign(about, part, worst, Standing.COUNTED, evidence + ", counts as " + worst, null, List.copyOf(looks)));
    } else {
      possible(about, part, domain(about), evidence, looks);
    }
  }

  void unknown(String about, String worst, String evidence, String... looks) {
    unknown(about, "", worst, evidence, List.of(looks));
  }

  /** Too old or unseen in a run: counted as worst whatever the stage. */
  void counted(String about, String value, String evidence, String... looks) {
    signs.add(new Sign(about, "", value, Standing.COUNTED, evidence, null, List.of(looks)));
  }
}
