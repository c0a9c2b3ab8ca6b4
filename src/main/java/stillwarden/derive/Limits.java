package stillwarden.derive;

import stillwarden.describe.Knowledge;
import stillwarden.describe.Policy;
import stillwarden.describe.Tree;

/** Limits of {@code rules/limits}, as tightened by the site. */
public final class Limits {
  private Limits() {}

  /** SI value (a fraction for shares) of one limit; the reader has already refused a policy that loosens it unwaived. */
  public static double of(Policy policy, String id) {
    Double site = policy.limits().get(id);
    if (site != null) {
      return site;
    }
    Tree t = Knowledge.section("limits").get(id);
    return t.number("value").orElseThrow(() -> new IllegalArgumentException("no limit `" + id + "` in rules/limits"));
  }
}
