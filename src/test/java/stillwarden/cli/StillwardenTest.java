package stillwarden.cli;

import static org.assertj.core.api.Assertions.assertThat;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.time.Clock;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

class StillwardenTest {
  private final ByteArrayOutputStream out = new ByteArrayOutputStream();
  private final ByteArrayOutputStream err = new ByteArrayOutputStream();
  private final FakeEngine engine = new FakeEngine();
  private Instant now = Instant.parse("2026-04-14T10:33:05Z");

  private int run(String... args) {
    return fed("", args);
  }

  private int fed(String text, String... args) {
    InputStream in = new ByteArrayInputStream(text.getBytes(StandardCharsets.UTF_8));
    PrintStream o = new PrintStream(out, true, StandardCharsets.UTF_8);
    PrintStream e = new PrintStream(err, true, StandardCharsets.UTF_8);
    return Stillwarden.run(new Desk(engine, in, o, e, Clock.fixed(now, ZoneOffset.UTC)), args).code();
  }

  private String out() {
    return out.toString(StandardCharsets.UTF_8);
  }

  private String err() {
    return err.toString(StandardCharsets.UTF_8);
  }

  @ParameterizedTest
  @CsvSource({"start, 0", "carry-on, 0", "not-yet, 1", "adjust, 1", "wind-down, 1", "stop, 1", "bad, 2", "broken, 2", "unlinked, 2"})
  void theExitStatusSaysWhetherThereIsSomethingToDo(String rig, int status) {
    assertThat(run("inspect", rig)).isEqualTo(status);
  }

  @Test
  void ofSeveralRigsTheWorstCounts() {
    assertThat(run("inspect", "start", "not-yet", "start")).isEqualTo(1);
    assertThat(run("inspect", "bad", "not-yet", "start")).isEqualTo(2);
  }

  @Test
  void severalRigsInJsonAreAnArrayInTheOrderGiven() {
    assertThat(run("inspect", "--format", "json", "stop", "bad", "start")).isEqualTo(2);
    JsonNode array = new JsonMapper().readTree(out());
    assertThat(array.get(0).get("verdict").stringValue()).isEqualTo("stop");
    assertThat(array.get(1).get("file").stringValue()).isEqualTo("bad");
    assertThat(array.get(1).get("unusable").size()).isEqualTo(2);
    assertThat(array.get(2).get("verdict").stringValue()).isEqualTo("start");
  }

  @Test
  void oneRigInJsonIsOneObject() {
    run("inspect", "--format=json", "start");
    assertThat(new JsonMapper().readTree(out()).get("format").stringValue()).isEqualTo("stillwarden/advice/1");
    assertThat(err()).isEmpty();
  }

  @Test
  void everyDefectStandsOnALineOfStandardError() {
    run("inspect", "bad");
    assertThat(err()).isEqualTo("bad:3:5: unknown key `volum`\nbad:9:1: empty value\n");
    assertThat(out()).isEmpty();
  }

  @Test
  void aFaultOfTheProgramIsOnePlainLineWithoutATrace() {
    assertThat(run("inspect", "broken")).isEqualTo(2);
    assertThat(err()).startsWith("stillwarden: the program failed (a bug)").hasLineCount(1).doesNotContain("Exception", "\tat ");
    assertThat(out()).isEmpty();
  }

  @ParameterizedTest
  @ValueSource(strings = {"", "inspekt a", "inspect", "inspect --format xml a", "advise a", "inspect --wrong a", "advise a - --at noon",
      "schema rigs", "rules no-such-hazard", "advise a - --follow --at now", "plan a b", "serve", "audit a", "print a"})
  void aWrongCommandLineIsTwoAndSaysWhatWouldBeRight(String line) {
    assertThat(run(line.isEmpty() ? new String[0] : line.split(" "))).isEqualTo(2);
    assertThat(err()).startsWith("stillwarden: ").contains("--help").doesNotContain("Exception");
    assertThat(out()).isEmpty();
  }

  @Test
  void aMistypedCommandNamesTheNearest() {
    run("inspekt", "a");
    assertThat(err()).contains("unknown command `inspekt`; the nearest is `inspect`");
  }

  @Test
  void helpAndVersionGoToStandardOutputAndListOnlyWhatExists() {
    assertThat(run("--help")).isZero();
    assertThat(out()).contains("inspect", "plan", "advise", "rules", "schema").doesNotContain("audit", "serve", "print ");
    assertThat(run("--version")).isZero();
    assertThat(out()).contains("stillwarden ");
    assertThat(err()).isEmpty();
  }

  @Test
  void anAnswerIsForTheGivenTimeOrForTheMachinesClockOrForTheLog() {
    run("inspect", "start", "--at", "2026-04-14T10:52:05+02:00");
    run("inspect", "start", "--at", "now");
    run("inspect", "start");
    assertThat(engine.asked).containsExactly(Optional.of(OffsetDateTime.parse("2026-04-14T10:52:05+02:00")),
        Optional.of(OffsetDateTime.ofInstant(now, ZoneOffset.UTC)), Optional.empty());
  }

  @Test
  void anOldAnswerSaysItsAgeFirstOnStandardError() {
    assertThat(fed("2026-04-14T09:52:05Z stop\n", "advise", "rig", "-")).isEqualTo(1);
    assertThat(err()).isEqualTo("as of 09:52:05, 41 min ago; for this minute add --at now\n");
    assertThat(out()).startsWith("STOP");
  }

  @ParameterizedTest
  @CsvSource({"2026-04-14T09:54:05Z, 0", "2026-04-14T09:54:06Z, 1", "2026-04-14T08:00:00Z, 0"})
  void twoMinutesAreNotOld(String clock, int lines) {
    now = Instant.parse(clock);
    fed("2026-04-14T09:52:05Z carry-on\n", "advise", "rig", "-");
    assertThat(err().lines().count()).isEqualTo(lines);
  }

  @Test
  void withAtNothingIsSaidAboutAge() {
    fed("2026-04-14T09:52:05Z carry-on\n", "advise", "rig", "-", "--at", "now");
    assertThat(err()).isEmpty();
  }

  @Test
  void colourIsNeverPrinted() {
    assertThat(run("inspect", "start", "--no-color")).isZero();
    run("--help");
    assertThat(out()).doesNotContain("\u001b");
  }

  @Test
  void aLogWithoutAUsableLineIsTwo() {
    assertThat(fed("", "advise", "rig", "-")).isEqualTo(2);
    assertThat(fed("", "advise", "rig", "-", "--follow")).isEqualTo(2);
    assertThat(err()).isEqualTo("-: no usable line\n-: no usable line\n");
  }

  @Test
  void followPrintsOnlyWhatChangesAndEndsWithTheInput() {
    String log = """
        2026-04-14T09:00:00Z carry-on
        2026-04-14T09:01:00Z carry-on
        2026-04-14T09:02:00Z stop
        2026-04-14T09:03:00Z stop
        2026-04-14T09:04:00Z carry-on""";
    assertThat(fed(log, "advise", "rig", "-", "--follow", "--format", "json")).isZero();
    assertThat(out().lines().map(l -> new JsonMapper().readTree(l).get("at").stringValue()))
        .containsExactly("2026-04-14T09:00Z", "2026-04-14T09:02Z", "2026-04-14T09:04Z");
    assertThat(err()).isEmpty();
  }

  @Test
  void followOfAFileThatIsNotThereIsTwo() {
    assertThat(run("advise", "rig", "/no/such/log", "--follow")).isEqualTo(2);
    assertThat(err()).isEqualTo("/no/such/log: want a run log that can be read\n");
  }

  @Test
  void schemaAndPlanGoToStandardOutput() {
    assertThat(run("schema", "log")).isZero();
    assertThat(run("plan", "start", "--format", "json")).isZero();
    assertThat(out()).startsWith("{\"title\": \"log\"}\n").contains("stillwarden/plan/1");
  }
}
