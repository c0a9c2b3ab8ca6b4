package stillwarden.show;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Map;
import java.util.Optional;
import stillwarden.derive.Estimate;

/** Numbers as they are read: six significant digits and UCUM for machines, three and the bench's units for people. */
final class Figures {
  private static final MathContext SIX = new MathContext(6, RoundingMode.HALF_EVEN);
  private static final MathContext THREE = new MathContext(3, RoundingMode.HALF_EVEN);

  /** UCUM code to the unit people read, and the factor to it. */
  private static final Map<String, Unit> READ = Map.ofEntries(
      Map.entry("m3", new Unit("mL", 1e6)), Map.entry("m3/s", new Unit("mL/min", 6e7)), Map.entry("kg", new Unit("g", 1e3)),
      Map.entry("kg/s", new Unit("g/min", 6e4)), Map.entry("Pa", new Unit("kPa", 1e-3)), Map.entry("s", new Unit("min", 1.0 / 60)),
      Map.entry("m2", new Unit("cm²", 1e4)), Map.entry("Cel", new Unit("°C", 1)), Map.entry("1", new Unit("", 1)),
      Map.entry("[drp]/min", new Unit("drops/min", 1)), Map.entry("/min", new Unit("per min", 1)), Map.entry("1/s", new Unit("per s", 1)));

  private Figures() {}

  private record Unit(String word, double factor) {}

  /** {@code 98.5432 Cel}: at most six significant digits, no exponent, no trailing zeros. */
  static String ucum(double value, String unit) {
    return unit.equals("1") ? six(value) : six(value) + " " + unit;
  }

  /** The number's name in words. */
  static String name(Estimate e) {
    return e.name().replace('-', ' ').replace("co boiling", "co-boiling").replace("boil up", "boil-up").replace("heat up", "heat-up");
  }

  static String six(double value) {
    return plain(value, SIX);
  }

  /** For a person: {@code 98.5 °C}, {@code 41 min}, {@code 380 mL}. */
  static String read(double value, String unit) {
    if (unit.equals("Cel")) {
      return BigDecimal.valueOf(value).setScale(1, RoundingMode.HALF_EVEN).toPlainString() + " °C";
    }
    Unit u = unitFor(value, unit);
    String number = plain(value * u.factor(), THREE);
    return u.word().isEmpty() ? number : number + " " + u.word();
  }

  /** An answer without a unit is a word of a closed list: {@code method} carries the word, {@code notes} the reasons. */
  static boolean isWord(Estimate e) {
    return e.known() && e.unit().isEmpty();
  }

  /** The value with its band, the word with its reasons, or why there is none. */
  static String read(Estimate e) {
    if (!e.known()) {
      return "no value: " + e.reason();
    }
    if (isWord(e)) {
      return e.notes().isEmpty() ? e.method() : e.method() + ", because " + String.join("; ", e.notes());
    }
    String nominal = read(e.nominal(), e.unit());
    return e.low() == e.high() ? nominal : nominal + " (" + read(e.low(), e.unit()) + " to " + read(e.high(), e.unit()) + ")";
  }

  /** Short times stay in seconds and small pressures in pascals: "0.1 min" helps nobody. */
  private static Unit unitFor(double value, String unit) {
    boolean small = unit.equals("s") && Math.abs(value) < 120 || unit.equals("Pa") && Math.abs(value) < 1000;
    return small ? new Unit(unit, 1) : Optional.ofNullable(READ.get(unit)).orElse(new Unit(unit, 1));
  }

  private static String plain(double value, MathContext digits) {
    BigDecimal d = BigDecimal.valueOf(value).round(digits);
    return d.signum() == 0 ? "0" : d.stripTrailingZeros().toPlainString();
  }
}
