package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.ArrayList;
import java.util.List;
import java.util.Set;
import javax.measure.Unit;
import javax.measure.format.UnitFormat;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.MethodSource;
import systems.uom.ucum.format.UCUMFormat;

class UnitsTest {
  /** Not UCUM: written out here against their definitions instead. */
  private static final Set<String> CONVENTIONAL = Set.of("°C", "°F", "mmHg", "torr", "Torr", "psi", "ft/min", "fpm");

  static List<Arguments> ucumCodes() {
    List<Arguments> out = new ArrayList<>();
    for (Dimension d : Dimension.values()) {
      Units.codes(d).stream().filter(c -> !CONVENTIONAL.contains(c)).forEach(c -> out.add(Arguments.of(d, c)));
    }
    return out;
  }

  /** The oracle: an independent UCUM implementation, used here and nowhere else. */
  @ParameterizedTest(name = "{0} {1}")
  @MethodSource("ucumCodes")
  void everyUcumCodeAgreesWithAnIndependentLibrary(Dimension d, String code) throws BadValue {
    UnitFormat ucum = UCUMFormat.getInstance(UCUMFormat.Variant.CASE_SENSITIVE);
    String si = d.si().equals("1") ? "1" : d.si();
    Unit<?> from = ucum.parse(code);
    Unit<?> to = ucum.parse(si);
    for (double x : new double[] {0.1, 1, 37, 250}) {
      double theirs = converted(from, to, x);
      assertThat(Units.read(x + " " + code, d).si()).isCloseTo(theirs, within(Math.abs(theirs) * 1e-9));
    }
  }

  @SuppressWarnings({"unchecked", "rawtypes"})
  private static double converted(Unit from, Unit to, double x) throws BadValue {
    try {
      return from.getConverterToAny(to).convert(x);
    } catch (javax.measure.IncommensurableException e) {
      throw new BadValue(e.getMessage());
    }
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource({
      // conventional units against their definitions
      "0 °C, TEMPERATURE, 273.15",
      "212 °F, TEMPERATURE, 373.15",
      "32 [degF], TEMPERATURE, 273.15",
      "760 torr, PRESSURE, 101325",
      "760 mmHg, PRESSURE, 101325.0144354",
      "760 mm[Hg], PRESSURE, 101324.72",
      "14.695948775 psi, PRESSURE, 101325",
      "100 ft/min, VELOCITY, 0.508",
      "100 fpm, VELOCITY, 0.508",
      "1e3 mL, VOLUME, 0.001",
      "1E3 mL, VOLUME, 0.001",
      "1.5e-1 L, VOLUME, 0.00015",
      "450mL, VOLUME, 0.00045",
      "-40 °F, TEMPERATURE, 233.15",
      "30%, FRACTION, 0.3",
      "20 [ppm], FRACTION, 0.00002",
  })
  void quantitiesAreReadRightly(String text, Dimension d, double si) throws BadValue {
    assertThat(Units.read(text, d).si()).isCloseTo(si, within(Math.abs(si) * 1e-9));
  }

  @ParameterizedTest(name = "{0}")
  @CsvSource(delimiter = '|', value = {
      "250 ML   | VOLUME      | did you mean `mL`",
      "250 Ml   | VOLUME      | did you mean `mL`",
      "1,5 L    | VOLUME      | write a point: `1.5 L`",
      "1.500,5 L| VOLUME      | is no unit of volume",
      "1 e3 mL  | VOLUME      | is no unit of volume",
      "1e L     | VOLUME      | is no unit of volume",
      "1_000 mL | VOLUME      | is no unit of volume",
      "0x10 mL  | VOLUME      | is no unit of volume",
      "007 mL   | VOLUME      | starts with a zero",
      ".5 L     | VOLUME      | is not a number with a unit",
      "5. L     | VOLUME      | is no unit of volume",
      "five mL  | VOLUME      | is not a number with a unit",
      "450      | VOLUME      | has no unit",
      "98 C     | TEMPERATURE | did you mean `Cel`",
      "98 F     | TEMPERATURE | did you mean `[degF]`",
      "0.5 Cel  | TEMPERATURE_DIFFERENCE | did you mean `K`",
      "5 m      | TIME        | did you mean `min`",
      "5 M      | TIME        | did you mean `min`",
      "380 KW   | POWER       | did you mean `kW`",
      "380 VA   | POWER       | is no unit of power",
      "98 KPA   | PRESSURE    | did you mean `kPa`",
      "1 MPa    | PRESSURE    | did you mean `kPa`",
      "760 mm   | PRESSURE    | is no unit of pressure",
      "1e400 mL | VOLUME      | too large",
      "1e999999999 mL | VOLUME | too large",
      "1e-999999999 mL | VOLUME | too small",
      "-.inf mL | VOLUME      | not a finite number",
      "infinity | VOLUME      | not a finite number",
      "NaN mL   | VOLUME      | not a finite number",
      "0.5 L/m  | VOLUME_FLOW | did you mean `L/min`",
      "20 ppm   | FRACTION    | did you mean `[ppm]`",
  })
  void slipsAreRefusedAndNeverGuessed(String text, Dimension d, String wanted) {
    assertThatThrownBy(() -> Units.read(text, d)).isInstanceOf(BadValue.class).hasMessageContaining(wanted);
  }

  @Test
  void aFieldCanTakeFewerUnitsThanItsDimension() {
    assertThatThrownBy(() -> Units.read("600000 [ppm]", Dimension.FRACTION, List.of("%"))).hasMessageContaining("a fraction in % is wanted");
  }

  @Test
  void aLongNumberIsRefusedNotParsed() {
    assertThatThrownBy(() -> Units.read("1".repeat(200) + " mL", Dimension.VOLUME)).hasMessageContaining("is not a number with a unit");
  }

  @Test
  void everySlipPointsToACodeThatExists() {
    Knowledge.section("words").get("units").fields().forEach((name, t) ->
        t.get("slips").fields().forEach((slip, meant) -> {
          assertThat(Units.codes(Units.dimension(name))).as(name + " " + slip).contains(meant.text().orElseThrow()).doesNotContain(slip);
        }));
  }
}
