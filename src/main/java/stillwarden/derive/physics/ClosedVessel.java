package stillwarden.derive.physics;

import java.util.Optional;

/** What happens in heated glass without a way out, and against a liquid seal. Laboratory glass has no pressure rating. */
public final class ClosedVessel {
  private static final double GRAVITY = 9.80665;

  private ClosedVessel() {}

  /**
   * Seconds until boiling water and its glass stand {@code over} Pa above the air, heated quasi-steadily along the
   * saturation line with no air left in the vapour space.
   *
   * @param water kg
   * @param glassCapacity J/K
   * @param net W into the liquid, above 0
   */
  public static double seconds(double pascal, double over, double water, double glassCapacity, double net) {
    double from = WaterSteam.boilingPoint(pascal);
    double to = WaterSteam.boilingPoint(pascal + over);
    double liquid = water * WaterSteam.warming(from, to);
    return (liquid + glassCapacity * (to - from)) / net;
  }

  /** Vacuum, Pa, of a sealed flask without air that was closed boiling at {@code pascal} and has cooled to {@code kelvin}. */
  public static double vacuum(double pascal, double kelvin) {
    return pascal - WaterSteam.pressure(kelvin);
  }

  /** Back-pressure of a liquid seal, Pa. */
  public static double seal(double metres, double density) {
    return density * GRAVITY * metres;
  }

  /**
   * Pressure drop, Pa, when the whole boil-up leaves as steam through one bore.
   *
   * @param net W that boil
   * @param bore inner diameter, m
   * @param length of the narrow place, m; 0 for an orifice
   * @param heads velocity heads lost at entry, bends and exit
   */
  public static double ventDrop(double pascal, double net, double bore, double length, double heads) {
    double boiling = WaterSteam.boilingPoint(pascal);
    double density = WaterSteam.steamDensity(boiling);
    double area = Math.PI * bore * bore / 4;
    double speed = net / WaterSteam.latentHeat(boiling) / density / area;
    double reynolds = density * speed * bore / Limits.value("steam-viscosity");
    double friction = reynolds <= 0 ? 0 : reynolds < 2300 ? 64 / reynolds : 0.3164 / Math.pow(reynolds, 0.25);
    return (heads + friction * length / bore) * density * speed * speed / 2;
  }

  /** Seconds in which a standing flask cools, Newton's law. */
  static Optional<Band> cooling(Band capacity, double volume, double from, double to, double room) {
    if (to <= room || from <= to || volume <= 0) {
      return Optional.empty();
    }
    double area = 4 * Math.PI * Math.pow(3 * volume / (4 * Math.PI), 2 / 3.0);
    return Optional.of(capacity.over(Limits.band("cooling-coefficient").times(area)).times(Math.log((from - room) / (to - room))));
  }

  /** Seconds by which a cold feed stops the boil. */
  public static double reboil(double kilograms, double feedKelvin, double boilingKelvin, double net) {
    return kilograms * WaterSteam.warming(feedKelvin, boilingKelvin) / net;
  }
}
