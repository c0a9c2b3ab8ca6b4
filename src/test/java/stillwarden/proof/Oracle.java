package stillwarden.proof;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import stillwarden.order.Arranged.Bar;
import stillwarden.order.Arranged.Plan;
import stillwarden.order.Arranged.Row;

/**
 * The invariants of a rig whose flask holds water and plant, told in plain Java from what they are for: nothing here
 * reads a rule, the ladder or any other data of the program.
 */
final class Oracle {
  /** What each message begins with. */
  static final List<String> NAMES = List.of(
      "INV-01", "INV-03", "INV-04", "INV-05", "INV-06", "INV-09", "INV-10", "INV-11", "INV-12", "INV-13", "INV-14", "INV-15", "INV-16", "INV-17", "INV-21", "INV-25");

  private static final Set<String> CUTS = Set.of("cut-power", "isolate-remote", "isolate-auto", "close-gas");
  private static final Set<String> PERSONAL = Set.of(
      "stand-clear", "warn-people", "call-help", "raise-alarm", "evacuate", "get-person", "cool-burn", "rinse-eyes", "stop-work", "hands-off-person", "resuscitate",
      "take-rings-off", "remove-contam", "others-take-over", "move-out", "drop-and-roll", "point-away", "ask-policy", "handover");
  private static final Set<String> LOOKS_AND_PAPER = Set.of(
      "log", "keep-heat-off", "second-look", "verify-level", "verify-path", "read-baro", "measure", "identify", "inspect-cold", "do-not-start", "end-run", "tag-out", "relabel", "weigh");
  /** Undone, taken off or pulled out under vapour. */
  private static final Set<String> OPENS = Set.of("unstopper-reservoir", "swap-receiver", "reseat-cold", "take-apart-cold", "draw-off-cold", "replace-item");
  private static final Set<String> WAITS = Set.of("wait-quiet", "let-cool");
  /** Told as a deed, and done by keeping one's hands off. */
  private static final Set<String> NO_DEED = Set.of("leave-feed", "coolant-leave-off", "coolant-keep", "continue", "pause");
  private static final Set<String> COLD = Set.of("reseat-cold", "take-apart-cold", "draw-off-cold", "inspect-cold", "cap-cold", "fix-setup", "replace-item");
  private static final Set<String> CLOSES = Set.of("close-feed", "cap-cover", "close-vent-late", "close-tap");
  private static final Set<String> ADDS = Set.of("add-solvent", "prime", "start-gentle-heat");
  private static final Set<String> HEATS = Set.of("raise-heat", "restart-low", "start-gentle-heat");
  private static final Set<String> TOUCHES_WET = Set.of("lower-heat", "lower-heat-part", "close-water", "dry-floor", "contain-spill");

  private final State s;
  private final List<Row> steps;
  private final List<Bar> bars;
  private final List<String> ids = new ArrayList<>();
  private final List<String> equipment = new ArrayList<>();
  final List<String> broken = new ArrayList<>();

  private Oracle(State s, Plan plan) {
    this.s = s;
    steps = plan.steps();
    bars = plan.bars();
    for (Row row : steps) {
      if (row.iff().isEmpty()) {
        ids.add(row.id());
        if (!PERSONAL.contains(row.id()) && !LOOKS_AND_PAPER.contains(row.id())) {
          equipment.add(row.id());
        }
      }
    }
  }

  /** What is broken, each beginning with the invariant's name. */
  static List<String> judge(State s, Plan plan) {
    Oracle o = new Oracle(s, plan);
    o.energyFirst();
    o.neverOpenUnderPressure();
    o.noColdLiquidOnHotGlass();
    o.lastOpening();
    o.tipBeforeCooling();
    o.heatDoesNotWait();
    o.nothingIntoHotLiquid();
    o.heatIsNotRaised();
    o.possibleMoves();
    o.coolantGoesOn();
    o.electricityBeforeWater();
    o.noSwitchInVapour();
    o.peopleFirst();
    o.toxic();
    o.nothingWarmIsSealed();
    o.listDiscipline();
    return o.broken;
  }

  private void require(boolean holds, String what) {
    if (!holds) {
      broken.add(what);
    }
  }

  private boolean hurt() {
    return s.is("injury", "other", "cut", "burn", "breathing", "eye", "shock-released", "shock");
  }

  private boolean fire() {
    return s.is("fire", "small", "spreading", "clothing");
  }

  /** Some deed first and nothing of it missing. */
  private boolean inOrder(String first, String then) {
    return !ids.contains(then) || ids.contains(first) && ids.indexOf(first) < ids.indexOf(then);
  }

  private boolean behindAWait(String deed) {
    int at = ids.indexOf(deed);
    return WAITS.stream().anyMatch(w -> ids.contains(w) && ids.indexOf(w) < at);
  }

  /** INV-01, with the sash for the jack where the heater stays, pressure shows, poison or fire is out, nobody is there. */
  private void energyFirst() {
    if (!s.live() || !s.is("path", "closed") || hurt() || s.is("attendance", "nobody")) {
      return;
    }
    List<String> left = new ArrayList<>(equipment);
    // flames first only when what can burn is out (on the hot heater too); support before a walk to the switch
    boolean canBurn = !s.is("vapour-out", "none") || s.is("heater-wet", "oil", "solvent");
    boolean walk = s.is("clamp-slipping", "yes") && s.is("switch", "out-of-reach");
    left.removeIf(d -> d.equals("flame-out") && (canBurn || s.is("heater-kind", "burner")) || d.equals("support-load") && walk);
    require(!left.isEmpty() && CUTS.contains(left.get(0)), "INV-01 no energy cut first: " + left);
    // a burner has two energies, gas and the mains of everything else; a load is supported before the heater moves (INV-11)
    List<String> cuts = left.stream().limit(1).toList();
    left.removeAll(cuts);
    left.removeIf(d -> CUTS.contains(d) && s.is("heater-kind", "burner") || d.equals("support-load"));
    // a flask that cracks wets its heater: wet and live
    boolean sash = s.is("pressure-evident", "yes") || fire() || s.is("toxic-release", "yes") || s.is("heater-live-wet", "yes") || s.is("heater-lowers", "no")
        || s.is("heater-kind", "burner") || s.is("glass-failing", "yes") || bathWet();
    boolean either = s.is("heater-wet", "oil", "solvent");
    String second = left.isEmpty() ? "" : left.get(0);
    require(second.equals(sash ? "sash-down" : "lower-heat") || either && Set.of("sash-down", "lower-heat").contains(second), "INV-01 second is " + second + ", wanted " + (sash ? "sash-down" : "lower-heat"));
  }

  private boolean bathWet() {
    return s.is("bath-spitting", "yes") || s.is("heater-kind", "bath") && s.is("heater-wet", "water");
  }

  /** INV-03; a receiver that stands free is no closure while no pressure shows. */
  private void neverOpenUnderPressure() {
    boolean pressed = s.live() && !s.is("path", "open") || s.is("pressure-evident", "yes") && s.is("glass-hot", "yes");
    if (pressed && s.is("pressure-gone", "no")) {
      for (String deed : ids) {
        boolean free = deed.equals("swap-receiver") && s.is("tip-can-be-cleared", "yes") && s.is("pressure-evident", "no") && !s.is("path", "closed");
        require(!OPENS.contains(deed) || free || COLD.contains(deed) || behindAWait(deed), "INV-03 " + deed + " before pressure is verified gone");
      }
    }
  }

  /** INV-04. */
  private void noColdLiquidOnHotGlass() {
    if (s.is("glass-hot", "yes") && s.is("flask-level", "dry")) {
      require(!ids.contains("feed-slow"), "INV-04 feed-slow into a hot dry flask");
    }
    if (s.is("glass-hot", "yes") && s.is("jacket", "empty-hot")) {
      // tempered water onto a jacket that was held off by plan is allowed
      for (String deed : List.of("coolant-start-slow", "coolant-raise", "coolant-keep")) {
        require(!ids.contains(deed) || behindAWait(deed) || deed.equals("coolant-keep") && s.is("coolant", "running", "low"), "INV-04 " + deed + " into a hot empty jacket");
      }
    }
  }

  /** INV-05. */
  private void lastOpening() {
    if (s.live() && s.is("last-opening", "yes") && s.is("path", "closed", "not-proven")) {
      CLOSES.forEach(deed -> require(!ids.contains(deed) || behindAWait(deed), "INV-05 " + deed + " closes the last opening"));
    }
  }

  /** INV-06, with vapour at the receiver and the urgent order excepted. */
  private void tipBeforeCooling() {
    boolean excepted = fire() || hurt() || s.is("receiver-in-vapour", "yes") || s.is("toxic-release", "yes") || s.is("attendance", "nobody")
        || s.is("vapour-out", "wisps", "plume") || plugged() || ids.contains("evacuate") || s.is("tip-can-be-cleared", "no") || !s.is("tip-can-be-cleared", "yes");
    if (s.live() && s.is("tip", "under-liquid") && s.is("path", "open") && !excepted) {
      require(inOrder("lower-receiver", "lower-heat"), "INV-06 lower-heat before the tip is clear");
      require(inOrder("lower-receiver", "wait-quiet"), "INV-06 wait-quiet before the tip is clear");
    }
  }

  /** Whatever the tip does: stored heat does not wait until it is quiet, since it is what keeps it from being quiet. */
  private void heatDoesNotWait() {
    boolean until = bars.stream().anyMatch(b -> b.deed().equals("lower-heat") && WAITS.contains(b.until()));
    // open: a leak outside wants the water shut before the heater moves, one inside wants it to run until quiet
    boolean twoLeaks = s.is("inner-leak", "yes") && s.is("coolant-leak", "yes");
    if (s.live() && !until && !twoLeaks) {
      require(!behindAWait("lower-heat") || !ids.contains("lower-heat") || s.is("attendance", "nobody"), "INV-06 lower-heat behind the wait for quiet");
    }
  }

  /** Crystals and no drip are a plug, whatever the last look at the way said. */
  private boolean plugged() {
    return s.is("crystals", "film", "growing", "blocking") && s.is("flow", "none", "slowing") || s.is("crystals", "blocking") || s.is("coolant-watch", "failed");
  }

  /** INV-09. */
  private void nothingIntoHotLiquid() {
    if (s.is("glass-hot", "yes")) {
      ADDS.forEach(deed -> require(!ids.contains(deed), "INV-09 " + deed + " over hot liquid"));
    }
  }

  /** INV-10; a restart never stands in an alarm list. */
  private void heatIsNotRaised() {
    HEATS.forEach(deed -> require(!ids.contains(deed), "INV-10 " + deed));
  }

  /** INV-11 and INV-12. */
  private void possibleMoves() {
    if (s.is("heater-carries-flask", "yes")) {
      require(inOrder("support-load", "lower-heat"), "INV-11 lower-heat before support-load");
      require(inOrder("support-load", "lower-heat-part"), "INV-11 lower-heat-part before support-load");
    }
    if (s.is("heater-lowers", "no") || s.is("heater-kind", "burner")) {
      require(!ids.contains("lower-heat"), "INV-12 lower-heat of a heater that cannot move");
      require(!ids.contains("lower-heat-part"), "INV-12 lower-heat-part of a heater that cannot move");
    }
    if (s.is("tip-can-be-cleared", "no")) {
      require(!ids.contains("lower-receiver"), "INV-12 lower-receiver where it cannot be lowered");
      require(!ids.contains("swap-receiver"), "INV-12 swap-receiver where it cannot be taken away");
    }
    if (s.live() && s.is("attendance", "nobody") && !ids.isEmpty()) {
      for (String deed : List.of("lower-heat", "lower-receiver", "close-feed", "feed-slow", "sash-down", "close-water", "coolant-start-slow")) {
        require(inOrder("get-person", deed), "INV-12 " + deed + " with nobody at the rig");
      }
    }
  }

  /** INV-13. */
  private void coolantGoesOn() {
    if (s.is("vapour", "yes") && s.live()) {
      boolean crystals = s.is("crystals", "film", "growing") && !s.is("path", "closed");
      require(!ids.contains("coolant-stop") || behindAWait("coolant-stop") || crystals, "INV-13 coolant-stop while vapour is made");
      boolean cut = ids.indexOf("close-water") > ids.stream().filter(CUTS::contains).mapToInt(ids::indexOf).min().orElse(Integer.MAX_VALUE);
      require(!ids.contains("close-water") || cut, "INV-13 close-water before the energy is cut");
      require(!ids.contains("jacket-drain") || behindAWait("jacket-drain"), "INV-13 jacket-drain while vapour is made");
    }
  }

  /** INV-14. */
  private void electricityBeforeWater() {
    boolean wet = s.is("water-on", "electrics", "heater") || s.is("heater-live-wet", "yes");
    if (wet && s.is("heater-proven-dead", "no")) {
      TOUCHES_WET.forEach(deed -> require(inOrder("isolate-remote", deed), "INV-14 " + deed + " before a dry remote cut"));
      require(!ids.contains("cut-power"), "INV-14 cut-power at the rig's switch with water on live parts");
    }
  }

  /** INV-15. */
  private void noSwitchInVapour() {
    if (s.is("switch", "wet-or-in-vapour")) {
      require(!ids.contains("cut-power"), "INV-15 cut-power at a switch that is wet or in vapour");
    }
  }

  /** INV-16. */
  private void peopleFirst() {
    if (hurt() && s.is("glass-hot", "yes") && !steps.isEmpty()) {
      // heat left off is no deed; flames go out first where what burns is already in the air, whoever is hurt beside them
      boolean first = !ids.isEmpty() && (PERSONAL.contains(ids.get(0)) || CUTS.contains(ids.get(0)) || Set.of("keep-heat-off", "flame-out").contains(ids.get(0)));
      require(first, "INV-16 first is " + (ids.isEmpty() ? "nothing" : ids.get(0)));
      for (String deed : equipment) {
        boolean onTheWay = CUTS.contains(deed) || deed.equals("flame-out") || deed.equals("sash-down") || NO_DEED.contains(deed);
        require(onTheWay || COLD.contains(deed), "INV-16 " + deed + " sends a hurt person back");
      }
    }
  }

  /** INV-17. */
  private void toxic() {
    if (s.is("toxic-release", "yes") && s.is("glass-hot", "yes")) {
      require(ids.contains("evacuate") && ids.contains("raise-alarm"), "INV-17 nobody is sent out");
      require(equipment.stream().filter(CUTS::contains).count() <= (s.is("heater-kind", "burner") ? 2 : 1), "INV-17 more than one energy cut");
      for (String deed : equipment) {
        boolean allowed = CUTS.contains(deed) || NO_DEED.contains(deed) || Set.of("sash-down", "flame-out").contains(deed);
        require(allowed || COLD.contains(deed), "INV-17 " + deed + " at the rig in poison");
      }
    }
  }

  /** INV-21. */
  private void nothingWarmIsSealed() {
    if (s.is("glass-hot", "yes")) {
      for (String deed : List.of("cap-cold", "cap-cover", "close-vent-late")) {
        require(!ids.contains(deed) || behindAWait(deed), "INV-21 " + deed + " while warm");
      }
    }
  }

  /** INV-25, and the must-nots: nothing in the list is banned, nothing stands ahead of what it waits for. */
  private void listDiscipline() {
    Set<String> twice = new HashSet<>();
    for (Row row : steps) {
      require(!row.reasons().isEmpty(), "INV-25 " + row.id() + " without a reason");
      require(COLD.contains(row.id()) || twice.add(row.id() + row.part()), "INV-25 " + row.id() + " twice");
    }
    for (Bar bar : bars) {
      require(!bar.until().isEmpty() || !ids.contains(bar.deed()), "INV-25 a ban does not beat " + bar.deed());
      boolean action = !bar.until().isEmpty() && !bar.until().contains(" ");
      require(!action || inOrder(bar.until(), bar.deed()), "INV-25 " + bar.deed() + " ahead of " + bar.until());
    }
    require(ids.stream().filter(CUTS::contains).count() <= (s.is("heater-kind", "burner") ? 2 : 1), "INV-25 two energy cuts: " + ids.stream().filter(CUTS::contains).toList());
  }
}
