package stillwarden.order;

import java.util.Locale;
import java.util.Map;
import stillwarden.derive.Estimate;
import stillwarden.derive.Limits;
import stillwarden.derive.Situation;

/** How far a number is from turning its sign, where a sign has a number behind it. */
final class Margins {
  /** Sign to the number and the limit it is compared with. */
  private static final Map<String, String[]> BEHIND = Map.of(
      "time-to-minimum", new String[] {"time-to-minimum-level", "time-to-minimum-min", "60"},
      "refill-in-time", new String[] {"time-to-minimum-level", "time-to-minimum-min", "60"},
      "flask-fill", new String[] {"flask-fill", "flask-fill-max", "0.01"});

  private Margins() {}

  static String of(String about, Situation s) {
    String[] behind = BEHIND.get(about);
    if (about.equals("condenser-margin")) {
      return s.numbers().facts().condenser().map(c -> String.format(Locale.ROOT, "%.0f %% against %.0f %%", c.margin() * 100, Limits.of(s.policy(), "condenser-margin-min") * 100)).orElse("");
    }
    if (behind == null) {
      return "";
    }
    Estimate e = s.numbers().get(behind[0]);
    if (!e.known()) {
      return "";
    }
    double limit = Limits.of(s.policy(), behind[1]) / Double.parseDouble(behind[2]);
    double worse = about.equals("flask-fill") ? e.high() : e.low();
    return String.format(Locale.ROOT, "%.1f %s against %.1f", worse, e.unit(), limit);
  }
}
