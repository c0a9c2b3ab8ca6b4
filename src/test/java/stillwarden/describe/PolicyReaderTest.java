package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.catchThrowableOfType;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.time.Instant;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PolicyReaderTest {
  private static final String HEAD = "format: stillwarden/policy/1\n";
  private static final String WAIVER = "waivers: [ { limit: flask-fill-max, who: nk, why: trial, until: 2026-05-01 } ]\n";

  @TempDir Path folder;

  private Policy read(String text) throws IOException, Unusable {
    return PolicyReader.read(Files.writeString(folder.resolve("p.policy.yaml"), HEAD + text));
  }

  private String refused(String text) {
    Unusable u = catchThrowableOfType(Unusable.class, () -> read(text));
    assertThat(u).as("the policy must be refused").isNotNull();
    return String.join("\n", u.defects().stream().map(Defect::message).toList());
  }

  @Test
  void theExampleReadsWithoutADefect() throws Exception {
    Policy p = PolicyReader.read(Path.of("src/test/resources/describe/mill.policy.yaml"));
    assertThat(p.site()).isEqualTo("Lower mill laboratory");
    assertThat(p.limits()).containsEntry("flask-fill-max", 0.5).containsEntry("face-velocity-min", 0.5);
    assertThat(p.words()).containsEntry("dichloromethane", "forbidden");
    assertThat(p.permits("plant-as-boiling-aid")).isTrue();
    assertThat(p.permits("unattended")).isFalse();
    assertThat(p.coolant()).contains("before-heat");
    assertThat(p.shelfLife()).containsEntry("flask-level", Duration.ofMinutes(5));
    assertThat(p.digest()).matches("sha256:[0-9a-f]{64}");
  }

  @Test
  void aLimitMayBeTightened() throws Exception {
    Policy p = read("limits: { flask-fill-max: 40 %, time-to-minimum-min: 8 min, low-level-factor: 1.5, jacket-cold-start-max: 50 Cel }\n");
    assertThat(SiteLimits.value(p, "flask-fill-max")).isEqualTo(0.4);
    assertThat(SiteLimits.value(p, "time-to-minimum-min")).isEqualTo(480);
    assertThat(SiteLimits.value(p, "low-level-factor")).isEqualTo(1.5);
    assertThat(SiteLimits.value(Policy.NONE, "low-level-factor")).isEqualTo(1.25);
  }

  @Test
  void aLooserLimitIsRefusedNamingBothValues() {
    assertThat(refused("limits: { flask-fill-max: 60 % }\n"))
        .isEqualTo("`60 %` for `flask-fill-max` is looser than 50 %, which holds without a policy; loosening it needs an entry in `waivers`");
    assertThat(refused("limits: { quiet-time-min: 1 min }\n")).contains("looser than 300 s").contains("guards life and takes no waiver");
    assertThat(refused("limits: { jacket-cold-start-max: 70 Cel }\n")).contains("looser than 60 Cel");
  }

  @Test
  void aWaiverLoosensUntilItIsOverAndIsThenReported() throws Exception {
    Policy p = read("limits: { flask-fill-max: 60 % }\n" + WAIVER);
    Optional<Instant> during = Optional.of(Instant.parse("2026-05-01T23:00:00Z"));
    Optional<Instant> after = Optional.of(Instant.parse("2026-05-02T00:00:00Z"));
    assertThat(p.expired(during)).isEmpty();
    assertThat(SiteLimits.value(p.asOf(during), "flask-fill-max")).isEqualTo(0.6);
    assertThat(p.expired(after)).hasSize(1);
    assertThat(SiteLimits.value(p.asOf(after), "flask-fill-max")).isEqualTo(0.5);
    assertThat(SiteLimits.value(p.asOf(Optional.empty()), "flask-fill-max")).as("no instant known: nothing dated is in force").isEqualTo(0.5);
  }

  @Test
  void anExpiredWaiverTakesNoTighteningAway() throws Exception {
    Policy p = read("limits: { flask-fill-max: 40 % }\n" + WAIVER);
    assertThat(SiteLimits.value(p.asOf(Optional.of(Instant.parse("2030-01-01T00:00:00Z"))), "flask-fill-max")).isEqualTo(0.4);
  }

  @Test
  void whatGuardsLifeTakesNoWaiver() {
    SiteLimits.all().values().stream().filter(SiteLimits.Limit::danger).forEach(l ->
        assertThat(refused("waivers: [ { limit: " + l.key() + ", who: a, why: b, until: 2026-05-01 } ]\n")).contains("guards life").contains("takes no waiver"));
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(delimiter = '|', quoteCharacter = '\'', value = {
      "limits: { flask-fil-max: 40 % }                  | nearest is `flask-fill-max`",
      "limits: { unattended: no }                       | it belongs under `permits`",
      "limits: { flask-fill-max: 0.4 }                  | has no unit",
      "limits: { flask-fill-max: -40 % }                | less than zero",
      "limits: { flask-fill-max: }                      | has no value",
      "limits: { low-level-factor: much }               | a factor is wanted",
      "limits: { low-level-factor: 1.2 }                | looser than 1.25",
      "limits: { dichloromethane: banned }              | one of allowed, forbidden",
      "limits: [ 1 ]                                    | takes keys with values",
      "permits: { unattended: true }                    | `yes` or `no` is wanted",
      "permits: { unatended: no }                       | nearest is `unattended`",
      "coolant: warm                                    | one of before-heat, tempered, held-off",
      "shelf-life: { flask-level: 10 min }              | may only shorten",
      "shelf-life: { flask-level: 0 min }               | may only shorten",
      "shelf-life: { flask-level: 5 }                   | has no unit",
      "shelf-life: { smoke: 5 min }                     | unknown look",
      "contacts: { emergency: 112 }                     | words are wanted",
      "waivers: [ { limit: flask-fill-max, who: nk } ]  | here `why` is missing",
      "waivers: [ { limit: x, who: a, why: b, until: 2026-05-01 } ] | unknown limit `x`",
      "waivers: [ { limit: flask-fill-max, who: a, why: b, until: soon } ] | is no day",
      "waivers: none                                    | takes a list",
      "polcy: x                                         | unknown key `polcy` in a policy file",
      "limit: { flask-fill-max: 40 % }                  | nearest is `limits`",
  })
  void aSlipIsRefused(String text, String wanted) {
    assertThat(refused(text + "\n")).contains(wanted);
  }

  @Test
  void everyLimitSaysWhatItGuardsWhereItIsFromAndWhoseItIs() {
    Knowledge.section("limits").fields().values().stream().filter(t -> t.has("tighter")).forEach(t -> {
      for (String key : new String[] {"value", "guards", "source", "proposal", "danger"}) {
        assertThat(t.text(key)).as(key + " of " + t).isPresent();
      }
    });
  }
}
