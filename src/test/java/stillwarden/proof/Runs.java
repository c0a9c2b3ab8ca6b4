package stillwarden.proof;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.SplittableRandom;
import java.util.TreeMap;
import stillwarden.describe.LogReader;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RigReader;
import stillwarden.describe.RunLog;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import stillwarden.rulebook.Rulebook;

/** Random logs of a run on the demo rig, through the real readers and the whole chain. */
final class Runs {
  static final Path GOOD = Path.of("demo-data", "rigs", "fennel-bench.rig.yaml");
  static final Instant START = Instant.parse("2026-05-12T09:00:00Z");
  static final Set<String> CUTS = Set.of("cut-power", "isolate-remote", "isolate-auto", "close-gas");
  private static final Map<String, List<String>> SAW = words();
  /** A good run's looks. */
  private static final String[][] CALM = {
      {"path", "open"}, {"foam", "none"}, {"hood", "running"}, {"tip", "clear"}, {"coolant-running", "yes"}, {"reservoir-level", "200 mL"}, {"condenser-solids", "none"},
      {"vapour-past-condenser", "none"}, {"boiling", "gentle"}, {"drip", "drops"}, {"head-temperature", "98.5 Cel"}, {"flask-level", "350 mL"}, {"receiver-level", "60 mL"}};
  private static final String[][] NUMBERS = {
      {"head-temperature", "99.5 Cel"}, {"head-temperature", "104 Cel"}, {"head-temperature", "80 Cel"}, {"flask-level", "180 mL"}, {"flask-level", "120 mL"}, {"receiver-level", "240 mL"},
      {"reservoir-level", "20 mL"}, {"distillate-temperature", "65 Cel"}, {"flask-temperature", "104 Cel"}, {"coolant-outlet-temperature", "50 Cel"}, {"barometer", "98.4 kPa"},
      {"heater-power", "0 W"}, {"pressure", "0 kPa"}, {"pressure", "3 kPa"}, {"room-temperature", "15 Cel"}, {"jacket-temperature", "70 Cel"}, {"drip-rate", "60 /min"}};
  private static final String[] DEEDS = {"feed", "coolant-on", "coolant-stop", "swap-receiver", "refill-reservoir", "reduce-heat", "lower-heat", "cut-power", "close-feed", "lower-receiver", "end-run", "sash-down"};

  /** One line of a log. */
  record Line(Instant at, String verb, String id, String value) {
    String json() {
      return "{\"at\":\"" + at + "\",\"by\":\"mr\",\"" + verb + "\":\"" + id + "\"" + (value.isEmpty() ? "" : ",\"value\":\"" + value + "\"") + "}";
    }

    @Override
    public String toString() {
      return at.toString().substring(11, 19) + " " + verb + " " + id + (value.isEmpty() ? "" : " " + value);
    }
  }

  private Runs() {}

  /** What the log's own words can be, later methods aside. */
  private static Map<String, List<String>> words() {
    Map<String, List<String>> out = new TreeMap<>();
    Map<String, List<String>> domains = Rulebook.domains();
    ((Map<?, ?>) Rulebook.yaml("rules/words/log.yaml").get("saw")).forEach((id, key) -> {
      Map<?, ?> k = (Map<?, ?>) key;
      if (!k.containsKey("later") && (k.containsKey("values") || "tri".equals(k.get("type")))) {
        List<String> values = k.get("values") instanceof List<?> v ? v.stream().map(String::valueOf).toList() : "yes".equals(k.get("calm")) ? List.of("yes", "no") : List.of("no", "yes");
        out.put(id.toString(), values);
      }
    });
    domains.keySet().retainAll(out.keySet());
    return out;
  }

  static List<String> values(String id) {
    return SAW.getOrDefault(id, List.of());
  }

  /** Heat on, half an hour of good looks, then anything; {@code deeds} whether people also do things. */
  static List<Line> draw(SplittableRandom r, boolean deeds) {
    List<Line> out = new ArrayList<>();
    out.add(new Line(START, "did", "heat-on", "60 %"));
    Instant t = START.plusSeconds(20 * 60);
    out.add(new Line(t, "saw", "first-drop", ""));
    for (int round = 0; round < 5; round++) {
      t = t.plusSeconds(60 + r.nextInt(120));
      for (String[] look : CALM) {
        out.add(new Line(t, "saw", look[0], look[1]));
      }
    }
    for (int n = 1 + r.nextInt(7); n > 0; n--) {
      t = t.plusSeconds(r.nextInt(3) == 0 ? 0 : r.nextInt(240));
      out.add(any(t, r, deeds));
    }
    return out;
  }

  private static Line any(Instant t, SplittableRandom r, boolean deeds) {
    int how = r.nextInt(10);
    if (how < 2) {
      String[] n = NUMBERS[r.nextInt(NUMBERS.length)];
      return new Line(t, "saw", n[0], n[1]);
    }
    if (how < 4 && deeds) {
      return new Line(t, "did", DEEDS[r.nextInt(DEEDS.length)], "");
    }
    List<String> ids = List.copyOf(SAW.keySet());
    String id = ids.get(r.nextInt(ids.size()));
    List<String> values = SAW.get(id);
    return new Line(t, "saw", id, r.nextInt(12) == 0 ? "not-sure" : values.get(r.nextInt(values.size())));
  }

  static RunLog log(List<Line> lines) throws Unusable {
    StringBuilder b = new StringBuilder();
    lines.forEach(l -> b.append(l.json()).append('\n'));
    return LogReader.read(new ByteArrayInputStream(b.toString().getBytes(StandardCharsets.UTF_8)), "drawn.run.jsonl");
  }

  static Rig good() throws Unusable {
    return RigReader.read(GOOD);
  }

  /** The demo rig's text, changed. */
  static Rig rig(Path folder, java.util.function.UnaryOperator<String> change) throws IOException, Unusable {
    Path file = folder.resolve("changed.rig.yaml");
    Files.writeString(file, change.apply(Files.readString(GOOD)));
    return RigReader.read(file);
  }

  static Instant last(List<Line> lines) {
    return lines.stream().map(Line::at).max(Instant::compareTo).orElseThrow();
  }

  static Advice whole(Rig rig, List<Line> lines, Instant at) throws Unusable {
    return Advisor.whole(rig, Policy.NONE, log(lines), Optional.of(at(at)));
  }

  static OffsetDateTime at(Instant t) {
    return t.atOffset(ZoneOffset.UTC);
  }

  /** Rank of the gravest signal word: -1 for none. */
  static int gravest(Advice a) {
    List<String> words = List.of("NOTICE", "CAUTION", "WARNING", "DANGER");
    return a.actions().stream().mapToInt(x -> words.indexOf(x.signal())).max().orElse(-1);
  }

  static boolean cuts(Advice a) {
    return a.actions().stream().anyMatch(x -> CUTS.contains(x.act()) && x.iff().isEmpty());
  }

  static List<String> ids(Advice a) {
    return a.actions().stream().map(Advice.Action::act).toList();
  }
}
