package stillwarden.describe;

/** One opening of a part, {@code claisen.foot}; a part with a single port may be named alone. */
public record Port(String part, String port) implements Comparable<Port> {
  /** By hand, as {@code stillwarden.derive.Sign}'s: a key of many maps. */
  @Override
  public boolean equals(Object o) {
    return o instanceof Port p && part.equals(p.part) && port.equals(p.port);
  }

  @Override
  public int hashCode() {
    return 31 * part.hashCode() + port.hashCode();
  }

  @Override
  public int compareTo(Port o) {
    int c = part.compareTo(o.part);
    return c != 0 ? c : port.compareTo(o.port);
  }

  @Override
  public String toString() {
    return port.isEmpty() ? part : part + "." + port;
  }
}
