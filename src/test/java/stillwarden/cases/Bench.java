package stillwarden.cases;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import stillwarden.describe.LogReader;
import stillwarden.describe.Policy;
import stillwarden.describe.PolicyReader;
import stillwarden.describe.Rig;
import stillwarden.describe.RigReader;
import stillwarden.describe.RunLog;
import stillwarden.describe.Unusable;

/** Makes the rig, the policy and the log of one case, as files read by the real readers. */
final class Bench {
  static final Path GOOD = Path.of("demo-data", "rigs", "fennel-bench.rig.yaml");
  static final Instant HEAT_ON = Instant.parse("2026-05-12T09:00:00Z");
  private static final int FIRST_DROP = 20;
  private static final Pattern LINE = Pattern.compile("([\\d.]+)\\s+(saw|did)\\s+(\\S+)\\s*(.*)");
  private static final Set<String> ENDS = Set.of("cut-power", "isolate-remote", "isolate-auto", "close-gas");

  private Bench() {}

  static Rig rig(Map<String, Object> changes, Path folder) throws IOException, Unusable {
    @SuppressWarnings("unchecked")
    Map<String, Object> tree = CaseFile.YAML.readValue(Files.readString(GOOD), Map.class);
    changes.forEach((path, value) -> change(tree, path, value));
    Path file = folder.resolve("case.rig.yaml");
    Files.writeString(file, CaseFile.YAML.writeValueAsString(tree));
    return RigReader.read(file);
  }

  static Policy policy(Map<String, Object> changes, Path folder) throws IOException, Unusable {
    if (changes.isEmpty()) {
      return Policy.NONE;
    }
    Map<String, Object> tree = new LinkedHashMap<>();
    tree.put("format", "stillwarden/policy/1");
    tree.put("site", "case");
    changes.forEach((path, value) -> put(tree, path.split("\\."), 0, value));
    Path file = folder.resolve("case.policy.yaml");
    Files.writeString(file, CaseFile.YAML.writeValueAsString(tree));
    return PolicyReader.read(file);
  }

  /** A path by part name, {@code joints[3].key}, or {@code openings.part.port}; {@code absent} leaves it out. */
  @SuppressWarnings("unchecked")
  private static void change(Map<String, Object> tree, String path, Object value) {
    if (path.equals("joints")) {
      put(tree, new String[] {"joints"}, 0, value);
      return;
    }
    Matcher whole = Pattern.compile("joints\\[(\\d+)\\]").matcher(path);
    if (whole.matches() && "absent".equals(value)) {
      ((List<Object>) tree.get("joints")).remove(Integer.parseInt(whole.group(1)));
      return;
    }
    Matcher joint = Pattern.compile("joints\\[(\\d+)\\]\\.(.+)").matcher(path);
    if (joint.matches()) {
      put((Map<String, Object>) ((List<Object>) tree.get("joints")).get(Integer.parseInt(joint.group(1))), new String[] {joint.group(2)}, 0, value);
      return;
    }
    if (path.startsWith("openings.")) {
      put(tree, new String[] {"openings", path.substring("openings.".length())}, 0, value);
      return;
    }
    String[] steps = path.split("\\.");
    boolean section = Set.of("place", "charge", "target", "people", "emergency", "seen", "nothing-else", "parts", "name").contains(steps[0]);
    if (section) {
      put(tree, steps, 0, value);
    } else if (steps.length == 1) {
      put((Map<String, Object>) tree.get("parts"), steps, 0, value);
    } else {
      put((Map<String, Object>) tree.get("parts"), steps, 0, value);
    }
  }

  @SuppressWarnings("unchecked")
  private static void put(Map<String, Object> at, String[] steps, int i, Object value) {
    if (i == steps.length - 1) {
      if ("absent".equals(value)) {
        at.remove(steps[i]);
      } else {
        at.put(steps[i], value);
      }
      return;
    }
    put((Map<String, Object>) at.computeIfAbsent(steps[i], k -> new LinkedHashMap<>()), steps, i + 1, value);
  }

  /** One written line of a case. */
  record Line(double minute, String verb, String id, String value, Map<String, String> more) {
    Instant at() {
      return HEAT_ON.plusMillis(Math.round(minute * 60_000));
    }

    String json() {
      StringBuilder b = new StringBuilder("{\"at\":\"").append(at()).append('"');
      String by = more.getOrDefault("by", more.containsKey("from") ? "" : "nk");
      b.append(by.isEmpty() ? ",\"from\":\"" + more.get("from") : ",\"by\":\"" + by).append("\",\"").append(verb).append("\":\"").append(id).append('"');
      if (!value.isEmpty()) {
        b.append(",\"value\":\"").append(value).append('"');
      }
      more.forEach((k, v) -> {
        if (!k.equals("by") && !k.equals("from")) {
          b.append(",\"").append(k).append("\":\"").append(v).append('"');
        }
      });
      return b.append('}').toString();
    }
  }

  static Line line(String text) {
    Matcher m = LINE.matcher(text.strip());
    if (!m.matches()) {
      throw new IllegalArgumentException("a case's log line reads `MINUTE saw|did ID [VALUE] [part=..]`, not: " + text);
    }
    Map<String, String> more = new LinkedHashMap<>();
    List<String> value = new ArrayList<>();
    for (String word : m.group(4).split("\\s+")) {
      Matcher kv = Pattern.compile("(part|by|from|reach|what|id|corrects)=(.+)").matcher(word);
      if (kv.matches()) {
        more.put(kv.group(1), kv.group(2));
      } else if (!word.isEmpty()) {
        value.add(word);
      }
    }
    return new Line(Double.parseDouble(m.group(1)), m.group(2), m.group(3), String.join(" ", value), more);
  }

  /** The good run up to the last line of the case, with the case's own lines in it. */
  static Optional<RunLog> log(List<String> own, List<String> silent) throws Unusable {
    if (own.isEmpty()) {
      return Optional.empty();
    }
    List<Line> lines = new ArrayList<>(own.stream().map(Bench::line).toList());
    double end = lines.stream().mapToDouble(Line::minute).max().orElseThrow();
    double stop = lines.stream().filter(l -> l.verb().equals("did") && ENDS.contains(l.id()) || l.id().equals("power") && l.value().equals("lost"))
        .mapToDouble(Line::minute).min().orElse(Double.MAX_VALUE);
    List<Line> all = new ArrayList<>();
    boolean ownHeat = lines.stream().anyMatch(l -> l.id().equals("heat-on") && l.minute() < 1);
    if (!ownHeat && end > 0) {
      all.add(line("0 did heat-on 60 %"));
    }
    for (int minute = 2; minute <= end; minute += 2) {
      if (minute <= stop) {
        all.addAll(looks(minute, end, lines, silent));
      }
    }
    all.addAll(lines);
    all.sort(Comparator.comparingDouble(Line::minute));
    StringBuilder b = new StringBuilder();
    all.forEach(l -> b.append(l.json()).append('\n'));
    return Optional.of(LogReader.read(new ByteArrayInputStream(b.toString().getBytes(StandardCharsets.UTF_8)), "case.run.jsonl"));
  }

  /** A case's own word about a look stands from then on: the good run says no more about it. */
  private static List<Line> looks(int minute, double end, List<Line> own, List<String> silent) {
    List<Line> out = new ArrayList<>();
    boolean quiet = minute > end - 10;
    for (String look : nominal(minute)) {
      Line l = line(minute + " " + look);
      boolean told = own.stream().anyMatch(o -> concerns(o, l.id()) && o.minute() <= minute);
      if (!told && !(quiet && silent.contains(l.id()))) {
        out.add(l);
      }
    }
    return out;
  }

  private static boolean concerns(Line own, String id) {
    return own.verb().equals("saw") && (own.id().equals(id) || id.equals("drip") && Set.of("drip-rate", "first-drop").contains(own.id())
        || id.equals("coolant-running") && own.id().equals("coolant-flow"))
        || own.verb().equals("did") && id.equals("coolant-running") && own.id().equals("coolant-stop");
  }

  private static List<String> nominal(int minute) {
    List<String> out = new ArrayList<>(List.of("saw path open", "saw foam none", "saw hood running", "saw tip clear", "saw coolant-running", "saw flask-level " + flask(minute) + " mL",
        "saw reservoir-level 200 mL", "saw condenser-solids none", "saw vapour-past-condenser none"));
    if (minute >= FIRST_DROP) {
      if (minute == FIRST_DROP) {
        out.add("saw first-drop");
      }
      out.addAll(List.of("saw boiling gentle", "saw drip drops", "saw head-temperature 98.6 Cel", "saw receiver-level " + receiver(minute) + " mL"));
    }
    return out;
  }

  /** 3 g of water over a minute: what 60 % of the mantle's power boils, near its low end. */
  private static long flask(int minute) {
    return Math.round(400 - 3.0 * Math.max(0, minute - FIRST_DROP));
  }

  private static long receiver(int minute) {
    return Math.round(3.0 * Math.max(0, minute - FIRST_DROP));
  }

  static Duration since(Instant t) {
    return Duration.between(HEAT_ON, t);
  }
}
