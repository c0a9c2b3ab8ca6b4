package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import org.hipparchus.analysis.solvers.BrentSolver;

/**
 * Water boiling together with an oil that does not mix with it: p = p_water(T) + sum of x_i p_i(T) over the oil.
 *
 * @param kelvin temperature at which both boil
 * @param waterPascal what the water contributes
 * @param oilPascal what each constituent contributes, in the order of {@code oil.parts()}; 0 where its volatility is unknown
 * @param extrapolated constituents whose equation was used outside its range
 * @param unknown constituents of unknown volatility, counted as contributing nothing
 * @param error relative error of the oil's pressure
 */
public record TwoLiquids(
    Oil oil, double kelvin, double waterPascal, double[] oilPascal, List<String> extrapolated, List<String> unknown, double error) {

  private static final double FREEZING = 273.16;
  private static final double ACCURACY = 1e-7;

  public static TwoLiquids at(double pascal, Oil oil) {
    VapourPressure[] by = new VapourPressure[oil.parts().size()];
    double boiling = WaterSteam.boilingPoint(pascal);
    double kelvin = boiling;
    // the equation nearest to the temperature found is the one to use: three rounds settle it
    for (int round = 0; round < 3; round++) {
      boolean same = choose(oil, kelvin, by);
      if (same && round > 0) {
        break;
      }
      kelvin = solve(pascal, oil, by, boiling);
    }
    return result(oil, kelvin, by);
  }

  static double solve(double pascal, Oil oil, VapourPressure[] by, double boiling) {
    double[] share = new double[by.length];
    for (int i = 0; i < by.length; i++) {
      share[i] = by[i] == null ? 0 : oil.share(i);
    }
    return solve(pascal, share, by, boiling);
  }

  static double solve(double pascal, double[] share, VapourPressure[] by, double boiling) {
    if (excess(boiling, pascal, share, by) <= 0) {
      return boiling;
    }
    return new BrentSolver(ACCURACY).solve(200, t -> excess(t, pascal, share, by), FREEZING, boiling);
  }

  private static double excess(double t, double pascal, double[] share, VapourPressure[] by) {
    double sum = WaterSteam.pressure(t) - pascal;
    for (int i = 0; i < share.length; i++) {
      sum += share[i] == 0 ? 0 : share[i] * by[i].formula(t);
    }
    return sum;
  }

  /** Fills in the equation for each constituent; true when nothing changed. */
  static boolean choose(Oil oil, double kelvin, VapourPressure[] by) {
    boolean same = true;
    for (int i = 0; i < by.length; i++) {
      VapourPressure v = oil.parts().get(i).substance().vapourPressure(kelvin).map(VapourPressure.Reading::by).orElse(null);
      same &= v == by[i];
      by[i] = v;
    }
    return same;
  }

  private static TwoLiquids result(Oil oil, double kelvin, VapourPressure[] by) {
    double[] partial = new double[by.length];
    List<String> extrapolated = new ArrayList<>();
    List<String> unknown = new ArrayList<>(oil.unlisted());
    double squares = 0;
    double total = 0;
    for (int i = 0; i < by.length; i++) {
      Substance s = oil.parts().get(i).substance();
      if (by[i] == null) {
        unknown.add(s.name());
        continue;
      }
      VapourPressure.Reading r = by[i].at(kelvin).orElseGet(() -> new VapourPressure.Reading(0, true, null));
      partial[i] = oil.share(i) * by[i].formula(kelvin);
      total += partial[i];
      squares += partial[i] * s.error(r);
      if (r.extrapolated()) {
        extrapolated.add(s.name());
      }
    }
    return new TwoLiquids(oil, kelvin, WaterSteam.pressure(kelvin), partial, extrapolated, unknown, total > 0 ? squares / total : 0);
  }

  public double oilTotal() {
    double sum = 0;
    for (double p : oilPascal) {
      sum += p;
    }
    return sum;
  }

  /** Mole share of the oil whose volatility is unknown. */
  public double unknownShare() {
    double moles = oil.unlistedMoles();
    for (Oil.Part p : oil.parts()) {
      moles += unknown.contains(p.substance().name()) ? p.moles() : 0;
    }
    return moles / oil.moles();
  }

  /** Moles of water that carry a mole of oil. */
  public double moleRatio() {
    return waterPascal / oilTotal();
  }

  /** Kilograms of water that carry a kilogram of oil. */
  public double massRatio() {
    return moleRatio() * WaterSteam.MOLAR_MASS / vapourMolarMass();
  }

  /** Mass share of the oil in what comes over. */
  public double oilMassShare() {
    return 1 / (1 + massRatio());
  }

  /** Mean molar mass of the oil in the vapour, kg/mol. */
  public double vapourMolarMass() {
    double mass = 0;
    for (int i = 0; i < oilPascal.length; i++) {
      mass += oilPascal[i] * oil.parts().get(i).substance().molarMass();
    }
    return mass / oilTotal();
  }

  /** Mole shares of the oil that condenses, constituents of unknown volatility left out. */
  public double[] vapourShares() {
    double total = oilTotal();
    double[] y = oilPascal.clone();
    for (int i = 0; i < y.length; i++) {
      y[i] /= total;
    }
    return y;
  }
}
