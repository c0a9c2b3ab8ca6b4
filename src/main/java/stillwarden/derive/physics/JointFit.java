package stillwarden.derive.physics;

import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * How two ground joints go together, by their designations: 1:10 tapers by wide-end diameter / length of the ground
 * zone in mm ({@code 24/40}), ball joints by ball diameter / bore ({@code ball 18/9}). ISO 383, ASTM E676.
 */
public final class JointFit {
  private static final Pattern SIZE = Pattern.compile("(ball|s|ks|ns|st|st\\.)?\\s*(\\d{1,3}(?:\\.\\d)?)\\s*/\\s*(\\d{1,3})\\s*(ball)?");
  private static final double SAME_DIAMETER = 0.6;
  /** Pairs that are written without the word and can only be balls: no taper has that wide end with so short a zone. */
  private static final Set<String> BALLS = Set.of("12/1", "12/2", "12/3", "12/5", "18/7", "18/9", "28/12", "28/15", "35/20", "35/25", "40/25", "50/30", "65/40");

  private JointFit() {}

  /** A designation. */
  public record Size(boolean ball, double diameter, int second) {
    @Override
    public String toString() {
      return (ball ? "ball " : "") + (diameter == Math.rint(diameter) ? Integer.toString((int) diameter) : Double.toString(diameter)) + "/" + second;
    }
  }

  /** SEATS fully; SHORT: same taper, but only over the shorter ground zone; MISFIT needs an adapter. */
  public enum Seat {
    SEATS,
    SHORT,
    MISFIT
  }

  /** The verdict with its reason. */
  public record Verdict(Seat seat, String why) {}

  /** Empty when the text is not a designation. */
  public static Optional<Size> parse(String text) {
    Matcher m = SIZE.matcher(text.strip().toLowerCase(Locale.ROOT));
    if (!m.matches()) {
      return Optional.empty();
    }
    boolean ball = "ball".equals(m.group(1)) || "s".equals(m.group(1)) || m.group(4) != null || BALLS.contains(m.group(2) + "/" + m.group(3));
    return Optional.of(new Size(ball, Double.parseDouble(m.group(2)), Integer.parseInt(m.group(3))));
  }

  public static Verdict of(Size a, Size b) {
    if (a.ball() != b.ball()) {
      return new Verdict(Seat.MISFIT, "a ball joint never mates with a taper");
    }
    if (a.ball()) {
      boolean same = a.diameter() == b.diameter() && a.second() == b.second();
      return same ? new Verdict(Seat.SEATS, "") : new Verdict(Seat.MISFIT, "ball joints of different size: " + a + ", " + b);
    }
    // 14/23 and 14.5/23 are one taper written two ways
    if (Math.abs(a.diameter() - b.diameter()) > SAME_DIAMETER) {
      return new Verdict(Seat.MISFIT, "different wide end, an adapter is needed: " + a + ", " + b);
    }
    return a.second() == b.second()
        ? new Verdict(Seat.SEATS, "")
        : new Verdict(Seat.SHORT, "same taper, ground over " + Math.min(a.second(), b.second()) + " mm only: " + a + ", " + b);
  }

  /** Of a joint written as one size ({@code 24/40}) or two ({@code 24/29 in 24/40}); empty when it is neither. */
  public static Optional<Verdict> ofText(String text) {
    String[] two = text.split("\\s+(?:in|to|with|x)\\s+|\\s*[+,]\\s*");
    Optional<Size> a = parse(two[0]);
    Optional<Size> b = two.length == 2 ? parse(two[1]) : two.length == 1 ? a : Optional.empty();
    return a.isEmpty() || b.isEmpty() ? Optional.empty() : Optional.of(of(a.get(), b.get()));
  }
}
