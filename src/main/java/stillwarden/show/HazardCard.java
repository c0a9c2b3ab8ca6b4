package stillwarden.show;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;

/**
 * One hazard of the rule base as people read it.
 *
 * @param line what is wrong, in one line
 * @param page Markdown, as it stands beside the rule
 */
public record HazardCard(String id, String family, String signal, String urgency, String line, String page, List<RuleCard> rules) {
  /** One rule: its name is a sentence, its condition the rule's own text, its sources resolved. */
  public record RuleCard(String name, String when, List<String> sources) {}

  /** All hazards, by family, then by id. */
  public static List<HazardCard> all() {
    List<HazardCard> out = new ArrayList<>();
    Knowledge.section("hazards").fields().forEach((id, front) -> out.add(card(id, front)));
    out.sort(Comparator.comparing(HazardCard::family).thenComparing(HazardCard::id));
    return List.copyOf(out);
  }

  public static Optional<HazardCard> of(String id) {
    Tree all = Knowledge.section("hazards");
    return all.has(id) ? Optional.of(card(id, all.get(id))) : Optional.empty();
  }

  static HazardCard card(String id, Tree front) {
    String page = Knowledge.section("pages").text(id).orElse("");
    List<RuleCard> rules = front.get("rules").items().stream().map(HazardCard::rule).toList();
    return new HazardCard(id, front.text("family").orElse(""), front.text("signal").orElse(""), front.text("urgency").orElse(""),
        front.text("line").or(() -> front.text("title")).orElseGet(() -> firstSentence(page)), page, rules);
  }

  private static RuleCard rule(Tree r) {
    return new RuleCard(r.text("name").orElse(""), r.text("when").orElse(""),
        r.words("source").stream().map(s -> reference(s, Knowledge.section("sources"))).toList());
  }

  /** {@code "ID locator"} with the full reference of the id; an id of no entry stays as it is. */
  static String reference(String cited, Tree sources) {
    String id = cited.split(" ", 2)[0];
    Tree entry = sources.get(id);
    return entry.text("ref").map(ref -> ref + edition(ref, entry) + cited.substring(id.length()) + seen(entry)).orElse(cited);
  }

  private static String edition(String ref, Tree entry) {
    return entry.text("edition").filter(e -> !e.equals("-") && !ref.contains(e)).map(e -> " (" + e + ")").orElse("");
  }

  /** A reference that nobody read for this says so, in the list's own words. */
  private static String seen(Tree entry) {
    String seen = entry.text("seen").orElse("");
    return seen.startsWith("secondary") ? ", " + seen : seen.equals("memory") ? ", from memory" : "";
  }

  static String firstSentence(String page) {
    String paragraph = page.replaceAll("(?m)^#.*$", "").strip().split("\\n\\s*\\n", 2)[0];
    String text = paragraph.strip().replaceAll("\\s+", " ");
    int end = text.indexOf(". ");
    return end < 0 ? text : text.substring(0, end + 1);
  }

  /** Family by family, in order. */
  static Map<String, List<HazardCard>> byFamily(List<HazardCard> cards) {
    Map<String, List<HazardCard>> out = new java.util.TreeMap<>();
    cards.forEach(c -> out.computeIfAbsent(c.family(), f -> new ArrayList<>()).add(c));
    return out;
  }
}
