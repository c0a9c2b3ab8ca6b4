package stillwarden.describe;

import java.util.List;

/** An input that cannot be used at all; carries every defect found, not the first only. */
public final class Unusable extends Exception {
  private static final long serialVersionUID = 1L;

  private final transient List<Defect> defects;

  public Unusable(List<Defect> defects) {
    super(defects.isEmpty() ? "unusable" : defects.get(0).toString());
    this.defects = List.copyOf(defects);
  }

  public Unusable(Spot spot, String message) {
    this(List.of(new Defect(spot, message)));
  }

  public List<Defect> defects() {
    return defects;
  }
}
