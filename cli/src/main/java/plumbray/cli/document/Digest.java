package plumbray.cli.document;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.Objects;

/**
 * What a result was made from, so that it can be told whether it would come out the same again.
 *
 * @param name what it is called: a file's name, or what else went in
 * @param sha256 SHA-256 (FIPS 180-4) of its bytes, 64 lower-case hexadecimal digits
 */
public record Digest(String name, String sha256) {
  private static final String ALGORITHM = "SHA-256";
  private static final int BLOCK_BYTES = 1 << 16;

  /** Checks that both are there. */
  public Digest {
    Objects.requireNonNull(name, "name");
    Objects.requireNonNull(sha256, "sha256");
  }

  /**
   * The digest of some bytes.
   *
   * @param name what they are called
   * @param bytes the bytes
   */
  public static Digest of(String name, byte[] bytes) {
    try {
      byte[] digest = MessageDigest.getInstance(ALGORITHM).digest(bytes);
      return new Digest(name, HexFormat.of().formatHex(digest));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java has SHA-256", e);
    }
  }

  /**
   * The digest of a file, by its name without the folder.
   *
   * @param file the file
   * @throws IOException when it cannot be read
   */
  public static Digest of(Path file) throws IOException {
    try (InputStream in = Files.newInputStream(file)) {
      MessageDigest digest = MessageDigest.getInstance(ALGORITHM);
      byte[] block = new byte[BLOCK_BYTES];
      for (int length = in.read(block); length >= 0; length = in.read(block)) {
        digest.update(block, 0, length);
      }
      return new Digest(file.getFileName().toString(), HexFormat.of().formatHex(digest.digest()));
    } catch (NoSuchAlgorithmException e) {
      throw new IllegalStateException("every Java has SHA-256", e);
    }
  }

  /**
   * The digest of a text's UTF-8 bytes.
   *
   * @param name what it is called
   * @param text the text
   */
  public static Digest of(String name, String text) {
    return of(name, text.getBytes(StandardCharsets.UTF_8));
  }
}
