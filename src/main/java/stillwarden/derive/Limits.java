package stillwarden.derive;

import java.util.Map;
import java.util.concurrent.ConcurrentHashMap;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Policy;
import stillwarden.describe.Tree;

/** Limits of {@code rules/limits}, as tightened by the site. */
public final class Limits {
  private static final Map<String, Double> READ = new ConcurrentHashMap<>();

  private Limits() {}

  /** SI value (a fraction for shares) of one limit; the reader has already refused a policy that loosens it unwaived. */
  public static double of(Policy policy, String id) {
    Double site = policy.limits().get(id);
    if (site != null) {
      return site;
    }
    Double read = READ.get(id);
    return read != null ? read : READ.computeIfAbsent(id, Limits::read);
  }

  private static Double read(String id) {
    Tree t = Knowledge.section("limits").get(id);
    return t.number("value").orElseThrow(() -> new IllegalArgumentException("no limit `" + id + "` in rules/limits"));
  }
}
