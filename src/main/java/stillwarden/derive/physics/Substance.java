package stillwarden.derive.physics;

import java.util.List;
import java.util.Optional;
import stillwarden.describe.Tree;

/**
 * One entry of {@code rules/substances}; what is not known of it is absent.
 *
 * @param id file name without ending
 * @param molarMass kg/mol
 * @param density kg/m3 near room temperature
 * @param meltingPoint K, with the scatter between sources
 * @param heatOfFusion J/mol, often an estimate
 * @param waterSolubility kg/m3 at 25 degC; infinite when miscible in all proportions
 * @param waterInIt mass share of water that its own layer takes up
 * @param spread relative disagreement between published vapour pressures beyond the usual
 */
public record Substance(
    String id,
    String name,
    double molarMass,
    Optional<Double> density,
    Optional<Band> meltingPoint,
    Optional<Band> heatOfFusion,
    List<VapourPressure> equations,
    Optional<Double> waterSolubility,
    Optional<Double> waterInIt,
    Optional<Double> flashPoint,
    boolean toxic,
    double spread,
    List<String> notes,
    Tree data) {

  static Substance read(String id, Tree t) {
    boolean miscible = t.get("water-solubility").has("miscible");
    return new Substance(
        id,
        t.text("name").orElse(id),
        Limits.read(t.get("molar-mass"), id).nominal(),
        value(t, "density").map(Band::nominal),
        value(t, "melting-point"),
        value(t, "heat-of-fusion"),
        t.get("vapour-pressure").items().stream().map(VapourPressure::read).toList(),
        miscible ? Optional.of(Double.POSITIVE_INFINITY) : value(t, "water-solubility").map(Band::nominal),
        value(t, "water-in-it").map(Band::nominal),
        value(t, "flash-point").map(Band::nominal),
        t.get("toxic").text("value").filter("yes"::equals).isPresent(),
        value(t, "vapour-pressure-spread").map(Band::nominal).orElse(0.0),
        t.words("notes"),
        t);
  }

  private static Optional<Band> value(Tree t, String key) {
    Tree v = t.get(key);
    return v.has("value") || v.has("nominal") ? Optional.of(Limits.read(v, key)) : Optional.empty();
  }

  /** Vapour pressure with its band, or empty: volatility unknown at this temperature. */
  public Optional<VapourPressure.Reading> vapourPressure(double kelvin) {
    return VapourPressure.best(equations, kelvin);
  }

  /** Relative error of a reading. */
  double error(VapourPressure.Reading r) {
    return Math.max(spread, Limits.value(r.extrapolated() ? "extrapolated-band" : "vapour-pressure-band"));
  }
}
