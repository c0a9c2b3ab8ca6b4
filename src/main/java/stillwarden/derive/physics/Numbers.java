package stillwarden.derive.physics;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import stillwarden.derive.Estimate;

/**
 * Everything computed for one rig at one moment.
 *
 * @param all by name, every name of {@link #UNITS} in its order; one that cannot be had is there with its reason
 * @param words the value of those that are a word: {@code coolant-strategy}
 */
public record Numbers(Map<String, Estimate> all, Map<String, String> words, SideFacts facts) {
  /** The closed list of names in the order in which they are shown, each with its UCUM unit. */
  public static final Map<String, String> UNITS = names();

  public Numbers {
    Map<String, Estimate> ordered = new LinkedHashMap<>();
    Map<String, Estimate> given = all;
    UNITS.forEach((name, unit) -> ordered.put(name, Optional.ofNullable(given.get(name))
        .orElseThrow(() -> new IllegalArgumentException("number `" + name + "` was left out"))));
    all = Collections.unmodifiableMap(ordered);
    words = Map.copyOf(words);
  }

  public Estimate get(String name) {
    Estimate e = all.get(name);
    if (e == null) {
      throw new IllegalArgumentException("no number `" + name + "`");
    }
    return e;
  }

  public List<Estimate> list() {
    return List.copyOf(all.values());
  }

  private static Map<String, String> names() {
    Map<String, String> m = new LinkedHashMap<>();
    String[] pairs = {
      "pressure-here", "kPa", "water-boiling-point-here", "Cel", "boiling-point-here", "Cel", "co-boiling-shift", "K",
      "mole-ratio-water-to-oil", "1", "mass-ratio-water-to-oil", "1", "oil-share-of-distillate", "%", "water-needed", "mL",
      "water-needed-ideal", "mL", "water-available", "mL", "feed-limit", "mL/min", "heat-up-time", "min", "boil-up-rate", "g/min",
      "drip-rate", "/min", "time-to-target", "min", "time-to-reservoir-end", "min", "time-to-minimum-level", "min",
      "time-to-dryness", "min", "time-to-full-receiver", "min", "flask-fill", "%", "condenser-duty", "W", "condenser-capacity", "W",
      "coolant-flow-least", "L/min", "coolant-outlet", "Cel", "coolant-strategy", "", "coolant-temperature", "Cel",
      "freezing-point-of-oil", "Cel", "crystals-possible-from", "min", "vent-pressure-drop", "Pa", "seal-back-pressure", "kPa",
      "closed-time-to-2-kPa", "s", "closed-time-to-5-kPa", "s", "closed-time-to-10-kPa", "s"
    };
    for (int i = 0; i < pairs.length; i += 2) {
      m.put(pairs[i], pairs[i + 1]);
    }
    return Collections.unmodifiableMap(m);
  }

  /** Collects estimates, turning SI into the unit of each name. */
  static final class Out {
    private static final Map<String, double[]> FROM_SI = Map.ofEntries(
        Map.entry("kPa", new double[] {1e-3, 0}), Map.entry("Pa", new double[] {1, 0}), Map.entry("Cel", new double[] {1, -273.15}),
        Map.entry("K", new double[] {1, 0}), Map.entry("1", new double[] {1, 0}), Map.entry("%", new double[] {100, 0}),
        Map.entry("mL", new double[] {1e6, 0}), Map.entry("mL/min", new double[] {6e7, 0}), Map.entry("min", new double[] {1 / 60.0, 0}),
        Map.entry("g/min", new double[] {6e4, 0}), Map.entry("/min", new double[] {60, 0}), Map.entry("W", new double[] {1, 0}),
        Map.entry("L/min", new double[] {6e4, 0}), Map.entry("s", new double[] {1, 0}), Map.entry("", new double[] {1, 0}));
    private final Map<String, Estimate> all = new LinkedHashMap<>();
    private final Map<String, String> words = new LinkedHashMap<>();
    private final RigParts parts;

    Out(RigParts parts) {
      this.parts = parts;
    }

    void put(String name, Band si, String method, String source, List<String> notes) {
      double[] f = FROM_SI.get(UNITS.get(name));
      all.put(name, Estimate.of(name, si.low() * f[0] + f[1], si.nominal() * f[0] + f[1], si.high() * f[0] + f[1], UNITS.get(name), method, source, notes));
    }

    void word(String name, String word, String source, List<String> reasons) {
      words.put(name, word);
      put(name, Band.of(0), word, source, reasons);
    }

    void absent(String name, String reason, String... missing) {
      List<String> paths = Stream.of(missing).map(p -> parts.path(p)).filter(p -> parts.rig().datum(p).isEmpty()).toList();
      all.put(name, Estimate.absent(name, UNITS.get(name), reason, paths));
    }

    Numbers with(SideFacts facts) {
      return new Numbers(all, words, facts);
    }
  }
}
