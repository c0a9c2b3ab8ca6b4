package stillwarden.derive;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import java.util.OptionalDouble;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import stillwarden.RigBuilder;
import stillwarden.derive.PathFinding.Closure;
import stillwarden.derive.PathFinding.Relief;
import stillwarden.derive.PathFinding.State;
import stillwarden.derive.PathState.Look;
import stillwarden.describe.Dimension;
import stillwarden.describe.Port;

@DisplayName("The vapour path of a rig")
class VapourPathTest {
  private static final PathState COLD = PathState.beforeHeat();

  private static PathFinding of(RigBuilder rig) {
    return VapourPath.find(rig.rig(), COLD);
  }

  private static PathFinding of(RigBuilder rig, PathState seen) {
    return VapourPath.find(rig.rig(), seen);
  }

  private static RigBuilder good() {
    return RigBuilder.good();
  }

  /** Side arm stoppered is not enough with a free receiver: the good rig with a receiver jointed gas-tight. */
  private static RigBuilder jointed() {
    return good().join("take-off.outlet", "receiver").with("receiver.held", "jointed").with("receiver.gas-tight", "yes");
  }

  private static RigBuilder hose(String end) {
    return jointed().with("take-off.side-arm", "tube").part("vent-hose", "vent-hose", "end", end);
  }

  private static List<String> texts(PathFinding f) {
    return f.closures().stream().filter(Closure::nearest).map(Closure::toString).toList();
  }

  @Test
  void theGoodRigIsOpenAtSideArmAndOutlet() {
    PathFinding f = of(good());
    assertThat(f.path()).isEqualTo(State.OPEN);
    assertThat(f.openExits()).containsExactlyInAnyOrder("take-off.side-arm", "take-off.outlet");
    assertThat(f.closures()).isEmpty();
    assertThat(f.unknowns()).isEmpty();
    assertThat(f.openings()).isEqualTo(2);
    assertThat(f.countKnown()).isTrue();
    assertThat(f.lastOpening()).isFalse();
    assertThat(f.last()).isEmpty();
    assertThat(f.unlisted()).isEmpty();
    assertThat(f.unreached()).isEmpty();
    assertThat(f.seals()).isEmpty();
  }

  @Test
  void theGoodRigTakesItsFeedOnTheStraightArm() {
    PathFinding f = of(good());
    assertThat(f.feedArm()).contains("straight");
    assertThat(f.feedCrossesVapourPath()).isFalse();
    assertThat(f.relief()).isEqualTo(Relief.NONE);
    assertThat(f.inletUpstreamOfTip()).isTrue();
  }

  @Test
  void sideArmStopperedButReceiverFreeIsOpenAtTheOutlet() {
    PathFinding f = of(good().with("take-off.side-arm", "stoppered"));
    assertThat(f.path()).isEqualTo(State.OPEN);
    assertThat(f.openExits()).containsExactly("take-off.outlet");
    assertThat(f.last()).contains(new Port("take-off", "outlet"));
    assertThat(texts(f)).containsExactly("take-off.side-arm is stoppered");
  }

  @Test
  void sideArmStopperedAndGasTightReceiverIsClosedNamingBoth() {
    PathFinding f = of(jointed().with("take-off.side-arm", "stoppered"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(texts(f)).containsExactlyInAnyOrder("take-off.side-arm is stoppered", "receiver is gas-tight");
    assertThat(f.closures()).allMatch(Closure::handsCold);
    assertThat(f.openings()).isZero();
    assertThat(f.countKnown()).isTrue();
    assertThat(f.inletUpstreamOfTip()).isFalse();
  }

  @Test
  void aGasTightJointedReceiverLeavesOnlyTheSideArm() {
    PathFinding f = of(jointed());
    assertThat(f.openExits()).containsExactly("take-off.side-arm");
    assertThat(f.last()).contains(new Port("take-off", "side-arm"));
    assertThat(f.lastOpening()).isTrue();
  }

  @Test
  void aFreeReceiverStatedGasTightClosesTheOutlet() {
    PathFinding f = of(good().with("receiver.gas-tight", "yes").with("take-off.side-arm", "stoppered"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(texts(f)).contains("take-off.outlet ends in `receiver`, which is gas-tight");
  }

  @Test
  void aJointedReceiverWithAVentOfItsOwnIsAnExit() {
    PathFinding f = of(jointed().with("receiver.gas-tight", "no").with("take-off.side-arm", "stoppered"));
    assertThat(f.openExits()).containsExactly("receiver");
  }

  @Test
  void liquidAtTheReceiversOwnVentClosesIt() {
    RigBuilder rig = jointed().with("receiver.gas-tight", "no").with("take-off.side-arm", "stoppered");
    PathFinding f = of(rig, COLD.saw(Look.RECEIVER_VENT, "under-liquid"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(texts(f)).contains("receiver has its liquid at or over its own vent");
    assertThat(f.throughLiquid()).containsExactly(new Port("receiver", ""));
  }

  @Test
  void aJointedReceiverOfUnknownTightnessIsAskedFor() {
    PathFinding f = of(jointed().without("receiver.gas-tight").with("take-off.side-arm", "stoppered"));
    assertThat(f.path()).isEqualTo(State.UNKNOWN);
    assertThat(f.unknowns()).containsExactly("receiver.gas-tight");
  }

  @Test
  void stopperOnTheReservoirClosesNoDesignedPath() {
    PathFinding f = of(good().with("reservoir.stopper", "on").with("reservoir.stopcock", "open"));
    assertThat(f.path()).isEqualTo(State.OPEN);
    assertThat(f.closures()).isEmpty();
    assertThat(f.relief()).isEqualTo(Relief.NONE);
  }

  @Test
  void tipUnderLiquidLeavesTheSideArmUpstreamOfIt() {
    PathFinding f = of(good(), COLD.saw(Look.TIP, "under-liquid").sawSealDepth(0.02));
    assertThat(f.path()).isEqualTo(State.OPEN);
    assertThat(f.openExits()).containsExactly("take-off.side-arm");
    assertThat(f.inletUpstreamOfTip()).isTrue();
    assertThat(f.throughLiquid()).containsExactly(new Port("take-off", "outlet"));
    assertThat(f.seals()).containsExactly(new PathFinding.Seal("take-off.outlet", OptionalDouble.of(0.02)));
  }

  @Test
  void tipUnderLiquidAndSideArmStopperedIsClosedAndTheTipIsTheLastToVent() {
    PathFinding f = of(good().with("take-off.side-arm", "stoppered").with("receiver.tip-below-liquid", "yes"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(texts(f)).containsExactlyInAnyOrder("take-off.outlet is under liquid", "take-off.side-arm is stoppered");
    assertThat(f.last()).contains(new Port("take-off", "outlet"));
    assertThat(f.inletUpstreamOfTip()).isFalse();
  }

  @Test
  void aVentOnTheReceiverLetsNoAirInUpstreamOfTheTip() {
    RigBuilder rig = jointed().with("receiver.gas-tight", "no").with("take-off.side-arm", "stoppered");
    assertThat(of(rig).path()).isEqualTo(State.OPEN);
    assertThat(of(rig).inletUpstreamOfTip()).isFalse();
  }

  @Test
  void theLogsTipOutranksTheRigFilesTip() {
    RigBuilder rig = good().with("take-off.side-arm", "stoppered").with("receiver.tip-below-liquid", "yes");
    assertThat(of(rig, COLD.saw(Look.TIP, "clear")).path()).isEqualTo(State.OPEN);
    PathFinding notSure = of(rig, COLD.saw(Look.TIP, PathState.NOT_SURE));
    assertThat(notSure.path()).isEqualTo(State.UNKNOWN);
    assertThat(notSure.unknowns()).containsExactly("tip");
  }

  @Test
  void blockingCrystalsCloseNamingTheCondenserAndNoHandsCanOpenIt() {
    PathFinding f = of(good(), COLD.saw(Look.CONDENSER_SOLIDS, "blocking"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(f.closures()).containsExactly(new Closure("condenser", "is blocked by solid", false, true));
    assertThat(f.openings()).isZero();
  }

  @Test
  void withCrystalsBlockingTheUnstopperedReservoirIsTheLastOpening() {
    PathFinding f = of(good(), COLD.saw(Look.CONDENSER_SOLIDS, "blocking").saw(Look.STOPCOCK, "open"));
    assertThat(f.relief()).isEqualTo(Relief.THROUGH_LIQUID);
    assertThat(f.last()).contains(new Port("reservoir", "top"));
    PathFinding dry = of(good(), COLD.saw(Look.CONDENSER_SOLIDS, "blocking").saw(Look.STOPCOCK, "open").saw(Look.RESERVOIR_LEVEL, "empty"));
    assertThat(dry.relief()).isEqualTo(Relief.FREE);
    assertThat(dry.path()).isEqualTo(State.CLOSED);
    assertThat(dry.vents()).containsExactly(new Port("reservoir", "top"));
    assertThat(dry.last()).contains(new Port("reservoir", "top"));
  }

  @Test
  void aStopperAtTheBackOfAPlugIsNamedAsNotReached() {
    PathFinding f = of(jointed().with("take-off.side-arm", "stoppered"), COLD.saw(Look.CONDENSER_SOLIDS, "blocking"));
    assertThat(texts(f)).containsExactly("condenser is blocked by solid");
    assertThat(f.closures()).extracting(Closure::what).containsExactly("condenser", "take-off.side-arm", "receiver");
  }

  @Test
  void filmAndGrowingCrystalsCloseNothingYetAndUnseenOnesLeaveItOpenToDoubt() {
    assertThat(of(good(), COLD.saw(Look.CONDENSER_SOLIDS, "growing")).path()).isEqualTo(State.OPEN);
    PathFinding f = of(good(), COLD.saw(Look.CONDENSER_SOLIDS, PathState.NOT_SURE));
    assertThat(f.path()).isEqualTo(State.UNKNOWN);
    assertThat(f.unknowns()).containsExactly("condenser-solids");
    assertThat(of(good(), COLD.saw(Look.TAKE_OFF_SOLIDS, "blocking")).path()).isEqualTo(State.CLOSED);
  }

  @Test
  void foamOrPlantInTheHeadProvesNothing() {
    assertThat(of(good(), COLD.saw(Look.FOAM, "at-head")).path()).isEqualTo(State.UNKNOWN);
    assertThat(of(good(), COLD.saw(Look.FOAM, "past-half")).path()).isEqualTo(State.OPEN);
    assertThat(of(good(), COLD.saw(Look.PLANT_IN_HEAD, "yes")).path()).isEqualTo(State.UNKNOWN);
  }

  @Test
  void withNoLookAtAllNothingIsProvenOpen() {
    assertThat(of(good(), PathState.nothingSeen()).path()).isEqualTo(State.UNKNOWN);
  }

  @Test
  void theVentArmIsAskedForEvenWhereNothingElseIsOnTheBench() {
    RigBuilder rig = jointed().without("take-off.side-arm");
    assertThat(of(rig).path()).isEqualTo(State.UNKNOWN);
    assertThat(of(rig).unlisted()).containsExactly(new Port("take-off", "side-arm"));
    PathFinding unknown = of(rig.without("nothing-else"));
    assertThat(unknown.path()).isEqualTo(State.UNKNOWN);
    assertThat(unknown.unknowns()).containsExactly("take-off.side-arm");
    assertThat(unknown.countKnown()).isFalse();
  }

  @Test
  void theGoodRigNeedsNoNothingElse() {
    assertThat(of(good().without("nothing-else")).path()).isEqualTo(State.OPEN);
  }

  @Test
  void aReceiverOfWhichNothingIsSaidLeavesTheOutletUnknown() {
    RigBuilder rig = good().without("nothing-else").with("take-off.side-arm", "stoppered");
    PathFinding f = of(rig.without("receiver.held").without("receiver.gas-tight"));
    assertThat(f.path()).isEqualTo(State.UNKNOWN);
    assertThat(f.unknowns()).containsExactly("openings.take-off.outlet");
  }

  @Test
  void whatTwoStatementsSayOfOnePortCountsByTheWorse() {
    PathFinding f = of(jointed().with("openings.take-off.side-arm", "capped"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
  }

  @Test
  void aThermometerFillsItsPortAndAnOpenHeadIsNoDesignedWay() {
    PathFinding f = of(jointed().with("take-off.side-arm", "stoppered").drop("thermometer").with("openings.head.top", "open"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(f.vents()).containsExactly(new Port("head", "top"));
    assertThat(f.inletUpstreamOfTip()).isTrue();
  }

  @Test
  void aHoseWithItsEndInTheAirIsOpen() {
    assertThat(of(hose("open")).openExits()).containsExactly("take-off.side-arm");
    assertThat(of(hose("open"), COLD.saw(Look.HOSE, PathState.NOT_SURE)).path()).isEqualTo(State.UNKNOWN);
  }

  @Test
  void aHoseWithItsEndUnderLiquidIsALiquidSealAndNotOpen() {
    PathFinding f = of(hose("under-liquid"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(texts(f)).contains("vent-hose has its end under liquid");
    assertThat(f.seals()).extracting(PathFinding.Seal::what).containsExactly("vent-hose");
    assertThat(f.throughLiquid()).containsExactly(new Port("take-off", "side-arm"));
    assertThat(f.inletUpstreamOfTip()).isFalse();
  }

  @Test
  void aKinkedHoseACakedDryingTubeAndALowLoop() {
    assertThat(texts(of(hose("open"), COLD.saw(Look.HOSE, "kinked")))).contains("vent-hose is kinked");
    RigBuilder dried = hose("open").part("drier", "drying-tube");
    assertThat(of(dried).path()).isEqualTo(State.UNKNOWN);
    assertThat(of(dried, COLD.saw(Look.DRYING_TUBE, "clear")).path()).isEqualTo(State.OPEN);
    assertThat(texts(of(dried, COLD.saw(Look.DRYING_TUBE, "caked")))).contains("drier has its drying tube caked");
    assertThat(of(hose("open").with("vent-hose.low-loop", "yes")).unknowns()).containsExactly("vent-bubbling");
  }

  @Test
  void aTubeOfWhichNothingIsSaidIsUnknown() {
    PathFinding f = of(jointed().with("take-off.side-arm", "tube"));
    assertThat(f.path()).isEqualTo(State.UNKNOWN);
    assertThat(f.unknowns()).containsExactly("vent-hose.end");
  }

  @Test
  void aHoseInAJointOfTheSideArmCountsToo() {
    RigBuilder rig = jointed().without("take-off.side-arm").part("vent-hose", "vent-hose").join("take-off.side-arm", "vent-hose");
    assertThat(of(rig).unknowns()).containsExactly("vent-hose.end");
    assertThat(of(rig.with("vent-hose.end", "open")).openExits()).containsExactly("vent-hose");
    assertThat(of(rig.with("vent-hose.end", "under-liquid")).path()).isEqualTo(State.CLOSED);
  }

  @Test
  void aHoseOnTheHeadIsNoDesignedWayOut() {
    RigBuilder rig = jointed().with("take-off.side-arm", "stoppered").drop("thermometer");
    PathFinding f = of(rig.part("vent-hose", "vent-hose", "end", "open").join("head.top", "vent-hose"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(f.vents()).containsExactly(new Port("vent-hose", ""));
  }

  @Test
  void aJointApartClosesTheWayAndIsTheOnlyThingVenting() {
    PathFinding f = of(good(), COLD.sawApart("head.side-arm"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(texts(f)).containsExactly("head.side-arm + condenser.upper is apart");
    assertThat(f.last()).contains(new Port("head", "side-arm"));
  }

  @Test
  void aPartBetweenTwoJointsLeavesBothInDoubt() {
    PathFinding f = of(good(), COLD.sawApart("condenser"));
    assertThat(f.path()).isEqualTo(State.UNKNOWN);
    assertThat(f.unknowns()).containsExactly("joint-apart");
    assertThat(f.countKnown()).isFalse();
  }

  @Test
  void aHissingJointIsNoPathButIsTheLastOpening() {
    PathFinding f = of(good(), COLD.saw(Look.CONDENSER_SOLIDS, "blocking").sawLeak("joints[2]"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(f.last()).contains(new Port("claisen", "curved"));
    assertThat(f.inletUpstreamOfTip()).isFalse();
    assertThat(of(good(), COLD.sawLeak("")).countKnown()).isFalse();
  }

  @Test
  void aDisconnectedRigIsClosedNamingWhereTheChainEnds() {
    PathFinding f = of(good().unjoin("head.side-arm"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
    assertThat(texts(f)).containsExactly("head leads on to no exit: the joint is missing");
    assertThat(f.unreached()).containsExactly("condenser", "take-off");
    assertThat(f.vents()).containsExactly(new Port("head", "side-arm"));
  }

  @Test
  void withoutNothingElseAMissingJointIsOnlyUnlisted() {
    PathFinding f = of(good().unjoin("head.side-arm").without("nothing-else"));
    assertThat(f.path()).isEqualTo(State.UNKNOWN);
    assertThat(f.unknowns()).containsExactly("openings.head.side-arm");
  }

  @Test
  void aRigWithoutAFlaskOrWithTwoIsUnknown() {
    assertThat(of(good().drop("flask")).path()).isEqualTo(State.UNKNOWN);
    RigBuilder two = good().unjoin("flask").without("flask.boiling-aid").without("flask.minimum-level").part("other", "round-bottom-flask");
    assertThat(of(two).path()).isEqualTo(State.UNKNOWN);
    assertThat(of(two).unknowns()).containsExactly("flask.boiling-aid", "other.boiling-aid");
  }

  @Test
  void withoutATakeOffTheCondensersLowerEndIsTheTip() {
    RigBuilder rig = good().drop("take-off");
    assertThat(of(rig).openExits()).containsExactly("condenser.lower");
    assertThat(of(rig, COLD.saw(Look.TIP, "under-liquid")).path()).isEqualTo(State.CLOSED);
  }

  @Test
  void aRingOfGlassEndsTheSearch() {
    RigBuilder ring = good().with("flask.necks", "2").quantity("flask.necks", 2, Dimension.COUNT, "2").unjoin("flask");
    ring.join("flask.neck-1", "claisen.foot").part("claisen-2", "claisen-adapter");
    ring.join("flask.neck-2", "claisen-2.foot").drop("thermometer").join("claisen-2.curved", "head.top");
    PathFinding f = of(ring.with("openings.claisen-2.straight", "capped"));
    assertThat(f.path()).isEqualTo(State.OPEN);
    assertThat(f.openings()).isEqualTo(2);
  }

  @Test
  void ofTwoFreeReceiversTheTightOneMayStandUnderTheTip() {
    RigBuilder rig = good().with("take-off.side-arm", "stoppered").part("spare", "bottle", "gas-tight", "yes");
    assertThat(of(rig).path()).isEqualTo(State.UNKNOWN);
    assertThat(of(rig.with("spare.gas-tight", "no")).path()).isEqualTo(State.OPEN);
  }

  @Test
  void theFeedThroughTheHeadCrossesTheVapour() {
    RigBuilder rig = good().unjoin("reservoir.stem").drop("thermometer").join("head.top", "reservoir.stem");
    assertThat(of(rig).feedCrossesVapourPath()).isTrue();
    assertThat(of(rig).feedArm()).contains("side");
  }

  @Test
  void swappedArmsPutTheFeedOnTheSideArm() {
    RigBuilder rig = good().unjoin("reservoir.stem").unjoin("head.foot");
    PathFinding f = of(rig.join("claisen.curved", "reservoir.stem").join("claisen.straight", "head.foot"));
    assertThat(f.feedArm()).contains("side");
    assertThat(f.path()).isEqualTo(State.OPEN);
  }

  @Test
  void theNarrowestBoreIsThatOfTheWayWhoseBoresAreAllStated() {
    PathFinding.Narrowest n = of(good()).narrowest().orElseThrow();
    assertThat(n.metres()).isEqualTo(0.006);
    assertThat(n.what()).isEqualTo("take-off.side-arm-bore");
    assertThat(n.missing()).isEmpty();
    PathFinding.Narrowest outlet = of(good().with("take-off.side-arm", "stoppered")).narrowest().orElseThrow();
    assertThat(outlet.metres()).isEqualTo(0.012);
    assertThat(outlet.missing()).containsExactly("take-off.outlet");
  }

  @Test
  void aHoseNarrowerThanItsArmIsTheNarrowest() {
    PathFinding f = of(hose("open").quantity("vent-hose.bore", 0.004, Dimension.LENGTH, "4 mm"));
    assertThat(f.narrowest().orElseThrow().what()).isEqualTo("vent-hose.bore");
  }

  @Test
  void anUnknownStopcockLeavesTheReliefUnknown() {
    assertThat(of(good().without("reservoir.stopcock")).relief()).isEqualTo(Relief.UNKNOWN);
    assertThat(of(good(), COLD.saw(Look.STOPCOCK, "stuck")).relief()).isEqualTo(Relief.UNKNOWN);
    assertThat(of(good(), COLD.saw(Look.STOPCOCK, "stuck").saw(Look.STOPPER, "on")).relief()).isEqualTo(Relief.NONE);
  }

  @Test
  void aFlaskReceivingIsJointedByItsNeckOrItsMouth() {
    for (String port : List.of("receiver", "receiver.mouth", "receiver.neck")) {
      RigBuilder rig = good().with("receiver.kind", "round-bottom-flask").with("receiver.gas-tight", "yes");
      PathFinding f = of(rig.join("take-off.outlet", port).with("take-off.side-arm", "stoppered"));
      assertThat(f.path()).as(port).isEqualTo(State.CLOSED);
      assertThat(texts(f)).as(port).contains("receiver is gas-tight");
    }
  }

  @Test
  void closingEitherOpeningAloneLeavesTheOtherAsTheLast() {
    for (String closed : List.of("take-off.side-arm", "take-off.outlet")) {
      String other = closed.endsWith("outlet") ? "side-arm" : "outlet";
      PathFinding f = of(good().with("openings." + closed, "capped"));
      assertThat(f.path()).as(closed).isEqualTo(State.OPEN);
      assertThat(f.last()).as(closed).contains(new Port("take-off", other));
      assertThat(texts(f)).as(closed).containsExactly(closed + " is capped");
    }
    PathFinding both = of(good().with("openings.take-off.outlet", "capped").with("openings.take-off.side-arm", "stoppered"));
    assertThat(both.path()).isEqualTo(State.CLOSED);
    assertThat(texts(both)).containsExactlyInAnyOrder("take-off.outlet is capped", "take-off.side-arm is stoppered");
  }

  @Test
  void aKinkedHoseUnderLiquidDoesNotYieldToAPush() {
    PathFinding f = of(hose("under-liquid"), COLD.saw(Look.HOSE, "kinked"));
    assertThat(f.throughLiquid()).isEmpty();
    assertThat(texts(f)).contains("vent-hose is kinked; has its end under liquid");
  }

  @Test
  void aJointApartSomewhereMakesTheCountOfOpeningsUnknown() {
    RigBuilder shut = jointed().with("take-off.side-arm", "stoppered");
    assertThat(of(shut).countKnown()).isTrue();
    assertThat(of(shut, COLD.sawApart("condenser")).countKnown()).isFalse();
  }

  @Test
  void onePortUnderTwoNamesCountsByTheWorse() {
    RigBuilder rig = good().unjoin("flask").with("openings.flask", "open").with("openings.flask.neck", "stoppered");
    assertThat(of(rig).vents()).isEmpty();
    RigBuilder pot = good().with("receiver.kind", "round-bottom-flask").with("receiver.gas-tight", "yes").quantity("receiver.necks", 2, Dimension.COUNT, "2");
    PathFinding f = of(pot.join("take-off.outlet", "receiver.neck-1").with("take-off.side-arm", "stoppered").with("openings.receiver.neck-2", "open"));
    assertThat(f.path()).isEqualTo(State.CLOSED);
  }

  @Test
  void theTopOfACondenserIsAnExitUntilItIsSeenStoppered() {
    RigBuilder rig = good().unjoin("head.side-arm").unjoin("condenser.lower").drop("take-off").join("head.side-arm", "condenser.lower");
    rig.with("openings.condenser.upper", "open");
    assertThat(of(rig).openExits()).containsExactly("condenser.upper");
    PathFinding f = of(rig, COLD.saw(Look.CONDENSER_TOP, "stoppered"));
    assertThat(texts(f)).containsExactly("condenser.upper is stoppered");
  }

  @Test
  void aThroughWayOfUnknownGlassIsAskedFor() {
    RigBuilder rig = good().unjoin("condenser.lower").part("bend", "unheard-of").join("condenser.lower", "bend").join("bend", "take-off.inlet");
    assertThat(of(rig).path()).isEqualTo(State.UNKNOWN);
    assertThat(of(rig).unknowns()).containsExactly("bend.kind");
    RigBuilder named = good().unjoin("condenser.lower").part("bend", "unheard-of").join("condenser.lower", "bend.in").join("bend.out", "take-off.inlet");
    assertThat(of(named).unknowns()).containsExactly("bend.kind");
  }
}
