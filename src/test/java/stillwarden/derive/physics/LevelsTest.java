package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import stillwarden.describe.Policy;

/** The words of the project's contract: ok from 1.25 x the minimum, reservoir low under a quarter, receiver full from 80 %. */
class LevelsTest {
  @ParameterizedTest
  @CsvSource({"dry, 0, 0", "nearly-dry, 0, 150", "low, 150, 187.5", "ok, 187.5, 500", "full, 500, 1000"})
  void aFlaskOfOneLitreWithAMarkAt150(String word, double low, double high) {
    Band b = Levels.flask(word, 1e-3, 150e-6, Policy.NONE).orElseThrow();
    assertThat(b.low() * 1e6).isCloseTo(low, offset(1e-6));
    assertThat(b.high() * 1e6).isCloseTo(high, offset(1e-6));
    assertThat(b.nominal()).as("times come from the worse end").isEqualTo(b.low());
  }

  @ParameterizedTest
  @CsvSource({"0, dry", "60, nearly-dry", "149.9, nearly-dry", "150, low", "187.4, low", "187.6, ok", "700, full"})
  void theWordForALevel(double millilitres, String word) {
    assertThat(Levels.flaskWord(millilitres * 1e-6, 1e-3, 150e-6, 50e-6, Policy.NONE)).isEqualTo(word);
  }

  @Test
  void withoutAMarkTheMinimumIsAFifthAndNeverUnderTheSolids() {
    assertThat(Levels.minimum(1e-3, Optional.empty(), 0)).isCloseTo(200e-6, offset(1e-9));
    assertThat(Levels.minimum(1e-3, Optional.empty(), 300e-6)).isEqualTo(300e-6);
    assertThat(Levels.minimum(1e-3, Optional.of(100e-6), 150e-6)).isEqualTo(150e-6);
  }

  @ParameterizedTest
  @CsvSource({"empty, 0", "low, 62.5", "ok, 200", "full, 250"})
  void aReceiversWorseEndIsItsUpper(String word, double upper) {
    assertThat(Levels.receiver(word, 250e-6).orElseThrow().nominal() * 1e6).isCloseTo(upper, offset(1e-6));
  }

  @Test
  void aReservoirIsLowUnderAQuarter() {
    assertThat(Levels.reservoirWord(62.0e-6, 250e-6)).isEqualTo("low");
    assertThat(Levels.reservoirWord(63.0e-6, 250e-6)).isEqualTo("ok");
    assertThat(Levels.reservoirWord(0, 250e-6)).isEqualTo("empty");
  }

  @Test
  void aSiteMayRaiseTheFactor() {
    Policy strict = Rigs.policy(java.util.Map.of("low-level-factor", 1.5), java.util.Map.of(), null);
    assertThat(Levels.flask("ok", 1e-3, 150e-6, strict).orElseThrow().low() * 1e6).isCloseTo(225, offset(1e-6));
  }

  @Test
  void notSureIsNoLevel() {
    assertThat(Levels.flask("not-sure", 1e-3, 150e-6, Policy.NONE)).isEmpty();
  }
}
