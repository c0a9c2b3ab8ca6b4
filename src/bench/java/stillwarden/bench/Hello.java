package stillwarden.bench;

/** The least that a Java program can do: what a cold start is compared with. */
public final class Hello {
  private Hello() {}

  public static void main(String[] args) {
    System.out.println("hello");
  }
}
