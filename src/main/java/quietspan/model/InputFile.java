package quietspan.model;

/** An input file and the SHA-256 of its bytes, in lower-case hexadecimal; the path is relative. */
public record InputFile(String path, String sha256) {}
