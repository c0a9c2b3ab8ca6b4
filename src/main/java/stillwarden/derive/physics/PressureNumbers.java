package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Vent, seal and closed system (physics section 8). */
final class PressureNumbers {
  private PressureNumbers() {}

  static void put(Bench b, Optional<BoilUp> rate, Progress now, Numbers.Out out) {
    vent(b, out);
    seal(b, out);
    closed(b, rate, now, out, "closed-time-to-2-kPa", 2000);
    closed(b, rate, now, out, "closed-time-to-5-kPa", 5000);
    closed(b, rate, now, out, "closed-time-to-10-kPa", 10_000);
  }

  private static void vent(Bench b, Numbers.Out out) {
    List<Double> bores = new ArrayList<>();
    b.parts.takeOff().flatMap(p -> p.si("side-arm-bore")).ifPresent(bores::add);
    b.parts.ventHose().flatMap(p -> p.si("bore")).ifPresent(bores::add);
    b.parts.condenser().flatMap(p -> p.si("tube-bore")).ifPresent(bores::add);
    if (b.parts.takeOff().flatMap(p -> p.si("side-arm-bore")).isEmpty() || b.heat.isEmpty()) {
      out.absent("vent-pressure-drop", "bore of the vent or power of the heater not stated", "take-off.side-arm-bore", "mantle.power");
      return;
    }
    double bore = bores.stream().mapToDouble(Double::doubleValue).min().orElseThrow();
    double length = b.parts.ventHose().flatMap(p -> p.si("length")).orElse(0.0);
    Band heads = Limits.band("vent-loss-coefficient");
    Band net = full(b);
    out.put("vent-pressure-drop",
        new Band(drop(b, net.low(), bore, length, heads.low()), drop(b, net.nominal(), bore, length, heads.nominal()), drop(b, net.high(), bore, length, heads.high())),
        "whole boil-up at full power through the narrowest stated bore, condenser lost", Limits.source("vent-loss-coefficient"), b.heat.get().notes());
  }

  private static double drop(Bench b, double net, double bore, double length, double heads) {
    return ClosedVessel.ventDrop(b.pascal, net, bore, length, heads);
  }

  /** Net heat at full power, W. */
  private static Band full(Bench b) {
    Heat h = b.heat.orElseThrow();
    return h.full().times(h.efficiency()).minus(h.loss()).atLeast(0);
  }

  private static void seal(Bench b, Numbers.Out out) {
    boolean tip = b.parts.receiver().flatMap(p -> p.word("tip-below-liquid")).filter("yes"::equals).isPresent();
    boolean hose = b.parts.ventHose().flatMap(p -> p.word("end")).filter("under-liquid"::equals).isPresent();
    if (!tip && !hose) {
      out.absent("seal-back-pressure", "no tip or hose is stated to stand under liquid");
      return;
    }
    out.put("seal-back-pressure", Limits.band("seal-depth-default").map(d -> ClosedVessel.seal(d, WaterSteam.COLD_DENSITY)), "depth x density x gravity", "PRACTICE",
        List.of("depth not stated: default band; the same suction lifts liquid up the tip when the flask cools"));
  }

  private static void closed(Bench b, Optional<BoilUp> rate, Progress now, Numbers.Out out, String name, double over) {
    Optional<Band> net = BoilUp.net(b, rate).filter(n -> n.nominal() > 0);
    if (net.isEmpty() || now.flask().isEmpty()) {
      out.absent(name, "heater power, flask size or water not stated", "mantle.power", "flask.volume", "charge.water");
      return;
    }
    Band water = now.flask().get().minus(b.charge.displaced()).atLeast(0).times(WaterSteam.BOILING_DENSITY);
    Band glass = b.glassCapacity();
    Band power = net.get();
    double slowest = Math.max(power.low(), BoilUp.slowest() * power.nominal());
    Band seconds = new Band(seconds(b, over, water.low(), glass.low(), power.high()), seconds(b, over, water.nominal(), glass.nominal(), power.nominal()),
        seconds(b, over, water.high(), glass.high(), slowest));
    double little = Limits.value("little-water");
    double dry = seconds(b, over, little * WaterSteam.BOILING_DENSITY, glass.low(), power.high());
    out.put(name, seconds, "liquid and glass along the saturation line, closed while boiling", "IAPWS-IF97",
        List.of(String.format(java.util.Locale.ROOT, "with %.0f mL left in the flask %.1f s", little * 1e6, dry), "laboratory glass of this kind is not rated for pressure"));
  }

  private static double seconds(Bench b, double over, double water, double glass, double net) {
    return ClosedVessel.seconds(b.pascal, over, water, glass, net);
  }
}
