package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import com.networknt.schema.InputFormat;
import com.networknt.schema.Schema;
import com.networknt.schema.SchemaRegistry;
import com.networknt.schema.SpecificationVersion;
import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** Schema and reader say the same about shapes: an independent validator holds the one against the other. */
class SchemaWriterTest {
  private static final Path DATA = Path.of("src/test/resources/describe");
  private static final SchemaRegistry REGISTRY = SchemaRegistry.withDefaultDialect(SpecificationVersion.DRAFT_2020_12);
  private static final Schema RIG = REGISTRY.getSchema(SchemaWriter.schema("rig"));
  private static final Schema POLICY = REGISTRY.getSchema(SchemaWriter.schema("policy"));
  private static final Schema LOG = REGISTRY.getSchema(SchemaWriter.schema("log"));

  @TempDir Path folder;

  private boolean rigReads(String yaml) throws IOException {
    try {
      RigReader.read(Files.writeString(folder.resolve("t.rig.yaml"), yaml));
      return true;
    } catch (Unusable e) {
      return false;
    }
  }

  private boolean policyReads(String yaml) throws IOException {
    try {
      PolicyReader.read(Files.writeString(folder.resolve("t.policy.yaml"), yaml));
      return true;
    } catch (Unusable e) {
      return false;
    }
  }

  private static boolean lineReads(String json) {
    try {
      return LogReader.read(new ByteArrayInputStream(json.getBytes(StandardCharsets.UTF_8)), "run").leftOut().isEmpty();
    } catch (Unusable e) {
      return false;
    }
  }

  @Test
  void theExamplesFitTheirSchemas() throws Exception {
    assertThat(RIG.validate(Files.readString(DATA.resolve("bench4.rig.yaml")), InputFormat.YAML)).isEmpty();
    assertThat(POLICY.validate(Files.readString(DATA.resolve("mill.policy.yaml")), InputFormat.YAML)).isEmpty();
    for (String line : Files.readAllLines(DATA.resolve("bench4.run.jsonl"))) {
      assertThat(LOG.validate(line, InputFormat.JSON)).as(line).isEmpty();
    }
  }

  @ParameterizedTest
  @ValueSource(strings = {
      "name: a",
      "place: { elevation: -20 m, barometer: 760 mmHg, hood: { running: no } }",
      "people: { people-at-rig: 0, arrives-within: 90 s }",
      "seen: { by: nk, at: \"2026-04-14T08:50:00+02:00\" }",
      "charge: { peroxide-test: { result: \"5 [ppm]\", on: 2026-04-01 }, foams: no, water: 1e3 mL }",
      "parts: { a: { kind: round-bottom-flask, necks: 2, volume: 1 L }, b: { kind: none-such-name, x: 1 } }",
      "parts: { thermometer: { kind: none } }",
      "parts: { c: { kind: liebig-condenser, coolant: { plan: held-off, supply: 12 °C, flow: 0.5 L/min } } }",
  })
  void aGoodRigFitsUnlessTheReaderRefusesItToo(String text) throws Exception {
    String yaml = "format: stillwarden/rig/1\n" + text + "\n";
    assertThat(RIG.validate(yaml, InputFormat.YAML).isEmpty()).isEqualTo(rigReads(yaml)).isEqualTo(!text.contains("none-such"));
  }

  @ParameterizedTest
  @ValueSource(strings = {
      "nmae: a", "name: 4", "place: { room: 21 }", "place: { room: 21 C }", "place: { room: \"1,5 Cel\" }", "charge: { water: 250 ML }",
      "charge: { water: 0400 mL }", "charge: { water: .5 L }", "charge: { water: 400 g }", "charge: { water: .inf }", "place: { hood: yes }",
      "place: { hood: { running: maybe } }", "place: { hood: { runing: yes } }", "people: { people-at-rig: 1.5 }", "people: { people-at-rig: 99 }",
      "people: { people-at-rig: two }", "seen: { at: \"2026-04-14T08:50:00\" }", "charge: { approval: { on: 14.4.2026 } }", "method: live-steam",
      "method: stew", "parts: { a: { kind: beeker } }", "parts: { a: { volume: 1 L } }", "parts: { a: { kind: beaker, power: 3 W } }",
      "parts: { a.b: { kind: beaker } }", "parts: [ a ]", "parts: { regulator: { kind: none, setting: 0 % } }", "joints: [ { joins: [a] } ]", "joints: { a: b }",
      "joints: [ { joins: [a, b], sizes: 24/40 } ]", "openings: { a.b: shut }", "charge: { oil: { makeup: { limonene: 8 } } }",
      "charge: { oil: { makeup: 80 % } }", "based-on: [a]", "charge: { cut: fine }", "target: { until: tomorrow }", "joints: [ { joins: [a, b], size: large } ]",
  })
  void aRigOfABadShapeIsRefusedByBoth(String text) throws Exception {
    String yaml = "format: stillwarden/rig/1\n" + text + "\n";
    assertThat(RIG.validate(yaml, InputFormat.YAML)).isNotEmpty();
    assertThat(rigReads(yaml)).isFalse();
  }

  @Test
  void aRigNeedsItsFormat() throws Exception {
    assertThat(RIG.validate("name: a\n", InputFormat.YAML)).isNotEmpty();
    assertThat(rigReads("name: a\n")).isFalse();
  }

  @Test
  void aPartMayTakeItsKindFromTheBase() throws Exception {
    Files.copy(DATA.resolve("bench4.rig.yaml"), folder.resolve("base.rig.yaml"));
    String yaml = "format: stillwarden/rig/1\nbased-on: base.rig.yaml\nparts: { flask: { cracks: no } }\n";
    assertThat(RIG.validate(yaml, InputFormat.YAML)).isEmpty();
    assertThat(rigReads(yaml)).isTrue();
  }

  @ParameterizedTest
  @ValueSource(strings = {
      "limits: { flask-fill-max: 0.4 }", "limits: { flask-fil-max: 40 % }", "limits: { dichloromethane: banned }", "limits: { low-level-factor: much }",
      "permits: { unattended: perhaps }", "permits: { naps: yes }", "coolant: warm", "shelf-life: { flask-level: 5 }", "shelf-life: { smoke: 5 min }",
      "waivers: none", "waivers: [ { limit: flask-fill-max } ]", "contacts: { emergency: 112 }", "sight: x",
  })
  void aPolicyOfABadShapeIsRefusedByBoth(String text) throws Exception {
    String yaml = "format: stillwarden/policy/1\n" + text + "\n";
    assertThat(POLICY.validate(yaml, InputFormat.YAML)).isNotEmpty();
    assertThat(policyReads(yaml)).isFalse();
  }

  @ParameterizedTest
  @ValueSource(strings = {
      "\"saw\":\"hiss\"", "\"saw\":\"hiss\",\"value\":\"no\",\"part\":\"joints[2]\"", "\"saw\":\"hiss\",\"value\":false", "\"saw\":\"foam\",\"value\":\"not-sure\"",
      "\"saw\":\"flask-level\",\"value\":\"300 mL\"", "\"saw\":\"flask-level\",\"value\":\"low\"", "\"saw\":\"injury\",\"value\":\"burn\",\"reach\":\"yes\"",
      "\"saw\":\"spill\",\"what\":\"oil\",\"value\":\"10 mL\"", "\"did\":\"cut-power\"", "\"did\":\"feed\",\"value\":\"50 mL\",\"id\":\"a\"", "\"did\":\"set-heat\",\"value\":\"40 %\"",
  })
  void aGoodLineIsTakenByBoth(String rest) {
    String line = "{\"at\":\"2026-04-14T09:10:00Z\",\"by\":\"nk\"," + rest + "}";
    assertThat(LOG.validate(line, InputFormat.JSON)).isEmpty();
    assertThat(lineReads(line)).isTrue();
  }

  @ParameterizedTest
  @ValueSource(strings = {
      "\"saw\":\"his\"", "\"saw\":\"drip\"", "\"saw\":\"drip\",\"value\":\"fast\"", "\"saw\":\"head-temperature\",\"value\":98", "\"saw\":\"head-temperature\",\"value\":\"98\"",
      "\"saw\":\"hiss\",\"did\":\"cut-power\"", "\"value\":\"yes\"", "\"saw\":\"hiss\",\"from\":\"tc\"", "\"saw\":\"hiss\",\"reach\":\"yes\"", "\"saw\":\"spill\",\"what\":\"wine\"",
      "\"saw\":\"steam\",\"value\":\"on\"", "\"did\":\"cut-power\",\"value\":\"60 %\"", "\"did\":\"set-heat\"", "\"did\":\"feed\",\"value\":\"not-sure\"", "\"saw\":\"hiss\",\"note\":\"x\"",
      "\"saw\":\"hiss\",\"value\":null", "\"saw\":5",
  })
  void aLineOfABadShapeIsRefusedByBoth(String rest) {
    String line = "{\"at\":\"2026-04-14T09:10:00Z\",\"by\":\"nk\"," + rest + "}";
    assertThat(LOG.validate(line, InputFormat.JSON)).isNotEmpty();
    assertThat(lineReads(line)).isFalse();
  }

  /** For every key there is: a value of its kind fits, a value of another kind does not. */
  @Test
  void everyClosedWordOfARigFitsItsSchema() throws Exception {
    Vocabulary words = Vocabulary.get();
    for (String kind : words.kinds()) {
      for (Key key : words.keys(kind).values()) {
        for (String value : key.closed() ? key.values() : List.<String>of()) {
          String inner = key.path().contains(".") ? key.path().replace(".", ": { ") + ": " + value + " }" : key.path() + ": " + value;
          String yaml = "format: stillwarden/rig/1\nparts: { x: { kind: " + kind + ", " + inner + " } }\n";
          assertThat(RIG.validate(yaml, InputFormat.YAML)).as(yaml).isEmpty();
          assertThat(rigReads(yaml)).as(yaml).isTrue();
          assertThat(RIG.validate(yaml.replace(": " + value, ": nonsense"), InputFormat.YAML)).as(yaml).isNotEmpty();
        }
      }
    }
  }

  @Test
  void aSchemaIsTheSameTextEachTimeAndAnUnknownOneIsRefused() {
    assertThat(SchemaWriter.schema("rig")).isEqualTo(SchemaWriter.schema("rig")).doesNotContain("\r").endsWith("}\n");
    assertThatThrownBy(() -> SchemaWriter.schema("advise")).isInstanceOf(IllegalArgumentException.class);
  }
}
