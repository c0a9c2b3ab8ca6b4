package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;
import static org.assertj.core.data.Percentage.withPercentage;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class ClosedVesselTest {
  private static final double GLASS = 0.3 * 830;

  @ParameterizedTest
  @CsvSource({"3000, 6, 0.3", "10000, 20, 1", "32000, 60, 3"}) // 300 mL, 0.3 kg of glass, 200 W net: computed elsewhere
  void aClosedFlask(double over, double seconds, double within) {
    assertThat(ClosedVessel.seconds(101_325, over, 0.300 * 0.958, GLASS, 200)).isCloseTo(seconds, offset(within));
  }

  @Test
  void dryingShortensTheTime() {
    assertThat(ClosedVessel.seconds(101_325, 10_000, 0.02, GLASS, 200)).isLessThan(0.3 * ClosedVessel.seconds(101_325, 10_000, 0.3, GLASS, 200));
  }

  @ParameterizedTest
  @CsvSource({"101, 3.8", "102, 7.6", "105, 19.6", "110, 42.1", "115, 67.9"}) // blocked, pure water, gauge kPa, IAPWS-IF97
  void gaugePressureOfABlockedFlask(double celsius, double kilopascal) {
    assertThat(-ClosedVessel.vacuum(101_325, celsius + 273.15) / 1000).isCloseTo(kilopascal, offset(0.06));
  }

  @Test
  void aSealedFlaskThatCooledTo79IsDeepUnderVacuum() { // about 53 kPa below atmospheric (computed elsewhere, boiling at 99 degC)
    assertThat(ClosedVessel.vacuum(WaterSteam.pressure(372.15), 352.15) / 1000).isCloseTo(53, offset(1.0));
  }

  @Test
  void aTwelveInchWaterSeal() { // 2.98 kPa: Nickels, Anal. Chem. 1949
    assertThat(ClosedVessel.seal(12 * 0.0254, 998) / 1000).isCloseTo(2.98, offset(0.01));
  }

  /** Two velocity heads of 0.590 kg/m3 at the speed that 200 W of steam (8.9 L/min, computed elsewhere) has in 6 mm. */
  @Test
  void anOpenVentDropsPascalsNotKilopascals() {
    double speed = 8.9e-3 / 60 / (Math.PI * 0.003 * 0.003);
    assertThat(ClosedVessel.ventDrop(101_325, 200, 0.006, 0, 2)).isCloseTo(2 * 0.598 * speed * speed / 2, withPercentage(3));
  }

  @Test
  void aLongNarrowHoseDropsMore() { // Hagen-Poiseuille for laminar flow: 32 mu L v / d2
    double speed = 20 / WaterSteam.latentHeat(373.12) / 0.598 / (Math.PI * 0.002 * 0.002);
    double laminar = 32 * 1.23e-5 * 2 * speed / (0.004 * 0.004);
    assertThat(ClosedVessel.ventDrop(101_325, 20, 0.004, 2, 0)).isCloseTo(laminar, withPercentage(1));
  }
}
