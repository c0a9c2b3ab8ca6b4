package stillwarden.describe;

import java.nio.file.Path;
import java.util.Locale;

/** A rig or policy file as a tree: JSON by its extension or its first character, else YAML. */
final class Documents {
  private static final int MOST_BYTES = 256 * 1024;

  private Documents() {}

  static Node read(Path path, Defects defects) throws Unusable {
    String text = Source.read(path, MOST_BYTES);
    String name = path.toString();
    if (text.isBlank()) {
      throw new Unusable(Spot.of(name), "is empty");
    }
    Node root = json(name, text) ? JsonSource.read(name, 1, text, Limits.FILE, defects)
        : YamlSource.read(name, text, Limits.FILE, defects);
    if (!root.is(Node.Kind.MAP)) {
      defects.add(root.spot(), "keys are wanted, here is " + root.describe());
      throw defects.unusable();
    }
    return root;
  }

  private static boolean json(String name, String text) {
    String lower = name.toLowerCase(Locale.ROOT);
    boolean yaml = lower.endsWith(".yaml") || lower.endsWith(".yml");
    return lower.endsWith(".json") || !yaml && text.stripLeading().startsWith("{");
  }

  /** Checks the first thing a file must say. */
  static void format(Node root, String wanted, Defects defects) {
    Node said = root.get("format").orElse(null);
    if (said == null) {
      defects.add(new Spot(root.spot().file(), 1, 1), "`format` is missing; the file must say `format: " + wanted + "`");
    } else if (!said.text().equals(wanted)) {
      defects.add(said.spot(), said.describe() + " where `" + wanted + "` is wanted");
    }
  }
}
