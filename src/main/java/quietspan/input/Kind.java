package quietspan.input;

import java.util.Map;
import java.util.Optional;

/**
 * How the value of a field is written: it reads it, says it in words and says it as JSON Schema.
 *
 * @param <T> what the value becomes
 */
sealed interface Kind<T> permits Scalar, Block, Items {

  /** Reads the value; when it cannot be taken, complains and gives nothing. */
  Optional<T> read(Spot spot);

  /** The kind in words with its article, such as {@code an angle}. */
  String noun();

  /** The kind as JSON Schema (draft 7), keys in a fixed order. */
  Map<String, Object> schema();
}
