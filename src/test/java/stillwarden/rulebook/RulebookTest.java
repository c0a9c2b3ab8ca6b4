package stillwarden.rulebook;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.drools.model.Model;
import org.junit.jupiter.api.Test;
import stillwarden.judge.Judge;
import stillwarden.judge.Statement;
import stillwarden.rulebook.Rulebook.Call;
import stillwarden.rulebook.Rulebook.Condition;
import stillwarden.rulebook.Rulebook.Page;
import stillwarden.rulebook.Rulebook.Rule;

/** The rulebook audits itself. Each test tells all it has found at once. */
class RulebookTest {
  private static final Rulebook BOOK = Rulebook.read();
  private static final Map<String, List<String>> DOMAINS = Rulebook.domains();
  private static final Set<String> ACTIONS = Rulebook.yaml("rules/actions.yaml").keySet();
  private static final Set<String> SOURCES = Rulebook.yaml("rules/sources.yaml").keySet();
  private static final Map<String, Object> WORDS = Rulebook.yaml("checklists/en/actions.yaml");
  private static final List<String> HEADINGS =
      List.of("What goes wrong", "What to do", "What not to do", "How it is noticed", "What this rule cannot see", "Sources");
  private static final Set<String> STATEMENTS =
      Set.of("propose", "proposeOn", "proposeAs", "forbid", "forbidUntil", "before", "ask", "reach", "as", "modifying", "knowing", "of", "getRule", "getName", "part");

  /** Every hazard that a run with water and plant boiling in the flask has to have a folder for. */
  private static final String REGISTER = """
      heat-not-removable heat-excess heat-stuck-on heat-direct-mains heat-mantle-mismatch heat-none boil-restart heat-wet-mantle heat-probe-out
      heat-oil-bath-water heat-left-on flask-low-wet flask-low-no-reserve flask-dry-hot flask-overfull flask-bumping flask-no-nucleation
      flask-superheat-quiet flask-scorch flask-crack-run flask-star-crack charge-makes-toxic-gas charge-reacts-water charge-gassing
      flask-stoppered-hot flask-handled-hot foam-rising foam-in-condenser head-plant-plug claisen-missing claisen-layout-wrong head-no-vapour
      head-carryover thermo-bulb-place thermo-high thermo-drop thermo-stale thermo-disagree thermo-broken thermo-no-baro thermo-port-open feed-none
      feed-too-fast feed-leak feed-backflow feed-wrong-liquid feed-reservoir-unsupported feed-stopcock-stuck joint-leak joint-open joint-unclipped
      joint-seized joint-grease-excess clamp-slip stand-overhang clamp-strain clip-softened coolant-off-at-vapour coolant-planned-off coolant-lost
      coolant-low condenser-crystals condenser-plugged coolant-too-warm hoses-reversed hose-off-flood hose-unclamped drain-blocked
      condenser-inner-leak cold-water-on-hot-condenser vapour-past-condenser condenser-undersized condenser-slug path-closed-at-start path-none-hot
      vent-restricted vent-to-ignition tip-immersed suckback-active receiver-full receiver-sealed-fill receiver-missing receiver-hot
      receiver-flammable-open distillate-none elec-water-contact elec-no-gfci elec-power-fail elec-power-return elec-cord-bad elec-shock-person
      hood-off-start hood-fails-run sash-wrong odour-exposed unattended ppe-missing untrained lone-work handover-gap burn-injury eye-splash
      exit-blocked ignition-source fire-small fire-large oil-on-hot-mantle
      coolant-not-proven receiver-too-small water-short joint-misfit part-unknown take-off-freezing
      """;

  private final List<String> problems = new ArrayList<>();

  private void wrong(boolean is, String what) {
    if (is) {
      problems.add(what);
    }
  }

  private void none() {
    assertThat(problems).isEmpty();
  }

  @Test
  void everyHazardOfTheRegisterHasAFolder() {
    Set<String> have = new HashSet<>();
    BOOK.pages().stream().filter(p -> !p.principle()).forEach(p -> have.add(p.id()));
    for (String id : REGISTER.strip().split("\\s+")) {
      wrong(!have.contains(id), "no folder for `" + id + "`");
    }
    none();
  }

  @Test
  void everyFolderIsComplete() {
    Set<String> ids = new HashSet<>();
    for (Page p : BOOK.pages()) {
      wrong(!ids.add(p.id()), p.id() + ": two folders of one name");
      wrong(p.drl().isEmpty(), p.id() + ": no rule.drl");
      wrong(p.text().isEmpty(), p.id() + ": no why.md");
      headings(p);
      front(p);
    }
    none();
  }

  private void headings(Page p) {
    List<String> have = p.text().lines().filter(l -> l.startsWith("## ")).map(l -> l.substring(3).strip()).toList();
    wrong(!have.equals(HEADINGS), p.id() + ": headings are " + have);
    for (String part : p.text().split("(?m)^## .*$")) {
      wrong(part.isBlank() && !part.equals(p.text().split("(?m)^## .*$")[0]), p.id() + ": an empty section");
    }
  }

  private void front(Page p) {
    wrong(!p.principle() && !Set.of("DANGER", "WARNING", "CAUTION", "NOTICE").containsAll(p.words("signal")), p.id() + ": signal " + p.words("signal"));
    wrong(!p.principle() && !Set.of("seconds", "minutes", "before-start", "after").containsAll(p.words("urgency")), p.id() + ": urgency " + p.words("urgency"));
    // a rule that modifies another's advice takes signal word and urgency from it
    boolean borrows = p.principle() && p.rules().stream().allMatch(r -> r.calls().stream().anyMatch(c -> c.method().equals("modifying") || c.method().equals("as")));
    for (String key : borrows ? List.of("rigs", "source") : List.of("signal", "urgency", "rigs", "source")) {
      wrong(p.words(key).isEmpty(), p.id() + ": no `" + key + "` in the front matter");
    }
    wrong(!p.words("rigs").contains("in-flask"), p.id() + ": rigs " + p.words("rigs"));
    Set<String> known = Set.of("signal", "urgency", "rigs", "source", "clears-within", "time-to-harm", "to-start", "end", "warn-first");
    p.front().keySet().stream().filter(k -> !known.contains(k)).forEach(k -> wrong(true, p.id() + ": `" + k + "` in the front matter is nobody's"));
    p.words("clears-within").forEach(d -> wrong(java.time.Duration.parse(d).isNegative(), p.id() + ": clears-within"));
  }

  @Test
  void everyHazardHasItsThreeKindsOfCase() {
    for (Page p : BOOK.pages()) {
      if (!p.principle()) {
        Path file = p.folder().resolve("cases.yaml");
        Set<String> kinds = new TreeSet<>();
        if (Files.exists(file)) {
          for (Object c : Rulebook.cases(file)) {
            kinds.add(String.valueOf(((Map<?, ?>) c).get("fires")));
          }
        }
        wrong(!kinds.contains("yes"), p.id() + ": no case that fires");
        wrong(!kinds.contains("no"), p.id() + ": no quiet case");
        wrong(!kinds.contains("could") && !missingLook(file), p.id() + ": no case where something is missing");
      }
    }
    none();
  }

  /** A look left out, a fact left out or a doubt may also be counted as its worst: then the hazard fires. */
  private static boolean missingLook(Path file) {
    String text = Rulebook.text(file);
    return text.contains("absent") || text.contains("not-sure") || text.contains("silent:");
  }

  @Test
  void rulesAreWrittenInThePlainForm() {
    Set<String> names = new HashSet<>();
    for (Page p : BOOK.pages()) {
      wrong(p.rules().isEmpty() || p.rules().size() > (p.principle() ? 4 : 3), p.id() + ": " + p.rules().size() + " rules");
      long heads = p.drl().lines().filter(l -> l.startsWith("rule ")).count();
      wrong(heads != p.rules().size(), p.id() + ": a rule that does not read");
      String first = p.drl().lines().filter(l -> l.startsWith("package ")).findFirst().orElse("");
      wrong(!Set.of("package stillwarden.inspect;", "package stillwarden.live;").contains(first), p.id() + ": " + first);
    }
    for (Rule r : BOOK.rules()) {
      wrong(!names.add(r.name()), r + ": a name that stands twice");
      wrong(r.name().split("\\s+").length > 12, r + ": more than 12 words");
      conditions(r);
    }
    none();
  }

  private void conditions(Rule r) {
    String last = "";
    for (String line : r.when()) {
      wrong(!line.startsWith("//") && !last.startsWith("//"), r + ": no comment above " + line);
      last = line;
    }
    for (Condition c : r.conditions()) {
      wrong(!c.readable(), r + ": not a positive sign or finding: " + c.text());
      wrong(c.readable() && !r.then().contains(c.variable()), r + ": " + c.variable() + " is matched and not told");
    }
    wrong(r.conditions().isEmpty(), r + ": no condition");
    wrong(!r.then().contains("\"" + r.page().id() + "\""), r + ": its finding is not of its own folder");
    wrong(!r.then().strip().startsWith("insertLogical(") || r.then().split("insertLogical").length != 2, r + ": wants one insertLogical");
    r.calls().forEach(c -> wrong(!STATEMENTS.contains(c.method()), r + ": ." + c.method() + "()"));
  }

  @Test
  void everyRuleSaysWhereItIsFrom() {
    for (Page p : BOOK.pages()) {
      Set<String> ofRules = new TreeSet<>();
      p.rules().forEach(r -> ofRules.addAll(r.sources()));
      wrong(!ofRules.equals(new TreeSet<>(p.words("source"))), p.id() + ": rules cite " + ofRules + ", the page " + p.words("source"));
      ofRules.stream().filter(s -> !SOURCES.contains(s)).forEach(s -> wrong(true, p.id() + ": `" + s + "` is not in sources.yaml"));
      p.rules().forEach(r -> wrong(r.sources().isEmpty(), r + ": no source"));
    }
    none();
  }

  @Test
  void everyWordAndValueOfARuleIsKnown() {
    for (Rule r : BOOK.rules()) {
      for (Condition c : r.conditions()) {
        if (!c.finding() && c.readable()) {
          List<String> domain = DOMAINS.getOrDefault(c.about(), List.of());
          wrong(domain.isEmpty(), r + ": nobody supplies `" + c.about() + "`");
          wrong(!domain.isEmpty() && !domain.containsAll(c.values()), r + ": `" + c.about() + "` has no " + c.values());
          wrong(new HashSet<>(c.values()).size() != c.values().size(), r + ": a value twice in " + c.text());
          wrong(c.values().size() == domain.size() && domain.size() > 1, r + ": `" + c.about() + "` matches every value it has");
        } else if (c.finding()) {
          c.values().forEach(a -> wrong(!ACTIONS.contains(a), r + ": no action `" + a + "`"));
        }
      }
    }
    none();
  }

  /** A derived value that no line of the sign makers writes down would leave its rule dead. */
  @Test
  void everyDerivedValueThatARuleWaitsForIsMadeSomewhere() throws IOException {
    String makers = sources(Path.of("src/main/java/stillwarden/derive")) + sources(Path.of("src/main/java/stillwarden/order/SetupFaults.java"));
    Set<String> derived = Rulebook.yaml("rules/words/signs.yaml").keySet();
    Set<String> observed = ((Map<?, ?>) Rulebook.yaml("rules/words/log.yaml").get("saw")).keySet().stream().map(String::valueOf).collect(java.util.stream.Collectors.toSet());
    for (Rule r : BOOK.rules()) {
      for (Condition c : r.conditions()) {
        if (derived.contains(c.about())) {
          wrong(!makers.contains("\"" + c.about() + "\""), r + ": no maker of `" + c.about() + "`");
          boolean told = observed.contains(c.about()) || Set.of("vapour-out", "crystals", "flow", "coolant-plan", "heater-lowers", "vent-place", "port-state", "feed-arm").contains(c.about());
          boolean made = c.values().stream().anyMatch(v -> made(makers, v));
          wrong(!told && !made, r + ": no maker writes `" + c.about() + "` " + c.values());
        }
      }
    }
    none();
  }

  private static boolean made(String makers, String value) {
    // jackets are put together from two halves
    return Set.of("yes", "no").contains(value) || makers.contains("\"" + value + "\"") || Arrays.stream(value.split("-")).allMatch(half -> makers.contains("\"" + half + "\"") || makers.contains("\"-" + half + "\""));
  }

  @Test
  void everyDeedOfARuleIsKnown() {
    Set<String> groups = Rulebook.yaml("rules/groups.yaml").keySet();
    Set<String> forbidden = new TreeSet<>(keys(WORDS.get("forbidden")));
    forbidden.addAll(ACTIONS);
    forbidden.addAll(groups);
    Set<String> bare = new HashSet<>();
    DOMAINS.keySet().forEach(bare::add);
    for (Rule r : BOOK.rules()) {
      for (Call c : r.calls()) {
        deed(r, c, forbidden);
      }
    }
    Rulebook.yaml("rules/groups.yaml").forEach((g, ids) -> ((List<?>) ids).forEach(id -> wrong(!forbidden.contains(id.toString()), g + ": no deed `" + id + "`")));
    none();
  }

  private void deed(Rule r, Call c, Set<String> forbidden) {
    switch (c.method()) {
      case "propose" -> c.words().forEach(a -> wrong(!ACTIONS.contains(a), r + ": no action `" + a + "`"));
      case "proposeOn" -> wrong(!ACTIONS.contains(c.words().get(c.words().size() - 1)), r + ": no action in " + c.words());
      case "proposeAs" -> variant(r, c);
      case "before" -> c.words().forEach(a -> wrong(!ACTIONS.contains(a), r + ": before of no action `" + a + "`"));
      case "forbid" -> c.words().forEach(d -> wrong(!forbidden.contains(d), r + ": no deed `" + d + "`"));
      case "forbidUntil" -> {
        String until = c.words().get(1);
        wrong(!forbidden.contains(c.words().get(0)), r + ": no deed `" + c.words().get(0) + "`");
        wrong(!ACTIONS.contains(until) && !asked(until.split(" ")[0]), r + ": until `" + until + "`, which is neither action nor sign");
      }
      case "ask" -> c.words().forEach(a -> wrong(!asked(a), r + ": nobody can be asked `" + a + "`"));
      case "reach" -> c.words().forEach(x -> wrong(!Statement.Reach.ALL.contains(x), r + ": no criterion `" + x + "`"));
      case "as" -> wrong(c.words().size() != 2 || !Set.of("DANGER", "WARNING", "CAUTION", "NOTICE").contains(c.words().get(0))
          || !Set.of("seconds", "minutes", "before-start", "after").contains(c.words().get(1)), r + ": as " + c.words());
      default -> wrong(!STATEMENTS.contains(c.method()), r + ": ." + c.method());
    }
  }

  private void variant(Rule r, Call c) {
    wrong(!ACTIONS.contains(c.words().get(0)), r + ": no action `" + c.words().get(0) + "`");
    Object deed = ((Map<?, ?>) WORDS.get("deeds")).get(c.words().get(0));
    Object variants = deed instanceof Map<?, ?> d ? d.get("variants") : null;
    wrong(!keys(variants).contains(c.words().get(1)), r + ": no wording `" + c.words().get(0) + "/" + c.words().get(1) + "`");
  }

  /** A rig path, an observation, or a deed of the restart gate that is logged. */
  private static boolean asked(String about) {
    Set<String> did = keys(Rulebook.yaml("rules/words/log.yaml").get("did"));
    Set<String> saw = keys(Rulebook.yaml("rules/words/log.yaml").get("saw"));
    return saw.contains(about) || did.contains(about) || DOMAINS.containsKey(about) || rigKeys().contains(about);
  }

  private static Set<String> rigKeys() {
    Set<String> out = new TreeSet<>(stillwarden.describe.Vocabulary.get().facts().keySet());
    stillwarden.describe.Vocabulary.get().roles().forEach(role -> {
      out.add(role);
      stillwarden.describe.Vocabulary.get().keysOfRole(role).keySet().forEach(k -> out.add(role + "." + k));
    });
    stillwarden.describe.Vocabulary.get().jointKeys().keySet().forEach(k -> out.add("joint." + k));
    return out;
  }

  @Test
  void everyActionIsInWordsAndOnTheLadder() {
    Map<String, Object> actions = Rulebook.yaml("rules/actions.yaml");
    Set<String> spoken = keys(WORDS.get("deeds"));
    Set<String> known = Set.of("ladder", "kind", "cut", "cut-if", "opens", "wait", "cold", "replaces", "lasting", "undone-by", "seen-by", "or-else", "never-lost");
    actions.forEach((id, v) -> {
      Map<?, ?> a = (Map<?, ?>) v;
      wrong(!(a.get("ladder") instanceof Number), id + ": no place on the ladder");
      wrong(!Set.of("equipment", "personal", "look", "paper").contains(String.valueOf(a.get("kind"))), id + ": kind " + a.get("kind"));
      a.keySet().forEach(k -> wrong(!known.contains(k.toString()), id + ": `" + k + "` is nobody's"));
      list(a.get("replaces")).forEach(w -> wrong(!actions.containsKey(w), id + " replaces no action `" + w + "`"));
      wrong(!spoken.contains(id), id + ": no words");
    });
    none();
  }

  @Test
  void everyChecklistItemNamesALiveKey() {
    Set<String> used = new HashSet<>();
    BOOK.rules().forEach(r -> r.calls().stream().filter(c -> c.method().equals("proposeAs")).forEach(c -> used.add(c.words().get(0) + "/" + c.words().get(1))));
    // a deed that only one hazard asks for is said in that hazard's own words
    BOOK.rules().forEach(r -> r.calls().stream().filter(c -> c.method().startsWith("propose")).forEach(c -> c.words().forEach(w -> used.add(w + "/" + r.page().id()))));
    ((Map<?, ?>) WORDS.get("deeds")).forEach((id, d) -> {
      wrong(!ACTIONS.contains(id.toString()), "actions.yaml words a deed `" + id + "` that is none");
      keys(((Map<?, ?>) d).get("variants")).forEach(v -> wrong(!used.contains(id + "/" + v), "no rule says `" + id + "/" + v + "`"));
    });
    Set<String> banned = new HashSet<>();
    BOOK.rules().forEach(r -> r.calls().stream().filter(c -> c.method().startsWith("forbid")).forEach(c -> banned.addAll(c.words())));
    Map<String, Object> walk = Rulebook.yaml("checklists/en/walk-round.yaml");
    Set<String> later = Set.of("method", "joints", "openings");
    keys(walk.get("asks")).forEach(k -> wrong(!asked(k) && !later.contains(k) && !k.startsWith("openings") && !isKind(k), "walk-round asks `" + k + "`, which is no key"));
    Rulebook.yaml("checklists/en/observations.yaml").keySet().forEach(k -> wrong(!keys(Rulebook.yaml("rules/words/log.yaml").get("saw")).contains(k), "no observation `" + k + "`"));
    none();
  }

  private static boolean isKind(String word) {
    int dot = word.indexOf('.');
    return dot < 0 ? stillwarden.describe.Vocabulary.get().kinds().contains(word) || stillwarden.describe.Vocabulary.get().roles().contains(word)
        : word.endsWith(".kind") || word.startsWith("policy.") || word.startsWith("site.");
  }

  @Test
  void everyLimitIsUsedAndCited() throws IOException {
    String java = sources(Path.of("src/main/java"));
    StringBuilder data = new StringBuilder();
    try (Stream<Path> files = Files.walk(Rulebook.ROOT)) {
      files.filter(f -> f.toString().matches(".*\\.(yaml|drl)") && !f.startsWith(Rulebook.ROOT.resolve("limits"))).sorted().forEach(f -> data.append(Rulebook.text(f)));
    }
    for (String file : List.of("physics", "site", "time")) {
      Rulebook.yaml("rules/limits/" + file + ".yaml").forEach((id, v) -> {
        boolean used = java.contains("\"" + id + "\"") || Pattern.compile("(?m)[\\[ \"]" + Pattern.quote(id) + "[\\], \"}]").matcher(data).find();
        boolean later = v instanceof Map<?, ?> m && "yes".equals(m.get("judged-later"));
        wrong(used == later, file + ".yaml: `" + id + "` is " + (later ? "used and said to be judged later" : "used nowhere"));
        cited(file, id, v);
      });
    }
    none();
  }

  private void cited(String file, String id, Object v) {
    Map<?, ?> limit = v instanceof Map<?, ?> m ? m : Map.of();
    Object source = limit.get("source");
    if (v instanceof List) {
      // a table: its source stands in an entry of its own
      return;
    }
    String word = String.valueOf(source);
    boolean known = SOURCES.contains(word.split("[ ,;:(]")[0]) || word.startsWith("common practice") || word.startsWith("proposal") || word.startsWith("from memory") || word.startsWith("site's choice") || word.startsWith("ANSI-Z9.5");
    wrong(source == null || !known, file + ".yaml: `" + id + "` cites " + source);
  }

  @Test
  void whatIsCompiledIsWhatIsWritten() throws Exception {
    Set<String> written = new TreeSet<>();
    BOOK.rules().forEach(r -> written.add(r.name()));
    assertThat(compiled()).isEqualTo(written);
    assertThat(Judge.ruleCount()).isEqualTo(BOOK.rules().size()).isGreaterThan(150);
  }

  private static Set<String> compiled() throws Exception {
    Set<String> out = new TreeSet<>();
    try (InputStream in = Judge.class.getResourceAsStream("/META-INF/kie/stillwarden/stillwarden/drools-model")) {
      for (String name : new String(in.readAllBytes(), StandardCharsets.UTF_8).lines().skip(1).map(String::strip).toList()) {
        Model m = (Model) Class.forName(name).getDeclaredConstructor().newInstance();
        m.getRules().forEach(r -> out.add(r.getName()));
      }
    }
    return out;
  }

  private static String sources(Path folder) throws IOException {
    StringBuilder out = new StringBuilder();
    try (Stream<Path> files = Files.walk(folder)) {
      files.filter(f -> f.toString().endsWith(".java")).sorted().forEach(f -> out.append(Rulebook.text(f)));
    }
    return out.toString();
  }

  private static Set<String> keys(Object map) {
    Set<String> out = new TreeSet<>();
    if (map instanceof Map<?, ?> m) {
      m.keySet().forEach(k -> out.add(k.toString()));
    }
    return out;
  }

  private static List<String> list(Object v) {
    return v instanceof List<?> l ? l.stream().map(String::valueOf).toList() : v == null ? List.of() : List.of(v.toString());
  }
}
