package stillwarden.judge;

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
    findings = findings.stream().distinct().sorted(STABLE).toList();
    notJudged = notJudged.stream().distinct().sorted().toList();
  }
}
