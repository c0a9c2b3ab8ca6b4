package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Water that the oil needs against water that there is. */
final class WaterBudget {
  private WaterBudget() {}

  static void put(Bench b, Numbers.Out out, Optional<String> whyNot, List<String> notes) {
    Optional<Band> ideal = ideal(b);
    if (ideal.isPresent()) {
      List<String> all = new ArrayList<>(notes);
      b.charge.notes().stream().filter(n -> n.startsWith("oil expected")).forEach(all::add);
      out.put("water-needed-ideal", ideal.get(), "differential distillation until 1 % of the oil is left: a lower bound", "RAOULT", all);
      if (b.charge.dispersed()) {
        all.add("plant gives its oil up slower: diffusion factor, default band; an earlier run of yours is better");
      }
      out.put("water-needed", ideal.get().times(b.diffusion()), "ideal x diffusion factor", "RAOULT; " + Limits.source("diffusion-factor"), all);
    } else {
      String reason = whyNot.orElse(b.charge.oilMass().isEmpty() ? "how much oil is expected is not known" : "the oil is too little volatile");
      String[] missing = b.charge.oil().isEmpty() ? new String[] {"charge.oil.makeup", "charge.plant"} : b.charge.oilMass().isEmpty() ? new String[] {"charge.oil.expected", "charge.material-mass"} : new String[0];
      out.absent("water-needed-ideal", reason, missing);
      out.absent("water-needed", reason, missing);
    }
    available(b).ifPresentOrElse(
        a -> out.put("water-available", a, "flask above its minimum level and reservoir, refills not counted", "PRACTICE", b.charge.notes()),
        () -> out.absent("water-available", "water or flask not stated", "charge.water", "flask.volume"));
  }

  static Optional<Band> ideal(Bench b) {
    if (b.course.isEmpty() || b.charge.oilMass().isEmpty() || !b.course.get().complete()) {
      return Optional.empty();
    }
    double nominal = b.charge.oilMass().get().nominal();
    double perKilogram = nominal > 0 ? b.course.get().waterForAll() / nominal : 0;
    double error = Math.min(0.9, b.two.orElseThrow().error());
    return Optional.of(b.charge.oilMass().get().times(perKilogram / WaterSteam.COLD_DENSITY).times(new Band(1 - error, 1, 1 + error)));
  }

  /** m3 that can still be boiled. */
  static Optional<Band> available(Bench b) {
    if (b.charge.water().isEmpty() || b.volume.isEmpty()) {
      return Optional.empty();
    }
    double minimum = b.minimumLevel(b.volume.get());
    Band level = Band.of(b.charge.water().get()).plus(b.charge.displaced());
    Band free = level.minus(Band.of(minimum)).minus(b.charge.uptake()).atLeast(0).atMost(b.charge.water().get());
    double reservoir = b.parts.reservoir().flatMap(p -> p.si("water")).orElse(0.0);
    return Optional.of(free.plus(Band.of(reservoir)));
  }

  /** What is short, against the distillate wanted, else against the water needed. */
  static Optional<SideFacts.Shortage> shortage(Bench b) {
    Optional<Band> there = available(b);
    Optional<Double> target = b.rig.si("target.distillate");
    Optional<Double> wanted = target.or(() -> ideal(b).map(i -> i.times(b.diffusion()).nominal()));
    if (there.isEmpty() || wanted.isEmpty() || there.get().nominal() >= wanted.get()) {
      return Optional.empty();
    }
    double lacks = wanted.get() - there.get().nominal();
    return Optional.of(new SideFacts.Shortage(
        String.format(Locale.ROOT, "%.0f mL wanted, %.0f mL there to boil", wanted.get() * 1e6, there.get().nominal() * 1e6),
        List.of(String.format(Locale.ROOT, "%.0f mL more water in charge or reservoir", Math.ceil(lacks * 1e6)),
            String.format(Locale.ROOT, "target down to %.0f mL", Math.floor(there.get().nominal() * 1e6)))));
  }
}
