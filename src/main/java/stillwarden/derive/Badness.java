package stillwarden.derive;

import java.util.List;
import java.util.Map;
import java.util.Set;
import stillwarden.describe.Entry;
import stillwarden.describe.Observation;
import stillwarden.describe.Vocabulary;

/** Which of two looks at one thing is the worse, and which looks raise an alarm. */
final class Badness {
  /** Quantities of which less is worse; of all others more is. */
  private static final Set<String> LESS_IS_WORSE = Set.of("flask-level", "reservoir-level", "coolant-flow", "drip-rate", "face-velocity");
  /** How many of an observation's values, from the calm end, are no alarm; one where nothing is said. */
  private static final Map<String, Integer> CALM = Map.of("drip", 2, "boiling", 2, "foam", 2, "distillate-look", 4, "flask-level", 2, "reservoir-level", 2,
      "receiver-level", 5, "stopcock", 2, "part-feels", 2);

  private Badness() {}

  static double of(Entry e) {
    List<String> values = values(e);
    if (values.contains(e.text())) {
      return values.indexOf(e.text());
    }
    // not being sure is worse than calm and no worse than an alarm that was seen
    if (e.text().equals(Looks.NOT_SURE)) {
      return CALM.getOrDefault(e.id(), 1) - 0.5;
    }
    double si = e.measured().map(q -> q.si()).orElse(0.0);
    return LESS_IS_WORSE.contains(e.id()) ? -si : si;
  }

  static boolean alarming(Entry e) {
    return values(e).indexOf(e.text()) >= CALM.getOrDefault(e.id(), 1);
  }

  private static List<String> values(Entry e) {
    return Vocabulary.get().observation(e.id()).map(Observation::key).map(k -> k.values()).orElse(List.of());
  }
}
