package quietspan.planted.link;

import com.fasterxml.jackson.core.JsonToken;
import net.fortuna.ical4j.model.Calendar;
import org.hipparchus.complex.Complex;
import org.optaplanner.core.api.score.Score;
import org.orekit.frames.Frame;
import org.snakeyaml.engine.v2.common.ScalarStyle;
import picocli.CommandLine;

/** Uses every library where none belongs. */
public record UsesEveryLibrary(
    Frame frame,
    Complex number,
    Score<?> score,
    Calendar calendar,
    ScalarStyle style,
    JsonToken token,
    CommandLine line) {}
