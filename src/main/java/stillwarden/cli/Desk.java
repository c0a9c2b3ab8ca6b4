package stillwarden.cli;

import java.io.InputStream;
import java.io.PrintStream;
import java.time.Clock;
import java.util.List;
import stillwarden.describe.Defect;

/** What a command may touch of the world outside: three streams, the clock and the engine. The answer alone goes to {@code out}. */
record Desk(Engine engine, InputStream in, PrintStream out, PrintStream err, Clock clock) {
  void answer(String text) {
    out.print(text);
    out.flush();
  }

  /** Every defect, one a line. */
  void defects(List<Defect> defects) {
    defects.forEach(d -> err.println(oneLine(d.toString())));
  }

  void say(String line) {
    err.println(oneLine(line));
  }

  private static String oneLine(String s) {
    return s.replaceAll("\\R\\s*", " ");
  }
}
