package stillwarden.derive.physics;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Tree;

/**
 * One published equation for the vapour pressure of a pure substance, with the range it was fitted in.
 *
 * @param form {@code antoine-ln, antoine-log10, antoine-log10-bar-K, antoine-log10-mmhg-cel, wagner-25, wagner-36, dippr-101}
 * @param minK maxK range of validity, K
 * @param phase {@code liquid} or {@code solid}
 * @param source id in {@code rules/sources.yaml}
 */
public record VapourPressure(String form, Map<String, Double> constants, double minK, double maxK, String phase, String source) {
  private static final double MMHG = 133.322387415;

  /** A pressure (Pa) and whether it was asked for outside the equation's range. */
  public record Reading(double pascal, boolean extrapolated, VapourPressure by) {}

  public VapourPressure {
    constants = Map.copyOf(constants);
  }

  static VapourPressure read(Tree t) {
    Map<String, Double> c = new java.util.HashMap<>();
    t.get("constants").fields().forEach((k, v) -> c.put(k, Double.parseDouble(v.text().orElseThrow())));
    return new VapourPressure(t.text("form").orElseThrow(), c, t.number("t-min").orElseThrow(), t.number("t-max").orElseThrow(),
        t.text("phase").orElse("liquid"), t.text("source").orElseThrow());
  }

  /** Distance outside the range, K; 0 inside. */
  public double outside(double kelvin) {
    return Math.max(0, Math.max(minK - kelvin, kelvin - maxK));
  }

  /** The nearest equation to this temperature; empty where none is near enough to answer. */
  public static Optional<Reading> best(List<VapourPressure> equations, double kelvin) {
    VapourPressure nearest = null;
    for (VapourPressure v : equations) {
      if (nearest == null || v.outside(kelvin) < nearest.outside(kelvin)) {
        nearest = v;
      }
    }
    return nearest == null ? Optional.empty() : nearest.at(kelvin);
  }

  /** Empty when asked so far outside that the equation cannot answer. */
  public Optional<Reading> at(double kelvin) {
    double outside = outside(kelvin);
    return outside > Limits.value("extrapolation-max") ? Optional.empty() : Optional.of(new Reading(formula(kelvin), outside > 0, this));
  }

  double formula(double t) {
    return switch (form) {
      case "antoine-ln" -> Math.exp(antoine(t));
      case "antoine-log10" -> Math.pow(10, antoine(t));
      case "antoine-log10-bar-K" -> 1e5 * Math.pow(10, antoine(t));
      case "antoine-log10-mmhg-cel" -> MMHG * Math.pow(10, antoine(t - 273.15));
      case "wagner-25" -> wagner(t, 2.5, 5);
      case "wagner-36" -> wagner(t, 3, 6);
      case "dippr-101" -> Math.exp(c("C1") + c("C2") / t + c("C3") * Math.log(t) + c("C4") * Math.pow(t, c("C5")));
      default -> throw new IllegalStateException("rules/substances: no vapour-pressure form `" + form + "`");
    };
  }

  private double antoine(double t) {
    return c("A") - c("B") / (t + c("C"));
  }

  private double wagner(double t, double third, double fourth) {
    double tr = t / c("Tc");
    double x = 1 - tr;
    double sum = c("A") * x + c("B") * Math.pow(x, 1.5) + c("C") * Math.pow(x, third) + c("D") * Math.pow(x, fourth);
    return c("Pc") * Math.exp(sum / tr);
  }

  private double c(String key) {
    return constants.get(key);
  }
}
