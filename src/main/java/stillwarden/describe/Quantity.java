package stillwarden.describe;

/**
 * A measured value in SI (K for temperatures, Pa, m3, W, fraction of 1), with the words the user wrote.
 *
 * @param si finite value in {@code dimension.si()}
 * @param text as written, for example {@code 450 mL}
 */
public record Quantity(double si, Dimension dimension, String text) {
  public Quantity {
    if (!Double.isFinite(si)) {
      throw new IllegalArgumentException("quantity must be finite, was " + text);
    }
  }
}
