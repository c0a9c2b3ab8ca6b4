package stillwarden.judge;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;

/**
 * What the rules say, in an order that does not depend on the engine.
 *
 * @param notJudged rules that threw, by name: what they guard counts as the worse case
 */
public record Judgement(List<Finding> findings, List<String> notJudged) {
  private static final Comparator<Finding> STABLE =
      Comparator.comparing(Finding::hazard)
          .thenComparing(Finding::rule)
          .thenComparing(Finding::under)
          .thenComparing(f -> f.facts().toString());

  public Judgement {
    findings = sorted(findings);
    notJudged = notJudged.stream().distinct().sorted().toList();
  }

  /** Without doubles. Only neighbours in the order can be equal, and hashing a finding is dear. */
  private static List<Finding> sorted(List<Finding> findings) {
    List<Finding> all = new ArrayList<>(findings);
    all.sort(STABLE);
    List<Finding> out = new ArrayList<>(all.size());
    for (Finding f : all) {
      if (!twice(out, f)) {
        out.add(f);
      }
    }
    return List.copyOf(out);
  }

  private static boolean twice(List<Finding> out, Finding f) {
    for (int i = out.size() - 1; i >= 0 && STABLE.compare(out.get(i), f) == 0; i--) {
      if (out.get(i).equals(f)) {
        return true;
      }
    }
    return false;
  }
}
