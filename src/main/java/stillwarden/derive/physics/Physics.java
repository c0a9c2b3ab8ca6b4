package stillwarden.derive.physics;

import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

/** The computation: every number of the contract for a rig, its site's policy and the run so far. */
public final class Physics {
  private final Rig rig;
  private final Policy policy;
  private RunState lastRun;
  private Numbers lastNumbers;

  /** For many moments of one run: a line that tells the computation nothing new costs no computation. */
  public Physics(Rig rig, Policy policy) {
    this.rig = rig;
    this.policy = policy;
  }

  /** As {@link #numbers(Rig, Policy, List, Instant)}. */
  public Numbers numbers(List<Entry> entries, Instant at) {
    RunState run = RunState.of(entries, at);
    if (!run.equals(lastRun)) {
      lastNumbers = of(new Bench(rig, policy, run)).numbers();
      lastRun = run;
    }
    return lastNumbers;
  }

  /**
   * @param entries usable log lines sorted by time with corrections applied; later ones than {@code at} are left out; empty before a run
   * @param at the moment to answer for; null only with no entries
   */
  public static Numbers numbers(Rig rig, Policy policy, List<Entry> entries, Instant at) {
    return of(new Bench(rig, policy, entries, at)).numbers();
  }

  /** A bench with everything computed from it; {@link Plan} draws its curves from the same. */
  record Worked(Bench bench, Optional<BoilUp> rate, Progress progress, Optional<CoolantChoice> coolant, Numbers numbers) {}

  static Worked of(Bench b) {
    Optional<BoilUp> rate = BoilUp.of(b);
    Progress now = Progress.of(b, rate);
    Numbers.Out out = new Numbers.Out(b.parts);
    BoilingNumbers.put(b, out);
    TimeNumbers.put(b, rate, now, out);
    CondenserNumbers condenser = CondenserNumbers.put(b, rate, now, out);
    PressureNumbers.put(b, rate, now, out);
    return new Worked(b, rate, now, condenser.choice(), out.with(facts(b, rate, now, condenser)));
  }

  private static SideFacts facts(Bench b, Optional<BoilUp> rate, Progress now, CondenserNumbers condenser) {
    Optional<Feed> feed = Feed.last(b, rate);
    return new SideFacts(
        b.atmosphere, b.charge.oil(), b.immiscible, BoilingNumbers.hardlyVolatile(b), b.two.map(TwoLiquids::unknown).orElse(List.of()),
        condenser.verdict(), condenser.choice(), condenser.liquidusNow(), condenser.liquidusHighest(), condenser.freezesInTakeOff(),
        b.volume.map(b::minimumLevel), now.flask(), now.reservoir(), now.receiver(), now.collected(), now.leak(),
        feed.map(Feed::recovered), feed.map(Feed::stopsBoil).orElse(false), now.boilsFrom(), cooling(b, now, Limits.value("hand-warm-max", b.policy)).map(s -> Duration.ofSeconds((long) s.high())),
        cooling(b, now, b.boiling() - Limits.value("quiet-below-boiling-min", b.policy)), condenser.jacketWarmsIn(),
        WaterBudget.shortage(b), overfull(b), receiver(b), mantle(b), b.charge.foams(), fillLimit(b), b.charge);
  }

  /** Cold feeds so far: when the boil has made up for them, and whether they were so much that boiling must stop. */
  private record Feed(Instant recovered, boolean stopsBoil) {
    static Optional<Feed> last(Bench b, Optional<BoilUp> rate) {
      double net = BoilUp.net(b, rate).map(Band::nominal).orElse(0.0);
      if (b.run.feeds().isEmpty() || net <= 0) {
        return Optional.empty();
      }
      double from = b.parts.reservoir().flatMap(p -> p.si("temperature")).orElseGet(() -> Limits.value("feed-temperature"));
      Instant until = Instant.MIN;
      boolean stops = false;
      for (RunState.Amount f : b.run.feeds()) {
        // what an earlier feed still owes is added to the next one's debt
        Instant start = until.isAfter(f.at()) ? until : f.at();
        until = start.plusMillis((long) (1000 * ClosedVessel.reboil(f.si() * WaterSteam.COLD_DENSITY, from, b.boiling(), net)));
        stops = Duration.between(f.at(), until).toSeconds() > Limits.value("feed-stops-after");
      }
      return Optional.of(new Feed(until, stops));
    }
  }

  /** A standing flask, from the boil down to a temperature. */
  private static Optional<Band> cooling(Bench b, Progress now, double to) {
    if (b.volume.isEmpty() || now.flask().isEmpty()) {
      return Optional.empty();
    }
    Band capacity = Heat.capacity(b.charge, now.flask().get().high(), b.volume);
    return ClosedVessel.cooling(capacity, b.volume.get(), b.boiling(), to, b.room);
  }

  private static Optional<Double> fillLimit(Bench b) {
    return b.charge.foams().map(f -> Limits.value(f.equals("strongly") ? "flask-fill-max-foaming" : "flask-fill-max", b.policy));
  }

  private static Optional<SideFacts.Shortage> overfull(Bench b) {
    Optional<Double> limit = fillLimit(b);
    if (limit.isEmpty() || b.volume.isEmpty() || b.charge.water().isEmpty()) {
      return Optional.empty();
    }
    double content = b.charge.water().get() + b.charge.displaced().nominal();
    double allowed = limit.get() * b.volume.get();
    if (content <= allowed) {
      return Optional.empty();
    }
    return Optional.of(new SideFacts.Shortage(
        String.format(Locale.ROOT, "%.0f %% full, %.0f %% allowed for this charge", 100 * content / b.volume.get(), 100 * limit.get()),
        List.of(String.format(Locale.ROOT, "%.0f mL less in the flask", Math.ceil((content - allowed) * 1e6)),
            String.format(Locale.ROOT, "a flask of at least %.0f mL", Math.ceil(content / limit.get() * 1e6)))));
  }

  private static Optional<SideFacts.Shortage> receiver(Bench b) {
    Optional<Double> volume = b.parts.receiver().flatMap(p -> p.si("volume"));
    Optional<Double> target = b.rig.si("target.distillate");
    double factor = Limits.value("receiver-capacity-min", b.policy);
    if (volume.isEmpty() || target.isEmpty() || volume.get() >= factor * target.get()) {
      return Optional.empty();
    }
    return Optional.of(new SideFacts.Shortage(
        String.format(Locale.ROOT, "the receiver holds %.0f mL, %.0f mL are planned", volume.get() * 1e6, target.get() * 1e6),
        List.of(String.format(Locale.ROOT, "a receiver of at least %.0f mL", Math.ceil(factor * target.get() * 1e6)),
            String.format(Locale.ROOT, "target down to %.0f mL", Math.floor(volume.get() / factor * 1e6)))));
  }

  private static Optional<SideFacts.Fit> mantle(Bench b) {
    Optional<Double> fits = b.parts.heater().flatMap(h -> h.si("fits"));
    if (fits.isEmpty() || b.volume.isEmpty()) {
      return Optional.empty();
    }
    double ratio = fits.get() / b.volume.get();
    double allowed = Limits.value("mantle-fit-factor");
    Optional<Double> zone = b.parts.heater().flatMap(h -> h.si("heated-up-to"));
    List<String> why = new ArrayList<>();
    if (ratio > allowed || ratio < 1 / allowed) {
      why.add(String.format(Locale.ROOT, "the heater is made for %.0f mL, the flask holds %.0f mL", fits.get() * 1e6, b.volume.get() * 1e6));
    }
    if (zone.filter(z -> z > b.minimumLevel(b.volume.get())).isPresent()) {
      why.add("the heated zone reaches above the minimum level: dry glass is heated before the level is low");
    }
    return Optional.of(new SideFacts.Fit(why.isEmpty(), String.join("; ", why)));
  }
}
