package stillwarden.order;

import java.time.Duration;
import java.util.List;
import java.util.Optional;
import stillwarden.derive.Estimate;
import stillwarden.derive.Situation;
import stillwarden.judge.Finding;

/** How soon each deed is due, from the most urgent hazard behind it and the computed time to harm. */
final class Deadlines {
  private static final Duration FIRST = Duration.ofSeconds(5);
  private static final Duration MINUTE = Duration.ofMinutes(1);
  private static final Duration MOST = Duration.ofMinutes(10);
  private static final Duration DEFAULT = Duration.ofMinutes(5);

  private final Situation situation;

  Deadlines(Situation situation) {
    this.situation = situation;
  }

  /**
   * @param first is this the first equipment step
   * @param behindWait does it stand behind a wait
   */
  Optional<Duration> of(Step s, boolean first, boolean behindWait) {
    if (behindWait || s.deed.waits() || s.deed.cold() || !s.behind.isEmpty()) {
      return Optional.empty();
    }
    Optional<Duration> shortest = Optional.empty();
    for (Finding f : s.reasons) {
      Optional<Duration> d = of(f, first);
      if (d.isPresent() && shortest.filter(x -> x.compareTo(d.get()) <= 0).isEmpty()) {
        shortest = d;
      }
    }
    return shortest;
  }

  private Optional<Duration> of(Finding f, boolean first) {
    return switch (Hazards.urgency(f)) {
      case "seconds" -> Optional.of(first ? FIRST : MINUTE);
      case "minutes" -> Optional.of(minutes(f, first));
      default -> Optional.empty();
    };
  }

  private Duration minutes(Finding f, boolean first) {
    Optional<Duration> harm = timeToHarm(f);
    if (harm.isEmpty()) {
      return DEFAULT;
    }
    if (harm.get().compareTo(MINUTE) < 0) {
      return first ? FIRST : MINUTE;
    }
    Duration half = harm.get().dividedBy(2);
    return half.compareTo(MOST) < 0 ? half : MOST;
  }

  /** The low end of the number that the hazard's page names. */
  Optional<Duration> timeToHarm(Finding f) {
    String name = Hazards.speaking(f).timeToHarm();
    if (name.isEmpty() || !situation.numbers().all().containsKey(name)) {
      return Optional.empty();
    }
    Estimate e = situation.numbers().get(name);
    return e.known() ? Optional.of(Duration.ofMillis(Math.round(Math.min(e.low(), 1e6) * (e.unit().equals("s") ? 1000 : 60_000)))) : Optional.empty();
  }

  double secondsToHarm(List<Finding> reasons) {
    return reasons.stream().flatMap(f -> timeToHarm(f).stream()).mapToDouble(d -> d.toMillis() / 1000.0).min().orElse(Double.MAX_VALUE);
  }
}
