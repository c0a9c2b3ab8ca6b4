package stillwarden.derive.physics;

/**
 * Water and saturated steam between 273.16 and 573 K, SI.
 *
 * <p>Saturation line, liquid density and heat capacity: IAPWS-IF97 (R7-97, 2012), regions 4 and 1. Density of
 * saturated steam: IAPWS SR1-86 (1992). Latent heat follows from them by Clapeyron's equation.
 */
public final class WaterSteam {
  public static final double MOLAR_MASS = 0.018015268;
  /** kg/m3 at 20 degC and at the boil: where the temperature of a measured volume does not matter more. */
  public static final double COLD_DENSITY = 998.2;
  public static final double BOILING_DENSITY = 958.4;
  private static final double GAS_CONSTANT = 461.526;
  private static final double CRITICAL_K = 647.096;
  private static final double CRITICAL_DENSITY = 322;

  private static final double[] R4 = {
    0, 0.11670521452767e4, -0.72421316703206e6, -0.17073846940092e2, 0.12020824702470e5, -0.32325550322333e7,
    0.14915108613530e2, -0.48232657361591e4, 0.40511340542057e6, -0.23855557567849, 0.65017534844798e3
  };
  private static final int[] I1 = {
    0, 0, 0, 0, 0, 0, 0, 0, 1, 1, 1, 1, 1, 1, 2, 2, 2, 2, 2, 3, 3, 3, 4, 4, 4, 5, 8, 8, 21, 23, 29, 30, 31, 32
  };
  private static final int[] J1 = {
    -2, -1, 0, 1, 2, 3, 4, 5, -9, -7, -1, 0, 1, 3, -3, 0, 1, 3, 17, -4, 0, 6, -5, -2, 10, -8, -11, -6, -29, -31, -38, -39, -40, -41
  };
  private static final double[] N1 = {
    0.14632971213167, -0.84548187169114, -0.37563603672040e1, 0.33855169168385e1, -0.95791963387872, 0.15772038513228,
    -0.16616417199501e-1, 0.81214629983568e-3, 0.28319080123804e-3, -0.60706301565874e-3, -0.18990068218419e-1,
    -0.32529748770505e-1, -0.21841717175414e-1, -0.52838357969930e-4, -0.47184321073267e-3, -0.30001780793026e-3,
    0.47661393906987e-4, -0.44141845330846e-5, -0.72694996297594e-15, -0.31679644845054e-4, -0.28270797985312e-5,
    -0.85205128120103e-9, -0.22425281908000e-5, -0.65171222895601e-6, -0.14341729937924e-12, -0.40516996860117e-6,
    -0.12734301741641e-8, -0.17424871230634e-9, -0.68762131295531e-18, 0.14478307828521e-19, 0.26335781662795e-22,
    -0.11947622640071e-22, 0.18228094581404e-23, -0.93537087292458e-25
  };
  private static final double[] STEAM = {-2.03150240, -2.68302940, -5.38626492, -17.2991605, -44.7586581, -63.9201063};
  private static final double[] STEAM_POWER = {2 / 6.0, 4 / 6.0, 8 / 6.0, 18 / 6.0, 37 / 6.0, 71 / 6.0};

  private WaterSteam() {}

  /** Vapour pressure, Pa. */
  public static double pressure(double kelvin) {
    double t = kelvin + R4[9] / (kelvin - R4[10]);
    double a = t * t + R4[1] * t + R4[2];
    double b = R4[3] * t * t + R4[4] * t + R4[5];
    double c = R4[6] * t * t + R4[7] * t + R4[8];
    return 1e6 * Math.pow(2 * c / (-b + Math.sqrt(b * b - 4 * a * c)), 4);
  }

  /** Boiling point, K. */
  public static double boilingPoint(double pascal) {
    double beta = Math.pow(pascal / 1e6, 0.25);
    double e = beta * beta + R4[3] * beta + R4[6];
    double f = R4[1] * beta * beta + R4[4] * beta + R4[7];
    double g = R4[2] * beta * beta + R4[5] * beta + R4[8];
    double d = 2 * g / (-f - Math.sqrt(f * f - 4 * e * g));
    double s = R4[10] + d;
    return (s - Math.sqrt(s * s - 4 * (R4[9] + R4[10] * d))) / 2;
  }

  /** Slope of the saturation line, Pa/K. */
  public static double slope(double kelvin) {
    double h = 0.01;
    return (pressure(kelvin + h) - pressure(kelvin - h)) / (2 * h);
  }

  /** Density of saturated steam, kg/m3. */
  public static double steamDensity(double kelvin) {
    double theta = 1 - kelvin / CRITICAL_K;
    double sum = 0;
    for (int i = 0; i < STEAM.length; i++) {
      sum += STEAM[i] * Math.pow(theta, STEAM_POWER[i]);
    }
    return CRITICAL_DENSITY * Math.exp(sum);
  }

  /** Latent heat, J/kg. */
  public static double latentHeat(double kelvin) {
    double liquid = liquidDensity(kelvin, pressure(kelvin));
    return kelvin * slope(kelvin) * (1 / steamDensity(kelvin) - 1 / liquid);
  }

  /** Density of the liquid, kg/m3. */
  public static double liquidDensity(double kelvin, double pascal) {
    double pi = pascal / 16.53e6;
    double tau = 1386 / kelvin;
    double gammaPi = 0;
    for (int i = 0; i < N1.length; i++) {
      gammaPi -= N1[i] * I1[i] * Math.pow(7.1 - pi, I1[i] - 1) * Math.pow(tau - 1.222, J1[i]);
    }
    return pascal / (GAS_CONSTANT * kelvin * pi * gammaPi);
  }

  /** Isobaric heat capacity of the liquid, J/(kg K). */
  public static double liquidHeatCapacity(double kelvin, double pascal) {
    double pi = pascal / 16.53e6;
    double tau = 1386 / kelvin;
    double second = 0;
    for (int i = 0; i < N1.length; i++) {
      second += N1[i] * Math.pow(7.1 - pi, I1[i]) * J1[i] * (J1[i] - 1) * Math.pow(tau - 1.222, J1[i] - 2);
    }
    return -GAS_CONSTANT * tau * tau * second;
  }

  /** Heat that a kilogram of water takes from one temperature to another, J, at the mean heat capacity. */
  public static double warming(double fromKelvin, double toKelvin) {
    return liquidHeatCapacity((fromKelvin + toKelvin) / 2, 101_325) * (toKelvin - fromKelvin);
  }
}
