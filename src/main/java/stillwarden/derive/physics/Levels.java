package stillwarden.derive.physics;

import java.util.Optional;
import stillwarden.describe.Policy;

/**
 * What a level's word means in m3: an interval whose nominal value is its worse end (the lower of a flask or a
 * reservoir, the upper of a receiver). The thresholds are those of {@code rules/limits}.
 */
public final class Levels {
  private Levels() {}

  /** @param minimum level (water and solids) that the flask must not fall below, m3 */
  public static Optional<Band> flask(String word, double volume, double minimum, Policy policy) {
    double ok = minimum * Limits.value("low-level-factor", policy);
    double full = Math.max(ok, Limits.value("flask-full-share") * volume);
    return switch (word) {
      case "full" -> lower(full, volume);
      case "ok" -> lower(ok, full);
      case "low" -> lower(minimum, ok);
      case "nearly-dry" -> lower(0, minimum);
      case "dry" -> lower(0, 0);
      default -> Optional.empty();
    };
  }

  public static Optional<Band> reservoir(String word, double volume) {
    double full = Limits.value("reservoir-full-share") * volume;
    double low = Limits.value("reservoir-low-share") * volume;
    double nearly = Limits.value("nearly-empty-share") * volume;
    return switch (word) {
      case "full" -> lower(full, volume);
      case "ok" -> lower(low, full);
      case "low" -> lower(nearly, low);
      case "nearly-dry" -> lower(0, nearly);
      case "dry", "empty" -> lower(0, 0);
      default -> Optional.empty();
    };
  }

  public static Optional<Band> receiver(String word, double volume) {
    double full = Limits.value("receiver-full-share") * volume;
    double low = Limits.value("receiver-low-share") * volume;
    double nearly = Limits.value("nearly-empty-share") * volume;
    return switch (word) {
      case "full" -> upper(full, volume);
      case "ok" -> upper(low, full);
      case "low" -> upper(nearly, low);
      case "nearly-dry" -> upper(0, nearly);
      case "dry", "empty" -> upper(0, 0);
      default -> Optional.empty();
    };
  }

  /**
   * The lowest level a flask may be boiled down to, m3: its own mark, else a share of its volume, and never under
   * what covers the solids.
   */
  public static double minimum(double volume, Optional<Double> mark, double covers) {
    return Math.max(mark.orElseGet(() -> Limits.value("low-level-share") * volume), covers);
  }

  /** The word for a level in a flask. */
  public static String flaskWord(double level, double volume, double minimum, double solids, Policy policy) {
    double ok = minimum * Limits.value("low-level-factor", policy);
    if (level <= solids) {
      return "dry";
    }
    if (level < minimum) {
      return "nearly-dry";
    }
    return level < ok ? "low" : level < Math.max(ok, Limits.value("flask-full-share") * volume) ? "ok" : "full";
  }

  public static String reservoirWord(double level, double volume) {
    double share = level / volume;
    if (share <= 0) {
      return "empty";
    }
    if (share < Limits.value("nearly-empty-share")) {
      return "nearly-dry";
    }
    return share < Limits.value("reservoir-low-share") ? "low" : share < Limits.value("reservoir-full-share") ? "ok" : "full";
  }

  public static String receiverWord(double level, double volume) {
    double share = level / volume;
    if (share <= 0) {
      return "empty";
    }
    if (share < Limits.value("nearly-empty-share")) {
      return "nearly-dry";
    }
    return share < Limits.value("receiver-low-share") ? "low" : share < Limits.value("receiver-full-share") ? "ok" : "full";
  }

  private static Optional<Band> lower(double low, double high) {
    return Optional.of(new Band(low, low, high));
  }

  private static Optional<Band> upper(double low, double high) {
    return Optional.of(new Band(low, high, high));
  }
}
