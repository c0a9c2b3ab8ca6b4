package stillwarden.order;

import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;

/** What {@code rules/actions.yaml} says about each deed. */
final class Deeds {
  private static final Map<String, Deed> ALL = read();

  private Deeds() {}

  /**
   * @param ladder place on the arbitration ladder
   * @param kind equipment, personal, look or paper
   * @param cut an energy cut
   * @param waits nothing behind it has a time limit
   * @param cold a step on cold glass only
   * @param replaces weaker deeds that fall away
   * @param lasting a state: done once logged, until one of {@code undoneBy} is logged
   * @param seenBy observations {@code id=value} that show it done
   * @param orElse what a ban waits for instead where this deed cannot be done
   * @param neverLost a ban on this deed that waits for what cannot be done is none
   */
  record Deed(
      String id,
      double ladder,
      String kind,
      boolean cut,
      boolean waits,
      boolean cold,
      List<String> replaces,
      boolean lasting,
      Set<String> undoneBy,
      List<String> seenBy,
      List<String> orElse,
      boolean neverLost) {

    boolean equipment() {
      return kind.equals("equipment");
    }

    boolean personal() {
      return kind.equals("personal");
    }
  }

  static Deed of(String id) {
    Deed d = ALL.get(id);
    if (d == null) {
      throw new IllegalArgumentException("no deed `" + id + "` in rules/actions.yaml");
    }
    return d;
  }

  /** The deeds of a group ({@code @rig-side}), or the deed itself. */
  static List<String> group(String deedOrGroup) {
    return deedOrGroup.startsWith("@") ? Knowledge.section("groups").words(deedOrGroup) : List.of(deedOrGroup);
  }

  static Set<String> ids() {
    return ALL.keySet();
  }

  private static Map<String, Deed> read() {
    Map<String, Deed> out = new TreeMap<>();
    for (Map.Entry<String, Tree> e : Knowledge.section("actions").fields().entrySet()) {
      Tree t = e.getValue();
      out.put(
          e.getKey(),
          new Deed(
              e.getKey(),
              t.number("ladder").orElseThrow(),
              t.text("kind").orElseThrow(),
              yes(t, "cut"),
              yes(t, "wait"),
              yes(t, "cold"),
              t.words("replaces"),
              yes(t, "lasting"),
              Set.copyOf(t.words("undone-by")),
              t.words("seen-by"),
              t.words("or-else"),
              yes(t, "never-lost")));
    }
    return out;
  }

  private static boolean yes(Tree t, String key) {
    return t.text(key).filter("yes"::equals).isPresent();
  }
}
