package stillwarden.show;

import static org.assertj.core.api.Assertions.assertThat;

import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import stillwarden.describe.Defect;
import stillwarden.describe.LogReader;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RigReader;
import stillwarden.describe.RunLog;
import stillwarden.describe.Spot;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import tools.jackson.databind.JsonNode;
import tools.jackson.databind.json.JsonMapper;

class JsonViewTest {
  private static final JsonMapper JSON = new JsonMapper();
  private static final Schema SCHEMA =
      SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12).getSchema(AdviceSchema.text(), InputFormat.JSON);

  static List<Advice> answers() {
    return Samples.all();
  }

  @ParameterizedTest
  @MethodSource("answers")
  void everyAnswerIsValidAgainstThePrintedSchema(Advice advice) {
    assertThat(SCHEMA.validate(JsonView.of(advice), InputFormat.JSON)).isEmpty();
    assertThat(SCHEMA.validate(JsonView.line(advice), InputFormat.JSON)).isEmpty();
  }

  @Test
  void realAnswersAreValidToo() throws Unusable {
    Rig rig = RigReader.read(Path.of("src/test/resources/describe/bench4.rig.yaml"));
    RunLog log = LogReader.read(Path.of("src/test/resources/describe/bench4.run.jsonl"));
    Advice inspected = Advisor.inspect(rig, Policy.NONE, Optional.empty());
    Advice advised = Advisor.advise(rig, Policy.NONE, log, Optional.empty());
    assertThat(inspected.actions()).isNotEmpty();
    assertThat(advised.actions()).isNotEmpty();
    assertThat(SCHEMA.validate(JsonView.of(inspected), InputFormat.JSON)).isEmpty();
    assertThat(SCHEMA.validate(JsonView.of(advised), InputFormat.JSON)).isEmpty();
  }

  @Test
  void theSchemaRefusesAnAnswerWithoutAVerdictWithAnUnknownMemberOrWithABareNumber() {
    String good = JsonView.of(Samples.stop());
    assertThat(SCHEMA.validate(good.replace("\"verdict\": \"stop\",", ""), InputFormat.JSON)).isNotEmpty();
    assertThat(SCHEMA.validate(good.replace("\"more\"", "\"moar\""), InputFormat.JSON)).isNotEmpty();
    assertThat(SCHEMA.validate(good.replace("\"98.5432 Cel\"", "98.5432"), InputFormat.JSON)).isNotEmpty();
    assertThat(SCHEMA.validate(good.replace("\"reason\"", "\"method\""), InputFormat.JSON)).isNotEmpty();
  }

  @Test
  void membersStandInTheOrderOfTheSchema() {
    List<String> members = new ArrayList<>(JSON.readTree(JsonView.of(Samples.stop())).propertyNames());
    assertThat(members).containsExactly("format", "rig", "at", "stage", "verdict", "actions", "more", "do-not", "ask", "numbers",
        "to-start", "waivers", "left-out", "defers-to");
  }

  @Test
  void oneActionIsWrittenMemberByMember() {
    String line = JsonView.line(Samples.stop());
    assertThat(line).contains("{\"order\":1,\"do\":\"cut-power\",\"part\":\"mantle\",\"say\":\"Switch the heater off at the wall switch left "
        + "of the hood, not the dial.\",\"signal\":\"WARNING\",\"within\":\"PT5S\",\"state\":\"due\",\"because\":[{\"rule\":\"the flask "
        + "runs low and nothing is left to feed\",\"hazard\":\"flask-low-no-reserve\",\"facts\":[\"flask level low, seen 10:52:00 by nk\","
        + "\"reservoir empty, seen 10:52:05 by nk\"],\"source\":\"common practice\"}],\"cautions\":[\"The mantle stays hot after the power "
        + "is off: it must come away from the flask.\"],\"done-when\":\"switch off, seen\"}");
  }

  @Test
  void whatIsAbsentIsLeftOut() {
    JsonNode actions = JSON.readTree(JsonView.of(Samples.stop())).get("actions");
    assertThat(actions.get(1).get("within").stringValue()).isEqualTo("PT1M");
    assertThat(actions.get(2).has("within")).isFalse();
    assertThat(actions.get(0).has("if")).isFalse();
    assertThat(actions.get(4).get("if").stringValue()).isEqualTo("boiling has stopped");
    assertThat(actions.get(4).has("part")).isFalse();
    JsonNode bans = JSON.readTree(JsonView.of(Samples.stop())).get("do-not");
    assertThat(bans.get(0).has("until")).isFalse();
    assertThat(bans.get(1).get("until").stringValue()).isEqualTo("wait-quiet");
  }

  @Test
  void aNumberHasSixSignificantDigitsAndAUnit() {
    JsonNode number = JSON.readTree(JsonView.of(Samples.stop())).get("numbers").get(0);
    assertThat(number.get("value").stringValue()).isEqualTo("98.5432 Cel");
    assertThat(number.get("low").stringValue()).isEqualTo("98.4912 Cel");
    assertThat(number.get("high").stringValue()).isEqualTo("98.6 Cel");
  }

  @Test
  void aNumberThatCannotBeHadIsThereWithItsReason() {
    JsonNode number = JSON.readTree(JsonView.of(Samples.stop())).get("numbers").get(3);
    assertThat(number.get("value").isNull()).isTrue();
    assertThat(number.get("reason").stringValue()).isEqualTo("the jacket length is not stated");
    assertThat(number.has("low")).isFalse();
  }

  @Test
  void theSameAnswerGivesTheSameBytesWithLineFeedsOnly() {
    assertThat(JsonView.of(Samples.stop())).isEqualTo(JsonView.of(Samples.stop())).doesNotContain("\r").endsWith("}\n");
    assertThat(JsonView.line(Samples.stop()).indexOf('\n')).isEqualTo(JsonView.line(Samples.stop()).length() - 1);
  }

  @Test
  void severalRigsAreAnArrayWithTheUnusableOnesInTheirPlaces() {
    Defect defect = new Defect(new Spot("b.rig.yaml", 3, 5), "unknown key `volum`; the nearest is `volume`");
    JsonNode array = JSON.readTree(JsonView.of(List.of(
        new JsonView.Item("a.rig.yaml", Optional.of(Samples.start()), List.of()),
        new JsonView.Item("b.rig.yaml", Optional.empty(), List.of(defect)))));
    assertThat(array.get(0).get("verdict").stringValue()).isEqualTo("start");
    assertThat(array.get(1)).isEqualTo(JSON.readTree(
        "{\"file\":\"b.rig.yaml\",\"unusable\":[\"b.rig.yaml:3:5: unknown key `volum`; the nearest is `volume`\"]}"));
  }
}
