package stillwarden.describe;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.List;
import org.junit.jupiter.api.Test;

class WordsTest {
  @Test
  void theNearestWordIsTheOneMeant() {
    assertThat(Words.nearest("clampd", List.of("clamped", "claisen"))).contains("clamped");
    assertThat(Words.nearest("anethol", List.of("menthol", "trans-anethole"))).contains("trans-anethole");
    assertThat(Words.nearest("Face_Velocity", List.of("face-velocity"))).contains("face-velocity");
    assertThat(Words.nearest("liebig", List.of("liebig-condenser", "coil-condenser"))).contains("liebig-condenser");
  }

  @Test
  void noWordIsSuggestedWhenNoneIsNear() {
    assertThat(Words.nearest("stones", List.of("fresh-stones", "used-stones", "none"))).isNotEqualTo(java.util.Optional.of("none"));
    assertThat(Words.nearest("zebra", List.of("clamped", "supported"))).isEmpty();
  }

  @Test
  void aSwapOfNeighboursIsOneEdit() {
    assertThat(Words.distance("jionts", "joints")).isEqualTo(1);
    assertThat(Words.distance("", "abc")).isEqualTo(3);
    assertThat(Words.distance("foam", "foam")).isZero();
  }

  @Test
  void theUsersWordIsCutAndMadeHarmless() {
    assertThat(Words.quote("a\u001b[2Jb`c\n")).isEqualTo("`a?[2Jb?c?`");
    assertThat(Words.quote("x".repeat(100))).hasSize(65).endsWith("...`");
  }
}
