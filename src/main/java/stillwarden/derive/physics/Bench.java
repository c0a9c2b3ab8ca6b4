package stillwarden.derive.physics;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import stillwarden.describe.Entry;
import stillwarden.describe.Part;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

/** What all the numbers start from: the place, the charge, the oil's run, the heat, and what the log says. SI. */
final class Bench {
  private static final Map<String, Fractionation> RUNS = new ConcurrentHashMap<>();
  private static final int RUNS_KEPT = 64;
  private static final double SEA_LEVEL = 101_325;

  final Rig rig;
  final RigParts parts;
  final Policy policy;
  final RunState run;
  final Atmosphere atmosphere;
  /** Pressure to compute with: that of the place, or sea level where nobody knows it (then {@code placeKnown} is false). */
  final double pascal;
  final boolean placeKnown;
  final double water;
  final double room;
  final Charge charge;
  final Optional<TwoLiquids> two;
  final Optional<Fractionation> course;
  final Optional<Immiscibility> immiscible;
  final Optional<Part> flask;
  final Optional<Double> volume;
  final Optional<Heat> heat;
  final List<String> notes = new ArrayList<>();

  Bench(Rig rig, Policy policy, List<Entry> entries, Instant at) {
    this(rig, policy, RunState.of(entries, at));
  }

  Bench(Rig rig, Policy policy, RunState run) {
    this.rig = rig;
    this.parts = RigParts.of(rig);
    this.policy = policy;
    this.run = run;
    this.atmosphere = run.barometer().isPresent()
        ? Atmosphere.of(run.barometer(), rig.word("place.barometer-is"), rig.si("place.elevation"))
        : Atmosphere.of(rig);
    this.placeKnown = atmosphere.pascal().isPresent();
    this.pascal = atmosphere.pascal().map(Band::nominal).orElse(SEA_LEVEL);
    this.water = WaterSteam.boilingPoint(pascal);
    this.room = Heat.room(rig, run, notes);
    this.charge = Charge.of(rig);
    this.immiscible = charge.oil().map(Immiscibility::of);
    boolean usable = immiscible.filter(i -> i.verdict() != Immiscibility.Verdict.REFUSED).isPresent();
    this.two = usable ? charge.oil().map(o -> TwoLiquids.at(pascal, o)) : Optional.empty();
    this.course = two.filter(t -> t.oilTotal() > 0 && tooMuchUnknown(t).isEmpty()).map(t -> course(t.oil()));
    this.flask = parts.flask();
    this.volume = flask.flatMap(f -> f.si("volume"));
    this.heat = Heat.of(parts, run, boiling(), room);
  }

  /** Temperature of the boil, K: with the oil where that is known. */
  double boiling() {
    return two.map(TwoLiquids::kelvin).orElse(water);
  }

  /** Why ratios cannot be given, when too much of the oil is of unknown volatility. */
  static Optional<String> tooMuchUnknown(TwoLiquids t) {
    return t.unknownShare() > Limits.value("unknown-volatility-share-max") || t.oilTotal() <= 0
        ? Optional.of("volatility unknown: " + String.join(", ", t.unknown()))
        : Optional.empty();
  }

  private Fractionation course(Oil oil) {
    StringBuilder key = new StringBuilder().append(pascal).append(oil.unlistedMoles());
    oil.parts().forEach(p -> key.append('|').append(p.substance().id()).append(p.moles()));
    if (RUNS.size() > RUNS_KEPT) {
      RUNS.clear();
    }
    return RUNS.computeIfAbsent(key.toString(), k -> Fractionation.of(oil, pascal, Limits.value("oil-over-share")));
  }

  Condenser.Allowed allowed() {
    return new Condenser.Allowed(Limits.value("coolant-rise-max", policy), Limits.value("condenser-margin-min", policy));
  }

  /** How much more water than ideal the oil needs: 1 for a free oil layer. */
  Band diffusion() {
    return charge.dispersed() ? Limits.band("diffusion-factor") : Band.of(1);
  }

  double minimumLevel(double flaskVolume) {
    return Levels.minimum(flaskVolume, flask.flatMap(f -> f.si("minimum-level")), charge.covers());
  }

  Band glassCapacity() {
    return volume.map(v -> Limits.byFlask("glass-mass", v, 1e-3)).orElse(Band.of(0)).times(Limits.value("glass-heat-capacity"));
  }
}
