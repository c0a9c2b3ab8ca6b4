package stillwarden.describe;

import java.util.List;

/** Takes a key into a map, refusing what would silently change the meaning of another one. */
final class Fields {
  private Fields() {}

  static void add(List<Node.Field> fields, Node key, Node value, boolean flow, Defects defects) {
    if (!key.isScalar() || key.is(Node.Kind.EMPTY)) {
      defects.add(key.spot(), "a key must be a word, here it is " + key.describe());
      return;
    }
    if (key.text().equals("<<")) {
      defects.add(key.spot(), "a merge key (`<<`) has no place here: `based-on` starts from another file");
      return;
    }
    if (flow && value.is(Node.Kind.EMPTY) && value.text().isEmpty() && !fields.isEmpty() && !key.text().endsWith(":")) {
      comma(fields.get(fields.size() - 1), key, defects);
      return;
    }
    first(fields, key.text()).ifPresentOrElse(
        f -> defects.add(key.spot(), Words.quote(key.text()) + " stands twice; first in line " + f.spot().line()),
        () -> fields.add(new Node.Field(key.text(), key.spot(), value)));
  }

  /** Between braces a comma ends the value: what follows it looks like a key of its own without a value. */
  private static void comma(Node.Field before, Node key, Defects defects) {
    String whole = before.value().text() + ", " + key.text();
    if (before.value().text().matches("[+-]?[0-9]+") && key.text().matches("[0-9].*")) {
      defects.add(key.spot(), "a comma in a number; write a point: " + Words.quote(before.value().text() + "." + key.text()));
      return;
    }
    defects.add(key.spot(), Words.quote(key.text()) + " has no value; between braces a comma ends a value: if it belongs to "
        + Words.quote(before.key()) + ", put the whole value in quotes, \"" + Words.quote(whole).replace("`", "") + "\"");
  }

  private static java.util.Optional<Node.Field> first(List<Node.Field> fields, String key) {
    for (Node.Field f : fields) {
      if (f.key().equals(key)) {
        return java.util.Optional.of(f);
      }
    }
    return java.util.Optional.empty();
  }
}
