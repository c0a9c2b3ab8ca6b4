package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import org.hipparchus.ode.ODEState;
import org.hipparchus.ode.ODEStateAndDerivative;
import org.hipparchus.ode.OrdinaryDifferentialEquation;
import org.hipparchus.ode.events.Action;
import org.hipparchus.ode.events.ODEEventDetector;
import org.hipparchus.ode.events.AdaptableInterval;
import org.hipparchus.ode.events.ODEEventHandler;
import org.hipparchus.analysis.solvers.BracketedUnivariateSolver;
import org.hipparchus.analysis.solvers.BracketingNthOrderBrentSolver;
import org.hipparchus.analysis.UnivariateFunction;
import org.hipparchus.ode.nonstiff.DormandPrince54Integrator;
import org.hipparchus.ode.sampling.ODEStateInterpolator;
import org.hipparchus.ode.sampling.ODEStepHandler;

/**
 * Differential distillation of a multi-constituent oil over boiling water, dn_i/dn_w = x_i p_i / p_w, each point at
 * its own boiling temperature, until the wanted share of the volatile oil is over or the water cap is reached.
 */
public final class Fractionation {
  /**
   * One moment of the ideal run.
   *
   * @param water kg of water over so far
   * @param oil kg of oil over so far
   * @param share mass of oil over, of what can come over
   * @param vapour mole shares of the oil condensing now
   * @param left mol of each constituent still in the flask
   */
  public record Point(double water, double oil, double share, double kelvin, double[] vapour, double[] left) {}

  private static final double CAP = 2000;
  private static final int POINTS_A_STEP = 3;
  private final Oil oil;
  private final List<Point> points;
  private final boolean complete;

  private Fractionation(Oil oil, List<Point> points, boolean complete) {
    this.oil = oil;
    this.points = List.copyOf(points);
    this.complete = complete;
  }

  /** @param overShare mass share of the volatile oil at which it counts as over */
  public static Fractionation of(Oil oil, double pascal, double overShare) {
    Model m = new Model(oil, pascal);
    List<Point> points = new ArrayList<>();
    if (m.volatileMass() <= 0) {
      return new Fractionation(oil, points, false);
    }
    double[] y = m.start();
    points.add(m.point(y));
    Until over = new Until(s -> m.overShare(s) - overShare);
    Until capped = new Until(s -> s[s.length - 1] * WaterSteam.MOLAR_MASS - CAP * oil.mass());
    DormandPrince54Integrator integrator = new DormandPrince54Integrator(1e-9, 1e6, 1e-9 * oil.moles(), 1e-5);
    integrator.addStepHandler(new Recorder(m, points));
    integrator.addEventDetector(over);
    integrator.addEventDetector(capped);
    ODEStateAndDerivative end = integrator.integrate(m, new ODEState(0, y), 1e6);
    return new Fractionation(oil, points, m.overShare(end.getPrimaryState()) >= overShare - 1e-4);
  }

  public Oil oil() {
    return oil;
  }

  public List<Point> points() {
    return points;
  }

  /** False when the oil is so little volatile that the water cap (2000 times its mass) came first. */
  public boolean complete() {
    return complete;
  }

  /** Kilograms of water that the whole of it takes, ideally. */
  public double waterForAll() {
    return points.get(points.size() - 1).water();
  }

  /** The run after so many kg of water; the last point after the end. */
  public Point atWater(double kg) {
    for (int i = 1; i < points.size(); i++) {
      if (points.get(i).water() >= kg) {
        Point a = points.get(i - 1);
        Point b = points.get(i);
        return between(a, b, b.water() > a.water() ? (kg - a.water()) / (b.water() - a.water()) : 1);
      }
    }
    return points.get(points.size() - 1);
  }

  /** The run when this share of the volatile oil is over. */
  public Point atShare(double share) {
    for (int i = 1; i < points.size(); i++) {
      if (points.get(i).share() >= share) {
        Point a = points.get(i - 1);
        Point b = points.get(i);
        return between(a, b, (share - a.share()) / (b.share() - a.share()));
      }
    }
    return points.get(points.size() - 1);
  }

  private static Point between(Point a, Point b, double f) {
    double g = Math.max(0, Math.min(1, f));
    return new Point(mix(a.water(), b.water(), g), mix(a.oil(), b.oil(), g), mix(a.share(), b.share(), g), mix(a.kelvin(), b.kelvin(), g),
        mix(a.vapour(), b.vapour(), g), mix(a.left(), b.left(), g));
  }

  private static double mix(double a, double b, double f) {
    return a + (b - a) * f;
  }

  private static double[] mix(double[] a, double[] b, double f) {
    double[] out = new double[a.length];
    for (int i = 0; i < out.length; i++) {
      out[i] = mix(a[i], b[i], f);
    }
    return out;
  }

  /** State: mol of each constituent left, then mol of water over. */
  private static final class Model implements OrdinaryDifferentialEquation {
    private final Oil oil;
    private final double pascal;
    private final double boiling;
    private final VapourPressure[] by;
    private final double scale;
    private double last;

    Model(Oil oil, double pascal) {
      this.oil = oil;
      this.pascal = pascal;
      this.boiling = WaterSteam.boilingPoint(pascal);
      this.by = new VapourPressure[oil.parts().size()];
      TwoLiquids start = TwoLiquids.at(pascal, oil);
      TwoLiquids.choose(oil, start.kelvin(), by);
      this.scale = Math.max(start.oilTotal(), 1e-3);
    }

    @Override
    public int getDimension() {
      return by.length + 1;
    }

    double[] start() {
      double[] y = new double[by.length + 1];
      for (int i = 0; i < by.length; i++) {
        y[i] = oil.parts().get(i).moles();
      }
      return y;
    }

    double[] shares(double[] y) {
      double total = oil.unlistedMoles();
      for (int i = 0; i < by.length; i++) {
        total += Math.max(0, y[i]);
      }
      double[] x = new double[by.length];
      for (int i = 0; i < by.length; i++) {
        x[i] = by[i] == null || total <= 0 ? 0 : Math.max(0, y[i]) / total;
      }
      return x;
    }

    @Override
    public double[] computeDerivatives(double t, double[] y) {
      double[] x = shares(y);
      double kelvin = TwoLiquids.solve(pascal, x, by, boiling);
      double[] d = new double[y.length];
      double total = oil.unlistedMoles();
      for (int i = 0; i < by.length; i++) {
        total += Math.max(0, y[i]);
        d[i] = by[i] == null ? 0 : -Math.max(0, y[i]) * by[i].formula(kelvin) / scale;
      }
      d[by.length] = total * WaterSteam.pressure(kelvin) / scale;
      last = kelvin;
      return d;
    }

    double volatileMass() {
      double sum = 0;
      for (int i = 0; i < by.length; i++) {
        sum += by[i] == null ? 0 : oil.parts().get(i).mass();
      }
      return sum;
    }

    double massOver(double[] y) {
      double sum = 0;
      for (int i = 0; i < by.length; i++) {
        sum += (oil.parts().get(i).moles() - y[i]) * oil.parts().get(i).substance().molarMass();
      }
      return sum;
    }

    double overShare(double[] y) {
      return massOver(y) / volatileMass();
    }

    Point point(double[] y) {
      double[] d = computeDerivatives(0, y);
      double sum = 0;
      for (int i = 0; i < by.length; i++) {
        sum += d[i];
      }
      double[] vapour = new double[by.length];
      for (int i = 0; i < by.length; i++) {
        vapour[i] = sum == 0 ? 0 : d[i] / sum;
      }
      double[] left = java.util.Arrays.copyOf(y, by.length);
      return new Point(y[by.length] * WaterSteam.MOLAR_MASS, massOver(y), overShare(y), last, vapour, left);
    }
  }

  /** Keeps a few points of every accepted step. */
  private record Recorder(Model model, List<Point> points) implements ODEStepHandler {
    @Override
    public void handleStep(ODEStateInterpolator i) {
      double a = i.getPreviousState().getTime();
      double b = i.getCurrentState().getTime();
      for (int k = 1; k <= POINTS_A_STEP; k++) {
        points.add(model.point(i.getInterpolatedState(a + (b - a) * k / POINTS_A_STEP).getPrimaryState()));
      }
    }
  }

  /** Stops the integration where a function of the state first rises through zero. */
  private record Until(Crossing g) implements ODEEventDetector {
    /** The event function. */
    interface Crossing {
      double of(double[] state);
    }

    @Override
    public AdaptableInterval getMaxCheckInterval() {
      return (s, forward) -> 0.25;
    }

    @Override
    public int getMaxIterationCount() {
      return 60;
    }

    @Override
    public BracketedUnivariateSolver<UnivariateFunction> getSolver() {
      return new BracketingNthOrderBrentSolver(0, 1e-6, 0, 5);
    }

    @Override
    public ODEEventHandler getHandler() {
      return (s, d, increasing) -> Action.STOP;
    }

    @Override
    public double g(ODEStateAndDerivative s) {
      return g.of(s.getPrimaryState());
    }
  }
}
