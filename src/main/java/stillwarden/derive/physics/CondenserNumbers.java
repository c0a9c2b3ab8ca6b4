package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import stillwarden.describe.Part;

/**
 * Condenser, coolant strategy and freezing (physics sections 6 and 7): the numbers are put, the facts handed back.
 */
record CondenserNumbers(
    Optional<SideFacts.CondenserVerdict> verdict,
    Optional<CoolantChoice> choice,
    Optional<Band> liquidusNow,
    Optional<Band> liquidusHighest,
    Optional<Boolean> freezesInTakeOff,
    Optional<Band> jacketWarmsIn) {

  private static final String SOURCE = "LMTD; rules/limits";

  static CondenserNumbers put(Bench b, Optional<BoilUp> rate, Progress now, Numbers.Out out) {
    Optional<Part> part = b.parts.condenser();
    Optional<Condenser> condenser = part.flatMap(p -> Condenser.of(p, b.run));
    Optional<Band> duty = duty(b, rate);
    duty.ifPresentOrElse(d -> out.put("condenser-duty", d, "boil-up, condensed and cooled", "IAPWS-IF97", rate.map(BoilUp::notes).orElse(List.of())),
        () -> out.absent("condenser-duty", "heater power or flask size not stated", "mantle.power", "flask.volume"));
    capacity(b, condenser, out);
    flow(b, condenser, duty, out);
    Freezing freezing = Freezing.of(b, now, rate);
    Optional<SideFacts.CondenserVerdict> verdict = condenser.flatMap(c -> duty.map(d -> verdict(b, c, d)));
    Optional<CoolantChoice> choice = CoolantNumbers.put(b, part, condenser, duty, freezing, now, rate, out);
    Optional<Boolean> takeOff = freezing.highest().map(h -> b.room < h.nominal());
    return new CondenserNumbers(verdict, choice, freezing.now(), freezing.highest(), takeOff, jacket(b, part, condenser, duty, freezing));
  }

  /** W to condense what boils at the present or planned setting and cool it down. */
  static Optional<Band> duty(Bench b, Optional<BoilUp> rate) {
    return BoilUp.net(b, rate).map(n -> n.times(factor(b)));
  }

  /** Duty for a watt that boils. */
  static double factor(Bench b) {
    double cooled = WaterSteam.warming(Math.min(b.boiling(), Limits.value("distillate-outlet")), b.boiling());
    return 1 + cooled / WaterSteam.latentHeat(b.boiling());
  }

  private static void capacity(Bench b, Optional<Condenser> condenser, Numbers.Out out) {
    condenser.ifPresentOrElse(
        c -> out.put("condenser-capacity", c.capacity(b.boiling(), b.allowed()), "overall coefficient x area x log-mean temperature difference", SOURCE, c.notes()),
        () -> out.absent("condenser-capacity", "jacket length and bore, or the cooled area, not stated", "condenser.jacket-length", "condenser.tube-bore"));
  }

  private static void flow(Bench b, Optional<Condenser> condenser, Optional<Band> duty, Numbers.Out out) {
    double inlet = condenser.map(c -> c.supply().nominal()).orElseGet(() -> Limits.band("assumed-supply").nominal());
    double rise = Math.min(b.allowed().coolantRise(), Math.max(1, b.boiling() - inlet - 5));
    duty.ifPresentOrElse(
        d -> out.put("coolant-flow-least", d.map(q -> Condenser.leastFlow(q, rise, inlet) / WaterSteam.COLD_DENSITY),
            String.format(Locale.ROOT, "duty at a warming of %.0f K", rise), "IAPWS-IF97; " + Limits.source("coolant-rise-max"), List.of()),
        () -> out.absent("coolant-flow-least", "heater power or flask size not stated", "mantle.power", "flask.volume"));
    Optional<Band> outlet = condenser.flatMap(c -> duty.flatMap(c::outlet));
    outlet.ifPresentOrElse(
        o -> out.put("coolant-outlet", o.atMost(b.boiling()), "inlet + duty / (flow x heat capacity)", "IAPWS-IF97", List.of()),
        () -> out.absent("coolant-outlet", "coolant flow or heater power not stated", "condenser.coolant.flow", "mantle.power"));
  }

  /** Capacity against duty, with what would make it enough. */
  static SideFacts.CondenserVerdict verdict(Bench b, Condenser c, Band duty) {
    double capacity = c.capacity(b.boiling(), b.allowed()).nominal();
    double wanted = duty.nominal() * (1 + b.allowed().margin());
    double margin = duty.nominal() > 0 ? capacity / duty.nominal() - 1 : capacity > 0 ? 1 : 0;
    List<String> ways = new ArrayList<>();
    if (capacity < wanted) {
      double net = capacity / (1 + b.allowed().margin()) / factor(b);
      b.heat.ifPresent(h -> ways.add(String.format(Locale.ROOT, "power down to %.0f W", Math.floor(h.electrical(net)))));
      enoughFlow(b, c, wanted).ifPresentOrElse(
          f -> ways.add(String.format(Locale.ROOT, "coolant flow up to %.1f L/min", f)), () -> ways.add("a longer condenser"));
    }
    return new SideFacts.CondenserVerdict(margin, capacity >= wanted, ways);
  }

  /** L/min that would do, searched up to ten times the flow that keeps the warming to its limit. */
  private static Optional<Double> enoughFlow(Bench b, Condenser c, double wanted) {
    double least = Condenser.leastFlow(wanted, b.allowed().coolantRise(), c.supply().nominal());
    for (double f = least; f <= 10 * least; f *= 1.1) {
      Condenser faster = new Condenser(c.area(), c.supply(), Optional.of(f), c.medium(), c.supplyAssumed(), c.notes());
      if (faster.capacity(b.boiling(), b.allowed()).nominal() >= wanted) {
        return Optional.of(Math.ceil(f / WaterSteam.COLD_DENSITY * 6e5) / 10);
      }
    }
    return Optional.empty();
  }

  /** A full still jacket warms from the coolant's to the oil's freezing temperature under the present duty. */
  private static Optional<Band> jacket(Bench b, Optional<Part> part, Optional<Condenser> c, Optional<Band> duty, Freezing freezing) {
    Optional<Double> volume = part.flatMap(p -> p.si("jacket-volume"));
    if (volume.isEmpty() || c.isEmpty() || duty.filter(d -> d.low() > 0).isEmpty() || freezing.highest().isEmpty()) {
      return Optional.empty();
    }
    double to = freezing.highest().get().nominal() + Limits.value("liquidus-margin");
    return Optional.of(jacketWarming(volume.get(), c.get().supply().nominal(), to, duty.get()));
  }

  /** Seconds. */
  static Band jacketWarming(double volume, double from, double to, Band duty) {
    return Band.of(Math.max(0, volume * WaterSteam.COLD_DENSITY * WaterSteam.warming(from, Math.max(from, to)))).over(duty);
  }
}
