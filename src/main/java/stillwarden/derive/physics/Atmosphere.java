package stillwarden.derive.physics;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Rig;

/**
 * Pressure of the place: a station barometer first, else a sea-level pressure brought to the elevation, else the
 * standard atmosphere (ISO 2533) at the elevation.
 *
 * @param pascal the pressure with its band; empty when neither barometer nor elevation is known
 * @param conflict difference of barometer and elevation where it is more than the site tolerates, Pa
 */
public record Atmosphere(Optional<Band> pascal, String method, List<String> notes, Optional<Double> conflict) {
  private static final double SEA_LEVEL = 101_325;

  public Atmosphere {
    notes = List.copyOf(notes);
  }

  /** Standard pressure, Pa, at a geopotential height of up to 11 km. */
  public static double standard(double metres) {
    return SEA_LEVEL * Math.pow(1 - 2.25577e-5 * metres, 5.25588);
  }

  public static Atmosphere of(Rig rig) {
    return of(rig.si("place.barometer"), rig.word("place.barometer-is"), rig.si("place.elevation"));
  }

  static Atmosphere of(Optional<Double> barometer, Optional<String> is, Optional<Double> elevation) {
    Optional<Double> station = station(barometer, is, elevation);
    List<String> notes = new ArrayList<>();
    if (station.isPresent()) {
      double gap = elevation.map(z -> station.get() - standard(z)).orElse(0.0);
      boolean apart = Math.abs(gap) > Limits.value("barometer-conflict");
      boolean guessed = is.isEmpty();
      if (guessed) {
        notes.add("the barometer is taken to show the pressure of the place, not that of sea level");
      }
      double error = Limits.value("barometer-band");
      Band read = new Band(station.get() - error, station.get(), station.get() + error);
      return new Atmosphere(Optional.of(apart ? widened(read, station.get() - gap) : read), "barometer", notes,
          apart ? Optional.of(gap) : Optional.empty());
    }
    if (elevation.isEmpty()) {
      return new Atmosphere(Optional.empty(), "", notes, Optional.empty());
    }
    double error = Limits.value("weather-band");
    double p = standard(elevation.get());
    notes.add("from the elevation alone: the weather moves it");
    return new Atmosphere(Optional.of(new Band(p - error, p, p + error)), "standard atmosphere at the elevation", notes, Optional.empty());
  }

  private static Optional<Double> station(Optional<Double> barometer, Optional<String> is, Optional<Double> elevation) {
    if (is.filter("sea-level"::equals).isPresent()) {
      // a sea-level pressure without an elevation says nothing about this place
      return barometer.isPresent() && elevation.isPresent()
          ? Optional.of(barometer.get() * standard(elevation.get()) / SEA_LEVEL)
          : Optional.empty();
    }
    return barometer;
  }

  private static Band widened(Band b, double other) {
    return new Band(Math.min(b.low(), other), b.nominal(), Math.max(b.high(), other));
  }
}
