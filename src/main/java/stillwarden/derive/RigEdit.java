package stillwarden.derive;

import java.util.LinkedHashMap;
import java.util.Map;
import java.util.Optional;
import stillwarden.describe.Datum;
import stillwarden.describe.Part;
import stillwarden.describe.Quantity;
import stillwarden.describe.Rig;
import stillwarden.describe.Spot;

/** The same rig with one key changed: to try whether a change would do. */
final class RigEdit {
  private RigEdit() {}

  static Rig with(Rig rig, String path, String text, Optional<Quantity> measured) {
    Datum d = new Datum(path, text, measured, Spot.of("a change tried"));
    int dot = path.indexOf('.');
    Part part = dot < 0 ? null : rig.parts().get(path.substring(0, dot));
    if (part == null) {
      return new Rig(rig.file(), rig.name(), rig.method(), plus(rig.facts(), path, d), rig.parts(), rig.joints(), rig.openings(), rig.digest());
    }
    Part changed = new Part(part.name(), part.kind(), plus(part.keys(), path.substring(dot + 1), d));
    return new Rig(rig.file(), rig.name(), rig.method(), rig.facts(), plus(rig.parts(), part.name(), changed), rig.joints(), rig.openings(), rig.digest());
  }

  private static <T> Map<String, T> plus(Map<String, T> some, String key, T value) {
    Map<String, T> more = new LinkedHashMap<>(some);
    more.put(key, value);
    return more;
  }
}
