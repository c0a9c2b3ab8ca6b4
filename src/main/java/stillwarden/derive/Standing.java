package stillwarden.derive;

/** How well a sign is known; the weakest of a finding's signs is the finding's own. */
public enum Standing {
  /** Stated in the rig file, seen in the log, or computed from such. */
  SEEN,
  /** Unknown, disputed or too old, and counted as its worst credible value by an unknown-observation policy. */
  COUNTED,
  /** Unknown: it could be so. Never acted on, always asked. */
  POSSIBLE;

  public Standing weaker(Standing other) {
    return compareTo(other) >= 0 ? this : other;
  }
}
