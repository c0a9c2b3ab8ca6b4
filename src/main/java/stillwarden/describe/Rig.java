package stillwarden.describe;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;

/**
 * One described apparatus. What is left out is unknown: every accessor answers with an Optional.
 *
 * @param facts everything outside parts, joints and openings, by path: {@code place.elevation}, {@code charge.oil.makeup.limonene}
 * @param parts by the user's name, in file order
 * @param openings state of ports in no joint: {@code open, stoppered, capped, tube}
 * @param digest {@code sha256:...} of the resolved description, or empty for the one that its content gives
 */
public record Rig(
    String file,
    String name,
    String method,
    Map<String, Datum> facts,
    Map<String, Part> parts,
    List<Joint> joints,
    SortedMap<Port, Datum> openings,
    String digest) {

  /** Computed when asked for: most commands never do, and a hash is slow to start. */
  public String digest() {
    return digest.isEmpty() ? Digest.of(method, facts, parts, joints, openings) : digest;
  }

  public Optional<String> word(String path) {
    return datum(path).map(Datum::text);
  }

  /** The SI value at a path, part keys included ({@code flask.volume}). */
  public Optional<Double> si(String path) {
    return datum(path).flatMap(Datum::measured).map(Quantity::si);
  }

  public Optional<Datum> datum(String path) {
    Datum direct = facts.get(path);
    if (direct != null) {
      return Optional.of(direct);
    }
    int dot = path.indexOf('.');
    if (dot < 0) {
      return Optional.empty();
    }
    Part part = parts.get(path.substring(0, dot));
    return part == null ? Optional.empty() : Optional.ofNullable(part.keys().get(path.substring(dot + 1)));
  }

  /** True when the user says that every part and opening on the bench is in the file. */
  public boolean nothingElse() {
    return word("nothing-else").filter("yes"::equals).isPresent();
  }
}
