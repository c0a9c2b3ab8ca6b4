package stillwarden.order;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import stillwarden.describe.Knowledge;
import stillwarden.describe.Tree;

/** The words of the checklists against the ids that rules can use. */
class ActionWordsTest {
  /** Deeds that are only ever forbidden; every action can be forbidden too. */
  private static final Set<String> FORBIDDEN = Set.of("open-joint", "press-joint", "loosen-lid", "open-hot", "pull-stopper",
      "close-opening", "stopper-reservoir", "seal-warm", "open-feed", "feed-fast", "add-liquid", "add-solids", "start-stirrer",
      "restart-heat", "open-steam-wide", "lift-flask", "carry-burning", "poke-plug", "blow-through", "coolant-cold", "pour-on-glass",
      "chill-glass", "force-stopcock", "drain-pressurised", "touch-wet", "wipe-heater", "use-dial", "reset-breaker", "refit-hose",
      "step-in-water", "open-sash", "reach-over", "lean-over-outlet", "go-back", "touch-person", "water-on-fire", "new-flame",
      "blow-out-flame", "heat-gun", "use-ice", "rub-eye", "sniff", "trust-reading", "wait-and-see", "top-up-trap", "shake-funnel",
      "heat-funnel", "drain-unproven", "discard-layer", "to-dryness", "scrape", "clean-unventilated", "mix-waste");

  private static final Set<String> FIELDS = Set.of("say", "part", "caution", "done-when", "clears-within", "not", "variants");

  private static final Pattern SHARPENED = Pattern.compile("proposeAs\\(\"([a-z-]+)\",\\s*\"([a-z-]+)\"\\)");

  private static Tree words() {
    return Knowledge.section("checklists").get("en").get("actions");
  }

  private static Map<String, Tree> deeds() {
    return words().get("deeds").fields();
  }

  /** Every sentence that can be shown as a deed, by {@code id} or {@code id/variant}. */
  private static Map<String, String> says() {
    Map<String, String> out = new HashMap<>();
    deeds().forEach((id, deed) -> {
      deed.text("say").ifPresent(s -> out.put(id, s));
      deed.get("variants").fields().forEach((v, s) -> out.put(id + "/" + v, s.text().orElse("")));
    });
    return out;
  }

  private static Map<String, String> bans() {
    Map<String, String> out = new HashMap<>();
    words().get("forbidden").fields().forEach((id, ban) -> out.put(id, ban.text("not").orElse("")));
    deeds().forEach((id, deed) -> out.put(id, deed.text("not").orElse("")));
    return out;
  }

  @Test
  void everyActionOfTheLadderHasWordsAndNoOtherHas() {
    assertThat(new TreeSet<>(deeds().keySet())).isEqualTo(new TreeSet<>(Knowledge.section("actions").fields().keySet()));
  }

  @Test
  void everyForbiddenDeedHasWordsAndNoOtherHas() {
    assertThat(new TreeSet<>(words().get("forbidden").fields().keySet())).isEqualTo(new TreeSet<>(FORBIDDEN));
  }

  @Test
  void everyDeedSaysWhatToDoWhenItIsDoneAndHowItIsForbidden() {
    assertThat(deeds()).allSatisfy((id, deed) -> {
      assertThat(deed.text("say")).as(id).isPresent();
      assertThat(deed.text("done-when")).as(id).isPresent();
      assertThat(deed.text("not")).as(id).isPresent();
      assertThat(FIELDS).as(id).containsAll(deed.fields().keySet());
      deed.text("clears-within").ifPresent(d -> assertThat(Duration.parse(d)).as(id).isPositive());
    });
  }

  /** A rule that asks for a sharpened wording which is not there would silently get the plain one. */
  @Test
  void everySharpenedWordingThatARuleAsksForIsThere() throws IOException {
    List<String> asked = new ArrayList<>();
    try (Stream<Path> files = Files.walk(Path.of("rules"))) {
      for (Path drl : files.filter(f -> f.toString().endsWith(".drl")).toList()) {
        SHARPENED.matcher(Files.readString(drl)).results().forEach(m -> asked.add(m.group(1) + "/" + m.group(2)));
      }
    }
    assertThat(asked).allSatisfy(a -> assertThat(says()).containsKey(a));
  }

  @Test
  void noTwoIdsHaveTheSameWords() {
    List<String> all = new ArrayList<>();
    says().values().forEach(s -> all.add(plain(s)));
    bans().values().forEach(s -> all.add(plain(s)));
    assertThat(all).doesNotHaveDuplicates();
  }

  @Test
  void aDeedIsOneSentenceOfAtMostTwelveWords() {
    assertThat(says()).allSatisfy((id, say) -> {
      assertThat(say.split("\\s+").length).as("words of %s: %s", id, say).isLessThanOrEqualTo(12);
      assertThat(say).as(id).matches("[A-Z][^.!?]*\\.");
    });
  }

  @Test
  void aBanBeginsWithDoNotAndIsShort() {
    assertThat(bans()).allSatisfy((id, ban) -> {
      assertThat(ban).as(id).matches("Do not [^.!?]*\\.");
      assertThat(ban.split("\\s+").length).as("words of %s: %s", id, ban).isLessThanOrEqualTo(12);
    });
  }

  @Test
  void noWordingPromisesThatAnythingIsSafe() {
    assertThat(words().raw().toString()).doesNotContainPattern("(?i)\\b(safe|safely)\\b");
  }

  @Test
  void onlyKnownPlaceholdersStandInTheWords() {
    assertThat(says().values()).allSatisfy(s -> assertThat(s.replace("{part}", "").replace("{power-off}", "")).doesNotContain("{"));
    says().forEach((id, say) -> {
      if (say.contains("{part}")) {
        assertThat(deeds().get(id.split("/")[0]).text("part")).as(id).isPresent();
      }
    });
  }

  private static String plain(String s) {
    return s.toLowerCase().replaceAll("[^a-z ]", "").strip();
  }
}
