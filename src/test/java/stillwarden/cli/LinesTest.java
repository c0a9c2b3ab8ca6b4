package stillwarden.cli;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.ByteArrayInputStream;
import java.io.PipedInputStream;
import java.io.PipedOutputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class LinesTest {
  @TempDir private Path folder;

  private static String text(Lines.News news) {
    return new String(news.text(), StandardCharsets.UTF_8);
  }

  @Test
  void aStreamGivesLineByLineAndItsUnfinishedEnd() throws Exception {
    try (Lines lines = Lines.of(new ByteArrayInputStream("a\nb\nc".getBytes(StandardCharsets.UTF_8)))) {
      assertThat(text(lines.next())).isEqualTo("a\n");
      assertThat(text(lines.next())).isEqualTo("b\n");
      Lines.News last = lines.next();
      assertThat(text(last)).isEqualTo("c");
      assertThat(last.open()).isFalse();
    }
  }

  @Test
  void aSilentStreamGivesATick() throws Exception {
    try (PipedOutputStream writer = new PipedOutputStream(); Lines lines = Lines.of(new PipedInputStream(writer))) {
      Lines.News tick = lines.next();
      assertThat(tick.text()).isEmpty();
      assertThat(tick.open()).isTrue();
    }
  }

  @Test
  void aGrowingFileGivesWholeLinesOnly() throws Exception {
    Path log = Files.writeString(folder.resolve("log"), "a\nb\nhal");
    try (Lines lines = Lines.growing(log)) {
      assertThat(text(lines.next())).isEqualTo("a\nb\n");
      Files.writeString(log, "f\n", StandardOpenOption.APPEND);
      assertThat(text(lines.next())).isEqualTo("half\n");
      assertThat(lines.next().text()).isEmpty();
    }
  }

  @Test
  void aLogThatGetsShorterIsNotFollowed() throws Exception {
    Path log = Files.writeString(folder.resolve("log"), "a\nb\n");
    try (Lines lines = Lines.growing(log)) {
      lines.next();
      Files.writeString(log, "a\n");
      assertThatThrownBy(lines::next).hasMessageContaining("only grows");
    }
  }
}
