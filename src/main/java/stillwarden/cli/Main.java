package stillwarden.cli;

import java.io.FileDescriptor;
import java.io.FileInputStream;
import java.io.FileOutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.time.Clock;
import java.util.Optional;

/** Wiring: the process's streams and clock go in, its exit status comes out. */
public final class Main {
  private Main() {}

  public static void main(String[] args) {
    PrintStream out = new PrintStream(new FileOutputStream(FileDescriptor.out), false, StandardCharsets.UTF_8);
    PrintStream err = new PrintStream(new FileOutputStream(FileDescriptor.err), true, StandardCharsets.UTF_8);
    Desk desk = new Desk(new LiveEngine(), new FileInputStream(FileDescriptor.in), out, err, Clock.systemDefaultZone());
    System.exit(run(desk, args).code());
  }

  private static Exit run(Desk desk, String... args) {
    try {
      Optional<Quick> quick = Quick.of(args);
      return quick.isPresent() ? quick.get().run(desk) : Stillwarden.run(desk, args);
    } catch (Throwable e) { // no stack trace ever reaches a user, whatever broke
      return Fault.say(desk, e);
    }
  }
}
