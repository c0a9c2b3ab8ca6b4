package stillwarden.order;

/** The four signal words of ANSI Z535.6, from mild to grave. */
public enum Signal {
  NOTICE,
  CAUTION,
  WARNING,
  DANGER;

  static Signal of(String word) {
    return valueOf(word);
  }

  Signal worse(Signal other) {
    return compareTo(other) >= 0 ? this : other;
  }

  Signal raised() {
    return this == DANGER ? DANGER : values()[ordinal() + 1];
  }
}
