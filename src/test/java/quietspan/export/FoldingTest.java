package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import quietspan.Seeds;

/** RFC 5545, section 3.1: lines of at most 75 octets without their CRLF. */
final class FoldingTest {

  private static String folded(String line) {
    return new String(Folding.fold(line + "\r\n"), StandardCharsets.UTF_8);
  }

  @Test
  void seventyFiveOctetsStayOnOneLine() {
    assertThat(folded("x".repeat(75))).isEqualTo("x".repeat(75) + "\r\n");
  }

  @Test
  void theSeventySixthOctetGoesToTheNextLine() {
    assertThat(folded("x".repeat(76))).isEqualTo("x".repeat(75) + "\r\n x\r\n");
  }

  @Test
  void theBlankOfAContinuationCounts() {
    assertThat(folded("x".repeat(75 + 74 + 1)))
        .isEqualTo("x".repeat(75) + "\r\n " + "x".repeat(74) + "\r\n x\r\n");
  }

  /** Characters of two, three and four octets, begun at every octet around the edge. */
  @ParameterizedTest(name = "{0}")
  @ValueSource(strings = {"\u00e9", "\u20ac", "\ud83d\udce1"})
  void noCharacterIsTornApart(String wide) throws CharacterCodingException {
    for (int before = 66; before <= 76; before++) {
      String line = "x".repeat(before) + wide.repeat(40);
      assertUnfoldsTo(line);
    }
  }

  @Seeds(count = 10)
  void unfoldingGivesTheLineBack(Random random) throws CharacterCodingException {
    String[] alphabet = {"a", ":", " ", "\\n", "\u00fc", "\u4e2d", "\ud83d\ude80"};
    for (int i = 0; i < 200; i++) {
      StringBuilder line = new StringBuilder("X");
      for (int j = random.nextInt(300); j > 0; j--) {
        line.append(alphabet[random.nextInt(alphabet.length)]);
      }
      assertUnfoldsTo(line.toString());
    }
  }

  private static void assertUnfoldsTo(String line) throws CharacterCodingException {
    byte[] bytes = Folding.fold(line + "\r\n");
    int octets = 0;
    int lineStart = 0;
    for (int i = 0; i < bytes.length; i++) {
      if (bytes[i] == '\r') {
        assertThat(octets).isLessThanOrEqualTo(75);
        // A decoder that reports malformed input proves that the line is whole UTF-8.
        StandardCharsets.UTF_8
            .newDecoder()
            .decode(ByteBuffer.wrap(bytes, lineStart, i - lineStart));
        lineStart = i + 2;
        i++;
        octets = 0;
      } else {
        octets++;
      }
    }
    assertThat(new String(bytes, StandardCharsets.UTF_8).replace("\r\n ", ""))
        .isEqualTo(line + "\r\n");
  }
}
