package stillwarden.cli;

import java.io.ByteArrayOutputStream;
import java.io.InputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.time.Clock;
import java.time.Instant;
import java.time.ZoneOffset;

/** The program as the user calls it, with the real readers, rules and views, in this process and on a clock that stands. */
public final class InProcess {
  private InProcess() {}

  /** What one call printed and its exit status. */
  public record Result(int status, String out, String err) {}

  public static Result run(String... args) {
    ByteArrayOutputStream out = new ByteArrayOutputStream();
    ByteArrayOutputStream err = new ByteArrayOutputStream();
    Clock clock = Clock.fixed(Instant.parse("2026-06-01T12:00:00Z"), ZoneOffset.UTC);
    Desk desk = new Desk(new LiveEngine(), InputStream.nullInputStream(), stream(out), stream(err), clock);
    int status = Stillwarden.run(desk, args).code();
    return new Result(status, out.toString(StandardCharsets.UTF_8), err.toString(StandardCharsets.UTF_8));
  }

  private static PrintStream stream(ByteArrayOutputStream bytes) {
    return new PrintStream(bytes, true, StandardCharsets.UTF_8);
  }
}
