package stillwarden.derive.physics;

import java.time.Instant;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Entry;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;

/** How much slower than ideal a charge gave up its oil: read off a finished run, to plan the next one of its kind. */
public final class Diffusion {
  private static final int LOOKS = 3;

  private Diffusion() {}

  /**
   * Water over when the distillate had stayed clear for three looks, over the ideal water; at least 1. Empty when the
   * log does not show that, or the oil of the rig is not known.
   *
   * @param finished usable lines of the finished run, sorted by time
   */
  public static Optional<Double> fitted(Rig rig, Policy policy, List<Entry> finished) {
    Optional<Instant> clear = firstOfClear(finished);
    if (clear.isEmpty()) {
      return Optional.empty();
    }
    Bench b = new Bench(rig, policy, finished, clear.get());
    Optional<Band> ideal = WaterBudget.ideal(b).filter(i -> i.nominal() > 0);
    Optional<Band> over = b.run.collected().isEmpty() ? Optional.empty() : Progress.of(b, BoilUp.of(b)).collected();
    return over.flatMap(v -> ideal.map(i -> Math.max(1, v.nominal() / i.nominal())));
  }

  /** The first of three clear looks in a row with nothing else between. */
  private static Optional<Instant> firstOfClear(List<Entry> finished) {
    List<Entry> looks = finished.stream().filter(e -> e.verb() == Entry.Verb.SAW && e.id().equals("distillate-look")).toList();
    for (int i = 0; i + LOOKS <= looks.size(); i++) {
      if (looks.subList(i, i + LOOKS).stream().allMatch(e -> e.text().equals("clear"))) {
        return Optional.of(looks.get(i).at());
      }
    }
    return Optional.empty();
  }
}
