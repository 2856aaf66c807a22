package quietspan.export;

import static org.assertj.core.api.Assertions.assertThat;

import java.util.UUID;
import org.junit.jupiter.api.Test;

final class NameUuidTest {

  /** RFC 9562 (2024), appendix A.4: name space of domain names, name www.example.com. */
  @Test
  void publishedExampleComesOut() {
    UUID domainNames = UUID.fromString("6ba7b810-9dad-11d1-80b4-00c04fd430c8");
    assertThat(NameUuid.version5(domainNames, "www.example.com"))
        .isEqualTo(UUID.fromString("2ed6657d-e927-568b-95e1-2665a8aea6a2"));
  }

  @Test
  void missionKindAndIdAllCount() {
    assertThat(
            java.util.Set.of(
                NameUuid.of("A", "contact", "1"),
                NameUuid.of("B", "contact", "1"),
                NameUuid.of("A", "repoint", "1"),
                NameUuid.of("A", "contact", "2")))
        .hasSize(4);
  }
}
