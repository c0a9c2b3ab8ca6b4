package stillwarden.describe;

// replaced at merge
public final class SchemaWriter {
  private SchemaWriter() {}

  public static String schema(String what) {
    throw new IllegalStateException("no schema `" + what + "` in this build");
  }
}
