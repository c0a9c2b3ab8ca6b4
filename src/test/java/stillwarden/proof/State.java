package stillwarden.proof;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import stillwarden.derive.Sign;
import stillwarden.derive.Standing;

/** One abstract state of rig and run: each word seen or counted with one value, possible in all, or not reported. */
final class State {
  /** @param value null where every value of the domain is possible */
  record Known(String value, Standing standing) {}

  final Map<String, Known> known = new TreeMap<>();
  private final Map<String, List<String>> domains;

  State(Map<String, List<String>> domains) {
    this.domains = domains;
  }

  State copy() {
    State out = new State(domains);
    out.known.putAll(known);
    return out;
  }

  void seen(String about, String value) {
    known.put(about, new Known(value, Standing.SEEN));
  }

  void counted(String about, String value) {
    known.put(about, new Known(value, Standing.COUNTED));
  }

  void possible(String about) {
    known.put(about, new Known(null, Standing.POSSIBLE));
  }

  void absent(String about) {
    known.remove(about);
  }

  /** Seen or counted with one of these values. */
  boolean is(String about, String... values) {
    Known k = known.get(about);
    return k != null && k.value() != null && Set.of(values).contains(k.value());
  }

  boolean seenAs(String about, String... values) {
    return is(about, values) && known.get(about).standing() == Standing.SEEN;
  }

  String value(String about) {
    Known k = known.get(about);
    return k == null || k.value() == null ? "" : k.value();
  }

  boolean live() {
    return is("live", "yes");
  }

  List<Sign> signs() {
    List<Sign> out = new ArrayList<>();
    known.forEach((about, k) -> {
      String part = about.startsWith("joint-") || about.equals("clip-soft") ? "j" : about.equals("glass-cracked") ? "flask" : "";
      List<String> values = k.value() == null ? domains.get(about) : List.of(k.value());
      values.forEach(v -> out.add(new Sign(about, part, v, k.standing(), about, null, List.of(about))));
    });
    return out;
  }

  /** What is not calm, for a report. */
  String odd() {
    StringBuilder out = new StringBuilder();
    known.forEach((about, k) -> {
      if (k.value() == null || !k.value().equals(domains.get(about).get(0)) || k.standing() != Standing.SEEN) {
        out.append(out.isEmpty() ? "" : ", ").append(about).append('=').append(k.value() == null ? "?" : k.value()).append(k.standing() == Standing.COUNTED ? " (counted)" : "");
      }
    });
    return out.toString();
  }
}
