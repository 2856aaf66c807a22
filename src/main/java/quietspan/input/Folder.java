package quietspan.input;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import quietspan.model.InputFile;
import quietspan.problem.Place;
import quietspan.problem.Problems;

/** A scenario folder: gives the bytes of its files and remembers what it gave. */
final class Folder {

  private static final long LARGEST_TEXT = 20_000_000;

  private final Path root;
  private final Problems problems;
  private final Map<String, String> hashes = new TreeMap<>();

  Folder(Path root, Problems problems) {
    this.root = root;
    this.problems = problems;
  }

  /** The file's hash is taken and its bytes are given; complains at the place that asks for it. */
  Optional<byte[]> bytes(String file, Place asked, String path) {
    Path place = root.resolve(file);
    if (!Files.exists(place)) {
      problems.error(asked, path, "there is no file " + file, "a file in the scenario folder");
      return Optional.empty();
    }
    if (!Files.isRegularFile(place)) {
      problems.error(asked, path, file + " is not a file", "a file in the scenario folder");
      return Optional.empty();
    }
    try {
      byte[] bytes = Files.readAllBytes(place);
      hashes.put(file, sha256(bytes));
      return Optional.of(bytes);
    } catch (IOException e) {
      problems.error(asked, path, file + " cannot be read", "a file that may be read");
      return Optional.empty();
    }
  }

  /** The file as text in UTF-8, a byte-order mark left out. */
  Optional<String> text(String file, Place asked, String path) {
    return bytes(file, asked, path).flatMap(bytes -> decoded(bytes, file));
  }

  private Optional<String> decoded(byte[] bytes, String file) {
    if (bytes.length > LARGEST_TEXT) {
      problems.error(Place.wholeFile(file), "", "is larger than 20 MB", "a smaller file");
      return Optional.empty();
    }
    ByteBuffer in = ByteBuffer.wrap(bytes);
    try {
      String text =
          StandardCharsets.UTF_8
              .newDecoder()
              .onMalformedInput(CodingErrorAction.REPORT)
              .onUnmappableCharacter(CodingErrorAction.REPORT)
              .decode(in)
              .toString();
      return Optional.of(text.startsWith("\uFEFF") ? text.substring(1) : text);
    } catch (CharacterCodingException e) {
      // The decoder stops where the trouble begins, so what lies before it is good text.
      String before = new String(bytes, 0, in.position(), StandardCharsets.UTF_8);
      int line = (int) before.chars().filter(c -> c == '\n').count() + 1;
      int column = before.length() - before.lastIndexOf('\n');
      problems.error(
          new Place(file, line, column),
          "",
          String.format(
              java.util.Locale.ROOT, "the byte 0x%02X is not UTF-8", bytes[in.position()] & 0xFF),
          "save the file as UTF-8");
      return Optional.empty();
    }
  }

  /** Every file that was read, by path. */
  List<InputFile> inputs() {
    return hashes.entrySet().stream()
        .map(entry -> new InputFile(entry.getKey(), entry.getValue()))
        .toList();
  }

  static String sha256(byte[] bytes) {
    try {
      return HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-256", e);
    }
  }

  boolean exists() {
    return Files.isDirectory(root);
  }
}
