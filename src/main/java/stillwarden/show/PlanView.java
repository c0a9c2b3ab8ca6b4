package stillwarden.show;

import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import stillwarden.derive.Estimate;

/** A plan as text and as JSON, `stillwarden/plan/1`. */
public final class PlanView {
  /** Headings of the text and the numbers under each, in reading order; what is in none stands under "Other". */
  private static final Map<String, List<String>> GROUPS = groups();

  private PlanView() {}

  private static Map<String, List<String>> groups() {
    Map<String, List<String>> g = new LinkedHashMap<>();
    g.put("Boiling here, and why not at 100 °C",
        List.of("pressure-here", "water-boiling-point-here", "boiling-point-here", "co-boiling-shift"));
    g.put("What comes over", List.of("mole-ratio-water-to-oil", "mass-ratio-water-to-oil", "oil-share-of-distillate"));
    g.put("Water", List.of("water-needed", "water-needed-ideal", "water-available", "feed-limit"));
    g.put("Heat", List.of("heat-up-time", "boil-up-rate", "drip-rate"));
    g.put("Times from heat on", List.of("time-to-target", "time-to-reservoir-end", "time-to-minimum-level",
        "time-to-dryness", "time-to-full-receiver"));
    g.put("Condenser and coolant", List.of("condenser-duty", "condenser-capacity", "coolant-flow-least", "coolant-outlet",
        "coolant-strategy", "coolant-temperature", "freezing-point-of-oil", "crystals-possible-from"));
    g.put("If the way out chokes or closes", List.of("vent-pressure-drop", "seal-back-pressure", "closed-time-to-2-kPa",
        "closed-time-to-5-kPa", "closed-time-to-10-kPa"));
    g.put("Fill", List.of("flask-fill"));
    return g;
  }

  public static String text(PlanSheet plan) {
    Page page = new Page();
    page.line("Plan for " + plan.rig() + (plan.at().isEmpty() ? "" : ", as of " + Times.clock(plan.at())));
    Set<String> shown = new LinkedHashSet<>();
    GROUPS.forEach((heading, names) -> {
      page.section(heading, readable(plan, names), line -> page.item("  - ", line));
      shown.addAll(names);
    });
    page.section("Other", readable(plan, unlisted(plan, shown)), line -> page.item("  - ", line));
    page.section("To know", plan.lines(), line -> page.item("  - ", line));
    page.section("Assumed, defaulted or extrapolated", assumptions(plan), line -> page.item("  - ", line));
    page.section("Waivers in force", plan.waivers(), line -> page.item("  - ", line));
    SourceList sources = new SourceList();
    plan.numbers().forEach(e -> sources.add(e.source()));
    sources.write(page);
    return page.line("").item("", plan.defersTo()).text();
  }

  private static List<String> readable(PlanSheet plan, List<String> names) {
    List<String> lines = new ArrayList<>();
    for (String name : names) {
      plan.numbers().stream().filter(e -> e.name().equals(name)).forEach(e -> lines.add(number(e)));
    }
    return lines;
  }

  private static String number(Estimate e) {
    String how = e.known() && !Figures.isWord(e) && !e.method().isEmpty() ? "; " + e.method() : "";
    return Figures.name(e) + ": " + Figures.read(e) + how;
  }

  private static List<String> unlisted(PlanSheet plan, Set<String> shown) {
    Set<String> names = new LinkedHashSet<>();
    plan.numbers().forEach(e -> names.add(e.name()));
    names.removeAll(shown);
    return List.copyOf(names);
  }

  /** Each assumption once, with the numbers that rest on it. */
  private static List<String> assumptions(PlanSheet plan) {
    Map<String, List<String>> by = new LinkedHashMap<>();
    plan.notes().forEach(n -> by.computeIfAbsent(n, k -> new ArrayList<>()));
    for (Estimate e : plan.numbers().stream().filter(n -> !Figures.isWord(n)).toList()) {
      e.notes().forEach(n -> by.computeIfAbsent(n, k -> new ArrayList<>()).add(Figures.name(e)));
    }
    return by.entrySet().stream()
        .map(n -> n.getValue().isEmpty() ? n.getKey() : n.getKey() + " (" + String.join(", ", n.getValue()) + ")").toList();
  }

  public static String json(PlanSheet plan) {
    JsonOut out = new JsonOut(true);
    out.object(o -> {
      o.put("format", "stillwarden/plan/1").put("rig", plan.rig()).putOrNull("at", plan.at());
      o.array("numbers", plan.numbers(), e -> JsonView.number(o, e)).array("curves", plan.curves(), c -> curve(o, c));
      o.words("lines", plan.lines()).words("notes", plan.notes()).someWords("waivers", plan.waivers());
      o.put("defers-to", plan.defersTo());
    });
    return out.done();
  }

  private static void curve(JsonOut out, PlanSheet.Curve c) {
    out.object(o -> o.put("name", c.name()).put("unit", c.unit())
        .numbers("t", rounded(c.t())).numbers("low", rounded(c.low()))
        .numbers("value", rounded(c.value())).numbers("high", rounded(c.high())));
  }

  private static List<BigDecimal> rounded(List<Double> values) {
    return values.stream().map(v -> new BigDecimal(Figures.six(v))).toList();
  }
}
