package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class InheritanceTest {
  private static final String HEAD = "format: stillwarden/rig/1\n";

  @TempDir Path folder;

  @BeforeEach
  void base() throws IOException {
    Files.copy(Path.of("src/test/resources/describe/bench4.rig.yaml"), folder.resolve("base.rig.yaml"));
  }

  private Rig read(String text) throws IOException, Unusable {
    return RigReader.read(Files.writeString(folder.resolve("today.rig.yaml"), HEAD + text));
  }

  private Unusable refused(String text) {
    Unusable u = catchThrowableOfType(Unusable.class, () -> read(text));
    assertThat(u).isNotNull();
    return u;
  }

  @Test
  void whatStandsIsInherited() throws Exception {
    Rig rig = read("based-on: base.rig.yaml\n");
    assertThat(rig.name()).isEqualTo("Bench 4, fennel");
    assertThat(rig.method()).isEqualTo("in-flask");
    assertThat(rig.si("flask.volume")).contains(0.001);
    assertThat(rig.si("mantle.power")).contains(380.0);
    assertThat(rig.word("condenser.coolant.plan")).contains("tempered");
    assertThat(rig.joints()).hasSize(6);
    assertThat(rig.joints().get(0).word("size")).contains("24/40");
    assertThat(rig.word("emergency.power-off")).isPresent();
  }

  /** Nobody's look of another day counts as today's. */
  @Test
  void whatWearsIsNeverInherited() throws Exception {
    Rig rig = read("based-on: base.rig.yaml\n");
    for (String path : new String[] {"seen.by", "seen.at", "nothing-else", "place.hood.running", "place.hood.in-hood", "charge.water", "flask.cracks",
        "flask.clamped", "flask.boiling-aid", "reservoir.water", "reservoir.stopcock", "reservoir.stopper", "condenser.coolant.flow-proven",
        "condenser.coolant.hoses-clipped", "condenser.coolant.supply", "people.goggles", "people.people-at-rig", "take-off.side-arm",
        "receiver.tip-below-liquid", "jack.tried", "mantle.cord-sound", "regulator.setting", "emergency.exit-clear"}) {
      assertThat(rig.word(path)).as(path).isEmpty();
    }
    rig.joints().forEach(j -> assertThat(j.keys().keySet()).containsOnly("size"));
  }

  /** The rule above for every key there is, not for those that somebody thought of. */
  @Test
  void noKeyMarkedAsWearingSurvives() throws Exception {
    Rig rig = read("based-on: base.rig.yaml\n");
    Vocabulary words = Vocabulary.get();
    rig.facts().keySet().forEach(path -> assertThat(words.facts().getOrDefault(path, words.facts().get("charge.oil.makeup")).wears()).as(path).isFalse());
    for (Map.Entry<String, Part> p : rig.parts().entrySet()) {
      p.getValue().keys().keySet().forEach(k -> assertThat(words.keys(p.getValue().kind()).get(k).wears()).as(p.getKey() + "." + k).isFalse());
    }
    assertThat(rig.openings()).isEmpty();
  }

  @Test
  void theFileItselfStandsAboveItsBaseKeyByKey() throws Exception {
    Rig rig = read("based-on: base.rig.yaml\nname: mine\nparts:\n  flask: { cracks: no }\n  mantle: { power: 250 W }\ncharge: { oil: { makeup: { " + oil() + ": 90 % } } }\n");
    assertThat(rig.name()).isEqualTo("mine");
    assertThat(rig.si("mantle.power")).contains(250.0);
    assertThat(rig.si("flask.volume")).contains(0.001);
    assertThat(rig.word("flask.cracks")).contains("no");
    assertThat(rig.facts().keySet().stream().filter(k -> k.startsWith("charge.oil.makeup."))).containsExactly("charge.oil.makeup." + oil());
  }

  private static String oil() {
    return Values.listed("substances").stream().findFirst().orElse("limonene");
  }

  @Test
  void listsAreReplacedWhole() throws Exception {
    assertThat(read("based-on: base.rig.yaml\njoints:\n  - { joins: [flask, claisen.foot], seated: yes }\n").joints()).hasSize(1);
  }

  @Test
  void aPartOfAnotherKindIsAnotherPart() throws Exception {
    Rig rig = read("based-on: base.rig.yaml\nparts:\n  mantle: { kind: gas-burner }\n");
    assertThat(rig.parts().get("mantle").keys()).isEmpty();
  }

  @Test
  void aChainIsFollowedFromEachFilesOwnFolder() throws Exception {
    Files.createDirectories(folder.resolve("benches"));
    Files.writeString(folder.resolve("benches/b.rig.yaml"), HEAD + "based-on: ../base.rig.yaml\nname: b\n");
    Rig rig = read("based-on: benches/b.rig.yaml\n");
    assertThat(rig.name()).isEqualTo("b");
    assertThat(rig.si("flask.volume")).contains(0.001);
  }

  @Test
  void aCircleIsRefusedNamingTheChain() throws Exception {
    Files.writeString(folder.resolve("b.rig.yaml"), HEAD + "based-on: today.rig.yaml\n");
    String told = refused("based-on: b.rig.yaml\n").defects().get(0).toString().replace(folder + "/", "");
    assertThat(told).isEqualTo("b.rig.yaml:2:11: `based-on` goes round in a circle: today.rig.yaml -> b.rig.yaml -> today.rig.yaml");
    assertThat(refused("based-on: today.rig.yaml\n").defects().get(0).message()).contains("circle");
  }

  @Test
  void aMissingBaseIsADefectOfTheFileThatNamesIt() throws Exception {
    Unusable u = refused("based-on: nowhere.rig.yaml\nname: 4\n");
    assertThat(u.defects()).hasSize(2);
    assertThat(u.defects().get(0).message()).isEqualTo("there is no file `nowhere.rig.yaml` beside this one");
    assertThat(refused("based-on: [a]\n").defects().get(0).message()).contains("takes the name of a rig file");
  }

  @Test
  void aDefectOfTheBaseIsToldWithTheBasesName() throws Exception {
    Files.writeString(folder.resolve("base.rig.yaml"), HEAD + "target: { distilate: 150 mL }\n");
    assertThat(refused("based-on: base.rig.yaml\n").defects().get(0).toString().replace(folder + "/", ""))
        .isEqualTo("base.rig.yaml:2:11: unknown key `distilate` in `target`; nearest is `distillate`");
  }
}
