package plumbray.commandline;

import static org.assertj.core.api.Assertions.assertThat;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.time.Duration;
import java.time.Instant;
import java.util.List;
import java.util.Map;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import plumbray.commandline.StartScriptCheckout.Outcome;

/**
 * Runs the real start script, in a copy of the folders it expects. Maven is a stand-in that counts
 * its calls and hands out a stand-in program, so that what is checked is the script alone.
 */
class StartScriptTest {
  private static final String BUILDING =
      "plumbray: building the program (first use, or its sources have changed); this can take a minute";

  @TempDir private Path temporary;
  private StartScriptCheckout checkout;

  @BeforeAll
  static void needsAPosixShell() {
    assumeTrue(Files.isExecutable(Path.of("/bin/sh")));
  }

  @BeforeEach
  void makeCheckout() throws IOException {
    checkout = StartScriptCheckout.in(temporary.resolve("a folder with spaces"));
  }

  @Test
  void argumentsInputOutputFolderAndStatusPassThrough() throws Exception {
    Outcome first = checkout.start("3", "two words", "*", "$HOME", "");
    assertThat(first.status()).isEqualTo(3);
    assertThat(first.err()).containsExactly(BUILDING, "to standard error");
    assertThat(first.out())
        .containsExactly(
            "[3, two words, *, $HOME, ]",
            "typed in",
            checkout.elsewhere().toString(),
            "headless true");

    Outcome second = checkout.start("0");
    assertThat(second.status()).isZero();
    assertThat(second.err()).as("nothing is built again").containsExactly("to standard error");
    assertThat(checkout.builds()).isEqualTo(1);
  }

  @Test
  void theScriptFindsItsPlaceThroughSymbolicLinks() throws Exception {
    Path links = Files.createDirectories(temporary.resolve("some links"));
    Path absolute = Files.createSymbolicLink(links.resolve("absolute"), checkout.script());
    Path relative = Files.createSymbolicLink(links.resolve("relative"), Path.of("absolute"));
    assertThat(absolute).exists();
    assertThat(checkout.startAs(relative, Map.of(), "0").status()).isZero();
    assertThat(checkout.builds()).isEqualTo(1);
  }

  @Test
  void changedSourcesAreBuiltAgain() throws Exception {
    assertThat(checkout.start("0").status()).isZero();
    Files.setLastModifiedTime(
        checkout.source(), FileTime.from(Instant.now().plus(Duration.ofSeconds(5))));
    Outcome again = checkout.start("0");
    assertThat(again.status()).isZero();
    assertThat(again.err()).contains(BUILDING);
    assertThat(checkout.builds()).isEqualTo(2);
  }

  @Test
  void twoStartsAtOnceBuildOnce() throws Exception {
    Map<String, String> slowBuild = Map.of("FAKE_MAVEN_SLEEP", "2");
    Process one = checkout.begin(checkout.script(), slowBuild, "0");
    Process two = checkout.begin(checkout.script(), slowBuild, "0");
    assertThat(one.waitFor()).isZero();
    assertThat(two.waitFor()).isZero();
    assertThat(checkout.builds()).isEqualTo(1);
  }

  @Test
  void aLockLeftByADeadProcessIsTakenOver() throws Exception {
    Process dead = new ProcessBuilder("true").start();
    assertThat(dead.waitFor()).isZero();
    Path lock = Files.createDirectories(checkout.state().resolve("lock"));
    Files.writeString(lock.resolve("pid"), dead.pid() + "\n");
    assertThat(checkout.start("0").status()).isZero();
    assertThat(lock).doesNotExist();
  }

  @Test
  void theClassDataArchiveIsUsed() throws Exception {
    // Under a path with spaces the virtual machine takes only its own classes from the archive.
    checkout = StartScriptCheckout.in(temporary.resolve("plain"));
    assertThat(checkout.start("0").status()).isZero();
    Outcome traced =
        checkout.startAs(
            checkout.script(), Map.of("PLUMBRAY_JAVA_OPTS", "-Xlog:class+load=info"), "0");
    List<String> loaded =
        traced.out().stream().filter(line -> line.contains("plumbray.cli.Main")).toList();
    assertThat(loaded).singleElement().asString().contains("shared objects file");
  }

  @Test
  void aFailedBuildIsOneLineAndTriedAgainNextTime() throws Exception {
    Outcome broken =
        checkout.startAs(checkout.script(), Map.of("FAKE_MAVEN_ERROR", "no such thing"), "0");
    assertThat(broken.status()).isEqualTo(1);
    assertThat(broken.err()).hasSize(2).first().isEqualTo(BUILDING);
    assertThat(broken.err().get(1)).contains("the build failed", "no such thing");
    assertThat(checkout.start("0").status()).isZero();
  }

  @Test
  void missingMavenIsOneLineAndStatusTwo() throws Exception {
    Files.delete(checkout.maven());
    Outcome outcome = checkout.start("0");
    assertThat(outcome.status()).isEqualTo(2);
    assertThat(outcome.err()).singleElement().asString().contains("Maven 3.8 or newer");
  }

  @Test
  void missingJavaIsOneLineAndStatusTwo() throws Exception {
    Outcome outcome = checkout.startAs(checkout.script(), Map.of("JAVA_HOME", ""), "0");
    assertThat(outcome.status()).isEqualTo(2);
    assertThat(outcome.err()).singleElement().asString().contains("install a JDK 17 or newer");
  }

  @Test
  void anOldJavaIsOneLineAndStatusTwo() throws Exception {
    Path old = temporary.resolve("old java");
    pretendJava(old, "11.0.2");
    Outcome outcome = checkout.startAs(checkout.script(), Map.of("JAVA_HOME", old.toString()), "0");
    assertThat(outcome.status()).isEqualTo(2);
    assertThat(outcome.err()).singleElement().asString().contains("is Java 11");
  }

  @Test
  void aRuntimeWithoutACompilerIsOneLineAndStatusTwo() throws Exception {
    Path runtime = temporary.resolve("runtime only");
    pretendJava(runtime, "17.0.1");
    Outcome outcome =
        checkout.startAs(checkout.script(), Map.of("JAVA_HOME", runtime.toString()), "0");
    assertThat(outcome.status()).isEqualTo(2);
    assertThat(outcome.err()).singleElement().asString().contains("a JDK is needed");
  }

  private static void pretendJava(Path home, String version) throws IOException {
    Path java = Files.createDirectories(home.resolve("bin")).resolve("java");
    StartScriptCheckout.writeScript(java, "#!/bin/sh\nexit 1\n");
    Files.writeString(home.resolve("release"), "JAVA_VERSION=\"" + version + "\"\n");
  }
}
