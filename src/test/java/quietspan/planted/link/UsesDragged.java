package quietspan.planted.link;

import org.apache.commons.lang3.StringUtils;

/** Uses a library that another one drags along. */
public final class UsesDragged {
  public boolean blank(String text) {
    return StringUtils.isBlank(text);
  }
}
