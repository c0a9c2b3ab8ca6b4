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
    coolant(n);
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

  /** What is seen outranks what was computed: coolant held off as the site permits, and no vapour leaves. */
  private void coolant(Figures n) {
    boolean heldOff = scene.is(Role.CONDENSER, "coolant.plan", "held-off") && scene.policy().permits("held-off-coolant");
    Looks.Look outlet = scene.looks().at("vapour-past-condenser", Shelves.of(scene.policy(), "vapour-past-condenser"), null, null);
    boolean inside = outlet.fresh() && outlet.word().filter("none"::equals).isPresent() && scene.time().firstDrop().isPresent();
    if (n.coolantStrategy().equals("unmet") && heldOff && inside) {
      out.seen("coolant-strategy", "met", "held off as the site permits, and no vapour leaves, " + scene.told(outlet.entry().get()));
    } else {
      verdict("coolant-strategy", n.coolantStrategy(), "coolant-strategy");
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
