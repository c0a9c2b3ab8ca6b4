package stillwarden.derive.physics;

import java.util.List;
import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Policy;
import stillwarden.describe.Tree;

/** The default bands and thresholds of {@code rules/limits}, in SI; a site's policy stands before a default. */
final class Limits {
  /** Factor to SI and offset, by the unit words that {@code rules/limits} and {@code rules/substances} use. */
  private static final Map<String, double[]> UNITS = Map.ofEntries(
      Map.entry("1", new double[] {1, 0}), Map.entry("s", new double[] {1, 0}), Map.entry("m", new double[] {1, 0}),
      Map.entry("m/s", new double[] {1, 0}), Map.entry("%", new double[] {0.01, 0}), Map.entry("K", new double[] {1, 0}),
      Map.entry("Cel", new double[] {1, 273.15}), Map.entry("kPa", new double[] {1e3, 0}), Map.entry("min", new double[] {60, 0}),
      Map.entry("mL", new double[] {1e-6, 0}), Map.entry("mm", new double[] {1e-3, 0}), Map.entry("g/mol", new double[] {1e-3, 0}),
      Map.entry("kJ/mol", new double[] {1e3, 0}), Map.entry("kg/m3", new double[] {1, 0}), Map.entry("g/L", new double[] {1, 0}),
      Map.entry("L/kg", new double[] {1e-3, 0}), Map.entry("J/(kg.K)", new double[] {1, 0}), Map.entry("W/(m2.K)", new double[] {1, 0}),
      Map.entry("Pa.s", new double[] {1, 0}));

  /** Read once: a moment of a run asks for some hundreds of them. */
  private static final Map<String, Band> READ = new ConcurrentHashMap<>();

  private Limits() {}

  /** The band under a key of {@code rules/limits}. */
  static Band band(String key) {
    Band read = READ.get(key);
    return read != null ? read : READ.computeIfAbsent(key, k -> read(Knowledge.section("limits").get(k), "rules/limits: `" + k + "`"));
  }

  static double value(String key) {
    return band(key).nominal();
  }

  /** The site's own limit, else the default. */
  static double value(String key, Policy policy) {
    Double own = policy.limits().get(key);
    return own == null ? value(key) : own;
  }

  static String source(String key) {
    return Knowledge.section("limits").get(key).text("source").orElse("PRACTICE");
  }

  /** A band out of a table by flask volume (m3), interpolated; {@code factor} brings its unit to SI. */
  static Band byFlask(String key, double volume, double factor) {
    List<Tree> rows = Knowledge.section("limits").get(key).items();
    Tree below = rows.get(0);
    for (Tree row : rows) {
      double at = row.number("flask").orElseThrow() * 1e-6;
      if (at >= volume) {
        return between(below, row, volume).times(factor);
      }
      below = row;
    }
    return between(below, below, volume).times(factor);
  }

  private static Band between(Tree a, Tree b, double volume) {
    double va = a.number("flask").orElseThrow() * 1e-6;
    double vb = b.number("flask").orElseThrow() * 1e-6;
    double share = vb > va ? Math.max(0, (volume - va) / (vb - va)) : 0;
    double low = a.number("low").orElseThrow() * (1 - share) + b.number("low").orElseThrow() * share;
    double high = a.number("high").orElseThrow() * (1 - share) + b.number("high").orElseThrow() * share;
    return new Band(low, (low + high) / 2, high);
  }

  /** {@code {value}} or {@code {low, nominal, high}} with a {@code unit}. */
  static Band read(Tree t, String what) {
    double[] unit = UNITS.get(t.text("unit").orElse(""));
    if (unit == null || !(t.has("value") || t.has("nominal"))) {
      throw new IllegalStateException(what + ": wants a value or a band, and a known unit");
    }
    double nominal = t.number("value").orElseGet(() -> t.number("nominal").orElseThrow());
    double low = t.number("low").orElse(nominal);
    double high = t.number("high").orElse(nominal);
    return new Band(low * unit[0] + unit[1], nominal * unit[0] + unit[1], high * unit[0] + unit[1]);
  }
}
