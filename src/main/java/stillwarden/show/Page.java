package stillwarden.show;

import java.util.ArrayList;
import java.util.List;
import java.util.function.Consumer;

/** Lines of plain text, at most 100 columns wide where words allow it. */
final class Page {
  private static final int WIDTH = 100;

  private final StringBuilder out = new StringBuilder();

  Page line(String text) {
    // parts of a sentence may carry a UCUM unit; people read °C
    out.append(text.replaceAll("(?<=\\d) Cel\\b", " °C")).append('\n');
    return this;
  }

  /** One item, its further lines indented under its first word. */
  Page item(String lead, String text) {
    String indent = " ".repeat(lead.length());
    List<String> lines = wrap(text, WIDTH - lead.length());
    for (int i = 0; i < lines.size(); i++) {
      line((i == 0 ? lead : indent) + lines.get(i));
    }
    return this;
  }

  /** A heading and its items after an empty line; nothing at all when there are none. */
  <T> Page section(String heading, List<T> items, Consumer<T> each) {
    if (!items.isEmpty()) {
      line("").line(heading);
      items.forEach(each);
    }
    return this;
  }

  String text() {
    return out.toString();
  }

  private static List<String> wrap(String text, int width) {
    List<String> lines = new ArrayList<>();
    StringBuilder line = new StringBuilder();
    for (String word : text.split("\\s+")) {
      if (line.length() > 0 && line.length() + 1 + word.length() > width) {
        lines.add(line.toString());
        line.setLength(0);
      }
      line.append(line.length() == 0 ? "" : " ").append(word);
    }
    lines.add(line.toString());
    return lines;
  }
}
