package stillwarden.derive;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import stillwarden.derive.physics.Immiscibility;
import stillwarden.derive.physics.JointFit;
import stillwarden.derive.physics.Levels;
import stillwarden.derive.physics.Numbers;
import stillwarden.derive.physics.SideFacts;
import stillwarden.describe.Entry;
import stillwarden.describe.Joint;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

/** The computed numbers as the sign makers ask for them: each against its limit, in one word, with why. */
final class Figures {
  /** Two reading errors of 3 % of the vessel each. */
  private static final double SUDDEN_SHARE = 0.06;

  private final Rig rig;
  private final Policy policy;
  private final Roles roles;
  private final Numbers numbers;
  private final SideFacts facts;
  private final RunState run;

  Figures(Rig rig, Policy policy, Roles roles, Numbers numbers, RunState run) {
    this.rig = rig;
    this.policy = policy;
    this.roles = roles;
    this.numbers = numbers;
    this.facts = numbers.facts();
    this.run = run;
  }

  Optional<Estimate> get(String name) {
    return Optional.of(numbers.get(name));
  }

  Map<String, Estimate> all() {
    return numbers.all();
  }

  /** What to ask for, for a number that cannot be had. */
  List<String> missing(String name) {
    List<String> own = numbers.all().containsKey(name) ? numbers.get(name).missing() : List.of();
    return own.isEmpty() ? candidates(name).stream().filter(p -> rig.datum(p).isEmpty()).toList() : own;
  }

  private List<String> candidates(String name) {
    String flask = name(Role.FLASK);
    String condenser = name(Role.CONDENSER);
    String reservoir = name(Role.RESERVOIR);
    return switch (name) {
      case "flask-fill" -> List.of("charge.water", flask + ".volume", "charge.material-mass", "charge.foams");
      case "condenser-capacity" -> List.of(condenser + ".jacket-length", condenser + ".tube-bore", condenser + ".coolant.supply", name(Role.HEATER) + ".power");
      case "receiver-capacity" -> List.of(name(Role.RECEIVER) + ".volume", "target.distillate");
      case "mantle-fit" -> List.of(name(Role.HEATER) + ".fits", flask + ".volume");
      case "water-needed" -> List.of("charge.water", reservoir + ".water", "charge.plant", "charge.oil.expected", "target.distillate");
      case "coolant-strategy" -> List.of(condenser + ".coolant.plan", condenser + ".coolant.supply", "place.warm-water", "charge.plant");
      case "boiling-point-here" -> List.of("charge.plant");
      default -> List.of();
    };
  }

  String seat(Joint j) {
    return j.word("size").flatMap(JointFit::ofText).map(v -> switch (v.seat()) {
      case SEATS -> "seats";
      case SHORT -> "short";
      case MISFIT -> "misfit";
    }).orElse("");
  }

  String oilFreezes() {
    if (facts.oil().isEmpty()) {
      return "";
    }
    if (facts.liquidusHighest().isEmpty() && facts.coolant().isPresent() && inlet().isPresent() && facts.coolant().get().strategy().equals("before-heat")) {
      return "no";
    }
    return facts.coolant().flatMap(c -> facts.liquidusNow().flatMap(l -> inlet().map(in -> in < l.high() ? "yes" : in < l.high() + margin() ? "band" : "no")))
        .orElse("");
  }

  private double margin() {
    return Limits.of(Policy.NONE, "liquidus-margin");
  }

  private Optional<Double> inlet() {
    return run.lastSaw("coolant-supply-temperature").flatMap(e -> e.measured()).map(q -> q.si())
        .or(() -> roles.one(Role.CONDENSER).flatMap(c -> c.si("coolant.supply")));
  }

  String oilFreezesWhy() {
    String now = facts.liquidusNow().map(l -> String.format(Locale.ROOT, "the oil condensing now begins to freeze at %.0f °C", l.high() - 273.15)).orElse("the oil's freezing point is not known");
    return now + inlet().map(i -> String.format(Locale.ROOT, ", coolant enters at %.0f °C, computed", i - 273.15)).orElse("");
  }

  String takeOffWhy() {
    return facts.liquidusHighest().map(l -> String.format(Locale.ROOT, "along the run the oil begins to freeze at up to %.0f °C", l.high() - 273.15)).orElse("the oil's freezing point is not known")
        + rig.datum("place.room").map(d -> ", the room has " + d.text().replace(" Cel", " °C")).orElse("");
  }

  String freezesInTakeOff() {
    if (rig.datum("place.room").isEmpty() && run.lastSaw("room-temperature").isEmpty()) {
      return "";
    }
    return facts.freezesInTakeOff().map(b -> b ? "yes" : "no").orElse("");
  }

  Optional<Duration> meltTime() {
    // coolant already warmer than the computed freezing point explains no crystals: then the limit decides
    return facts.jacketWarmsIn().filter(b -> b.high() > 1).map(b -> Duration.ofMillis(Math.round(b.high() * 1000)));
  }

  Optional<Duration> coolingTime() {
    return facts.coolsToHandWarm();
  }

  /** Until when a weak boil is explained by the last feed. */
  Optional<Duration> reboilTime(double cubicMetres) {
    return facts.feedRecovery().flatMap(until -> run.lastDid("feed").map(e -> Duration.between(e.at(), until)));
  }

  String flaskFill() {
    Estimate fill = numbers.get("flask-fill");
    return !fill.known() || facts.fillLimit().isEmpty() ? "" : fill.high() / 100 > facts.fillLimit().get() + 1e-9 ? "over" : "ok";
  }

  String condenserMargin() {
    return facts.condenser().map(c -> c.enough() ? "ok" : "short").orElse("");
  }

  String receiverCapacity() {
    Optional<Double> volume = roles.one(Role.RECEIVER).flatMap(r -> r.si("volume"));
    Optional<Double> target = rig.si("target.distillate");
    if (volume.isEmpty() || target.isEmpty()) {
      return "";
    }
    return volume.get() >= target.get() * Limits.of(policy, "receiver-capacity-min") - 1e-12 ? "ok" : "small";
  }

  String waterBudget() {
    boolean told = roles.one(Role.RESERVOIR).isEmpty() || rig.datum(name(Role.RESERVOIR) + ".water").isPresent();
    return told && numbers.get("water-available").known() && numbers.get("water-needed").known() ? facts.waterBudget().isPresent() ? "short" : "ok" : "";
  }

  String coolantStrategy() {
    return facts.coolant().flatMap(c -> c.declaredMet()).map(b -> b ? "met" : "unmet").orElse("");
  }

  String mantleFit() {
    return facts.mantle().map(m -> m.fits() ? "ok" : "mismatch").orElse("");
  }

  String oilImmiscible() {
    return facts.immiscible().map(i -> i.verdict() == Immiscibility.Verdict.REFUSED ? "no" : "yes").orElse("");
  }

  boolean barometerConflict() {
    return facts.atmosphere().conflict().isPresent();
  }

  boolean leakSuspected() {
    return facts.leakSuspected().isPresent() || suddenLoss();
  }

  /** Between two readings more went than the full power could have boiled, by more than two reading errors. */
  private boolean suddenLoss() {
    List<Entry> read = run.saw("flask-level").stream().filter(e -> e.measured().isPresent()).toList();
    Estimate rate = numbers.get("boil-up-rate");
    Optional<Double> volume = roles.one(Role.FLASK).flatMap(p -> p.si("volume"));
    if (read.size() < 2 || !rate.known() || volume.isEmpty()) {
      return false;
    }
    Entry a = read.get(read.size() - 2);
    Entry b = read.get(read.size() - 1);
    double most = rate.high() * 1e-6 * Duration.between(a.at(), b.at()).toMillis() / 60_000.0;
    return a.measured().get().si() - b.measured().get().si() > most + SUDDEN_SHARE * volume.get();
  }

  boolean targetReached() {
    return collected().flatMap(c -> rig.si("target.distillate").map(t -> c >= t)).orElse(false);
  }

  boolean targetExceeded() {
    return collected().flatMap(c -> rig.si("target.distillate").map(t -> c >= 1.1 * t)).orElse(false);
  }

  /** Seen, not merely computed. */
  private Optional<Double> collected() {
    double taken = run.did("swap-receiver").stream().flatMap(e -> e.measured().stream()).mapToDouble(q -> q.si()).sum();
    Instant swapped = run.lastDid("swap-receiver").map(e -> e.at()).orElse(Instant.MIN);
    return run.saw("receiver-level").stream().filter(e -> e.measured().isPresent() && !e.at().isBefore(swapped)).reduce((a, b) -> b)
        .flatMap(e -> e.measured()).map(q -> q.si() + taken).or(() -> taken > 0 ? Optional.of(taken) : Optional.empty());
  }

  Optional<String> levelWord(String role, double cubicMetres) {
    Optional<Double> volume = roles.one(role.equals("flask") ? Role.FLASK : role.equals("reservoir") ? Role.RESERVOIR : Role.RECEIVER).flatMap(p -> p.si("volume"));
    return switch (role) {
      case "flask" -> volume.map(v -> Levels.flaskWord(cubicMetres, v, facts.minimumLevel().orElse(v / 5), facts.charge().displaced().nominal(), policy));
      case "reservoir" -> volume.map(v -> Levels.reservoirWord(cubicMetres, v));
      default -> volume.map(v -> Levels.receiverWord(cubicMetres, v));
    };
  }

  String name(Role role) {
    return roles.one(role).map(p -> p.name()).orElseGet(() -> RigSigns.usualName(role));
  }

  /** The rig key at which a failing figure is best mended. */
  String about(String sign) {
    return switch (sign) {
      case "flask-fill" -> "charge.water";
      case "condenser-margin" -> roles.one(Role.REGULATOR).map(r -> r.name() + ".setting").orElse(name(Role.HEATER) + ".power");
      case "receiver-capacity" -> name(Role.RECEIVER) + ".volume";
      case "water-budget" -> name(Role.RESERVOIR) + ".refill-at-hand";
      case "coolant-strategy" -> name(Role.CONDENSER) + ".coolant.supply";
      case "mantle-fit" -> name(Role.HEATER) + ".fits";
      case "oil-immiscible" -> "charge.oil.makeup";
      default -> sign;
    };
  }

  String why(String sign) {
    List<String> out = new ArrayList<>();
    switch (sign) {
      case "flask-fill" -> out.add(String.format(Locale.ROOT, "flask fill %.0f %% against %.0f %%, computed", numbers.get("flask-fill").nominal(), facts.fillLimit().orElse(0.0) * 100));
      case "condenser-margin" -> out.add(String.format(Locale.ROOT, "condenser duty %.0f W against %.0f W capacity, margin %.0f %%, computed",
          numbers.get("condenser-duty").nominal(), numbers.get("condenser-capacity").nominal(), facts.condenser().map(c -> c.margin() * 100).orElse(0.0)));
      case "coolant-strategy" -> {
        facts.coolant().ifPresent(c -> out.addAll(c.reasons()));
        policy.coolant().filter(c -> out.stream().noneMatch(r -> r.contains("policy"))).ifPresent(c -> out.add("the site's policy: coolant " + c));
      }
      case "water-budget" -> out.add(facts.waterBudget().map(SideFacts.Shortage::what).orElse("enough water, computed"));
      case "mantle-fit" -> out.add(facts.mantle().map(SideFacts.Fit::why).orElse("mantle fit not known"));
      case "oil-immiscible" -> out.add(facts.immiscible().map(Immiscibility::reason).orElse("solubility of the oil not known"));
      case "receiver-capacity" -> out.add("receiver volume against the planned distillate");
      default -> out.add(sign);
    }
    return String.join("; ", out);
  }

  SideFacts facts() {
    return facts;
  }

  Numbers numbers() {
    return numbers;
  }
}
