package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;
import static org.assertj.core.data.Percentage.withPercentage;

import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class CondenserTest {
  private static final Condenser.Allowed ALLOWED = new Condenser.Allowed(20, 0.2);

  private static Condenser with(double area, double celsius, Double litresPerMinute, String medium) {
    Optional<Double> flow = Optional.ofNullable(litresPerMinute).map(f -> f / 60 * 0.998);
    return new Condenser(Band.of(area), Band.of(celsius + 273.15), flow, medium, false, List.of());
  }

  @ParameterizedTest
  @CsvSource({"150, 10, 215", "150, 20, 108"}) // coolant for 150 W, cp 4.182: computed elsewhere
  void leastCoolantFlow(double watts, double rise, double millilitres) {
    assertThat(Condenser.leastFlow(watts, rise, 288.15) / 998 * 6e7).isCloseTo(millilitres, withPercentage(2));
  }

  @Test
  void halfALitreAMinuteWarmsBySixAndAHalfKelvinAt230Watts() { // computed elsewhere
    Band out = with(0.02, 15, 0.5, "water").outlet(Band.of(230)).orElseThrow();
    assertThat(out.nominal() - 288.15).isCloseTo(6.5, offset(0.15));
  }

  /** Q = U A LMTD with the outlet that the heat balance gives: the same heat by the textbook's other road. */
  @Test
  void capacityIsUATimesTheLogMean() {
    Condenser c = with(0.0124, 15, 0.3, "water");
    double q = c.capacity(372.15, ALLOWED).nominal();
    double out = c.outlet(Band.of(q)).orElseThrow().nominal();
    double logMean = (out - 288.15) / Math.log((372.15 - 288.15) / (372.15 - out));
    assertThat(q).isCloseTo(350 * 0.0124 * logMean, withPercentage(0.01));
  }

  @Test
  void noFlowIsNoCapacity() {
    assertThat(with(0.02, 15, 0.0, "water").capacity(372, ALLOWED).nominal()).isZero();
  }

  @Test
  void coolantHotterThanTheVapourCondensesNothing() {
    assertThat(with(0.02, 99.5, 1.0, "water").capacity(372, ALLOWED).nominal()).isZero();
  }

  @Test
  void warmerCoolantCarriesLess() {
    Condenser c = with(0.0124, 15, 0.5, "water");
    assertThat(c.capacity(372, Band.of(313), ALLOWED).nominal()).isLessThan(c.capacity(372, ALLOWED).nominal());
  }

  @Test
  void stillWaterCarriesLessThanRunningWaterAndAirTheLeast() {
    double running = with(0.0124, 15, 1.0, "water").capacity(372, ALLOWED).nominal();
    double still = with(0.0124, 15, null, "still-water").capacity(372, ALLOWED).nominal();
    double air = with(0.0124, 15, null, "water").airOnly(372, 294).nominal();
    assertThat(running).isGreaterThan(still);
    assertThat(still).isGreaterThan(air);
  }

  /** A full still jacket of 94 mL at 12 degC reaches 27 degC in 20 to 50 s at 380 to 160 W of heater (computed elsewhere, with losses). */
  @Test
  void aFullStillJacketWarms() {
    assertThat(CondenserNumbers.jacketWarming(94e-6, 285.15, 300.15, Band.of(0.75 * 380)).nominal()).isBetween(19.0, 23.0);
    assertThat(CondenserNumbers.jacketWarming(94e-6, 285.15, 300.15, Band.of(0.75 * 160)).nominal()).isBetween(46.0, 51.0);
  }
}
