package stillwarden.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.time.OffsetDateTime;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import stillwarden.describe.LogReader;
import stillwarden.describe.Policy;
import stillwarden.describe.Rig;
import stillwarden.describe.RigReader;
import stillwarden.describe.Unusable;
import stillwarden.order.Advice;
import stillwarden.order.Advisor;
import stillwarden.show.JsonView;

/** A log heard piece by piece is the log read whole. */
class WatchedLogTest {
  private static final String[] PIECES = {
    "{\"format\":\"stillwarden/log/1\",\"rig\":\"bench.rig.yaml\"}\n",
    "{\"at\":\"2026-05-12T09:00:00Z\",\"by\":\"nk\",\"did\":\"heat-on\",\"value\":\"60 %\"}\n\n",
    "no line at all\n{\"at\":\"2026-05-12T09:02:00Z\",\"by\":\"nk\",\"saw\":\"foam\",\"value\":\"none\"}\n",
    "{\"at\":\"2026-05-12T09:03:00Z\",\"by\":\"nk\",\"saw\":\"flask-level\",\"value\":\"340\"}\n",
    "{\"at\":\"2026-05-12T09:04:00Z\",\"by\":\"nk\",\"saw\":\"smo"
  };

  private final Rig rig = rig();

  private static Rig rig() {
    try {
      return RigReader.read(Path.of("demo-data", "rigs", "fennel-bench.rig.yaml"));
    } catch (Unusable u) {
      throw new AssertionError(u.getMessage(), u);
    }
  }

  @Test
  void pieceByPieceSaysWhatTheWholeSays() throws Unusable {
    StringBuilder sofar = new StringBuilder(PIECES[0]);
    try (Live live = new LiveRun(rig, Policy.NONE, "-")) {
      live.hear(bytes(PIECES[0]));
      assertThatThrownBy(() -> live.answer(Optional.empty())).isInstanceOf(Unusable.class);
      for (int i = 1; i < PIECES.length; i++) {
        live.hear(bytes(PIECES[i]));
        sofar.append(PIECES[i]);
        Advice whole = Advisor.advise(rig, Policy.NONE, LogReader.read(new ByteArrayInputStream(bytes(sofar.toString())), "-"), Optional.empty());
        assertThat(JsonView.of(live.answer(Optional.empty()))).isEqualTo(JsonView.of(whole));
      }
      assertThat(live.answer(Optional.empty()).leftOut()).hasSize(3);
    }
  }

  @Test
  void aClockBehindTheLogHidesNoLine() throws Unusable {
    try (Live live = new LiveRun(rig, Policy.NONE, "-")) {
      live.hear(bytes(PIECES[1]));
      assertThat(live.answer(Optional.of(OffsetDateTime.parse("2026-05-12T08:00:00Z"))).at()).startsWith("2026-05-12T09:00");
      assertThat(live.answer(Optional.of(OffsetDateTime.parse("2026-05-12T09:30:00Z"))).at()).startsWith("2026-05-12T09:30");
    }
  }

  @Test
  void aFormatThatNobodyKnowsStaysRefused() {
    try (Live live = new LiveRun(rig, Policy.NONE, "-")) {
      assertThatThrownBy(() -> live.hear(bytes("{\"format\":\"stillwarden/log/9\"}\n"))).isInstanceOf(Unusable.class);
      assertThatThrownBy(() -> live.hear(bytes(PIECES[1]))).isInstanceOf(Unusable.class);
      assertThatThrownBy(() -> live.answer(Optional.empty())).isInstanceOf(Unusable.class);
    }
  }

  private static byte[] bytes(String s) {
    return s.getBytes(StandardCharsets.UTF_8);
  }
}
