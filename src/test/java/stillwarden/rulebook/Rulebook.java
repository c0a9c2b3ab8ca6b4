package stillwarden.rulebook;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import tools.jackson.databind.ObjectMapper;
import tools.jackson.dataformat.yaml.YAMLMapper;

/**
 * The rule folder as it is written, read by the tests' own eyes: neither the bundler nor the rule engine has a hand in
 * it, so that both can be checked against it.
 */
public final class Rulebook {
  public static final Path ROOT = Path.of("rules");

  private static final ObjectMapper YAML = YAMLMapper.builder().build();
  private static final Pattern RULE = Pattern.compile("^rule\\s+\"([^\"]*)\"(.*?)^when\\b(.*?)^then\\b(.*?)^end\\b", Pattern.DOTALL | Pattern.MULTILINE);
  private static final Pattern SOURCE = Pattern.compile("@source\\(\"([^\"]*)\"\\)");
  private static final Pattern SIGN = Pattern.compile(
      "^(\\$\\w+) : Sign\\(about == \"([^\"]+)\", value (?:== \"([^\"]+)\"|in \\(([^)]*)\\))(?:, (?:part == \\$\\w+|\\$\\w+ : part))?\\)$");
  private static final Pattern FINDING = Pattern.compile("^(\\$\\w+) : Finding\\(active, (?:proposes\\(\"([^\"]+)\"\\)|reaches\\(\\))\\)$");
  private static final Pattern QUOTED = Pattern.compile("\"([^\"]*)\"");
  private static final Pattern CALL = Pattern.compile("\\.\\s*(\\w+)\\(((?:[^()\"]|\"[^\"]*\"|\\(\\))*)\\)");

  private final List<Page> pages = new ArrayList<>();

  /**
   * @param id folder name
   * @param principle under `principles`, else under `hazards`
   * @param front what stands in the front matter of the page
   */
  public record Page(String id, boolean principle, Path folder, Map<String, Object> front, String text, String drl, List<Rule> rules) {
    public List<String> words(String key) {
      Object v = front.get(key);
      return v instanceof List<?> l ? l.stream().map(String::valueOf).toList() : v == null ? List.of() : List.of(v.toString());
    }
  }

  /** One rule as text. */
  public record Rule(Page page, String name, List<String> sources, List<String> when, String then) {
    public List<Condition> conditions() {
      return when.stream().filter(l -> !l.startsWith("//")).map(Rulebook::condition).toList();
    }

    public List<Call> calls() {
      List<Call> out = new ArrayList<>();
      Matcher m = CALL.matcher(then.replaceAll("(?m)//.*$", ""));
      while (m.find()) {
        out.add(new Call(m.group(1), quoted(m.group(2))));
      }
      return out;
    }

    @Override
    public String toString() {
      return page.id() + ": `" + name + "`";
    }
  }

  /** @param about the sign's word; empty for a condition on another finding, and for one that could not be read */
  public record Condition(String text, String variable, String about, List<String> values, boolean finding) {
    public boolean readable() {
      return finding || !about.isEmpty();
    }
  }

  /** One statement of a consequence. */
  public record Call(String method, List<String> words) {}

  private Rulebook() {}

  public static Rulebook read() {
    Rulebook book = new Rulebook();
    book.folder("hazards", false);
    book.folder("principles", true);
    return book;
  }

  public List<Page> pages() {
    return List.copyOf(pages);
  }

  public List<Rule> rules() {
    return pages.stream().flatMap(p -> p.rules().stream()).toList();
  }

  private void folder(String name, boolean principle) {
    for (Path family : list(ROOT.resolve(name))) {
      for (Path hazard : list(family)) {
        pages.add(page(hazard, principle));
      }
    }
  }

  private static Page page(Path folder, boolean principle) {
    String text = text(folder.resolve("why.md"));
    int end = text.startsWith("---\n") ? text.indexOf("\n---\n", 4) : -1;
    Map<String, Object> front = end < 0 ? Map.of() : map(text.substring(4, end + 1));
    String drl = text(folder.resolve("rule.drl"));
    List<Rule> rules = new ArrayList<>();
    Page page = new Page(folder.getFileName().toString(), principle, folder, front, end < 0 ? text : text.substring(end + 5), drl, rules);
    Matcher m = RULE.matcher(drl);
    while (m.find()) {
      rules.add(new Rule(page, m.group(1), all(SOURCE, m.group(2)), m.group(3).lines().map(String::strip).filter(l -> !l.isEmpty()).toList(), m.group(4)));
    }
    return page;
  }

  private static Condition condition(String line) {
    Matcher sign = SIGN.matcher(line);
    if (sign.matches()) {
      List<String> values = sign.group(3) != null ? List.of(sign.group(3)) : quoted(sign.group(4));
      return new Condition(line, sign.group(1), sign.group(2), values, false);
    }
    Matcher finding = FINDING.matcher(line);
    return finding.matches()
        ? new Condition(line, finding.group(1), "", finding.group(2) == null ? List.of() : List.of(finding.group(2)), true)
        : new Condition(line, "", "", List.of(), false);
  }

  static List<String> quoted(String text) {
    return all(QUOTED, text);
  }

  private static List<String> all(Pattern p, String text) {
    return p.matcher(text).results().map(r -> r.group(1)).toList();
  }

  public static List<Path> list(Path folder) {
    try (Stream<Path> s = Files.list(folder)) {
      return s.filter(Files::isDirectory).sorted().toList();
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static String text(Path file) {
    try {
      return Files.exists(file) ? Files.readString(file) : "";
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  @SuppressWarnings("unchecked")
  static Map<String, Object> map(String yaml) {
    Map<String, Object> out = YAML.readValue(yaml, Map.class);
    return out == null ? Map.of() : new LinkedHashMap<>(out);
  }

  /** A data file of `rules/` or `checklists/` as a map. */
  public static Map<String, Object> yaml(String path) {
    return map(text(Path.of(path)));
  }

  static List<?> cases(Path file) {
    return YAML.readValue(text(file), List.class);
  }

  /** Word to the values it can have, calm to worst, for every word that a rule may match. */
  public static Map<String, List<String>> domains() {
    Map<String, List<String>> out = new TreeMap<>();
    ((Map<?, ?>) yaml("rules/words/log.yaml").get("saw")).forEach((id, key) -> values(key).ifPresent(v -> out.put(id.toString(), v)));
    yaml("rules/words/signs.yaml").forEach((id, key) -> values(key).ifPresent(v -> out.put(id, v)));
    rigWords(out);
    ((Map<?, ?>) yaml("rules/words/policy.yaml").get("permits")).forEach((id, key) -> out.put("permits." + id, List.of("no", "yes")));
    return out;
  }

  private static void rigWords(Map<String, List<String>> out) {
    Map<String, Object> rig = yaml("rules/words/rig.yaml");
    ((Map<?, ?>) rig.get("facts")).forEach((id, key) -> values(key).ifPresent(v -> out.put(id.toString(), v)));
    ((Map<?, ?>) rig.get("joints")).forEach((id, key) -> values(key).ifPresent(v -> out.put("joint." + id, v)));
    Map<?, ?> sets = (Map<?, ?>) rig.get("sets");
    for (Object kind : ((Map<?, ?>) rig.get("kinds")).values()) {
      Map<?, ?> k = (Map<?, ?>) kind;
      String role = k.get("role").toString();
      List<Map<?, ?>> keys = new ArrayList<>();
      if (k.get("sets") instanceof List<?> named) {
        named.forEach(s -> keys.add((Map<?, ?>) sets.get(s)));
      }
      if (k.get("keys") instanceof Map<?, ?> own) {
        keys.add(own);
      }
      keys.forEach(set -> set.forEach((id, key) -> values(key).ifPresent(v -> out.put(role + "." + id, v))));
    }
  }

  private static java.util.Optional<List<String>> values(Object key) {
    Map<?, ?> k = (Map<?, ?>) key;
    if (k.get("values") instanceof List<?> v && !v.isEmpty() && !"part".equals(k.get("type"))) {
      return java.util.Optional.of(v.stream().map(String::valueOf).toList());
    }
    return "tri".equals(k.get("type")) ? java.util.Optional.of("yes".equals(k.get("calm")) ? List.of("yes", "no") : List.of("no", "yes")) : java.util.Optional.empty();
  }
}
