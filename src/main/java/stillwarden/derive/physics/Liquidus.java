package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * Temperature at which a liquid mixture begins to freeze, by ideal solubility:
 * ln x = -(heat of fusion / R)(1/T - 1/Tm), the highest over the constituents.
 *
 * @param kelvin empty when the constituents of unknown melting point make up too much of the mixture
 * @param first the constituent that comes out first, or empty
 * @param unknown constituents whose melting point is unknown: they could come out earlier
 */
public record Liquidus(Optional<Band> kelvin, String first, List<String> unknown) {
  private static final double R = 8.314462618;

  /** @param shares mole shares in the order of {@code parts} */
  public static Liquidus of(List<Oil.Part> parts, double[] shares) {
    Band best = null;
    String first = "";
    double unknownShare = 0;
    double knownShare = 0;
    List<String> unknown = new ArrayList<>();
    for (int i = 0; i < shares.length; i++) {
      Substance s = parts.get(i).substance();
      if (s.meltingPoint().isEmpty() || s.heatOfFusion().isEmpty()) {
        unknownShare += shares[i];
        unknown.add(s.name());
        continue;
      }
      knownShare += shares[i];
      Optional<Band> t = shares[i] > 0 ? Optional.of(freezing(s, shares[i])) : Optional.empty();
      if (t.isPresent() && (best == null || t.get().nominal() > best.nominal())) {
        best = t.get();
        first = s.name();
      }
    }
    double total = unknownShare + knownShare;
    boolean enough = best != null && unknownShare <= Limits.value("pure-solid-share") * total;
    return new Liquidus(enough ? Optional.of(best) : Optional.empty(), enough ? first : "", unknown);
  }

  /** Of a whole oil at rest. */
  public static Liquidus of(Oil oil) {
    double[] x = new double[oil.parts().size()];
    for (int i = 0; i < x.length; i++) {
      x[i] = oil.share(i);
    }
    return of(oil.parts(), x);
  }

  static Band freezing(Substance s, double share) {
    Band melting = s.meltingPoint().orElseThrow();
    Band heat = s.heatOfFusion().orElseThrow();
    double low = depressed(melting.low(), heat.low(), share);
    double nominal = depressed(melting.nominal(), heat.nominal(), share);
    double high = depressed(melting.high(), heat.high(), share);
    return new Band(Math.min(low, nominal), nominal, Math.max(high, nominal));
  }

  private static double depressed(double melting, double heat, double share) {
    return 1 / (1 / melting - R / heat * Math.log(share));
  }
}
