package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Pressure, boiling points, ratios and the water that the oil needs (physics sections 1 to 3). */
final class BoilingNumbers {
  private static final String SOURCE = "RAOULT; vapour pressures after rules/substances";
  private static final String[] RATIOS = {"mole-ratio-water-to-oil", "mass-ratio-water-to-oil", "oil-share-of-distillate"};

  private BoilingNumbers() {}

  static void put(Bench b, Numbers.Out out) {
    place(b, out);
    Optional<String> no = whyNot(b);
    if (no.isPresent()) {
      refuse(b, out, no.get());
    } else {
      together(b, b.two.orElseThrow(), out);
    }
    water(b, out);
  }

  private static void place(Bench b, Numbers.Out out) {
    if (!b.placeKnown) {
      String reason = unplaced(b);
      out.absent("pressure-here", reason, "place.barometer", "place.elevation");
      out.absent("water-boiling-point-here", reason, "place.barometer", "place.elevation");
      return;
    }
    Band p = b.atmosphere.pascal().orElseThrow();
    out.put("pressure-here", p, b.atmosphere.method(), "ISO-2533", b.atmosphere.notes());
    out.put("water-boiling-point-here", p.map(WaterSteam::boilingPoint), "saturation line", "IAPWS-IF97", List.of());
  }

  private static String unplaced(Bench b) {
    return b.rig.si("place.barometer").isPresent()
        ? "a pressure reduced to sea level says nothing about the place without its elevation"
        : "neither barometer nor elevation of the place is known";
  }

  /** Why the numbers of the oil cannot be had. */
  private static Optional<String> whyNot(Bench b) {
    if (b.charge.oil().isEmpty()) {
      return Optional.of("the make-up of the oil is not known");
    }
    if (b.two.isEmpty()) {
      return b.immiscible.map(Immiscibility::reason);
    }
    return Bench.tooMuchUnknown(b.two.get());
  }

  private static void refuse(Bench b, Numbers.Out out, String reason) {
    String[] missing = b.charge.oil().isEmpty() ? new String[] {"charge.oil.makeup", "charge.plant"} : new String[0];
    out.absent("boiling-point-here", reason, missing);
    out.absent("co-boiling-shift", reason, missing);
    for (String name : RATIOS) {
      out.absent(name, reason, missing);
    }
  }

  private static void together(Bench b, TwoLiquids t, Numbers.Out out) {
    List<String> notes = notes(b, t);
    double shift = b.water - t.kelvin();
    Band shifts = Band.within(shift, Math.min(1, t.error()));
    Band unknown = new Band(shift, shift, shift / Math.max(1e-9, 1 - t.unknownShare()));
    Band widened = new Band(shifts.low(), shift, Math.max(shifts.high(), unknown.high()));
    out.put("co-boiling-shift", widened, "water's boiling point less that of both", SOURCE, notes);
    if (b.placeKnown) {
      Band place = b.atmosphere.pascal().orElseThrow().map(WaterSteam::boilingPoint);
      out.put("boiling-point-here", place.minus(widened), "both layers' pressures add up to that of the place", SOURCE, notes);
    } else {
      out.absent("boiling-point-here", unplaced(b), "place.barometer", "place.elevation");
    }
    Band ratio = Band.of(1).over(new Band(1 - Math.min(0.9, t.error()), 1, 1 + t.error()));
    out.put(RATIOS[0], ratio.times(t.moleRatio()), "p(water) / p(oil), at the start", SOURCE, notes);
    out.put(RATIOS[1], ratio.times(t.massRatio()), "mole ratio by molar masses, at the start", SOURCE, notes);
    out.put(RATIOS[2], ratio.times(t.massRatio()).map(r -> 1 / (1 + r)), "mass share, ideal, at the start", SOURCE, notes);
  }

  private static List<String> notes(Bench b, TwoLiquids t) {
    List<String> notes = new ArrayList<>();
    if (!b.placeKnown) {
      notes.add("pressure of the place not known: at sea level");
    }
    b.immiscible.map(Immiscibility::reason).filter(r -> !r.isEmpty()).ifPresent(notes::add);
    if (!t.extrapolated().isEmpty()) {
      notes.add("extrapolated: vapour pressure of " + String.join(", ", t.extrapolated()));
    }
    if (!t.unknown().isEmpty()) {
      notes.add("volatility unknown, counted as none: " + String.join(", ", t.unknown()));
    }
    List<String> slow = hardlyVolatile(b);
    if (!slow.isEmpty()) {
      notes.add("hardly steam-volatile: " + String.join(", ", slow));
    }
    b.charge.notes().stream().filter(n -> n.startsWith("make-up")).forEach(notes::add);
    return notes;
  }

  /** Constituents under about 5 mmHg at water's boiling point here. */
  static List<String> hardlyVolatile(Bench b) {
    return b.charge.oil().map(o -> o.parts().stream().map(Oil.Part::substance)
        .filter(s -> s.vapourPressure(b.water).filter(r -> r.pascal() < Limits.value("hardly-volatile")).isPresent())
        .map(Substance::name).toList()).orElse(List.of());
  }

  private static void water(Bench b, Numbers.Out out) {
    WaterBudget.put(b, out, whyNot(b), notesOf(b));
  }

  private static List<String> notesOf(Bench b) {
    return b.two.map(t -> notes(b, t)).orElse(List.of());
  }
}
