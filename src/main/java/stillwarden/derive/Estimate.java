package stillwarden.derive;

import java.util.List;

/**
 * A computed number with its band.
 *
 * @param low nominal high in {@code unit} (UCUM code); NaN never occurs: see {@link #absent}
 * @param method in a few words how it was computed
 * @param source where method or constants come from
 * @param notes what was defaulted, extrapolated or assumed, in words
 * @param reason why there is no value, or empty
 * @param missing rig paths that would give it
 */
public record Estimate(
    String name,
    double low,
    double nominal,
    double high,
    String unit,
    String method,
    String source,
    List<String> notes,
    String reason,
    List<String> missing) {

  public Estimate {
    notes = List.copyOf(notes);
    missing = List.copyOf(missing);
    if (reason.isEmpty() && !(Double.isFinite(low) && Double.isFinite(nominal) && Double.isFinite(high) && low <= nominal && nominal <= high)) {
      throw new IllegalArgumentException(name + ": want finite low <= nominal <= high, was " + low + ", " + nominal + ", " + high + " " + unit);
    }
  }

  public static Estimate of(String name, double low, double nominal, double high, String unit, String method, String source, List<String> notes) {
    return new Estimate(name, low, nominal, high, unit, method, source, notes, "", List.of());
  }

  public static Estimate absent(String name, String unit, String reason, List<String> missing) {
    return new Estimate(name, 0, 0, 0, unit, "", "", List.of(), reason, missing);
  }

  public boolean known() {
    return reason.isEmpty();
  }
}
