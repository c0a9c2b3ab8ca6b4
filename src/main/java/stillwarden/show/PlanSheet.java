package stillwarden.show;

import java.util.List;
import stillwarden.derive.Estimate;

/**
 * The numbers of one planned run, ready to be shown.
 *
 * @param at RFC 3339 text, or empty
 * @param numbers every number of the contract's list, the absent ones with their reason
 * @param lines what else is to be read, in sentences: refill schedule, joint fit, which openings close
 * @param notes what was defaulted, extrapolated or assumed
 */
public record PlanSheet(
    String rig, String at, List<Estimate> numbers, List<Curve> curves, List<String> lines,
    List<String> notes, List<String> waivers, String defersTo) {

  public PlanSheet {
    numbers = List.copyOf(numbers);
    curves = List.copyOf(curves);
    lines = List.copyOf(lines);
    notes = List.copyOf(notes);
    waivers = List.copyOf(waivers);
  }

  /** A course in time: {@code t} in minutes from heat on, values in {@code unit}; all four lists of one length. */
  public record Curve(String name, String unit, List<Double> t, List<Double> low, List<Double> value, List<Double> high) {
    public Curve {
      t = List.copyOf(t);
      low = List.copyOf(low);
      value = List.copyOf(value);
      high = List.copyOf(high);
      if (t.size() != value.size() || low.size() != value.size() || high.size() != value.size()) {
        throw new IllegalArgumentException("curve `" + name + "`: t, low, value and high want one length");
      }
    }
  }
}
