package stillwarden.show;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FiguresTest {
  @ParameterizedTest
  @CsvSource({
    "98.54321987, Cel, 98.5432 Cel", "100, Cel, 100 Cel", "0.00012345678, m3, 0.000123457 m3", "1234567.8, Pa, 1234570 Pa",
    "-0.0, K, 0 K", "0.45, 1, 0.45", "1e-9, m3, 0.000000001 m3"
  })
  void machinesGetSixSignificantDigitsWithoutExponent(double value, String unit, String expected) {
    assertThat(Figures.ucum(value, unit)).isEqualTo(expected);
  }

  @ParameterizedTest
  @CsvSource({
    "98.5432, Cel, 98.5 °C", "41, s, 41 s", "720, s, 12 min", "0.00061, m3, 610 mL", "8.83e-8, m3/s, 5.3 mL/min",
    "101325, Pa, 101 kPa", "250, Pa, 250 Pa", "0.0018, kg, 1.8 g", "230.4, W, 230 W", "24.31, 1, 24.3"
  })
  void peopleGetThreeDigitsInTheUnitsOfTheBench(double value, String unit, String expected) {
    assertThat(Figures.read(value, unit)).isEqualTo(expected);
  }
}
