package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class LogReaderTest {
  private static final String OK = "{\"at\":\"2026-04-14T09:02:00Z\",\"by\":\"nk\",\"did\":\"heat-on\",\"value\":\"60 %\"}\n";

  private static RunLog read(String text) throws Unusable {
    return LogReader.read(new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8)), "run");
  }

  /** One line with single quotes for double ones, between two good lines. */
  private static RunLog between(String line) throws Unusable {
    return read(OK + line.replace('\'', '"') + "\n" + OK);
  }

  private static String line(String rest) {
    return "{'at':'2026-04-14T09:10:00Z','by':'nk'," + rest + "}";
  }

  @Test
  void theExampleReadsWithoutALineLeftOut() throws Exception {
    RunLog log = LogReader.read(Path.of("src/test/resources/describe/bench4.run.jsonl"));
    assertThat(log.leftOut()).isEmpty();
    assertThat(log.entries()).hasSize(7);
    assertThat(log.header()).containsEntry("rig", "bench4.rig.yaml").doesNotContainKey("format");
    assertThat(log.entries().get(0).measured().orElseThrow().si()).isEqualTo(0.6);
    assertThat(log.entries().get(1).text()).isEqualTo("yes");
    assertThat(log.entries().get(2).instrument()).isTrue();
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(delimiter = '|', quoteCharacter = '^', value = {
      "'saw':'foam','value':'risng'                  | nearest is `rising`                 | foam",
      "'saw':'faom'                                  | unknown observation `faom`; nearest is `foam` | foam",
      "'did':'cut-powr'                              | unknown deed `cut-powr`; nearest is `cut-power` | cut-power",
      "'saw':'head-temperature','value':98.1         | has no unit                         | head-temperature",
      "'saw':'head-temperature','value':'98.1'       | has no unit                         | head-temperature",
      "'saw':'head-temperature','value':'98 C'       | did you mean `Cel`                  | head-temperature",
      "'saw':'head-temperature','value':'201 Cel'    | more than can be                    | head-temperature",
      "'saw':'head-temperature'                      | needs a `value`                     | head-temperature",
      "'saw':'barometer','value':'1013 kPa'          | more than can be                    | barometer",
      "'saw':'flask-level','value':'-5 mL'           | less than can be                    | flask-level",
      "'saw':'flask-level','value':'lo'              | nearest is `low`                    | flask-level",
      "'saw':'flask-level','value':'250 ML'          | did you mean `mL`                   | flask-level",
      "'saw':'drip'                                  | needs a `value`: one of drops, stream, slugs, none | drip",
      "'saw':'hiss','value':'maybe'                  | `yes` or `no` is wanted             | hiss",
      "'saw':'hiss','value':null                     | has no value                        | hiss",
      "'saw':'hiss','value':['yes']                  | takes one value                     | hiss",
      "'saw':'hiss','vlaue':'yes'                    | unknown key `vlaue`; nearest is `value` | hiss",
      "'saw':'hiss','did':'cut-power'                | both stand here                     | hiss",
      "'value':'yes'                                 | one of `saw` and `did` is missing   | ^^",
      "'saw':'hiss','from':'tc-1'                    | `by` and `from` both stand here     | hiss",
      "'saw':'hiss','saw':'foam'                     | stands twice                        | hiss",
      "'saw':'hiss','reach':'yes'                    | belongs to an injury                | hiss",
      "'saw':'hiss','what':'oil'                     | does not belong to `hiss`           | hiss",
      "'saw':'spill','what':'wine'                   | one of water, oil, other, solvent   | spill",
      "'saw':'spill','value':'no','what':'oil'       | says that nothing was               | spill",
      "'saw':'hiss','corrects':'n1'                  | no earlier line has that id         | hiss",
      "'saw':'steam','value':'on'                    | can't be judged yet                 | steam",
      "'saw':5                                       | takes a word                        | ^^",
      "'did':'cut-power','value':'60 %'              | takes no value                      | cut-power",
      "'did':'set-heat'                              | needs a `value`                     | set-heat",
      "'did':'set-heat','value':'160 %'              | more than can be                    | set-heat",
      "'did':'feed','value':'not-sure'               | is not a number with a unit         | feed",
      "'saw':'head-temperature','value':'NaN'        | not a finite number                 | head-temperature",
      "'saw':'head-temperature','value':1e400        | has no unit                         | head-temperature",
      "'saw':'head-temperature','value':'1e400 Cel'  | too large                           | head-temperature",
      "'saw':'head-temperature','value':NaN          | is not JSON                         | head-temperature",
  })
  void aBadLineIsLeftOutWithItsReasonAndTheRestCounts(String rest, String reason, String about) throws Exception {
    RunLog log = between(line(rest));
    assertThat(log.entries()).hasSize(2);
    assertThat(log.leftOut()).hasSize(1);
    assertThat(log.leftOut().get(0).reason()).contains(reason);
    assertThat(log.leftOut().get(0).line()).isEqualTo(2);
    assertThat(log.leftOut().get(0).about()).isEqualTo(about == null ? "" : about);
    assertThat(log.leftOut().get(0).at()).isEqualTo("2026-04-14T09:10:00Z");
    assertThat(log.leftOut().get(0).torn()).isFalse();
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(delimiter = '|', quoteCharacter = '^', value = {
      "2026-04-14T09:10:00       | has no offset",
      "2026-04-14 09:10:00Z      | is no time",
      "09:10                     | is no time",
      "2026-02-30T09:10:00Z      | is no day or time of the calendar",
      "1999-12-31T23:59:59Z      | a slip in the year",
      "2206-04-14T09:10:00Z      | a slip in the year",
  })
  void aTimeThatCannotBeIsLeftOut(String at, String reason) throws Exception {
    assertThat(between("{'at':'" + at + "','by':'nk','saw':'hiss'}").leftOut().get(0).reason()).contains(reason);
  }

  @Test
  void aLineWithoutTimeOrObserverIsLeftOut() throws Exception {
    assertThat(between("{'by':'nk','saw':'hiss'}").leftOut().get(0).reason()).contains("`at` is missing");
    assertThat(between("{'at':'2026-04-14T09:10:00Z','saw':'hiss'}").leftOut().get(0).reason()).contains("one of `by` and `from` is missing");
    assertThat(between("['hiss']").leftOut().get(0).reason()).contains("a line is `{...}`");
  }

  @Test
  void notSureIsAlwaysAllowedAndKeptAsSuch() throws Exception {
    for (String id : Vocabulary.get().observations().keySet()) {
      if (!Vocabulary.get().observation(id).orElseThrow().later()) {
        RunLog log = between(line("'saw':'" + id + "','value':'not-sure'"));
        assertThat(log.leftOut()).as(id).isEmpty();
        assertThat(log.entries().get(1).text()).isEqualTo("not-sure");
      }
    }
  }

  @Test
  void everyValueOfEveryObservationIsTaken() throws Exception {
    for (Observation o : Vocabulary.get().observations().values()) {
      for (String value : o.later() ? java.util.List.<String>of() : o.key().values()) {
        assertThat(between(line("'saw':'" + o.id() + "','value':'" + value + "'")).leftOut()).as(o.id() + " " + value).isEmpty();
      }
    }
  }

  @Test
  void everyActionThatCanBeAdvisedCanBeLogged() throws Exception {
    assertThat(Knowledge.section("actions").fields()).isNotEmpty();
    for (String id : Knowledge.section("actions").fields().keySet()) {
      Deed deed = Vocabulary.get().deeds().get(id);
      if (!deed.later() && !deed.valueRequired()) {
        assertThat(between(line("'did':'" + id + "'")).leftOut()).as(id).isEmpty();
      }
    }
  }

  @Test
  void aTornLastLineIsReportedAndLeftOut() throws Exception {
    RunLog log = read(OK + "{\"at\":\"2026-04-14T09:10:00Z\",\"by\":\"nk\",\"saw\":\"smo");
    assertThat(log.entries()).hasSize(1);
    assertThat(log.leftOut()).containsExactly(new RunLog.LeftOut(2, "the last line is torn", "smoke", "2026-04-14T09:10:00Z", true));
  }

  @Test
  void aLastLineThatIsWholeCountsWithoutItsLineEnd() throws Exception {
    assertThat(read(OK + OK.strip()).entries()).hasSize(2);
  }

  @Test
  void aTornCharacterAtTheEndIsATornLine() throws Exception {
    byte[] whole = (OK + "{\"by\":\"J\u00fc").getBytes(StandardCharsets.UTF_8);
    RunLog log = LogReader.read(new ByteArrayInputStream(whole, 0, whole.length - 1), "run");
    assertThat(log.leftOut().get(0).torn()).isTrue();
  }

  @Test
  void aLogWithNoUsableLineIsRefusedWithItsReasons() {
    Unusable u = catchThrowableOfType(Unusable.class, () -> read("{}\nnonsense\n"));
    assertThat(u.defects()).hasSize(3);
    assertThat(u.defects().get(0)).hasToString("run: has no line that can be used");
    assertThat(u.defects().get(2).spot().line()).isEqualTo(2);
    assertThat(catchThrowableOfType(Unusable.class, () -> read(""))).isNotNull();
    assertThat(catchThrowableOfType(Unusable.class, () -> LogReader.read(Path.of("no-such.run.jsonl"))).defects().get(0).message()).isEqualTo("there is no such file");
    assertThat(catchThrowableOfType(Unusable.class, () -> LogReader.read(Path.of("src")))).isNotNull();
  }

  @Test
  void anotherFormatIsRefusedWhole() {
    Unusable u = catchThrowableOfType(Unusable.class, () -> read("{\"format\":\"stillwarden/log/2\"}\n" + OK));
    assertThat(u.defects().get(0)).hasToString("run:1: `format` is `stillwarden/log/2` where `stillwarden/log/1` is wanted");
  }

  @Test
  void aSecondHeaderIsLeftOut() throws Exception {
    assertThat(between("{'format':'stillwarden/log/1'}").leftOut().get(0).reason()).contains("one header");
    assertThat(read("{\"format\":\"stillwarden/log/1\",\"rgi\":\"x\"}\n" + OK).leftOut().get(0).reason()).contains("nearest is `rig`");
  }

  @Test
  void linesOfAdviceShownAndBlankLinesAreSkipped() throws Exception {
    RunLog log = between("{'at':'2026-04-14T09:10:00Z','shown':{'verdict':'stop'}}\n\n\r");
    assertThat(log.entries()).hasSize(2);
    assertThat(log.leftOut()).isEmpty();
    assertThat(log.entries().get(1).line()).isEqualTo(5);
  }

  @Test
  void windowsLineEndsAndAByteOrderMarkAreTaken() throws Exception {
    assertThat(read("\uFEFF" + OK.replace("\n", "\r\n")).leftOut()).isEmpty();
  }

  @Test
  void anOverlongLineIsLeftOut() throws Exception {
    RunLog log = read(OK + "{\"x\":\"" + "y".repeat(70_000) + "\"}\n" + OK);
    assertThat(log.leftOut().get(0).reason()).contains("longer than 64 KiB");
    assertThat(log.entries()).hasSize(2);
  }

  @Test
  void aCorrectionMayMendALineThatWasLeftOut() throws Exception {
    String bad = line("'saw':'head-temperature','value':98,'id':'n1'").replace('\'', '"') + "\n";
    String mend = line("'saw':'head-temperature','value':'98 Cel','corrects':'n1'").replace('\'', '"') + "\n";
    RunLog log = read(bad + mend);
    assertThat(log.leftOut()).hasSize(1);
    assertThat(log.entries().get(0).corrects()).contains("n1");
  }

  @Test
  void anIdNamesOneLineOnly() throws Exception {
    RunLog log = between(line("'saw':'hiss','id':'a'") + "\n" + line("'saw':'hiss','id':'a'"));
    assertThat(log.leftOut().get(0).reason()).contains("names an earlier line already");
  }

  @Test
  void spillsSayWhatAndHowMuchAndInjuriesWhetherTheSwitchIsInReach() throws Exception {
    Entry spill = between(line("'saw':'spill','value':'10 mL','what':'solvent'")).entries().get(1);
    assertThat(spill.text()).isEqualTo("solvent");
    assertThat(spill.measured().orElseThrow().si()).isEqualTo(1e-5);
    Entry burn = between(line("'saw':'injury','value':'burn','reach':'no'")).entries().get(1);
    assertThat(burn.reach()).contains("no");
  }

  @Test
  void aGrowingLogIsReadLineByLine() throws Exception {
    LogReader reader = new LogReader("-");
    assertThat(reader.add("{\"format\":\"stillwarden/log/1\",\"rig\":\"a\"}")).isEmpty();
    assertThat(reader.add(OK.strip())).isPresent();
    assertThat(reader.add("nonsense")).isEmpty();
    assertThat(reader.log().entries()).hasSize(1);
    assertThat(reader.log().leftOut().get(0).line()).isEqualTo(3);
    assertThat(reader.log().header()).containsEntry("rig", "a");
  }

  @Test
  void aGrowingLogHasTheSameNets() throws Exception {
    LogReader reader = new LogReader("-");
    assertThat(reader.add("\uFEFF" + OK.strip())).isPresent();
    assertThat(reader.add("{\"x\":\"" + "y".repeat(70_000) + "\"}")).isEmpty();
    assertThat(reader.log().leftOut().get(0).reason()).contains("longer than 64 KiB");
  }

  @Test
  void theOffsetIsKeptAsWritten() throws Exception {
    Entry e = between("{'at':'2026-04-14T11:10:00+02:00','by':'nk','saw':'hiss'}").entries().get(1);
    assertThat(e.when().getOffset().getTotalSeconds()).isEqualTo(7200);
    assertThat(e.at()).hasToString("2026-04-14T09:10:00Z");
  }
}
