package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Part;

/**
 * A condenser with its coolant, SI. Counter-current, vapour at one temperature: Q = m cp (Tb - Tin)(1 - exp(-UA / m cp)).
 *
 * @param area m2
 * @param supply coolant inlet, K
 * @param flow kg/s; empty when unknown
 * @param medium {@code water, still-water, air}
 */
public record Condenser(Band area, Band supply, Optional<Double> flow, String medium, boolean supplyAssumed, List<String> notes) {

  public Condenser {
    notes = List.copyOf(notes);
  }

  static Optional<Condenser> of(Part part, RunState run) {
    List<String> notes = new ArrayList<>();
    Optional<Band> area = area(part, notes);
    if (area.isEmpty()) {
      return Optional.empty();
    }
    Optional<Double> supply = run.supply().or(() -> part.si("coolant.supply"));
    if (supply.isEmpty()) {
      notes.add("coolant temperature not stated: default band");
    }
    Optional<Double> flow = run.flow().or(() -> part.si("coolant.flow")).map(v -> v * WaterSteam.COLD_DENSITY);
    String medium = medium(part);
    part.word("coolant.medium").filter(m -> !m.equals("water") && !m.equals("none"))
        .ifPresent(m -> notes.add("coolant `" + m + "` is computed as water"));
    if (flow.isEmpty() && medium.equals("water")) {
      notes.add("coolant flow not stated: as much as keeps its warming to the limit");
    }
    Band inlet = supply.map(Band::of).orElseGet(() -> Limits.band("assumed-supply"));
    return Optional.of(new Condenser(area.get(), inlet, flow, medium, supply.isEmpty(), notes));
  }

  private static String medium(Part part) {
    if (part.word("coolant.source").filter("still-water"::equals).isPresent()) {
      return "still-water";
    }
    return part.word("coolant.medium").filter("none"::equals).isPresent() ? "air" : "water";
  }

  private static Optional<Band> area(Part part, List<String> notes) {
    Optional<Double> stated = part.si("cooled-area");
    Optional<Double> length = part.si("jacket-length");
    Optional<Double> bore = part.si("tube-bore");
    if (stated.isPresent() || length.isEmpty() || bore.isEmpty()) {
      return stated.map(Band::of);
    }
    notes.add("cooled area from jacket length and bore, as a plain tube; wall thickness assumed");
    double inner = Math.PI * bore.get() * length.get();
    double outer = Math.PI * (bore.get() + 2 * Limits.value("condenser-wall")) * length.get();
    return Optional.of(new Band(inner, (inner + outer) / 2, outer));
  }

  /** Most that it condenses with its own flow, W, the coolant entering at {@code supply}. */
  Band capacity(double boiling, Allowed limits) {
    return capacity(boiling, supply, limits);
  }

  Band capacity(double boiling, Band inlet, Allowed limits) {
    Band u = Limits.band(medium.equals("still-water") ? "condenser-u-still" : medium.equals("air") ? "condenser-u-air" : "condenser-u-water");
    double low = heat(u.low() * area.low(), boiling, inlet.high(), limits);
    double nominal = heat(u.nominal() * area.nominal(), boiling, inlet.nominal(), limits);
    double high = heat(u.high() * area.high(), boiling, inlet.low(), limits);
    return new Band(Math.min(low, nominal), nominal, Math.max(high, nominal));
  }

  private double heat(double ua, double boiling, double inlet, Allowed limits) {
    double drive = boiling - inlet;
    if (drive <= 0) {
      return 0;
    }
    if (medium.equals("air")) {
      return ua * drive;
    }
    if (flow.isEmpty()) {
      double rise = Math.min(limits.coolantRise(), 0.9 * drive);
      return ua * rise / Math.log(drive / (drive - rise));
    }
    double stream = flow.get() * WaterSteam.liquidHeatCapacity(inlet, 101_325);
    return stream <= 0 ? 0 : stream * drive * (1 - Math.exp(-ua / stream));
  }

  /** What the bare jacket gives to the room without coolant, W. */
  Band airOnly(double boiling, double room) {
    Band outer = area.times(Limits.value("air-jacket-bore-factor"));
    return outer.times(Limits.band("condenser-u-air")).times(Math.max(0, boiling - room));
  }

  /** Least flow, kg/s, that carries a duty off with no more than the warming allowed. */
  static double leastFlow(double duty, double rise, double inlet) {
    return duty / (WaterSteam.liquidHeatCapacity(inlet + rise / 2, 101_325) * rise);
  }

  /** Coolant temperature at the outlet, K, at a duty. */
  Optional<Band> outlet(Band duty) {
    if (flow.isEmpty() || flow.get() <= 0) {
      return Optional.empty();
    }
    double stream = flow.get() * WaterSteam.liquidHeatCapacity(supply.nominal(), 101_325);
    return Optional.of(new Band(supply.low() + duty.low() / stream, supply.nominal() + duty.nominal() / stream, supply.high() + duty.high() / stream));
  }

  /** The two limits of a site that a condenser is judged by. */
  record Allowed(double coolantRise, double margin) {}
}
