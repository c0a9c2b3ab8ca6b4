package stillwarden.describe;

/**
 * What a file may be at most, so that a hostile or broken one costs little.
 *
 * @param depth levels of nesting
 * @param string characters of one value or key
 * @param entries keys of one map, or items of one list
 */
record Limits(int depth, int string, int entries) {
  static final Limits FILE = new Limits(32, 8 * 1024, 1000);

  void depth(int now, Spot spot) throws Unusable {
    if (now > depth) {
      throw new Unusable(spot, "is nested deeper than " + depth + " levels");
    }
  }

  void entries(int now, Spot spot) throws Unusable {
    if (now > entries) {
      throw new Unusable(spot, "holds more than " + entries + " entries");
    }
  }

  void string(String text, Spot spot) throws Unusable {
    if (text.length() > string) {
      throw new Unusable(spot, "a value is longer than " + string / 1024 + " KiB");
    }
  }
}
