package stillwarden.derive.physics;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

/** 1:10 tapers: the first number decides, the second is the ground length (ISO 383, ASTM E676). */
class JointFitTest {
  @ParameterizedTest
  @CsvSource({
    "24/40, 24/40, SEATS", "29/32, 29/32, SEATS", "14/20, 14/23, SHORT", "14/23, 14.5/23, SEATS", "19/22, 19/26, SHORT", "24/29, 24/40, SHORT",
    "29/32, 29/42, SHORT", "34/35, 34/45, SHORT", "24/40, 29/32, MISFIT", "14/23, 19/26, MISFIT", "10/18, 14/20, MISFIT",
    "ball 18/9, ball 18/9, SEATS", "18/9, 28/15, MISFIT", "18/9, 19/22, MISFIT", "35/20, 34/35, MISFIT", "12/2, 12/21, MISFIT"
  })
  void pairs(String a, String b, JointFit.Seat seat) {
    assertThat(JointFit.of(JointFit.parse(a).orElseThrow(), JointFit.parse(b).orElseThrow()).seat()).isEqualTo(seat);
  }

  @ParameterizedTest
  @CsvSource({"24/40, SEATS", "24/29 in 24/40, SHORT", "24/40 + 29/32, MISFIT"})
  void aJointAsWritten(String text, JointFit.Seat seat) {
    assertThat(JointFit.ofText(text).orElseThrow().seat()).isEqualTo(seat);
  }

  @ParameterizedTest
  @ValueSource(strings = {"big", "24", "24-40", "", "24/40 in big"})
  void whatIsNoDesignationIsUnknown(String text) {
    assertThat(JointFit.ofText(text)).isEmpty();
  }

  @Test
  void aBallIsTold() {
    assertThat(JointFit.parse("18/9").orElseThrow().ball()).isTrue();
    assertThat(JointFit.parse("24/12").orElseThrow().ball()).isFalse();
  }
}
