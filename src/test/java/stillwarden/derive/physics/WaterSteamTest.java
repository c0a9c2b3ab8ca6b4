package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.data.Offset.offset;
import static org.assertj.core.data.Percentage.withPercentage;

import com.hummeling.if97.IF97;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class WaterSteamTest {
  private static final IF97 OTHER = new IF97(IF97.UnitSystem.SI);

  @ParameterizedTest
  @CsvSource({"300, 0.353658941e-2", "500, 0.263889776e1", "600, 0.123443146e2"}) // IAPWS R7-97(2012), table 35
  void vapourPressureMeetsTheVerificationTable(double kelvin, double megapascal) {
    assertThat(WaterSteam.pressure(kelvin)).isCloseTo(megapascal * 1e6, withPercentage(1e-6));
  }

  @ParameterizedTest
  @CsvSource({"0.1, 372.755919", "1, 453.035632", "10, 584.149488"}) // IAPWS R7-97(2012), table 36
  void boilingPointMeetsTheVerificationTable(double megapascal, double kelvin) {
    assertThat(WaterSteam.boilingPoint(megapascal * 1e6)).isCloseTo(kelvin, offset(1e-6));
  }

  @Test
  void everyRowOfTheWaterTableIsMet() {
    for (String[] r : Tables.rows("water.csv")) {
      double at = Double.parseDouble(r[1]);
      double want = Double.parseDouble(r[2]);
      double tolerance = Double.parseDouble(r[3]);
      double absolute = r[0].equals("T_s") ? tolerance : tolerance * want;
      assertThat(value(r[0], at)).as("%s at %s (%s)", r[0], r[1], r[4]).isCloseTo(want, offset(absolute));
    }
  }

  private static double value(String what, double at) {
    double k = at + 273.15;
    return switch (what) {
      case "p_s" -> WaterSteam.pressure(k);
      case "T_s" -> WaterSteam.boilingPoint(at) - 273.15;
      case "h_fg" -> WaterSteam.latentHeat(k);
      case "density" -> WaterSteam.liquidDensity(k, 101_325);
      case "cp" -> WaterSteam.liquidHeatCapacity(k, 101_325);
      case "steam" -> WaterSteam.steamDensity(k);
      default -> throw new IllegalArgumentException(what);
    };
  }

  @ParameterizedTest
  @ValueSource(doubles = {283.15, 313.15, 343.15, 363.15, 372.15, 393.15})
  void agreesWithAnIndependentLibrary(double kelvin) { // com.hummeling:if97
    double p = OTHER.saturationPressureT(kelvin);
    assertThat(WaterSteam.pressure(kelvin)).isCloseTo(p, withPercentage(1e-6));
    double latent = OTHER.specificEnthalpySaturatedVapourT(kelvin) - OTHER.specificEnthalpySaturatedLiquidT(kelvin);
    assertThat(WaterSteam.latentHeat(kelvin)).isCloseTo(latent, withPercentage(0.05));
    assertThat(WaterSteam.steamDensity(kelvin)).isCloseTo(1 / OTHER.specificVolumeSaturatedVapourT(kelvin), withPercentage(0.05));
    assertThat(WaterSteam.liquidDensity(kelvin, p * 1.001)).isCloseTo(1 / OTHER.specificVolumeSaturatedLiquidT(kelvin), withPercentage(0.001));
    assertThat(WaterSteam.liquidHeatCapacity(kelvin, p + 1000)).isCloseTo(OTHER.isobaricHeatCapacityPT(p + 1000, kelvin), withPercentage(1e-4));
  }

  @Test
  void boilingPointAndVapourPressureAreEachOthersInverse() {
    for (double k = 275; k < 470; k += 7) {
      assertThat(WaterSteam.boilingPoint(WaterSteam.pressure(k))).isCloseTo(k, offset(1e-7));
    }
  }
}
