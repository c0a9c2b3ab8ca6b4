package stillwarden.describe;

import java.io.InputStream;
import java.nio.file.Path;

// replaced at merge
public final class LogReader {
  private LogReader() {}

  public static RunLog read(Path file) throws Unusable {
    throw new Unusable(Spot.of(file.toString()), "can't be read by this build");
  }

  public static RunLog read(InputStream in, String name) throws Unusable {
    throw new Unusable(Spot.of(name), "can't be read by this build");
  }
}
