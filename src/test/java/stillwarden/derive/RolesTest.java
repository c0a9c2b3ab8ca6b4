package stillwarden.derive;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.DisplayName;
import org.junit.jupiter.api.Test;
import stillwarden.RigBuilder;
import stillwarden.describe.Part;

@DisplayName("The roles of the parts")
class RolesTest {
  private static List<String> names(RigBuilder rig, Role role) {
    return Roles.of(rig.rig()).all(role).stream().map(Part::name).toList();
  }

  @Test
  void theGoodRigLacksNothing() {
    Roles r = Roles.of(RigBuilder.goodRig());
    assertThat(r.missing()).isEmpty();
    assertThat(r.absent()).isEmpty();
    assertThat(r.others()).isEmpty();
    for (Role role : Role.IN_FLASK) {
      assertThat(r.one(role)).as(role.word()).isPresent();
    }
    assertThat(r.of("take-off")).contains(Role.TAKE_OFF);
  }

  @Test
  void theJackUnderTheHeaterIsNotTheJackUnderTheReceiver() {
    assertThat(names(RigBuilder.good(), Role.JACK)).containsExactly("jack");
    assertThat(names(RigBuilder.good(), Role.RECEIVER_JACK)).containsExactly("jack-2");
    RigBuilder bench = RigBuilder.good().with("mantle.stands-on", "bench");
    assertThat(names(bench, Role.JACK)).isEmpty();
  }

  @Test
  void theWordJackMeansTheJackThatIsLeft() {
    RigBuilder rig = RigBuilder.good().drop("jack").part("riser", "lab-jack");
    assertThat(names(rig, Role.JACK)).containsExactly("riser");
  }

  @Test
  void aRoundBottomFlaskUnderTheTakeOffReceives() {
    RigBuilder rig = RigBuilder.good().drop("receiver").part("pot", "round-bottom-flask").join("take-off.outlet", "pot");
    assertThat(names(rig, Role.FLASK)).containsExactly("flask");
    assertThat(names(rig, Role.RECEIVER)).containsExactly("pot");
  }

  @Test
  void theJointsOutrankTheKeys() {
    RigBuilder rig = RigBuilder.good().part("pot", "round-bottom-flask", "boiling-aid", "none").join("take-off.outlet", "pot");
    assertThat(names(rig, Role.FLASK)).containsExactly("flask");
    assertThat(names(rig, Role.RECEIVER)).containsExactlyInAnyOrder("receiver", "pot");
  }

  @Test
  void aFlaskStandingFreeByAJointedOneReceives() {
    RigBuilder rig = RigBuilder.good().drop("receiver").part("pot", "round-bottom-flask");
    assertThat(names(rig, Role.RECEIVER)).containsExactly("pot");
  }

  @Test
  void twoFlasksOfWhichNothingTellsAreBothListed() {
    RigBuilder rig = RigBuilder.empty().part("a", "round-bottom-flask").part("b", "round-bottom-flask");
    assertThat(names(rig, Role.FLASK)).containsExactly("a", "b");
    assertThat(Roles.of(rig.rig()).one(Role.FLASK)).isEmpty();
  }

  @Test
  void statedAbsentIsNotMissing() {
    Roles r = Roles.of(RigBuilder.good().drop("claisen").part("claisen", "none").drop("reservoir").rig());
    assertThat(r.absent()).containsExactly(Role.CLAISEN);
    assertThat(r.missing()).containsExactly(Role.RESERVOIR);
  }

  @Test
  void anUnjointedFunnelBesideTheReservoirIsNoReservoir() {
    RigBuilder rig = RigBuilder.good().part("work-up-funnel", "separatory-funnel");
    assertThat(names(rig, Role.RESERVOIR)).containsExactly("reservoir");
    assertThat(Roles.of(rig.rig()).others()).extracting(Part::name).containsExactly("work-up-funnel");
  }

  @Test
  void anEmptyRigMissesEverythingThatTheMethodNeeds() {
    assertThat(Roles.of(RigBuilder.empty().rig()).missing()).isEqualTo(Role.IN_FLASK);
  }

  @Test
  void aSplashHeadIsAHead() {
    assertThat(names(RigBuilder.good().with("head.kind", "splash-head"), Role.HEAD)).containsExactly("head");
  }

  @Test
  void aSecondPartThatIsThereOutranksOneThatIsNot() {
    Roles r = Roles.of(RigBuilder.good().part("condenser-2", "none").rig());
    assertThat(r.absent()).isEmpty();
    assertThat(r.one(Role.CONDENSER)).isPresent();
  }

  @Test
  void theFlaskUnderTheClaisenBoilsWhateverTheKeysOfAnotherSay() {
    RigBuilder rig = RigBuilder.good().without("flask.boiling-aid").without("flask.minimum-level").with("flask.tare", "212 g");
    rig.part("pot", "round-bottom-flask", "boiling-aid", "fresh-stones");
    assertThat(names(rig, Role.FLASK)).containsExactly("flask");
    assertThat(names(rig, Role.RECEIVER)).containsExactlyInAnyOrder("receiver", "pot");
  }
}
