package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Rig;
import stillwarden.describe.Tree;

/**
 * What is in the flask, SI: as the rig states it, else from the plant list's bands, which {@code notes} then say.
 *
 * @param water m3 poured in at the start
 * @param plantMass kg of dry material, 0 for none
 * @param oil composition of the oil; its amount is the nominal expected mass, or 1 kg when that is unknown
 * @param oilMass kg expected
 * @param uptake m3 of water that the plant holds
 * @param displaced m3 that solids, or a free oil layer, displace
 * @param covers m3 of level that covers the solids
 * @param foams {@code no, some, strongly}
 * @param dispersed true when the oil has to come out of plant matter first
 */
public record Charge(
    Optional<Double> water,
    double plantMass,
    Optional<Oil> oil,
    Optional<Band> oilMass,
    Band uptake,
    Band displaced,
    double covers,
    Optional<String> foams,
    boolean dispersed,
    List<String> notes,
    List<String> missing) {

  /** Name of what a make-up leaves unsaid. */
  static final String REST = "rest of the oil (make-up not stated)";
  private static final String MAKEUP = "charge.oil.makeup.";

  /** True when the amount of oil is that of the charge, not the 1 kg that stands for an unknown one. */
  public boolean oilAmountKnown() {
    return oil.isPresent() && oilMass.filter(m -> m.nominal() > 0).isPresent();
  }

  public static Charge of(Rig rig) {
    return of(rig, rig.word("charge.plant").map(p -> Knowledge.section("plants").get(p)).orElse(Tree.EMPTY));
  }

  static Charge of(Rig rig, Tree plant) {
    List<String> notes = new ArrayList<>();
    List<String> missing = new ArrayList<>();
    boolean solids = rig.word("charge.plant").isPresent() || rig.word("charge.material").isPresent();
    Optional<Double> mass = rig.si("charge.material-mass");
    if (solids && mass.isEmpty()) {
      missing.add("charge.material-mass");
    }
    Optional<Band> oilMass = oilMass(rig, plant, mass, notes);
    Optional<Oil> oil = oil(rig, plant, oilMass.map(Band::nominal).filter(m -> m > 0).orElse(1.0), notes);
    if (oil.isEmpty()) {
      missing.add("charge.oil.makeup");
    }
    double kg = mass.orElse(0.0);
    boolean dispersed = solids && kg > 0;
    // a free oil layer takes its own room in the flask; oil inside plant matter is counted with the plant
    Band layer = dispersed ? Band.of(0) : layer(oil, oilMass);
    Optional<String> foams = rig.word("charge.foams").or(() -> plant.text("foams"));
    return new Charge(rig.si("charge.water"), kg, oil, oilMass, uptake(plant, kg, notes), displaced(rig, plant, kg, notes).plus(layer), covers(plant, kg, notes),
        foams, dispersed, List.copyOf(notes), List.copyOf(missing));
  }

  private static Optional<Band> oilMass(Rig rig, Tree plant, Optional<Double> mass, List<String> notes) {
    Optional<Band> stated = rig.si("charge.oil.expected").map(Band::of);
    if (stated.isPresent() || mass.isEmpty() || !plant.has("oil-share")) {
      return stated;
    }
    notes.add("oil expected after the plant list: a band");
    return Optional.of(share(plant.get("oil-share")).times(mass.get()));
  }

  private static Optional<Oil> oil(Rig rig, Tree plant, double mass, List<String> notes) {
    Map<String, Double> shares = new LinkedHashMap<>();
    rig.facts().keySet().stream().filter(k -> k.startsWith(MAKEUP)).sorted()
        .forEach(k -> rig.si(k).ifPresent(v -> shares.put(k.substring(MAKEUP.length()), v)));
    if (shares.isEmpty() && plant.has("makeup")) {
      plant.get("makeup").fields().forEach((k, v) -> shares.put(k, share(v).nominal()));
      notes.add("make-up of the oil after the plant list: it varies from lot to lot");
    }
    double sum = shares.values().stream().mapToDouble(Double::doubleValue).sum();
    if (sum <= 0) {
      return Optional.empty();
    }
    if (sum < Limits.value("makeup-complete")) {
      shares.put(REST, 1 - sum);
    }
    return Optional.of(Oil.ofMassShares(shares, mass));
  }

  private static Band layer(Optional<Oil> oil, Optional<Band> mass) {
    double density = oil.flatMap(Oil::density).orElseGet(() -> Limits.value("oil-density-default"));
    return mass.map(m -> m.times(1 / density)).orElse(Band.of(0));
  }

  private static Band uptake(Tree plant, double kg, List<String> notes) {
    if (kg == 0) {
      return Band.of(0);
    }
    boolean listed = plant.has("water-uptake");
    Band perKg = listed ? share(plant.get("water-uptake")) : Limits.band("water-uptake-default");
    notes.add((listed ? "water that the plant takes up after the plant list" : "water that the plant takes up: default band") + ": not there to boil");
    return perKg.times(kg / 1000);
  }

  private static Band displaced(Rig rig, Tree plant, double kg, List<String> notes) {
    Optional<Double> stated = rig.si("charge.solids-volume");
    if (stated.isPresent() || kg == 0) {
      return Band.of(stated.orElse(0.0));
    }
    if (plant.has("solids-volume")) {
      notes.add("room that the plant takes after the plant list");
      return share(plant.get("solids-volume")).times(kg / 1000);
    }
    notes.add("room that the plant takes: default density band");
    return Band.of(kg).over(Limits.band("solids-density"));
  }

  private static double covers(Tree plant, double kg, List<String> notes) {
    if (kg == 0) {
      return 0;
    }
    Optional<Band> listed = plant.has("bulk-volume") ? Optional.of(share(plant.get("bulk-volume")).times(1e-3)) : Optional.empty();
    return listed.orElseGet(() -> Limits.band("bulk-volume")).nominal() * kg;
  }

  /** A number, or {low, nominal, high} whose nominal may be left out. */
  private static Band share(Tree t) {
    if (t.raw() instanceof Number n) {
      return Band.of(n.doubleValue());
    }
    double low = t.number("low").orElseGet(() -> t.number("nominal").orElseThrow());
    double high = t.number("high").orElseGet(() -> t.number("nominal").orElseThrow());
    return new Band(low, t.number("nominal").orElse((low + high) / 2), high);
  }
}
