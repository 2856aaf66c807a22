package quietspan.export;

import java.io.ByteArrayOutputStream;
import java.nio.charset.StandardCharsets;

/**
 * Folds content lines at 75 octets as RFC 5545, section 3.1, asks: each piece ends with CRLF, each
 * but the first begins with a blank that counts, and no character of UTF-8 is torn apart.
 */
final class Folding {

  private static final int MOST_OCTETS = 75;

  private Folding() {}

  /**
   * @param text unfolded content lines, each ended by CRLF
   */
  static byte[] fold(String text) {
    ByteArrayOutputStream out = new ByteArrayOutputStream(text.length() + text.length() / 16);
    for (String line : text.split("\r\n", -1)) {
      if (!line.isEmpty()) {
        fold(line.getBytes(StandardCharsets.UTF_8), out);
      }
    }
    return out.toByteArray();
  }

  private static void fold(byte[] line, ByteArrayOutputStream out) {
    int from = 0;
    int room = MOST_OCTETS;
    while (line.length - from > room) {
      int to = from + room;
      while (isContinuation(line[to])) {
        to--;
      }
      out.write(line, from, to - from);
      out.write('\r');
      out.write('\n');
      out.write(' ');
      from = to;
      room = MOST_OCTETS - 1;
    }
    out.write(line, from, line.length - from);
    out.write('\r');
    out.write('\n');
  }

  /** Whether the octet goes on a character that an earlier one began: 10xxxxxx. */
  private static boolean isContinuation(byte octet) {
    return (octet & 0xC0) == 0x80;
  }
}
