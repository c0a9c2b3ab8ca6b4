package stillwarden.order;

import java.util.ArrayList;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import stillwarden.derive.Sign;
import stillwarden.derive.Situation;
import stillwarden.derive.Standing;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;
import stillwarden.judge.Finding;
import stillwarden.judge.Judgement;

/** "Why" and "why not" for one hazard: each sign its rules name holds, does not, or is unknown. */
final class Why {
  private static final Pattern CONDITION =
      Pattern.compile("Sign\\(\\s*about\\s*==\\s*\"([^\"]+)\"\\s*(?:,\\s*value\\s*(==|!=|in)\\s*(\\([^)]*\\)|\"[^\"]*\"))?");
  private static final Pattern WORD = Pattern.compile("\"([^\"]*)\"");

  private Why() {}

  static Explanation explain(String hazard, Situation s, Judgement j) {
    List<Explanation.RuleView> out = new ArrayList<>();
    for (Tree rule : Knowledge.section("hazards").get(hazard).get("rules").items()) {
      String name = rule.text("name").orElse("");
      out.add(new Explanation.RuleView(name, outcome(name, j), signs(rule.text("when").orElse(""), s)));
    }
    return new Explanation(hazard, out);
  }

  private static String outcome(String rule, Judgement j) {
    List<Finding> mine = j.findings().stream().filter(f -> f.rule().equals(rule)).toList();
    return mine.stream().anyMatch(Finding::isActive) ? "fires" : mine.isEmpty() ? "quiet" : "could";
  }

  private static List<Explanation.SignView> signs(String when, Situation s) {
    List<Explanation.SignView> out = new ArrayList<>();
    Matcher m = CONDITION.matcher(when);
    while (m.find()) {
      Set<String> wanted = new LinkedHashSet<>();
      Matcher w = WORD.matcher(m.group(3) == null ? "" : m.group(3));
      while (w.find()) {
        wanted.add(w.group(1));
      }
      out.add(view(m.group(1), wanted, "!=".equals(m.group(2)), s));
    }
    return out;
  }

  private static Explanation.SignView view(String about, Set<String> wanted, boolean not, Situation s) {
    List<Sign> here = s.about(about);
    List<Sign> match = here.stream().filter(x -> wanted.isEmpty() || wanted.contains(x.value()) != not).toList();
    boolean holds = match.stream().anyMatch(Sign::isActive);
    boolean unknown = !holds && match.stream().anyMatch(x -> x.standing() == Standing.POSSIBLE);
    Sign shown = (match.isEmpty() ? here : match).stream().min(java.util.Comparator.comparing(Sign::standing)).orElse(null);
    return new Explanation.SignView(
        about,
        (not ? "not " : "") + String.join(" or ", wanted),
        shown == null || unknown ? "" : shown.value(),
        holds ? "yes" : unknown ? "unknown" : "no",
        shown == null ? "not reported" : shown.evidence(),
        Margins.of(about, s));
  }
}
