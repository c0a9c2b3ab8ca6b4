package stillwarden.describe;

/** A value that cannot be taken; the message says in the user's word what is wrong and what would be right. */
public final class BadValue extends Exception {
  private static final long serialVersionUID = 1L;

  public BadValue(String message) {
    super(message);
  }
}
