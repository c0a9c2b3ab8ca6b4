package stillwarden.order;

import java.util.List;
import java.util.stream.Collectors;
import stillwarden.derive.Situation;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;
import stillwarden.judge.Finding;

/** Whom the answer defers to; with a DANGER the site's emergency plan comes first. */
final class Deference {
  private Deference() {}

  static String words(Situation s, List<Finding> findings) {
    Tree words = Knowledge.section("checklists").get("en").get("deference");
    boolean danger = findings.stream().anyMatch(f -> f.isActive() && Hazards.signal(f) == Signal.DANGER);
    String contacts = s.policy().contacts().entrySet().stream().sorted(java.util.Map.Entry.comparingByKey())
        .map(e -> e.getKey().replace('-', ' ') + ": " + e.getValue()).collect(Collectors.joining("; "));
    String base = (danger ? words.text("danger").orElse("") + " " : "") + words.text("always").orElse("");
    return (contacts.isEmpty() ? base : base + " " + contacts + ".").strip();
  }
}
