package stillwarden.describe;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Collection;
import java.util.EnumMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * Numbers with units, by the strict table {@code rules/words/units.yaml} (codes of UCUM 2.1 and a few conventional ones).
 *
 * <p>A general unit library is not used to read what people type: some misread {@code 1e3 mL}, {@code 1,5 L} or
 * {@code 250 ML} without a word. Nothing is guessed here: no default unit, no case folding, no decimal comma.
 */
public final class Units {
  private static final Pattern NUMBER_FIRST =
      Pattern.compile("([+-]?(?:[0-9]+(?:\\.[0-9]+)?)(?:[eE][+-]?[0-9]+)?)[ ]*(.*)", Pattern.DOTALL);
  private static final Pattern LEADING_ZERO = Pattern.compile("[+-]?0[0-9].*", Pattern.DOTALL);
  private static final Pattern COMMA = Pattern.compile("[+-]?[0-9]+,[0-9]+.*", Pattern.DOTALL);
  private static final Pattern NOT_FINITE = Pattern.compile("(?i)[+-]?\\.?(inf|infinity|nan)\\b.*", Pattern.DOTALL);
  private static final int LONGEST = 100;
  private static final Map<Dimension, Table> TABLES = load();

  private Units() {}

  /** SI = (number + plus) x times, times as a ratio so that 1/60 stays exact. */
  private record Code(BigDecimal plus, BigDecimal times, BigDecimal per) {
    double si(BigDecimal number) {
      BigDecimal product = number.add(plus).multiply(times);
      return per.equals(BigDecimal.ONE) ? product.doubleValue() : product.divide(per, MathContext.DECIMAL128).doubleValue();
    }
  }

  private record Table(String name, String usual, Map<String, Code> codes, Map<String, String> slips) {}

  /** The unit codes that a dimension takes; none for a count, which is a bare number. */
  public static List<String> codes(Dimension d) {
    return TABLES.containsKey(d) ? List.copyOf(TABLES.get(d).codes.keySet()) : List.of();
  }

  /** An example of a quantity, for messages: {@code 450 mL}. */
  public static String example(Dimension d) {
    return TABLES.get(d).usual;
  }

  /** Reads a quantity with any unit of its dimension. */
  public static Quantity read(String text, Dimension d) throws BadValue {
    return read(text, d, List.of());
  }

  /**
   * @param text number and unit, {@code 450 mL}
   * @param allowed unit codes that this field takes; empty for all of the dimension
   * @return the finite SI value with the text as written
   */
  public static Quantity read(String text, Dimension d, Collection<String> allowed) throws BadValue {
    String t = text.strip();
    refuseTraps(t, d, allowed);
    Matcher m = NUMBER_FIRST.matcher(t);
    if (t.length() > LONGEST || !m.matches()) {
      throw new BadValue(Words.quote(text) + " is not a number with a unit; " + wanted(d, allowed));
    }
    double si = code(text, m.group(2), d, allowed).si(finite(text, m.group(1)));
    if (!Double.isFinite(si)) {
      throw new BadValue(Words.quote(text) + " is not a finite number");
    }
    return new Quantity(si, d, t);
  }

  private static void refuseTraps(String t, Dimension d, Collection<String> allowed) throws BadValue {
    if (NOT_FINITE.matcher(t).matches()) {
      throw new BadValue(Words.quote(t) + " is not a finite number; " + wanted(d, allowed));
    }
    if (COMMA.matcher(t).matches()) {
      throw new BadValue(Words.quote(t) + " has a comma in its number; write a point: " + Words.quote(t.replaceFirst(",", ".")));
    }
    if (LEADING_ZERO.matcher(t).matches()) {
      throw new BadValue(Words.quote(t) + " starts with a zero; write the number without it");
    }
  }

  private static BigDecimal finite(String text, String number) throws BadValue {
    double d = Double.parseDouble(number);
    boolean vanished = d == 0 && number.replaceFirst("[eE].*", "").chars().anyMatch(c -> c >= '1' && c <= '9');
    if (!Double.isFinite(d) || vanished) {
      throw new BadValue(Words.quote(text) + " is too " + (vanished ? "small" : "large") + " a number to be read");
    }
    return new BigDecimal(number);
  }

  private static Code code(String text, String unit, Dimension d, Collection<String> allowed) throws BadValue {
    Table table = TABLES.get(d);
    Code code = table.codes.get(unit);
    if (code != null && (allowed.isEmpty() || allowed.contains(unit))) {
      return code;
    }
    if (unit.isBlank()) {
      throw new BadValue(Words.quote(text) + " has no unit; " + wanted(d, allowed));
    }
    throw new BadValue("`" + Words.quote(unit).replace("`", "") + "` in " + Words.quote(text) + " is no unit of " + table.name
        + hint(unit, d, allowed) + "; " + wanted(d, allowed));
  }

  private static String hint(String unit, Dimension d, Collection<String> allowed) {
    Table table = TABLES.get(d);
    Collection<String> known = allowed.isEmpty() ? table.codes.keySet() : allowed;
    String meant = table.slips.get(unit);
    if (meant == null || !known.contains(meant)) {
      String folded = unit.toLowerCase(Locale.ROOT);
      meant = known.stream().filter(k -> k.toLowerCase(Locale.ROOT).equals(folded)).findFirst().orElse(null);
    }
    return meant == null ? "" : "; did you mean `" + meant + "`";
  }

  private static String wanted(Dimension d, Collection<String> allowed) {
    Table t = TABLES.get(d);
    return allowed.isEmpty() ? article(t.name) + " is wanted, for example `" + t.usual + "`"
        : article(t.name) + " in " + String.join(" or ", allowed) + " is wanted";
  }

  private static String article(String name) {
    return ("aeiou".indexOf(name.charAt(0)) >= 0 ? "an " : "a ") + name;
  }

  private static Map<Dimension, Table> load() {
    Map<Dimension, Table> out = new EnumMap<>(Dimension.class);
    Knowledge.section("words").get("units").fields().forEach((name, t) -> {
      Map<String, Code> codes = new LinkedHashMap<>();
      t.get("codes").fields().forEach((code, c) -> codes.put(code, code(c)));
      Map<String, String> slips = new LinkedHashMap<>();
      t.get("slips").fields().forEach((slip, meant) -> slips.put(slip, meant.text().orElseThrow()));
      out.put(dimension(name), new Table(name.replace('-', ' '), t.text("usual").orElseThrow(), codes, slips));
    });
    return out;
  }

  private static Code code(Tree c) {
    String[] ratio = c.text("times").orElseThrow().split("/");
    BigDecimal per = ratio.length == 2 ? new BigDecimal(ratio[1]) : BigDecimal.ONE;
    return new Code(new BigDecimal(c.text("plus").orElse("0")), new BigDecimal(ratio[0]), per);
  }

  /** {@code volume-flow} of the rule data as the enum. */
  static Dimension dimension(String name) {
    return Dimension.valueOf(name.toUpperCase(Locale.ROOT).replace('-', '_'));
  }
}
