package stillwarden.derive.physics;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Part;

/**
 * Where the run stands now, by the last looks carried forward with the boil-up rate.
 *
 * @param heatLeft seconds until it boils: from heat-on before the run, 0 once boiling was seen
 * @param heatUp the whole heat-up, s
 * @param flask level of water and solids, m3
 * @param fill the same level, to judge a fill by
 * @param reservoir m3
 * @param receiver m3 in the receiver now
 * @param collected m3 over since the start
 * @param leak what it could mean that more water is gone than the power could boil
 */
record Progress(
    Optional<Band> heatLeft,
    Optional<Band> heatUp,
    Optional<Instant> boilsFrom,
    Optional<Band> flask,
    Optional<Band> fill,
    Optional<Band> reservoir,
    Optional<Band> receiver,
    Optional<Band> collected,
    Optional<String> leak) {

  static Progress of(Bench b, Optional<BoilUp> rate) {
    Optional<Band> heatUp = heatUp(b);
    Optional<Instant> boils = boilsFrom(b, heatUp);
    Optional<Band> wait = wait(b, heatUp);
    Optional<Band> collected = collected(b, rate, boils);
    return new Progress(wait, heatUp, boils, flask(b, rate, boils), fill(b, rate, boils), reservoir(b), receiver(b, rate, boils, collected), collected, Leak.suspected(b, heatUp, collected));
  }

  private static Optional<Band> heatUp(Bench b) {
    if (b.heat.isEmpty() || b.charge.water().isEmpty()) {
      return Optional.empty();
    }
    Heat h = b.heat.get();
    // the loss grows from nought to its full value on the way up
    Band into = h.full().times(h.setting()).times(h.efficiency()).minus(h.loss().times(0.5));
    if (into.nominal() <= 0) {
      return Optional.empty();
    }
    Band slow = new Band(Math.max(into.low(), into.nominal() * BoilUp.slowest()), into.nominal(), into.high());
    return Optional.of(Heat.capacity(b.charge, b.charge.water().get(), b.volume).times(Math.max(0, b.boiling() - b.room)).over(slow));
  }

  private static Optional<Instant> boilsFrom(Bench b, Optional<Band> heatUp) {
    RunState run = b.run;
    if (run.boilingSince().isPresent() || run.heatSince().isEmpty() || heatUp.isEmpty()) {
      return run.boilingSince();
    }
    return Optional.of(run.heatSince().get().plusMillis((long) (1000 * heatUp.get().nominal())));
  }

  private static Optional<Band> wait(Bench b, Optional<Band> heatUp) {
    if (b.run.boilingSince().isPresent()) {
      return Optional.of(Band.of(0));
    }
    if (b.run.flaskTemperature().isPresent() && b.boiling() > b.room) {
      // a temperature read on the way up says more than the clock
      RunState.Amount read = b.run.flaskTemperature().get();
      double left = Math.max(0, (b.boiling() - read.si()) / (b.boiling() - b.room));
      double since = b.run.secondsSince(read.at());
      return heatUp.map(h -> h.times(left).minus(Band.of(since)).atLeast(0));
    }
    double gone = b.run.heatSince().map(b.run::secondsSince).orElse(0.0);
    return heatUp.map(h -> h.minus(Band.of(gone)).atLeast(0));
  }

  /** Seconds of boiling between an earlier look and now, or until the heat was cut. */
  private static double boiledSince(Bench b, Optional<Instant> boils, Instant look) {
    if (boils.isEmpty() || b.run.at() == null) {
      return 0;
    }
    Instant end = b.run.heatOn() ? b.run.at() : b.run.settingSince().orElse(b.run.at());
    Instant from = boils.get().isAfter(look) ? boils.get() : look;
    return Math.max(0, (end.toEpochMilli() - from.toEpochMilli()) / 1000.0);
  }

  private static Optional<Band> flask(Bench b, Optional<BoilUp> rate, Optional<Instant> boils) {
    if (b.run.flask().isPresent() && b.volume.isPresent()) {
      RunState.Look look = b.run.flask().get();
      Optional<Band> seen = look.volume().isPresent()
          ? look.volume().map(v -> read(v, b.volume.get()))
          : Levels.flask(look.word(), b.volume.get(), b.minimumLevel(b.volume.get()), b.policy);
      return seen.map(s -> s.plus(Band.of(b.run.fedSince(look.at()))).minus(boiled(b, rate, boils, look.at())).atLeast(0));
    }
    return reckoned(b, rate, boils);
  }

  /** What was poured in and fed, less what has boiled away by the clock. */
  private static Optional<Band> reckoned(Bench b, Optional<BoilUp> rate, Optional<Instant> boils) {
    Optional<Band> start = b.charge.water().map(w -> Band.of(w).plus(b.charge.displaced()));
    if (!b.run.started()) {
      return start;
    }
    Instant from = b.run.heatSince().orElse(b.run.at());
    return start.map(s -> s.plus(Band.of(b.run.fed())).minus(boiled(b, rate, boils, from)).atLeast(0));
  }

  /** The level to judge a fill by: a word's interval is far too wide for that, so it only bounds what is reckoned. */
  private static Optional<Band> fill(Bench b, Optional<BoilUp> rate, Optional<Instant> boils) {
    Optional<Band> seen = flask(b, rate, boils);
    Optional<Band> reckoned = reckoned(b, rate, boils);
    boolean byWord = b.run.flask().filter(l -> l.volume().isEmpty()).isPresent();
    boolean meet = byWord && reckoned.isPresent() && seen.isPresent() && reckoned.get().low() <= seen.get().high() && reckoned.get().high() >= seen.get().low();
    return meet ? reckoned.map(r -> r.atLeast(seen.get().low()).atMost(seen.get().high())) : seen;
  }

  private static Band boiled(Bench b, Optional<BoilUp> rate, Optional<Instant> boils, Instant since) {
    double seconds = boiledSince(b, boils, since);
    return rate.map(r -> r.cubicMetres().times((b.charge.dispersed() ? r.waterShare() : 1) * seconds)).orElse(Band.of(0));
  }

  private static Band read(double volume, double vessel) {
    double error = Limits.value("level-reading-error") * vessel;
    return new Band(Math.max(0, volume - error), volume, volume + error);
  }

  private static Optional<Band> reservoir(Bench b) {
    Optional<Part> part = b.parts.reservoir();
    Optional<Double> size = part.flatMap(p -> p.si("volume"));
    if (b.run.reservoir().isPresent()) {
      RunState.Look look = b.run.reservoir().get();
      Optional<Band> seen = look.volume().map(Band::of).or(() -> size.flatMap(v -> Levels.reservoir(look.word(), v)));
      return seen.map(s -> s.minus(Band.of(b.run.fedSince(look.at()))).atLeast(0));
    }
    return part.flatMap(p -> p.si("water")).map(w -> Band.of(w).minus(Band.of(b.run.fed())).atLeast(0));
  }

  private static Optional<Band> receiver(Bench b, Optional<BoilUp> rate, Optional<Instant> boils, Optional<Band> collected) {
    Optional<Double> size = b.parts.receiver().flatMap(p -> p.si("volume"));
    if (b.run.receiver().isPresent()) {
      RunState.Look look = b.run.receiver().get();
      Optional<Band> seen = look.volume().isPresent()
          ? look.volume().map(v -> v == 0 ? Band.of(0) : read(v, size.orElse(v)))
          : size.flatMap(v -> Levels.receiver(look.word(), v));
      double seconds = boiledSince(b, boils, look.at());
      return seen.map(s -> rate.map(r -> s.plus(r.cubicMetres().times(seconds))).orElse(s));
    }
    return collected.map(c -> c.minus(Band.of(b.run.swapped())).atLeast(0));
  }

  private static Optional<Band> collected(Bench b, Optional<BoilUp> rate, Optional<Instant> boils) {
    if (!b.run.started()) {
      return Optional.of(Band.of(0));
    }
    List<RunState.Amount> readings = b.run.collected();
    if (!readings.isEmpty()) {
      RunState.Amount last = readings.get(readings.size() - 1);
      double seconds = boiledSince(b, boils, last.at());
      Band seen = Band.of(last.si());
      return Optional.of(rate.map(r -> seen.plus(r.cubicMetres().times(seconds))).orElse(seen));
    }
    Instant from = b.run.heatSince().orElse(b.run.at());
    return rate.map(r -> r.cubicMetres().times(boiledSince(b, boils, from)).plus(Band.of(0)));
  }
}
