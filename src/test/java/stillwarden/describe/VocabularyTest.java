package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;

class VocabularyTest {
  private static final Tree WALK = Knowledge.section("checklists").get("en").get("walk-round");
  private static final Tree READS = Knowledge.section("checklists").get("en").get("observations");

  private final Vocabulary words = Vocabulary.get();

  private Set<String> everythingThatCanBeAsked() {
    Set<String> out = new TreeSet<>(words.facts().keySet());
    words.roles().forEach(role -> {
      out.add(role);
      Set<String> receivers = words.keysOfRole("receiver").keySet();
      Set<String> heads = words.keysOfRole("head").keySet();
      words.keysOfRole(role).keySet().stream()
          .filter(k -> !role.equals("flask") || !receivers.contains(k) || heads.contains(k) || k.equals("volume"))
          .forEach(k -> out.add(role + "." + k));
    });
    words.jointKeys().keySet().forEach(k -> out.add("joint." + k));
    words.observations().values().stream().filter(o -> !o.later()).forEach(o -> out.add(o.id()));
    out.addAll(List.of("method", "openings", "joints"));
    return out;
  }

  @Test
  void theWalkRoundAsksForEverythingAndForNothingElse() {
    assertThat(WALK.get("asks").fields().keySet()).containsExactlyInAnyOrderElementsOf(everythingThatCanBeAsked());
  }

  @Test
  void theWalkRoundGoesAlongTheBench() {
    List<String> stations = WALK.get("stations").items().stream().map(s -> s.text("id").orElseThrow()).toList();
    List<String> walked = WALK.get("asks").fields().values().stream().map(a -> a.text("station").orElseThrow()).distinct().toList();
    assertThat(walked).isEqualTo(stations);
  }

  @Test
  void everyQuestionAsksForWhatIsSeenInAFewWords() {
    Map<String, Tree> asks = WALK.get("asks").fields();
    asks.forEach((about, ask) -> {
      String say = ask.text("say").orElseThrow();
      assertThat(say).as(about).endsWith("?").doesNotContainIgnoringCase("checked").doesNotContainIgnoringCase("safe");
      assertThat(say.split(" ").length).as(say).isLessThanOrEqualTo(14);
    });
    assertThat(asks.values().stream().map(a -> a.text("say").orElseThrow()).collect(Collectors.toSet()).size()).as("questions told apart").isGreaterThan(asks.size() - 5);
  }

  @Test
  void everyObservationHasWordsForEvidence() {
    assertThat(READS.fields().keySet()).containsExactlyInAnyOrderElementsOf(
        words.observations().values().stream().filter(o -> !o.later()).map(Observation::id).toList());
    READS.fields().forEach((id, t) -> {
      List<String> known = new ArrayList<>(words.observation(id).orElseThrow().key().values());
      assertThat(known).as(id).containsAll(t.get("values").fields().keySet());
      if (words.observation(id).orElseThrow().key().type() == Key.Type.TRI) {
        assertThat(t.get("values").fields().keySet()).as(id).containsExactlyInAnyOrder("yes", "no");
      }
    });
  }

  @Test
  void everyKeyIsWhole() {
    List<Key> all = new ArrayList<>(words.facts().values());
    words.roles().forEach(r -> all.addAll(words.keysOfRole(r).values()));
    all.addAll(words.jointKeys().values());
    words.observations().values().forEach(o -> all.add(o.key()));
    for (Key k : all) {
      assertThat(k.means()).as(k.path()).isNotBlank();
      assertThat(k.closed() ? k.values().size() : 2).as(k.path()).isGreaterThanOrEqualTo(2);
      boolean number = k.type() == Key.Type.QUANTITY || k.type() == Key.Type.LEVEL || k.type() == Key.Type.COUNT;
      assertThat(number).as(k.path()).isEqualTo(k.dimension().isPresent());
      if (number) {
        assertThat(k.from().orElseThrow()).as(k.path()).isLessThan(k.to().orElseThrow());
      }
    }
  }

  @Test
  void portsAndRolesAreAsTheTradeNamesThem() {
    assertThat(words.role("heating-mantle")).contains("heater");
    assertThat(words.role("spoon")).isEmpty();
    assertThat(words.ports("claisen-adapter", OptionalDouble.empty())).containsExactly("foot", "straight", "curved");
    assertThat(words.ports("round-bottom-flask", OptionalDouble.of(3))).containsExactly("neck-1", "neck-2", "neck-3");
    assertThat(words.ports("round-bottom-flask", OptionalDouble.empty())).containsExactly("neck");
    assertThat(words.noneOf("mantle")).contains("heater");
    assertThat(words.glass("still-head")).isTrue();
    assertThat(words.glass("lab-jack")).isFalse();
  }

  @Test
  void valuesRunFromCalmToWorst() {
    assertThat(words.keys("round-bottom-flask").get("cracks").values()).containsExactly("no", "yes");
    assertThat(words.keys("round-bottom-flask").get("clamped").values()).containsExactly("yes", "no");
    assertThat(words.observation("vapour-past-condenser").orElseThrow().key().values()).containsExactly("none", "wisps", "plume");
    assertThat(words.observation("flask-level").orElseThrow().key().values()).containsExactly("full", "ok", "low", "nearly-dry", "dry");
  }

  @Test
  void looksHaveTheirShelfLives() {
    assertThat(words.observation("path").orElseThrow().shelf()).contains(Duration.ofMinutes(5));
    assertThat(words.shelfIn("after-disturbance", "path")).contains(Duration.ofMinutes(1));
    assertThat(words.shelfIn("heat-up", "foam")).contains(Duration.ofMinutes(1));
    assertThat(words.shelfIn("freezing", "condenser-solids")).contains(Duration.ofMinutes(2));
    assertThat(words.observation("barometer").orElseThrow().shelf()).contains(Duration.ofHours(12));
    assertThat(words.observation("smoke").orElseThrow().look()).isFalse();
    words.observations().values().stream().filter(o -> o.look() && !o.id().equals("tip")).forEach(o -> assertThat(o.shelf()).as(o.id()).isPresent());
  }

  /** A derived sign that goes on in an observation's words must have all of them; `jacket` has words of its own. */
  @Test
  void aDerivedSignOfAnObservationsNameKnowsItsWords() {
    Knowledge.section("words").get("signs").fields().forEach((sign, t) -> words.observation(sign).ifPresent(o -> {
      List<String> seen = new ArrayList<>(o.key().values());
      boolean ownWords = !seen.removeAll(t.words("values"));
      assertThat(ownWords ? List.of() : seen).as("words of observation `" + sign + "` that its sign can't have").isEmpty();
    }));
  }
}
