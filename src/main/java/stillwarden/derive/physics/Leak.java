package stillwarden.derive.physics;

import java.time.Instant;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** An impossible water balance is a finding of its own. */
final class Leak {
  private Leak() {}

  /** More water gone than the power could have boiled is a leak, a wrong entry or a wrong rig file. */
  static Optional<String> suspected(Bench b, Optional<Band> heatUp, Optional<Band> collected) {
    if (b.run.flask().isEmpty() || b.volume.isEmpty() || b.heat.isEmpty() || b.charge.water().isEmpty() || b.run.heatSince().isEmpty()) {
      return Optional.empty();
    }
    RunState.Look look = b.run.flask().get();
    Band error = Band.of(Limits.value("level-reading-error") * b.volume.get());
    Optional<Band> seen = look.volume().map(Band::of).or(() -> Levels.flask(look.word(), b.volume.get(), b.minimumLevel(b.volume.get()), b.policy));
    if (seen.isEmpty()) {
      return Optional.empty();
    }
    double fed = b.run.fed() - b.run.fedSince(look.at());
    double gone = b.charge.water().get() + b.charge.displaced().low() + fed - b.charge.uptake().high() - seen.get().high() - error.high();
    double most = b.heat.get().full().high() * seconds(b, heatUp, look.at()) / WaterSteam.latentHeat(b.boiling()) / WaterSteam.BOILING_DENSITY;
    if (gone <= most) {
      return Optional.empty();
    }
    List<String> why = new ArrayList<>();
    boolean cameOver = collected.filter(c -> !b.run.collected().isEmpty() && c.high() >= Limits.value("came-over-share") * gone).isPresent();
    why.add(String.format(Locale.ROOT, "%.0f mL are gone from the flask, the heater could have boiled at most %.0f mL", gone * 1e6, most * 1e6));
    why.add(cameOver ? "as much came over: the power in the rig file or the time of heat-on is wrong" : "not in the receiver: a leak or a wrong entry");
    return Optional.of(String.join("; ", why));
  }

  private static double seconds(Bench b, Optional<Band> heatUp, Instant look) {
    Instant start = b.run.boilingSince().orElseGet(() -> b.run.heatSince().get().plusMillis((long) (1000 * heatUp.map(Band::low).orElse(0.0))));
    return Math.max(0, (look.toEpochMilli() - start.toEpochMilli()) / 1000.0);
  }
}
