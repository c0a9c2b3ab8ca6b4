package stillwarden.describe;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/** Collects everything that is wrong with an input, so that one look at the message mends the whole file. */
final class Defects {
  /** A hostile file shall not print for ever. */
  private static final int MOST = 200;

  private final List<Defect> found = new ArrayList<>();

  /** One fault a place: what follows from the first one there is no news. */
  void add(Spot spot, String message) {
    boolean told = spot.line() > 0 && found.stream().anyMatch(d -> d.spot().equals(spot));
    if (found.size() < MOST && !told) {
      found.add(new Defect(spot, message));
    }
  }

  /** True when no more would be told: then looking for the nearest word is work for nothing. */
  boolean full() {
    return found.size() >= MOST;
  }

  void throwIfAny() throws Unusable {
    if (!found.isEmpty()) {
      throw unusable();
    }
  }

  Unusable unusable() {
    List<Defect> sorted = new ArrayList<>(found);
    sorted.sort(
        Comparator.comparing((Defect d) -> d.spot().file())
            .thenComparing(d -> d.spot().line())
            .thenComparing(d -> d.spot().column()));
    return new Unusable(sorted);
  }

  List<Defect> all() {
    return List.copyOf(found);
  }
}
