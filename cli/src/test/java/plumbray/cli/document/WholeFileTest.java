package plumbray.cli.document;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.DisabledOnOs;
import org.junit.jupiter.api.condition.OS;
import org.junit.jupiter.api.io.TempDir;

class WholeFileTest {
  @Test
  void theFileAndItsFolderAreMade(@TempDir Path folder) throws IOException {
    Path target = folder.resolve("new").resolve("a.txt");
    WholeFile.write(target, "text");
    WholeFile.write(target, "other");
    assertThat(target).hasContent("other");
    assertThat(names(target.getParent())).containsExactly("a.txt");
  }

  @Test
  void aFailureLeavesWhatWasThere(@TempDir Path folder) throws IOException {
    Path target = folder.resolve("a.txt");
    WholeFile.write(target, "before");
    assertThatThrownBy(
            () ->
                WholeFile.write(
                    target,
                    out -> {
                      out.write(1);
                      throw new IOException("the disk is full");
                    }))
        .hasMessage("the disk is full");
    assertThat(target).hasContent("before");
    assertThat(names(folder)).containsExactly("a.txt");
  }

  @Test
  @DisabledOnOs(OS.WINDOWS)
  void theFileMayBeReadByWhomAnyNewFileMay(@TempDir Path folder) throws IOException {
    Path plain = Files.createFile(folder.resolve("plain.txt"));
    Path target = folder.resolve("a.txt");
    WholeFile.write(target, "text");
    assertThat(Files.getPosixFilePermissions(target))
        .isEqualTo(Files.getPosixFilePermissions(plain));
  }

  private static String[] names(Path folder) throws IOException {
    try (Stream<Path> files = Files.list(folder)) {
      return files.map(file -> file.getFileName().toString()).toArray(String[]::new);
    }
  }
}
