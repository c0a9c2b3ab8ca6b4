package stillwarden.derive;

import java.util.List;

/** Ways to meet a failing figure, computed. */
public final class Changes {
  private Changes() {}

  /** Empty where the sign has no number behind it: then the hazard's page knows the right value. */
  public static List<Change> of(Situation s, Sign sign) {
    return List.of();
  }
}
