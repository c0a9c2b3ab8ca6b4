package stillwarden.show;

import java.util.List;
import stillwarden.order.Explanation;
import stillwarden.order.Explanation.RuleView;
import stillwarden.order.Explanation.SignView;

/** The rule base, one hazard of it, or why it spoke about one rig, as text and as JSON. */
public final class RulesView {
  private RulesView() {}

  public static String text(List<HazardCard> all) {
    Page page = new Page();
    page.line(all.size() + " hazards; `stillwarden rules HAZARD` shows one");
    HazardCard.byFamily(all).forEach((family, cards) -> page.section(family, cards, c ->
        page.item(String.format("  %-32s %-8s %-12s ", c.id(), c.signal(), c.urgency()), c.line())));
    return page.text();
  }

  public static String text(HazardCard c) {
    Page page = new Page();
    page.line(c.id() + " (" + c.family() + "), " + c.signal() + ", " + c.urgency()).line("");
    c.page().lines().forEach(page::line);
    page.section("Rules", c.rules(), r -> rule(page, r));
    return page.text();
  }

  private static void rule(Page page, HazardCard.RuleCard r) {
    page.item("  - ", r.name());
    r.when().lines().forEach(l -> page.line("      " + l.strip()));
    r.sources().forEach(s -> page.item("      source: ", s));
  }

  public static String json(List<HazardCard> all) {
    JsonOut out = new JsonOut(true);
    out.object(o -> o.put("format", "stillwarden/rules/1").array("hazards", all, c -> o.object(h -> head(h, c))));
    return out.done();
  }

  public static String json(HazardCard c) {
    JsonOut out = new JsonOut(true);
    out.object(o -> {
      head(o.put("format", "stillwarden/rules/1"), c);
      o.put("page", c.page()).array("rules", c.rules(), r -> o.object(x -> x
          .put("rule", r.name()).put("when", r.when()).words("sources", r.sources())));
    });
    return out.done();
  }

  private static void head(JsonOut out, HazardCard c) {
    out.put("hazard", c.id()).put("family", c.family()).put("signal", c.signal()).put("urgency", c.urgency()).put("line", c.line());
  }

  /** Why the rules of these hazards spoke or kept quiet about one rig. */
  public static String why(String rig, List<Explanation> explanations) {
    Page page = new Page();
    page.line("Why the rules spoke or kept quiet about " + rig);
    for (Explanation e : explanations) {
      page.section(e.hazard(), e.rules(), r -> why(page, r));
    }
    return page.text();
  }

  private static void why(Page page, RuleView r) {
    page.item("  - ", r.rule() + ": " + outcome(r.outcome()));
    r.signs().forEach(s -> page.item("      ", sign(s)));
  }

  private static String outcome(String outcome) {
    return switch (outcome) {
      case "fires" -> "speaks";
      case "could" -> "could speak: something it needs is unknown";
      default -> "keeps quiet";
    };
  }

  private static String sign(SignView s) {
    String is = s.is().isEmpty() ? "nothing known" : s.is();
    String margin = s.margin().isEmpty() ? "" : "; margin " + s.margin();
    String evidence = s.evidence().isEmpty() ? "" : " (" + s.evidence() + ")";
    return s.holds() + ": " + s.sign().replace('-', ' ') + " wanted " + s.wanted() + ", is " + is + margin + evidence;
  }

  public static String whyJson(String rig, List<Explanation> explanations) {
    JsonOut out = new JsonOut(true);
    out.object(o -> o.put("format", "stillwarden/why/1").put("rig", rig)
        .array("hazards", explanations, e -> o.object(h -> h.put("hazard", e.hazard()).array("rules", e.rules(), r -> whyJson(h, r)))));
    return out.done();
  }

  private static void whyJson(JsonOut out, RuleView r) {
    out.object(o -> o.put("rule", r.rule()).put("outcome", r.outcome()).array("signs", r.signs(), s -> o.object(x -> x
        .put("sign", s.sign()).put("wanted", s.wanted()).putOrNull("is", s.is()).put("holds", s.holds())
        .putIfAny("evidence", s.evidence()).putIfAny("margin", s.margin()))));
  }
}
