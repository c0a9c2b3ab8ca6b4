package stillwarden.bench;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.function.UnaryOperator;
import stillwarden.derive.Sign;
import stillwarden.judge.Finding;
import stillwarden.judge.Judgement;

/** Twenty of the live rules written by hand, without any engine: the yardstick. All are looked at every time. */
final class PlainRules {
  private record Condition(int slot, String[] values) {}

  private record Rule(String name, String hazard, Condition[] when, UnaryOperator<Finding> then) {}

  private static final String[] ALL_FEEDS = {"full", "ok", "low", "nearly-dry"};
  private final Map<String, Integer> slots = new HashMap<>();
  private final List<List<Sign>> signs = new ArrayList<>();
  private final List<Rule> rules = new ArrayList<>();

  PlainRules() {
    flaskLow();
    flaskDry();
    flaskFails();
    receiver();
    vapour();
    coolant();
  }

  Set<String> names() {
    Set<String> out = new LinkedHashSet<>();
    rules.forEach(r -> out.add(r.name()));
    return out;
  }

  Judgement judge(List<Sign> all) {
    signs.forEach(List::clear);
    for (Sign s : all) {
      Integer slot = slots.get(s.about());
      if (slot != null) {
        signs.get(slot).add(s);
      }
    }
    List<Finding> out = new ArrayList<>();
    for (Rule r : rules) {
      match(r, 0, new Sign[r.when().length], out);
    }
    return new Judgement(out, List.of());
  }

  private void match(Rule r, int next, Sign[] facts, List<Finding> out) {
    if (next == facts.length) {
      out.add(r.then().apply(Finding.of(r.name(), r.hazard(), facts)));
      return;
    }
    Condition c = r.when()[next];
    for (Sign s : signs.get(c.slot())) {
      for (String v : c.values()) {
        if (v.equals(s.value())) {
          facts[next] = s;
          match(r, next + 1, facts, out);
        }
      }
    }
  }

  /** @param when {@code about=value|value}, in the order in which the rule names them */
  private void rule(String name, String hazard, UnaryOperator<Finding> then, String... when) {
    rules.add(new Rule(name, hazard, Arrays.stream(when).map(this::condition).toArray(Condition[]::new), then));
  }

  private Condition condition(String text) {
    String[] both = text.split("=");
    int slot = slots.computeIfAbsent(both[0], k -> {
      signs.add(new ArrayList<>());
      return signs.size() - 1;
    });
    return new Condition(slot, both[1].split("\\|"));
  }

  private void flaskLow() {
    String live = "live=yes";
    String feeds = "reservoir-level=" + String.join("|", ALL_FEEDS);
    String path = "path=open|not-proven";
    rule("the flask runs low and water is left to feed", "flask-low-wet",
        f -> f.propose("verify-level", "feed-slow", "log").forbid("feed-fast", "open-joint"), live, "flask-level=low", feeds, path);
    rule("the flask is under its minimum level, still wet, water left", "flask-low-wet",
        f -> f.propose("reduce-heat", "verify-level", "feed-slow", "log").forbid("feed-fast", "open-joint").as("WARNING", "minutes"),
        live, "flask-level=nearly-dry", feeds, path);
    rule("the flask runs low and nothing is left to feed", "flask-low-no-reserve",
        f -> f.propose("cut-power", "lower-heat", "wait-quiet").forbidUntil("feed-slow", "wait-quiet").forbid("feed-fast", "open-joint"),
        live, "flask-level=low|nearly-dry", "reservoir-level=empty|dry", "refill-in-time=no");
    rule("once the heat is away the empty reservoir is filled", "flask-low-no-reserve",
        f -> f.propose("refill-reservoir", "feed-slow").before("lower-heat", "refill-reservoir").forbidUntil("refill-reservoir", "lower-heat"),
        live, "flask-level=low|nearly-dry", "reservoir-level=empty|dry", "refill-in-time=no", path);
    rule("the flask runs low and a refill comes in time", "flask-low-no-reserve",
        f -> f.propose("reduce-heat", "refill-reservoir", "feed-slow", "verify-level").before("feed-slow", "verify-level").forbid("feed-fast"),
        live, "flask-level=low", "reservoir-level=empty|dry", "refill-in-time=yes", path);
  }

  private void flaskDry() {
    String[] never = {"add-liquid", "feed-slow", "feed-fast", "open-feed", "lift-flask", "pour-on-glass", "chill-glass", "open-joint"};
    String[] smoke = {"add-liquid", "feed-slow", "feed-fast", "open-feed", "lift-flask", "pour-on-glass", "open-joint"};
    rule("no liquid, or bare solids, on hot glass", "flask-dry-hot",
        f -> f.propose("cut-power", "lower-heat", "sash-down", "let-cool", "coolant-keep").forbid(never), "glass-hot=yes", "flask-level=dry");
    rule("the dry flask must not get the reservoir's next drop", "flask-dry-hot",
        f -> f.propose("close-feed").before("close-feed", "lower-heat").before("let-cool", "coolant-keep").before("lower-heat", "sash-down"),
        "glass-hot=yes", "flask-level=dry", "path=open|not-proven");
    rule("smoke comes from the rig", "flask-dry-hot",
        f -> f.propose("cut-power", "lower-heat", "sash-down", "let-cool").forbid(smoke), "live=yes", "smoke=yes");
  }

  private void flaskFails() {
    rule("hot glass cracks or leaks", "flask-crack-run",
        f -> f.propose("isolate-remote", "stand-clear", "warn-people", "sash-down", "let-cool")
            .forbid("lift-flask", "lower-heat", "pour-on-glass", "use-dial", "touch-wet", "feed-slow", "raise-heat"),
        "glass-hot=yes", "glass-failing=yes");
    rule("the cracked flask must not be fed", "flask-crack-run", f -> f.propose("close-feed"),
        "glass-hot=yes", "glass-failing=yes", "path=open|not-proven");
    rule("more water is gone than can have boiled away", "flask-crack-run",
        f -> f.propose("verify-level", "second-look").ask("leak-under").as("CAUTION", "minutes"), "live=yes", "leak-suspected=yes");
    rule("the rig is taken apart while hot", "flask-handled-hot",
        f -> f.propose("stop-work", "let-cool", "coolant-keep", "take-apart-cold").forbid("open-hot", "lift-flask", "chill-glass"),
        "taken-apart-hot=yes", "glass-hot=yes");
  }

  private void receiver() {
    rule("the receiver is nearly full and can be swapped", "receiver-full",
        f -> f.propose("reduce-heat", "lower-receiver", "swap-receiver").proposeAs("second-look", "receiver-swapped")
            .before("swap-receiver", "second-look").forbid("raise-heat", "feed-fast"),
        "live=yes", "receiver-level=full", "tip-can-be-cleared=yes", "receiver-in-vapour=no", "pressure-evident=no");
    rule("the receiver is nearly full and cannot be taken away", "receiver-full",
        f -> f.propose("cut-power", "lower-heat", "wait-quiet").forbid("swap-receiver", "lower-receiver", "open-joint", "raise-heat"),
        "live=yes", "receiver-level=full", "tip-can-be-cleared=no");
    rule("the receiver is nearly full and stands in vapour", "receiver-full",
        f -> f.propose("cut-power", "lower-heat", "stand-clear", "wait-quiet").forbidUntil("swap-receiver", "wait-quiet").forbidUntil("lower-receiver", "wait-quiet"),
        "live=yes", "receiver-level=full", "receiver-in-vapour=yes");
  }

  private void vapour() {
    String out = "vapour-out=wisps|plume";
    rule("vapour leaves at the receiver end", "vapour-past-condenser",
        f -> f.propose("cut-power", "lower-heat", "stand-clear", "sash-down", "wait-quiet").forbidUntil("lower-receiver", "wait-quiet")
            .forbidUntil("swap-receiver", "wait-quiet").forbid("close-opening", "seal-warm", "cap-cover", "coolant-cold", "raise-heat", "new-flame"),
        "live=yes", out);
    rule("vapour leaves and the switch is wet or in it", "vapour-past-condenser",
        f -> f.propose("isolate-remote", "sash-down").forbid("use-dial"), "live=yes", out, "switch=wet-or-in-vapour");
    rule("vapour leaves and the held-off coolant can be opened", "vapour-past-condenser",
        f -> f.propose("coolant-start-slow").before("lower-heat", "coolant-start-slow").forbid("coolant-cold"),
        "live=yes", out, "coolant=off", "coolant-plan=held-off", "jacket=full-cool|full-hot|empty-cool", "oil-freezes=no");
  }

  private void coolant() {
    String[] lost = {"live=yes", "stage=running|stopping", "vapour=yes", "coolant=off", "coolant-plan=before-heat|tempered", "coolant-watch=normal|failed"};
    rule("the coolant stops while vapour is made", "coolant-lost",
        f -> f.propose("cut-power", "lower-heat", "stand-clear", "sash-down").forbid("coolant-cold", "close-opening", "pour-on-glass"), lost);
    String[] cool = Arrays.copyOf(lost, lost.length + 1);
    cool[lost.length] = "jacket=full-cool|empty-cool";
    rule("the coolant stopped a moment ago and the jacket is cool", "coolant-lost",
        f -> f.propose("coolant-start-slow").before("cut-power", "coolant-start-slow").before("lower-heat", "coolant-start-slow"), cool);
  }
}
