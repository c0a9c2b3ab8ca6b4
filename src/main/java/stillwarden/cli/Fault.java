package stillwarden.cli;

/** The last resort: a fault of ours is said to be one, in one line, and no advice is given. */
final class Fault {
  private Fault() {}

  static Exit say(Desk desk, Throwable e) {
    String what = e.getMessage() == null ? "no further word" : e.getMessage();
    desk.say("stillwarden: the program failed (" + what + "); this is no advice about the rig: ask a person");
    return Exit.UNUSABLE;
  }
}
