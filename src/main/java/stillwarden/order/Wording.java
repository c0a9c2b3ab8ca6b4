package stillwarden.order;

import java.time.Duration;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;

/**
 * The words of deeds, bans and questions, read from the checklists of one language. Decides nothing; an id without
 * words is put into words itself ({@code flask-level} becomes "flask level"), so that no answer ever lacks a sentence.
 */
public final class Wording {
  private static final Wording ENGLISH = new Wording("en");

  private final Tree deeds;
  private final Tree forbidden;
  private final Tree defaults;
  private final Tree asks;

  private Wording(String language) {
    Tree lists = Knowledge.section("checklists").get(language);
    deeds = lists.get("actions").get("deeds");
    forbidden = lists.get("actions").get("forbidden");
    defaults = lists.get("actions").get("defaults");
    asks = lists.get("walk-round").get("asks");
  }

  public static Wording english() {
    return ENGLISH;
  }

  /**
   * What to say for a deed, one sentence, verb first.
   *
   * @param part the user's name of the part, or empty for the trade's noun
   * @param variant a hazard id with a sharpened wording, or empty; an unknown one falls back to the plain wording
   * @param slots words of the rig by name, for example {@code power-off}; missing ones take the default
   */
  public String say(String action, String part, String variant, Map<String, String> slots) {
    Tree deed = deeds.get(action);
    String plain = deed.text("say").orElseGet(() -> sentence(action));
    String template = deed.get("variants").text(variant).orElse(plain);
    return capital(fill(template, part.isEmpty() ? deed.text("part").orElse("part") : part, slots));
  }

  /** What to say for a ban, for example "Do not open a joint to look."; any action id can be banned too. */
  public String not(String deed) {
    return forbidden.get(deed).text("not")
        .or(() -> deeds.get(deed).text("not"))
        .map(words -> fill(words, deeds.get(deed).text("part").orElse("part"), Map.of()))
        .orElseGet(() -> "Do not: " + inWords(deed) + ".");
  }

  public Optional<String> caution(String action) {
    return deeds.get(action).text("caution");
  }

  /** What is seen when the deed is done; empty text when the action is unknown. */
  public String doneWhen(String action) {
    return deeds.get(action).text("done-when").orElse("");
  }

  /** How long the sign that called for the deed may take to clear after it. */
  public Optional<Duration> clearsWithin(String action) {
    return deeds.get(action).text("clears-within").map(Duration::parse);
  }

  /** What a ban waits for: what is seen when an action is done, or the sign in words. */
  public String until(String actionOrSign) {
    return deeds.get(actionOrSign).text("done-when").orElseGet(() -> inWords(actionOrSign));
  }

  /** The question for a rig path or an observation id. */
  public String question(String about) {
    return asks.get(about).text("say").orElseGet(() -> "Look: " + inWords(about) + "?");
  }

  /** Where on the walk round the question is asked; empty when the list does not say. */
  public String station(String about) {
    return asks.get(about).text("station").orElse("");
  }

  private String fill(String template, String part, Map<String, String> slots) {
    String out = template.replace("{part}", part);
    for (Map.Entry<String, String> slot : slots.entrySet()) {
      out = out.replace("{" + slot.getKey() + "}", slot.getValue());
    }
    for (Map.Entry<String, Tree> slot : defaults.fields().entrySet()) {
      out = out.replace("{" + slot.getKey() + "}", slot.getValue().text().orElse(""));
    }
    return out;
  }

  private static String sentence(String id) {
    return capital(inWords(id)) + ".";
  }

  static String inWords(String id) {
    return id.replace('.', ' ').replace('-', ' ');
  }

  private static String capital(String s) {
    return s.isEmpty() ? s : Character.toUpperCase(s.charAt(0)) + s.substring(1);
  }
}
