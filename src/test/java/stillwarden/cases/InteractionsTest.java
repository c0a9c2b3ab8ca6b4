package stillwarden.cases;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.DynamicTest;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.TestFactory;
import org.junit.jupiter.api.io.TempDir;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;

/** Simultaneous faults (`rules/interactions.yaml`) through the real readers and the capped answer that a person sees. */
class InteractionsTest {
  private static final Set<String> KEYS =
      Set.of("interaction", "of", "state", "rig", "policy", "log", "silent", "order", "must-not", "calm", "verdict", "signal");

  @TempDir
  Path folder;

  static List<CaseFile.Case> all() throws IOException {
    List<CaseFile.Case> out = new ArrayList<>();
    for (Object raw : CaseFile.YAML.readValue(Files.readString(Path.of("rules", "interactions.yaml")), List.class)) {
      Map<String, Object> keys = new LinkedHashMap<>();
      ((Map<?, ?>) raw).forEach((k, v) -> keys.put(k.toString(), v));
      assertThat(KEYS).as("keys of %s", keys.get("interaction")).containsAll(keys.keySet());
      out.add(new CaseFile.Case(keys.get("interaction").toString(), keys));
    }
    return out;
  }

  @TestFactory
  Stream<DynamicTest> interactions() throws IOException {
    return all().stream().map(c -> DynamicTest.dynamicTest(c.hazard(), () -> check(c)));
  }

  /** Every entry has its turn, and no turn is told without the entry that it turns. */
  @Test
  void everyInteractionHasItsTurn() throws IOException {
    Set<String> turned = new TreeSet<>();
    Set<String> entries = new TreeSet<>();
    for (CaseFile.Case c : all()) {
      (c.has("of") ? turned : entries).add(c.has("of") ? c.word("of") : c.hazard());
    }
    assertThat(turned).isEqualTo(entries);
  }

  private void check(CaseFile.Case c) throws Exception {
    var log = Bench.log(c.list("log"), c.list("silent")).orElseThrow();
    assertThat(log.leftOut()).as("lines left out").isEmpty();
    Advice a = Advisor.advise(Bench.rig(c.map("rig"), folder), Bench.policy(c.map("policy"), folder), log, Optional.empty());
    List<String> wrong = new ArrayList<>();
    order(c, a, wrong);
    mustNot(c, a, wrong);
    if (!a.verdict().equals(c.word("verdict"))) {
      wrong.add("verdict: wanted " + c.word("verdict") + ", was " + a.verdict());
    }
    if (c.has("signal") && !Told.signal(a).equals(c.word("signal"))) {
      wrong.add("signal: wanted " + c.word("signal") + ", was " + Told.signal(a));
    }
    assertThat(wrong).as(() -> Told.whole(a)).isEmpty();
  }

  private static void order(CaseFile.Case c, Advice a, List<String> wrong) {
    List<String> wanted = c.list("order");
    List<String> left = new ArrayList<>(wanted);
    Told.deeds(a).forEach(d -> {
      if (!left.isEmpty() && left.get(0).equals(d)) {
        left.remove(0);
      }
    });
    if (!left.isEmpty()) {
      wrong.add("order: wanted " + wanted + ", missed from " + left.get(0) + " on, was " + Told.deeds(a));
    }
    List<String> two = wanted.stream().filter(Told::equipment).limit(2).toList();
    List<String> was = Told.deeds(a).stream().filter(Told::equipment).limit(two.size()).toList();
    if (!two.equals(was)) {
      wrong.add("first equipment steps: wanted " + two + ", were " + was);
    }
  }

  /** Told as a do-not, or never proposed; with `until` it may stand behind that deed or sign only. */
  private static void mustNot(CaseFile.Case c, Advice a, List<String> wrong) {
    List<String> deeds = Told.deeds(a);
    for (String entry : c.list("must-not")) {
      String[] deedAndUntil = entry.split(" until ", 2);
      int at = deeds.indexOf(deedAndUntil[0]);
      boolean behind = deedAndUntil.length == 2 && Told.behind(a, deedAndUntil[0], deedAndUntil[1]);
      if (at >= 0 && !behind) {
        wrong.add("must not: " + entry + ", was " + deeds);
      }
    }
    c.list("calm").stream().filter(deeds::contains).forEach(d -> wrong.add("must not be there: " + d));
  }
}
