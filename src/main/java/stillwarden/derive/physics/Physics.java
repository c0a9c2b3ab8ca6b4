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
  private Physics() {}

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
    Numbers.Out out = new Numbers.Out();
    BoilingNumbers.put(b, out);
    TimeNumbers.put(b, rate, now, out);
    CondenserNumbers condenser = CondenserNumbers.put(b, rate, now, out);
    PressureNumbers.put(b, rate, now, out);
    return new Worked(b, rate, now, condenser.choice(), out.with(facts(b, now, condenser)));
  }

  private static SideFacts facts(Bench b, Progress now, CondenserNumbers condenser) {
    Optional<Feed> feed = Feed.last(b);
    return new SideFacts(
        b.atmosphere, b.charge.oil(), b.immiscible, BoilingNumbers.hardlyVolatile(b), b.two.map(TwoLiquids::unknown).orElse(List.of()),
        condenser.verdict(), condenser.choice(), condenser.liquidusNow(), condenser.liquidusHighest(), condenser.freezesInTakeOff(),
        b.volume.map(b::minimumLevel), now.flask(), now.reservoir(), now.receiver(), now.collected(), now.leak(),
        feed.map(Feed::recovered), feed.map(Feed::stopsBoil).orElse(false), now.boilsFrom(), cooling(b, now), condenser.jacketWarmsIn(),
        WaterBudget.shortage(b), mantle(b), b.charge.foams(), fillLimit(b), b.charge);
  }

  /** The last cold feed: when the boil has made up for it, and whether it was so much that boiling must stop. */
  private record Feed(Instant recovered, boolean stopsBoil) {
    static Optional<Feed> last(Bench b) {
      List<RunState.Amount> feeds = b.run.feeds();
      double net = b.heat.map(h -> h.net().nominal()).orElse(0.0);
      if (feeds.isEmpty() || net <= 0) {
        return Optional.empty();
      }
      RunState.Amount last = feeds.get(feeds.size() - 1);
      double from = Roles.reservoir(b.rig).flatMap(p -> p.si("temperature")).orElseGet(() -> Limits.value("feed-temperature"));
      double seconds = ClosedVessel.reboil(last.volume() * 998, from, b.boiling(), net);
      // one quarter of a check interval's heat taken by the feed still boils on; more stops it for a time
      boolean stops = seconds > Limits.value("feed-share") * 60;
      return Optional.of(new Feed(last.at().plusMillis((long) (1000 * seconds)), stops));
    }
  }

  private static Optional<Duration> cooling(Bench b, Progress now) {
    if (b.volume.isEmpty() || now.flask().isEmpty()) {
      return Optional.empty();
    }
    Band capacity = Heat.capacity(b.charge, now.flask().get().high(), b.volume);
    return ClosedVessel.cooling(capacity, b.volume.get(), b.boiling(), Limits.value("hand-warm-max", b.policy), b.room)
        .map(s -> Duration.ofSeconds((long) s.high()));
  }

  private static Optional<Double> fillLimit(Bench b) {
    return b.charge.foams().map(f -> Limits.value(f.equals("strongly") ? "flask-fill-max-foaming" : "flask-fill-max", b.policy));
  }

  private static Optional<SideFacts.Fit> mantle(Bench b) {
    Optional<Double> fits = Roles.heater(b.rig).flatMap(h -> h.si("fits"));
    if (fits.isEmpty() || b.volume.isEmpty()) {
      return Optional.empty();
    }
    double ratio = fits.get() / b.volume.get();
    double allowed = Limits.value("mantle-fit-factor");
    Optional<Double> zone = Roles.heater(b.rig).flatMap(h -> h.si("heated-up-to"));
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
