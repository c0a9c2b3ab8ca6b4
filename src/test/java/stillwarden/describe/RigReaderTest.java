package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class RigReaderTest {
  private static final String HEAD = "format: stillwarden/rig/1\n";
  private static final Path GOOD = Path.of("src/test/resources/describe/bench4.rig.yaml");

  @TempDir Path folder;

  private Rig read(String text) throws IOException, Unusable {
    return RigReader.read(file("t.rig.yaml", text));
  }

  private Path file(String name, String text) throws IOException {
    return Files.writeString(folder.resolve(name), text);
  }

  /** Every defect as one text, the folder's name left out. */
  private String refused(Path file) {
    Unusable u = catchThrowableOfType(Unusable.class, () -> RigReader.read(file));
    assertThat(u).as("the file must be refused").isNotNull();
    return u.defects().stream().map(d -> d.toString().replace(folder + "/", "")).collect(Collectors.joining("\n"));
  }

  private String refused(String text) throws IOException {
    return refused(file("t.rig.yaml", HEAD + text));
  }

  @Test
  void theExampleRigReadsWithoutADefect() throws Exception {
    Rig rig = RigReader.read(GOOD);
    assertThat(rig.name()).isEqualTo("Bench 4, fennel");
    assertThat(rig.parts().keySet()).startsWith("jack", "mantle", "regulator", "flask").hasSize(12);
    assertThat(rig.si("flask.volume")).contains(0.001);
    assertThat(rig.word("condenser.coolant.plan")).contains("tempered");
    assertThat(rig.si("charge.oil.makeup.estragole")).contains(0.12);
    assertThat(rig.joints()).hasSize(6);
    assertThat(rig.joints().get(0).a()).isEqualTo(new Port("flask", "neck"));
    assertThat(rig.nothingElse()).isTrue();
  }

  @Test
  void whatIsLeftOutIsAbsent() throws Exception {
    Rig rig = read(HEAD + "method: in-flask\nparts:\n  flask: { kind: round-bottom-flask }\n");
    assertThat(rig.word("flask.cracks")).isEmpty();
    assertThat(rig.facts()).isEmpty();
  }

  @Test
  void aMisspeltKeyNamesItsPlaceAndTheNearestWord() throws Exception {
    assertThat(refused("parts:\n  flask: { kind: round-bottom-flask, clampd: yes }\n"))
        .isEqualTo("t.rig.yaml:3:38: unknown key `clampd` in a round-bottom flask; nearest is `clamped`");
    assertThat(refused("place:\n  hood: { runing: yes }\n")).contains("unknown key `runing` in `place.hood`; nearest is `running`");
    assertThat(refused("jionts: []\n")).contains("unknown key `jionts`").contains("nearest is `joints`");
  }

  @Test
  void everyDefectIsToldAtOnce() throws Exception {
    String all = refused("place: { room: 21 C, elevaton: 2 m }\ncharge: { water: 400 }\n");
    assertThat(all.lines()).hasSize(3);
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(delimiter = '|', quoteCharacter = '\'', value = {
      "name: &a Bench                                              | anchor",
      "place: { room: *a }                                         | alias",
      "'place: &p { room: 21 Cel }\ncharge: *p'                    | alias",
      "'place: { <<: { room: 21 Cel } }'                           | merge key",
      "name: !!str Bench                                           | tag",
      "place: !thing { room: 21 Cel }                              | tag",
      "charge: { water: 0400 mL }                                  | starts with a zero",
      "charge: { water: 0o17 mL }                                  | is no unit of volume",
      "people: { people-at-rig: 012 }                              | bare whole number",
      "people: { people-at-rig: 1_0 }                              | bare whole number",
      "people: { people-at-rig: 1.0 }                              | bare whole number",
      "people: { people-at-rig: \"1\" }                            | bare whole number",
      "people: { people-at-rig: -1 }                               | less than can be",
      "'charge: { water: 1 mL, water: 2 mL }'                      | stands twice",
      "'name: a\n---\nname: b'                                     | second document",
      "'name: a\n...\n---\nname: b'                                | second document",
      "charge: { water: .inf }                                     | not a finite number",
      "charge: { water: .nan mL }                                  | not a finite number",
      "charge: { water: NaN }                                      | not a finite number",
      "charge: { water: 1e400 mL }                                 | too large",
      "charge: { water: 1e-400 mL }                                | too small",
      "charge: { water: 250 ML }                                   | did you mean `mL`",
      "'charge: { water: \"1,5 L\" }'                              | write a point: `1.5 L`",
      "'charge: { water: 1,5 L }'                                  | a comma in a number; write a point: `1.5 L`",
      "'charge: { material: fennel, crushed, water: 4 mL }'        | put the whole value in quotes",
      "charge: { water: 400 }                                      | has no unit",
      "charge: { water: \"400\" }                                  | has no unit",
      "charge: { water: 400 g }                                    | is no unit of volume",
      "charge: { water: -400 mL }                                  | less than can be",
      "place: { barometer: 1013 kPa }                              | more than can be",
      "place: { barometer: 49 kPa }                                | less than can be",
      "place: { room: 0x15 Cel }                                   | is no unit of temperature",
      "place: { hood: { running: true } }                          | `yes` or `no` is wanted",
      "place: { hood: { running: Yes } }                           | nearest is `yes`",
      "place: { hood: { running: on } }                            | `yes` or `no` is wanted",
      "place: { hood: { running: 1 } }                             | `yes` or `no` is wanted",
      "place: { hood: yes }                                        | takes keys",
      "place: { room: }                                            | has no value",
      "place: { room: ~ }                                          | has no value",
      "place: { room: \"\" }                                       | has no value",
      "place:                                                      | takes keys",
      "place: { room: [21 Cel] }                                   | takes one value",
      "place: { barometer-is: 4 }                                  | one of station, sea-level",
      "charge: { plant: 12 }                                       | words are wanted",
      "name: 4                                                     | words are wanted",
      "seen: { at: 2026-04-14T08:50:00 }                           | has no offset",
      "seen: { at: 2026-04-31T08:50:00Z }                          | is no day or time of the calendar",
      "seen: { at: yesterday }                                     | is no time",
      "charge: { approval: { on: 14.4.2026 } }                     | is no day",
      "'%YAML 1.1\n---\nname: a'                                   | no place here",
      "'? [a, b]\n: c'                                             | a key must be a word",
      "'place:\n\troom: 21 Cel'                                    | a tab where spaces are wanted",
      "'? { a: b }\n: c'                                           | a key must be a word",
      "name: 'a                                                    | is not YAML",
  })
  void aTrapIsRefused(String text, String wanted) throws IOException {
    Path file = text.startsWith("%") ? file("t.rig.yaml", text.replace("---\n", "---\n" + HEAD)) : file("t.rig.yaml", HEAD + text + "\n");
    assertThat(refused(file)).contains(wanted);
  }

  @Test
  void onlyWordsCountAsYesAndNoInYamlAndAlsoTrueAndFalseInJson() throws Exception {
    assertThat(read(HEAD + "place: { hood: { running: no, in-hood: 'yes' } }").word("place.hood.running")).contains("no");
    Path json = file("t.rig.json", "{\"format\":\"stillwarden/rig/1\",\"place\":{\"hood\":{\"running\":false,\"in-hood\":\"yes\"}}}");
    assertThat(RigReader.read(json).word("place.hood.running")).contains("no");
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(delimiter = '|', quoteCharacter = '\'', value = {
      "'{\"format\":\"stillwarden/rig/1\"} {}'                                       | something follows",
      "'{\"format\":\"stillwarden/rig/1\",\"format\":\"stillwarden/rig/1\"}'         | stands twice",
      "'{\"format\":\"stillwarden/rig/1\",\"name\":null}'                            | has no value",
      "'{\"format\":\"stillwarden/rig/1\",\"name\":NaN}'                             | is not JSON",
      "'{\"format\":\"stillwarden/rig/1\",\"charge\":{\"water\":1e400}}'             | has no unit",
      "'{\"format\":\"stillwarden/rig/1\",\"charge\":{\"water\":\"Infinity\"}}'      | not a finite number",
      "'{\"format\":\"stillwarden/rig/1\",\"charge\":{\"water\":400}}'               | has no unit",
      "'{\"format\":\"stillwarden/rig/1\",\"name\":4}'                               | words are wanted",
      "'{\"format\":\"stillwarden/rig/1\",\"name\":\"a\",}'                          | is not JSON",
      "'{\"format\":\"stillwarden/rig/1\" // x\n}'                                   | is not JSON",
      "'{\"format\":\"stillwarden/rig/1\"'                                           | is not JSON: it ends too early",
      "'[]'                                                                          | keys are wanted",
  })
  void aJsonTrapIsRefused(String text, String wanted) throws IOException {
    assertThat(refused(file("t.rig.json", text))).contains(wanted);
  }

  @Test
  void aPlaceInJsonIsCountedInCharactersNotBytes() throws Exception {
    Path f = file("t.rig.json", "{\"format\":\"stillwarden/rig/1\",\"name\":\"äöü\",\"colour\":\"x\"}");
    assertThat(refused(f)).startsWith("t.rig.json:1:44: unknown key `colour`");
  }

  @Test
  void largeDeepAndLongFilesAreRefusedBeforeTheyCost() throws Exception {
    assertThat(refused("# " + "x".repeat(256 * 1024))).contains("larger than 256 KiB");
    assertThat(refused("name: " + "x".repeat(8 * 1024 + 1))).contains("longer than 8 KiB");
    assertThat(refused("name: " + "[".repeat(40) + "]".repeat(40))).contains("nested deeper than 32");
    String json = "{\"format\":\"stillwarden/rig/1\",\"name\":" + "[".repeat(5000) + "]".repeat(5000) + "}";
    assertThat(refused(file("t.rig.json", json))).contains("nested deeper than 32");
  }

  @Test
  void manyKeysAreRefusedBeforeTheyCost() throws Exception {
    StringBuilder keys = new StringBuilder("parts:\n");
    for (int i = 0; i < 20_000; i++) {
      keys.append("  p").append(i).append(": 1\n");
    }
    assertThat(refused(keys.toString())).contains("more than 1000 entries");
    StringBuilder json = new StringBuilder("{\"format\":\"stillwarden/rig/1\",\"joints\":[0");
    assertThat(refused(file("t.rig.json", json.append(",0".repeat(2000)).append("]}").toString()))).contains("more than 1000 entries");
  }

  @Test
  void noMoreThanTwoHundredDefectsAreTold() throws Exception {
    StringBuilder keys = new StringBuilder();
    for (int i = 0; i < 900; i++) {
      keys.append("k").append(i).append(": 1\n");
    }
    assertThat(refused(keys.toString()).lines()).hasSize(200);
  }

  @Test
  void aByteOrderMarkAndWindowsLineEndsAreTaken() throws Exception {
    assertThat(read("\uFEFF" + HEAD.replace("\n", "\r\n") + "name: Bench\r\n").name()).isEqualTo("Bench");
  }

  @Test
  void whatIsNotUtf8NamesItsLine() throws Exception {
    Path f = Files.write(folder.resolve("t.rig.yaml"), (HEAD + "name: B\u00e4nk\n").getBytes(StandardCharsets.ISO_8859_1));
    assertThat(refused(f)).isEqualTo("t.rig.yaml:2: is not UTF-8 text; save it as UTF-8");
  }

  @Test
  void aFileThatIsNotThereOrEmptyOrAFolderIsRefused() throws Exception {
    assertThat(refused(folder.resolve("none.yaml"))).endsWith("none.yaml: there is no such file");
    assertThat(refused(folder)).contains("is a folder");
    assertThat(refused(file("e.rig.yaml", ""))).contains("is empty");
    assertThat(refused(file("e.rig.yaml", "# nothing\n"))).contains("is empty");
    assertThat(refused(file("e.rig.json", " \n"))).contains("is empty");
    assertThat(refused(file("e.rig.yaml", "just words\n"))).contains("keys are wanted");
  }

  @Test
  void theFormatMustBeSaidAndRight() throws Exception {
    assertThat(refused(file("t.rig.yaml", "name: a\n"))).contains("`format` is missing");
    assertThat(refused(file("t.rig.yaml", "format: stillwarden/rig/2\n"))).contains("`stillwarden/rig/2` where `stillwarden/rig/1` is wanted");
  }

  @Test
  void aMethodThatIsNotBuiltYetIsRefusedWithNothingElse() throws Exception {
    assertThat(refused("method: live-steam\nsteam: { source: line }\n")).isEqualTo("t.rig.yaml:2:9: method `live-steam` can't be judged yet");
    assertThat(refused("method: in-flusk\n")).contains("nearest is `in-flask`");
    assertThat(refused("work-up: { in-hood: yes }\n")).contains("can't be judged yet");
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(delimiter = '|', quoteCharacter = '\'', value = {
      "'[flask, claisen.fot]'        | its ports are foot, straight, curved",
      "'[flask, claisen]'            | has several ports; say which: foot, straight, curved",
      "'[flask, mantle]'             | is a heating mantle and has no port",
      "'[flask, clasen.foot]'        | there is no part `clasen` in this file; nearest is `claisen`",
      "'[flask, receiver]'           | is `kind: none`",
      "'[claisen.foot, claisen.curved]' | joined to itself",
      "'[flask]'                     | two ports",
      "'flask'                       | two ports",
      "'[flask.neck-2, claisen.foot]' | with more necks say how many",
      "'[flask, 3]'                  | a port is wanted",
  })
  void aJointNeedsPortsThatAreThere(String joins, String wanted) throws IOException {
    String parts = "parts:\n  mantle: { kind: heating-mantle }\n  receiver: { kind: none }\n"
        + "  flask: { kind: round-bottom-flask }\n  claisen: { kind: claisen-adapter }\n";
    assertThat(refused(parts + "joints:\n  - { joins: " + joins + " }\n")).contains(wanted);
  }

  @Test
  void aPortIsInOneJointOrOpeningOnly() throws Exception {
    String parts = "parts:\n  a: { kind: round-bottom-flask, necks: 2 }\n  b: { kind: claisen-adapter }\n  c: { kind: still-head }\n";
    assertThat(refused(parts + "joints:\n  - { joins: [a.neck-1, b.foot] }\n  - { joins: [c.foot, b.foot] }\n"))
        .contains("`b.foot` is in joint 1 and in joint 2");
    assertThat(refused(parts + "joints:\n  - { joins: [a.neck-1, b.foot] }\nopenings: { b.foot: open }\n")).contains("`b.foot` is in joint 1 and in `openings`");
    assertThat(read(HEAD + parts + "openings: { a.neck-2: stoppered }\n").openings()).containsKey(new Port("a", "neck-2"));
    assertThat(refused(parts + "openings: { a.neck-3: stoppered }\n")).contains("its ports are neck-1, neck-2");
    assertThat(refused(parts + "openings: { a.neck-2: shut }\n")).contains("one of open, tube, capped, stoppered");
  }

  @Test
  void namesOfPartsAndKindsAreChecked() throws Exception {
    assertThat(refused("parts:\n  place: { kind: beaker }\n")).contains("means something else here");
    assertThat(refused("parts:\n  a.b: { kind: beaker }\n")).contains("is no name of a part");
    assertThat(refused("parts:\n  a: { kind: beeker }\n")).contains("nearest is `beaker`");
    assertThat(refused("parts:\n  a: { kind: liebig }\n")).contains("nearest is `liebig-condenser`");
    assertThat(refused("parts:\n  a: { kind: round-bottom-flask, boiling-aid: stones }\n")).as("two words have it: neither is suggested").doesNotContain("nearest");
    assertThat(refused("parts:\n  a: { volume: 1 L }\n")).contains("needs a `kind`");
    assertThat(refused("parts:\n  a: beaker\n")).contains("needs a `kind`");
    assertThat(refused("parts:\n  a: { kind: oil-trap }\n")).contains("can't be judged yet");
    assertThat(refused("parts:\n  thing: { kind: none }\n")).contains("does not tell what there is none of");
    assertThat(read(HEAD + "parts:\n  lab-jack: { kind: none }\n").parts().get("lab-jack").kind()).isEqualTo("none");
  }

  @Test
  void aNamedPartMustBeThere() throws Exception {
    assertThat(refused("parts:\n  m: { kind: heating-mantle, stands-on: jck }\n  jack-2: { kind: lab-jack }\n"))
        .contains("`jck` for `stands-on`: the name of a part of this file or one of jack, ring, bench is wanted; nearest is `jack`");
  }

  @Test
  void oneThingSaidTwiceAndDifferentlyIsRefused() throws Exception {
    assertThat(refused("parts:\n  t: { kind: vacuum-adapter, side-arm: open }\nopenings: { t.side-arm: stoppered }\n"))
        .contains("`openings.t.side-arm` is `stoppered`, but `t.side-arm` is `open` in line 3");
  }

  @Test
  void whatStandsFreeIsInNoJoint() throws Exception {
    String parts = "parts:\n  t: { kind: vacuum-adapter, side-arm: open }\n  r: { kind: beaker, held: free }\n  h: { kind: vent-hose }\n";
    assertThat(refused(parts + "joints: [ { joins: [t.outlet, r] } ]\n")).isEqualTo("t.rig.yaml:4:28: `r.held` is `free`, but `r.mouth` is in joint 1");
    assertThat(refused(parts + "joints: [ { joins: [t.side-arm, h.inlet] } ]\n")).contains("`t.side-arm` is `open`, but `t.side-arm` is in joint 1");
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(delimiter = '|', quoteCharacter = '^', value = {
      "name: a: b                          | a `:` where none can be",
      "name: 'a                            | a quote is not closed",
      "place: { room: 21 Cel               | a `,` or a closing `}` is missing",
      "joints: [ a                         | a `,` or a closing `]` is missing",
      "name: %a                            | put it in quotes",
      "name: @a                            | put it in quotes",
      "^place:\n  room: 21 Cel\n hood: x^  | the indentation does not fit",
  })
  void aFaultOfYamlIsToldInWordsOfTheTrade(String text, String wanted) throws IOException {
    assertThat(refused(text + "\n")).contains(wanted);
  }

  @Test
  void sharesOfTheOilAddUpToTheWholeAtMost() throws Exception {
    List<String> plain = Values.listed("substances").stream().filter(n -> n.matches("[a-z]+")).toList();
    String known = plain.get(0);
    String other = plain.get(1);
    String oil = "charge: { oil: { makeup: { " + known + ": 80 %, " + other + ": ";
    assertThat(refused(oil + "30 % } } }\n")).contains("adds up to 110.0 %");
    assertThat(refused(oil + "20 } } }\n")).contains("has no unit");
    assertThat(refused(oil + "-1 % } } }\n")).contains("less than can be");
    assertThat(read(HEAD + oil + "20.3 % } } }\n").si("charge.oil.makeup." + known)).contains(0.8);
    assertThat(refused("charge: { oil: { makeup: 80 % } }\n")).contains("takes names with their shares");
  }

  @Test
  void theDigestIsOfWhatIsSaidNotOfHowItIsWritten() throws Exception {
    String a = read(HEAD + "name: x # note\ncharge: { water: 450 mL, salt: 0 g }\n").digest();
    assertThat(a).matches("sha256:[0-9a-f]{64}").isEqualTo(read(HEAD + "charge: { salt: 0 g, water: 0.45 L }\nname: x\n").digest());
    assertThat(a).isNotEqualTo(read(HEAD + "name: x\ncharge: { water: 451 mL, salt: 0 g }\n").digest());
  }

  @Test
  void aWordThatATerminalWouldObeyIsMadeHarmless() throws Exception {
    Path f = file("t.rig.json", "{\"format\":\"stillwarden/rig/1\",\"\\u001b[31mred\\u202e\":1}");
    assertThat(refused(f)).contains("unknown key `?[31mred?`").doesNotContain("\u001b");
  }

  @Test
  void nestedWordsThatBelongElsewhereAreSentThere() throws Exception {
    assertThat(refused("running: yes\n")).contains("it belongs at `place.hood.running`");
  }

  @Test
  void aDefectEndsAFileOnlyOnceAtOnePlace() throws Exception {
    Unusable u = catchThrowableOfType(Unusable.class, () -> read(HEAD + "a: &x 1\nb: *x\n"));
    assertThat(u.defects().stream().map(Defect::spot).distinct().count()).isEqualTo(u.defects().size());
    assertThat(List.copyOf(u.defects())).isNotEmpty();
  }
}
