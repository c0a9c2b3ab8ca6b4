package stillwarden.describe;

/** One thing that is wrong with an input: where, and in words what is wrong and what would be right. */
public record Defect(Spot spot, String message) {
  @Override
  public String toString() {
    return spot + ": " + message;
  }
}
