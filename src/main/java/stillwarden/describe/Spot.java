package stillwarden.describe;

/** Where something stands in a file; line and column count from 1, 0 means unknown. */
public record Spot(String file, int line, int column) {
  public static Spot of(String file) {
    return new Spot(file, 0, 0);
  }

  @Override
  public String toString() {
    return line == 0 ? file : column == 0 ? file + ":" + line : file + ":" + line + ":" + column;
  }
}
