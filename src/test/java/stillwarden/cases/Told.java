package stillwarden.cases;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import stillwarden.order.Advice;

/** Reads an answer for a test: which deeds, which of them are equipment steps, the signal word, and all of it in words. */
final class Told {
  private static final Map<?, ?> ACTIONS = actions();
  private static final List<String> SIGNALS = List.of("NOTICE", "CAUTION", "WARNING", "DANGER");
  private static final List<String> VERDICTS = List.of("carry-on", "adjust", "wind-down", "stop");

  private Told() {}

  private static Map<?, ?> actions() {
    try {
      return CaseFile.YAML.readValue(Files.readString(Path.of("rules", "actions.yaml")), Map.class);
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  static boolean equipment(String deed) {
    return has(deed, "kind", "equipment");
  }

  static boolean cut(String deed) {
    return has(deed, "cut", "yes");
  }

  private static boolean has(String deed, String key, String value) {
    return ACTIONS.get(deed) instanceof Map<?, ?> d && value.equals(d.get(key));
  }

  static List<String> deeds(Advice a) {
    return a.actions().stream().map(Advice.Action::act).toList();
  }

  /** Is the deed listed only behind another deed, or only under a condition. */
  static boolean behind(Advice a, String deed, String until) {
    int first = deeds(a).indexOf(until);
    int at = deeds(a).indexOf(deed);
    boolean condition = at >= 0 && a.actions().get(at).iff().isPresent();
    return condition || first >= 0 && first < at;
  }

  static String signal(Advice a) {
    return SIGNALS.get(loudness(a));
  }

  static int loudness(Advice a) {
    return a.actions().stream().filter(x -> x.iff().isEmpty()).mapToInt(x -> SIGNALS.indexOf(x.signal())).max().orElse(0);
  }

  static int gravity(Advice a) {
    return VERDICTS.indexOf(a.verdict());
  }

  static String whole(Advice a) {
    StringBuilder b = new StringBuilder(a.verdict() + " " + a.stage() + " " + signal(a));
    a.actions().forEach(x -> b.append("\n  do ").append(x.act()).append(' ').append(x.signal()).append(x.iff().map(i -> " if " + i).orElse(""))
        .append(x.state().equals("due") ? "" : " " + x.state()).append(" <- ").append(x.because().stream().map(y -> y.hazard() + " '" + y.rule() + "'").toList()));
    a.doNot().forEach(x -> b.append("\n  not ").append(x.act()).append(x.until().isEmpty() ? "" : " until " + x.until()).append(" <- ").append(x.because()));
    a.ask().forEach(x -> b.append("\n  ask ").append(x.about()));
    return b.append("\n  more ").append(a.more()).toString();
  }
}
