package stillwarden.cli;

/** What the shell is told. */
enum Exit {
  /** {@code start} or {@code carry-on}; for plan, rules and schema: done. */
  NOTHING_TO_DO(0),
  /** Something to do or to find out. */
  SOMETHING_TO_DO(1),
  /** The command line, a rig, a policy or a whole log could not be used. */
  UNUSABLE(2);

  private final int code;

  Exit(int code) {
    this.code = code;
  }

  int code() {
    return code;
  }

  static Exit of(int adviceExit) {
    return adviceExit == 0 ? NOTHING_TO_DO : SOMETHING_TO_DO;
  }

  Exit worse(Exit other) {
    return compareTo(other) >= 0 ? this : other;
  }
}
