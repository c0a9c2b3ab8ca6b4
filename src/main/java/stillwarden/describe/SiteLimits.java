package stillwarden.describe;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/** The limits that a site may tighten, with their defaults ({@code rules/limits/site.yaml}). */
public final class SiteLimits {
  private static final Map<String, Limit> ALL = load();

  private SiteLimits() {}

  /**
   * One limit.
   *
   * @param value default in SI or as a share of 1; empty for a limit that takes a word
   * @param words words it takes from loose to tight; empty for a number
   * @param tighter {@code up, down, none} or the tight word
   * @param danger true where it guards life and takes no waiver
   */
  public record Limit(
      String key, Optional<Double> value, Optional<Dimension> dimension, List<String> words, String tighter, boolean danger, String guards, String source) {

    /** True when {@code si} lets pass what the default would not; never where neither way is the tighter one. */
    public boolean looser(double si) {
      double d = value.orElseThrow();
      double rounding = Math.abs(d) * 1e-9;
      return switch (tighter) {
        case "up" -> si < d - rounding;
        case "down" -> si > d + rounding;
        default -> false;
      };
    }
  }

  public static Map<String, Limit> all() {
    return ALL;
  }

  /** The value that holds here: the site's own, else the default, SI or a share of 1. */
  public static double value(Policy policy, String key) {
    return policy.limits().getOrDefault(key, ALL.get(key).value.orElseThrow());
  }

  private static Map<String, Limit> load() {
    Map<String, Limit> out = new LinkedHashMap<>();
    Knowledge.section("limits").fields().forEach((key, t) -> {
      if (t.has("tighter")) {
        out.put(key, limit(key, t));
      }
    });
    return out;
  }

  private static Limit limit(String key, Tree t) {
    Optional<Double> value = t.number("value").isPresent() ? Optional.of(t.number("value").getAsDouble()) : Optional.empty();
    return new Limit(key, value, t.text("dimension").map(Units::dimension), new ArrayList<>(t.words("values")), t.text("tighter").orElseThrow(),
        t.text("danger").filter("yes"::equals).isPresent(), t.text("guards").orElse(""), t.text("source").orElse(""));
  }

  /** The value of a limit as a person would write it: {@code 50 %}, {@code 0.5 m/s}. */
  static String spoken(Limit limit, double si) {
    if (limit.dimension.isEmpty() || limit.dimension.get() == Dimension.COUNT) {
      return number(si);
    }
    return switch (limit.dimension.get()) {
      case FRACTION -> si < 0.001 ? number(si * 1e6) + " [ppm]" : number(si * 100) + " %";
      case TEMPERATURE -> number(si - 273.15) + " Cel";
      default -> number(si) + " " + limit.dimension.get().si();
    };
  }

  private static String number(double d) {
    return new java.math.BigDecimal(d).round(new java.math.MathContext(6)).stripTrailingZeros().toPlainString();
  }
}
