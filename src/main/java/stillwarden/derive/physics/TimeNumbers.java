package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/** Heat-up, boil-up, drip rate, feed, fill, and the times to what comes next (physics sections 4, 5, 9). */
final class TimeNumbers {
  private static final String BY_HEAT = "power x setting x efficiency less losses";
  private static final String SOURCE = "IAPWS-IF97; rules/limits";

  private final Bench b;
  private final Optional<BoilUp> rate;
  private final Progress now;
  private final Numbers.Out out;
  private final List<String> floor = new ArrayList<>();

  private TimeNumbers(Bench b, Optional<BoilUp> rate, Progress now, Numbers.Out out) {
    this.b = b;
    this.rate = rate;
    this.now = now;
    this.out = out;
  }

  static void put(Bench b, Optional<BoilUp> rate, Progress now, Numbers.Out out) {
    TimeNumbers t = new TimeNumbers(b, rate, now, out);
    t.heat();
    t.feed();
    t.fill();
    t.target();
    t.time("time-to-reservoir-end", now.reservoir(), "reservoir at the rate at which water boils away", "reservoir.water");
    Optional<Double> minimum = b.volume.map(b::minimumLevel);
    if (b.volume.isPresent() && minimum.get() > Levels.minimum(b.volume.get(), b.flask.flatMap(f -> f.si("minimum-level")), 0)) {
      t.floor.add("minimum level raised to what covers the solids");
    }
    t.time("time-to-minimum-level", minimum.flatMap(m -> now.flask().map(f -> f.minus(Band.of(m)).atLeast(0))),
        "flask above its minimum level, nothing fed", "flask.volume", "charge.water");
    t.time("time-to-dryness", now.flask().map(f -> f.minus(b.charge.displaced()).minus(b.charge.uptake()).atLeast(0)),
        "free water in the flask, nothing fed", "flask.volume", "charge.water");
    t.receiver();
  }

  private String method() {
    return rate.filter(BoilUp::fitted).isPresent() ? "fitted to this run's readings" : BY_HEAT;
  }

  private List<String> notes(String... more) {
    List<String> all = new ArrayList<>(List.of(more));
    rate.ifPresent(r -> all.addAll(r.notes()));
    return all;
  }

  private void heat() {
    now.heatUp().ifPresentOrElse(
        h -> out.put("heat-up-time", h, "heat of charge and glass over net power", SOURCE, b.heat.orElseThrow().notes()),
        () -> noHeat("heat-up-time"));
    rate.ifPresentOrElse(r -> {
      out.put("boil-up-rate", r.kilograms(), method(), SOURCE, notes());
      out.put("drip-rate", r.cubicMetres().over(Limits.band("drop-volume")), "boil-up rate in drops", Limits.source("drop-volume"), notes());
    }, () -> {
      noHeat("boil-up-rate");
      noHeat("drip-rate");
    });
  }

  private void noHeat(String name) {
    boolean weak = b.heat.filter(h -> h.net().nominal() <= 0).isPresent();
    out.absent(name, weak ? "at this setting the heat does not bring it to the boil" : "neither heater power nor flask size is known, or no water is stated",
        "mantle.power", "flask.volume", "charge.water");
  }

  private void feed() {
    Optional<Band> net = BoilUp.net(b, rate).filter(n -> n.nominal() > 0);
    if (net.isEmpty()) {
      noHeat("feed-limit");
      return;
    }
    double from = b.parts.reservoir().flatMap(p -> p.si("temperature")).orElseGet(() -> Limits.value("feed-temperature"));
    double perCubicMetre = WaterSteam.COLD_DENSITY * WaterSteam.warming(from, b.boiling());
    out.put("feed-limit", net.get().times(Limits.value("feed-share") / perCubicMetre), "feed that takes a quarter of the net heat", "PRACTICE; IAPWS-IF97", notes());
  }

  private void fill() {
    if (b.volume.isEmpty() || now.fill().isEmpty()) {
      out.absent("flask-fill", "flask volume or water not stated", "flask.volume", "charge.water");
      return;
    }
    out.put("flask-fill", now.fill().get().times(1 / b.volume.get()), "water and solids over flask volume", "geometry", b.charge.notes());
  }

  private void target() {
    Optional<Band> left = b.rig.si("target.distillate").flatMap(v -> now.collected().map(c -> Band.of(v).minus(c).atLeast(0)));
    if (left.isEmpty()) {
      left = b.rig.si("target.oil").flatMap(this::forOil);
    }
    Optional<Double> planned = b.rig.si("target.time");
    if (left.isEmpty() && planned.isPresent()) {
      double gone = b.run.heatSince().map(b.run::secondsSince).orElse(0.0);
      out.put("time-to-target", Band.of(Math.max(0, planned.get() - gone)), "planned time less time since heat-on", "the rig file", List.of());
      return;
    }
    time("time-to-target", left, "what is still to come over", "target.distillate", "target.oil");
  }

  /** m3 of distillate that bring a mass of oil. */
  private Optional<Band> forOil(double kilograms) {
    if (b.course.isEmpty() || !b.charge.oilAmountKnown() || now.collected().isEmpty()) {
      return Optional.empty();
    }
    double share = kilograms / b.charge.oilMass().get().nominal();
    Band water = b.diffusion().times(b.course.get().atShare(share).water() / WaterSteam.COLD_DENSITY);
    return Optional.of(water.minus(now.collected().get()).atLeast(0));
  }

  private void receiver() {
    Optional<Double> size = b.parts.receiver().flatMap(p -> p.si("volume"));
    Optional<Band> room = size.flatMap(v -> now.receiver().map(r -> Band.of(v * Limits.value("receiver-full-share")).minus(r).atLeast(0)));
    time("time-to-full-receiver", room, "until the receiver is full to its limit", "receiver.volume");
  }

  /** A receiver fills, and a flask with a free oil layer falls, by all that comes over; else only the water counts. */
  private boolean wholeDistillate(String name) {
    return name.contains("receiver") || name.contains("target") || name.contains("minimum") && !b.charge.dispersed();
  }

  private void time(String name, Optional<Band> volume, String what, String... missing) {
    if (b.run.started() && !b.run.heatOn()) {
      out.absent(name, "the heat is off");
    } else if (volume.isEmpty()) {
      out.absent(name, "not stated: " + String.join(", ", missing), missing);
    } else if (rate.isEmpty() || now.heatLeft().isEmpty()) {
      noHeat(name);
    } else {
      Band share = rate.get().cubicMetres().times(wholeDistillate(name) ? 1 : rate.get().waterShare());
      boolean none = volume.get().high() == 0;
      Band seconds = none ? Band.of(0) : volume.get().over(share).plus(now.heatLeft().get());
      List<String> notes = notes(b.run.started() ? "from now" : "from heat-on");
      if (name.contains("minimum")) {
        notes.addAll(floor);
      }
      out.put(name, seconds, what + "; " + method(), SOURCE, notes);
    }
  }
}
