package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;
import static org.assertj.core.data.Percentage.withPercentage;

import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class HeatTest {
  @ParameterizedTest
  @CsvSource({"duty, 0.60", "voltage, 0.36", "phase, 0.69"}) // 60 % on a dial is 36 to 69 % of full power by control type (computed elsewhere)
  void sixtyOnADial(String control, double share) {
    assertThat(Heat.meaning(0.6, control).nominal()).isCloseTo(share, offset(0.005));
  }

  @Test
  void anUnknownControlIsTheBandOfAllThree() {
    Band b = Heat.meaning(0.6, "unknown");
    assertThat(b.low()).isCloseTo(0.36, offset(0.005));
    assertThat(b.high()).isCloseTo(0.69, offset(0.005));
  }

  /** P = 1 - a/pi + sin(2a)/(2 pi) integrated numerically over the conducting part of a half wave. */
  @ParameterizedTest
  @CsvSource({"0.2", "0.5", "0.8"})
  void phaseControlIsTheAreaUnderTheSineSquared(double dial) {
    double sum = 0;
    int n = 20_000;
    for (int i = 0; i < n; i++) {
      double angle = Math.PI * (i + 0.5) / n;
      sum += angle > Math.PI * (1 - dial) ? Math.pow(Math.sin(angle), 2) * 2 / n : 0;
    }
    assertThat(Heat.meaning(dial, "phase").nominal()).isCloseTo(sum, offset(1e-3));
  }

  @ParameterizedTest
  @CsvSource({"50, 1.33", "100, 2.66", "200, 5.32", "300, 7.98"}) // g/min at 100 degC, from IAPWS-IF97
  void boilUpOfNetPower(double watts, double gramsPerMinute) {
    assertThat(watts / WaterSteam.latentHeat(373.12) * 6e4).isCloseTo(gramsPerMinute, withPercentage(1));
  }

  @ParameterizedTest
  @CsvSource({"2, 86", "3, 128", "4, 171"}) // Ph. Eur. distillation rates as heat, cooled to 25 degC, computed elsewhere
  void dutyOfPharmacopoeiaRates(double millilitresPerMinute, double watts) {
    double kilograms = millilitresPerMinute / 6e7 * 997;
    assertThat(kilograms * (WaterSteam.latentHeat(373.12) + WaterSteam.warming(298.15, 373.12))).isCloseTo(watts, withPercentage(1));
  }

  @Test
  void fiftyMillilitresOfColdFeedStopATwoHundredWattBoilFor84Seconds() { // computed elsewhere
    assertThat(ClosedVessel.reboil(0.050, 293.15, 373.15, 200)).isCloseTo(84, offset(1.0));
  }

  @Test
  void nineMillilitresAMinuteTakeAQuarterOfTwoHundredWatts() { // computed elsewhere
    assertThat(0.25 * 200 / (998 * WaterSteam.warming(293.15, 373.15)) * 6e7).isCloseTo(9, offset(0.2));
  }

  @Test
  void aStandingFlaskCoolsByNewtonsLaw() { // 2093 J/K, 10 W/(m2 K), 0.035 m2, 100 to 50 degC in 20 degC air: 98 min (computed elsewhere)
    double radius = Math.sqrt(0.035 / (4 * Math.PI));
    double volume = 4 / 3.0 * Math.PI * radius * radius * radius;
    Band seconds = ClosedVessel.cooling(Band.of(0.5 * 4186), volume, 373.15, 323.15, 293.15).orElseThrow();
    assertThat(seconds.high() / 60).as("at 10 W/(m2 K)").isCloseTo(98, offset(1.0));
    assertThat(seconds.low() / 60).as("at 20 W/(m2 K)").isCloseTo(49, offset(1.0));
  }

  @Test
  void cooledGlassNeedsNoMoreCooling() {
    assertThat(ClosedVessel.cooling(Band.of(2000), 1e-3, 310, 323.15, 293.15)).isEqualTo(Optional.empty());
  }
}
