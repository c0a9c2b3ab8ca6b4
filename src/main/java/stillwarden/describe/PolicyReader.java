package stillwarden.describe;

import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.regex.Pattern;

/** Reads a site policy: a site may tighten our limits; loosening one needs a waiver, and none where life is guarded. */
public final class PolicyReader {
  private static final List<String> OWN = List.of("format", "contacts", "limits", "permits", "shelf-life", "waivers");
  private static final Pattern BARE = Pattern.compile("(0|[1-9][0-9]{0,5})(\\.[0-9]{1,9})?");
  private static final Pattern CONTACT = Pattern.compile("[\\p{L}\\p{N}][\\p{L}\\p{N} _-]{0,39}");

  private final Vocabulary words = Vocabulary.get();
  private final Defects defects = new Defects();
  private final Map<String, Double> limits = new LinkedHashMap<>();
  private final Map<String, String> limitWords = new LinkedHashMap<>();

  private PolicyReader() {}

  /** @throws Unusable with every defect */
  public static Policy read(Path file) throws Unusable {
    PolicyReader reader = new PolicyReader();
    Node root = Documents.read(file, reader.defects);
    Documents.format(root, "stillwarden/policy/1", reader.defects);
    Policy policy = reader.policy(file, root);
    reader.defects.throwIfAny();
    return policy;
  }

  private Policy policy(Path file, Node root) {
    Node rest = root;
    for (String own : OWN) {
      rest = rest.without(own);
    }
    Map<String, Datum> facts = new Section(words.policyFacts(), "a policy file", "", OWN, defects).read(rest);
    List<Policy.Waiver> waivers = root.get("waivers").map(this::waivers).orElse(List.of());
    group(root, "limits").forEach(f -> limit(f, waivers));
    Map<String, Boolean> permits = permits(root);
    Map<String, Duration> shelf = new LinkedHashMap<>();
    group(root, "shelf-life").forEach(f -> shelf(f, shelf));
    Map<String, String> contacts = contacts(root);
    String digest = digest(facts, contacts, permits, shelf, waivers);
    return new Policy(file.toString(), text(facts, "site").orElse(""), contacts, limits, limitWords, permits, text(facts, "coolant"), shelf, waivers, digest);
  }

  private static Optional<String> text(Map<String, Datum> facts, String key) {
    return Optional.ofNullable(facts.get(key)).map(Datum::text);
  }

  private List<Node.Field> group(Node root, String key) {
    Node n = root.get(key).orElse(null);
    if (n != null && !n.is(Node.Kind.MAP)) {
      defects.add(n.spot(), Words.quote(key) + " takes keys with values, here is " + n.describe());
    }
    return n == null ? List.of() : n.fields();
  }

  private Map<String, Boolean> permits(Node root) {
    Map<String, Boolean> out = new LinkedHashMap<>();
    Node group = Node.map(group(root, "permits"), root.spot(), false);
    new Section(words.permits(), "`permits`", "permits.", defects).read(group).forEach((k, d) -> out.put(k, d.text().equals("yes")));
    return out;
  }

  private Map<String, String> contacts(Node root) {
    Map<String, String> out = new LinkedHashMap<>();
    for (Node.Field f : group(root, "contacts")) {
      if (!CONTACT.matcher(f.key()).matches() || !f.value().isText()) {
        defects.add(f.value().spot(), Words.quote(f.key()) + ": words are wanted, for example \"ext. 17\"; here is " + f.value().describe());
      } else {
        out.put(f.key(), f.value().text());
      }
    }
    return out;
  }

  private void limit(Node.Field f, List<Policy.Waiver> waivers) {
    SiteLimits.Limit limit = SiteLimits.all().get(f.key());
    if (limit == null) {
      String hint = words.permits().containsKey(f.key()) ? "; it belongs under `permits`" : Words.hint(f.key(), SiteLimits.all().keySet());
      defects.add(f.spot(), "unknown limit " + Words.quote(f.key()) + (hint.isEmpty() ? "; known are " + Words.list(SiteLimits.all().keySet()) : hint));
      return;
    }
    try {
      if (limit.words().isEmpty()) {
        number(f, limit, waivers);
      } else {
        limitWords.put(f.key(), word(f, limit.words()));
      }
    } catch (BadValue e) {
      defects.add(f.value().spot(), e.getMessage());
    }
  }

  private static String word(Node.Field f, List<String> known) throws BadValue {
    if (f.value().isText() && known.contains(f.value().text())) {
      return f.value().text();
    }
    throw new BadValue(f.value().describe() + " for " + Words.quote(f.key()) + ": one of " + Words.list(known) + " is wanted" + Words.hint(f.value().text(), known));
  }

  private void number(Node.Field f, SiteLimits.Limit limit, List<Policy.Waiver> waivers) throws BadValue {
    double si = si(f, limit);
    boolean waived = waivers.stream().anyMatch(w -> w.limit().equals(f.key()));
    if (limit.looser(si) && !waived) {
      String here = SiteLimits.spoken(limit, limit.value().orElseThrow());
      throw new BadValue(Words.quote(f.value().text()) + " for " + Words.quote(f.key()) + " is looser than " + here + ", which holds without a policy"
          + (limit.danger() ? "; it guards life and takes no waiver" : "; loosening it needs an entry in `waivers`"));
    }
    limits.put(f.key(), si);
  }

  private static double si(Node.Field f, SiteLimits.Limit limit) throws BadValue {
    Node n = f.value();
    if (!n.isScalar() || n.is(Node.Kind.EMPTY)) {
      throw new BadValue(Words.quote(f.key()) + " has no value; leave the key out where the default shall hold");
    }
    double si;
    if (limit.dimension().orElseThrow() == Dimension.COUNT) {
      si = BARE.matcher(n.text()).matches() ? Double.parseDouble(n.text()) : factor(f);
    } else {
      si = measured(f, limit.dimension().get());
    }
    if (si < 0) {
      throw new BadValue(Words.quote(n.text()) + " for " + Words.quote(f.key()) + " is less than zero");
    }
    return si;
  }

  private static double factor(Node.Field f) throws BadValue {
    try {
      return Units.read(f.value().text(), Dimension.FRACTION, List.of("%")).si();
    } catch (BadValue e) {
      throw new BadValue(Words.quote(f.value().text()) + " for " + Words.quote(f.key()) + ": a factor is wanted, for example `1.5` or `150 %`");
    }
  }

  private static double measured(Node.Field f, Dimension d) throws BadValue {
    try {
      return Units.read(f.value().text(), d).si();
    } catch (BadValue e) {
      throw new BadValue(Words.quote(f.key()) + ": " + e.getMessage());
    }
  }

  private void shelf(Node.Field f, Map<String, Duration> out) {
    Optional<Duration> ours = words.observation(f.key()).flatMap(Observation::shelf);
    if (ours.isEmpty()) {
      List<String> known = words.observations().values().stream().filter(o -> o.shelf().isPresent()).map(Observation::id).toList();
      defects.add(f.spot(), "unknown look " + Words.quote(f.key()) + " in `shelf-life`; known are " + Words.list(known));
      return;
    }
    try {
      Duration said = Duration.ofMillis(Math.round(measured(f, Dimension.TIME) * 1000));
      if (said.isNegative() || said.isZero() || said.compareTo(ours.get()) > 0) {
        throw new BadValue(Words.quote(f.value().text()) + " for " + Words.quote(f.key()) + ": a site may only shorten it, and not to nothing; it is "
            + ours.get().toSeconds() / 60.0 + " min");
      }
      out.put(f.key(), said);
    } catch (BadValue e) {
      defects.add(f.value().spot(), e.getMessage());
    }
  }

  private List<Policy.Waiver> waivers(Node list) {
    List<Policy.Waiver> out = new ArrayList<>();
    if (!list.is(Node.Kind.LIST)) {
      defects.add(list.spot(), "`waivers` takes a list, here is " + list.describe());
    }
    list.items().forEach(n -> waiver(n).ifPresent(out::add));
    return List.copyOf(out);
  }

  private Optional<Policy.Waiver> waiver(Node n) {
    Map<String, Datum> w = new Section(words.waiver(), "a waiver", "waivers.", defects).read(n);
    for (String key : words.waiver().keySet()) {
      if (n.get(key).isEmpty()) {
        defects.add(n.spot(), "a waiver needs " + Words.list(words.waiver().keySet()) + "; here `" + key + "` is missing");
      }
    }
    if (w.size() < words.waiver().size()) {
      return Optional.empty();
    }
    Datum named = w.get("limit");
    SiteLimits.Limit limit = SiteLimits.all().get(named.text());
    if (limit == null) {
      defects.add(named.spot(), "unknown limit " + Words.quote(named.text()) + Words.hint(named.text(), SiteLimits.all().keySet()));
    } else if (limit.danger()) {
      defects.add(named.spot(), Words.quote(named.text()) + " guards life (" + limit.guards() + ") and takes no waiver");
    }
    return Optional.of(new Policy.Waiver(named.text(), w.get("who").text(), w.get("why").text(), w.get("until").text()));
  }

  private String digest(Map<String, Datum> facts, Map<String, String> contacts, Map<String, Boolean> permits, Map<String, Duration> shelf, List<Policy.Waiver> waivers) {
    TreeMap<String, String> lines = new TreeMap<>(limitWords);
    facts.forEach((k, d) -> lines.put("fact " + k, d.text()));
    contacts.forEach((k, v) -> lines.put("contact " + k, v));
    limits.forEach((k, v) -> lines.put("limit " + k, Digest.number(v)));
    permits.forEach((k, v) -> lines.put("permits " + k, v.toString()));
    shelf.forEach((k, v) -> lines.put("shelf " + k, v.toString()));
    waivers.forEach(w -> lines.put("waiver " + w, ""));
    return Digest.of(lines);
  }
}
