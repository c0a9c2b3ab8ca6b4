package stillwarden.derive.physics;

import java.util.List;

/**
 * Whether the oil is immiscible enough for the two-liquid model.
 *
 * @param verdict {@code IMMISCIBLE}, {@code FLAGGED} (numbers are given, but overstate the oil), {@code REFUSED}
 */
public record Immiscibility(Verdict verdict, String reason) {
  public enum Verdict {
    IMMISCIBLE,
    FLAGGED,
    REFUSED
  }

  public static Immiscibility of(Oil oil) {
    double dissolved = oil.waterSolubility();
    if (dissolved >= Limits.value("soluble-refused")) {
      return new Immiscibility(Verdict.REFUSED, (Double.isInfinite(dissolved) ? "the oil mixes with water" : inWater(dissolved))
          + ": two layers that ignore each other is not what is in the flask");
    }
    if (dissolved >= Limits.value("soluble-from")) {
      return new Immiscibility(Verdict.FLAGGED, inWater(dissolved) + ": less oil comes over than computed");
    }
    double taken = waterTaken(oil);
    if (taken >= Limits.value("water-in-oil-from")) {
      return new Immiscibility(Verdict.FLAGGED, "the oil layer takes up " + Math.round(taken * 100) + " % of water: less oil comes over than computed");
    }
    List<String> unknown = oil.parts().stream().map(Oil.Part::substance).filter(s -> s.waterSolubility().isEmpty()).map(Substance::name).toList();
    return new Immiscibility(Verdict.IMMISCIBLE, unknown.isEmpty() ? "" : "solubility in water not known, taken as small: " + String.join(", ", unknown));
  }

  private static String inWater(double gramsPerLitre) {
    return "about " + Math.round(gramsPerLitre) + " g/L of the oil dissolve in water";
  }

  private static double waterTaken(Oil oil) {
    double sum = 0;
    for (int i = 0; i < oil.parts().size(); i++) {
      sum += oil.share(i) * oil.parts().get(i).substance().waterInIt().orElse(0.0);
    }
    return sum;
  }
}
