package stillwarden.judge;

import java.util.Set;

/** A judge of some of the compiled rules alone, to be measured against the same rules written by hand. */
public final class SubsetJudge {
  private SubsetJudge() {}

  /** @throws IllegalArgumentException when a rule of that name is not compiled */
  public static Judge of(Set<String> rules, boolean shortCut) {
    return new Judge(RuleBase.only(rules), shortCut);
  }
}
