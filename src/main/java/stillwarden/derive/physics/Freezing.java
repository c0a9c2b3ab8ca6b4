package stillwarden.derive.physics;

import java.util.List;
import java.util.Optional;
import java.util.function.DoublePredicate;

/**
 * When the oil that condenses could freeze, along its run.
 *
 * @param whole the oil as a whole at rest, K
 * @param now what condenses now, K
 * @param highest the highest along the run, K
 * @param unknown constituents of unknown melting point
 * @param gaps true when for some stretch of the run they are too much of what condenses to say anything
 */
record Freezing(Optional<Band> whole, Optional<Band> now, Optional<Band> highest, List<String> unknown, boolean gaps, Optional<Fractionation> course) {
  private static final int STEPS = 50;

  static Freezing of(Bench b, Progress progress, Optional<BoilUp> rate) {
    Optional<Band> stated = b.rig.si("charge.oil.melting-point").map(Band::of);
    if (b.course.isEmpty()) {
      Optional<Liquidus> rest = b.charge.oil().map(Liquidus::of);
      Optional<Band> t = stated.or(() -> rest.flatMap(Liquidus::kelvin));
      return new Freezing(t, t, t, rest.map(Liquidus::unknown).orElse(List.of()), t.isEmpty(), Optional.empty());
    }
    Fractionation run = b.course.get();
    Liquidus rest = Liquidus.of(run.oil());
    Optional<Band> highest = Optional.empty();
    boolean gaps = false;
    for (int i = 0; i <= STEPS; i++) {
      Optional<Band> here = at(run, run.atShare(share(i)));
      gaps |= here.isEmpty();
      highest = higher(highest, here);
    }
    Optional<Band> now = b.charge.oilAmountKnown() ? now(b, run, progress) : anywhere(at(run, run.points().get(0)), highest, b.run.started());
    return new Freezing(stated.or(rest::kelvin), now, higher(highest, stated), rest.unknown(), gaps, b.course);
  }

  /** Not knowing how much oil there is, a started run can be anywhere on its way: it counts at its highest. */
  private static Optional<Band> anywhere(Optional<Band> start, Optional<Band> highest, boolean started) {
    return started ? highest.map(h -> new Band(Math.min(h.nominal(), start.map(Band::low).orElse(h.low())), h.nominal(), h.high())) : start;
  }

  private static Optional<Band> now(Bench b, Fractionation run, Progress progress) {
    double water = progress.collected().map(c -> c.nominal() * WaterSteam.COLD_DENSITY).orElse(0.0);
    Band slower = b.diffusion();
    Optional<Band> nominal = at(run, run.atWater(water / slower.nominal()));
    Optional<Band> early = at(run, run.atWater(water / slower.high()));
    Optional<Band> late = at(run, run.atWater(water));
    return nominal.map(n -> new Band(
        Math.min(n.low(), early.map(Band::low).orElse(n.low())), n.nominal(), Math.max(n.high(), late.map(Band::high).orElse(n.high()))));
  }

  /** The last few per cent of the oil are too little to plug a tube. */
  private static double share(int step) {
    return Limits.value("freezing-considered-share") * step / STEPS;
  }

  private static Optional<Band> at(Fractionation run, Fractionation.Point reached) {
    double last = share(STEPS);
    Fractionation.Point p = reached.share() > last ? run.atShare(last) : reached;
    return Liquidus.of(run.oil().parts(), p.vapour()).kelvin();
  }

  private static Optional<Band> higher(Optional<Band> a, Optional<Band> b) {
    return a.isEmpty() ? b : b.filter(x -> x.nominal() > a.get().nominal()).or(() -> a);
  }

  /** First share of the oil over at which what condenses freezes above a temperature. */
  Optional<Double> from(double kelvin) {
    DoublePredicate freezes = s -> at(course.orElseThrow(), course.get().atShare(s)).filter(t -> t.nominal() > kelvin).isPresent();
    if (course.isEmpty()) {
      return highest.filter(h -> h.nominal() > kelvin).map(h -> 0.0);
    }
    for (int i = 0; i <= STEPS; i++) {
      if (freezes.test(share(i))) {
        return Optional.of(i == 0 ? 0.0 : bisect(freezes, share(i - 1), share(i)));
      }
    }
    return Optional.empty();
  }

  private static double bisect(DoublePredicate freezes, double not, double yes) {
    double a = not;
    double b = yes;
    for (int i = 0; i < 8; i++) {
      double m = (a + b) / 2;
      if (freezes.test(m)) {
        b = m;
      } else {
        a = m;
      }
    }
    return b;
  }
}
