package stillwarden.judge;

import java.util.Set;

/** The five kinds of statement that a rule can make. */
public sealed interface Statement {
  /** Do this. {@code part} is the user's name of the part where it matters, else empty. {@code say} sharpens the default wording, else empty. */
  record Propose(String action, String part, String say) implements Statement {}

  /** Do not do this; with {@code until} (an action id or a sign in words) it may be done after that, without it never. */
  record Forbid(String deed, String until) implements Statement {}

  /** {@code first} comes before {@code then}, when both are in the answer. */
  record Before(String first, String then) implements Statement {}

  /** Look at this: a rig path or an observation id. */
  record Ask(String about) implements Statement {}

  /** An end criterion (A1, A2, B1 .. C4) holds. */
  record Reach(String criterion) implements Statement {
    public static final Set<String> ALL = Set.of("A1", "A2", "B1", "B2", "B4", "C1", "C2", "C3", "C4");
  }
}
