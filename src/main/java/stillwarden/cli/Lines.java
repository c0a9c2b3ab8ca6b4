package stillwarden.cli;

import java.io.BufferedInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.concurrent.LinkedBlockingQueue;
import java.util.concurrent.TimeUnit;

/** Lines as they come, from a stream that ends or from a file that grows. */
interface Lines extends AutoCloseable {
  /** Seconds of silence after which the clock counts as news. */
  int TICK_SECONDS = 1;

  /**
   * What came since the last look.
   *
   * @param text whole lines with their line feeds; empty when nothing came for one tick
   * @param open false when nothing more will come
   */
  record News(byte[] text, boolean open) {}

  News next() throws IOException, InterruptedException;

  @Override
  void close() throws IOException;

  /** Each line of the stream is news of its own, unless very many are waiting. */
  static Lines of(InputStream in) {
    return new FromStream(in);
  }

  /** What stands in the file at first is one piece of news; then each growth by whole lines. */
  static Lines growing(Path file) throws IOException {
    return new FromFile(FileChannel.open(file, StandardOpenOption.READ));
  }

  /** A thread reads, so that the clock can be looked at while the stream is silent. */
  final class FromStream implements Lines {
    /** With more lines waiting than this the judgement has fallen behind, and what is newest matters most. */
    private static final int BEHIND = 1000;

    private final LinkedBlockingQueue<News> queue = new LinkedBlockingQueue<>();

    FromStream(InputStream in) {
      Thread reader = new Thread(() -> read(new BufferedInputStream(in)), "log-reader");
      reader.setDaemon(true);
      reader.setUncaughtExceptionHandler((thread, broken) -> queue.add(new News(new byte[0], false)));
      reader.start();
    }

    private void read(InputStream in) {
      ByteArrayOutputStream line = new ByteArrayOutputStream();
      try {
        for (int b = in.read(); b >= 0; b = in.read()) {
          line.write(b);
          if (b == '\n') {
            queue.add(new News(line.toByteArray(), true));
            line.reset();
          }
        }
      } catch (IOException e) {
        line.reset(); // half a line from a broken stream is no line
      }
      queue.add(new News(line.toByteArray(), false));
    }

    @Override
    public News next() throws InterruptedException {
      News first = queue.poll(TICK_SECONDS, TimeUnit.SECONDS);
      if (first == null) {
        return new News(new byte[0], true);
      }
      return queue.size() > BEHIND ? joined(first) : first;
    }

    private News joined(News first) {
      List<News> waiting = new ArrayList<>(List.of(first));
      queue.drainTo(waiting);
      ByteArrayOutputStream all = new ByteArrayOutputStream();
      waiting.forEach(n -> all.writeBytes(n.text()));
      return new News(all.toByteArray(), waiting.get(waiting.size() - 1).open());
    }

    @Override
    public void close() {
      queue.clear();
    }
  }

  /** Looked at five times a second; an unfinished last line waits for its end. */
  final class FromFile implements Lines {
    private static final int LOOKS_A_SECOND = 5;

    private final FileChannel file;
    private final ByteArrayOutputStream half = new ByteArrayOutputStream();
    private long read;

    FromFile(FileChannel file) {
      this.file = file;
    }

    @Override
    public News next() throws IOException, InterruptedException {
      for (int look = 0; look < TICK_SECONDS * LOOKS_A_SECOND; look++) {
        byte[] lines = wholeLines(grown());
        if (lines.length > 0) {
          return new News(lines, true);
        }
        TimeUnit.MILLISECONDS.sleep(1000 / LOOKS_A_SECOND);
      }
      return new News(new byte[0], true);
    }

    private byte[] grown() throws IOException {
      long size = file.size();
      if (size < read) {
        throw new UncheckedIOException(new IOException("the log got shorter while it was followed; a log only grows"));
      }
      ByteBuffer buffer = ByteBuffer.allocate((int) Math.min(size - read, Integer.MAX_VALUE - 8));
      while (buffer.hasRemaining() && file.read(buffer, read + buffer.position()) > 0) {
        // reads until the buffer is full or the file's end
      }
      read += buffer.position();
      return Arrays.copyOf(buffer.array(), buffer.position());
    }

    private byte[] wholeLines(byte[] more) {
      half.writeBytes(more);
      byte[] all = half.toByteArray();
      int end = all.length;
      while (end > 0 && all[end - 1] != '\n') {
        end--;
      }
      half.reset();
      half.write(all, end, all.length - end);
      return Arrays.copyOf(all, end);
    }

    @Override
    public void close() throws IOException {
      file.close();
    }
  }
}
