package stillwarden.derive;

import java.util.List;


/** Computed numbers against their limits, as signs; what cannot be computed asks for what is missing. */
final class FigureSigns {
  private final Scene scene;
  private final SignSet out;

  FigureSigns(Scene scene, SignSet out) {
    this.scene = scene;
    this.out = out;
  }

  void make() {
    Figures n = scene.numbers();
    verdict("flask-fill", n.flaskFill(), "flask-fill");
    verdict("condenser-margin", n.condenserMargin(), "condenser-capacity");
    verdict("receiver-capacity", n.receiverCapacity(), "receiver-capacity");
    verdict("water-budget", n.waterBudget(), "water-needed");
    verdict("coolant-strategy", n.coolantStrategy(), "coolant-strategy");
    verdict("mantle-fit", n.mantleFit(), "mantle-fit");
    verdict("oil-immiscible", n.oilImmiscible(), "boiling-point-here");
    out.seenIf(n.barometerConflict(), "barometer-conflict", n.barometerConflict() ? "barometer and elevation disagree by more than 3 kPa" : "barometer and elevation agree, or one is missing");
    boolean known = scene.rig().datum("place.elevation").isPresent() || scene.rig().datum("place.barometer").isPresent() || scene.run().lastSaw("barometer").isPresent();
    if (known) {
      out.seen("pressure-known", "yes", "pressure of the place by barometer or elevation");
    } else {
      out.seen("pressure-known", "", "no", "neither barometer nor elevation stated", null, "place.elevation");
    }
  }

  private void verdict(String about, String value, String number) {
    List<String> missing = scene.numbers().missing(number);
    if (value.isEmpty()) {
      out.possible(about, "", SignSet.domain(about), about.replace('-', ' ') + " cannot be computed", missing.isEmpty() ? List.of(about) : missing);
    } else {
      out.seen(about, "", value, scene.numbers().why(about), null, scene.numbers().about(about));
    }
  }
}
