package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import stillwarden.describe.Part;

/** Puts the strategy, the coolant's temperature, and the freezing numbers. */
final class CoolantNumbers {
  private static final String SOURCE = "SCHROEDER; RAOULT; melting points and heats of fusion after rules/substances";

  private CoolantNumbers() {}

  static Optional<CoolantChoice> put(
      Bench b, Optional<Part> part, Optional<Condenser> condenser, Optional<Band> duty, Freezing freezing, Progress now, Optional<BoilUp> rate, Numbers.Out out) {
    freezing(freezing, out);
    if (freezing.highest().isEmpty()) {
      String reason = b.charge.oil().isEmpty() ? "the make-up of the oil is not known" : "melting points not known: " + String.join(", ", freezing.unknown());
      String[] missing = b.charge.oil().isEmpty() ? new String[] {"charge.oil.makeup", "charge.oil.melting-point"} : new String[] {"charge.oil.melting-point"};
      out.absent("coolant-strategy", reason, missing);
      out.absent("coolant-temperature", reason, missing);
      out.absent("crystals-possible-from", reason, missing);
      return Optional.empty();
    }
    boolean stated = condenser.filter(c -> !c.supplyAssumed()).isPresent();
    Band supply = condenser.map(Condenser::supply).orElseGet(() -> Limits.band("assumed-supply"));
    // an assumed supply counts at its coldest: that is where crystals come first
    double inlet = supply.low();
    Optional<Double> watch = freezing.from(inlet - Limits.value("liquidus-margin"));
    Optional<Double> expect = freezing.from(inlet);
    CoolantChoice choice = CoolantChoice.of(inputs(b, part, condenser, duty, freezing.highest().get().nominal(), inlet, stated), watch, expect);
    List<String> reasons = new ArrayList<>(choice.reasons());
    if (freezing.gaps()) {
      reasons.add("for part of the run the melting points are not known, watch for crystals: " + String.join(", ", freezing.unknown()));
    }
    choice.alternatives().forEach(a -> reasons.add("or: " + a));
    out.word("coolant-strategy", choice.strategy(), SOURCE, reasons);
    out.put("coolant-temperature", Band.of(choice.kelvin()), "freezing temperature of what condenses + 2 K, within what the site supplies", SOURCE, reasons);
    crystals(b, watch, inlet, now, rate, out);
    return Optional.of(choice);
  }

  private static CoolantChoice.Inputs inputs(
      Bench b, Optional<Part> part, Optional<Condenser> condenser, Optional<Band> duty, double highest, double inlet, boolean stated) {
    double needs = duty.map(d -> d.nominal() * (1 + b.allowed().margin())).orElse(0.0);
    Optional<Band> air = condenser.map(c -> c.airOnly(b.boiling(), b.room));
    Optional<Double> airWatts = air.flatMap(a -> b.heat.map(h -> h.electrical(a.nominal() / CondenserNumbers.factor(b))));
    return new CoolantChoice.Inputs(
        highest, inlet, stated, CoolantChoice.warmest(b.rig.word("place.warm-water"), inlet), part.flatMap(p -> p.word("coolant.plan")),
        k -> condenser.isEmpty() || condenser.get().capacity(b.boiling(), Band.of(k), b.allowed()).nominal() >= needs,
        air.filter(a -> duty.isPresent() && a.nominal() >= needs).isPresent(), airWatts, b.policy);
  }

  private static void freezing(Freezing f, Numbers.Out out) {
    if (f.whole().isEmpty()) {
      out.absent("freezing-point-of-oil", "make-up or melting points of the oil not known", "charge.oil.makeup", "charge.oil.melting-point");
      return;
    }
    List<String> notes = new ArrayList<>();
    f.now().ifPresent(t -> notes.add(String.format(Locale.ROOT, "what condenses now begins to freeze at %.0f Cel", t.nominal() - 273.15)));
    f.highest().ifPresent(t -> notes.add(String.format(Locale.ROOT, "along the run up to %.0f Cel", t.nominal() - 273.15)));
    if (!f.unknown().isEmpty()) {
      notes.add("melting point unknown, could come out earlier: " + String.join(", ", f.unknown()));
    }
    notes.add("heats of fusion partly estimated: see rules/substances");
    out.put("freezing-point-of-oil", f.whole().get(), "ideal solubility, the oil as a whole at rest", SOURCE, notes);
  }

  private static void crystals(Bench b, Optional<Double> watch, double inlet, Progress now, Optional<BoilUp> rate, Numbers.Out out) {
    String name = "crystals-possible-from";
    if (watch.isEmpty()) {
      out.absent(name, String.format(Locale.ROOT, "not with coolant at %.0f Cel: what condenses stays liquid", inlet - 273.15));
      return;
    }
    if (b.course.isEmpty() || !b.charge.oilAmountKnown() || rate.isEmpty() || now.heatLeft().isEmpty() || (b.run.started() && !b.run.heatOn())) {
      out.absent(name, String.format(Locale.ROOT, "from %.0f %% of the oil over; rate or amount of oil not known, or heat off: no time", watch.get() * 100), "charge.oil.expected", "mantle.power");
      return;
    }
    double ideal = b.course.get().atShare(watch.get()).water() / WaterSteam.COLD_DENSITY;
    Band slower = b.diffusion();
    Band volume = new Band(ideal, ideal * slower.nominal(), ideal * slower.high());
    Band left = volume.minus(now.collected().orElse(Band.of(0))).atLeast(0);
    Band seconds = left.over(rate.get().cubicMetres()).plus(now.heatLeft().get());
    out.put(name, seconds, String.format(Locale.ROOT, "coolant at %.0f Cel, from %.0f %% of the oil over", inlet - 273.15, watch.get() * 100), SOURCE, List.of());
  }
}
