package quietspan.export;

import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.UUID;

/** Name-based identifiers: UUID version 5 of RFC 9562 (2024), section 5.5. */
final class NameUuid {

  /** Chosen at random once; under it each mission has a name space of its own. */
  private static final UUID PROGRAM = UUID.fromString("7c3f1d52-8a0e-4b6d-9e21-54d0c6a7f318");

  private NameUuid() {}

  /** The identifier of a thing of a mission. */
  static UUID of(String mission, String kind, String id) {
    return version5(version5(PROGRAM, mission), kind + "/" + id);
  }

  /** SHA-1 of the name space and the name in UTF-8, cut to 128 bits, version and variant set. */
  static UUID version5(UUID space, String name) {
    MessageDigest sha1;
    try {
      sha1 = MessageDigest.getInstance("SHA-1");
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java platform has SHA-1", e);
    }
    sha1.update(
        ByteBuffer.allocate(16)
            .putLong(space.getMostSignificantBits())
            .putLong(space.getLeastSignificantBits())
            .array());
    ByteBuffer hash = ByteBuffer.wrap(sha1.digest(name.getBytes(StandardCharsets.UTF_8)));
    long high = (hash.getLong() & 0xFFFF_FFFF_FFFF_0FFFL) | 0x5000L;
    long low = (hash.getLong() & 0x3FFF_FFFF_FFFF_FFFFL) | 0x8000_0000_0000_0000L;
    return new UUID(high, low);
  }
}
