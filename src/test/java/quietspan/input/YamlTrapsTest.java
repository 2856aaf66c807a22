package quietspan.input;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** What YAML itself makes go wrong. */
class YamlTrapsTest {

  @TempDir Path folder;

  /** In the second column {@code \n}, {@code \t} and so on stand for the characters. */
  @ParameterizedTest(name = "{0}")
  @CsvSource(
      delimiter = '|',
      quoteCharacter = '`',
      textBlock =
          """
          an empty file             | ``                                  | state.yaml: is empty (a YAML document)
          only a comment            | # nothing                           | state.yaml: is empty (a YAML document)
          an explicit null          | ---\\n                              | state.yaml: is empty (a YAML document)
          a list at the top         | - craft                             | state.yaml:1:1: is a list where the state at the begin of the period is due (the keys quiet_since_onboard_utc, last_contact_end_ground_utc, craft)
          a tab as indent           | craft:\\n\\t- name: Reed            | state.yaml:2:1: a tab stands where YAML wants spaces (indent with spaces)
          a second document         | craft: []\\n---\\ncraft: []         | state.yaml:3:1: a second YAML document begins here (one document in a file)
          a bracket never closed    | craft: [                            | state.yaml:1:9: is not YAML: expected the node content, but found '<stream end>' (YAML 1.2)
          an unknown alias          | craft: *nobody                      | state.yaml:1:8: is not YAML: found undefined alias nobody (YAML 1.2)
          a foreign YAML version    | %YAML 3.0\\n---\\ncraft: []         | state.yaml: asks for another version of YAML (YAML 1.2)
          a control character       | craft: a\\7                         | state.yaml:1:9: holds the character U+0007 (printable characters)
          """)
  void isRefusedAtItsPlace(String name, String text, String complaint) {
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.put("state.yaml", text == null ? "" : text.translateEscapes());
    assertThat(texts.complaints()).containsExactly(complaint);
  }

  @Test
  void aFileThatIsNotUtf8IsRefusedAtTheByte() {
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.put("state.yaml", "# Zürich\ncraft: \u00fc".getBytes(StandardCharsets.ISO_8859_1));
    assertThat(texts.complaints())
        .containsExactly("state.yaml:1:4: the byte 0xFC is not UTF-8 (save the file as UTF-8)");
  }

  @Test
  void aByteOrderMarkIsPassedBy() {
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.put("state.yaml", "\uFEFF" + FolderOfTexts.STATE);
    assertThat(texts.complaints()).isEmpty();
  }

  @Test
  void linesMayEndWithCarriageReturns() {
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.put("state.yaml", FolderOfTexts.STATE.replace("\n", "\r\n"));
    texts.replace("state.yaml", "12.9 deg", "12.8 deg");
    assertThat(texts.complaints())
        .containsExactly(
            "state.yaml:11:43: craft[1].aim.elevation: is not the elevation that is built in"
                + " (12.9 deg)");
  }

  @Test
  void hugeNestingIsRefusedWithoutLosingOneself() {
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.put("state.yaml", "[".repeat(100_000));
    assertThat(texts.complaints())
        .containsExactly(
            "state.yaml:1:31: is nested more than 30 deep (the fields of this file are nested less"
                + " deep)");
  }

  @Test
  void aliasesThatGrowWithoutEndAreNotFollowed() {
    StringBuilder text = new StringBuilder("craft: &a0 [{name: x}]\n");
    for (int i = 1; i < 25; i++) {
      text.append("k").append(i).append(": &a").append(i).append(" [");
      text.append(("*a" + (i - 1) + ",").repeat(9)).append("]\n");
    }
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.put("state.yaml", text.toString());
    assertThat(texts.complaints())
        .hasSizeGreaterThan(24)
        .contains(
            "state.yaml:2:1: k1: is not known here (one of quiet_since_onboard_utc,"
                + " last_contact_end_ground_utc, craft)");
  }

  @Test
  void anAliasOfItselfIsRefused() {
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.put("state.yaml", "craft: &me [*me]\n");
    assertThat(texts.complaints())
        .contains(
            "state.yaml:1:8: craft[0]: is a list where a craft at the begin of the period is due"
                + " (the keys name, aim, fill, last_contact_end_ground_utc,"
                + " last_repoint_onboard_utc)");
  }

  @Test
  void anchorsAreWelcome() {
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.replace("mission.yaml", "half_power_width: 4.6 deg", "half_power_width: &wide 4.6 deg");
    texts.replace(
        "mission.yaml",
        "half_cone: 1.7 deg\n",
        "half_cone: 1.7 deg\n      half_power_width: *wide\n");
    assertThat(texts.scenario().craft("Tern").antenna().halfPowerWidth().degrees())
        .isEqualTo(4.6, within(1e-12));
  }

  @Test
  void namesThatOtherYamlVersionsTakeForTruthValuesAreNames() {
    FolderOfTexts texts = new FolderOfTexts(folder);
    texts.replace("mission.yaml", "name: Tern", "name: no");
    texts.replace("state.yaml", "name: Tern", "name: no");
    assertThat(texts.scenario().craft().get(1).name()).isEqualTo("no");
  }
}
