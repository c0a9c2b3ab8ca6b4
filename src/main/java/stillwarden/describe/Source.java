package stillwarden.describe;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.Arrays;

/** Bytes of a file as text: capped before anything parses them, strictly UTF-8, without a byte order mark. */
final class Source {
  private Source() {}

  static String read(Path path, int mostBytes) throws Unusable {
    Spot spot = Spot.of(path.toString());
    if (Files.isDirectory(path)) {
      throw new Unusable(spot, "is a folder; a file is wanted");
    }
    try (InputStream in = Files.newInputStream(path)) {
      return text(capped(in, mostBytes, spot), spot);
    } catch (NoSuchFileException e) {
      throw new Unusable(spot, "there is no such file");
    } catch (AccessDeniedException e) {
      throw new Unusable(spot, "may not be read by this user");
    } catch (IOException e) {
      throw new Unusable(spot, "could not be read");
    }
  }

  static byte[] capped(InputStream in, int mostBytes, Spot spot) throws IOException, Unusable {
    byte[] bytes = in.readNBytes(mostBytes + 1);
    if (bytes.length > mostBytes) {
      throw tooLarge(mostBytes, spot);
    }
    return bytes;
  }

  static Unusable tooLarge(int mostBytes, Spot spot) {
    return new Unusable(spot, "is larger than " + mostBytes / 1024 + " KiB; no description of a rig or a run is");
  }

  static String text(byte[] bytes, Spot spot) throws Unusable {
    try {
      String s = strict(bytes);
      return s.startsWith("\uFEFF") ? s.substring(1) : s;
    } catch (CharacterCodingException e) {
      throw new Unusable(new Spot(spot.file(), lineOfFirstFault(bytes), 0), "is not UTF-8 text; save it as UTF-8");
    }
  }

  private static String strict(byte[] bytes) throws CharacterCodingException {
    return StandardCharsets.UTF_8.newDecoder()
        .onMalformedInput(CodingErrorAction.REPORT)
        .onUnmappableCharacter(CodingErrorAction.REPORT)
        .decode(ByteBuffer.wrap(bytes))
        .toString();
  }

  /** UTF-8 never hides a line feed inside a character, so whole lines can be tried one by one. */
  private static int lineOfFirstFault(byte[] bytes) {
    int line = 1;
    int start = 0;
    for (int i = 0; i < bytes.length; i++) {
      if (bytes[i] == '\n') {
        try {
          strict(Arrays.copyOfRange(bytes, start, i));
        } catch (CharacterCodingException e) {
          return line;
        }
        line++;
        start = i + 1;
      }
    }
    return line;
  }
}
