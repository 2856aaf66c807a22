package quietspan.cli;

import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.Reader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.Properties;
import picocli.CommandLine.IVersionProvider;

/** The version that the build wrote beside this class. */
final class Version implements IVersionProvider {
  @Override
  public String[] getVersion() {
    return new String[] {"quietspan " + number()};
  }

  static String number() {
    Properties properties = new Properties();
    try (InputStream bytes = Version.class.getResourceAsStream("version.properties");
        Reader text = new InputStreamReader(bytes, StandardCharsets.UTF_8)) {
      properties.load(text);
    } catch (IOException e) {
      throw new UncheckedIOException("version.properties cannot be read", e);
    }
    return properties.getProperty("version");
  }
}
