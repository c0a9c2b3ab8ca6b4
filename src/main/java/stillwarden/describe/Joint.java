package stillwarden.describe;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;

/**
 * Two ports put together.
 *
 * @param index place in the rig file's list, from 0; its path is {@code joints[index]}
 * @param keys what is known of it: {@code size, greased, grease, clipped, held-by, clip, seated, chipped}
 */
public record Joint(int index, Port a, Port b, Map<String, Datum> keys) {
  public Joint {
    keys = Collections.unmodifiableMap(new LinkedHashMap<>(keys));
  }

  public Optional<String> word(String key) {
    return Optional.ofNullable(keys.get(key)).map(Datum::text);
  }

  public String path() {
    return "joints[" + index + "]";
  }

  @Override
  public String toString() {
    return a + " + " + b;
  }
}
