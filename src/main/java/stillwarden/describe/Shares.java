package stillwarden.describe;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;

/** A map of names to shares of one whole, such as the makeup of an oil. */
record Shares(Key key, String path, Defects defects) {
  /** Shares are rounded where they come from; beyond this a sum over the whole is an error. */
  private static final double ROUNDING = 0.005;

  Map<String, Datum> read(Node n) {
    Map<String, Datum> out = new LinkedHashMap<>();
    if (!n.is(Node.Kind.MAP) || n.fields().isEmpty()) {
      defects.add(n.spot(), Words.quote(key.path()) + " takes names with their shares, for example `limonene: 8 %`; here is " + n.describe());
      return out;
    }
    n.fields().forEach(f -> share(f, out));
    double sum = out.values().stream().mapToDouble(d -> d.measured().orElseThrow().si()).sum();
    if (sum > 1 + ROUNDING) {
      defects.add(n.spot(), Words.quote(key.path()) + " adds up to " + Math.round(sum * 1000) / 10.0 + " %; no more than 100 % can be");
    }
    return out;
  }

  private void share(Node.Field f, Map<String, Datum> out) {
    List<String> known = Values.listed(key.list());
    Optional<String> slip = known.contains(f.key()) ? Optional.empty() : known.stream().filter(k -> Words.distance(f.key(), k) == 1).findFirst();
    if (slip.isPresent()) {
      // one letter off is a slip; a name that is simply not listed counts as a constituent of unknown volatility
      defects.add(f.spot(), Words.quote(f.key()) + " is not in the list of " + key.list() + "; nearest is " + Words.quote(slip.get()));
      return;
    }
    try {
      out.put(f.key(), Values.read(share(f.key()), path + "." + f.key(), f.value()));
    } catch (BadValue e) {
      defects.add(f.value().spot(), e.getMessage());
    }
  }

  private static Key share(String name) {
    return new Key(name, Key.Type.QUANTITY, List.of(), Optional.of(Dimension.FRACTION), List.of("%"), OptionalDouble.of(0), OptionalDouble.of(1), false, "",
        "share of the whole");
  }
}
