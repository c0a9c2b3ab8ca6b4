package stillwarden;

import static stillwarden.describe.Dimension.COUNT;
import static stillwarden.describe.Dimension.FRACTION;
import static stillwarden.describe.Dimension.LENGTH;
import static stillwarden.describe.Dimension.MASS;
import static stillwarden.describe.Dimension.POWER;
import static stillwarden.describe.Dimension.TEMPERATURE;
import static stillwarden.describe.Dimension.TEMPERATURE_DIFFERENCE;
import static stillwarden.describe.Dimension.VELOCITY;
import static stillwarden.describe.Dimension.VOLUME;
import static stillwarden.describe.Dimension.VOLUME_FLOW;

/** The contract's example rig, value by value. */
final class GoodRig {
  private GoodRig() {}

  static RigBuilder fill(RigBuilder b) {
    place(b);
    charge(b);
    heat(b);
    glass(b);
    cooling(b);
    collecting(b);
    joints(b);
    people(b);
    return b;
  }

  private static void place(RigBuilder b) {
    words(b, "seen.by", "nk", "seen.at", "2026-04-14T08:50:00Z", "nothing-else", "yes", "place.warm-water", "mixer");
    words(b, "place.hood.in-hood", "yes", "place.hood.running", "yes", "place.hood.sash-at-mark", "yes");
    b.quantity("place.elevation", 250, LENGTH, "250 m");
    b.quantity("place.room", 294.15, TEMPERATURE, "21 Cel");
    b.quantity("place.hood.face-velocity", 0.5, VELOCITY, "0.5 m/s");
  }

  private static void charge(RigBuilder b) {
    words(b, "charge.material", "fennel seed, crushed", "charge.plant", "fennel-seed");
    b.quantity("charge.material-mass", 0.060, MASS, "60 g");
    b.quantity("charge.water", 400e-6, VOLUME, "400 mL");
    b.quantity("charge.oil.expected", 1.8e-3, MASS, "1.8 g");
    b.quantity("charge.oil.makeup.trans-anethole", 0.80, FRACTION, "80 %");
    b.quantity("charge.oil.makeup.estragole", 0.12, FRACTION, "12 %");
    b.quantity("charge.oil.makeup.limonene", 0.08, FRACTION, "8 %");
    b.quantity("target.distillate", 150e-6, VOLUME, "150 mL");
  }

  private static void heat(RigBuilder b) {
    b.part("jack", "lab-jack", "raised", "yes", "clear-to-lower", "yes", "drop", "one-motion", "tried", "yes");
    b.part("mantle", "heating-mantle", "stands-on", "jack", "cord-sound", "yes", "liquid-inside", "no");
    b.quantity("mantle.power", 380, POWER, "380 W");
    b.quantity("mantle.fits", 1e-3, VOLUME, "1 L");
    b.part("regulator", "power-regulator", "setting-means", "duty", "feeds", "mantle", "residual-current-protected", "yes");
    b.quantity("regulator.setting", 0, FRACTION, "0 %");
  }

  private static void glass(RigBuilder b) {
    b.part("flask", "round-bottom-flask", "cracks", "no", "boiling-aid", "fresh-stones", "clamped", "yes", "carried-by", "clamp");
    b.quantity("flask.volume", 1e-3, VOLUME, "1 L");
    b.quantity("flask.minimum-level", 150e-6, VOLUME, "150 mL");
    b.part("claisen", "claisen-adapter", "cracks", "no");
    b.part("reservoir", "separatory-funnel", "holds", "water", "stopper", "off", "stopcock", "shut", "supported", "yes", "cracks", "no");
    b.quantity("reservoir.volume", 250e-6, VOLUME, "250 mL");
    b.quantity("reservoir.water", 200e-6, VOLUME, "200 mL");
    b.part("head", "still-head", "cracks", "no");
    b.part("thermometer", "thermometer", "bulb", "at-side-arm", "filling", "spirit");
    b.quantity("thermometer.upper-limit", 423.15, TEMPERATURE, "150 Cel");
    b.quantity("thermometer.error", 0.5, TEMPERATURE_DIFFERENCE, "0.5 K");
  }

  private static void cooling(RigBuilder b) {
    b.part("condenser", "liebig-condenser", "clamped", "yes", "cracks", "no");
    b.quantity("condenser.jacket-length", 0.300, LENGTH, "300 mm");
    b.quantity("condenser.tube-bore", 0.012, LENGTH, "12 mm");
    b.quantity("condenser.jacket-volume", 95e-6, VOLUME, "95 mL");
    words(b, "condenser.coolant.medium", "water", "condenser.coolant.plan", "tempered", "condenser.coolant.flow-proven", "yes");
    words(b, "condenser.coolant.connected", "yes", "condenser.coolant.inlet", "lower", "condenser.coolant.hoses-clipped", "yes");
    words(b, "condenser.coolant.drain-secured", "yes");
    b.quantity("condenser.coolant.supply", 301.15, TEMPERATURE, "28 Cel");
    b.quantity("condenser.coolant.flow", 0.5e-3 / 60, VOLUME_FLOW, "0.5 L/min");
  }

  private static void collecting(RigBuilder b) {
    b.part("take-off", "vacuum-adapter", "side-arm", "open", "vents-to", "hood", "cracks", "no");
    b.quantity("take-off.side-arm-bore", 0.006, LENGTH, "6 mm");
    b.part("receiver", "graduated-receiver", "held", "free", "stands-on", "jack-2", "mouth", "narrow", "gas-tight", "no");
    words(b, "receiver.tip-below-liquid", "no", "receiver.supported", "yes", "receiver.can-be-lowered", "yes");
    b.quantity("receiver.volume", 250e-6, VOLUME, "250 mL");
    b.part("jack-2", "lab-jack", "raised", "yes", "clear-to-lower", "yes");
  }

  private static void joints(RigBuilder b) {
    b.join("flask", "claisen.foot").join("claisen.straight", "reservoir.stem").join("claisen.curved", "head.foot");
    b.join("head.top", "thermometer", "10/18", "no");
    b.join("head.side-arm", "condenser.upper").join("condenser.lower", "take-off.inlet");
  }

  private static void people(RigBuilder b) {
    b.quantity("people.people-at-rig", 1, COUNT, "1");
    for (String item : "trained goggles heat-gloves lab-coat closed-shoes second-person-in-call".split(" ")) {
      b.with("people." + item, "yes");
    }
    for (String item : "eyewash-within-10-s extinguisher-within-reach spill-kit exit-clear power-off-within-reach".split(" ")) {
      b.with("emergency." + item, "yes");
    }
    b.with("emergency.power-off", "wall switch left of the hood");
  }

  private static void words(RigBuilder b, String... pathsAndWords) {
    for (int i = 0; i < pathsAndWords.length; i += 2) {
      b.with(pathsAndWords[i], pathsAndWords[i + 1]);
    }
  }
}
