package stillwarden.derive;

import java.time.Duration;
import stillwarden.describe.Observation;
import stillwarden.describe.Policy;
import stillwarden.describe.Vocabulary;

/** Shelf lives of looks: the vocabulary's, or the site's where shorter. */
final class Shelves {
  private Shelves() {}

  static Duration of(Policy policy, String id) {
    Duration own = Vocabulary.get().observation(id).flatMap(Observation::shelf).orElse(Duration.ofMinutes(5));
    Duration site = policy.shelfLife().get(id);
    return site != null && site.compareTo(own) < 0 ? site : own;
  }

  /** The smaller of a look's shelf life and a quarter of a computed time. */
  static Duration quarter(Policy policy, String id, Duration computed) {
    Duration own = of(policy, id);
    Duration quarter = computed.dividedBy(4);
    return quarter.compareTo(own) < 0 ? quarter : own;
  }
}
