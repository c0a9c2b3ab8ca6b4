package stillwarden.describe;

/** What a quantity measures, with the SI unit that a bare double of it carries. */
public enum Dimension {
  LENGTH("m"),
  VOLUME("m3"),
  MASS("kg"),
  TIME("s"),
  TEMPERATURE("K"),
  TEMPERATURE_DIFFERENCE("K"),
  PRESSURE("Pa"),
  POWER("W"),
  FRACTION("1"),
  VOLUME_FLOW("m3/s"),
  MASS_FLOW("kg/s"),
  VELOCITY("m/s"),
  AREA("m2"),
  DENSITY("kg/m3"),
  RATE("1/s"),
  COUNT("1");

  private final String si;

  Dimension(String si) {
    this.si = si;
  }

  public String si() {
    return si;
  }
}
