package stillwarden.show;

import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;

/** The sources that a text cites by id, each with its full reference once. */
final class SourceList {
  private final Set<String> ids = new TreeSet<>();

  /** @param cited {@code "ID locator; ID"}; what is no id of the list is a reference already */
  void add(String cited) {
    for (String one : cited.split(";\\s*")) {
      String id = one.strip().split(" ", 2)[0];
      if (Knowledge.section("sources").has(id)) {
        ids.add(id);
      }
    }
  }

  void write(Page page) {
    Tree sources = Knowledge.section("sources");
    page.section("Sources", List.copyOf(ids), id -> page.item("  - ", id + ": " + HazardCard.reference(id, sources)));
  }
}
