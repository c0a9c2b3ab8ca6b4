package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class AtmosphereTest {
  @ParameterizedTest
  @CsvSource({"0, 101.325", "500, 95.461", "1000, 89.875", "2500, 74.683", "3000, 70.109"}) // ISO 2533:1975, geopotential heights
  void standardPressure(double metres, double kilopascal) {
    assertThat(Atmosphere.standard(metres) / 1000).isCloseTo(kilopascal, offset(0.02));
  }

  @Test
  void theBarometerOfThePlaceComesFirst() {
    Atmosphere a = Atmosphere.of(Optional.of(98_000.0), Optional.of("station"), Optional.of(250.0));
    assertThat(a.pascal().orElseThrow().nominal()).isEqualTo(98_000);
    assertThat(a.conflict()).isEmpty();
  }

  @Test
  void aSeaLevelPressureIsBroughtToTheElevation() {
    Atmosphere a = Atmosphere.of(Optional.of(101_325.0), Optional.of("sea-level"), Optional.of(1000.0));
    assertThat(a.pascal().orElseThrow().nominal() / 1000).isCloseTo(89.875, offset(0.02)); // ISO 2533
  }

  @Test
  void aSeaLevelPressureWithoutElevationSaysNothing() {
    assertThat(Atmosphere.of(Optional.of(101_325.0), Optional.of("sea-level"), Optional.empty()).pascal()).isEmpty();
  }

  @Test
  void barometerAndElevationThatDisagreeAreAFactAndWidenTheBand() {
    Atmosphere a = Atmosphere.of(Optional.of(101_300.0), Optional.of("station"), Optional.of(1000.0));
    assertThat(a.conflict().orElseThrow()).isCloseTo(11_425, offset(50.0));
    assertThat(a.pascal().orElseThrow().low()).isCloseTo(89_875, offset(50.0));
  }

  @Test
  void justUnderThreeKilopascalIsNoConflict() {
    assertThat(Atmosphere.of(Optional.of(101_325.0 - 2900), Optional.of("station"), Optional.of(0.0)).conflict()).isEmpty();
    assertThat(Atmosphere.of(Optional.of(101_325.0 - 3100), Optional.of("station"), Optional.of(0.0)).conflict()).isPresent();
  }

  @Test
  void nothingKnownIsUnknownNotSeaLevel() {
    assertThat(Atmosphere.of(Optional.empty(), Optional.empty(), Optional.empty()).pascal()).isEmpty();
  }
}
