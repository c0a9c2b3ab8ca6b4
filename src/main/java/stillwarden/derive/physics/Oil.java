package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * An oil by its constituents.
 *
 * @param parts amounts of what the substance table knows
 * @param unlistedMoles amount of what it does not know, at the mean molar mass of the rest
 * @param unlisted names of those
 */
public record Oil(List<Part> parts, double unlistedMoles, List<String> unlisted) {
  /** One constituent: mol. */
  public record Part(Substance substance, double moles) {
    public double mass() {
      return moles * substance.molarMass();
    }
  }

  private static final double TYPICAL_MOLAR_MASS = 0.150;

  public Oil {
    parts = List.copyOf(parts);
    unlisted = List.copyOf(unlisted);
  }

  /** From shares by mass (any positive scale) and a total mass in kg. */
  public static Oil ofMassShares(Map<String, Double> shares, double mass) {
    double total = shares.values().stream().mapToDouble(Double::doubleValue).sum();
    List<Part> parts = new ArrayList<>();
    List<String> unlisted = new ArrayList<>();
    double unlistedMass = 0;
    for (Map.Entry<String, Double> e : shares.entrySet()) {
      double m = mass * e.getValue() / total;
      Optional<Substance> s = Substances.find(e.getKey());
      if (s.isPresent() && m > 0) {
        parts.add(new Part(s.get(), m / s.get().molarMass()));
      } else if (m > 0) {
        unlisted.add(e.getKey());
        unlistedMass += m;
      }
    }
    return new Oil(parts, unlistedMass / meanMolarMass(parts), unlisted);
  }

  public static Oil pure(Substance s, double moles) {
    return new Oil(List.of(new Part(s, moles)), 0, List.of());
  }

  private static double meanMolarMass(List<Part> parts) {
    double moles = parts.stream().mapToDouble(Part::moles).sum();
    return moles > 0 ? parts.stream().mapToDouble(Part::mass).sum() / moles : TYPICAL_MOLAR_MASS;
  }

  public double moles() {
    return unlistedMoles + parts.stream().mapToDouble(Part::moles).sum();
  }

  public double mass() {
    return unlistedMoles * meanMolarMass(parts) + parts.stream().mapToDouble(Part::mass).sum();
  }

  /** Mole share of the i-th part in the whole. */
  public double share(int i) {
    return parts.get(i).moles() / moles();
  }

  /** Density near room temperature, kg/m3, volumes adding; empty when a tenth of the mass has none. */
  public Optional<Double> density() {
    double mass = 0;
    double volume = 0;
    for (Part p : parts) {
      if (p.substance().density().isPresent()) {
        mass += p.mass();
        volume += p.mass() / p.substance().density().get();
      }
    }
    return mass < 0.9 * mass() ? Optional.empty() : Optional.of(mass / volume);
  }

  /** What the oil would dissolve to in water, kg/m3, each constituent in its mole share; unknown ones counted as insoluble. */
  public double waterSolubility() {
    double sum = 0;
    for (int i = 0; i < parts.size(); i++) {
      sum += share(i) * parts.get(i).substance().waterSolubility().orElse(0.0);
    }
    return sum;
  }
}
