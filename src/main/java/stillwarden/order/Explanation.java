package stillwarden.order;

import java.util.List;

/** Why one hazard's rules spoke or kept quiet about one rig (and run). */
public record Explanation(String hazard, List<RuleView> rules) {
  public Explanation {
    rules = List.copyOf(rules);
  }

  /**
   * One rule and every sign it looks at.
   *
   * @param outcome {@code fires}, {@code could} (something unknown could make it fire) or {@code quiet}
   */
  public record RuleView(String rule, String outcome, List<SignView> signs) {
    public RuleView {
      signs = List.copyOf(signs);
    }
  }

  /**
   * One condition of a rule.
   *
   * @param wanted the value that the rule waits for
   * @param is the value now, in words; empty when nothing is known
   * @param holds {@code yes}, {@code no} or {@code unknown}
   * @param evidence who saw it and when, or how it was computed
   * @param margin how far it is from turning, with unit; empty when there is no number behind it
   */
  public record SignView(String sign, String wanted, String is, String holds, String evidence, String margin) {}
}
