package stillwarden.describe;

import java.math.BigDecimal;
import java.math.MathContext;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * {@code sha256:...} of what a description says: the same for another order of keys, other comments, {@code 0.45 L} for
 * {@code 450 mL}, and the same on every machine.
 */
final class Digest {
  private static final MathContext NINE_DIGITS = new MathContext(9);

  private Digest() {}

  static String of(String method, Map<String, Datum> facts, Map<String, Part> parts, List<Joint> joints, Map<Port, Datum> openings) {
    TreeMap<String, String> lines = new TreeMap<>();
    lines.put("method", method);
    facts.forEach((path, d) -> lines.put("fact " + path, value(d)));
    parts.values().forEach(p -> {
      lines.put("part " + p.name(), p.kind());
      p.keys().forEach((key, d) -> lines.put("part " + p.name() + "." + key, value(d)));
    });
    joints.forEach(j -> {
      lines.put(j.path(), j.toString());
      j.keys().forEach((key, d) -> lines.put(j.path() + "." + key, value(d)));
    });
    openings.forEach((port, d) -> lines.put("opening " + port, value(d)));
    return of(lines);
  }

  /** Each text with its length before it, so that no value can pass for two lines. */
  static String of(TreeMap<String, String> lines) {
    StringBuilder b = new StringBuilder();
    lines.forEach((k, v) -> b.append(k.length()).append(' ').append(k).append(' ').append(v.length()).append(' ').append(v).append('\n'));
    try {
      byte[] hash = MessageDigest.getInstance("SHA-256").digest(b.toString().getBytes(StandardCharsets.UTF_8));
      return "sha256:" + HexFormat.of().formatHex(hash);
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java has SHA-256", e);
    }
  }

  /** Quantities by their SI value to nine digits: more would tell `450 mL` from `0.45 L`. */
  static String value(Datum d) {
    return d.measured().map(q -> number(q.si()) + " " + q.dimension().si()).orElse(d.text());
  }

  static String number(double si) {
    return new BigDecimal(si).round(NINE_DIGITS).stripTrailingZeros().toString();
  }
}
