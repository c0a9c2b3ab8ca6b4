package stillwarden.cli;

import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import stillwarden.describe.Policy;
import stillwarden.describe.Unusable;

/**
 * The plain call {@code inspect RIG... [--policy FILE] [--format text|json]}, read without the command line library,
 * which takes longer to start than the inspection itself. Whatever is not plainly this is left to the library.
 */
final class Quick {
  private final List<Path> rigs = new ArrayList<>();
  private Path policy;
  private String format;

  private Quick() {}

  static Optional<Quick> of(String... args) {
    Quick q = new Quick();
    try {
      return args.length > 1 && args[0].equals("inspect") && q.takes(args) && !q.rigs.isEmpty() ? Optional.of(q) : Optional.empty();
    } catch (InvalidPathException e) {
      return Optional.empty();
    }
  }

  private boolean takes(String[] args) {
    for (int i = 1; i < args.length; i++) {
      boolean option = args[i].equals("--policy") || args[i].equals("--format");
      if (!(option ? ++i < args.length && option(args[i - 1], args[i]) : rig(args[i]))) {
        return false;
      }
    }
    return true;
  }

  private boolean rig(String word) {
    return plain(word) && rigs.add(Path.of(word));
  }

  /** Each once; a second one is an error that the library words. */
  private boolean option(String name, String value) {
    if (name.equals("--policy")) {
      boolean first = policy == null && plain(value);
      policy = first ? Path.of(value) : policy;
      return first;
    }
    boolean first = format == null && (value.equals("text") || value.equals("json"));
    format = value;
    return first;
  }

  /** No option, no file of arguments. */
  private static boolean plain(String word) {
    return !word.isEmpty() && word.charAt(0) != '-' && word.charAt(0) != '@';
  }

  Exit run(Desk desk) {
    try {
      Policy site = policy == null ? Policy.NONE : desk.engine().policy(policy);
      return new Inspection(desk, rigs, site, "json".equals(format), Optional.empty()).run();
    } catch (Unusable u) {
      desk.defects(u.defects());
      return Exit.UNUSABLE;
    }
  }
}
