package stillwarden.derive.physics;

import java.util.LinkedHashMap;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;

/** The substance table, by file name, full name or another name in use; hyphens, commas, case and spaces do not matter. */
public final class Substances {
  private static final Map<String, Substance> BY_NAME = load();

  private Substances() {}

  public static Optional<Substance> find(String name) {
    return Optional.ofNullable(BY_NAME.get(plain(name)));
  }

  /** Every substance once, in the order of their file names. */
  public static Map<String, Substance> all() {
    Map<String, Substance> out = new LinkedHashMap<>();
    BY_NAME.values().stream().sorted(java.util.Comparator.comparing(Substance::id)).forEach(s -> out.put(s.id(), s));
    return out;
  }

  private static Map<String, Substance> load() {
    Map<String, Substance> out = new LinkedHashMap<>();
    for (Map.Entry<String, Tree> e : Knowledge.section("substances").fields().entrySet()) {
      Substance s = Substance.read(e.getKey(), e.getValue());
      out.put(plain(e.getKey()), s);
      out.putIfAbsent(plain(s.name()), s);
      e.getValue().words("also").forEach(a -> out.putIfAbsent(plain(a), s));
    }
    return out;
  }

  private static String plain(String name) {
    return name.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]", "");
  }
}
