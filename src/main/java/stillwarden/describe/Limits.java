package stillwarden.describe;

/**
 * What a file may be at most, so that a hostile or broken one costs little.
 *
 * @param depth levels of nesting
 * @param string characters of one value or key
 */
record Limits(int depth, int string) {
  static final Limits FILE = new Limits(32, 8 * 1024);

  void depth(int now, Spot spot) throws Unusable {
    if (now > depth) {
      throw new Unusable(spot, "is nested deeper than " + depth + " levels");
    }
  }

  void string(String text, Spot spot) throws Unusable {
    if (text.length() > string) {
      throw new Unusable(spot, "a value is longer than " + string / 1024 + " KiB");
    }
  }
}
