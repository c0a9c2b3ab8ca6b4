package stillwarden.derive;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Predicate;
import java.util.stream.DoubleStream;
import stillwarden.derive.physics.Physics;
import stillwarden.describe.Dimension;
import stillwarden.describe.Quantity;
import stillwarden.describe.Rig;

/**
 * Ways to meet a failing figure: each is tried on the rig and computed anew, so that what is named would do. Where a
 * figure can be met in two ways both are named.
 */
public final class Changes {
  /** Sizes in which laboratory glass is sold, mL (common practice). */
  private static final double[] SIZES = {50, 100, 250, 500, 1000, 2000, 5000, 10_000, 20_000};

  private final Situation situation;
  private final Rig rig;

  private Changes(Situation situation) {
    this.situation = situation;
    this.rig = situation.rig();
  }

  /** Empty where the sign has no number behind it: then the hazard's page knows the right value. */
  public static List<Change> of(Situation s, Sign sign) {
    return new Changes(s).of(sign);
  }

  private List<Change> of(Sign sign) {
    List<Change> out = new ArrayList<>();
    switch (sign.about() + "=" + sign.value()) {
      case "flask-fill=over" -> {
        Predicate<Figures> ok = f -> f.flaskFill().equals("ok");
        volumes("charge.water", down(rig.si("charge.water"), 10), ok, "less water").ifPresent(out::add);
        sizes(name(Role.FLASK) + ".volume", ok, "a bigger flask").ifPresent(out::add);
      }
      case "condenser-margin=short" -> {
        Predicate<Figures> ok = f -> f.condenserMargin().equals("ok");
        if (!situation.roles().all(Role.REGULATOR).isEmpty()) {
          tried(name(Role.REGULATOR) + ".setting", DoubleStream.iterate(95, x -> x >= 5, x -> x - 5), "%", 0.01, Dimension.FRACTION, ok, "less heat").ifPresent(out::add);
        }
        tried(name(Role.CONDENSER) + ".jacket-length", DoubleStream.of(200, 250, 300, 400, 500, 600, 800, 1000), "mm", 1e-3, Dimension.LENGTH, ok, "a longer condenser").ifPresent(out::add);
      }
      case "receiver-capacity=small" -> {
        Predicate<Figures> ok = f -> f.receiverCapacity().equals("ok");
        sizes(name(Role.RECEIVER) + ".volume", ok, "a bigger receiver").ifPresent(out::add);
        volumes("target.distillate", down(rig.si("target.distillate"), 5), ok, "less distillate").ifPresent(out::add);
      }
      case "water-budget=short" -> {
        Predicate<Figures> ok = f -> f.waterBudget().equals("ok");
        volumes("target.distillate", down(rig.si("target.distillate"), 10), ok, "less distillate").ifPresent(out::add);
        volumes(name(Role.RESERVOIR) + ".water", up(rig.si(name(Role.RESERVOIR) + ".water"), 25, rig.si(name(Role.RESERVOIR) + ".volume")), ok, "more water in the reservoir").ifPresent(out::add);
      }
      case "coolant-strategy=unmet" -> coolant(out);
      case "oil-freezes-in-take-off=yes" -> tried("place.room", DoubleStream.iterate(18, x -> x <= 45, x -> x + 1), "Cel", 1, Dimension.TEMPERATURE, f -> f.freezesInTakeOff().equals("no"), "a warmer place").ifPresent(out::add);
      case "mantle-fit=mismatch" -> mantle(out);
      case "path=closed" -> openings().ifPresent(out::add);
      case "joint-seat=misfit", "joint-seat=short" -> out.add(new Change(sign.looks().get(0), rig.joints().stream().filter(j -> j.toString().equals(sign.part()))
          .findFirst().flatMap(j -> j.word("size")).orElse("").split(" in ")[0], "both sides of one designation"));
      case "hood-draught=weak" -> out.add(new Change("place.hood.face-velocity", String.format(Locale.ROOT, "%.2f m/s", Limits.of(situation.policy(), "face-velocity-min")), "the site's least face velocity"));
      default -> { }
    }
    return out;
  }

  private String name(Role role) {
    return RigNames.part(situation.roles(), role);
  }

  private void mantle(List<Change> out) {
    String flask = name(Role.FLASK);
    Predicate<Figures> ok = f -> f.mantleFit().equals("ok");
    rig.datum(flask + ".volume").filter(v -> ok.test(figures(RigEdit.with(rig, name(Role.HEATER) + ".fits", v.text(), v.measured()))))
        .ifPresent(v -> out.add(new Change(name(Role.HEATER) + ".fits", v.text(), "a heater made for this flask")));
    rig.datum(name(Role.HEATER) + ".heated-up-to").filter(v -> ok.test(figures(RigEdit.with(rig, flask + ".minimum-level", v.text(), v.measured()))))
        .ifPresent(v -> out.add(new Change(flask + ".minimum-level", v.text(), "liquid over the heated zone")));
  }

  /** The one designed opening that opens the way when opened. */
  private Optional<Change> openings() {
    List<Change> all = new ArrayList<>(List.of(new Change(name(Role.TAKE_OFF) + ".side-arm", "open", "the way out"), new Change(name(Role.RECEIVER) + ".gas-tight", "no", "the way out")));
    rig.openings().keySet().forEach(p -> all.add(new Change("openings." + p, "open", "the way out")));
    return all.stream().filter(c -> VapourPath.find(RigEdit.with(rig, c.about(), c.to(), Optional.empty()), PathState.beforeHeat()).path() == PathFinding.State.OPEN).findFirst();
  }

  private void coolant(List<Change> out) {
    situation.numbers().facts().coolant().ifPresent(c -> {
      String condenser = name(Role.CONDENSER);
      String plan = c.strategy();
      out.add(new Change(condenser + ".coolant.plan", plan, "what the computation asks for"));
      tried(condenser + ".coolant.supply", DoubleStream.iterate(Math.ceil(c.kelvin() - 273.15), x -> x <= 60, x -> x + 1), "Cel", 1, Dimension.TEMPERATURE,
          RigEdit.with(rig, condenser + ".coolant.plan", plan, Optional.empty()), f -> f.coolantStrategy().equals("met"), "what condenses stays liquid").ifPresent(out::add);
    });
  }

  private static DoubleStream down(Optional<Double> from, double step) {
    double start = Math.floor(from.orElse(0.0) * 1e6 / step) * step;
    return DoubleStream.iterate(start, x -> x >= step, x -> x - step);
  }

  private static DoubleStream up(Optional<Double> from, double step, Optional<Double> most) {
    double start = Math.ceil(from.orElse(0.0) * 1e6 / step) * step;
    return DoubleStream.iterate(start, x -> x <= most.orElse(0.0) * 1e6 + 1e-6, x -> x + step);
  }

  private Optional<Change> volumes(String path, DoubleStream millilitres, Predicate<Figures> ok, String why) {
    return tried(path, millilitres, "mL", 1e-6, Dimension.VOLUME, ok, why);
  }

  private Optional<Change> sizes(String path, Predicate<Figures> ok, String why) {
    double now = rig.si(path).orElse(0.0) * 1e6;
    return volumes(path, DoubleStream.of(SIZES).filter(x -> x > now), ok, why);
  }

  private Optional<Change> tried(String path, DoubleStream values, String unit, double factor, Dimension d, Predicate<Figures> ok, String why) {
    return tried(path, values, unit, factor, d, rig, ok, why);
  }

  private Optional<Change> tried(String path, DoubleStream values, String unit, double factor, Dimension d, Rig base, Predicate<Figures> ok, String why) {
    double[] all = values.limit(60).toArray();
    for (double x : all) {
      String text = (x == Math.rint(x) ? Long.toString((long) x) : String.format(Locale.ROOT, "%.2f", x)) + " " + unit;
      double si = unit.equals("Cel") ? x + 273.15 : x * factor;
      Rig changed = RigEdit.with(base, path, text, Optional.of(new Quantity(si, d, text)));
      if (ok.test(figures(changed))) {
        return Optional.of(new Change(path, text, why));
      }
    }
    return Optional.empty();
  }

  private Figures figures(Rig changed) {
    Instant at = situation.run().at();
    return new Figures(changed, situation.policy(), Roles.of(changed), Physics.numbers(changed, situation.policy(), List.of(), at), RunState.none(at, situation.run().offset()));
  }
}
