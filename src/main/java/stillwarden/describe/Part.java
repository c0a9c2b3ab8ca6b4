package stillwarden.describe;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * One piece on the bench.
 *
 * @param name the user's own
 * @param kind a word of the closed list, or {@code none}: there is none of it
 * @param keys nested keys joined by dots: {@code coolant.supply}
 */
public record Part(String name, String kind, Map<String, Datum> keys) {
  public Part {
    keys = Collections.unmodifiableMap(new LinkedHashMap<>(keys));
  }

  public Optional<String> word(String key) {
    return Optional.ofNullable(keys.get(key)).map(Datum::text);
  }

  /** The SI value of a key that takes a quantity. */
  public Optional<Double> si(String key) {
    return Optional.ofNullable(keys.get(key)).flatMap(Datum::measured).map(Quantity::si);
  }
}
